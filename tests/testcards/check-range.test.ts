import { describe, expect, test } from "vitest";
import { checkCount, checkFinite, checkOneOf, checkPositive, checkRange, checkResult } from "@/lib/testcards/check-range";
import { normalCumulative } from "@/lib/testcards/normal-distribution";
import { checkSeries, valueAt } from "@/lib/testcards/series";

describe("a refusal", () => {
  test.each([
    ["no number", () => checkFinite("massKg", Number.NaN), "massKg is NaN; it must be a finite number."],
    ["a string from a form", () => checkFinite("massKg", "5" as unknown as number), 'massKg is "5"; it must be a finite number.'],
    ["outside a range", () => checkRange("altitudeM", 30_000, -2000, 20_000), "altitudeM is 30000; it must be from -2000 to 20000."],
    ["below an open range", () => checkRange("rate", -1, 0, Number.POSITIVE_INFINITY), "rate is -1; it must be at least 0."],
    ["above an open range", () => checkRange("x", 2, Number.NEGATIVE_INFINITY, 1), "x is 2; it must be at most 1."],
    ["not positive", () => checkPositive("stepS", 0), "stepS is 0; it must be above 0."],
    ["not a word", () => checkOneOf("side", "top", ["max", "min"]), 'side is "top"; it must be one of max, min.'],
    ["too few", () => checkCount("legs", [1], 3), "legs holds 1 values; it must hold at least 3."],
    ["overflow", () => checkResult("final", Number.POSITIVE_INFINITY), "final comes out as Infinity; the inputs must keep it finite."],
  ])("of %s names the argument, its value and what is allowed", (_, refused, message) => {
    expect(refused).toThrow(RangeError);
    expect(refused).toThrow(message);
  });

  test("lets the ends of a range through", () => {
    expect(checkRange("x", 0, 0, 1)).toBe(0);
    expect(checkRange("x", 1, 0, 1)).toBe(1);
  });
});

describe("series", () => {
  const series = [
    { timeS: 0, value: 10 },
    { timeS: 60, value: 40 },
  ];

  test("gives the value between two readings on the straight line, and nothing outside them", () => {
    expect(valueAt(series, 20)).toBeCloseTo(20, 12);
    expect(valueAt(series, 60)).toBe(40);
    expect(() => valueAt(series, 61)).toThrow(/timeS is 61; it must be from 0 to 60/);
  });

  test("refuses times that stand still or go back, and readings that are none", () => {
    expect(() => checkSeries([...series].reverse())).toThrow(/goes from 60 to 0; times must rise/);
    expect(() => checkSeries([{ timeS: 0, value: Number.NaN }])).toThrow(/series.value is NaN/);
    expect(() => checkSeries([])).toThrow(/series holds 0 values/);
  });
});

describe("normalCumulative", () => {
  // Abramowitz and Stegun, table 26.1.
  test.each([
    [0, 0.5],
    [1, 0.841344746068543],
    [1.4, 0.919243340766229],
    [1.96, 0.97500210485178],
    [2, 0.977249868051821],
    [3, 0.99865010196837],
    [-2, 0.022750131948179],
    [4.9, 0.999999520816723],
    [5, 0.999999713348428],
  ])("at %d is the tabulated value", (z, expected) => {
    expect(normalCumulative(z)).toBeCloseTo(expected, 13);
  });

  test("keeps its tail where one minus it would be lost: Φ(−10) is 7.6199e-24", () => {
    expect(normalCumulative(-10) / 7.61985302416052e-24).toBeCloseTo(1, 10);
    expect(normalCumulative(-60)).toBe(0);
    expect(normalCumulative(60)).toBe(1);
  });
});
