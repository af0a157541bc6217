import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { standardAtmosphere } from "@/lib/testcards/atmosphere";
import {
  heatSoak,
  highest,
  hotDayTemperature,
  peak,
  rate,
  STABILISED_PER_MIN,
  slopeOf,
  steadySince,
  steadyState,
  testComplete,
  windowToResolve,
} from "@/lib/testcards/cooling";
import { convert, convertDifference } from "@/lib/testcards/units";

const ft = (value: number) => convert(value, "ft", "m");
const kelvin = (value: number) => convert(value, "degC", "K");
const celsius = (value: number) => convert(value, "K", "degC");
const minutes = (values: number[], stepS = 60, fromS = 0) => values.map((value, i) => ({ timeS: fromS + i * stepS, value }));

type Case = [string, number, number, number, number, "plus-one" | "barrel" | "ratio", "us" | "metric", number, number];

describe("hotDayTemperature", () => {
  // 14 CFR 23.1043(b),(c); AC 23-8C section 23.1047 as quoted on a builders' forum: 400 °F at 4,000 ft, 75 °F -> 410.6 °F. Others by hand.
  test.each([
    ["the worked example of AC 23-8C, a cylinder head", 400, 75, 4000, "plus-one", 410.6],
    ["oil 205 °F at 8,000 ft, 50 °F", 205, 50, 8000, "plus-one", 226.2],
    ["a barrel 300 °F at 5,000 ft, 60 °F", 300, 60, 5000, "barrel", 315.4],
    ["coolant 230 °F at sea level on the hot day itself", 230, 100, 0, "plus-one", 230.0],
  ] as const)("carries %s to the us hot day", (_, measuredF, ambientF, altitudeFt, rule, expectedF) => {
    const hot = hotDayTemperature({
      measuredK: convert(measuredF, "degF", "K"),
      ambientK: convert(ambientF, "degF", "K"),
      pressureAltitudeM: ft(altitudeFt),
      rule,
      basis: "us",
    });
    expect(convert(hot.hotDayK, "K", "degF")).toBeCloseTo(expectedF, 6);
  });

  // Hand calculation: T + k(T_hot − T_amb), kelvin ratio for induction air; U = √(U_T² + (k·1.0)²) or r√(U_T² + (T/T_amb)²). OAT U 1.0.
  test.each<Case>([
    ["S1 coolant", 93.0625, 21, 350, 3, "plus-one", "metric", 109.4, 3.2],
    ["S1 heads", 124.556, 21, 350, 3.3333, "plus-one", "metric", 140.9, 3.5],
    ["S1 oil", 85, 21, 350, 4, "plus-one", "metric", 101.3, 4.1],
    ["S1 induction air", 41, 21, 350, 2, "ratio", "metric", 58.4, 2.4],
    ["S1 induction air, plus-one instead", 41, 21, 350, 2, "plus-one", "metric", 57.3, 2.2],
    ["S2 coolant", 109.375, 33, 350, 3, "plus-one", "metric", 113.7, 3.2],
    ["S2 coolant, us", 109.375, 33, 350, 3, "plus-one", "us", 113.5, 3.2],
    ["S3 soak, logger", 101.4167, 22, 350, 1.5, "plus-one", "metric", 116.7, 1.8],
    ["S4 coolant, metric", 95.875, 7, 5900, 3, "plus-one", "metric", 115.2, 3.2],
    ["S4 coolant, us", 95.875, 7, 5900, 3, "plus-one", "us", 114.9, 3.2],
    ["S4 induction air", 35, 7, 5900, 2, "ratio", "metric", 56.2, 2.4],
    ["S5 coolant", 98.6875, 14, 5200, 3, "plus-one", "metric", 112.4, 3.2],
    ["S6 coolant", 104.125, 22, 3100, 3, "plus-one", "metric", 114.0, 3.2],
    ["a barrel", 131, 12, 3000, 4, "barrel", "metric", 145.0, 4.1],
    ["induction air at 3,000 ft", 48, 18, 3000, 2, "ratio", "metric", 63.5, 2.4],
  ])("carries %s to the hot day", (_, measuredC, ambientC, altitudeFt, u, rule, basis, expected, expectedU) => {
    const hot = hotDayTemperature({
      measuredK: kelvin(measuredC),
      ambientK: kelvin(ambientC),
      pressureAltitudeM: ft(altitudeFt),
      rule,
      basis,
      expandedUncertaintyK: u,
      ambientUncertaintyK: 1,
    });
    expect(celsius(hot.hotDayK)).toBeCloseTo(expected, 1);
    expect(hot.expandedUncertaintyK).toBeCloseTo(expectedU, 1);
    expect(hot.clamped).toBe(false);
  });

  test("subtracts nothing on a day hotter than the hot day, and says so", () => {
    const hotter = { measuredK: 380, ambientK: kelvin(41), pressureAltitudeM: 0, basis: "metric" } as const;
    for (const rule of ["plus-one", "barrel", "ratio"] as const) {
      const hot = hotDayTemperature({ ...hotter, rule });
      expect(hot.hotDayK).toBe(380);
      expect(hot.clamped).toBe(true);
      expect(hot.differenceK).toBeCloseTo(-3, 9);
    }
    expect(hotDayTemperature({ ...hotter, rule: "none" })).toMatchObject({ hotDayK: 380, clamped: false });
  });

  test("leaves U out where a part of it is not known", () => {
    const input = { measuredK: 380, ambientK: 290, pressureAltitudeM: 0, rule: "plus-one", basis: "us" } as const;
    expect(hotDayTemperature({ ...input, expandedUncertaintyK: 3 })).not.toHaveProperty("expandedUncertaintyK");
    expect(hotDayTemperature({ ...input, ambientUncertaintyK: 1 })).not.toHaveProperty("expandedUncertaintyK");
    expect(hotDayTemperature({ ...input, rule: "none", expandedUncertaintyK: 3 }).expandedUncertaintyK).toBe(3);
  });

  test("is never below what was measured, nor better known", () => {
    const inputs = fc.record({
      measuredK: fc.double({ min: 250, max: 1300, noNaN: true }),
      ambientK: fc.double({ min: 230, max: 325, noNaN: true }),
      pressureAltitudeM: fc.double({ min: -500, max: 6000, noNaN: true }),
      rule: fc.constantFrom("plus-one" as const, "barrel" as const, "ratio" as const, "none" as const),
      basis: fc.constantFrom("us" as const, "metric" as const),
      expandedUncertaintyK: fc.double({ min: 0, max: 20, noNaN: true }),
      ambientUncertaintyK: fc.double({ min: 0, max: 5, noNaN: true }),
    });
    fc.assert(
      fc.property(inputs, (input) => {
        const hot = hotDayTemperature(input);
        expect(hot.hotDayK).toBeGreaterThanOrEqual(input.measuredK);
        expect(hot.expandedUncertaintyK ?? 0).toBeGreaterThanOrEqual(input.expandedUncertaintyK - 1e-12);
      }),
    );
  });

  test("refuses degrees given for kelvins, and a negative U", () => {
    const input = { measuredK: 380, ambientK: 290, pressureAltitudeM: 0, rule: "plus-one", basis: "us" } as const;
    expect(() => hotDayTemperature({ ...input, measuredK: 93 })).toThrow(/measuredK is 93/);
    expect(() => hotDayTemperature({ ...input, ambientK: 21 })).toThrow(/ambientK is 21/);
    expect(() => hotDayTemperature({ ...input, expandedUncertaintyK: -1 })).toThrow(RangeError);
    expect(() => hotDayTemperature({ ...input, rule: "double" as "none" })).toThrow(/rule is "double"/);
  });
});

