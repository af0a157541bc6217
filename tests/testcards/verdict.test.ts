import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { abortDiscipline, groupSpread, judge, largestFall, peakToPeak, timeBeyond, worst } from "@/lib/testcards/verdict";
import { type Reason, VERDICTS } from "@/lib/testcards/words";

const max = (limit: number) => ({ side: "max" as const, limit });
const min = (limit: number) => ({ side: "min" as const, limit });
const read = (value: number, expandedUncertainty: number | null) => ({ value, expandedUncertainty });
const minutes = (values: number[], stepS = 60) => values.map((value, i) => ({ timeS: i * stepS, value }));

describe("judge", () => {
  // ILAC-G8:09/2019 4.2 with w = U; figures of the demo programme worked by hand.
  test.each([
    ["109.4, U 3.2 against 115", read(109.4, 3.2), max(115), "within", []],
    ["113.7, U 3.2 against 115", read(113.7, 3.2), max(115), "marginal", []],
    ["115.2, U 3.2 against 115", read(115.2, 3.2), max(115), "exceeded", ["by less than U"]],
    ["109.375, U 3 against the card's 109", read(109.375, 3), max(109), "exceeded", ["by less than U"]],
    ["27.5 %, U 1.25 against 25 %", read(27.5, 1.25), max(25), "exceeded", ["clearly"]],
    ["25.0 %, U 1.25 against 25 %", read(25, 1.25), max(25), "marginal", []],
    ["58 psi, U 3 against a minimum of 33", read(58, 3), min(33), "within", []],
    ["35 psi, U 3 against a minimum of 33", read(35, 3), min(33), "marginal", []],
    ["29 psi, U 3 against a minimum of 33", read(29, 3), min(33), "exceeded", ["clearly"]],
    ["3 tries, a count, against 3", read(3, 0), max(3), "within", []],
    ["4 tries, a count, against 3", read(4, 0), max(3), "exceeded", ["clearly"]],
  ] as const)("calls %s by the guard band", (_, reading, limit, verdict, notes) => {
    expect(judge(reading, limit)).toMatchObject({ verdict, notes, reasons: [], informationOnly: false });
  });

  test("lets equality pass, on the limit and on the guard band, with room for rounding only", () => {
    expect(judge(read(115, 0), max(115)).verdict).toBe("within");
    expect(judge(read(112, 3), max(115)).verdict).toBe("within");
    expect(judge(read(115 + 5e-10, 0), max(115)).verdict).toBe("within");
    expect(judge(read(115 + 2e-9, 0), max(115)).verdict).toBe("exceeded");
    expect(judge(read(0.1 + 0.2, 0), max(0.3)).verdict).toBe("within");
    expect(judge(read(118, 3), max(115)).notes).toEqual(["by less than U"]);
  });

  test("compares unrounded: 115.04 is past 115 though it prints 115.0", () => {
    expect(judge(read(115.04, 0), max(115)).verdict).toBe("exceeded");
  });

  test("gives the margin in hand, negative past the limit", () => {
    expect(judge(read(109.4, 3.2), max(115)).margin).toBeCloseTo(5.6, 9);
    expect(judge(read(29, 3), min(33)).margin).toBeCloseTo(-4, 9);
  });

  // JCGM 106:2012 7.3 and its examples: Φ(1.4), Φ(2.2907), Φ(2), Φ(0); u = U/2.
  test.each([
    ["Zener diode, upper -5.40 V", read(-5.47, 0.1), max(-5.4), 0.919243],
    ["lower 490 kPa", read(509.7, 17.2), min(490), 0.98901],
    ["upper 100, y 98.4, u 0.8", read(98.4, 1.6), max(100), 0.97725],
    ["on the limit", read(100, 1.6), max(100), 0.5],
    ["a count inside", read(3, 0), max(3), 1],
    ["a count past", read(4, 0), max(3), 0],
  ] as const)("gives the probability of being within: %s", (_, reading, limit, expected) => {
    expect(judge(reading, limit).probabilityWithin).toBeCloseTo(expected, 5);
  });

  test("notes a value outside its normal range, only beside within", () => {
    const normal = { low: 75, high: 98 };
    expect(judge(read(98.7, 3), max(109), { normal }).notes).toEqual(["above normal"]);
    expect(judge(read(74, 3), max(109), { normal }).notes).toEqual(["below normal"]);
    expect(judge(read(98, 3), max(109), { normal }).notes).toEqual([]);
    expect(judge(read(108, 3), max(109), { normal }).notes).toEqual([]);
    expect(judge(read(110, 3), max(109), { normal }).notes).toEqual(["by less than U"]);
    expect(judge(read(50, 3), max(109), { normal: { low: null, high: null } }).notes).toEqual([]);
  });

  test("withholds without a reading or a known U, and lists every reason in order", () => {
    expect(judge(null, max(115), { withheld: ["not calibrated"] })).toEqual({
      verdict: "no verdict",
      margin: null,
      probabilityWithin: null,
      notes: [],
      reasons: ["no reading", "not calibrated"],
      informationOnly: false,
    });
    const all: Reason[] = ["stopped early", "off condition", "not calibrated", "wrong configuration"];
    const judged = judge(read(100, null), max(115), { stage: "hot day", withheld: all });
    expect(judged.reasons).toEqual(["wrong configuration", "not calibrated", "uncertainty unknown", "off condition", "stopped early"]);
    expect(judged).toMatchObject({ verdict: "no verdict", margin: null, informationOnly: true });
  });

  test("is not talked out of an as-flown verdict by a short, unsteady or off-condition run", () => {
    const withheld: Reason[] = ["off condition", "not stabilised", "stopped early"];
    expect(judge(read(98.7, 3), max(109), { withheld })).toMatchObject({ verdict: "within", notes: [], reasons: [] });
    expect(judge(read(110, 3), max(109), { withheld })).toMatchObject({ verdict: "exceeded" });
  });

  test("lets a short run prove a failure on the hot day and never a pass", () => {
    const early = { stage: "hot day", withheld: ["stopped early"] } as const;
    expect(judge(read(112.4, 3.2), max(115), early)).toMatchObject({
      verdict: "no verdict",
      reasons: ["stopped early"],
      informationOnly: true,
    });
    expect(judge(read(116, 3.2), max(115), early)).toMatchObject({
      verdict: "exceeded",
      notes: ["by less than U", "stopped early"],
      reasons: [],
      informationOnly: false,
    });
    expect(judge(read(115, 3.2), max(115), early).verdict).toBe("no verdict");
  });

  test.each(["off condition", "wrong configuration"] as const)("never answers on the hot day with %s", (reason) => {
    const judged = judge(read(140, 3), max(115), { stage: "hot day", withheld: [reason, "stopped early"] });
    expect(judged).toMatchObject({ verdict: "no verdict", reasons: [reason, "stopped early"] });
  });

  test("withholds as flown in the wrong configuration, unless the limit is passed", () => {
    expect(judge(read(100, 3), max(115), { withheld: ["wrong configuration"] })).toMatchObject({
      verdict: "no verdict",
      reasons: ["wrong configuration"],
    });
    expect(judge(read(118, 1), max(115), { withheld: ["wrong configuration"] })).toMatchObject({
      verdict: "exceeded",
      notes: ["clearly", "wrong configuration"],
    });
  });

  test("calls an unknown U exceeded past the limit, with the reason as its note, and nothing else", () => {
    const past = judge(read(116, null), max(115));
    expect(past).toMatchObject({ verdict: "exceeded", notes: ["uncertainty unknown"], reasons: [], probabilityWithin: null });
    expect(past.margin).toBeCloseTo(-1, 9);
    expect(judge(read(60, null), max(115))).toMatchObject({
      verdict: "no verdict",
      reasons: ["uncertainty unknown"],
      informationOnly: true,
    });
    expect(judge(read(115, null), max(115)).verdict).toBe("no verdict");
  });

  // Gauge past 120: at least 122.5 − 3.0 = 119.5 true, past 115 and short of 120.
  test("takes a reading past the hot end of its table as proof only when its lower bound is past the limit", () => {
    const offTable = { withheld: ["outside calibrated range"], beyond: "high" } as const;
    expect(judge(read(122.5, 3), max(115), offTable)).toEqual({
      verdict: "exceeded",
      margin: null,
      probabilityWithin: null,
      notes: ["clearly", "outside calibrated range"],
      reasons: [],
      informationOnly: false,
    });
    expect(judge(read(122.5, 3), max(120), offTable)).toMatchObject({
      verdict: "no verdict",
      reasons: ["outside calibrated range"],
      informationOnly: false,
    });
    expect(judge(read(122.5, 3), max(119.5), offTable).verdict).toBe("no verdict");
    expect(judge(read(-4, 3), max(115), { ...offTable, beyond: "low" }).verdict).toBe("no verdict");
  });

  test("mirrors that at the cold end for a minimum, and takes no proof from the wrong end", () => {
    expect(judge(read(-4, 3), min(55), { withheld: ["outside calibrated range"], beyond: "low" }).verdict).toBe("exceeded");
    expect(judge(read(-4, 3), min(-2), { withheld: ["outside calibrated range"], beyond: "low" }).verdict).toBe("no verdict");
    expect(judge(read(40, 3), min(55), { withheld: ["outside calibrated range"], beyond: "high" }).verdict).toBe("no verdict");
  });

  test("never gets better as the reading moves towards the limit and past it", () => {
    const rank = (verdict: string) => ["within", "marginal", "exceeded"].indexOf(verdict);
    const figure = fc.double({ min: -1000, max: 1000, noNaN: true });
    fc.assert(
      fc.property(
        figure,
        figure,
        fc.double({ min: 0, max: 50, noNaN: true }),
        figure,
        fc.constantFrom<"max" | "min">("max", "min"),
        (x, step, u, limit, side) => {
          const nearer = side === "max" ? x + Math.abs(step) : x - Math.abs(step);
          const before = judge(read(x, u), { side, limit });
          const after = judge(read(nearer, u), { side, limit });
          expect(rank(after.verdict)).toBeGreaterThanOrEqual(rank(before.verdict));
          expect(after.probabilityWithin ?? 0).toBeLessThanOrEqual((before.probabilityWithin ?? 1) + 1e-12);
        },
      ),
    );
  });

  test("never gets better with a larger U or with anything withheld", () => {
    const rank = (verdict: string) => ["within", "marginal", "no verdict", "exceeded"].indexOf(verdict);
    const figure = fc.double({ min: -1000, max: 1000, noNaN: true });
    const u = fc.double({ min: 0, max: 50, noNaN: true });
    fc.assert(
      fc.property(figure, u, u, figure, (x, a, b, limit) => {
        expect(rank(judge(read(x, a + b), max(limit)).verdict)).toBeGreaterThanOrEqual(rank(judge(read(x, a), max(limit)).verdict));
        const held = judge(read(x, a), max(limit), { stage: "hot day", withheld: ["stopped early"] }).verdict;
        expect(["no verdict", "exceeded"]).toContain(held);
      }),
    );
  });

  test.each([Number.NaN, Number.POSITIVE_INFINITY])("refuses %d anywhere", (bad) => {
    expect(() => judge(read(bad, 1), max(1))).toThrow(/reading.value/);
    expect(() => judge(read(1, bad), max(1))).toThrow(/reading.expandedUncertainty/);
    expect(() => judge(read(1, 1), max(bad))).toThrow(/limit.limit/);
    expect(() => judge(read(0, 0), max(1), { normal: { high: bad } })).toThrow(/normal.high/);
  });

  test("refuses a negative U and words that are not fixed", () => {
    expect(() => judge(read(1, -1), max(1))).toThrow(RangeError);
    expect(() => judge(read(1, 1), { side: "top" as "max", limit: 1 })).toThrow(/side is "top"/);
    expect(() => judge(read(1, 1), max(1), { withheld: ["cloudy" as Reason] })).toThrow(/"cloudy"/);
  });
});

