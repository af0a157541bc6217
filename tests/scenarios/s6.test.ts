/** A correct abort. Figures: worked scenario 6 of the team, by hand. */
import { describe, expect, test } from "vitest";
import { sampleCard, samplePoint, sampleReading } from "../testcards/support/sample-card";
import { checked, digit, lineOf, typedDebrief } from "../testcards/support/sample-debrief";

const card = sampleCard([
  samplePoint({ title: "Climb cooling at 85", place: "air", readings: [sampleReading("coolant", "highest")] }),
  samplePoint({
    id: "p2",
    title: "Climb cooling at 75",
    place: "air",
    readings: [sampleReading("coolant", "highest", { id: "coolant-2" })],
  }),
]);
const debrief = typedDebrief(card, {
  p1: { outcome: "aborted", readings: { coolant: { value: 102.5, atS: 240, altitudeFt: 3100, oat: 22 } } },
  p2: { outcome: "skipped", onCondition: null },
});
const called = {
  ...debrief,
  safety: {
    ...debrief.safety,
    callMade: true,
    calls: [
      { point: "p1", word: "abort" as const, trigger: "coolant", onGauge: 102.5, durationS: 180, action: "level, 45 %", recovered: true },
    ],
  },
};
const report = checked(card, called, { dispositions: [{ point: "p1", disposition: "repeat" }] });

describe("S6, abort called on the number", () => {
  test("was called", () => {
    expect(report.points[0]?.disciplines[0]).toMatchObject({ worstOnGauge: 102.5, thresholdOnGauge: 102.5, discipline: "called" });
  });

  test("is within the card as flown: 101.5 + 2.5 × 1.05 = 104.1, upper 107.1", () => {
    const line = lineOf(report, "coolant", "as flown, card");
    expect(digit(line.asTrue?.value)).toBe("104.1");
    expect(digit((line.asTrue?.value ?? 0) + (line.asTrue?.expandedUncertainty ?? 0))).toBe("107.1");
    expect(line).toMatchObject({ verdict: "within", notes: ["above normal"] });
  });

  test("shows 114.0 on the hot day for information only", () => {
    const line = lineOf(report, "coolant", "hot day, placard");
    expect(digit(line.hotDay?.value)).toBe("114.0"); // 104.125 + 38 − 1.98 × 3.1 − 22
    expect(digit((line.hotDay?.value ?? 0) + (line.hotDay?.expandedUncertainty ?? 0))).toBe("117.1");
    expect(line).toMatchObject({ verdict: "no verdict", reasons: ["stopped early"], informationOnly: true, required: false });
  });

  test("holds with a squawk that does not ground", () => {
    expect(report.decision).toBe("hold");
    expect(report.points.map((point) => point.outcome)).toEqual(["aborted", "skipped"]);
    expect(report.squawks).toEqual([expect.objectContaining({ point: "p1", reading: "coolant", severity: "before next test" })]);
  });
});
