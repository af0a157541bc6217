import { checkRange } from "./check-range";

const LANCZOS = [
  0.99999999999980993, 676.5203681218851, -1259.1392167224028, 771.32342877765313, -176.61502916214059, 12.507343278686905,
  -0.13857109526572012, 9.9843695780195716e-6, 1.5056327351493116e-7,
];

function logGamma(x: number): number {
  const t = x + 6.5;
  const sum = LANCZOS.reduce((total, c, i) => (i === 0 ? c : total + c / (x + i - 1)), 0);
  return 0.5 * Math.log(2 * Math.PI) + (x - 0.5) * Math.log(t) - t + Math.log(sum);
}

/** Continued fraction of the regularised incomplete beta function, [AS] 26.5.8, by Lentz's method. */
function incompleteBeta(x: number, a: number, b: number): number {
  if (x <= 0 || x >= 1) return Math.min(Math.max(x, 0), 1);
  if (x > (a + 1) / (a + b + 2)) return 1 - incompleteBeta(1 - x, b, a);
  const front = Math.exp(logGamma(a + b) - logGamma(a) - logGamma(b) + a * Math.log(x) + b * Math.log(1 - x)) / a;
  const tiny = 1e-300;
  let c = 1;
  let d = 1 / (1 - ((a + b) * x) / (a + 1) || tiny);
  let h = d;
  for (let m = 1; m <= 300; m++) {
    for (const step of [
      (m * (b - m) * x) / ((a + 2 * m - 1) * (a + 2 * m)),
      (-(a + m) * (a + b + m) * x) / ((a + 2 * m) * (a + 2 * m + 1)),
    ]) {
      d = 1 / (1 + step * d || tiny);
      c = 1 + step / c || tiny;
      h *= c * d;
    }
    if (Math.abs(c * d - 1) < 1e-15) break;
  }
  return front * h;
}

/**
 * Quantile of Student's t: the half-width, in standard errors, of a two-sided interval.
 *
 *     P(|t| ≤ q) = 1 − I_x(ν/2, ½), x = ν/(ν + q²)
 *
 * Source    [AS] 26.7.1 with 26.5.27, turned round by bisection; [NIST-HANDBOOK] 1.3.6.7.2 table.
 * Inputs    confidence of the two-sided interval, 0.95 for t(0.975); degrees of freedom ν.
 * Domain    0 < confidence < 1, here 0.01 to 0.999; ν whole, at least 1.
 * Throws    RangeError outside the domain.
 * Accuracy  better than 1e-9 of the value.
 */
export function studentT(confidence: number, degreesOfFreedom: number): number {
  checkRange("confidence", confidence, 0.01, 0.999);
  checkRange("degreesOfFreedom", degreesOfFreedom, 1, 1e6);
  if (!Number.isInteger(degreesOfFreedom)) throw new RangeError(`degreesOfFreedom is ${degreesOfFreedom}; it must be a whole number.`);
  const outside = (q: number) => incompleteBeta(degreesOfFreedom / (degreesOfFreedom + q * q), degreesOfFreedom / 2, 0.5);
  let low = 0;
  let high = 1;
  while (outside(high) > 1 - confidence) high *= 2;
  for (let i = 0; i < 200 && high - low > 1e-13 * high; i++) {
    const middle = (low + high) / 2;
    if (outside(middle) > 1 - confidence) low = middle;
    else high = middle;
  }
  return (low + high) / 2;
}
