import { describe, expect, it } from "vitest";
import { reviewCard } from "@/lib/testcards/readiness";
import { must, oneFinding, plain } from "../support/one-finding";
import { climb, readyCard, readyContext, shut, soak } from "../support/ready-card";
import { numberAbort } from "../support/ready-programme";

/* Coolant gauge 100 → 101.5, 120 → 122.5 °C: 107.5 reads 101.5 + 7.5 × 1.05 = 109.375 true (hand calculation). */
describe("abort numbers against the card limit and the gauge", () => {
  it("finds an abort number that is past the card limit once turned back to true", () => {
    const found = oneFinding("abort-past-limit", [climb()], ({ point }) => {
      point.aborts.lines = [numberAbort("coolant", "COOLANT-PANEL", 109.4, 107.5, { id: "own", setBy: "gauge" })];
    });
    expect(plain(found)).toBe(
      "Point 1: coolant abort 107.5 °C on the gauge is 109.4 °C true, past the card limit 109 °C. Call it at 102.5 °C or lower.",
    );
    expect(found[0]?.where).toEqual({ at: "point", point: "climb", field: "aborts", item: "own" });
  });

  it("adds U and the point's own rate: the standing 102.5 is past the limit where coolant rises 6 °C a minute", () => {
    // 104.125 + 3.0 + 6 × 0.5 = 110.125 > 109; by the rule 109 − 6 = 103 → 101.43 → 100 (hand calculation).
    const found = oneFinding("abort-past-limit", [climb()], ({ point }) => {
      must(point.readings[1]).expectedRatePerMin = { value: 6, unit: "degC" };
    });
    expect(plain(found)).toContain(
      "is 104.1 °C true; with U 3 and 6 °C a minute for 30 s it reaches 110.1, past the card limit 109 °C. Call it at 100 °C or lower.",
    );
  });

  it("speaks of a wrong standing number once for the whole card", () => {
    const found = oneFinding("abort-past-limit", [climb(), climb({ id: "second" })], ({ card }) => {
      card.programme.standingAborts[0] = numberAbort("coolant", "COOLANT-PANEL", 107.3, 105.5, { setBy: "gauge", id: "abort-coolant" });
      card.programme.instruments.forEach((i) => {
        if (i.id === "COOLANT-PANEL") i.readable = 0.5;
      });
    });
    expect(found).toHaveLength(1);
    expect(found[0]?.where).toEqual({ at: "programme", field: "standingAborts" });
  });

  it("holds a minimum from below: oil pressure called at 35 leaves 32 against 33 psi", () => {
    const found = oneFinding("abort-past-limit", [climb()], ({ card }) => {
      card.programme.standingAborts[5] = numberAbort("oil-p", "OIL-P", 35, 35, { side: "min", appliesWhen: "at power", setBy: "gauge" });
    });
    expect(plain(found)).toContain("reaches 32, past the card limit 33 psi. Call it at 37.5 psi or higher.");
  });

  it("holds an abort on a rate: 45 °F in 60 s is 46.8 °F a minute true before any U", () => {
    // steepest slope 1.04: 45 × 1.04 = 46.8, and the limit is 26 °C/min = 46.8 °F/min; U takes it past.
    const line = numberAbort("cht", "CHT-PANEL", 23.6, 45, { id: "fall", perMinute: true, windowS: 60, setBy: "gauge" });
    const found = oneFinding("abort-past-limit", [climb()], ({ point }) => {
      point.aborts.lines = [line];
    });
    expect(plain(found)).toContain("Call it at 40 °F or lower.");
    const timeless = oneFinding("abort-past-limit", [climb()], ({ point }) => {
      point.aborts.lines = [numberAbort("cht", "CHT-PANEL", 23.6, 45, { perMinute: true, windowS: null })];
    });
    expect(plain(timeless)).toBe("Point 1: CHT abort 45 °F is a change without the time in which it is judged. State the seconds.");
  });

  it("stands still for a rate called at 40 °F in 60 s", () => {
    const line = numberAbort("cht", "CHT-PANEL", 23.6, 40, { id: "fall", perMinute: true, windowS: 60 });
    const card = readyCard([climb({ aborts: { standing: true, lines: [line], ifReached: false } })]);
    expect(reviewCard(card, readyContext())).toEqual([]);
  });

  it("finds a true value printed as a gauge number", () => {
    // 101.5 true reads 100 on the panel; printed as 101.5 it is 101.5 + 1.5 × 1.05 = 103.1 true.
    const found = oneFinding("gauge-true-mixed", [climb()], ({ point, card }) => {
      point.aborts.lines = [numberAbort("coolant", "COOLANT-PANEL", 101.5, 101.5, { id: "own" })];
      card.programme.instruments.forEach((i) => {
        if (i.id === "COOLANT-PANEL") i.readable = 0.5;
      });
    });
    expect(plain(found)).toContain("is 103.1 °C true, not 101.5");
  });

  it("finds an abort number outside the calibrated range", () => {
    const found = oneFinding("abort-off-table", [climb()], ({ card }) => {
      card.programme.instruments.forEach((i) => {
        if (i.id === "OIL-T" && i.calibration) i.calibration.high = 100;
      });
    });
    expect(plain(found)).toContain("OIL-T's calibrated range, 0 to 100 °C. Add a calibration point beyond it.");
  });

  it("finds an abort number between the marks a pilot can read", () => {
    const found = oneFinding("abort-not-on-mark", [climb()], ({ card }) => {
      card.programme.standingAborts[0] = numberAbort("coolant", "COOLANT-PANEL", 105, 102);
    });
    expect(plain(found)).toContain("readable to 2.5 °C. Round it to 100 °C.");
  });

  it("finds a point without abort criteria, and a safety parameter without a number", () => {
    oneFinding("abort-missing", [climb()], ({ point }) => {
      point.aborts = { standing: false, lines: [], ifReached: false };
    });
    const found = oneFinding("abort-missing", [climb()], ({ card }) => {
      card.programme.standingAborts.splice(2, 1);
    });
    expect(plain(found)).toBe("Point 1 reads Oil T but has no abort number for it. Add one.".replace("Oil T", "oil T"));
  });

  it("finds an abort on a display that the person who must call it cannot see", () => {
    const found = oneFinding("abort-not-visible", [soak()], ({ point }) => {
      const line = must(point.aborts.lines[1]);
      if (line.kind === "number") line.calledBy = "pilot";
    });
    expect(plain(found)).toContain("LOGGER-SKIN, which the pilot who must call it cannot see");
  });

  it("finds a normal range that reaches the abort number", () => {
    // 104.2 true reads 102.57 on the panel, prints 102.5 (hand calculation): the abort number itself.
    const found = oneFinding("normal-reaches-abort", [climb()], ({ card }) => {
      must(card.programme.parameters[0]).normal = { low: 75, high: 104.2, unit: "degC" };
    });
    expect(plain(found)).toContain("tops at 102.5 °C on the gauge, at or past the abort number 102.5 °C. Narrow it.");
  });

  it("finds an expected band and a prediction past the abort threshold", () => {
    oneFinding("prediction-past-abort", [climb()], ({ point }) => {
      must(point.readings[1]).expected = { low: 85, high: 104.5, unit: "degC" };
    });
    // Straight line through 85, 88.4, 91.7, 95.3 at 45 to 60: 90.1 + 0.684 (x − 52.5); at 67.5 it is 100.36, at 65 it is 98.65 (hand calculation).
    const found = oneFinding("prediction-past-abort", [shut()], ({ point }) => {
      point.aborts.lines = [numberAbort("coolant", "REPEATER", 98.5, 98.5, { id: "abort-shut", setBy: "gauge" })];
      must(point.readings[0]).expected = { low: 90, high: 98, unit: "degC" };
    });
    expect(plain(found)).toContain("coolant predicted 98.7 °C, past the abort threshold 98.5 °C. Do not release it; take a smaller step.");
  });
});
