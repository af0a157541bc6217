/** Comparison (i): the gauge against the number to abort at. It says whether a call was due; a call is never questioned. */
import { type AbortNumber, abortsOf, type CardDocument, type CardPoint, instrumentOf, parameterOf, type Reading } from "./card";
import { converted, extremeOf, isUsable, rawRows, speaksFor } from "./check-gauge";
import { clock } from "./check-limits";
import type { AbortCall, CheckLine, Debrief, DisciplineLine, PointDebrief, ReadingEntry } from "./debrief-types";
import { abortDiscipline, largestFall } from "./verdict";

const ROUNDING = 1e-9;

export function abortReport(
  card: CardDocument,
  point: CardPoint,
  said: PointDebrief | null,
  debrief: Debrief,
): { disciplines: DisciplineLine[]; lines: CheckLine[] } {
  const numbers = abortsOf(card.programme, point).filter((line) => line.kind === "number");
  const calls = debrief.safety.calls.filter((call) => call.point === point.id);
  const found = numbers.map((line) => {
    const named = calls.filter((call) => isFor(card, call, line));
    const read = point.readings.flatMap((reading) => {
      const value = watches(reading, line) ? worstRead(card, line, reading, entryOf(said, reading)) : null;
      return value === null ? [] : [{ reading, value }];
    });
    const told = named.flatMap(({ onGauge }) => (onGauge !== null && isUsable(onGauge) && !line.perMinute ? [onGauge] : []));
    const worstOnGauge = worstOf(line, [...read.map(({ value }) => value), ...told]);
    return { line, named: named.length > 0, read, worstOnGauge, reached: worstOnGauge !== null && isReached(line, worstOnGauge) };
  });
  const disciplines: DisciplineLine[] = [];
  const lines: CheckLine[] = [];
  for (const { line, named, read, worstOnGauge, reached } of found) {
    // one call names a parameter, not a side: it belongs to the line that was reached, where one was
    const elsewhere = !reached && found.some((other) => other.line.parameter === line.parameter && other.reached);
    const { parameter, side, instrument, onGauge: threshold } = line;
    const discipline = abortDiscipline({ worstOnGauge, threshold, side, calledForThis: named && !elsewhere });
    const unit = instrumentOf(card, instrument)?.unit ?? parameterOf(card, parameter)?.unit ?? "1";
    disciplines.push({ point: point.id, parameter, side, instrument, worstOnGauge, thresholdOnGauge: threshold, unit, discipline });
    for (const { reading, value } of read) lines.push(abortLine(point, reading, line, value, unit, discipline));
  }
  return { disciplines, lines };
}

function entryOf(said: PointDebrief | null, reading: Reading): ReadingEntry | null {
  return said?.readings.find((entry) => entry.reading === reading.id) ?? null;
}

function isFor(card: CardDocument, call: AbortCall, line: AbortNumber): boolean {
  const parameter = parameterOf(card, line.parameter);
  const trigger = call.trigger.trim().toLowerCase();
  return [line.parameter, parameter?.name, parameter?.shortName].some((name) => name?.toLowerCase() === trigger);
}

/** The number counts on the instrument it is printed for, and while its condition holds. */
function watches(reading: Reading, line: AbortNumber): boolean {
  if (reading.kind !== "number" && reading.kind !== "count") return false;
  const inForce = line.appliesWhen === "always" || reading.conditions.includes(line.appliesWhen);
  const shows = line.perMinute ? reading.sampling === "series" : speaksFor(reading, line.side);
  return reading.parameter === line.parameter && reading.instrument === line.instrument && inForce && shows;
}

function worstRead(card: CardDocument, line: AbortNumber, reading: Reading, entry: ReadingEntry | null): number | null {
  const unit = instrumentOf(card, reading.instrument)?.unit;
  if (line.perMinute) return entry && fallOnGauge(entry, line.windowS ?? 60);
  const raw = extremeOf(reading, entry, line.side);
  return raw && (entry?.unit && unit ? converted(raw.value, entry.unit, unit) : raw.value);
}

/** Largest fall on the gauge over the window, raw; null where the rows are too few or too far apart to show it. */
function fallOnGauge(entry: ReadingEntry, windowS: number): number | null {
  const series = rawRows(entry).flatMap(({ atS, value }) => (atS === null || !isUsable(atS) ? [] : [{ timeS: atS, value }]));
  const gaps = series.slice(1).map((sample, i) => sample.timeS - (series[i]?.timeS ?? 0));
  const spanS = gaps.reduce((sum, gap) => sum + gap, 0);
  if (series.length < 2 || windowS <= 0 || spanS < windowS || gaps.some((gap) => gap <= 0 || gap > windowS)) return null;
  return (largestFall(series, { windowS }).perMin * windowS) / 60;
}

function worstOf(line: AbortNumber, values: number[]): number | null {
  if (values.length === 0) return null;
  return line.side === "max" ? Math.max(...values) : Math.min(...values);
}

function isReached(line: AbortNumber, value: number): boolean {
  return line.side === "max" ? value >= line.onGauge - ROUNDING : value <= line.onGauge + ROUNDING;
}

function abortLine(
  point: CardPoint,
  reading: Reading,
  line: AbortNumber,
  value: number,
  unit: DisciplineLine["unit"],
  discipline: DisciplineLine["discipline"],
): CheckLine {
  const { side, appliesWhen, onGauge: threshold, id } = line;
  return {
    point: point.id,
    reading: reading.id,
    parameter: reading.parameter,
    comparison: "abort",
    statistic: line.perMinute ? "rate" : "instant",
    onGauge: { value, unit },
    asTrue: null,
    hotDay: null,
    limit: { id, side, value: threshold, unit, source: "abort line of the card, on the gauge", authority: null, appliesWhen, forS: 0 },
    verdict: isReached(line, value) ? "exceeded" : "within",
    margin: side === "max" ? threshold - value : value - threshold,
    probabilityWithin: null,
    notes: [],
    reasons: [],
    informationOnly: false,
    required: false,
    why: line.perMinute ? `change on the gauge in ${clock(line.windowS ?? 60)}` : "",
    otherBasis: null,
    discipline,
  };
}
