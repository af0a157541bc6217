/** Comparison (ii): what was true in flight against the card limit and against the placard. */
import { rateUncertainty } from "./calibration";
import { type CardDocument, type CardPoint, parameterOf, type Reading } from "./card";
import { type Corrected, correct, extremeOf, type Gauge, gaugeOf, type Raw, rawRows, speaksFor, trueSeries } from "./check-gauge";
import { type AppliedLimit, clock, limitOnLine } from "./check-limits";
import type { CheckContext, CheckLine, Debrief, PointDebrief, ReadingEntry } from "./debrief-types";

import { unitSymbol } from "./unit-symbols";
import { convert, convertDifference, rateUnitOf, sameDimension, type Unit } from "./units";
import { type Judgement, judge, largestFall, peakToPeak, timeBeyond } from "./verdict";
import { REASONS, type Reason } from "./words";

/** One reading of one point, with all that its judgement rests on. */
export type Subject = {
  card: CardDocument;
  point: CardPoint;
  debrief: Debrief;
  said: PointDebrief | null;
  reading: Reading;
  entry: ReadingEntry | null;
  gauge: Gauge;
  context: CheckContext;
  withheld: { reason: Reason; why: string }[]; // of the point: wrong configuration, off condition
};

/** The figure one limit is judged on. */
type Figure = { onGauge: number | null; corrected: Corrected | null; reasons: Reason[]; why: string };

const RATE_WINDOW_S = 60; // common practice, no source: a fall is judged over any minute
const SWING_WINDOW_S = 300; // team's own rule where the limit states no window

export function asFlownLine(subject: Subject, limit: AppliedLimit): CheckLine | null {
  const figure = figureFor(subject, limit);
  if (figure === null) return null;
  const { gauge } = subject;
  const { corrected } = figure;
  // a reading, a valid calibration and U are enough here: what was true that day does not hang on condition, time run or configuration
  const reasons = [...figure.reasons, ...(corrected?.reasons ?? gauge.reasons)];
  const level = limit.statistic === "instant" || limit.statistic === "sustained";
  const judgement =
    corrected === null
      ? noVerdict(figure.onGauge === null || reasons.length === 0 ? ["no reading", ...reasons] : reasons)
      : judge(
          { value: corrected.value, expandedUncertainty: corrected.expandedUncertainty },
          { side: limit.side, limit: limit.value },
          { stage: "as flown", normal: level ? normalIn(subject, limit.unit) : {}, withheld: reasons, beyond: corrected.beyond },
        );
  const guard = corrected?.expandedUncertainty ?? 0;
  const timed = level && limit.forS > 0 ? allowTime(subject, limit, judgement, guard) : { judgement, why: "" };
  return {
    ...emptyLine(subject, limit),
    onGauge: figure.onGauge === null ? null : { value: figure.onGauge, unit: gauge.unit },
    asTrue: corrected === null || corrected.beyond !== null ? null : judged(corrected),
    ...timed.judgement,
    required: limit.printed,
    why: [figure.why, timed.why, whyOf(subject, timed.judgement, corrected)].filter((part) => part !== "").join("; "),
  };
}

export function emptyLine(subject: Subject, limit: AppliedLimit): CheckLine {
  return {
    point: subject.point.id,
    reading: subject.reading.id,
    parameter: subject.reading.parameter,
    comparison: limit.comparison,
    statistic: limit.statistic,
    onGauge: null,
    asTrue: null,
    hotDay: null,
    limit: limitOnLine(limit),
    ...noVerdict(["no reading"]),
    required: false,
    why: "",
    discipline: null,
    otherBasis: null,
  };
}

export function noVerdict(reasons: readonly Reason[], informationOnly = false): Judgement {
  const ordered = REASONS.filter((reason) => reasons.includes(reason));
  return { verdict: "no verdict", margin: null, probabilityWithin: null, notes: [], reasons: ordered, informationOnly };
}

export function judged({ value, unit, expandedUncertainty }: Corrected): NonNullable<CheckLine["asTrue"]> {
  return { value, unit, expandedUncertainty };
}

export function normalIn(subject: Subject, unit: Unit): { low?: number | null; high?: number | null } {
  const normal = parameterOf(subject.card, subject.reading.parameter)?.normal;
  if (!normal || !sameDimension(normal.unit, unit)) return {};
  const turn = (value: number | null) => (value === null ? null : convert(value, normal.unit, unit));
  return { low: turn(normal.low), high: turn(normal.high) };
}

