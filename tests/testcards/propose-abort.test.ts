import { describe, expect, it } from "vitest";
import type { CardPoint } from "@/lib/testcards/card";
import { proposeAbort, proposeRateAbort } from "@/lib/testcards/propose-abort";
import type { Unit } from "@/lib/testcards/units";
import type { LimitCondition, Side } from "@/lib/testcards/words";
import { climb, readingOf, readyCard } from "./support/ready-card";

type Case = [
  gauge: string,
  parameter: string,
  side: Side,
  when: LimitCondition,
  ownRate: [number, Unit] | null,
  trueValue: number,
  printed: number,
];

/* Hand calculation for each: card limit less (for a minimum: plus) U and rate × 0.5 min, through the gauge's table, to the next readable mark. */
const CASES: Case[] = [
  ["COOLANT-PANEL", "coolant", "max", "always", null, 105, 102.5], // 109 − 3.0 − 2 × 0.5 = 105 → 103.33
  ["COOLANT-PANEL", "coolant", "max", "always", [6, "degC"], 103, 100], // 109 − 3.0 − 3 = 103 → 101.43
  ["COOLANT-PANEL", "coolant", "max", "always", [4, "degC"], 104, 100], // 109 − 3.0 − 2 = 104 → 102.38
  ["COOLANT-PANEL", "coolant", "min", "take-off", null, 58, 62.5], // 55 + 3.0 = 58 → 60.24
  ["CHT-PANEL", "cht", "max", "always", null, 150.56, 300], // 311 − 6 − 4 × 0.5 = 303 °F → 300
  ["CHT-PANEL", "cht", "max", "always", [10, "degF"], 148.89, 295], // 311 − 6 − 5 = 300 °F → 297.1
  ["OIL-T", "oil-t", "max", "always", null, 113, 110], // 118 − 4 − 1
  ["OIL-T", "oil-t", "min", "full power", null, 54, 55], // 50 + 4
  ["TIT", "tit", "max", "always", null, 865, 860], // 880 − 10 − 5
  ["IAT", "iat", "max", "always", null, 57, 55], // 60 − 2 − 1
  ["OIL-P", "oil-p", "min", "at power", null, 36, 37.5], // 33 + 3
  ["OIL-P", "oil-p", "min", "idle", null, 18, 20], // 15 + 3
  ["OIL-P", "oil-p", "max", "always", null, 69, 67.5], // 72 − 3
  ["FUEL-P", "fuel-p", "min", "always", null, 2.7, 2.7], // 2.6 + 0.1
  ["REPEATER", "coolant", "max", "always", [6, "degC"], 104.5, 104.5], // 109 − 1.5 − 3
  ["REPEATER", "coolant", "max", "always", [5.5, "degC"], 104.75, 104.7], // 109 − 1.5 − 2.75
  ["LOGGER-SKIN", "skin", "max", "always", [6, "degC"], 92, 92], // 98 − 3 − 3
  ["LOGGER-LINE", "line", "max", "always", [2.5, "degC"], 48.75, 48.7], // 52 − 2 − 1.25
  ["LOGGER-LINE", "line", "max", "always", [1, "degC"], 49.5, 49.5], // 52 − 2 − 0.5
];

const withRate = (parameter: string, rate: [number, Unit] | null): CardPoint =>
  climb({ readings: [readingOf(parameter, { expectedRatePerMin: rate && { value: rate[0], unit: rate[1] } })] });

describe("the abort number by the rule", () => {
  it.each(CASES)(
    "proposes for %s %s %s (%s, own rate %j) %d true, %d on the gauge",
    (gauge, parameter, side, when, rate, trueValue, printed) => {
      const point = withRate(parameter, rate);
      const proposal = proposeAbort(readyCard([point]), point, parameter, side, gauge, when);
      expect(proposal?.trueValue).toBeCloseTo(trueValue, 2);
      expect(proposal?.onGauge).toBeCloseTo(printed, 9);
      expect(proposal?.inRange).toBe(true);
    },
  );

  it("takes the widest row where nobody says when: the oil pressure minimum at power", () => {
    const point = climb();
    expect(proposeAbort(readyCard([point]), point, "oil-p", "min", "OIL-P")?.onGauge).toBe(37.5);
  });

  it("takes a point's own limit and its own U where that is tighter: 30 kt less 2 is 28", () => {
    const point = climb({
      readings: [readingOf("ias", { instrument: "ASI", unit: "kt" })],
      limits: [
        {
          id: "l",
          reading: "ias",
          label: "IAS",
          side: "max",
          value: 30,
          unit: "kt",
          forS: 0,
          statistic: "instant",
          expandedUncertainty: 2,
          source: "PL-01 rev 2",
        },
      ],
    });
    expect(proposeAbort(readyCard([point]), point, "ias", "max", "ASI")?.onGauge).toBe(28);
  });

  it("proposes nothing without a limit, a calibration or its U, and says when the gauge was not proved there", () => {
    const point = climb();
    const card = readyCard([point]);
    expect(proposeAbort(card, point, "oat", "max", "OAT")).toBeNull();
    const gauge = card.programme.instruments.find((i) => i.id === "COOLANT-PANEL");
    if (gauge?.calibration) gauge.calibration.high = 100;
    expect(proposeAbort(card, point, "coolant", "max", "COOLANT-PANEL")?.inRange).toBe(false);
    if (gauge?.calibration) gauge.calibration.expandedUncertainty = null;
    expect(proposeAbort(card, point, "coolant", "max", "COOLANT-PANEL")).toBeNull();
    if (gauge) gauge.calibration = null;
    expect(proposeAbort(card, point, "coolant", "max", "COOLANT-PANEL")).toBeNull();
  });

  it("proposes 40 °F in 60 s for a fall of 26 °C a minute", () => {
    // 26 °C/min = 46.8 °F/min; U = 2 × 5/√6 × 1.04 = 4.25; (46.8 − 4.25)/1.04 = 40.9 → 40 on a dial readable to 5.
    // The threshold itself, 42.55 °F a minute, is 42.55/1.8 = 23.64 °C a minute: a difference, without the 32.
    const point = climb();
    const proposal = proposeRateAbort(readyCard([point]), point, "cht", "max", "CHT-PANEL", 60);
    expect(proposal?.onGauge).toBe(40);
    expect(proposal?.trueValue).toBeCloseTo(23.64, 2);
    // Over 6 s the dial cannot show it: 4.68 °F less 42 of U.
    expect(proposeRateAbort(readyCard([point]), point, "cht", "max", "CHT-PANEL", 6)).toBeNull();
  });
});
