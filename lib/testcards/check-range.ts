/**
 * Refusals shared by every computation: an impossible input is an error, never a silent default.
 * A value beyond a limit is a result, not an error, and does not come through here.
 */

const show = (value: unknown): string => (typeof value === "number" ? String(value) : JSON.stringify(value));

/** No figure of this trade is larger; beyond it products and quotients could overflow. */
const LARGEST = 1e15;
const SMALLEST_DIVISOR = 1e-12;

/** Throws RangeError unless `value` is a finite number of a size that measurements have; answers it. */
export function checkFinite(name: string, value: number): number {
  if (Math.abs(value) > LARGEST && Number.isFinite(value)) throw new RangeError(`${name} is ${value}; it must be from -1e15 to 1e15.`);
  if (typeof value !== "number" || !Number.isFinite(value)) throw new RangeError(`${name} is ${show(value)}; it must be a finite number.`);
  return value;
}

/** Throws RangeError unless low ≤ value ≤ high; answers it. Use ±Infinity for an open end. */
export function checkRange(name: string, value: number, low: number, high: number): number {
  checkFinite(name, value);
  if (value < low || value > high) throw new RangeError(`${name} is ${value}; it must be ${range(low, high)}.`);
  return value;
}

/** Throws RangeError unless value is above zero; answers it. */
export function checkPositive(name: string, value: number): number {
  checkFinite(name, value);
  if (value < SMALLEST_DIVISOR) throw new RangeError(`${name} is ${value}; it must be above 0.`);
  return value;
}

/** Throws RangeError unless `value` is one of `allowed`; answers it. */
export function checkOneOf<T extends string | number>(name: string, value: T, allowed: readonly T[]): T {
  if (!allowed.includes(value)) throw new RangeError(`${name} is ${show(value)}; it must be one of ${allowed.join(", ")}.`);
  return value;
}

/** Throws RangeError unless the list holds at least `least` items. */
export function checkCount(name: string, list: readonly unknown[], least: number): void {
  if (list.length < least) throw new RangeError(`${name} holds ${list.length} values; it must hold at least ${least}.`);
}

/** Throws RangeError for a result that left the range of floating-point numbers. */
export function checkResult(name: string, value: number): number {
  if (!Number.isFinite(value)) throw new RangeError(`${name} comes out as ${value}; the inputs must keep it finite.`);
  return value;
}

function range(low: number, high: number): string {
  if (high === Number.POSITIVE_INFINITY) return `at least ${low}`;
  if (low === Number.NEGATIVE_INFINITY) return `at most ${high}`;
  return `from ${low} to ${high}`;
}
