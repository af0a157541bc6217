import { describe, expect, it } from "vitest";
import { reviewSortie } from "@/lib/testcards/readiness";
import { must, oneSortieFinding, plain } from "../support/one-finding";
import { climb, readyCard, readySortie, readySortieContext, shut } from "../support/ready-card";

describe("a sortie", () => {
  it("finds fuel short: 3 + 0.5 h × 28 + 7 + 15 + 4 = 43 L", () => {
    const found = oneSortieFinding("fuel-short", [climb()], ({ sortie }) => {
      sortie.fuelOnBoardL = 40;
    });
    expect(plain(found)).toBe("Fuel required 43 L exceeds fuel on board 40 L, short 3.0 L. Add fuel and re-check mass, or cut time.");
    expect(found[0]?.where).toEqual({ at: "sortie", field: "fuelOnBoardL" });
  });

  it("finds mass outside the envelope: 597.1 kg and 12 kg more", () => {
    const found = oneSortieFinding("mass-cg-outside", [climb()], ({ sortie }) => {
      must(sortie.crew[1]).massKg = 84; // 597.08 − 72 + 84 = 609.08 kg
    });
    expect(plain(found)).toContain("take-off 609.1 kg at");
    expect(plain(found)).toContain("Maximum mass 600 kg. Change the load.");
  });

  it("finds a seat loaded past its mark", () => {
    const found = oneSortieFinding("mass-cg-outside", [climb()], ({ sortie }) => {
      sortie.crew = [{ name: "C. Pilot", role: "pilot", massKg: 112 }];
    });
    expect(plain(found)).toBe("The seat of C. Pilot carries 112 of 110 kg allowed. Change the load.");
  });

  it("finds an acceptance that is missing, declined or of another content", () => {
    for (const acceptance of [
      null,
      { digest: "9f3c21b0", at: "2031-05-04T17:30:00Z", accepted: false },
      { digest: "other", at: "2031-05-04T17:30:00Z", accepted: true },
    ])
      oneSortieFinding("acceptance-missing", [climb()], ({ sortie }) => {
        must(sortie.cards[0]).acceptance = acceptance;
      });
  });

  it("asks for no acceptance of a card that is not released yet", () => {
    const sortie = readySortie();
    Object.assign(must(sortie.cards[0]), { state: "draft", acceptance: null });
    expect(reviewSortie(sortie, readySortieContext())).toEqual([]);
  });

  it("finds an acceptance older than 7 days, not one of 7", () => {
    oneSortieFinding("acceptance-stale", [climb()], ({ sortie }) => {
      must(must(sortie.cards[0]).acceptance).at = "2031-04-26T08:00:00Z"; // 8 days before 4 May
    });
    const sortie = readySortie();
    must(must(sortie.cards[0]).acceptance).at = "2031-04-27T23:00:00Z";
    expect(reviewSortie(sortie, readySortieContext())).toEqual([]);
  });

  it("finds a forecast more than 10 °C below the hot day of 37.3 °C at 350 ft", () => {
    const found = oneSortieFinding("far-from-hot-day", [climb()], ({ sortie }) => {
      sortie.forecastOatC = 27;
    });
    expect(plain(found)).toContain("Forecast 27 °C is 10.3 °C below the metric hot day of 37.3 °C at Harrow Fen.");
  });

  it("finds a day plan with a gap", () => {
    const found = oneSortieFinding("day-plan-missing", [climb()], ({ sortie }) => {
      sortie.dayPlan = { daylight: "", dutyTime: "8 h", runway: null };
    });
    expect(plain(found)).toBe("Daylight and runway are not stated. State them.");
  });

  it("finds two aboard for a COWL SHUT point in the air", () => {
    const one = [{ name: "C. Pilot", role: "pilot", massKg: 92 }];
    const found = oneSortieFinding(
      "crew-above-minimum",
      [shut()],
      ({ sortie }) => {
        sortie.crew = [...one, { name: "D. Observer", role: "observer", massKg: 72 }];
      },
      { crew: one },
    );
    expect(plain(found)).toBe(
      "2 people aboard for COWL SHUT in the air at Card 07 point 1, which carries the minimum crew of 1. Leave the others behind.",
    );
  });

  it("finds a prediction past the abort and more than twelve points in all", () => {
    const one = [{ name: "C. Pilot", role: "pilot", massKg: 92 }];
    oneSortieFinding(
      "prediction-past-abort",
      [shut()],
      ({ card }) => {
        must(must(card.content.points[0]).series).level.value = 75; // predicted 105.5 past 104.5
      },
      { crew: one },
    );
    const six = (from: number) => readyCard(Array.from({ length: 6 }, (_, i) => climb({ id: `p${from + i}`, durationMin: 3 })));
    const documents = [six(0), six(6), readyCard([climb({ id: "p12", durationMin: 3 })])];
    expect(reviewSortie(readySortie(documents), readySortieContext()).map((f) => f.message)).toEqual([
      "The sortie has 13 points, more than 12 a sortie. Split it.",
    ]);
  });

  it("says once what two cards share", () => {
    const documents = [readyCard([climb({ id: "a", durationMin: 3 })]), readyCard([climb({ id: "b", durationMin: 3 })])];
    for (const { programme } of documents) must(programme.instruments.find((i) => i.id === "TIT")).calibration = null;
    const found = reviewSortie(readySortie(documents), readySortieContext());
    expect(found.map((f) => f.code)).toEqual(["gauge-not-calibrated"]);
  });
});
