/** What a debrief may not say. Impossible entries are refused beside their field; whatever merely surprises is kept and found later. */
import type { CardDocument } from "./card";
import { COMMENT_LENGTH, debriefModel, TIMES_OF } from "./debrief";
import type { Debrief, DebriefField, FieldError, PointDebrief, ReadingEntry } from "./debrief-types";
import { withUnit } from "./unit-symbols";
import { convert, sameDimension, type Unit } from "./units";

export type ValidateOptions = { complete?: boolean };

/** Longest plausible stretch between two times, in minutes: airborne three hours; an inspection may take a working day. */
const LONGEST_MIN = { running: 180, inspection: 720 };
const FUEL_UNITS: readonly Unit[] = ["L", "USgal", "impgal", "kg"];
const QNH_INHG = { low: 27.8, high: 31 };

export function validateDebrief(card: CardDocument, debrief: Debrief, options: ValidateOptions = {}): FieldError[] {
  const fields = new Map(debriefModel(card, debrief.kind).map((field) => [field.key, field]));
  return [
    ...timeErrors(debrief),
    ...fuelErrors(card, debrief),
    ...weatherErrors(debrief, fields),
    ...textErrors("comment", debrief.comment),
    ...textErrors("safety.note", debrief.safety.note),
    ...debrief.squawks.flatMap((squawk) => textErrors(`squawks.${squawk.id}.text`, squawk.text)),
    ...(options.complete ? safetyErrors(debrief) : []),
    ...card.content.points.flatMap((point) => {
      const said = debrief.points.find((candidate) => candidate.point === point.id);
      return pointErrors(point.id, said, fields, options.complete === true);
    }),
  ];
}

function timeErrors({ kind, times }: Debrief): FieldError[] {
  const errors: FieldError[] = [];
  let before: { label: string; text: string; minutes: number } | null = null;
  for (const { key, label } of TIMES_OF[kind]) {
    const text = times[key];
    if (text === null || text === "") continue;
    const minutes = minutesOf(text);
    if (minutes === null) {
      errors.push({ key: `times.${key}`, message: `${label}: write the time as hh:mm, UTC, 00:00 to 23:59.` });
      continue;
    }
    const longest = kind === "inspection" ? LONGEST_MIN.inspection : LONGEST_MIN.running;
    const gap: number = before === null ? 0 : (minutes - before.minutes + 1440) % 1440; // midnight may lie between
    if (before !== null && gap > longest) {
      const wrong = gap > 720 ? "is before" : `is more than ${longest / 60} hours after`;
      errors.push({ key: `times.${key}`, message: `${label} ${text} ${wrong} ${before.label.toLowerCase()} ${before.text}: check both.` });
    }
    before = { label, text, minutes };
  }
  return errors;
}

/** Minutes of the day of "hh:mm", or null. */
export function minutesOf(text: string): number | null {
  const match = /^([01]\d|2[0-3]):([0-5]\d)$/.exec(text);
  return match ? Number(match[1]) * 60 + Number(match[2]) : null;
}

/** Minutes from one time of day to the next, over midnight where it must; null while one is missing. */
export function minutesBetween(from: string | null, to: string | null): number | null {
  const start = from === null ? null : minutesOf(from);
  const end = to === null ? null : minutesOf(to);
  return start === null || end === null ? null : (end - start + 1440) % 1440;
}

