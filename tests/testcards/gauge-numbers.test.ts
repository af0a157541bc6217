import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { gaugeAbort, gaugeLimit, gaugeRateAbort, roundToReadable } from "@/lib/testcards/calibration";
import { convertDifference } from "@/lib/testcards/units";
import { CHT_PANEL, COOLANT_PANEL, readsTrue } from "./support/gauges";

describe("what prints for the pilot", () => {
  const coolant = { calibration: COOLANT_PANEL, readable: 2.5 };
  const cht = { calibration: CHT_PANEL, readable: 5 };

  // Hand calculation: 100 + (109 − 101.5)/1.05 = 107.143, mark at or below 105; true 122.5 -> 120.
  test.each([
    ["placard 115", { limit: 115, side: "max", ...coolant }, 112.857, 112.5],
    ["card 109", { limit: 109, side: "max", ...coolant }, 107.143, 105],
    ["normal from 75", { limit: 75, side: "min", ...coolant }, 76.235, 77.5],
    ["normal to 98", { limit: 98, side: "max", ...coolant }, 96.889, 95],
    ["head placard 329 °F", { limit: 329, side: "max", ...cht }, 325, 325],
    ["head card 311 °F", { limit: 311, side: "max", ...cht }, 307.692, 305],
    ["head normal from 203 °F", { limit: 203, side: "min", ...cht }, 203.846, 205],
    ["head normal to 284 °F", { limit: 284, side: "max", ...cht }, 281.731, 280],
  ] as const)("turns %s to the gauge and rounds it inward", (_, input, onGauge, printed) => {
    const line = gaugeLimit(input);
    expect(line.onGauge).toBeCloseTo(onGauge, 3);
    expect(line.printed).toBe(printed);
    expect(line.inRange).toBe(true);
  });

  // limit ∓ (U + rate · 0.5 min), then through the table and to the mark on the cautious side.
  test.each([
    ["coolant", { cardLimit: 109, side: "max", expandedUncertainty: 3, ratePerMin: 2, ...coolant }, 105, 103.333, 102.5],
    [
      "coolant that heats at 6 a minute",
      { cardLimit: 109, side: "max", expandedUncertainty: 3, ratePerMin: 6, ...coolant },
      103,
      101.429,
      100,
    ],
    [
      "coolant that heats at 4 a minute",
      { cardLimit: 109, side: "max", expandedUncertainty: 3, ratePerMin: 4, ...coolant },
      104,
      102.381,
      100,
    ],
    ["coolant for take-off", { cardLimit: 55, side: "min", expandedUncertainty: 3, ratePerMin: 0, ...coolant }, 58, 60.235, 62.5],
    ["heads, °F", { cardLimit: 311, side: "max", expandedUncertainty: 6, ratePerMin: 4, ...cht }, 303, 300, 300],
    ["heads that heat at 10 a minute", { cardLimit: 311, side: "max", expandedUncertainty: 6, ratePerMin: 10, ...cht }, 300, 297.115, 295],
    [
      "oil temperature",
      { cardLimit: 118, side: "max", expandedUncertainty: 4, ratePerMin: 2, calibration: readsTrue(0, 130, 4), readable: 5 },
      113,
      113,
      110,
    ],
    [
      "oil for full power",
      { cardLimit: 50, side: "min", expandedUncertainty: 4, ratePerMin: 0, calibration: readsTrue(0, 130, 4), readable: 5 },
      54,
      54,
      55,
    ],
    [
      "turbine inlet",
      { cardLimit: 880, side: "max", expandedUncertainty: 10, ratePerMin: 10, calibration: readsTrue(500, 950, 10), readable: 10 },
      865,
      865,
      860,
    ],
    [
      "induction air",
      { cardLimit: 60, side: "max", expandedUncertainty: 2, ratePerMin: 2, calibration: readsTrue(0, 80, 2), readable: 2.5 },
      57,
      57,
      55,
    ],
    [
      "low oil pressure",
      { cardLimit: 33, side: "min", expandedUncertainty: 3, ratePerMin: 0, calibration: readsTrue(0, 110, 3), readable: 2.5 },
      36,
      36,
      37.5,
    ],
    [
      "idle oil pressure",
      { cardLimit: 15, side: "min", expandedUncertainty: 3, ratePerMin: 0, calibration: readsTrue(0, 110, 3), readable: 2.5 },
      18,
      18,
      20,
    ],
    [
      "high oil pressure",
      { cardLimit: 72, side: "max", expandedUncertainty: 3, ratePerMin: 0, calibration: readsTrue(0, 110, 3), readable: 2.5 },
      69,
      69,
      67.5,
    ],
    [
      "low fuel pressure",
      { cardLimit: 2.6, side: "min", expandedUncertainty: 0.1, ratePerMin: 0, calibration: readsTrue(2, 3.8, 0.1), readable: 0.1 },
      2.7,
      2.7,
      2.7,
    ],
    [
      "logger coolant",
      { cardLimit: 109, side: "max", expandedUncertainty: 1.5, ratePerMin: 6, calibration: readsTrue(0, 125, 1.5), readable: 0.1 },
      104.5,
      104.5,
      104.5,
    ],
    [
      "logger soak",
      { cardLimit: 109, side: "max", expandedUncertainty: 1.5, ratePerMin: 5.5, calibration: readsTrue(0, 125, 1.5), readable: 0.1 },
      104.75,
      104.75,
      104.7,
    ],
    [
      "cowl skin",
      { cardLimit: 98, side: "max", expandedUncertainty: 3, ratePerMin: 6, calibration: readsTrue(0, 120, 3), readable: 0.1 },
      92,
      92,
      92,
    ],
    [
      "fuel line in the soak",
      { cardLimit: 52, side: "max", expandedUncertainty: 2, ratePerMin: 2.5, calibration: readsTrue(0, 70, 2), readable: 0.1 },
      48.75,
      48.75,
      48.7,
    ],
    [
      "fuel line",
      { cardLimit: 52, side: "max", expandedUncertainty: 2, ratePerMin: 1, calibration: readsTrue(0, 70, 2), readable: 0.1 },
      49.5,
      49.5,
      49.5,
    ],
  ] as const)("draws the abort number of %s in, turns it to the gauge and rounds it", (_, input, trueValue, onGauge, printed) => {
    const abort = gaugeAbort({ reactionMin: 0.5, ...input });
    expect(abort.trueValue).toBeCloseTo(trueValue, 9);
    expect(abort.onGauge).toBeCloseTo(onGauge, 3);
    expect(abort.printed).toBe(printed);
    expect(abort.inRange).toBe(true);
  });

  test("turns the printed number back to true: 102.5 on this gauge is 104.1", () => {
    const abort = gaugeAbort({ cardLimit: 109, side: "max", expandedUncertainty: 3, ratePerMin: 2, reactionMin: 0.5, ...coolant });
    expect(abort.printedTrue).toBeCloseTo(104.125, 9); // 101.5 + 1.05 · 2.5
  });

  test("says where the gauge was not proved at the threshold", () => {
    const abort = { side: "max", expandedUncertainty: 3, ratePerMin: 0, reactionMin: 0.5, ...coolant } as const;
    expect(gaugeAbort({ ...abort, cardLimit: 130 })).toMatchObject({ inRange: false });
    expect(gaugeAbort({ ...abort, cardLimit: 125 }).inRange).toBe(true); // 122 true is 119.5 on the gauge
    const low = { cardLimit: 2, expandedUncertainty: 0, ratePerMin: 0, reactionMin: 0, side: "max", readable: 2.5 } as const;
    // 2.1 reads 2.1, the mark below is 0, where this gauge was not proved.
    expect(gaugeAbort({ ...low, calibration: readsTrue(1, 10, 1) })).toMatchObject({ printed: 0, inRange: false });
  });

  // 26 − 2.5 = 23.5 °C/min is 42.3 °F in 60 s; 42.3/1.04 = 40.673, mark at or below 40.
  test("prints a rate as a change on the gauge over its window", () => {
    const cardRatePerMin = convertDifference(26, "degC", "degF");
    const expandedUncertaintyPerMin = convertDifference(2.5, "degC", "degF");
    const fall = gaugeRateAbort({
      cardRatePerMin,
      expandedUncertaintyPerMin,
      readable: 5,
      windowMin: 1,
      atReading: 250,
      calibration: CHT_PANEL,
    });
    expect(fall.changeOnGauge).toBeCloseTo(40.673, 3);
    expect(fall.printed).toBe(40);
  });

  test("refuses a rate smaller than its own uncertainty, or than the dial can show, or watched off the table", () => {
    const rate = {
      cardRatePerMin: 46.8,
      expandedUncertaintyPerMin: 4.5,
      readable: 5,
      windowMin: 1,
      atReading: 250,
      calibration: CHT_PANEL,
    };
    expect(() => gaugeRateAbort({ ...rate, expandedUncertaintyPerMin: 50 })).toThrow(RangeError);
    expect(() => gaugeRateAbort({ ...rate, readable: 50 })).toThrow(/readable is 50/);
    expect(() => gaugeRateAbort({ ...rate, atReading: 400 })).toThrow(/atReading is 400/);
    expect(() => gaugeRateAbort({ ...rate, windowMin: 0 })).toThrow(RangeError);
  });

  test("prints an abort never past the limit, however the table bends", () => {
    const figures = fc.record({
      cardLimit: fc.double({ min: 20, max: 120, noNaN: true }),
      expandedUncertainty: fc.double({ min: 0, max: 5, noNaN: true }),
      ratePerMin: fc.double({ min: 0, max: 8, noNaN: true }),
      reactionMin: fc.double({ min: 0, max: 1, noNaN: true }),
      readable: fc.constantFrom(0.1, 0.5, 1, 2.5, 5),
      side: fc.constantFrom<"max" | "min">("max", "min"),
    });
    fc.assert(
      fc.property(figures, (input) => {
        const abort = gaugeAbort({ ...input, calibration: COOLANT_PANEL });
        if (!abort.inRange) return;
        const drawnIn = input.expandedUncertainty + input.ratePerMin * input.reactionMin;
        const lost = input.side === "max" ? abort.printedTrue + drawnIn - input.cardLimit : input.cardLimit - (abort.printedTrue - drawnIn);
        expect(lost).toBeLessThanOrEqual(1.2e-6); // a mark within 0.000001 counts as on it
        expect(Math.abs(abort.printed - abort.onGauge)).toBeLessThan(input.readable + 1e-6);
      }),
    );
  });

  test("puts a value within 0.000001 of a mark on the mark", () => {
    expect(roundToReadable(102.4999995, 2.5, "max")).toBe(102.5);
    expect(roundToReadable(102.499998, 2.5, "max")).toBe(100);
    expect(roundToReadable(60.0000005, 2.5, "min")).toBe(60);
    expect(roundToReadable(60.000002, 2.5, "min")).toBe(62.5);
    expect(roundToReadable(-4.1, 2.5, "max")).toBe(-5);
    expect(Object.is(roundToReadable(-0.5, 2.5, "min"), 0)).toBe(true);
    expect(() => roundToReadable(10, 0, "max")).toThrow(/readable is 0/);
    expect(() => roundToReadable(10, 1, "both" as "max")).toThrow(/side is "both"/);
  });
});