describe("rate and steadySince", () => {
  // Hand calculation: y = 1, 3, 2, 5 at 0..3 min: slope 1.1/min, RSS 2.7, se √(1.35/5) = 0.5196.
  test("fits the last window by least squares", () => {
    const fit = rate(minutes([9, 1, 3, 2, 5], 60, -60), { windowS: 180 });
    expect(fit.perS * 60).toBeCloseTo(1.1, 9);
    expect(fit.expandedUncertaintyPerS * 60).toBeCloseTo(2 * 0.519615, 5);
  });

  test("keeps to whole readings that reach back over the window, though they come a little early", () => {
    const early = [0, 59, 118, 177, 236, 295, 354].map((timeS) => ({ timeS, value: timeS / 60 }));
    expect(rate(early, { windowS: 300 }).perS * 60).toBeCloseTo(1, 9);
    expect(slopeOf(early.slice(1), { windowS: 300 })).toBeNull();
  });

  test("refuses a window that is not filled", () => {
    expect(() => rate(minutes([1, 2, 3]), { windowS: 300 })).toThrow(/spans 120 s/);
    expect(() => rate(minutes([1, 2]), { windowS: 60 })).toThrow(/at least 3/);
  });

  // 14 CFR 25.1045(a): less than 2 °F a minute, 1.11 °C; U_slope must stay under half, 0.556.
  test("is the 2 °F of 25.1045(a)", () => {
    expect(STABILISED_PER_MIN).toBeCloseTo(convertDifference(2, "degF", "degC"), 12);
    expect(STABILISED_PER_MIN).toBeCloseTo(1.11, 2);
  });

  // 2 · readable/√6/window < 0.556: 5 min at 2.5 · 1.125, 5 min at 5 °F · 1.04, 8 min at 5, 2 min on a logger.
  test.each([
    ["the coolant panel", 2.5 * 1.125, 5],
    ["the head panel", (5 * 1.04) / 1.8, 5],
    ["the oil gauge", 5, 8],
    ["a logger", 0.1, 2],
  ])("needs a window long enough for %s", (_, readableTrue, expected) => {
    expect(windowToResolve({ readableTrue })).toBe(expected * 60);
  });

  const panel = { perMinute: STABILISED_PER_MIN, windowS: 300, readingUncertainty: 2.5 * 1.125 };
  const ground = [70, 78, 84, 88, 90.25, 91.5, 92, 92.5, 93.0625, 93.0625, 93.0625, 93.0625, 93.0625, 93.0625];

  test("finds since when, in the unbroken run to the end", () => {
    const since = steadySince(minutes(ground), panel);
    expect(since).not.toBeNull();
    expect(steadySince(minutes(ground.slice(8), 60, 480), panel)).toBe(480);
    expect(steadySince(minutes([...ground, 96, 100, 104]), panel)).toBeNull();
  });

  test("is not steady on three equal readings of a dial that cannot show the slope", () => {
    expect(steadySince(minutes(ground.slice(-3)), { ...panel, windowS: 120 })).toBeNull();
    expect(steadySince(minutes(ground.slice(-3)), { ...panel, windowS: 120, readingUncertainty: 0.1 })).toBe(0);
  });

  test("is not steady at the limit itself, nor where scatter hides the slope", () => {
    expect(steadySince(minutes([0, 1, 2, 3]), { perMinute: 1, windowS: 180 })).toBeNull();
    expect(steadySince(minutes([0, 0.99, 1.98, 2.97]), { perMinute: 1, windowS: 180 })).toBe(0);
    expect(steadySince(minutes([90, 93, 90, 93, 90, 93]), { perMinute: 1.11, windowS: 300 })).toBeNull();
  });
});

