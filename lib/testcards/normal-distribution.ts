import { checkFinite } from "./check-range";

/**
 * Probability that a standard normal variable is at most z.
 *
 *     Φ(z) = ½ + φ(z) · (z + z³/3 + z⁵/15 + …)          |z| < 5
 *     1 − Φ(z) = φ(z) / (z + 1/(z + 2/(z + 3/(z + …))))  z ≥ 5, mirrored below
 *
 * Source    [AS] 26.2.11 (series) and 26.2.14 (continued fraction).
 * Inputs    z, a pure number.
 * Domain    any finite z.
 * Throws    RangeError for z not finite.
 * Accuracy  better than 1e-13.
 */
export function normalCumulative(z: number): number {
  checkFinite("z", z);
  const density = Math.exp((-z * z) / 2) / Math.sqrt(2 * Math.PI);
  if (Math.abs(z) >= 5) {
    let tail = Math.abs(z);
    for (let k = 60; k >= 1; k--) tail = Math.abs(z) + k / tail;
    return z > 0 ? 1 - density / tail : density / tail;
  }
  let term = z;
  let sum = z;
  for (let k = 3; Math.abs(term) > 1e-17 * Math.abs(sum); k += 2) {
    term *= (z * z) / k;
    sum += term;
  }
  return 0.5 + density * sum;
}
