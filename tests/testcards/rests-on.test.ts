import { describe, expect, it } from "vitest";
import type { ProgrammeSnapshot } from "@/lib/testcards/card";
import { broken, restsOn } from "@/lib/testcards/rests-on";
import { must } from "./support/one-finding";
import { climb, readyCard } from "./support/ready-card";

function fallenAfter(change: (programme: ProgrammeSnapshot) => void): { kind: string; id: string; why: string }[] {
  const card = readyCard();
  const now = structuredClone(card.programme);
  change(now);
  return broken(restsOn(card), now);
}
const gauge = (programme: ProgrammeSnapshot, id: string) => must(must(programme.instruments.find((i) => i.id === id)).calibration);

describe("what a release rests on", () => {
  it("lists the instruments used, every limit, the fuel plan, the configuration and the hazards named", () => {
    const rests = restsOn(readyCard([climb()]));
    expect(
      rests
        .filter((r) => r.kind === "calibration")
        .map((r) => r.id)
        .sort(),
    ).toEqual(["ASI", "CHT-PANEL", "COOLANT-PANEL", "IAT", "OAT", "OIL-P", "OIL-T", "TIT"]);
    expect(rests.filter((r) => r.kind === "limit")).toHaveLength(36);
    expect(rests.filter((r) => ["fuel plan", "configuration", "hazard"].includes(r.kind)).map((r) => r.id)).toEqual([
      "programme",
      "c-14",
      "H1",
    ]);
  });

  it("stands while nothing changes, and while something changes that the card does not use", () => {
    expect(fallenAfter(() => {})).toEqual([]);
    expect(
      fallenAfter((programme) => {
        gauge(programme, "REPEATER").expandedUncertainty = 9;
        programme.goNoGo = [];
        must(programme.configuration).gapsMeasuredOn = "2031-05-03";
      }),
    ).toEqual([]);
  });

  it("stands through a renewal within a tenth of U and falls past it: 0.30 of 3.0 °C", () => {
    const renew = (shift: number) => (programme: ProgrammeSnapshot) => {
      const c = gauge(programme, "COOLANT-PANEL");
      Object.assign(c, { id: "renewed", calibratedOn: "2031-05-04", validUntil: "2032-05-04" });
      if (c.kind === "points") must(c.points[3]).actual += shift;
    };
    expect(fallenAfter(renew(0.3))).toEqual([]);
    expect(fallenAfter(renew(0.31))).toEqual([
      { kind: "calibration", id: "COOLANT-PANEL", why: "COOLANT-PANEL: its correction changed by 0.31, more than a tenth of U" },
    ]);
  });

  it("falls with a smaller range, a larger U, a moved sensor or a lost calibration", () => {
    const ids = (change: (programme: ProgrammeSnapshot) => void) => fallenAfter(change).map((b) => b.id);
    expect(ids((p) => Object.assign(gauge(p, "OIL-T"), { high: 110 }))).toEqual(["OIL-T"]);
    expect(ids((p) => Object.assign(gauge(p, "OIL-T"), { expandedUncertainty: 4.1 }))).toEqual(["OIL-T"]);
    expect(ids((p) => Object.assign(gauge(p, "OIL-T"), { disturbedOn: "2031-05-04" }))).toEqual(["OIL-T"]);
    expect(ids((p) => Object.assign(must(p.instruments.find((i) => i.id === "OIL-T")), { calibration: null }))).toEqual(["OIL-T"]);
  });

  it("falls with a limit changed, removed or added, and with fuel, configuration or hazard", () => {
    const kinds = (change: (programme: ProgrammeSnapshot) => void) => fallenAfter(change).map((b) => b.kind);
    expect(kinds((p) => Object.assign(must(p.limits[0]), { value: 114 }))).toEqual(["limit"]);
    expect(kinds((p) => p.limits.pop())).toEqual(["limit"]);
    expect(kinds((p) => p.limits.push({ ...must(p.limits[0]), id: "new" }))).toEqual(["limit"]);
    expect(kinds((p) => Object.assign(p.fuelPlan, { reserveL: 20 }))).toEqual(["fuel plan"]);
    expect(kinds((p) => Object.assign(must(p.configuration), { massKg: 384 }))).toEqual(["configuration"]);
    expect(kinds((p) => Object.assign(must(p.configuration), { signedBy: null }))).toEqual(["configuration"]);
    expect(kinds((p) => Object.assign(must(p.hazards[0]), { after: { severity: 2, probability: "C" } }))).toEqual(["hazard"]);
  });
});