function fuelErrors(card: CardDocument, { fuel }: Debrief): FieldError[] {
  const { fuelCapacityL, fuelDensityKgPerL } = card.programme.aircraft;
  const labels = { start: "Fuel at start", end: "Fuel at end", uplift: "Fuel uplift" } as const;
  const litres = (value: number, unit: Unit) => (unit === "kg" ? value / fuelDensityKgPerL : convert(value, unit, "L"));
  const errors = (["start", "end", "uplift"] as const).flatMap((which) => {
    const quantity = fuel[which];
    const key = `fuel.${which}`;
    if (quantity === null) return [];
    if (!FUEL_UNITS.includes(quantity.unit)) return [{ key, message: `${labels[which]}: choose L, US gal, imp gal or kg.` }];
    if (!Number.isFinite(quantity.value)) return [{ key, message: `${labels[which]}: enter a number.` }];
    const volume = litres(quantity.value, quantity.unit);
    const fits = volume >= 0 && volume <= fuelCapacityL + 1e-6;
    return fits ? [] : [{ key, message: `${labels[which]}: the tanks hold 0 to ${fuelCapacityL} L. Check the number and its unit.` }];
  });
  const { start, end, uplift } = fuel;
  if (errors.length === 0 && start && end && !uplift && litres(end.value, end.unit) > litres(start.value, start.unit) + 1e-6)
    errors.push({ key: "fuel.end", message: "Fuel at end is more than fuel at start: check both, or enter the uplift." });
  return errors;
}

function weatherErrors({ weather }: Debrief, fields: Map<string, DebriefField>): FieldError[] {
  const errors: FieldError[] = [];
  const check = (key: string, value: number | null, unit: Unit | null) => {
    const field = fields.get(key);
    if (field && value !== null) errors.push(...rangeErrors(field, value, unit));
  };
  check("weather.oat", weather.oat?.value ?? null, weather.oat?.unit ?? null);
  if (weather.qnh?.unit === "inHg") {
    const { low, high } = QNH_INHG;
    if (!(weather.qnh.value >= low && weather.qnh.value <= high))
      errors.push({ key: "weather.qnh", message: `QNH: enter ${low} to ${high} inHg, or change the unit to hPa.` });
  } else check("weather.qnh", weather.qnh?.value ?? null, weather.qnh?.unit ?? null);
  check("weather.windFromDeg", weather.windFromDeg, null);
  check("weather.windKt", weather.windKt, null);
  return errors;
}

const SAFETY_QUESTIONS = {
  limitExceeded: "was any limit exceeded",
  callMade: "was abort or knock it off called",
  rough: "was there any roughness, smell, leak, light or stuck lever",
} as const;

function safetyErrors({ safety }: Debrief): FieldError[] {
  const open = (["limitExceeded", "callMade", "rough"] as const).flatMap((key) =>
    safety[key] === null ? [{ key: `safety.${key}`, message: `Answer yes or no: ${SAFETY_QUESTIONS[key]}?` }] : [],
  );
  const unlike = safety.callMade === false && safety.calls.length > 0;
  const unsaid = safety.callMade === true && safety.calls.some(({ word, point }) => word === null || point === "");
  return [
    ...open,
    ...(unlike ? [{ key: "safety.callMade", message: "No call was made, but one is written down: answer yes, or take it off." }] : []),
    ...(unsaid ? [{ key: "safety.callMade", message: "Say of each call in which point it came and which word was used." }] : []),
  ];
}

function pointErrors(point: string, said: PointDebrief | undefined, fields: Map<string, DebriefField>, complete: boolean): FieldError[] {
  const errors: FieldError[] = [];
  if (complete && !said?.outcome)
    errors.push({ key: `${point}.outcome`, message: "Say how the point ended: flown, part, aborted or skipped." });
  if (!said) return errors;
  const check = (key: string, value: number | null, unit: Unit | null = null) => {
    const field = fields.get(key);
    if (field && value !== null) errors.push(...rangeErrors(field, value, unit));
  };
  check(`${point}.ranForS`, said.ranForS);
  check(`${point}.topAltitudeFt`, said.topAltitudeFt);
  errors.push(...textErrors(`${point}.comment`, said.comment));
  for (const entry of said.readings) errors.push(...entryErrors(point, said, entry, fields));
  return errors;
}

