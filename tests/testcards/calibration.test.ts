import fc from "fast-check";
import { describe, expect, test } from "vitest";
import {
  type Calibration,
  combinedUncertainty,
  correctReading,
  fitCalibration,
  rateUncertainty,
  readingFor,
} from "@/lib/testcards/calibration";
import { CHT_PANEL, COOLANT_PANEL } from "./support/gauges";
import norris from "./truth/norris.json";

describe("correctReading", () => {
  // Hand calculation on the table: 92.5 -> 79 + 22.5/20 · 12.5 = 93.0625; 107.5 -> 101.5 + 21/20 · 7.5 = 109.375.
  test.each([
    [92.5, 93.0625],
    [88, 88],
    [95, 95.875],
    [97.5, 98.6875],
    [102.5, 104.125],
    [90, 90.25],
    [107.5, 109.375],
    [109, 110.95],
    [0, -4],
    [120, 122.5],
    [80, 79],
  ])("reads %d on the coolant gauge as %d true", (read, value) => {
    const corrected = correctReading(read, COOLANT_PANEL);
    expect(corrected.value).toBeCloseTo(value, 9);
    expect(corrected).toMatchObject({ inRange: true, beyond: null, expandedUncertainty: 3 });
  });

  // 199 + 1.04 · 65 = 266.6 °F; 199 + 1.04 · 55 = 256.2; 199 + 1.04 · 45 = 245.8.
  test.each([
    [265, 266.6],
    [255, 256.2],
    [245, 245.8],
  ])("reads %d °F on the head gauge as %d true, with the slope of its stretch", (read, value) => {
    expect(correctReading(read, CHT_PANEL).value).toBeCloseTo(value, 9);
    expect(correctReading(read, CHT_PANEL).slope).toBeCloseTo(1.04, 12);
  });

  test("never extrapolates: beyond the table it answers the true value at that end and says so", () => {
    expect(correctReading(-5, COOLANT_PANEL)).toMatchObject({ value: -4, inRange: false, beyond: "low" });
    const hot = correctReading(125, COOLANT_PANEL);
    expect(hot).toMatchObject({ inRange: false, beyond: "high" });
    expect(hot.value).toBeCloseTo(122.5, 12);
  });

  test("follows a straight line with gain and offset, over its proved range only", () => {
    const line: Calibration = { kind: "linear", gain: 1, offset: -0.4, low: 10, high: 50, expandedUncertainty: null };
    expect(correctReading(20, line)).toMatchObject({ slope: 1, inRange: true, expandedUncertainty: null });
    expect(correctReading(20, line).value).toBeCloseTo(19.6, 12);
    expect(correctReading(60, line)).toMatchObject({ inRange: false, beyond: "high" });
    expect(correctReading(60, line).value).toBeCloseTo(49.6, 12);
  });

  test("takes the steeper slope where two stretches meet, the cautious one for a rate", () => {
    expect(correctReading(80, COOLANT_PANEL).slope).toBeCloseTo(1.125, 12); // 22.5/20 against 42.5/40
    expect(readingFor(101.5, COOLANT_PANEL).slope).toBeCloseTo(1.125, 12); // 22.5/20 against 21/20
  });

  test.each<[string, Partial<Calibration>]>([
    [
      "a table that falls",
      {
        points: [
          { read: 0, actual: 0 },
          { read: 10, actual: -1 },
        ],
      },
    ],
    ["a table of one point", { points: [{ read: 0, actual: 0 }] }],
    [
      "two entries for one reading",
      {
        points: [
          { read: 0, actual: 0 },
          { read: 0, actual: 1 },
          { read: 10, actual: 11 },
        ],
      },
    ],
    ["a range wider than its points", { high: 130 }],
    ["a range upside down", { low: 120, high: 0 }],
    ["a negative U", { expandedUncertainty: -1 }],
    [
      "a figure that is no number",
      {
        points: [
          { read: 0, actual: Number.NaN },
          { read: 120, actual: 1 },
        ],
      },
    ],
  ])("refuses %s", (_, part) => {
    expect(() => correctReading(5, { ...COOLANT_PANEL, ...part } as Calibration)).toThrow(RangeError);
  });

  test("refuses a reading that is no number, naming it", () => {
    expect(() => correctReading(Number.NaN, COOLANT_PANEL)).toThrow(/read is NaN/);
    expect(() => readingFor(Number.POSITIVE_INFINITY, COOLANT_PANEL)).toThrow(/actual is Infinity/);
    const flat: Calibration = { kind: "linear", gain: 0, offset: 0, low: 0, high: 1, expandedUncertainty: 1 };
    expect(() => correctReading(0.5, flat)).toThrow(/gain is 0/);
  });

  test("is undone by readingFor everywhere inside the table, and rises with the reading", () => {
    const tables = fc.uniqueArray(fc.integer({ min: -50, max: 500 }), { minLength: 2, maxLength: 8 }).chain((reads) =>
      fc
        .array(fc.double({ min: 0.2, max: 5, noNaN: true }), { minLength: reads.length, maxLength: reads.length })
        .map((slopes): Calibration => {
          const sorted = [...reads].sort((a, b) => a - b);
          let actual = (sorted[0] ?? 0) - 3;
          const list = sorted.map((read, i) => {
            actual += i === 0 ? 0 : (slopes[i] ?? 1) * (read - (sorted[i - 1] ?? read));
            return { read, actual };
          });
          return { kind: "points", points: list, low: sorted[0] ?? 0, high: sorted.at(-1) ?? 0, expandedUncertainty: 1 };
        }),
    );
    fc.assert(
      fc.property(tables, fc.double({ min: 0, max: 1, noNaN: true }), fc.double({ min: 0, max: 1, noNaN: true }), (c, s, t) => {
        const at = (share: number) => c.low + share * (c.high - c.low);
        const value = correctReading(at(s), c).value;
        expect(readingFor(value, c).reading).toBeCloseTo(at(s), 7);
        expect(readingFor(value, c).inRange).toBe(true);
        if (s < t) expect(correctReading(at(t), c).value).toBeGreaterThanOrEqual(value);
      }),
    );
  });
});

