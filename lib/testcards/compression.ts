import { checkCount, checkPositive, checkRange } from "./check-range";

/**
 * Leakage of a differential compression test: the fraction of the regulated pressure that is lost.
 *
 *     loss = (p_regulated − p_held)/p_regulated
 *
 * Source    [AC-43.13-1B] para 8-14: 80 psi, hot engine, top dead centre. More than 25 % is cause to suspect; 25 % itself is not more.
 * Inputs    both pressures in one unit (the name says pascals). Never a cranking reading: that is another test.
 * Domain    reference above zero, held from 0 to reference.
 * Throws    RangeError outside the domain.
 * Accuracy  that of the gauges: 1 psi in 80 is 1.25 %.
 */
export function leakage({ referencePa, heldPa }: { referencePa: number; heldPa: number }): number {
  checkPositive("referencePa", referencePa);
  checkRange("heldPa", heldPa, 0, referencePa);
  return (referencePa - heldPa) / referencePa;
}

/**
 * Spread between cylinders of one compression test.
 *
 *     spread = highest − lowest    fractionOfHighest = spread/highest
 *
 * Source    common practice, no source.
 * Inputs    one value a cylinder, one unit, one kind of test.
 * Domain    at least 2 values, none negative, the highest above zero.
 * Throws    RangeError outside the domain.
 * Accuracy  exact.
 */
export function spread(values: readonly number[]): { highest: number; lowest: number; spread: number; fractionOfHighest: number } {
  checkCount("values", values, 2);
  for (const value of values) checkRange("values", value, 0, Number.POSITIVE_INFINITY);
  const top = checkPositive("the highest of values", Math.max(...values));
  const bottom = Math.min(...values);
  return { highest: top, lowest: bottom, spread: top - bottom, fractionOfHighest: (top - bottom) / top };
}
