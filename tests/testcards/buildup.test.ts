import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { decideAfterFlight, decideStep, predictNext } from "@/lib/testcards/buildup";
import { studentT } from "@/lib/testcards/student-t";

// An invented series: power in %, coolant in °C by the logger (U 1.5), abort threshold 104.5 true.
const flown = [
  { level: 45, value: 85.0 },
  { level: 50, value: 88.4 },
  { level: 55, value: 91.7 },
  { level: 60, value: 95.3 },
];
const step = { results: flown, threshold: 104.5, side: "max", expandedUncertainty: 1.5, lastInBand: true } as const;

describe("studentT", () => {
  // NIST/SEMATECH e-Handbook 1.3.6.7.2, critical values of Student's t.
  test.each([
    [1, 12.706],
    [2, 4.303],
    [3, 3.182],
    [10, 2.228],
    [30, 2.042],
    [100, 1.984],
  ])("is the tabulated t(0.975) for %d degrees of freedom", (nu, expected) => {
    expect(studentT(0.95, nu)).toBeCloseTo(expected, 3);
  });

  test.each([
    [0.9, 5, 2.015],
    [0.99, 4, 4.604],
    [0.99, 16, 2.921],
    [0.5, 3, 0.765],
  ])("is the tabulated value at confidence %d for %d", (confidence, nu, expected) => {
    expect(studentT(confidence, nu)).toBeCloseTo(expected, 3);
  });

  // One degree of freedom is the Cauchy distribution: t = tan(π · confidence/2).
  test("is the Cauchy quantile for one degree of freedom", () => {
    expect(studentT(0.95, 1)).toBeCloseTo(Math.tan((Math.PI * 0.95) / 2), 9);
    expect(() => studentT(0.95, 0)).toThrow(RangeError);
    expect(() => studentT(0.95, 1.5)).toThrow(/whole number/);
    expect(() => studentT(1, 3)).toThrow(/confidence is 1/);
  });
});

describe("predictNext", () => {
  // Hand calculation: Sxx 125, slope 85.5/125 = 0.684, RSS 0.018, s 0.0949; h(65) = 4.303 · 0.0949 · √2.5 = 0.645; √(0.645² + 1.5²) = 1.63.
  test.each([
    [65, 1.5, 98.65, 1.6],
    [70, 1.5, 102.1, 1.7],
    [75, 1.5, 105.5, 1.8],
    [65, 3, 98.65, 3.1],
  ])("at %d %% with U %d gives %d ± %d", (level, expandedUncertainty, value, halfWidth) => {
    const next = predictNext(flown, level, { confidence: 0.95, expandedUncertainty });
    expect(Math.abs(next.value - value)).toBeLessThan(0.051);
    expect(Math.abs(next.high - next.value - halfWidth)).toBeLessThan(0.06);
    expect(next.value - next.low).toBeCloseTo(next.high - next.value, 9);
  });

  test("prints the band 97.0 to 100.3 for 65 %", () => {
    const next = predictNext(flown, 65, { confidence: 0.95, expandedUncertainty: 1.5 });
    expect(next.low).toBeCloseTo(97.0, 1);
    expect(next.high).toBeCloseTo(100.3, 1);
  });

  test("is exact on a straight line, and grows with distance", () => {
    const line = [1, 2, 3, 4].map((level) => ({ level, value: 10 + 2 * level }));
    const next = predictNext(line, 5, { confidence: 0.95 });
    expect(next.low).toBeCloseTo(20, 9);
    expect(next.high).toBeCloseTo(20, 9);
    const width = (level: number) => {
      const { low, high } = predictNext(flown, level, { confidence: 0.95 });
      return high - low;
    };
    expect(width(75)).toBeGreaterThan(width(65));
  });

  test("refuses fewer than three results, and one level only", () => {
    expect(() => predictNext(flown.slice(0, 2), 55, { confidence: 0.95 })).toThrow(/holds 2 values; it must hold at least 3/);
    expect(() =>
      predictNext(
        [1, 2, 3].map((value) => ({ level: 50, value })),
        55,
        { confidence: 0.95 },
      ),
    ).toThrow(/at least 2 different/);
  });
});

