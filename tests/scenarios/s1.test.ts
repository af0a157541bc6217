/** Ground run that stays inside. Figures: worked scenario 1 of the team, by hand from the invented gauge tables; the sums stand beside each check. */
import { describe, expect, test } from "vitest";
import { sampleCard, samplePoint, sampleReading } from "../testcards/support/sample-card";
import { checked, digit, lineOf, minuteRows, type Typed, typedDebrief } from "../testcards/support/sample-debrief";

const point = samplePoint({
  completion: { rule: "stabilised", runS: null, pastPeakS: null },
  readings: [
    sampleReading("coolant", "series", { expected: { low: 85, high: 98, unit: "degC" } }),
    sampleReading("cht", "series", { expected: { low: 235, high: 280, unit: "degF" } }),
    sampleReading("oil-t", "series", { expected: { low: 70, high: 95, unit: "degC" } }),
    sampleReading("tit", "highest", { expected: { low: 700, high: 855, unit: "degC" } }),
    sampleReading("iat", "highest", { expected: { low: 30, high: 50, unit: "degC" } }),
    sampleReading("oil-p", "single", { expected: { low: 45, high: 65, unit: "psi" } }),
    sampleReading("rpm", "single", { id: "rpm-full", conditions: ["full power"] }),
    sampleReading("rpm", "single", { id: "rpm-held" }),
    sampleReading("oat", "single"),
  ],
});
const card = sampleCard([point], { content: { kind: "ground run" } });

const steady = (value: number, count: number, before: number[]) => minuteRows([...before, ...Array<number>(count).fill(value)], 13);
const said: Typed = {
  ranForS: 780,
  readings: {
    coolant: { rows: steady(92.5, 6, [70, 75, 80, 82.5, 85, 87.5, 90, 90]) },
    cht: { rows: steady(255, 6, [200, 215, 225, 235, 240, 245, 250, 250]) },
    "oil-t": { rows: steady(85, 9, [60, 65, 75, 80, 80]) },
    tit: { value: 790, atS: 300 },
    iat: { value: 41, atS: 300 },
    "oil-p": { value: 55 },
    "rpm-full": { value: 2700 },
    "rpm-held": { value: 2550 },
    oat: { value: 21 },
  },
};

describe("S1, static ground cooling run", () => {
  const report = checked(card, typedDebrief(card, { p1: said }), { dispositions: [{ point: "p1", disposition: "accept" }] });

  test("corrects the coolant gauge and stays within as flown: 79 + 12.5 × 1.125 = 93.06", () => {
    const line = lineOf(report, "coolant", "as flown, placard");
    expect(line.onGauge).toEqual({ value: 92.5, unit: "degC" });
    expect(digit(line.asTrue?.value)).toBe("93.1");
    expect(line.verdict).toBe("within");
    expect(lineOf(report, "coolant", "as flown, card").verdict).toBe("within");
  });

  test("adds 38 − 1.98 × 0.35 − 21 = 16.31 for the hot day", () => {
    const line = lineOf(report, "coolant", "hot day, placard");
    expect(line.hotDay?.difference.toFixed(2)).toBe("16.31");
    expect(line.hotDay?.hotAmbient.value.toFixed(2)).toBe("37.31");
    expect(digit(line.hotDay?.value)).toBe("109.4");
    expect(digit(line.hotDay?.expandedUncertainty)).toBe("3.2"); // √(3.0² + 1.0²)
    expect(digit((line.hotDay?.value ?? 0) + (line.hotDay?.expandedUncertainty ?? 0))).toBe("112.5");
    expect(line).toMatchObject({ verdict: "within", notes: ["above normal"], required: true });
    expect(digit(line.margin)).toBe("5.6");
  });

  test("judges head metal read in °F: 199 + 55 × 1.04 = 256.2 °F", () => {
    const line = lineOf(report, "cht", "hot day, placard");
    expect(line.onGauge).toEqual({ value: 255, unit: "degF" });
    expect(digit((line.asTrue?.value ?? 0) * 1.8 + 32)).toBe("256.2");
    expect(digit(line.asTrue?.value)).toBe("124.6");
    expect(digit(line.hotDay?.value)).toBe("140.9");
    expect(digit(line.hotDay?.expandedUncertainty)).toBe("3.5"); // √(3.33² + 1.0²)
    expect(digit(line.margin)).toBe("24.1");
    expect(line).toMatchObject({ verdict: "within", notes: ["above normal"] });
  });

  test.each([
    ["oil-t", "101.3", "4.1", []],
    ["tit", "806.3", "10.0", []],
    ["iat", "58.4", "2.4", ["above normal"]], // 314.15 × 310.457 / 294.15 − 273.15; plus-one would say 57.3
  ])("puts %s within on the hot day at %s", (reading, value, u, notes) => {
    const line = lineOf(report, reading, "hot day, placard");
    expect(digit(line.hotDay?.value)).toBe(value);
    expect(digit(line.hotDay?.expandedUncertainty)).toBe(u);
    expect(line).toMatchObject({ verdict: "within", notes });
  });

  test("finds it stabilised: U of the slope 2·readable/√6·gauge slope/window", () => {
    expect(report.points[0]).toMatchObject({
      completion: null,
      completionWhy: "Coolant out 0.0 ±0.46 °C/min, Head metal, hottest 0.0 ±0.47 °C/min, Oil temperature 0.0 ±0.51 °C/min",
    });
  });

  test("leaves abort discipline empty and is clear to the next step", () => {
    expect(report.points[0]?.disciplines.map((line) => line.discipline)).toEqual([null, null, null, null, null, null]);
    expect(report.squawks).toEqual([]);
    expect(report.points[0]?.outsideExpected).toEqual([]);
    expect(report.decision).toBe("clear to next step");
  });

  test("is not stabilised with the last three readings alone: 2·2.5/√6·1.125/2 = 1.15", () => {
    const short = { ...said, readings: { ...said.readings, coolant: { rows: minuteRows([92.5, 92.5, 92.5], 13) } } };
    const again = checked(card, typedDebrief(card, { p1: short }));
    const line = lineOf(again, "coolant", "hot day, placard");
    expect(line).toMatchObject({ verdict: "no verdict", reasons: ["not stabilised"], informationOnly: true });
    expect(line.why).toContain("slope known to 1.15 of 0.556 °C/min");
    expect(lineOf(again, "tit", "hot day, placard").reasons).toEqual(["not stabilised"]);
    expect(lineOf(again, "oil-t", "hot day, placard").verdict).toBe("within");
    expect(lineOf(again, "coolant", "as flown, placard").verdict).toBe("within");
    expect(again.decision).toBe("hold");
  });
});
