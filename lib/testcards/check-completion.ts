/** Did the point run as long as its rule asks? Answered for each reading, with the figures that say so. */
import { type CardDocument, type CardPoint, parameterOf, type Reading } from "./card";
import { correct, extremeOf, gaugeOf, momentOf, rawRows, speaksFor, trueSeries } from "./check-gauge";
import { clock } from "./check-limits";
import { PAST_PEAK_S, STABILISED_PER_MIN, slopeOf, windowToResolve } from "./cooling";
import type { CheckContext, PointDebrief, ReadingEntry } from "./debrief-types";
import { convertDifference, sameDimension } from "./units";
import type { Reason } from "./words";

/** `reason` null: the rule was met. */
export type Completion = { reason: Reason | null; why: string };

const SHORTEST_WINDOW_S = 120;
const WIDEST_GAP_S = 120; // team's own rule: rows further apart cannot show that a temperature stood still between them
const ROUNDING_S = 1e-6;

export function completionOf(
  card: CardDocument,
  point: CardPoint,
  said: PointDebrief | null,
  context: CheckContext,
): { point: Completion; of: (reading: Reading) => Completion } {
  const { rule } = point.completion;
  if (rule === "none") {
    const free: Completion = { reason: "stopped early", why: "the point has no completion rule" };
    return { point: { reason: null, why: free.why }, of: () => free };
  }
  if (rule === "stabilised") return stabilised(card, point, said, context);

  const each = new Map(point.readings.map((reading) => [reading.id, ranLongEnough(card, point, said, reading)]));
  const asked = point.readings.filter((reading) => isHot(card, reading)).flatMap((reading) => each.get(reading.id) ?? []);
  return { point: gravest(asked.length > 0 ? asked : [...each.values()]), of: (reading) => each.get(reading.id) ?? gravest(asked) };
}

function isHot(card: CardDocument, reading: Reading): boolean {
  return (parameterOf(card, reading.parameter)?.hotDayRule ?? "none") !== "none" && speaksFor(reading, "max");
}

function gravest(completions: readonly Completion[]): Completion {
  return completions.find(({ reason }) => reason !== null) ?? completions[0] ?? { reason: null, why: "" };
}

function entryOf(said: PointDebrief | null, reading: string): ReadingEntry | null {
  return said?.readings.find((entry) => entry.reading === reading) ?? null;
}

/** Asked of the parameters that must be steady, from their rows; every other reading follows the worst of them. */
function stabilised(card: CardDocument, point: CardPoint, said: PointDebrief | null, context: CheckContext) {
  const steady = new Map<string, Completion>();
  for (const reading of point.readings) {
    const parameter = parameterOf(card, reading.parameter);
    if (!parameter?.stabilises) continue;
    const found = steadyNow(card, reading, entryOf(said, reading.id), context);
    const known = steady.get(parameter.code);
    if (!known || known.reason !== null) steady.set(parameter.code, found); // one steady gauge speaks for its parameter
  }
  const all = [...steady.values()];
  const none: Completion = { reason: "not stabilised", why: "no temperature that must be steady was recorded" };
  const why = all.map((one) => one.why).join(", ");
  const worst = all.length === 0 ? none : all.some(({ reason }) => reason !== null) ? gravest(all) : { reason: null, why };
  return { point: worst, of: (reading: Reading) => steady.get(reading.parameter ?? "") ?? worst };
}

