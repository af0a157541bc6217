/** A climb stopped too soon. Figures: worked scenario 5 of the team, by hand. */
import { describe, expect, test } from "vitest";
import { sampleCard, samplePoint, sampleReading } from "../testcards/support/sample-card";
import { checked, digit, lineOf, typedDebrief } from "../testcards/support/sample-debrief";

const card = sampleCard([
  samplePoint({
    place: "air",
    completion: { rule: "5 min past peak", runS: null, pastPeakS: null },
    readings: [sampleReading("coolant", "highest")],
  }),
]);
const report = checked(
  card,
  typedDebrief(card, {
    p1: { outcome: "part", ranForS: 790, topAltitudeFt: 9200, readings: { coolant: { value: 97.5, atS: 600, altitudeFt: 5200, oat: 14 } } },
  }),
  { dispositions: [{ point: "p1", disposition: "repeat" }] },
);

describe("S5, climb stopped 3:10 after the peak", () => {
  test("is within as flown: 79 + 17.5 × 1.125 = 98.69, upper 101.7", () => {
    const line = lineOf(report, "coolant", "as flown, card");
    expect(digit(line.asTrue?.value)).toBe("98.7");
    expect(digit((line.asTrue?.value ?? 0) + (line.asTrue?.expandedUncertainty ?? 0))).toBe("101.7");
    expect(line).toMatchObject({ verdict: "within", notes: ["above normal"] });
  });

  test("gives the hot day for information only: 38 − 1.98 × 5.2 − 14 = 13.70, 112.4", () => {
    const line = lineOf(report, "coolant", "hot day, placard");
    expect(line).toMatchObject({ verdict: "no verdict", reasons: ["stopped early"], informationOnly: true, required: true });
    expect(line.why).toBe("ran 3:10 of 5:00 past the highest");
    expect(line.hotDay?.difference.toFixed(2)).toBe("13.70");
    expect(digit(line.hotDay?.value)).toBe("112.4");
  });

  test("holds", () => {
    expect(report.points[0]).toMatchObject({ outcome: "part", completion: "stopped early", worst: "no verdict" });
    expect(report.decision).toBe("hold");
    expect(report.squawks).toEqual([]);
  });
});
