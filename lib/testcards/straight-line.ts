import { checkCount, checkFinite, checkResult } from "./check-range";

export type LineFit = {
  slope: number;
  intercept: number;
  residualSd: number;
  slopeSe: number;
  interceptSe: number;
  meanX: number;
  sumSquaresX: number; // Σ(x − x̄)²
  count: number;
};

/**
 * Ordinary least-squares straight line y = intercept + slope · x with its standard errors.
 *
 *     slope = Sxy/Sxx    s² = RSS/(n − 2)    se(slope) = s/√Sxx    se(intercept) = s·√(1/n + x̄²/Sxx)
 *
 * Source    [STRD-NORRIS] NIST StRD, linear regression, data set Norris and its model.
 * Inputs    x and y in any units, one pair a reading.
 * Domain    at least 3 pairs, of at least 2 different x.
 * Throws    RangeError outside the domain.
 * Accuracy  centred sums: 9 figures or more on the StRD set.
 */
export function fitLine(name: string, points: readonly { x: number; y: number }[]): LineFit {
  checkCount(name, points, 3);
  for (const { x, y } of points) {
    checkFinite(name, x);
    checkFinite(name, y);
  }
  const count = points.length;
  const meanX = points.reduce((sum, p) => sum + p.x, 0) / count;
  const meanY = points.reduce((sum, p) => sum + p.y, 0) / count;
  const sumSquaresX = points.reduce((sum, p) => sum + (p.x - meanX) ** 2, 0);
  if (sumSquaresX < 1e-24) throw new RangeError(`${name} has the same value ${meanX} throughout; it must hold at least 2 different ones.`);

  const slope = points.reduce((sum, p) => sum + (p.x - meanX) * (p.y - meanY), 0) / sumSquaresX;
  const rss = points.reduce((sum, p) => sum + (p.y - meanY - slope * (p.x - meanX)) ** 2, 0);
  const residualSd = Math.sqrt(rss / (count - 2));
  const slopeSe = residualSd / Math.sqrt(sumSquaresX);
  const interceptSe = residualSd * Math.sqrt(1 / count + meanX ** 2 / sumSquaresX);
  checkResult(`the line through ${name}`, slope + residualSd + slopeSe + interceptSe);
  return { slope, intercept: meanY - slope * meanX, residualSd, slopeSe, interceptSe, meanX, sumSquaresX, count };
}
