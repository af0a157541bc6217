import { checkCount, checkFinite, checkPositive, checkRange, checkResult } from "./check-range";
import { checkSeries, endsOf, type Sample } from "./series";

export type Approach = {
  initial: number;
  final: number;
  timeConstantS: number;
  finalSe: number;
  timeConstantSe: number;
  residualSumOfSquares: number;
  converged: boolean;
};

export type ApproachOptions = {
  initial?: number; // value at timeS = 0 where it is known; fitted where not given
  start?: { timeConstantS: number }; // where the search begins; the whole range is scanned where not given
};

/** One step of the search in ln b, and its range: time constants from 1/60 of the shortest gap to 1,000 records. */
const STEP = 0.1;
const SHORTEST_GAP_SHARE = 60;
const LONGEST_RECORDS = 1000;

type Row = { t: number; decay: number; rise: number; value: number };
type Fit = { b: number; initial: number; final: number; rss: number; tilt: number; rows: Row[] };

/**
 * First-order approach to a steady value, by least squares.
 *
 *     T(t) = final + (initial − final) · e^(−t/τ)
 *     for each τ the model is linear in initial and final (variable projection); the best τ is where d(RSS)/dτ = 0
 *
 * Source    [STRD-MISRA1A] and [STRD-BOXBOD] with initial = 0: b₁ = final, b₂ = 1/τ.
 * Inputs    values in one unit; seconds counted from the start of the change, where `initial` stands.
 * Domain    times rising, none negative; at least 3 readings with initial given, 4 without; the series must bend.
 * Throws    RangeError outside the domain, or for a series that does not change.
 * Accuracy  6 figures or more on the StRD sets. converged false: no bend was found inside the search range, the figures mean nothing.
 */
export function fitApproach(series: readonly Sample[], options: ApproachOptions = {}): Approach {
  const fixed = options.initial;
  checkSeries(series, fixed === undefined ? 4 : 3);
  for (const { timeS } of series) checkRange("series.timeS", timeS, 0, Number.POSITIVE_INFINITY);
  if (fixed !== undefined) checkFinite("initial", fixed);
  if (options.start) checkPositive("start.timeConstantS", options.start.timeConstantS);

  // With initial fitted the record's own first moment is the origin, so that nothing underflows on a late record.
  const origin = fixed === undefined ? endsOf(series).first.timeS : 0;
  const at = (lnB: number) => bestFor(series, Math.exp(lnB), origin, fixed);
  const { lnB, converged } = search(at, searchRange(series, origin), options.start && -Math.log(options.start.timeConstantS));
  const fit = at(lnB);
  const { finalSe, rateSe } = standardErrors(fit, fixed !== undefined);
  return {
    initial: checkResult("initial", fit.final + (fit.initial - fit.final) * Math.exp(fit.b * origin)),
    final: checkResult("final", fit.final),
    timeConstantS: checkResult("timeConstantS", 1 / fit.b),
    finalSe: checkResult("finalSe", finalSe),
    timeConstantSe: checkResult("timeConstantSe", rateSe / fit.b ** 2),
    residualSumOfSquares: checkResult("residualSumOfSquares", fit.rss),
    converged,
  };
}

/** Best initial and final for the rate b = 1/τ, and the tilt d(RSS)/d(ln b)/2 there. */
function bestFor(series: readonly Sample[], b: number, origin: number, fixed: number | undefined): Fit {
  const rows = series.map(({ timeS, value }): Row => {
    const t = timeS - origin;
    return { t, decay: Math.exp(-b * t), rise: -Math.expm1(-b * t), value };
  });
  const sum = (term: (row: Row) => number) => rows.reduce((total, row) => total + term(row), 0);
  let initial: number;
  let final: number;
  if (fixed === undefined) {
    const meanRise = sum((r) => r.rise) / rows.length;
    const meanValue = sum((r) => r.value) / rows.length;
    const slope = sum((r) => (r.rise - meanRise) * (r.value - meanValue)) / sum((r) => (r.rise - meanRise) ** 2);
    initial = meanValue - slope * meanRise;
    final = initial + slope;
  } else {
    initial = fixed;
    final = sum((r) => r.rise * (r.value - fixed * r.decay)) / sum((r) => r.rise ** 2);
  }
  const residual = (r: Row) => r.value - initial * r.decay - final * r.rise;
  const tilt = -sum((r) => residual(r) * (final - initial) * b * r.t * r.decay);
  return { b, initial, final, rss: sum((r) => residual(r) ** 2), tilt, rows };
}