describe("highest and peak", () => {
  // Parabola by hand: 96.8, 98.2, 98.0 at 3, 4, 5 min -> 98.3 at 4.4 min; 100.6, 101.4, 101.0 -> 101.4 at 4.2; 90.5, 91.6, 91.2 -> 91.6 at 2.2.
  test.each([
    ["three readings", minutes([96.8, 98.2, 98.0], 60, 180), 98.3, 4.4],
    ["a soak with the exit shut", minutes([88.0, 93.5, 97.9, 100.6, 101.4, 101.0]), 101.4, 4.2],
    ["a soak with the exit open", minutes([88.0, 90.5, 91.6, 91.2]), 91.6, 2.2],
  ])("finds the peak between %s", (_, series, value, minute) => {
    expect(peak(series).value).toBeCloseTo(value, 1);
    expect(peak(series).timeS / 60).toBeCloseTo(minute, 1);
  });

  // y = 100 − (t − 2.3)² sampled at uneven times has its peak at 2.3, 100.
  test("is exact on a parabola, evenly sampled or not", () => {
    const parabola = [0, 1.5, 2.2, 4].map((t) => ({ timeS: t, value: 100 - (t - 2.3) ** 2 }));
    expect(peak(parabola).timeS).toBeCloseTo(2.3, 9);
    expect(peak(parabola).value).toBeCloseTo(100, 9);
  });

  test("answers the reading itself where no peak was seen, and the first of equals", () => {
    expect(peak(minutes([88, 90, 92]))).toEqual({ timeS: 120, value: 92 });
    expect(peak(minutes([92]))).toEqual({ timeS: 0, value: 92 });
    expect(highest(minutes([90, 92, 92, 91]))).toEqual({ timeS: 60, value: 92 });
    expect(() => highest([])).toThrow(/series holds 0 values/);
  });

  test("lies no lower than the highest reading and between its neighbours", () => {
    fc.assert(
      fc.property(fc.array(fc.double({ min: 0, max: 200, noNaN: true }), { minLength: 1, maxLength: 12 }), (values) => {
        const series = minutes(values);
        const top = highest(series);
        const found = peak(series);
        expect(found.value).toBeGreaterThanOrEqual(top.value - 1e-9);
        expect(Math.abs(found.timeS - top.timeS)).toBeLessThanOrEqual(30 + 1e-6);
      }),
    );
  });
});

