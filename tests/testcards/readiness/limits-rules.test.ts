import { describe, expect, it } from "vitest";
import type { PointLimit } from "@/lib/testcards/card";
import { must, oneFinding, plain } from "../support/one-finding";
import { climb } from "../support/ready-card";

const pointLimit = (over: Partial<PointLimit>): PointLimit => ({
  id: "own",
  reading: "cht",
  label: "CHT fall",
  side: "max",
  value: 46.8,
  unit: "degF/min",
  forS: 0,
  statistic: "rate",
  expandedUncertainty: null,
  source: "PL-01 rev 2",
  ...over,
});

describe("limits", () => {
  it("finds a card limit looser than its placard", () => {
    const found = oneFinding("card-limit-past-placard", [climb()], ({ card }) => {
      must(card.programme.limits.find((l) => l.id === "oil-p-max-always-instant-card")).value = 76;
    });
    expect(plain(found)).toBe("Oil P maximum: the card limit 76 psi is looser than the placard 75 psi. Bring it inside.");
    expect(found[0]?.where).toEqual({ at: "limit", limit: "oil-p-max-always-instant-card" });
  });

  it("compares layers across units and allows equality", () => {
    // 239 °F = 115 °C exactly.
    const found = oneFinding("card-limit-past-placard", [climb()], ({ card }) => {
      const limit = must(card.programme.limits.find((l) => l.id === "skin-max-always-instant-card"));
      limit.value = 222;
      limit.unit = "degF"; // 105.56 °C past 105 °C
    });
    expect(found).toHaveLength(1);
  });

  it("finds a minimum below the placard and a longer allowance", () => {
    oneFinding("card-limit-past-placard", [climb()], ({ card }) => {
      must(card.programme.limits.find((l) => l.id === "fuel-p-min-always-instant-card")).value = 2.3;
    });
    oneFinding("card-limit-past-placard", [climb()], ({ card }) => {
      must(card.programme.limits.find((l) => l.id === "rpm-max-at-power-instant-card")).forS = 360;
    });
  });

  it("finds a limit without a source or without its revision", () => {
    oneFinding("limit-no-source", [climb()], ({ card }) => {
      must(card.programme.limits[0]).source = "";
    });
    const found = oneFinding("limit-no-source", [climb()], ({ point }) => {
      point.limits = [pointLimit({ source: "PL-01" })];
    });
    expect(plain(found)).toBe('Point 1: the limit CHT fall names the source "PL-01" without its revision. Add both.');
  });

  it("finds a reading without a unit, or not in the gauge's own", () => {
    const found = oneFinding("unit-missing", [climb()], ({ point }) => {
      must(point.readings[2]).unit = "degC";
    });
    expect(plain(found)).toBe("Point 1: the reading cht is asked in °C, but CHT-PANEL shows °F. Use the unit on the panel.");
    oneFinding("unit-missing", [climb()], ({ point }) => {
      must(point.readings[0]).unit = null;
    });
    oneFinding("unit-missing", [climb()], ({ card }) => {
      must(card.programme.limits.find((l) => l.id === "fuel-p-min-always-instant-placard")).unit = "degC";
    });
  });

  it("finds a rate converted with the 32", () => {
    // 26 °C/min is 46.8 °F/min; with the 32 it would be 78.8.
    const found = oneFinding("delta-as-temperature", [climb()], ({ point }) => {
      point.limits = [pointLimit({ value: 78.8 })];
    });
    expect(plain(found)).toContain("is 26 °C of difference converted with the 32. Convert by 1.8 alone: 46.8 °F.");
  });

  it("finds an expected rate converted with the 32", () => {
    // Standard 4 °F a minute is 2.22 °C; with the 32 it is −15.56.
    oneFinding("delta-as-temperature", [climb()], ({ point }) => {
      must(point.readings[2]).expectedRatePerMin = { value: -15.56, unit: "degC" };
    });
  });
});
