/**
 * Cards that no readiness rule speaks against, from the invented Quillon R2: a climb in the air, a flight with COWL SHUT, a soak
 * on the ground. A test breaks one thing and expects one finding.
 */

import { B612_WIDTHS } from "@/lib/testcards/b612-widths";
import { assembleCard, type CardContent, type CardDocument, type CardPoint, type Reading, type Step } from "@/lib/testcards/card";
import type { CardContext, SortieContext, SortiePlan } from "@/lib/testcards/readiness-types";
import type { Unit } from "@/lib/testcards/units";
import { numberAbort, PARAMETERS, PROGRAMME } from "./ready-programme";

export { PROGRAMME } from "./ready-programme";

/** Gauge by parameter, and the band expected of it as flown, true (°C, psi). */
const READ: Record<string, [instrument: string, unit: Unit, head: string, low: number | null, high: number | null]> = {
  coolant: ["COOLANT-PANEL", "degC", "COOL", 85, 98],
  cht: ["CHT-PANEL", "degF", "CHT", 113, 143],
  "oil-t": ["OIL-T", "degC", "OIL", 80, 109],
  "oil-p": ["OIL-P", "psi", "OIL P", 45, 65],
  iat: ["IAT", "degC", "IAT", 15, 50],
  oat: ["OAT", "degC", "OAT", null, null],
  skin: ["LOGGER-SKIN", "degC", "SKIN", 50, 88],
  line: ["LOGGER-LINE", "degC", "LINE", 28, 48],
};

export function readingOf(parameter: string, over: Partial<Reading> = {}): Reading {
  const [instrument, unit, cellHead, low, high] = READ[parameter] ?? [null, null, parameter, null, null];
  return {
    id: parameter,
    parameter,
    label: parameter,
    cellHead,
    kind: "number",
    instrument,
    unit,
    recordedBy: "pilot",
    onSheet: "grid",
    sampling: "highest",
    conditions: ["at power"],
    expected: low === null ? null : { low, high, unit: PARAMETERS.find((p) => p.code === parameter)?.unit ?? "degC" },
    expectedOrigin: null,
    expectedRatePerMin: null,
    choices: [],
    low: null,
    high: null,
    ...over,
  };
}

export const stepOf = (id: string, text: string, over: Partial<Step> = {}): Step => ({
  id,
  text,
  kind: "action",
  durationS: null,
  rpm: null,
  manifoldPressureInHg: null,
  ...over,
});

export function climb(over: Partial<CardPoint> = {}): CardPoint {
  return {
    id: "climb",
    template: { id: "t10", code: "T10", revision: 1 },
    title: "Climb cooling",
    purpose: "Hot-day margin to the critical altitude.",
    place: "air",
    engine: "running",
    positions: [{ control: "COWL", position: "OPEN" }],
    entryText: "level 75 % stabilised, 1000 AGL or above",
    entry: [{ id: "entry-ias", parameter: "ias", instrument: "ASI", relation: "about", value: 68, tolerance: 2, unit: "kt" }],
    steps: [
      stepOf("a", "2700/30.0 for 1 min", { kind: "power", durationS: 60, rpm: 2700, manifoldPressureInHg: 30 }),
      stepOf("b", "2550/28.5 to 5 min past highest, above 9000 ft", { kind: "power", rpm: 2550, manifoldPressureInHg: 28.5 }),
      stepOf("c", "level at 11 000 ft in any case"),
    ],
    grid: { head: "1000 ft", unit: null, by: "height", rows: ["1", "2", "3"], timeColumn: true },
    readings: ["oat", "coolant", "cht", "oil-t", "iat"].map((parameter) => readingOf(parameter)),
    cardTable: true,
    conditions: ["at power", "full power"],
    limits: [],
    aborts: { standing: true, lines: [], ifReached: false },
    recovery: "COWL OPEN (below 105 kt), level, 45 %, 80 kt",
    completion: { rule: "5 min past peak", runS: null, pastPeakS: 300 },
    durationMin: 30,
    fuelFlowLPerH: 28,
    objectives: ["O1"],
    hazards: ["H1"],
    parents: ["T11"],
    series: null,
    changes: ["power"],
    order: "F4",
    heightFloor: { value: 1000, unit: "ft", reference: "AGL" },
    needsHeightFloor: false,
    minimumCrewOnly: false,
    smoothAir: false,
    wingFlap: false,
    firstFlight: false,
    soak: false,
    ...over,
  };
}

/** Level flight with COWL SHUT at 65 %, called on the repeater: 109 − 1.5 − 6 × 0.5 = 104.5 °C. */
export function shut(over: Partial<CardPoint> = {}): CardPoint {
  return climb({
    id: "shut",
    template: { id: "t13", code: "T13", revision: 1 },
    title: "COWL SHUT level",
    positions: [{ control: "COWL", position: "SHUT" }],
    entryText: "level 65 %, in gliding range",
    entry: [],
    steps: [stepOf("a", "COWL SHUT, clock"), stepOf("b", "hold until stabilised, 8 min at most"), stepOf("c", "COWL OPEN")],
    grid: { head: "min", unit: null, by: "time", rows: ["0", "2", "4", "6", "8"], timeColumn: false },
    readings: [
      readingOf("coolant", { instrument: "REPEATER", expectedRatePerMin: { value: 6, unit: "degC" } }),
      ...["cht", "oil-t", "iat"].map((parameter) => readingOf(parameter)),
    ],
    aborts: { standing: true, lines: [numberAbort("coolant", "REPEATER", 104.5, 104.5, { id: "abort-shut" })], ifReached: false },
    completion: { rule: "stabilised", runS: null, pastPeakS: null },
    parents: ["T09"],
    series: { name: "COWL SHUT power", level: { value: 65, unit: "%" }, base: false },
    order: "F5",
    heightFloor: { value: 2500, unit: "ft", reference: "AGL" },
    needsHeightFloor: true,
    minimumCrewOnly: true,
    ...over,
  });
}