describe("testComplete", () => {
  const coolant = { readableTrue: 2.5 * 1.125 };
  const six = minutes([93.0625, 93.0625, 93.0625, 93.0625, 93.0625, 93.0625], 60, 480);

  test("asks a stabilised run for a window in which the dial can show the slope", () => {
    expect(testComplete(six, "stabilised", coolant)).toBeNull();
    expect(testComplete(six.slice(3), "stabilised", coolant)).toBe("not stabilised");
    expect(testComplete(six.slice(3), "stabilised", { readableTrue: 0.1 })).toBeNull();
    expect(testComplete(minutes(Array(9).fill(85)), "stabilised", { readableTrue: 5 })).toBeNull();
    expect(testComplete(minutes(Array(8).fill(85)), "stabilised", { readableTrue: 5 })).toBe("not stabilised");
    expect(testComplete(minutes([80, 83, 86, 89, 92, 95]), "stabilised", coolant)).toBe("not stabilised");
  });

  test("takes a limit in another unit: 2 °F a minute for a series in °F", () => {
    const heads = minutes([256.2, 256.2, 256.2, 256.2, 256.2, 256.2]);
    expect(testComplete(heads, "stabilised", { readableTrue: 5.2, perMinute: 2 })).toBeNull();
    expect(() => testComplete(heads, "stabilised", { windowS: 60 })).toThrow(/windowS is 60/);
  });

  // CS 22.1047(a): five minutes past the highest; 14 CFR 23.1043(a)(4): the whole climb for which the turbocharger is used.
  test("asks a climb for five minutes past the first highest and for the critical altitude", () => {
    const climb = (afterS: number) => [
      { timeS: 0, value: 90 },
      { timeS: 600, value: 98 },
      { timeS: 660, value: 98 },
      { timeS: 600 + afterS, value: 97 },
    ];
    const critical = { criticalAltitudeM: ft(9000) };
    expect(testComplete(climb(320), "5 min past peak", { ...critical, topAltitudeM: ft(10_100) })).toBeNull();
    expect(testComplete(climb(300), "5 min past peak", { ...critical, topAltitudeM: ft(9000) })).toBeNull();
    expect(testComplete(climb(190), "5 min past peak", { ...critical, topAltitudeM: ft(10_100) })).toBe("stopped early");
    expect(testComplete(climb(320), "5 min past peak", { ...critical, topAltitudeM: ft(8900) })).toBe("stopped early");
    expect(testComplete(climb(320), "5 min past peak", { ...critical, topAltitudeM: null })).toBe("stopped early");
    expect(testComplete(climb(320), "5 min past peak", { criticalAltitudeM: null })).toBeNull();
    expect(testComplete(climb(320), "5 min past peak")).toBeNull();
  });

  test("takes how long the point ran where it is given, and never a peak at the end", () => {
    expect(testComplete([{ timeS: 600, value: 98 }], "5 min past peak", { ranForS: 920 })).toBeNull();
    expect(testComplete([{ timeS: 600, value: 98 }], "5 min past peak", { ranForS: 790 })).toBe("stopped early");
    expect(testComplete(minutes([80, 85, 90, 95]), "5 min past peak")).toBe("stopped early");
  });

  test("asks a whole run for its written time, and a soak for its time past the peak", () => {
    expect(testComplete(minutes([90, 100]), "whole run", { runS: 900, ranForS: 900 })).toBeNull();
    expect(testComplete(minutes([90, 100]), "whole run", { runS: 900, ranForS: 899 })).toBe("stopped early");
    expect(testComplete(minutes([90, 100, 90]), "whole run", { pastPeakS: 600, ranForS: 660 })).toBeNull();
    expect(testComplete(minutes([90, 100, 90]), "whole run", { pastPeakS: 600, ranForS: 650 })).toBe("stopped early");
    expect(testComplete(minutes([90, 100, 90]), "whole run", { ranForS: 10_000 })).toBe("stopped early");
  });

  test("never completes a point whose rule is none, and refuses what is no rule", () => {
    expect(testComplete(six, "none", { ranForS: 10_000 })).toBe("stopped early");
    expect(() => testComplete(six, "until tired" as "none")).toThrow(/rule is "until tired"/);
    expect(() => testComplete([], "whole run", { runS: 1 })).toThrow(RangeError);
    expect(() => testComplete(six, "whole run", { runS: -1 })).toThrow(/runS is -1/);
  });
});