describe("worst", () => {
  test("puts exceeded before marginal, no verdict and within", () => {
    expect(worst([...VERDICTS])).toBe("exceeded");
    expect(worst(["within", "no verdict", "marginal"])).toBe("marginal");
    expect(worst(["within", "no verdict"])).toBe("no verdict");
    expect(worst(["within"])).toBe("within");
    expect(() => worst([])).toThrow(/verdicts holds 0 values/);
  });
});

describe("abortDiscipline", () => {
  test.each([
    ["reached exactly and called", 102.5, "max", true, "called"],
    ["passed without a call", 107.5, "max", false, "missed"],
    ["called below it", 100, "max", true, "early"],
    ["neither", 100, "max", false, null],
    ["a minimum reached without a call", 100, "min", false, "missed"],
    ["a minimum not reached", 105, "min", false, null],
    ["no number written, but called", null, "max", true, "called"],
    ["no number written, no call", null, "max", false, null],
  ] as const)("answers for: %s", (_, worstOnGauge, side, calledForThis, expected) => {
    expect(abortDiscipline({ worstOnGauge, threshold: 102.5, side, calledForThis })).toBe(expected);
  });
});

describe("timeBeyond", () => {
  // Straight lines: 2580 is passed half way up the first step (5 s) and half way down the last: 5 + 10 + 5 = 20 s.
  test("measures the longest stretch and the sum, between readings too", () => {
    const rpm = minutes([2570, 2590, 2590, 2570, 2570, 2600, 2570], 10);
    const beyond = timeBeyond(rpm, { side: "max", limit: 2580 });
    expect(beyond.longestS).toBeCloseTo(20, 9);
    // second peak: 20/30 of each 10 s step lies above 2580, 6.667 s twice
    expect(beyond.totalS).toBeCloseTo(20 + 40 / 3, 9);
  });

  test("does not count the limit itself, nor anything short of it", () => {
    expect(timeBeyond(minutes([10, 10, 10]), { side: "max", limit: 10 })).toEqual({ longestS: 0, totalS: 0 });
    expect(timeBeyond(minutes([12, 14, 12]), { side: "min", limit: 10 })).toEqual({ longestS: 0, totalS: 0 });
    expect(timeBeyond(minutes([8, 8]), { side: "min", limit: 10 })).toEqual({ longestS: 60, totalS: 60 });
  });

  test("joins what touches the limit only at a reading into two stretches", () => {
    expect(timeBeyond(minutes([12, 10, 12], 10), { side: "max", limit: 10 })).toEqual({ longestS: 10, totalS: 20 });
  });

  test("refuses one reading, which says nothing about time, and times that do not rise", () => {
    expect(() => timeBeyond([{ timeS: 0, value: 9 }], { side: "max", limit: 1 })).toThrow(/at least 2/);
    expect(() =>
      timeBeyond(
        [
          { timeS: 5, value: 1 },
          { timeS: 5, value: 1 },
        ],
        { side: "max", limit: 1 },
      ),
    ).toThrow(/times must rise/);
  });
});

