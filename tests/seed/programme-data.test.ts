import { describe, expect, test } from "vitest";
import { gaugeFromTrueRate } from "@/components/builder/gauge-both-ways";
import { HAZARDS } from "@/db/seed/hazards";
import { INSTRUMENTS } from "@/db/seed/instruments";
import { LIMITS } from "@/db/seed/limits";
import { OBJECTIVES } from "@/db/seed/objectives";
import { NOTICE, SETTINGS } from "@/db/seed/settings";
import { calibratedInstruments, demoSnapshot } from "@/db/seed/snapshot";
import { TEST_POINTS } from "@/db/seed/test-points/shelf";
import { B612_WIDTHS } from "@/lib/testcards/b612-widths";
import { gaugeLimit, roundToReadable } from "@/lib/testcards/calibration";
import type { CardPoint } from "@/lib/testcards/card";
import { planCard } from "@/lib/testcards/card-plan";
import { proposeAbort, proposeRateAbort } from "@/lib/testcards/propose-abort";
import { reviewCard } from "@/lib/testcards/readiness";
import type { CardContext } from "@/lib/testcards/readiness-types";
import { riskLevel } from "@/lib/testcards/risk";
import { convert, type Unit } from "@/lib/testcards/units";
import { cardPoint } from "@/lib/workflow/card/point-schema";
import { cardOfOne } from "../support/card-of-one";

const DAY = "2031-05-09";
const programme = demoSnapshot(DAY);
const codeOf = (point: CardPoint) => point.template?.code ?? "";
const named = (code: string) => TEST_POINTS.find((point) => codeOf(point) === code) as CardPoint;
const instrumentNamed = (name: string) => {
  const found = programme.instruments.find((instrument) => instrument.name === name);
  if (!found?.calibration) throw new Error(name);
  return { ...found, calibration: found.calibration };
};

const alone = (point: CardPoint) => cardOfOne(programme, point, DAY);