function searchRange(series: readonly Sample[], origin: number): { low: number; high: number } {
  const times = [origin, ...series.map((sample) => sample.timeS).filter((timeS) => timeS > origin)];
  checkCount("series.timeS after the start", times, 3);
  const gaps = times.slice(1).map((timeS, i) => timeS - (times[i] ?? origin));
  const span = (times.at(-1) ?? origin) - origin;
  return { low: -Math.log(LONGEST_RECORDS * span), high: Math.log(SHORTEST_GAP_SHARE / Math.min(...gaps)) };
}

/** Downhill in ln b from the start (or from the best of a scan) until the valley is bracketed, then the zero of the tilt. */
function search(
  at: (lnB: number) => Fit,
  { low, high }: { low: number; high: number },
  start?: number,
): { lnB: number; converged: boolean } {
  const rssAt = (lnB: number) => at(lnB).rss;
  let lnB = start === undefined ? low : Math.min(Math.max(start, low), high);
  if (start === undefined) for (let x = low; x <= high; x += STEP) if (rssAt(x) < rssAt(lnB)) lnB = x;
  const direction = at(lnB).tilt > 0 ? -1 : 1;
  while (rssAt(lnB + direction * STEP) < rssAt(lnB)) {
    lnB += direction * STEP;
    if (lnB <= low || lnB >= high) return { lnB: Math.min(Math.max(lnB, low), high), converged: false };
  }
  let left = lnB - STEP;
  let right = lnB + STEP;
  if (!(at(left).tilt < 0 && at(right).tilt > 0)) return { lnB, converged: false };
  for (let i = 0; i < 100 && right - left > 1e-15 * Math.abs(left); i++) {
    const middle = (left + right) / 2;
    if (middle === left || middle === right) break;
    if (at(middle).tilt < 0) left = middle;
    else right = middle;
  }
  return { lnB: (left + right) / 2, converged: true };
}

/** Square roots of the diagonal of s²(JᵀJ)⁻¹ for final and b, with the columns of J brought to length 1 first. */
function standardErrors(fit: Fit, initialIsFixed: boolean): { finalSe: number; rateSe: number } {
  const columns = [
    fit.rows.map((r) => r.rise),
    fit.rows.map((r) => (fit.final - fit.initial) * r.t * r.decay),
    ...(initialIsFixed ? [] : [fit.rows.map((r) => r.decay)]),
  ];
  const lengths = columns.map((column) => Math.hypot(...column));
  if (lengths.some((length) => !(length > 0))) throw new RangeError("series does not change; an approach must rise or fall.");
  const unit = columns.map((column, j) => column.map((x) => x / (lengths[j] ?? 1)));
  const normal = unit.map((a) => unit.map((b) => a.reduce((total, x, i) => total + x * (b[i] ?? 0), 0)));
  const variance = fit.rss / (fit.rows.length - columns.length);
  const [finalVariance, rateVariance] = inverseDiagonal(normal);
  return {
    finalSe: Math.sqrt(variance * (finalVariance ?? 0)) / (lengths[0] ?? 1),
    rateSe: Math.sqrt(variance * (rateVariance ?? 0)) / (lengths[1] ?? 1),
  };
}

/** Diagonal of the inverse of a small symmetric positive matrix, by Gauss-Jordan elimination. */
function inverseDiagonal(matrix: readonly (readonly number[])[]): number[] {
  const size = matrix.length;
  const rows = matrix.map((row, i) => [...row, ...row.map((_, j) => (i === j ? 1 : 0))]);
  for (let i = 0; i < size; i++) {
    const pivotRow = rows[i] ?? [];
    const pivot = pivotRow[i] ?? 0;
    if (!(pivot > 1e-14)) throw new RangeError("series does not bend; initial, final and time constant cannot be told apart.");
    const scaled = pivotRow.map((x) => x / pivot);
    rows.forEach((row, k) => {
      const factor = row[i] ?? 0;
      rows[k] = k === i ? scaled : row.map((x, j) => x - factor * (scaled[j] ?? 0));
    });
  }
  return rows.map((row, i) => row[size + i] ?? 0);
}