/** [CFR-25.1045] (a): less than 2 °F a minute, and the slope itself known to half of that (team's own rule). */
function steadyNow(card: CardDocument, reading: Reading, entry: ReadingEntry | null, context: CheckContext): Completion {
  const name = parameterOf(card, reading.parameter)?.shortName ?? reading.label;
  const not = (why: string): Completion => ({ reason: "not stabilised", why: `${name} ${why}` });
  if (reading.sampling !== "series" || !entry || entry.rows.length === 0) return not("has no rows to show that it was steady");
  const gauge = gaugeOf(card, reading, entry, context);
  if (!sameDimension(gauge.unit, "K")) return not("is no temperature");
  const timed = trueSeries(entry, gauge, "K");
  if (!timed) return not("has no rows with rising times inside the calibrated range");
  const series = sinceGap(timed);
  const slope = correct(rawRows(entry).at(-1)?.value ?? 0, gauge, "K")?.slope ?? 1;
  const readableTrue = convertDifference(gauge.readable, gauge.unit, "K") * slope;
  const window = windowToResolve({ readableTrue });
  const spanS = (series.at(-1)?.timeS ?? 0) - (series[0]?.timeS ?? 0);
  const found = slopeOf(series, { windowS: Math.max(SHORTEST_WINDOW_S, Math.min(window, spanS)), readingUncertainty: readableTrue });
  if (!found) return not(`has rows over ${clock(spanS)} of ${clock(window)}`);
  const known = found.expandedUncertaintyPerMin;
  const half = STABILISED_PER_MIN / 2;
  if (Math.abs(found.perMin) >= STABILISED_PER_MIN)
    return not(`changing ${oneDecimal(found.perMin)} of ${STABILISED_PER_MIN.toFixed(2)} °C/min`);
  if (known >= half) return not(`slope known to ${known.toFixed(2)} of ${half.toFixed(3)} °C/min`);
  return { reason: null, why: `${name} ${oneDecimal(found.perMin)} ±${known.toFixed(2)} °C/min` };
}

/** The rows after the last gap too wide to be trusted. */
function sinceGap<T extends { timeS: number }>(series: T[]): T[] {
  const after = series.findLastIndex((sample, i) => i > 0 && sample.timeS - (series[i - 1]?.timeS ?? 0) > WIDEST_GAP_S);
  return after < 0 ? series : series.slice(after);
}

/** One decimal with a real minus sign; nothing is minus nought. */
export function oneDecimal(value: number): string {
  const text = Math.abs(value).toFixed(1);
  return value < 0 && Number(text) !== 0 ? `−${text}` : text;
}

function ranLongEnough(card: CardDocument, point: CardPoint, said: PointDebrief | null, reading: Reading): Completion {
  const entry = entryOf(said, reading.id);
  const raw = extremeOf(reading, entry, "max");
  const lastS = entry && reading.sampling === "series" ? (rawRows(entry).at(-1)?.atS ?? null) : null;
  const ranS = said?.ranForS ?? lastS;
  const peakS = raw?.atS ?? momentOf(said?.readings ?? [], entry)?.atS ?? null;
  const { rule, runS, pastPeakS } = point.completion;
  if (rule === "5 min past peak") {
    const height = heightHeld(card, point, said);
    const ran = past(ranS, peakS, PAST_PEAK_S);
    const short = [ran, height].filter(({ reason }) => reason !== null);
    return short.length > 0 ? { reason: "stopped early", why: short.map(({ why }) => why).join("; ") } : ran;
  }
  if (pastPeakS !== null) {
    const logged = past(ranS, peakS, pastPeakS);
    if (logged.reason !== null || runS === null) return logged;
  }
  const written = runS ?? stepsS(point) ?? point.durationMin * 60;
  if (ranS === null) return { reason: "stopped early", why: `time run not given, ${clock(written)} asked` };
  return { reason: ranS >= written - ROUNDING_S ? null : "stopped early", why: `ran ${clock(ranS)} of ${clock(written)}` };
}

function past(ranS: number | null, peakS: number | null, askedS: number): Completion {
  if (peakS === null) return { reason: "stopped early", why: "time of the highest value not given" };
  if (ranS === null) return { reason: "stopped early", why: `time run not given, ${clock(askedS)} past the highest asked` };
  const gone = Math.max(ranS - peakS, 0);
  return { reason: gone >= askedS - ROUNDING_S ? null : "stopped early", why: `ran ${clock(gone)} of ${clock(askedS)} past the highest` };
}

/** [CFR-23.1043] (a)(4): a turbocharged engine is run through the part of the climb for which the turbocharger is used. */
function heightHeld(card: CardDocument, point: CardPoint, said: PointDebrief | null): Completion {
  const critical = card.programme.aircraft.criticalAltitudeFt;
  if (point.place === "ground" || critical === null) return { reason: null, why: "" };
  const top = said?.topAltitudeFt ?? null;
  if (top === null) return { reason: "stopped early", why: "top altitude not given" };
  return { reason: top >= critical - 1e-6 ? null : "stopped early", why: `reached ${top} of ${critical} ft` };
}

function stepsS(point: CardPoint): number | null {
  const total = point.steps.reduce((sum, step) => sum + (step.durationS ?? 0), 0);
  return total > 0 ? total : null;
}
