/** Taking a part of a point back as the shelf has it. Expected values follow from the rule: a limit names a reading of its own point. */
import { describe, expect, test } from "vitest";
import { copyPoint } from "@/components/builder/builder-state";
import { asOnShelf, differencesFromShelf } from "@/components/builder/shelf-difference";
import { testPointNamed } from "@/db/seed/test-points/shelf";
import type { CardPoint } from "@/lib/testcards/card";

const shelf = testPointNamed("T18");
let minted = 0;
const newId = () => `id-${++minted}`;
const labelOf = (point: CardPoint, id: string) => point.readings.find((reading) => reading.id === id)?.label;
const limited = (point: CardPoint) => point.limits.map((limit) => [limit.label, labelOf(point, limit.reading)]);

describe("a point on a card beside the shelf", () => {
  test("is no different when it was only copied", () => {
    expect(differencesFromShelf(copyPoint(shelf, newId), shelf)).toEqual([]);
  });

  test("gets its readings back in the shelf's order while each limit still names its own reading", () => {
    const copy = copyPoint(shelf, newId);
    const turned = { ...copy, readings: copy.readings.toReversed() };
    expect(differencesFromShelf(turned, shelf).map(({ part }) => part)).toContain("readings");
    const back = { ...turned, ...asOnShelf(turned, shelf, "readings", newId) };
    expect(differencesFromShelf(back, shelf)).toEqual([]);
    expect(limited(back)).toEqual(limited(shelf));
  });

  test("gets a reading back that was taken off", () => {
    const copy = copyPoint(shelf, newId);
    const shorter = { ...copy, readings: copy.readings.slice(1), limits: copy.limits.slice(1) };
    const readings = { ...shorter, ...asOnShelf(shorter, shelf, "readings", newId) };
    const back = { ...readings, ...asOnShelf(readings, shelf, "limits", newId) };
    expect(differencesFromShelf(back, shelf)).toEqual([]);
    expect(limited(back)).toEqual(limited(shelf));
  });

  test("gets its limits back on the readings it has", () => {
    const copy = copyPoint(shelf, newId);
    const bare = { ...copy, limits: [] };
    const back = { ...bare, ...asOnShelf(bare, shelf, "limits", newId) };
    expect(differencesFromShelf(back, shelf)).toEqual([]);
    expect(limited(back)).toEqual(limited(shelf));
  });
});
