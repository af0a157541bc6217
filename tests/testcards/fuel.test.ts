import { describe, expect, test } from "vitest";
import { fuelFlowFactor, fuelPlan } from "@/lib/testcards/fuel";

describe("fuelPlan", () => {
  // Hand calculation: 3 + 1.4 h · 25 + 9 + 0.75 h · 20 + 4 = 66 L against 60.
  test("adds up what is needed and says what is short", () => {
    const plan = fuelPlan({ taxi: 3, points: [{ durationMin: 84, flowPerH: 25 }], transit: 9, reserve: 15, unusable: 4, onBoard: 60 });
    expect(plan.required).toBeCloseTo(66, 9);
    expect(plan.inHand).toBeCloseTo(-6, 9);
  });

  // 0.75 h · 20 + 7 + 4 = 26 L; 25.2 L rounds up as well.
  test("rounds bingo up to a whole litre, and not beyond", () => {
    const plan = { taxi: 3, points: 20, transit: 7, reserve: 15, unusable: 4, onBoard: 64 };
    expect(fuelPlan(plan).bingo).toBe(26);
    expect(fuelPlan({ ...plan, transit: 6.2 }).bingo).toBe(26);
    expect(fuelPlan({ ...plan, reserve: 0.1 + 0.2, transit: 0.7, unusable: 0 }).bingo).toBe(1);
  });

  test("takes the points as one sum or one by one", () => {
    const rest = { taxi: 1, transit: 2, reserve: 3, unusable: 4, onBoard: 50 };
    const points = [
      { durationMin: 30, flowPerH: 28 },
      { durationMin: 15, flowPerH: 20 },
    ];
    expect(fuelPlan({ ...rest, points }).required).toBeCloseTo(fuelPlan({ ...rest, points: 19 }).required, 9);
  });

  test("refuses negative fuel, naming it", () => {
    const plan = { taxi: 3, points: 20, transit: 7, reserve: 15, unusable: 4, onBoard: 64 };
    expect(() => fuelPlan({ ...plan, reserve: -1 })).toThrow(/reserve is -1/);
    expect(() => fuelPlan({ ...plan, points: [{ durationMin: -5, flowPerH: 20 }] })).toThrow(/durationMin is -5/);
    expect(() => fuelPlan({ ...plan, onBoard: Number.NaN })).toThrow(/onBoard is NaN/);
  });
});

describe("fuelFlowFactor", () => {
  // 30.4/32.2 = 0.9441; 32.2/30.4 = 1.0592.
  test("corrects a meter that shows too little", () => {
    const corrected = fuelFlowFactor({ metered: 30.4, filled: 32.2, factor: 1 });
    expect(corrected.factor).toBeCloseTo(0.9441, 4);
    expect(corrected.trueOverShown).toBeCloseTo(1.0592, 4);
    expect(corrected.factor * corrected.trueOverShown).toBeCloseTo(1, 12);
  });

  test("scales the factor in use, and refuses an empty fill", () => {
    expect(fuelFlowFactor({ metered: 30, filled: 30, factor: 72.5 }).factor).toBe(72.5);
    expect(() => fuelFlowFactor({ metered: 30, filled: 0, factor: 1 })).toThrow(/filled is 0/);
  });
});