describe("the numbers on the gauge", () => {
  // Programme table of limits: true -> gauge -> printed to a readable mark on the cautious side (hand interpolation in the tables).
  test.each<[string, number, Unit, "max" | "min", number]>([
    ["COOLANT-PANEL", 115, "degC", "max", 112.5],
    ["COOLANT-PANEL", 109, "degC", "max", 105],
    ["COOLANT-PANEL", 75, "degC", "min", 77.5],
    ["COOLANT-PANEL", 98, "degC", "max", 95],
    ["CHT-PANEL", 165, "degC", "max", 325],
    ["CHT-PANEL", 155, "degC", "max", 305],
    ["CHT-PANEL", 95, "degC", "min", 205],
    ["CHT-PANEL", 140, "degC", "max", 280],
    ["OIL-T", 125, "degC", "max", 125],
    ["OIL-T", 118, "degC", "max", 115],
    ["TIT", 880, "degC", "max", 880],
    ["IAT", 60, "degC", "max", 60],
    ["OIL-P", 33, "psi", "min", 35],
    ["OIL-P", 72, "psi", "max", 70],
    ["FUEL-P", 2.6, "bar", "min", 2.6],
    ["LOGGER-SKIN", 98, "degC", "max", 98],
    ["LOGGER-LINE", 52, "degC", "max", 52],
  ])("%s shows %d %s (%s) as %d", (name, value, unit, side, printed) => {
    const { calibration, readable, unit: gaugeUnit } = instrumentNamed(name);
    const limit = convert(value, unit, gaugeUnit);
    expect(gaugeLimit({ limit, side, calibration, readable }).printed).toBeCloseTo(printed, 9);
  });

  // Card limit less U less rate × 0.5 min, turned to the gauge and rounded to the safe side: worked by hand in the limits list.
  test.each<[string, string, "max" | "min", string, number, "full power" | "at power" | "always"]>([
    ["T10", "coolant", "max", "COOLANT-PANEL", 102.5, "always"],
    ["T10", "cht", "max", "CHT-PANEL", 300, "always"],
    ["T10", "oil-t", "max", "OIL-T", 110, "always"],
    ["T10", "tit", "max", "TIT", 860, "always"],
    ["T10", "iat", "max", "IAT", 55, "always"],
    ["T10", "oil-p", "min", "OIL-P", 37.5, "at power"],
    ["T12", "coolant", "max", "COOLANT-PANEL", 100, "always"],
    ["T12", "cht", "max", "CHT-PANEL", 295, "always"],
    ["T13", "coolant", "max", "COOLANT-REPEATER", 104.5, "always"],
    ["T13", "coolant", "max", "COOLANT-PANEL", 100, "always"],
    ["T02", "coolant", "max", "COOLANT-REPEATER", 104.7, "always"],
    ["T03", "skin", "max", "LOGGER-SKIN", 92, "always"],
    ["T03", "line", "max", "LOGGER-LINE", 48.7, "always"],
    ["T26", "line", "max", "LOGGER-LINE", 49.5, "always"],
    ["T26", "fuel-p", "min", "FUEL-P", 2.7, "always"],
    ["T16", "oil-t", "min", "OIL-T", 55, "full power"],
    ["T16", "oil-p", "max", "OIL-P", 67.5, "always"],
    ["T07", "ias", "max", "ASI", 28, "always"],
  ])("%s calls %s (%s) on %s at %d", (code, parameter, side, name, printed, when) => {
    const point = named(code);
    const proposal = proposeAbort(alone(point), point, parameter, side, instrumentNamed(name).id, when);
    expect(proposal?.onGauge).toBeCloseTo(printed, 9);
  });

  // 26 °C/min less U 2.5 is 23.5 °C/min = 42.3 °F in 60 s; over a slope of 1.04 that is 40.67 °F: 40 prints.
  test("a fall of CHT is called at 40 °F in 60 s, which is the mark below 23.5 °C a minute", () => {
    const point = named("T15");
    const gauge = instrumentNamed("CHT-PANEL");
    const line = point.aborts.lines.find((each) => each.kind === "number");
    expect(line).toMatchObject({ parameter: "cht", perMinute: true, windowS: 60, trueValue: 23.5, onGauge: 40, setBy: "true" });
    const onGauge = gaugeFromTrueRate(23.5, "degC", 60, gauge) ?? Number.NaN;
    expect(onGauge).toBeCloseTo(40.673, 3);
    expect(roundToReadable(onGauge, gauge.readable, "max")).toBe(40);
    expect(proposeRateAbort(alone(point), point, "cht", "max", gauge.id, 60)?.onGauge).toBe(40);
  });

  test("every abort number that the rule set is the rule's own, its true threshold too", () => {
    const lines = TEST_POINTS.flatMap((point) =>
      [...point.aborts.lines, ...(codeOf(point) === "T10" ? SETTINGS.standingAborts : [])].map((line) => ({ point, line })),
    );
    for (const { point, line } of lines) {
      if (line.kind !== "number" || line.setBy !== "rule" || line.perMinute) continue;
      const proposal = proposeAbort(alone(point), point, line.parameter, line.side, line.instrument, line.appliesWhen);
      const where = `${codeOf(point)} ${line.parameter}`;
      expect(proposal?.onGauge, where).toBeCloseTo(line.onGauge, 9);
      expect(proposal?.trueValue, where).toBeCloseTo(line.trueValue, 9);
    }
  });
});

