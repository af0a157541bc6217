import { describe, expect, test } from "vitest";
import { decimalsOf, formatMargin, formatNumber, formatUncertainty, roundToResolution } from "@/lib/format/number";
import { daysBetween, formatDay, formatInstant, formatMinutes, formatStopwatch } from "@/lib/format/time";
import { formatBand, formatOnGauge, formatQuantity, unitLabel } from "@/lib/format/unit";
import { countOf, listAnd } from "@/lib/format/words";

// Expected strings are the house style, written out by hand: U+2212 minus, U+202F between value and unit.
describe("formatNumber", () => {
  test.each([
    [109.375, 1, "109.4"], // half a tenth and more rounds away from zero
    [-0.2, 1, "\u22120.2"],
    [-0.04, 1, "0.0"], // zero carries no sign
    [2550, 0, "2550"],
    [11000, 0, "11\u202f000"],
    [1.005, 2, "1.01"], // held as 1.00499999999999989…
    [-1.25, 1, "\u22121.3"],
  ])("writes %d with %i decimals as %s", (value, decimals, text) => {
    expect(formatNumber(value, decimals)).toBe(text);
  });
});

describe("formatMargin", () => {
  test("never lets a miss read as nothing in hand", () => {
    expect(formatMargin(-0.04)).toBe("\u22120.04");
    expect(formatMargin(-0.0004)).toBe("\u22120.0004");
  });
  test("writes what is in hand plainly", () => {
    expect(formatMargin(13.1)).toBe("13.1");
    expect(formatMargin(0)).toBe("0.0");
  });
});

describe("roundToResolution", () => {
  // By hand: 103.33 / 2.5 = 41.3 steps → 41 steps below = 102.5, 42 above = 105, nearest 41 = 102.5.
  test.each([
    [103.33, 2.5, "below", 102.5],
    [103.33, 2.5, "above", 105],
    [103.33, 2.5, "nearest", 102.5],
    [104.75, 0.1, "below", 104.7],
    [300, 5, "below", 300],
    [0.3, 0.1, "below", 0.3], // 0.3 / 0.1 = 2.9999999999999996 in binary
  ] as const)("reads %d at steps of %d, %s, as %d", (value, step, towards, read) => {
    expect(roundToResolution(value, step, towards)).toBe(read);
  });

  test.each([
    [10, 0],
    [2.5, 1],
    [0.25, 2],
    [0.1, 1],
  ])("needs for steps of %d as many decimals as %i", (step, decimals) => {
    expect(decimalsOf(step)).toBe(decimals);
  });
});

describe("units", () => {
  test("are printed as the trade prints them", () => {
    expect([unitLabel("degC"), unitLabel("psi"), unitLabel("kt"), unitLabel("USgal"), unitLabel("degF/min")]).toEqual([
      "°C",
      "psi",
      "kt",
      "US gal",
      "°F/min",
    ]);
  });
  test("stand a thin space behind the figure", () => {
    expect(formatQuantity({ value: 30.5, unit: "inHg" })).toBe("30.5\u202finHg");
    expect(formatQuantity({ value: 0.5, unit: "1" })).toBe("0.5");
  });
  test("take the decimals of the gauge on the gauge", () => {
    expect(formatOnGauge(105, { unit: "degC", readable: 2.5 })).toBe("105\u202f°C");
    expect(formatOnGauge(102.5, { unit: "degC", readable: 2.5 })).toBe("102.5\u202f°C");
    expect(formatOnGauge(92, { unit: "degC", readable: 0.1 })).toBe("92.0\u202f°C");
    expect(formatOnGauge(305, { unit: "degF", readable: 5 })).toBe("305\u202f°F");
  });
  test("a band may lack an end", () => {
    expect(formatBand({ low: 75, high: 98, unit: "degC" })).toBe("75 to 98\u202f°C");
    expect(formatBand({ low: null, high: 20, unit: "degC" })).toBe("20\u202f°C or less");
    expect(formatBand({ low: 2.4, high: null, unit: "bar" })).toBe("2.4\u202fbar or more");
  });
  test("an unknown uncertainty says so", () => {
    expect(formatUncertainty(null)).toBe("U unknown");
    expect(formatUncertainty(3.162)).toBe("±3.2");
  });
});

describe("days and times", () => {
  test("are written in UTC whatever the machine's zone", () => {
    expect(formatDay("2026-12-04")).toBe("4 Dec 2026");
    expect(formatInstant("2031-05-04T23:59:59.000Z")).toBe("4 May 2031, 23:59\u202fUTC");
    expect(formatInstant("2031-05-05T01:30:00.000+02:00")).toBe("4 May 2031, 23:30\u202fUTC");
  });
  test("count minutes and seconds as a stopwatch does", () => {
    expect(formatStopwatch(190)).toBe("3:10");
    expect(formatStopwatch(59.6)).toBe("1:00");
    expect(formatMinutes(43)).toBe("43\u202fmin");
    expect(formatMinutes(65)).toBe("1\u202fh\u202f05");
  });
  test("count days across a leap day", () => {
    expect(daysBetween("2028-02-28", "2028-03-01")).toBe(2); // 2028 is a leap year
    expect(daysBetween("2026-12-04", "2026-12-01")).toBe(-3);
  });
});

test("lists and counts read as sentences", () => {
  expect(listAnd(["engineer", "pilot"])).toBe("engineer and pilot");
  expect([countOf(0, "sortie"), countOf(1, "sortie"), countOf(2, "sortie")]).toEqual(["no sorties", "1 sortie", "2 sorties"]);
});
