import { emptyEntry } from "@/lib/testcards/debrief-blank";
import type { Debrief, DebriefField, PointDebrief, ReadingEntry } from "@/lib/testcards/debrief-types";
import type { Unit } from "@/lib/testcards/units";

export type FieldValue = string | number | boolean | null;

const NUMBER = /^[-+−]?\d{1,7}([.,]\d{0,4})?$/;

/** A figure as typed on a phone, comma or point; null while it is none. */
export function parseFigure(typed: string): number | null {
  const text = typed.trim();
  return NUMBER.test(text) ? Number(text.replace("−", "-").replace(",", ".")) : null;
}

/** "5:20", "5.20" and "520" are five minutes twenty; "12" alone is twelve minutes. Seconds, or null. */
export function parseStopwatch(typed: string): number | null {
  const text = typed.trim();
  const parts = /^(\d{1,3})[:.,]([0-5]\d)$/.exec(text) ?? /^(\d{1,3})([0-5]\d)$/.exec(text);
  if (parts) return Number(parts[1]) * 60 + Number(parts[2]);
  return /^\d{1,2}$/.test(text) ? Number(text) * 60 : null;
}

/** "0912", "9:12" and "09.12" are 09:12 UTC; null where it is no time of day. */
export function parseClock(typed: string): string | null {
  const parts = /^(\d{1,2})[:.]?([0-5]\d)$/.exec(typed.trim());
  const hour = Number(parts?.[1]);
  return parts && hour < 24 ? `${String(hour).padStart(2, "0")}:${parts[2]}` : null;
}

/** What a typed text means for its field, or why it means nothing. */
export function readTyped(field: DebriefField, typed: string): { value: FieldValue; problem: string | null } {
  if (typed.trim() === "") return { value: null, problem: null };
  if (field.kind === "choice" || field.kind === "yes-no" || field.kind === "text" || field.kind === "photo")
    return { value: typed, problem: null };
  if (field.kind === "time of day") {
    const value = parseClock(typed);
    return { value, problem: value === null ? "Write the time as hh:mm, UTC." : null };
  }
  const value = field.kind === "duration" ? parseStopwatch(typed) : parseFigure(typed);
  const shape = field.kind === "duration" ? "Write minutes and seconds, such as 5:20." : "Write a number.";
  return { value, problem: value === null ? shape : null };
}

function entryOf(point: PointDebrief | undefined, reading: string): ReadingEntry {
  return point?.readings.find((entry) => entry.reading === reading) ?? emptyEntry({ id: reading });
}

/** The value that stands under a field's key. */
export function fieldValue(debrief: Debrief, field: Pick<DebriefField, "key" | "point" | "reading">): FieldValue {
  const path = field.key.split(".");
  const last = path.at(-1) ?? "";
  if (field.point) {
    const point = debrief.points.find((one) => one.point === field.point);
    if (field.reading) return entryOf(point, field.reading)[last as "value"];
    if (path[1] === "positions") return point?.positions.find(({ control }) => control === path.slice(2).join("."))?.position ?? null;
    return (point?.[last as "outcome"] ?? null) as FieldValue;
  }
  switch (path[0]) {
    case "times":
      return debrief.times[last as "start"];
    case "fuel":
      return debrief.fuel[last as "start"]?.value ?? null;
    case "weather": {
      const value = debrief.weather[last as "oat" | "windKt"];
      return value !== null && typeof value === "object" ? value.value : value;
    }
    case "safety":
      return debrief.safety[last as "callMade"];
    default:
      return debrief.revisionsFlown.find(({ card }) => card === path[1])?.letter ?? null;
  }
}

/** The debrief with one field set; everything else stands as it was. */
export function withValue(debrief: Debrief, field: DebriefField, value: FieldValue, unit: Unit | null = null): Debrief {
  const path = field.key.split(".");
  const last = path.at(-1) ?? "";
  if (field.point) return withPoint(debrief, field.point, (point) => changePoint(point, field, path, value));
  const quantity = typeof value === "number" && (unit ?? field.unit) ? { value, unit: (unit ?? field.unit) as Unit } : null;
  switch (path[0]) {
    case "times":
      return { ...debrief, times: { ...debrief.times, [last]: value } };
    case "fuel":
      return { ...debrief, fuel: { ...debrief.fuel, [last]: quantity } };
    case "weather":
      return { ...debrief, weather: { ...debrief.weather, [last]: last === "oat" || last === "qnh" ? quantity : value } };
    case "safety":
      return { ...debrief, safety: { ...debrief.safety, [last]: value } };
    default: {
      const card = path[1] ?? "";
      const others = debrief.revisionsFlown.filter((one) => one.card !== card);
      const note = debrief.revisionsFlown.find((one) => one.card === card)?.note ?? "";
      return { ...debrief, revisionsFlown: typeof value === "string" ? [...others, { card, letter: value, note }] : others };
    }
  }
}

export function withPoint(debrief: Debrief, id: string, change: (point: PointDebrief) => PointDebrief): Debrief {
  return { ...debrief, points: debrief.points.map((point) => (point.point === id ? change(point) : point)) };
}

export function withEntry(debrief: Debrief, point: string, reading: string, patch: Partial<ReadingEntry>): Debrief {
  return withPoint(debrief, point, (one) => {
    const entry = { ...entryOf(one, reading), ...patch };
    const known = one.readings.some((each) => each.reading === reading);
    return { ...one, readings: known ? one.readings.map((each) => (each.reading === reading ? entry : each)) : [...one.readings, entry] };
  });
}

function changePoint(point: PointDebrief, field: DebriefField, path: string[], value: FieldValue): PointDebrief {
  const last = path.at(-1) ?? "";
  if (field.reading) {
    const entry = { ...entryOf(point, field.reading), [last]: value, ...(last === "value" || last === "lowest" ? { asRead: false } : {}) };
    const known = point.readings.some((one) => one.reading === field.reading);
    return {
      ...point,
      readings: known ? point.readings.map((one) => (one.reading === field.reading ? entry : one)) : [...point.readings, entry],
    };
  }
  if (path[1] === "positions") {
    const control = path.slice(2).join(".");
    const others = point.positions.filter((one) => one.control !== control);
    return { ...point, positions: typeof value === "string" ? [...others, { control, position: value }] : others };
  }
  return { ...point, [last]: last === "comment" ? String(value ?? "") : value };
}