/** The reasons in figures, for whatever the judgement names. */
export function whyOf(subject: Subject, judgement: Judgement, corrected: Corrected | null): string {
  const named = new Set<string>([...judgement.reasons, ...judgement.notes]);
  const parts = subject.withheld.filter(({ reason }) => named.has(reason)).map(({ why }) => why);
  if (named.has("not calibrated")) parts.push(subject.gauge.why);
  if (named.has("outside calibrated range") && corrected?.beyond) {
    const { calibration } = subject.gauge;
    const end = corrected.beyond === "high" ? calibration?.high : calibration?.low;
    if (calibration && end !== undefined) parts.push(`the table ends at ${end} ${unitSymbol(calibration.unit)} on the gauge`);
  }
  return [...new Set(parts)].filter((part) => part !== "").join("; ");
}

function figureFor(subject: Subject, limit: AppliedLimit): Figure | null {
  const { reading, gauge } = subject;
  switch (limit.statistic) {
    case "instant":
    case "sustained":
      if (speaksFor(reading, limit.side)) return levelFigure(subject, limit);
      // the card's table waits for a reading that can speak; the point's own limit names this one and must not go unsaid
      return limit.authority === null
        ? missing(`a ${reading.sampling} says nothing about a ${limit.side === "max" ? "maximum" : "minimum"}`)
        : null;
    case "rate":
      if (sameDimension(gauge.unit, limit.unit)) return speaksFor(reading, limit.side) ? levelFigure(subject, limit) : null;
      return reading.sampling === "series" ? fallFigure(subject, limit) : null;
    case "peak to peak":
      return reading.sampling === "series" ? swingFigure(subject, limit) : null;
    case "spread":
      return spreadFigure(subject, limit);
    case "change from baseline":
      return changeFigure(subject, limit);
  }
}

function corrects(subject: Subject, raw: Raw, limit: AppliedLimit): Corrected | null {
  return correct(raw.value, subject.gauge, limit.unit, limit.ownUncertainty, subject.reading.kind === "count");
}

function levelFigure(subject: Subject, limit: AppliedLimit): Figure {
  const raw = extremeOf(subject.reading, subject.entry, limit.side);
  return { onGauge: raw?.value ?? null, corrected: raw && corrects(subject, raw, limit), reasons: [], why: "" };
}

const missing = (why: string): Figure => ({ onGauge: null, corrected: null, reasons: ["no reading"], why });

/** Largest fall over any minute, on corrected values. Rows further apart than the window were not asked for this: no line. */
function fallFigure(subject: Subject, limit: AppliedLimit): Figure | null {
  const { entry, gauge } = subject;
  const unit = gauge.calibration?.unit ?? gauge.unit;
  const perMinute = rateUnitOf(unit);
  const series = entry && trueSeries(entry, gauge, unit);
  if (!entry || !series)
    return entry && entry.rows.length > 0 ? missing("the rows have no rising times inside the calibrated range") : missing("no rows");
  const sparse = series.some((sample, i) => i > 0 && sample.timeS - (series[i - 1]?.timeS ?? 0) > RATE_WINDOW_S);
  if (sparse || perMinute === null || !sameDimension(perMinute, limit.unit)) return null;
  if ((series.at(-1)?.timeS ?? 0) - (series[0]?.timeS ?? 0) < RATE_WINDOW_S) return missing("the rows span less than a minute");
  const slope = Math.max(...rawRows(entry).map((row) => correct(row.value, gauge, unit)?.slope ?? 1));
  const value = convert(largestFall(series, { windowS: RATE_WINDOW_S }).perMin, perMinute, limit.unit);
  const dial = convert(rateUncertainty({ readable: gauge.readable * slope, windowMin: RATE_WINDOW_S / 60 }), perMinute, limit.unit);
  return derived(subject, limit, value, dial, "largest fall in any 60 s");
}

function swingFigure(subject: Subject, limit: AppliedLimit): Figure {
  const series = subject.entry && trueSeries(subject.entry, subject.gauge, limit.unit);
  if (!series) return missing("no rows with rising times inside the calibrated range");
  const windowS = limit.forS > 0 ? limit.forS : SWING_WINDOW_S;
  return derived(subject, limit, peakToPeak(series, { windowS }), pairUncertainty(subject, limit), `peak to peak over ${clock(windowS)}`);
}

/**
 * Highest less lowest of the group: readings of the same parameter or group, each by its own gauge, or the rows of one reading. Said once,
 * on its first reading. A value that its gauge cannot vouch for leaves the spread without a reading.
 */