describe("decideStep", () => {
  test.each([
    ["65 % on the repeater", 65, step, "clear to next step"],
    ["70 %: inside, but a step of 10 after steps of 5", 70, step, "smaller step"],
    ["75 %: the centre is past the threshold", 75, step, "hold"],
    ["65 % on the panel gauge, threshold 101.5", 65, { ...step, expandedUncertainty: 3, threshold: 101.5 }, "smaller step"],
    ["70 % on the panel gauge", 70, { ...step, expandedUncertainty: 3, threshold: 101.5 }, "hold"],
    ["off prediction", 65, { ...step, lastInBand: false }, "hold"],
    ["two results", 55, { ...step, results: flown.slice(0, 2) }, "hold"],
    ["nothing flown", 45, { ...step, results: [] }, "hold"],
    ["an instrument whose U nobody knows", 65, { ...step, expandedUncertainty: null }, "hold"],
    ["three results at one level", 55, { ...step, results: [1, 2, 3].map((value) => ({ level: 50, value })) }, "hold"],
  ] as const)("decides %s", (_, nextLevel, input, decision) => {
    const decided = decideStep({ ...input, nextLevel });
    expect(decided.decision).toBe(decision);
    expect(decided.because.length).toBeGreaterThan(0);
  });

  test("says every ground for a hold", () => {
    const { because } = decideStep({ ...step, nextLevel: 75, lastInBand: false });
    expect(because.join("; ")).toMatch(/outside its own predicted band.*past the abort threshold 104.5.*step of 15/);
  });

  test("allows a step of exactly 1.5 times the largest earlier one", () => {
    expect(decideStep({ ...step, nextLevel: 67.5 }).decision).toBe("clear to next step");
    expect(decideStep({ ...step, nextLevel: 67.6 }).decision).toBe("smaller step");
  });

  test("mirrors for a minimum and for a series flown downwards in speed", () => {
    const mirrored = flown.map(({ level, value }) => ({ level: -level, value: -value }));
    for (const [level, decision] of [
      [-65, "clear to next step"],
      [-70, "smaller step"],
      [-75, "hold"],
    ] as const)
      expect(decideStep({ ...step, results: mirrored, nextLevel: level, threshold: -104.5, side: "min" }).decision).toBe(decision);
  });

  test("is never looser with a nearer threshold", () => {
    const rank = (decision: string) => ["clear to next step", "smaller step", "hold"].indexOf(decision);
    const figure = fc.double({ min: 60, max: 130, noNaN: true });
    fc.assert(
      fc.property(
        figure,
        fc.double({ min: 0, max: 20, noNaN: true }),
        fc.double({ min: 40, max: 90, noNaN: true }),
        (threshold, nearer, nextLevel) => {
          const far = decideStep({ ...step, threshold, nextLevel }).decision;
          expect(rank(decideStep({ ...step, threshold: threshold - nearer, nextLevel }).decision)).toBeGreaterThanOrEqual(rank(far));
        },
      ),
    );
  });

  test("refuses figures that are none", () => {
    expect(() => decideStep({ ...step, nextLevel: Number.NaN })).toThrow(/nextLevel is NaN/);
    expect(() => decideStep({ ...step, nextLevel: 65, expandedUncertainty: -1 })).toThrow(RangeError);
    expect(() => decideStep({ ...step, nextLevel: 65, results: [{ level: 1, value: Number.NaN }] })).toThrow(/results.value/);
  });
});

describe("decideAfterFlight", () => {
  const good = {
    start: "clear to next step",
    verdicts: ["within", "within"],
    disciplines: [null],
    dispositions: ["accept"],
    outcomes: ["flown"],
    groundingOpen: false,
    outsideExpected: false,
  } as const;

  test("lets the start stand where nothing is against it", () => {
    expect(decideAfterFlight(good).decision).toBe("clear to next step");
    expect(decideAfterFlight({ ...good, start: "smaller step" }).decision).toBe("smaller step");
    expect(decideAfterFlight({ ...good, start: "hold" })).toMatchObject({ decision: "hold" });
    expect(decideAfterFlight({ ...good, disciplines: ["called", "early"] }).decision).toBe("clear to next step");
  });

  test.each([
    ["an exceeded", { verdicts: ["within", "exceeded"] }],
    ["a no verdict", { verdicts: ["no verdict"] }],
    ["a missed abort", { disciplines: ["called", "missed"] }],
    ["a point broken off", { outcomes: ["flown", "part"] }],
    ["an outcome nobody gave", { outcomes: [null] }],
    ["a repeat", { dispositions: ["repeat"] }],
    ["a void", { dispositions: ["void"] }],
    ["an open grounding squawk", { groundingOpen: true }],
    ["a reading outside its band", { outsideExpected: true }],
    ["a marginal beside a hold", { verdicts: ["marginal", "no verdict"] }],
  ] as const)("holds for %s", (_, part) => {
    const decided = decideAfterFlight({ ...good, ...part });
    expect(decided.decision).toBe("hold");
    expect(decided.because).not.toEqual([]);
  });

  test("brings a marginal down to a smaller step, never up from a hold", () => {
    expect(decideAfterFlight({ ...good, verdicts: ["marginal", "within"] }).decision).toBe("smaller step");
    expect(decideAfterFlight({ ...good, start: "smaller step", verdicts: ["marginal"] }).decision).toBe("smaller step");
    expect(decideAfterFlight({ ...good, start: "hold", verdicts: ["marginal"] }).decision).toBe("hold");
  });

  test("refuses words that are not fixed", () => {
    expect(() => decideAfterFlight({ ...good, start: "go" as "hold" })).toThrow(/start is "go"/);
    expect(() => decideAfterFlight({ ...good, verdicts: ["pass" as "within"] })).toThrow(/verdicts is "pass"/);
  });
});
