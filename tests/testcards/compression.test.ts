import { describe, expect, test } from "vitest";
import { leakage, spread } from "@/lib/testcards/compression";
import { judge } from "@/lib/testcards/verdict";

describe("leakage", () => {
  // AC 43.13-1B para 8-14: regulator at 80 psi; (80 − held)/80 by hand.
  test.each([
    [78, 0.025],
    [77, 0.0375],
    [76, 0.05],
    [72, 0.1],
    [60, 0.25],
    [58, 0.275],
    [80, 0],
    [0, 1],
  ])("holding %d of 80 loses %d", (heldPa, lost) => {
    expect(leakage({ referencePa: 80, heldPa })).toBeCloseTo(lost, 12);
  });

  // "In excess of 25 %": 60/80 is not more than 25 %, though a gauge of 1 psi (1.25 %) cannot say so for certain.
  test("of 60/80 is marginal and of 58/80 exceeded", () => {
    const percent = (heldPa: number) => ({ value: 100 * leakage({ referencePa: 80, heldPa }), expandedUncertainty: 1.25 });
    expect(judge(percent(60), { side: "max", limit: 25 }).verdict).toBe("marginal");
    expect(judge(percent(58), { side: "max", limit: 25 })).toMatchObject({ verdict: "exceeded", notes: ["clearly"] });
    expect(judge(percent(77), { side: "max", limit: 25 }).verdict).toBe("within");
  });

  test("refuses a cylinder that holds more than it is given, as a cranking test would", () => {
    expect(() => leakage({ referencePa: 80, heldPa: 110 })).toThrow(/heldPa is 110; it must be from 0 to 80/);
    expect(() => leakage({ referencePa: 0, heldPa: 0 })).toThrow(/referencePa is 0/);
  });
});

describe("spread", () => {
  test.each([
    ["the baseline", [77, 78, 76, 77], 78, 76, 2],
    ["after the climb", [77, 78, 58, 76], 78, 58, 20],
  ])("of %s", (_, values, top, bottom, difference) => {
    expect(spread(values)).toEqual({ highest: top, lowest: bottom, spread: difference, fractionOfHighest: difference / top });
  });

  test("refuses one cylinder, and none that holds", () => {
    expect(() => spread([77])).toThrow(/values holds 1 values/);
    expect(() => spread([0, 0])).toThrow(/the highest of values is 0/);
    expect(() => spread([77, Number.NaN])).toThrow(RangeError);
  });
});
