import { describe, expect, it } from "vitest";
import { planCard } from "@/lib/testcards/card-plan";
import { climb, readyCard } from "./support/ready-card";

describe("the plan of a card", () => {
  it("gives the cover of card 07: 597.1 kg, CG 2.000 m, bingo 26 L", () => {
    // 381 + 92 + 72 + 6 + 64 × 0.72 = 597.08 kg; moment 721.995 + 352.6 + 16.8 + 102.758 = 1194.153 kg·m (hand calculation).
    const plan = planCard(readyCard());
    expect(plan.takeOff?.massKg).toBeCloseTo(597.08, 6);
    expect(plan.takeOff?.cgM).toBeCloseTo(2.0, 3);
    expect(plan.takeOff?.inside).toBe(true);
    expect(plan.bingoL).toBe(26); // 15 + 7 + 4
    expect(plan.fuelRequiredL).toBeCloseTo(43, 9); // 3 + 14 + 7 + 15 + 4
    expect(plan.minutes).toBe(32); // 30 and 2 to reset
  });

  it("burns taxi, points and return before landing: 64 − 24 = 40 L", () => {
    const plan = planCard(readyCard());
    expect(plan.landing?.massKg).toBeCloseTo(381 + 92 + 72 + 6 + 40 * 0.72, 6);
    expect(plan.zeroFuel.massKg).toBeCloseTo(381 + 92 + 72 + 6 + 4 * 0.72, 6);
  });

  it("asks no return and no reserve of a run on the ground, and no mass without fuel on board", () => {
    const card = readyCard([climb({ place: "ground" })], { fuelOnBoardL: null });
    const plan = planCard(card);
    expect(plan.fuelRequiredL).toBeCloseTo(21, 9); // 3 + 14 + 4
    expect(plan.takeOff).toBeNull();
    expect(plan.landing).toBeNull();
  });

  it("adds the programme's own minutes where it states them", () => {
    const card = readyCard();
    card.programme.fuelPlan = { ...card.programme.fuelPlan, taxiMin: 8, returnMin: 10 };
    expect(planCard(card).minutes).toBe(50);
  });
});
