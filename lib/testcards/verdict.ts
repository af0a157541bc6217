import { checkCount, checkFinite, checkOneOf, checkPositive, checkRange } from "./check-range";
import { normalCumulative } from "./normal-distribution";
import { checkSeries, endsOf, type Sample, valueAt } from "./series";
import { type AbortDiscipline, type Note, REASONS, type Reason, SIDES, type Side, VERDICTS, type Verdict } from "./words";

export type { AbortDiscipline, Note, Reason, Verdict };

export type JudgedReading = { value: number; expandedUncertainty: number | null };
export type JudgedLimit = { side: Side; limit: number };

export type JudgeOptions = {
  stage?: "as flown" | "hot day"; // "as flown" where not given
  normal?: { low?: number | null; high?: number | null };
  withheld?: readonly Reason[];
  beyond?: "low" | "high" | null; // with "outside calibrated range": which end of the table the reading left
};

export type Judgement = {
  verdict: Verdict;
  margin: number | null;
  probabilityWithin: number | null;
  notes: (Note | Reason)[];
  reasons: Reason[];
  informationOnly: boolean;
};

/** Equality passes; this is the room for rounding in the comparison, in the limit's unit. */
const TOLERANCE = 1e-9;

const NOT_AS_FLOWN: readonly Reason[] = ["off condition", "not stabilised", "stopped early"];
const ALWAYS_WITHHELD_ON_THE_HOT_DAY: readonly Reason[] = ["off condition", "wrong configuration"];

/**
 * The guard-banded verdict on one reading against one limit, in the trade's fixed words.
 *
 *     max: within x + U ≤ L, marginal x ≤ L < x + U, exceeded x > L; min mirrored.    probability within = Φ((L − x)/(U/2))
 *
 * A proven failure outranks a reason to withhold: past the limit is "exceeded" with the reason as a note, but for "off condition" and
 * "wrong configuration" on the hot day. As flown, "off condition", "not stabilised" and "stopped early" withhold nothing.
 * A reading beyond its table comes as the true value at that end with "outside calibrated range" withheld; it proves an exceedance
 * only when that value less U is past the limit, and no number is quoted.
 *
 * Source    [JCGM-106] 7.3 and 8.3, [ILAC-G8] 4.2 with w = U; equality and the order of reasons are the team's own rule.
 * Inputs    value, U (k = 2) and limit in one unit, true values; null for no reading. U null = not known, 0 for a count.
 * Domain    finite figures, U ≥ 0.
 * Throws    RangeError outside the domain or for an unknown word.
 * Accuracy  compared unrounded, tolerance 1e-9. margin > 0 is in hand, null where there is no verdict or no number to quote.
 */
export function judge(reading: JudgedReading | null, limit: JudgedLimit, options: JudgeOptions = {}): Judgement {
  const { stage = "as flown", normal, withheld = [], beyond = null } = options;
  checkFinite("limit.limit", limit.limit);
  checkOneOf("limit.side", limit.side, SIDES);
  checkOneOf("options.stage", stage, ["as flown", "hot day"]);
  for (const reason of withheld) checkOneOf("options.withheld", reason, REASONS);
  if (reading) {
    checkFinite("reading.value", reading.value);
    if (reading.expandedUncertainty !== null)
      checkRange("reading.expandedUncertainty", reading.expandedUncertainty, 0, Number.POSITIVE_INFINITY);
  }

  const reasons = reasonsFor(reading, stage, withheld);
  if (!reading) return noVerdict(reasons, false);

  const margin = limit.side === "max" ? limit.limit - reading.value : reading.value - limit.limit;
  const u = reading.expandedUncertainty;
  const offTable = reasons.includes("outside calibrated range");
  if (reasons.length > 0) {
    const barred = stage === "hot day" && reasons.some((reason) => ALWAYS_WITHHELD_ON_THE_HOT_DAY.includes(reason));
    const proven = offTable ? provenOffTable(margin, u, limit.side, beyond) : margin < -TOLERANCE;
    if (barred || reasons.includes("no reading") || !proven) return noVerdict(reasons, !offTable && !reasons.includes("no reading"));
    const notes = [...exceedanceNotes(margin, u), ...reasons];
    const quoted = offTable ? null : margin;
    return {
      verdict: "exceeded",
      margin: quoted,
      probabilityWithin: quoted === null ? null : probability(margin, u),
      notes,
      reasons: [],
      informationOnly: false,
    };
  }

  const guard = u ?? 0; // an unknown U has given a reason above
  const verdict: Verdict = margin < -TOLERANCE ? "exceeded" : margin - guard < -TOLERANCE ? "marginal" : "within";
  const notes = verdict === "exceeded" ? exceedanceNotes(margin, u) : verdict === "within" ? normalNotes(reading.value, normal) : [];
  return { verdict, margin, probabilityWithin: probability(margin, u), notes, reasons: [], informationOnly: false };
}

