/**
 * What the phone asks about one card, as one list. The form draws it, the schema is made of it and the server checks against it,
 * so that no two of them can disagree. A key is the path of its value in the debrief: "times.takeOff", "<point>.outcome",
 * "<point>.<reading>.value", "<point>.<reading>.atS".
 */
import { gaugeLimit } from "./calibration";
import { type CardDocument, type CardPoint, type Instrument, instrumentOf, parameterOf, type Reading } from "./card";
import type { DebriefField, DebriefTimes, FieldPart, ReadingEntry } from "./debrief-types";
import { convert, sameDimension } from "./units";
import { OUTCOMES, type Side, type SortieKind } from "./words";

/** The one parameter code the core must know: the hot-day rule needs the outside air temperature and its gauge. */
export const OUTSIDE_AIR = "oat";
/** The altimeter, where a programme lists it. */
export const PRESSURE_ALTITUDE = "altitude";

const LONGEST_S = 3 * 3600; // team's own rule: no point runs longer
export const COMMENT_LENGTH = 500;

export const TIMES_OF: Record<SortieKind, { key: keyof DebriefTimes; label: string }[]> = {
  flight: [
    { key: "offBlocks", label: "Off blocks" },
    { key: "takeOff", label: "Take-off" },
    { key: "landing", label: "Landing" },
    { key: "onBlocks", label: "On blocks" },
  ],
  taxi: [
    { key: "offBlocks", label: "Off blocks" },
    { key: "onBlocks", label: "On blocks" },
  ],
  "ground run": [
    { key: "engineStart", label: "Engine start" },
    { key: "engineStop", label: "Engine stop" },
  ],
  inspection: [
    { key: "start", label: "Start" },
    { key: "end", label: "End" },
  ],
};

type Draft = Pick<DebriefField, "key" | "section" | "part" | "label" | "kind"> & Partial<DebriefField>;

function field(draft: Draft): DebriefField {
  return {
    point: null,
    reading: null,
    unit: null,
    low: null,
    high: null,
    step: null,
    expected: null,
    choices: [],
    rows: [],
    required: false,
    recordedBy: "pilot",
    ...draft,
  };
}

/** `kind` is the sortie's; it decides which times are asked. A ground run is never asked for a take-off. */
export function debriefModel(card: CardDocument, kind: SortieKind = card.content.kind): DebriefField[] {
  return [...flightFields(card, kind), ...safetyFields(), ...card.content.points.flatMap((point) => pointFields(card, point))];
}

/** The gauge that outside air is read on: the point's own, else one on the panel, else any. */
export function outsideAirGauge(card: CardDocument, point: CardPoint | null): Instrument | undefined {
  const own = point?.readings.find((reading) => reading.parameter?.toLowerCase() === OUTSIDE_AIR && reading.instrument !== null);
  const gauges = card.programme.instruments.filter((instrument) => instrument.parameter.toLowerCase() === OUTSIDE_AIR);
  return instrumentOf(card, own?.instrument ?? null) ?? gauges.find((gauge) => gauge.shownOn === "panel") ?? gauges[0];
}

function flightFields(card: CardDocument, kind: SortieKind): DebriefField[] {
  const { identity, programme } = card;
  const flight = (draft: Omit<Draft, "section">) => field({ section: "flight", ...draft });
  const oat = outsideAirGauge(card, null);
  const oatUnit = oat?.unit ?? "degC";
  const fuel = (key: string, label: string) =>
    flight({
      key: `fuel.${key}`,
      part: "fuel",
      label,
      kind: "number",
      unit: "L",
      low: 0,
      high: programme.aircraft.fuelCapacityL,
      step: 0.5,
    });
  return [
    flight({
      key: `revisionsFlown.${identity.id}`,
      part: "revision",
      label: `Revision flown, card ${identity.number}`,
      kind: "choice",
      choices: [identity.letter, "other"],
    }),
    ...TIMES_OF[kind].map(({ key, label }) => flight({ key: `times.${key}`, part: "time", label: `${label}, UTC`, kind: "time of day" })),
    fuel("start", "Fuel at start"),
    fuel("end", "Fuel at end"),
    fuel("uplift", "Fuel uplift"),
    flight({
      key: "weather.oat",
      part: "weather",
      label: "Outside air",
      kind: "number",
      unit: oatUnit,
      low: Math.ceil(convert(-30, "degC", oatUnit)),
      high: Math.floor(convert(50, "degC", oatUnit)),
      step: oat?.readable ?? 1,
    }),
    flight({ key: "weather.qnh", part: "weather", label: "QNH", kind: "number", unit: "hPa", low: 940, high: 1050, step: 1 }),
    flight({ key: "weather.windFromDeg", part: "weather", label: "Wind from", kind: "number", unit: "deg", low: 0, high: 360, step: 10 }),
    flight({ key: "weather.windKt", part: "weather", label: "Wind", kind: "number", unit: "kt", low: 0, high: 40, step: 1 }),
    flight({
      key: "weather.turbulence",
      part: "weather",
      label: "Turbulence",
      kind: "choice",
      choices: ["none", "light", "moderate", "severe"],
    }),
  ];
}

