import type { CardPoint } from "@/lib/testcards/card";

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