describe("groupSpread", () => {
  // Hand calculation: mean (240 + 252 + 247 + 261)/4 = 250.
  test("says how far apart, which is hottest and how each lies to the mean", () => {
    const cylinders = [240, 252, 247, 261].map((value, i) => ({ id: `${i + 1}`, value }));
    expect(groupSpread(cylinders)).toEqual({
      spread: 21,
      mean: 250,
      highest: "4",
      lowest: "1",
      fromMean: [
        { id: "1", value: -10 },
        { id: "2", value: 2 },
        { id: "3", value: -3 },
        { id: "4", value: 11 },
      ],
    });
    expect(() => groupSpread(cylinders.slice(0, 1))).toThrow(/at least 2/);
  });
});

describe("largestFall and peakToPeak", () => {
  // 60 s windows on readings each 30 s: 250 -> 240 -> 215 -> 205: falls over 60 s are 35, 35; hand calculation.
  test("finds the fastest fall over any whole window", () => {
    const fall = largestFall(minutes([250, 250, 240, 215, 205, 200], 30), { windowS: 60 });
    expect(fall).toEqual({ perMin: 35, fromS: 30 });
  });

  test("looks between readings too: 60 s of a 90 s fall of 45 is 30", () => {
    expect(
      largestFall(
        [
          { timeS: 0, value: 100 },
          { timeS: 90, value: 55 },
        ],
        { windowS: 60 },
      ).perMin,
    ).toBeCloseTo(30, 9);
  });

  test("gives no fall for a rise, and refuses a record shorter than its window", () => {
    expect(largestFall(minutes([1, 2, 3]), { windowS: 60 })).toEqual({ perMin: 0, fromS: 0 });
    expect(() => largestFall(minutes([250, 200], 30), { windowS: 60 })).toThrow(/spans 30 s.*at least the window, 60 s/);
  });

  test("finds the largest swing inside a window, either way round", () => {
    const swing = minutes([86, 90, 84, 88, 82, 95]);
    expect(peakToPeak(swing, { windowS: 300 })).toBe(13);
    expect(peakToPeak(minutes([86, 90, 84, 88, 82, 82]), { windowS: 300 })).toBe(8); // 90 to 82
    expect(peakToPeak(minutes([86, 90, 84, 88, 82, 82]), { windowS: 60 })).toBe(6); // 90 to 84, 88 to 82
  });

  test("grows with the window and turns with the sign", () => {
    const values = fc.array(fc.double({ min: -100, max: 100, noNaN: true }), { minLength: 2, maxLength: 12 });
    fc.assert(
      fc.property(values, fc.integer({ min: 1, max: 400 }), fc.integer({ min: 0, max: 400 }), (list, windowS, more) => {
        const series = minutes(list, 30);
        const narrow = peakToPeak(series, { windowS });
        expect(peakToPeak(series, { windowS: windowS + more })).toBeGreaterThanOrEqual(narrow - 1e-9);
        expect(
          peakToPeak(
            minutes(
              list.map((v) => -v),
              30,
            ),
            { windowS },
          ),
        ).toBeCloseTo(narrow, 9);
        expect(narrow).toBeLessThanOrEqual(Math.max(...list) - Math.min(...list) + 1e-9);
      }),
    );
  });
});