function reasonsFor(reading: JudgedReading | null, stage: "as flown" | "hot day", withheld: readonly Reason[]): Reason[] {
  const found = new Set(withheld);
  if (!reading) found.add("no reading");
  else if (reading.expandedUncertainty === null) found.add("uncertainty unknown");
  return REASONS.filter((reason) => found.has(reason) && !(stage === "as flown" && NOT_AS_FLOWN.includes(reason)));
}

/** The hot end of a table proves nothing about a minimum, nor the cold end about a maximum. */
function provenOffTable(margin: number, u: number | null, side: Side, beyond: "low" | "high" | null): boolean {
  const rightEnd = beyond === null || (side === "max") === (beyond === "high");
  return rightEnd && margin + (u ?? 0) < -TOLERANCE;
}

function noVerdict(reasons: Reason[], informationOnly: boolean): Judgement {
  return { verdict: "no verdict", margin: null, probabilityWithin: null, notes: [], reasons, informationOnly };
}

function exceedanceNotes(margin: number, u: number | null): Note[] {
  if (u === null) return [];
  return [margin + u >= -TOLERANCE ? "by less than U" : "clearly"];
}

function normalNotes(value: number, normal: JudgeOptions["normal"]): Note[] {
  const low = normal?.low ?? null;
  const high = normal?.high ?? null;
  if (high !== null && value > checkFinite("options.normal.high", high) + TOLERANCE) return ["above normal"];
  if (low !== null && value < checkFinite("options.normal.low", low) - TOLERANCE) return ["below normal"];
  return [];
}

function probability(margin: number, u: number | null): number | null {
  if (u === null) return null;
  const z = u > 0 ? margin / (u / 2) : Number.NaN;
  if (!Number.isFinite(z)) return margin >= -TOLERANCE ? 1 : 0;
  return normalCumulative(Math.min(Math.max(z, -100), 100)); // 0 or 1 long before
}

/** The gravest of several verdicts: exceeded, then marginal, then no verdict, then within. Throws RangeError for none. */
export function worst(verdicts: readonly Verdict[]): Verdict {
  checkCount("verdicts", verdicts, 1);
  for (const verdict of verdicts) checkOneOf("verdicts", verdict, VERDICTS);
  const order: Verdict[] = ["exceeded", "marginal", "no verdict", "within"];
  return order.find((verdict) => verdicts.includes(verdict)) ?? "no verdict";
}

/**
 * Whether the call was made when the gauge reached its abort number.
 *
 *     reached and called: called    reached, not called: missed    called below it: early    neither: null
 *
 * Source    team's own rule. "early" is never criticised.
 * Inputs    worstOnGauge and threshold on the gauge; worstOnGauge null = not written down; calledForThis: an abort was called for this line.
 * Domain    finite figures.
 * Throws    RangeError outside the domain.
 * Accuracy  on the mark is reached, tolerance 1e-9. With no reading a call stands as called and silence stays null: missing data accuses nobody.
 */
export function abortDiscipline(input: {
  worstOnGauge: number | null;
  threshold: number;
  side: Side;
  calledForThis: boolean;
}): AbortDiscipline | null {
  const { worstOnGauge, threshold, side, calledForThis } = input;
  checkFinite("threshold", threshold);
  checkOneOf("side", side, SIDES);
  if (worstOnGauge === null) return calledForThis ? "called" : null;
  checkFinite("worstOnGauge", worstOnGauge);
  const reached = side === "max" ? worstOnGauge >= threshold - TOLERANCE : worstOnGauge <= threshold + TOLERANCE;
  if (reached) return calledForThis ? "called" : "missed";
  return calledForThis ? "early" : null;
}

/**
 * How long a series stays beyond a limit, for limits that allow it for a time.
 *
 * Source    team's own rule: the longest single stretch is judged against the allowance.
 * Inputs    corrected readings and limit in one unit; times in seconds.
 * Domain    at least 2 readings (one says nothing about duration), times rising.
 * Throws    RangeError outside the domain.
 * Accuracy  straight lines between readings; at the limit is not beyond it. What happened between two readings is not seen.
 */
