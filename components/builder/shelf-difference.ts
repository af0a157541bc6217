import type { CardPoint, Reading } from "@/lib/testcards/card";
import { copyPoint } from "./builder-state";

/** The parts of a point that can be changed on a card, in the order of the sheet. */
export const EDITABLE = [
  ["title", "Title"],
  ["positions", "Control position"],
  ["entryText", "Entry line"],
  ["entry", "Entry conditions"],
  ["steps", "Steps"],
  ["grid", "Grid"],
  ["readings", "Readings"],
  ["limits", "Own limits"],
  ["aborts", "Abort"],
  ["recovery", "Recovery"],
  ["completion", "Completion rule"],
  ["durationMin", "Duration"],
  ["fuelFlowLPerH", "Fuel flow"],
  ["heightFloor", "Height floor"],
  ["objectives", "Objectives"],
] as const satisfies readonly (readonly [keyof CardPoint, string])[];

export type EditablePart = (typeof EDITABLE)[number][0];

/** Ids differ by nature between a copy and the shelf; readings are named by their place. */
function comparable(point: CardPoint, part: EditablePart): string {
  const place = new Map(point.readings.map((reading, index) => [reading.id, `reading ${index}`]));
  return JSON.stringify(point[part], (key, value: unknown) => {
    if (key === "id") return undefined;
    if (key === "reading" && typeof value === "string") return place.get(value) ?? value;
    return value;
  });
}

/** Which parts of a copy no longer read as the shelf has them. */
export function differencesFromShelf(point: CardPoint, shelf: CardPoint | undefined): { part: EditablePart; label: string }[] {
  if (!shelf) return [];
  return EDITABLE.filter(([part]) => comparable(point, part) !== comparable(shelf, part)).map(([part, label]) => ({ part, label }));
}

/** The readings of the shelf under the ids they have on the card, so that limits go on naming the reading they were set for. */
function shelfReadings(point: CardPoint, copied: Reading[]): Reading[] {
  const free = [...point.readings];
  const take = (fits: (one: Reading) => boolean) => {
    const at = free.findIndex(fits);
    return at < 0 ? undefined : free.splice(at, 1)[0];
  };
  const kin = (a: Reading, b: Reading) => a.kind === b.kind && a.parameter === b.parameter && a.instrument === b.instrument;
  const alike = copied.map((reading) => take((one) => kin(one, reading) && one.label === reading.label));
  return copied.map((reading, index) => ({ ...reading, id: (alike[index] ?? take((one) => kin(one, reading)))?.id ?? reading.id }));
}

/** The change that puts one part back as the shelf has it. */
export function asOnShelf(point: CardPoint, shelf: CardPoint, part: EditablePart, newId: () => string): Partial<CardPoint> {
  const copy = copyPoint(shelf, newId);
  const readings = shelfReadings(point, copy.readings);
  if (part === "readings") {
    const limits = point.limits.filter((limit) => readings.some(({ id }) => id === limit.reading));
    return { readings, ...(limits.length < point.limits.length ? { limits } : {}) };
  }
  if (part === "limits") {
    const idOf = new Map(copy.readings.map(({ id }, index) => [id, readings[index]?.id]));
    const kept = new Set(point.readings.map(({ id }) => id));
    const limits = copy.limits.map((limit) => ({ ...limit, reading: idOf.get(limit.reading) ?? limit.reading }));
    return { limits: limits.filter(({ reading }) => kept.has(reading)) };
  }
  return { [part]: copy[part] };
}