function entryErrors(point: string, said: PointDebrief, entry: ReadingEntry, fields: Map<string, DebriefField>): FieldError[] {
  const errors: FieldError[] = [];
  const path = (property: keyof ReadingEntry) => `${point}.${entry.reading}.${property}`;
  for (const property of ["value", "lowest", "atS", "altitudeFt", "oat"] as const) {
    const value = entry[property];
    const field = fields.get(path(property));
    const changed = property === "value" || property === "lowest" ? entry.unit : null;
    if (field && value !== null) errors.push(...rangeErrors(field, value, changed));
  }
  if (entry.lowest !== null && entry.value !== null && entry.lowest > entry.value)
    errors.push({ key: path("lowest"), message: "The lowest is above the highest: check both." });
  if (entry.atS !== null && said.ranForS !== null && entry.atS > said.ranForS)
    errors.push({ key: path("atS"), message: "This moment lies after the point had ended: check it and the time run." });
  if (entry.sameMomentAs !== null && !said.readings.some(({ reading }) => reading === entry.sameMomentAs && reading !== entry.reading))
    errors.push({
      key: path("atS"),
      message: "The reading that shares this moment is not on this point: choose another, or give the time.",
    });
  if (entry.answer !== null) {
    const asked = fields.get(path("answer"));
    if (asked && asked.choices.length > 0 && !asked.choices.includes(entry.answer))
      errors.push({ key: path("answer"), message: `Choose one of: ${asked.choices.join(", ")}.` });
    errors.push(...textErrors(path("answer"), entry.answer));
  }
  return [...errors, ...rowErrors(path("rows"), entry, fields)];
}

function rowErrors(key: string, { rows, unit }: ReadingEntry, fields: Map<string, DebriefField>): FieldError[] {
  const field = fields.get(key);
  if (!field) return [];
  const errors = rows.flatMap((row) =>
    rangeErrors(field, row.value, unit).map((error) => ({ key, message: `Row ${row.label}. ${error.message}` })),
  );
  const times = rows.map((row) => row.atS).filter((atS) => atS !== null);
  const falling = times.findIndex((atS, index) => !Number.isFinite(atS) || (index > 0 && atS <= (times[index - 1] ?? 0)));
  if (falling >= 0) errors.push({ key, message: "The times of the rows must rise: check them." });
  return errors;
}

/** Refuses what cannot be. With "gauge changed" the range is the old gauge's, turned into the new unit. */
function rangeErrors(field: DebriefField, value: number, unit: Unit | null): FieldError[] {
  const { key, label } = field;
  if (!Number.isFinite(value)) return [{ key, message: `${label}: enter a number.` }];
  if ((field.kind === "count" || field.unit === "s") && !Number.isInteger(value))
    return [{ key, message: `${label}: enter a whole number.` }];
  const turn = (bound: number | null) =>
    bound === null || unit === null || field.unit === null ? bound : convert(bound, field.unit, unit);
  if (unit !== null && field.unit !== null && !sameDimension(unit, field.unit))
    return [{ key, message: `${label}: this unit does not fit. Use the unit on the gauge.` }];
  const low = turn(field.low);
  const high = turn(field.high);
  if ((low === null || value >= low - 1e-9) && (high === null || value <= high + 1e-9)) return [];
  const possible = rangeWords(low, high, unit ?? field.unit);
  return [{ key, message: `${label}: ${possible}. Check the number and which gauge it is from.` }];
}

function rangeWords(low: number | null, high: number | null, unit: Unit | null): string {
  const sign = (value: number) => `${value < 0 ? "−" : ""}${Number(Math.abs(value).toFixed(2))}`;
  if (low === null) return `possible up to ${withUnit(sign(high ?? 0), unit)}`;
  if (high === null) return `possible from ${withUnit(sign(low), unit)} upwards`;
  return `possible are ${sign(low)} to ${withUnit(sign(high), unit)}`;
}

function textErrors(key: string, text: string): FieldError[] {
  const over = [...text].length - COMMENT_LENGTH;
  return over > 0 ? [{ key, message: `Shorten this by ${over} characters: ${COMMENT_LENGTH} fit.` }] : [];
}