describe("uncertainty", () => {
  // 2 · 2.5/√6/5 · 1.125 = 0.459; over 4 min 0.574, over 2 min 1.148; 5 °F: 2 · 5/√6/5 · 1.04/1.8 = 0.472; 5 °C over 8 min 0.510.
  test.each([
    ["coolant, 5 min", 2.5, 5, 1.125, 0.459],
    ["coolant, 4 min", 2.5, 4, 1.125, 0.574],
    ["coolant, the last 3 readings", 2.5, 2, 1.125, 1.148],
    ["heads in °C, 5 min", 5, 5, 1.04 / 1.8, 0.472],
    ["oil, 8 min", 5, 8, 1, 0.51],
  ])("of a slope: %s", (_, readable, windowMin, slope, expected) => {
    expect(rateUncertainty({ readable, windowMin }) * slope).toBeCloseTo(expected, 3);
  });

  test("of a slope halves when the window doubles", () => {
    expect(rateUncertainty({ readable: 5, windowMin: 0.5 }) / rateUncertainty({ readable: 5, windowMin: 1 })).toBeCloseTo(2, 12);
    expect(() => rateUncertainty({ readable: 5, windowMin: 0 })).toThrow(/windowMin is 0/);
  });

  // JCGM 100 (GUM) example H.1, end gauge, in nm: 25, 9.66, 2.89 and 16.60 combine to 31.66 (32 in the guide).
  test("combines as the root of the sum of squares", () => {
    const combined = combinedUncertainty({ reference: 25, reading: 9.66, drift: 2.89, installation: 16.6, resolution: 0 });
    expect(combined.standard).toBeCloseTo(31.66, 1);
    expect(combined.expanded).toBeCloseTo(2 * combined.standard, 12);
  });

  // JCGM 100 4.3.7: a full step of 1 is 1/√12 = 0.2887.
  test("takes a display step as rectangular", () => {
    expect(combinedUncertainty({ reference: 0, reading: 0, drift: 0, installation: 0, resolution: 1 }).standard).toBeCloseTo(0.288675, 6);
    expect(() => combinedUncertainty({ reference: -1, reading: 0, drift: 0, installation: 0, resolution: 1 })).toThrow(/reference is -1/);
  });
});

describe("fitCalibration", () => {
  test("gives the certified line of NIST StRD Norris to nine figures", () => {
    const fit = fitCalibration(norris.x.map((read, i) => ({ read, actual: norris.y[i] ?? Number.NaN })));
    expect(fit.gain).toBeCloseTo(norris.b1, 12);
    expect(fit.offset).toBeCloseTo(norris.b0, 10);
    expect(fit.gainSe).toBeCloseTo(norris.b1Sd, 12);
    expect(fit.offsetSe).toBeCloseTo(norris.b0Sd, 10);
    expect(fit.residualSd).toBeCloseTo(norris.residualSd, 10);
  });

  test("refuses one check point, two points, and one reading repeated", () => {
    const point = { read: 88, actual: 88 };
    expect(() => fitCalibration([point])).toThrow(/holds 1 values; it must hold at least 3/);
    expect(() => fitCalibration([point, { read: 90, actual: 90 }])).toThrow(RangeError);
    expect(() => fitCalibration([point, point, point])).toThrow(/at least 2 different/);
  });
});