export function timeBeyond(
  series: readonly Sample[],
  { side, limit }: { side: Side; limit: number },
): { longestS: number; totalS: number } {
  checkSeries(series, 2);
  checkFinite("limit", limit);
  checkOneOf("side", side, SIDES);
  let longestS = 0;
  let totalS = 0;
  let running = 0;
  let from: Sample | undefined;
  for (const to of series) {
    if (from) {
      const a = side === "max" ? from.value - limit : limit - from.value;
      const b = side === "max" ? to.value - limit : limit - to.value;
      const stepS = to.timeS - from.timeS;
      const beyondS = a > 0 && b > 0 ? stepS : a <= 0 && b <= 0 ? 0 : (stepS * Math.max(a, b)) / Math.abs(a - b);
      running = a > 0 ? running + beyondS : beyondS;
      totalS += beyondS;
      longestS = Math.max(longestS, running);
    }
    from = to;
  }
  return { longestS, totalS };
}

/**
 * Spread of a group read at one moment (cylinders), and each one against the mean.
 *
 *     spread = highest − lowest    fromMean_i = value_i − mean
 *
 * Source    common practice, no source.
 * Inputs    values in one unit, ids distinct; highest and lowest answer the id of the first such value.
 * Domain    at least 2 values.
 * Throws    RangeError outside the domain.
 * Accuracy  exact.
 */
export function groupSpread(values: readonly { id: string; value: number }[]): {
  spread: number;
  mean: number;
  highest: string;
  lowest: string;
  fromMean: { id: string; value: number }[];
} {
  checkCount("values", values, 2);
  for (const { value } of values) checkFinite("values.value", value);
  const high = values.reduce((best, v) => (v.value > best.value ? v : best));
  const low = values.reduce((best, v) => (v.value < best.value ? v : best));
  const mean = values.reduce((sum, v) => sum + v.value, 0) / values.length;
  const fromMean = values.map(({ id, value }) => ({ id, value: value - mean }));
  return { spread: high.value - low.value, mean, highest: high.id, lowest: low.id, fromMean };
}

/**
 * Largest swing of a series inside any window.
 *
 *     max |x(t₂) − x(t₁)|    0 ≤ t₂ − t₁ ≤ window
 *
 * Source    common practice, no source.
 * Inputs    corrected values; windowS in seconds.
 * Domain    at least 2 readings, times rising, window > 0. A record shorter than the window gives its own swing, which is a lower bound.
 * Throws    RangeError outside the domain.
 * Accuracy  straight lines between readings, windows may start between them.
 */
export function peakToPeak(series: readonly Sample[], { windowS }: { windowS: number }): number {
  checkSeries(series, 2);
  checkPositive("windowS", windowS);
  const upside = series.map(({ timeS, value }) => ({ timeS, value: -value }));
  return Math.max(largestDrop(series, windowS).drop, largestDrop(upside, windowS).drop);
}

/**
 * Fastest cooling: the largest fall inside any window, as a rate per minute.
 *
 *     perMin = max (x(t₁) − x(t₂)) · 60 / window    0 ≤ t₂ − t₁ ≤ window
 *
 * Source    common practice, no source.
 * Inputs    corrected values (a fall on the gauge times the table's slope); windowS in seconds.
 * Domain    at least 2 readings over at least one window, times rising.
 * Throws    RangeError outside the domain: a record shorter than the window cannot be judged by it.
 * Accuracy  straight lines between readings. No fall gives 0 at the first reading.
 */
export function largestFall(series: readonly Sample[], { windowS }: { windowS: number }): { perMin: number; fromS: number } {
  checkSeries(series, 2);
  checkPositive("windowS", windowS);
  const { spanS } = endsOf(series);
  if (spanS < windowS - 1e-9) throw new RangeError(`series spans ${spanS} s; it must span at least the window, ${windowS} s.`);
  const { drop, fromS } = largestDrop(series, windowS);
  return { perMin: (drop * 60) / windowS, fromS };
}

/** On straight lines the extreme has a reading at one end at least, and a reading or a window's width at the other. */
function largestDrop(series: readonly Sample[], windowS: number): { drop: number; fromS: number } {
  const { first, last } = endsOf(series);
  let best = { drop: 0, fromS: first.timeS };
  const consider = (fromS: number, drop: number) => {
    if (drop > best.drop) best = { drop, fromS };
  };
  for (const [i, start] of series.entries()) {
    for (const end of series.slice(i + 1)) {
      if (end.timeS > start.timeS + windowS) break;
      consider(start.timeS, start.value - end.value);
    }
    if (start.timeS + windowS <= last.timeS) consider(start.timeS, start.value - valueAt(series, start.timeS + windowS));
    if (start.timeS - windowS >= first.timeS) consider(start.timeS - windowS, valueAt(series, start.timeS - windowS) - start.value);
  }
  return best;
}