describe("heatSoak", () => {
  // 12 min/ln((91.6 − 22)/(76 − 22)) = 12/ln(1.28889) = 47.3 min.
  test("gives peak, rise, time to peak and the time constant of cooling down", () => {
    const soak = heatSoak([...minutes([88.0, 90.5, 91.6, 91.2]), { timeS: 120 + 720, value: 76 }], { ambientK: 22 });
    expect(soak.shutdown).toBe(88);
    expect(soak.peak).toBeCloseTo(91.6, 1);
    expect(soak.rise).toBeCloseTo(3.6408, 3); // 91.6 + (91.2 − 90.5)²/(8 · 1.5) − 88
    expect(soak.timeToPeakS / 60).toBeCloseTo(2.2, 1);
    expect((soak.coolDownTimeConstantS ?? 0) / 60).toBeCloseTo(47.3, 1);
  });

  test("has no time constant without an ambient, before any fall, or at ambient", () => {
    expect(heatSoak(minutes([88, 90, 89])).coolDownTimeConstantS).toBeNull();
    expect(heatSoak(minutes([88, 90, 92]), { ambientK: 22 }).coolDownTimeConstantS).toBeNull();
    expect(heatSoak(minutes([88, 90, 20]), { ambientK: 22 }).coolDownTimeConstantS).toBeNull();
  });

  test("counts from the shutdown, wherever the clock stood", () => {
    expect(heatSoak(minutes([88, 93.5, 97.9, 100.6, 101.4, 101.0], 60, 5000)).timeToPeakS).toBeCloseTo(250, 6);
  });
});

describe("steadyState", () => {
  // (86 · 95.2 − 91.8²)/(86 + 95.2 − 2 · 91.8) = 240.04/2.4 = 100.0; 2 min/ln(5.8/3.4) = 3.74 min.
  test("extrapolates three equally spaced readings", () => {
    const estimate = steadyState(86, 91.8, 95.2, 120);
    expect(estimate.final).toBeCloseTo(100.0, 1);
    expect(estimate.timeConstantS / 60).toBeCloseTo(3.7, 1);
  });

  test("returns the end of an exact first-order rise or fall", () => {
    const at = (t: number) => 100 - 60 * Math.exp(-t / 200);
    expect(steadyState(at(0), at(90), at(180), 90).final).toBeCloseTo(100, 9);
    expect(steadyState(-at(0), -at(90), -at(180), 90).timeConstantS).toBeCloseTo(200, 7);
  });

  test.each([
    ["differences that grow", 80, 82, 86],
    ["differences that stay", 80, 82, 84],
    ["a turn", 80, 84, 83],
    ["no change", 80, 80, 80],
  ])("refuses %s", (_, a, b, c) => {
    expect(() => steadyState(a, b, c, 60)).toThrow(RangeError);
  });
});

test("the standard day is always colder than the hot day where an engine is tested", () => {
  for (const altitudeFt of [0, 3000, 9000, 20_000]) {
    const ambientK = standardAtmosphere(ft(altitudeFt)).temperatureK;
    const hot = hotDayTemperature({ measuredK: 370, ambientK, pressureAltitudeM: ft(altitudeFt), rule: "plus-one", basis: "metric" });
    expect(hot.differenceK).toBeGreaterThan(20);
  }
});