function safetyFields(): DebriefField[] {
  const ask = (key: string, label: string) =>
    field({ key: `safety.${key}`, section: "safety", part: "safety", label, kind: "yes-no", choices: ["yes", "no"], required: true });
  return [
    ask("limitExceeded", "Was any limit exceeded?"),
    ask("callMade", "Was abort or knock it off called?"),
    ask("rough", "Any roughness, smell, leak, light, or lever that would not move?"),
  ];
}

function pointFields(card: CardDocument, point: CardPoint): DebriefField[] {
  const of = (draft: Omit<Draft, "section" | "point">) => field({ section: "point", point: point.id, ...draft });
  const positions = point.positions.map(({ control }) => {
    const known = card.programme.controls.find((candidate) => candidate.name === control)?.positions ?? [];
    const names = known.filter((position) => point.place === "ground" || !position.groundOnly).map((position) => position.name);
    return of({
      key: `${point.id}.positions.${control}`,
      part: "position",
      label: `${control} as flown`,
      kind: "choice",
      choices: [...names, "other"],
    });
  });
  const { rule } = point.completion;
  const timed = rule === "5 min past peak" || rule === "whole run";
  const height = heightRange(card);
  return [
    of({ key: `${point.id}.outcome`, part: "outcome", label: "Outcome", kind: "choice", choices: [...OUTCOMES], required: true }),
    ...positions,
    of({ key: `${point.id}.onCondition`, part: "on condition", label: "On condition", kind: "yes-no", choices: ["yes", "no"] }),
    ...(timed
      ? [of({ key: `${point.id}.ranForS`, part: "ran for", label: "Ran for", kind: "duration", unit: "s", low: 0, high: LONGEST_S })]
      : []),
    ...(rule === "5 min past peak" && point.place === "air"
      ? [of({ key: `${point.id}.topAltitudeFt`, part: "top altitude", label: "Top altitude", kind: "number", unit: "ft", ...height })]
      : []),
    ...point.readings.flatMap((reading) => readingFields(card, point, reading)),
    of({ key: `${point.id}.comment`, part: "comment", label: "Comment", kind: "text", high: COMMENT_LENGTH }),
  ];
}

function readingFields(card: CardDocument, point: CardPoint, reading: Reading): DebriefField[] {
  const instrument = instrumentOf(card, reading.instrument);
  const of = (property: keyof ReadingEntry, part: FieldPart, draft: Partial<DebriefField>) =>
    field({
      key: `${point.id}.${reading.id}.${property}`,
      section: "point",
      point: point.id,
      reading: reading.id,
      part,
      label: reading.label,
      kind: "number",
      recordedBy: reading.recordedBy,
      ...draft,
    });
  if (reading.kind !== "number" && reading.kind !== "count") {
    const choices = reading.kind === "yes-no" ? ["yes", "no"] : reading.choices;
    return [of("answer", "answer", { kind: reading.kind, choices, high: reading.kind === "text" ? COMMENT_LENGTH : null })];
  }
  const number = {
    kind: reading.kind,
    unit: instrument?.unit ?? reading.unit,
    low: instrument?.low ?? reading.low ?? (reading.kind === "count" ? 0 : null),
    high: instrument?.high ?? reading.high,
    step: instrument?.readable ?? (reading.kind === "count" ? 1 : null),
    expected: expectedOnGauge(reading, instrument),
  };
  const { sampling } = reading;
  const moment = momentFields(card, point, reading, of);
  if (sampling === "series") return [of("rows", "rows", { ...number, kind: "series", rows: plannedRows(point) }), ...moment];
  const value = of("value", sampling === "single" ? "value" : sampling === "lowest" ? "lowest" : "highest", number);
  const lowest = sampling === "lowest and highest" ? [of("lowest", "lowest", { ...number, label: `${reading.label}, lowest` })] : [];
  return [...lowest, value, ...moment];
}