function spreadFigure(subject: Subject, limit: AppliedLimit): Figure | null {
  const { card, point, reading, said, entry, gauge, context } = subject;
  const group = parameterOf(card, reading.parameter)?.group ?? null;
  const alike = (other: Reading) =>
    other.parameter === reading.parameter || (group !== null && parameterOf(card, other.parameter)?.group === group);
  const members = point.readings.filter(
    (other) =>
      other.id === reading.id || (reading.parameter !== null && (other.kind === "number" || other.kind === "count") && alike(other)),
  );
  if (members[0]?.id !== reading.id) return null;
  const rows = members.length === 1 && reading.sampling === "series" && entry ? rawRows(entry) : null;
  const values = rows
    ? rows.map((row) => correct(row.value, gauge, limit.unit, null, reading.kind === "count"))
    : members.map((member) => {
        const theirs = said?.readings.find((candidate) => candidate.reading === member.id) ?? null;
        const raw = extremeOf(member, theirs, "max");
        return raw && correct(raw.value, gaugeOf(card, member, theirs, context), limit.unit, null, member.kind === "count");
      });
  const known = values.filter((value) => value !== null && value.beyond === null) as Corrected[];
  if (known.length < 2 || known.length < values.length)
    return missing(`${known.length} of ${Math.max(values.length, 2)} readings of the spread`);
  const spread = Math.max(...known.map(({ value }) => value)) - Math.min(...known.map(({ value }) => value));
  const us = known.map(({ expandedUncertainty }) => expandedUncertainty);
  const u = us.every((one) => one !== null) ? Math.SQRT2 * Math.max(...us) : null;
  const reasons = known.flatMap((one) => one.reasons);
  const figure = derived(subject, limit, spread, u, `spread of ${known.length}`);
  return { ...figure, reasons: [...new Set([...figure.reasons, ...reasons])] };
}

/** After less before, where both are rows of one reading; otherwise the caller must know the baseline. */
function changeFigure(subject: Subject, limit: AppliedLimit): Figure {
  const { entry, gauge, reading, context } = subject;
  const rows = entry && reading.sampling === "series" ? rawRows(entry) : [];
  const before = context.baselines?.[reading.id] ?? (rows.length >= 2 ? rows[0]?.value : undefined);
  const after = reading.sampling === "series" ? rows.at(-1) : extremeOf(reading, entry, "max");
  if (before === undefined) return missing("no baseline to compare with");
  const from = correct(before, gauge, limit.unit);
  const to = after ? correct(after.value, gauge, limit.unit) : null;
  if (!after || !from || !to || from.beyond !== null || to.beyond !== null) return missing("the change cannot be told");
  return {
    ...derived(subject, limit, Math.abs(to.value - from.value), pairUncertainty(subject, limit), "change from baseline"),
    onGauge: after.value,
  };
}

/** U of a difference of two readings of one gauge: √2 U, unless the limit states its own. */
function pairUncertainty({ gauge, reading }: Subject, limit: AppliedLimit): number | null {
  if (gauge.instrument === null) return reading.kind === "count" ? 0 : null;
  const u = gauge.calibration?.expandedUncertainty ?? null;
  return u === null || !gauge.calibration ? null : Math.SQRT2 * convertDifference(u, gauge.calibration.unit, limit.unit);
}

function derived(subject: Subject, limit: AppliedLimit, value: number, u: number | null, why: string): Figure {
  const expandedUncertainty = limit.ownUncertainty ?? u;
  const corrected: Corrected = {
    value,
    expandedUncertainty,
    unit: limit.unit,
    slope: 1,
    beyond: null,
    reasons: [...subject.gauge.reasons],
  };
  return { onGauge: null, corrected, reasons: [], why };
}

/**
 * A limit that may be passed for a while: the longest stretch beyond it counts, and a single reading cannot show one.
 * Of a "sustained" limit the reading itself is the value that was held that long.
 */
function allowTime(subject: Subject, limit: AppliedLimit, judgement: Judgement, u: number): { judgement: Judgement; why: string } {
  if (judgement.verdict !== "exceeded" && judgement.verdict !== "marginal") return { judgement, why: "" };
  const series = subject.entry && subject.reading.sampling === "series" ? trueSeries(subject.entry, subject.gauge, limit.unit) : null;
  if (!series) {
    if (judgement.verdict === "marginal") return { judgement, why: "" };
    if (limit.statistic === "sustained") return { judgement, why: `held ${clock(limit.forS)} or more` };
    return {
      judgement: noVerdict(["no reading"]),
      why: `past it; the reading alone cannot show for how long, ${clock(limit.forS)} allowed`,
    };
  }
  const guard = limit.side === "max" ? -u : u;
  const longest = (shift: number) => timeBeyond(series, { side: limit.side, limit: limit.value + shift }).longestS;
  const beyond = longest(0);
  const why = `beyond it for ${clock(beyond)} of ${clock(limit.forS)}`;
  const verdict = beyond > limit.forS + 1e-9 ? "exceeded" : longest(guard) > limit.forS + 1e-9 ? "marginal" : "within";
  const notes = verdict === "exceeded" ? judgement.notes : [];
  return { judgement: { ...judgement, verdict, margin: null, probabilityWithin: null, notes }, why };
}
