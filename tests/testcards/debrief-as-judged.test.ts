/** What is judged in place of what was typed: amendments by reading and by field, and the times that row labels say. */
import { describe, expect, test } from "vitest";
import { debriefAsJudged } from "@/lib/testcards/debrief-as-judged";
import type { CheckContext } from "@/lib/testcards/debrief-types";
import { sampleCard, samplePoint, sampleReading } from "./support/sample-card";
import { typedDebrief } from "./support/sample-debrief";

const readings = [sampleReading("coolant", "highest"), sampleReading("oil-t", "series")];
const grid = { head: "min", unit: null, by: "time" as const, rows: ["1", "0:90", "x"], timeColumn: false };
const card = sampleCard([samplePoint({ readings, grid })]);
const rows = ["1", "2:30", "x"].map((label, i) => ({ atS: null, label, value: 80 + i }));
const raw = typedDebrief(card, { p1: { readings: { coolant: { value: 90, oat: 20 }, "oil-t": { rows } } } });
const judged = (...amendments: CheckContext["amendments"]) => debriefAsJudged(card, raw, amendments).points[0]?.readings ?? [];

describe("debriefAsJudged", () => {
  test("puts an amendment in place of a value, a moment's air or one row, and leaves the raw debrief as typed", () => {
    expect(judged({ reading: "coolant", value: 92.5 })[0]).toMatchObject({ value: 92.5, oat: 20 });
    expect(judged({ reading: "p1.coolant.oat", value: 25 })[0]).toMatchObject({ value: 90, oat: 25 });
    expect(judged({ reading: "oil-t.rows.1", value: 99 })[1]?.rows.map(({ value }) => value)).toEqual([80, 99, 82]);
    expect(raw.points[0]?.readings[0]).toMatchObject({ value: 90, oat: 20 });
  });

  test("lets the last of several stand, and passes over what names nothing or is no number", () => {
    expect(judged({ reading: "coolant", value: 91 }, { reading: "coolant", value: 92 })[0]?.value).toBe(92);
    for (const reading of ["coolant.rows.0", "coolant.colour", "p2.coolant", "oil-t.rows.7"])
      expect(judged({ reading, value: 1 })).toEqual(judged());
    expect(judged({ reading: "coolant", value: Number.NaN })[0]?.value).toBe(90);
  });

  // "1" is a minute, "2:30" is 150 s, "x" is no time.
  test("times the rows of a grid by time by their labels", () => {
    expect(judged()[1]?.rows.map(({ atS }) => atS)).toEqual([60, 150, null]);
  });

  test("leaves the points of other cards alone", () => {
    const other = { ...raw, points: raw.points.map((point) => ({ ...point, point: "elsewhere" })) };
    expect(debriefAsJudged(card, other, [{ reading: "coolant", value: 1 }])).toEqual(other);
  });
});
