/** Climb cooling, a close call where the hot-day basis decides. Figures: worked scenario 4 of the team, by hand. */
import { describe, expect, test } from "vitest";
import { sampleCard, samplePoint, sampleReading } from "../testcards/support/sample-card";
import { checked, digit, lineOf, typedDebrief } from "../testcards/support/sample-debrief";

const point = samplePoint({
  title: "Climb cooling",
  place: "air",
  completion: { rule: "5 min past peak", runS: null, pastPeakS: null },
  readings: [
    sampleReading("coolant", "highest", { expected: { low: 85, high: 101, unit: "degC" } }),
    sampleReading("cht", "highest", { expected: { low: 235, high: 290, unit: "degF" } }),
    sampleReading("oil-t", "highest", { expected: { low: 80, high: 109, unit: "degC" } }),
    sampleReading("tit", "highest", { expected: { low: 700, high: 855, unit: "degC" } }),
    sampleReading("iat", "highest", { expected: { low: 15, high: 50, unit: "degC" } }),
  ],
});
const card = sampleCard([point]);
const same = { sameMomentAs: "coolant" };
const debrief = typedDebrief(
  card,
  {
    p1: {
      ranForS: 920, // 5 min 20 s past 10:00
      topAltitudeFt: 10_100,
      readings: {
        coolant: { value: 95, atS: 600, altitudeFt: 5900, oat: 7 },
        cht: { value: 265, ...same },
        "oil-t": { value: 105, ...same },
        tit: { value: 850, ...same },
        iat: { value: 35, ...same },
      },
    },
  },
  { weather: { oat: { value: 22, unit: "degC" }, qnh: { value: 1013, unit: "hPa" }, windFromDeg: null, windKt: null, turbulence: null } },
);
const report = checked(card, debrief, { dispositions: [{ point: "p1", disposition: "accept" }] });

describe("S4, climb cooling", () => {
  test("takes the air at the peak: 38 − 1.98 × 5.9 = 26.32, add 19.32", () => {
    const { hotDay } = lineOf(report, "coolant", "hot day, placard");
    expect(hotDay?.hotAmbient.value.toFixed(2)).toBe("26.32");
    expect(hotDay?.difference.toFixed(2)).toBe("19.32");
    expect(hotDay?.ambient.value).toBeCloseTo(7, 9);
  });

  test("exceeds by 0.2 on the programme's metric basis and shows that us is marginal", () => {
    const line = lineOf(report, "coolant", "hot day, placard");
    expect(digit(line.asTrue?.value)).toBe("95.9"); // 79 + 15 × 1.125
    expect(digit(line.hotDay?.value)).toBe("115.2");
    expect(digit(line.margin)).toBe("-0.2");
    expect(line).toMatchObject({ verdict: "exceeded", notes: ["by less than U"] });
    expect(line.otherBasis).toMatchObject({ basis: "us", verdict: "marginal" });
    expect(digit(line.otherBasis?.hotDay.value)).toBe("114.9"); // 37.78 − 2.00 × 5.9 = 25.98, add 18.98
    expect(digit(line.otherBasis?.hotDay.expandedUncertainty)).toBe("3.2");
  });

  test.each([
    ["cht", "130.3", "149.7", "3.5", "153.1", "within", ["above normal"]],
    ["oil-t", "105.0", "124.3", "4.1", "128.4", "marginal", []],
    ["iat", "35.0", "56.2", "2.4", "58.7", "within", ["above normal"]],
  ])("gives %s %s true, %s ± %s on the hot day", (reading, asTrue, hot, u, upper, verdict, notes) => {
    const line = lineOf(report, reading, "hot day, placard");
    expect(digit(line.asTrue?.value)).toBe(asTrue);
    expect(digit(line.hotDay?.value)).toBe(hot);
    expect(digit(line.hotDay?.expandedUncertainty)).toBe(u);
    expect(digit((line.hotDay?.value ?? 0) + (line.hotDay?.expandedUncertainty ?? 0))).toBe(upper);
    expect(line).toMatchObject({ verdict, notes });
  });

  test("puts TIT at 869.3, within and above normal", () => {
    const line = lineOf(report, "tit", "hot day, placard");
    expect(digit(line.hotDay?.value)).toBe("869.3");
    expect(line).toMatchObject({ verdict: "within", notes: ["above normal"] });
  });

  test("is within the card as flown, 95.9 + 3.0, and no abort was due", () => {
    expect(lineOf(report, "coolant", "as flown, card").verdict).toBe("within");
    expect(report.points[0]?.disciplines.every((line) => line.discipline === null)).toBe(true);
  });

  test("holds without a squawk: the hot day is an engineering answer, not an engine exceedance", () => {
    expect(report.points[0]).toMatchObject({
      completion: null,
      completionWhy: "ran 5:20 of 5:00 past the highest",
      worst: "exceeded",
      outsideExpected: [],
    });
    expect(report.squawks).toEqual([]);
    expect(report.decision).toBe("hold");
  });

  test("keeps every other verdict the same on both bases", () => {
    expect(report.lines.filter((line) => line.otherBasis !== null).map((line) => line.reading)).toEqual(["coolant"]);
  });
});