describe("the shelf", () => {
  const context: CardContext = {
    today: DAY,
    currentConfiguration: { id: programme.configuration?.id ?? "", number: "C-14", signed: true },
    releaser: { id: "reviewer", name: "A. Reviewer", residualRisk: "Medium" },
    buildUp: TEST_POINTS.map((point) => ({ code: codeOf(point), state: "clear to next step", from: "flown" })),
    seriesResults: [],
    groundingSquawks: [],
    objectivesCovered: OBJECTIVES.map(({ code }) => code),
    digest: null,
    releasedDigest: null,
    widths: B612_WIDTHS,
  };

  test("holds T01 to T26, each once", () => {
    expect(TEST_POINTS.map(codeOf)).toEqual(Array.from({ length: 26 }, (_, index) => `T${String(index + 1).padStart(2, "0")}`));
  });

  test.each(TEST_POINTS.map((point) => [codeOf(point), point] as const))("%s keeps the form that a draft is saved in", (_, point) => {
    expect(cardPoint.parse(point)).toEqual(point);
  });

  test.each(TEST_POINTS.map((point) => [codeOf(point), point] as const))("%s alone on a card breaks no readiness rule", (_, point) => {
    expect(reviewCard(alone(point), context).map(({ code, message }) => `${code}: ${message}`)).toEqual([]);
  });

  test("names only objectives, hazards, parents, gauges and parameters that the programme has", () => {
    const known = {
      objectives: new Set(OBJECTIVES.map(({ code }) => code)),
      hazards: new Set(HAZARDS.map(({ code }) => code)),
      points: new Set(TEST_POINTS.map(codeOf)),
      gauges: new Set(INSTRUMENTS.map(({ id }) => id)),
      parameters: new Set(programme.parameters.map(({ code }) => code)),
    };
    for (const point of TEST_POINTS) {
      expect(point.objectives.every((code) => known.objectives.has(code)) && point.objectives.length > 0).toBe(true);
      expect(point.hazards.every((code) => known.hazards.has(code)) && point.hazards.length > 0).toBe(true);
      expect(point.parents.every((code) => known.points.has(code))).toBe(true);
      expect(point.readings.every(({ instrument }) => instrument === null || known.gauges.has(instrument))).toBe(true);
      expect(point.readings.every(({ parameter }) => parameter === null || known.parameters.has(parameter))).toBe(true);
      const ids = [...point.readings, ...point.steps, ...point.limits, ...point.aborts.lines, ...point.entry].map(({ id }) => id);
      expect(new Set(ids).size, codeOf(point)).toBe(ids.length);
    }
  });

  test("covers every objective", () => {
    const covered = new Set(TEST_POINTS.flatMap((point) => point.objectives));
    expect(OBJECTIVES.filter(({ code }) => !covered.has(code))).toEqual([]);
  });
});

describe("limits, hazards and gauges", () => {
  test("a card limit is never looser than its placard", () => {
    for (const card of LIMITS.filter((limit) => limit.layer === "card")) {
      const placard = LIMITS.find(
        (limit) =>
          limit.layer === "placard" &&
          limit.parameter === card.parameter &&
          limit.side === card.side &&
          limit.appliesWhen === card.appliesWhen &&
          limit.statistic === card.statistic,
      );
      expect(placard && (card.side === "max" ? card.value <= placard.value : card.value >= placard.value)).toBe(true);
    }
  });

  // MIL-STD-882E Table III: the pairs of the hazard sheet.
  test("hazards stand at the levels of the hazard sheet, none above Medium after its mitigations", () => {
    const levels = HAZARDS.map(({ before, after }) => [
      riskLevel(before.severity, before.probability),
      riskLevel(after.severity, after.probability),
    ]);
    expect(levels.slice(0, 10).map(([before]) => before)).toEqual([
      "Serious",
      "Serious",
      "Serious",
      "Serious",
      "Medium",
      "Serious",
      "Serious",
      "Serious",
      "Serious",
      "Medium",
    ]);
    expect(levels.every(([, after]) => after === "Medium")).toBe(true);
    expect(HAZARDS.every(({ before, after }) => before.severity === after.severity)).toBe(true);
  });

  test("every gauge is calibrated for twelve months around the demo date", () => {
    for (const { calibration, name } of calibratedInstruments(DAY)) {
      expect(calibration && calibration.calibratedOn < DAY && calibration.validUntil > "2032-01-01", name).toBe(true);
    }
  });

  // 381 + 92 + 72 + 6 + 64 × 0.72 = 597.08 kg; moments 721.995 + 197.8 + 154.8 + 16.8 + 102.758 = 1194.153 kg m; 2.000 m.
  test("pilot 92, observer 72, baggage 6 and 64 L make 597.1 kg at 2.000 m, bingo 26 L", () => {
    const card = alone(named("T10"));
    const plan = planCard({
      ...card,
      content: {
        ...card.content,
        crew: [
          { role: "pilot", massKg: 92 },
          { role: "observer", massKg: 72 },
        ],
      },
    });
    expect(plan.takeOff?.massKg).toBeCloseTo(597.08, 9);
    expect(plan.takeOff?.cgM).toBeCloseTo(2, 3);
    expect(plan.takeOff?.inside).toBe(true);
    expect(plan.bingoL).toBe(26);
    expect(plan.minutes).toBe(50);
  });

  test("the programme says that its limits are for no real aircraft", () => {
    expect(programme.notice).toBe("Limits invented for this demonstration: for no real aircraft.");
    expect(NOTICE).toBe(programme.notice);
  });
});
