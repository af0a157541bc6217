/** A missed abort on a hot day. Figures: worked scenario 2 of the team, by hand from the invented gauge tables. */
import { describe, expect, test } from "vitest";
import { sampleCard, samplePoint, sampleReading } from "../testcards/support/sample-card";
import { checked, digit, lineOf, typedDebrief } from "../testcards/support/sample-debrief";

const card = sampleCard(
  [
    samplePoint({
      title: "Taxi cooling, downwind",
      completion: { rule: "whole run", runS: 900, pastPeakS: null },
      readings: [
        sampleReading("coolant", "highest", { expected: { low: 75, high: 101, unit: "degC" } }),
        sampleReading("oil-t", "highest"),
        sampleReading("oat", "single"),
      ],
    }),
  ],
  { content: { kind: "taxi" } },
);
const debrief = typedDebrief(card, {
  p1: { ranForS: 900, readings: { coolant: { value: 107.5, atS: 840 }, "oil-t": { value: 85, atS: 840 }, oat: { value: 33 } } },
});
const report = checked(card, debrief, { dispositions: [{ point: "p1", disposition: "repeat" }] });

describe("S2, taxi with a missed abort", () => {
  test("exceeds the card limit by 0.4, less than U: 101.5 + 7.5 × 1.05 = 109.375", () => {
    const line = lineOf(report, "coolant", "as flown, card");
    expect(line.asTrue?.value).toBeCloseTo(109.375, 9);
    expect(digit(line.asTrue?.value)).toBe("109.4");
    expect(digit(line.margin)).toBe("-0.4");
    expect(line).toMatchObject({ verdict: "exceeded", notes: ["by less than U"] });
  });

  test("stays within the placard as flown: 109.4 + 3.0 ≤ 115", () => {
    expect(lineOf(report, "coolant", "as flown, placard")).toMatchObject({ verdict: "within", notes: ["above normal"] });
  });

  test("is marginal on the hot day on either basis", () => {
    const line = lineOf(report, "coolant", "hot day, placard");
    expect(line.hotDay?.difference.toFixed(2)).toBe("4.31");
    expect(digit(line.hotDay?.value)).toBe("113.7");
    expect(digit(line.hotDay?.expandedUncertainty)).toBe("3.2");
    expect(digit((line.hotDay?.value ?? 0) + (line.hotDay?.expandedUncertainty ?? 0))).toBe("116.8");
    expect(line).toMatchObject({ verdict: "marginal", otherBasis: null });
    const us = sampleCard(card.content.points, { programme: { hotDayBasis: "us" }, content: { kind: "taxi" } });
    const again = lineOf(checked(us, debrief), "coolant", "hot day, placard");
    expect(digit(again.hotDay?.value)).toBe("113.5");
    expect(again.verdict).toBe("marginal");
  });

  test("says that the abort was missed: 107.5 on the gauge against 102.5", () => {
    expect(report.points[0]?.disciplines[0]).toMatchObject({
      parameter: "coolant",
      worstOnGauge: 107.5,
      thresholdOnGauge: 102.5,
      discipline: "missed",
    });
    expect(lineOf(report, "coolant", "abort")).toMatchObject({ discipline: "missed", onGauge: { value: 107.5, unit: "degC" } });
  });

  test("holds, with a squawk before the next test and no grounding", () => {
    expect(report.points[0]).toMatchObject({ outcome: "flown", completion: null, completionWhy: "ran 15:00 of 15:00", worst: "exceeded" });
    expect(report.decision).toBe("hold");
    expect(report.squawks).toEqual([expect.objectContaining({ reading: "coolant", severity: "before next test" })]);
  });
});