/** When, how high and in what air a maximum was read: what the hot-day rule and "5 min past peak" need. Rows tell when by themselves. */
function momentFields(
  card: CardDocument,
  point: CardPoint,
  reading: Reading,
  of: (property: keyof ReadingEntry, part: FieldPart, draft: Partial<DebriefField>) => DebriefField,
): DebriefField[] {
  const parameter = parameterOf(card, reading.parameter);
  if (!parameter || parameter.hotDayRule === "none" || reading.sampling === "lowest") return [];
  const highest = reading.sampling === "highest" || reading.sampling === "lowest and highest";
  const timed = reading.sampling === "series" && plannedRows(point).every((row) => row.atS !== null);
  const gauge = outsideAirGauge(card, point);
  const moment = (what: string) => `${reading.label}: ${what}`;
  const at = of("atS", "at", { label: moment("when"), kind: "duration", unit: "s", low: 0, high: LONGEST_S });
  const altitude = of("altitudeFt", "altitude", { label: moment("pressure altitude then"), unit: "ft", ...heightRange(card) });
  const oat = of("oat", "oat", {
    label: moment("outside air then"),
    unit: gauge?.unit ?? "degC",
    low: gauge?.low ?? -30,
    high: gauge?.high ?? 50,
    step: gauge?.readable ?? 1,
  });
  return [
    ...(highest || (!timed && point.completion.rule === "5 min past peak") ? [at] : []),
    ...(point.place === "air" ? [altitude] : []),
    ...(highest || point.place === "air" ? [oat] : []),
  ];
}

function heightRange(card: CardDocument): { low: number; high: number; step: number } {
  const altimeter = card.programme.instruments.find((instrument) => instrument.parameter.toLowerCase() === PRESSURE_ALTITUDE);
  return altimeter ? { low: altimeter.low, high: altimeter.high, step: altimeter.readable } : { low: -200, high: 13_000, step: 10 };
}

/** The expected band as the pilot reads it: true turned to the gauge, then inward to marks that can be read. */
function expectedOnGauge(reading: Reading, instrument: Instrument | undefined): DebriefField["expected"] {
  const band = reading.expected;
  if (!band) return null;
  if (!instrument) {
    const { unit } = reading;
    const turn = (value: number | null) => (value === null || unit === null ? value : convert(value, band.unit, unit));
    return unit !== null && !sameDimension(unit, band.unit) ? null : { low: turn(band.low), high: turn(band.high) };
  }
  const { calibration, readable, unit } = instrument;
  if (!calibration || !sameDimension(band.unit, unit)) return null;
  const mark = (value: number | null, side: Side) => {
    if (value === null) return null;
    const turned = gaugeLimit({ limit: convert(value, band.unit, unit), side, calibration, readable });
    return turned.inRange ? turned.printed : null;
  };
  const low = mark(band.low, "min");
  const high = mark(band.high, "max");
  return low === null && high === null ? null : { low, high };
}

function plannedRows(point: CardPoint): DebriefField["rows"] {
  const byTime = point.grid?.by === "time";
  return (point.grid?.rows ?? []).map((label) => ({ label, atS: byTime ? secondsOf(label) : null }));
}

/** Seconds of a row's label: "0:30" is minutes and seconds, a bare number is minutes. Null where it is neither. */
export function secondsOf(label: string): number | null {
  const clock = /^\+?(\d{1,3}):([0-5]\d)$/.exec(label.trim());
  if (clock) return Number(clock[1]) * 60 + Number(clock[2]);
  const minutes = /^\+?(\d{1,3}(?:\.\d+)?)(?:\s*min)?$/.exec(label.trim());
  return minutes ? Math.round(Number(minutes[1]) * 60) : null;
}

/** True where the form asks once "as read?". It never refuses: what was read may always be entered. */
export function askAsRead(asked: DebriefField, value: number): boolean {
  const { low, high } = asked.expected ?? { low: null, high: null };
  return (low !== null && value < low - 1e-9) || (high !== null && value > high + 1e-9);
}