/** Heat soak after a stop: 109 − 1.5 − 5.5 × 0.5 = 104.75, prints 104.7; skin 98 − 3 − 6 × 0.5 = 92.0; line 52 − 2 − 2.5 × 0.5 = 48.75. */
export function soak(over: Partial<CardPoint> = {}): CardPoint {
  const watch = { calledBy: "observer" as const };
  return climb({
    id: "soak",
    template: { id: "t02", code: "T02", revision: 1 },
    title: "Heat soak, COWL OPEN",
    place: "ground",
    entryText: "nose into wind 3-8 kt",
    entry: [],
    steps: [
      stepOf("a", "1000 rpm 3 min cool-down", { kind: "cool-down", durationS: 180 }),
      stepOf("b", "stop", { kind: "engine stop" }),
      stepOf("c", "log to peak + 10 min"),
    ],
    grid: null,
    readings: [
      readingOf("coolant", {
        instrument: "REPEATER",
        recordedBy: "recorder",
        onSheet: "none",
        expectedRatePerMin: { value: 5.5, unit: "degC" },
      }),
      readingOf("skin", { recordedBy: "recorder", onSheet: "none", expectedRatePerMin: { value: 6, unit: "degC" } }),
      readingOf("line", { recordedBy: "recorder", onSheet: "none", expectedRatePerMin: { value: 2.5, unit: "degC" } }),
    ],
    conditions: ["idle"],
    aborts: {
      standing: false,
      ifReached: true,
      lines: [
        numberAbort("coolant", "REPEATER", 104.75, 104.7, { id: "soak-coolant", ...watch }),
        numberAbort("skin", "LOGGER-SKIN", 92, 92, { id: "soak-skin", ...watch }),
        numberAbort("line", "LOGGER-LINE", 48.75, 48.7, { id: "soak-line", ...watch }),
      ],
    },
    recovery: "call stand clear, no restart, cap stays closed",
    completion: { rule: "whole run", runS: 1800, pastPeakS: 600 },
    parents: ["T01"],
    changes: [],
    order: "G3",
    heightFloor: null,
    soak: true,
    ...over,
  });
}

export function readyCard(points: CardPoint[] = [climb()], content: Partial<CardContent> = {}): CardDocument {
  const air = points.some((point) => point.place === "air");
  return assembleCard(
    structuredClone(PROGRAMME),
    { id: "card-07", number: "07", letter: "C", author: { id: "engineer", name: "A. Engineer" } },
    {
      title: "Climb cooling",
      kind: air ? "flight" : "ground run",
      crew: [
        { role: "pilot", massKg: 92 },
        { role: "observer", massKg: 72 },
      ],
      baggageKg: 6,
      fuelOnBoardL: 64,
      bingoL: air ? 26 : null,
      plannedOn: "2031-05-05",
      firstFlightOfChange: false,
      remarks: "",
      points: structuredClone(points),
      ...content,
    },
  );
}

const SHARED: SortieContext = {
  today: "2031-05-04",
  currentConfiguration: { id: "c-14", number: "C-14", signed: true },
  releaser: { id: "reviewer", name: "B. Reviewer", residualRisk: "Medium" },
  buildUp: ["T01", "T09", "T11"].map((code) => ({ code, state: "clear to next step" as const, from: "flown" as const })),
  // Practice values of a COWL SHUT build-up, °C true at each power.
  seriesResults: [
    {
      series: "COWL SHUT power",
      results: [
        { level: 45, value: 85 },
        { level: 50, value: 88.4 },
        { level: 55, value: 91.7 },
        { level: 60, value: 95.3 },
      ],
      expandedUncertainty: 1.5,
      lastInBand: true,
    },
  ],
  groundingSquawks: [],
  objectivesCovered: ["O1"],
};

export const readyContext = (over: Partial<CardContext> = {}): CardContext => ({
  ...structuredClone(SHARED),
  digest: null,
  releasedDigest: null,
  widths: B612_WIDTHS,
  ...over,
});
export const readySortieContext = (over: Partial<SortieContext> = {}): SortieContext => ({ ...structuredClone(SHARED), ...over });

export function readySortie(documents: CardDocument[] = [readyCard()], over: Partial<SortiePlan> = {}): SortiePlan {
  return {
    id: "sortie",
    kind: "flight",
    plannedOn: "2031-05-05",
    cards: documents.map((document) => ({
      document,
      state: "released",
      digest: "9f3c21b0",
      releasedDigest: "9f3c21b0",
      acceptance: { digest: "9f3c21b0", at: "2031-05-04T17:30:00Z", accepted: true },
    })),
    crew: [
      { name: "C. Pilot", role: "pilot", massKg: 92 },
      { name: "D. Observer", role: "observer", massKg: 72 },
    ],
    baggageKg: 6,
    fuelOnBoardL: 64,
    configuration: { id: "c-14", number: "C-14" },
    forecastOatC: 30,
    dayPlan: { daylight: "sunset 19:40 UTC, land by 18:40", dutyTime: "8 h from 06:00 UTC", runway: "27, dry, 700 m" },
    ...over,
  };
}
