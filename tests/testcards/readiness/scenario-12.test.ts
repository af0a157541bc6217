import { describe, expect, it } from "vitest";
import { planLoad } from "@/lib/testcards/card-plan";
import { reviewCard, reviewSortie } from "@/lib/testcards/readiness";
import { must } from "../support/one-finding";
import { climb, readyCard, readyContext, readySortie, readySortieContext, soak } from "../support/ready-card";
import { PROGRAMME } from "../support/ready-programme";

/* The programme's scenario of a release and a brief that are both refused: five findings at the card, three at the brief. */
describe("release and brief refused", () => {
  // Five points, the heat soak second; 1.4 h = 84 min at 25 L/h in all.
  const flown = (id: string, durationMin: number) => climb({ id, durationMin, fuelFlowLPerH: 25, objectives: ["O1"] });
  const points = [
    flown("p1", 21),
    soak({ id: "p2", durationMin: 20, fuelFlowLPerH: 25, order: "F4" }),
    flown("p3", 21),
    flown("p4", 11),
    flown("p5", 11),
  ];
  must(must(points[0]).entry[0]).instrument = "ASI-SPARE"; // 5-kt marks
  must(must(points[0]).entry[0]).tolerance = 1;
  must(points[2]).positions = [];

  const crew = [
    { name: "C. Pilot", role: "pilot", massKg: 92 },
    { name: "A. Engineer", role: "observer", massKg: 98 },
  ];
  const card = readyCard(points, { crew, baggageKg: 12, fuelOnBoardL: 60, bingoL: 28 });
  card.programme.fuelPlan = { taxiL: 3, returnL: 9, reserveL: 15 };
  must(card.programme.instruments.find((i) => i.id === "OAT")?.calibration).validUntil = "2031-05-02"; // 3 days before

  const mustCodes = (found: { code: string; severity: string }[]) =>
    [...new Set(found.filter((f) => f.severity === "must").map((f) => f.code))].sort();

  it("names five at the card", () => {
    const context = readyContext({ releaser: { id: "engineer", name: "A. Engineer", residualRisk: "Medium" } });
    const found = reviewCard(card, context);
    expect(mustCodes(found)).toEqual([
      "author-sole-releaser",
      "cowl-position-missing",
      "entry-finer-than-gauge",
      "gauge-not-calibrated",
      "stop-point-not-last",
    ]);
    expect(found.filter((f) => f.severity === "must")).toHaveLength(5);
    expect(found.find((f) => f.code === "cowl-position-missing")?.where).toMatchObject({ at: "point", point: "p3" });
  });

  it("names three at the brief, with short fuel of 6.0 L and 626.2 kg", () => {
    const sortie = readySortie([card], { crew, baggageKg: 12, fuelOnBoardL: 60 });
    Object.assign(must(sortie.cards[0]), { state: "in review", acceptance: null, releasedDigest: null });
    const found = reviewSortie(sortie, readySortieContext());
    expect(mustCodes(found)).toEqual(["fuel-short", "gauge-not-calibrated", "mass-cg-outside"]);
    expect(found.filter((f) => f.severity === "must")).toHaveLength(3);
    expect(found.find((f) => f.code === "fuel-short")?.message).toContain("short 6.0");
    expect(found.find((f) => f.code === "mass-cg-outside")?.message).toContain("626.2");
  });

  it("is inside the envelope without the engineer: 528.2 kg at 1.987 m, zero fuel 487.9 kg at 1.967 m", () => {
    const plan = planLoad(PROGRAMME, { kind: "flight", crew: crew.slice(0, 1), baggageKg: 12, fuelOnBoardL: 60, points: [] });
    expect(plan.takeOff?.massKg).toBeCloseTo(528.2, 1);
    expect(plan.takeOff?.cgM).toBeCloseTo(1.987, 3);
    expect(plan.takeOff?.inside).toBe(true);
    expect(plan.zeroFuel.massKg).toBeCloseTo(487.9, 1);
    expect(plan.zeroFuel.cgM).toBeCloseTo(1.967, 3);
    expect(plan.zeroFuel.inside).toBe(true);
  });
});
