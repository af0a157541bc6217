/**
 * Cards that no readiness rule speaks against, from the invented Quillon R2: a climb in the air, a flight with COWL SHUT, a soak
 * on the ground. A test breaks one thing and expects one finding.
 */

import { B612_WIDTHS } from "@/lib/testcards/b612-widths";
import {
  type AbortLine,
  assembleCard,
  type CalibrationRecord,
  type CardContent,
  type CardDocument,
  type CardPoint,
  type Instrument,
  type Limit,
  type Parameter,
  type ProgrammeSnapshot,
  type Reading,
  type Step,
} from "@/lib/testcards/card";
import type { CardContext, SortieContext, SortiePlan } from "@/lib/testcards/readiness-types";
import type { Unit } from "@/lib/testcards/units";
import type { HotDayRule, LimitCondition, LimitStatistic, Side } from "@/lib/testcards/words";

type Table = [read: number, actual: number][];
const truly = (...reads: number[]): Table => reads.map((read) => [read, read]);

function calibration(unit: Unit, table: Table, expandedUncertainty: number): CalibrationRecord {
  const points = table.map(([read, actual]) => ({ read, actual }));
  return {
    id: `calibration-${unit}`,
    kind: "points",
    points,
    low: points[0]?.read ?? 0,
    high: points.at(-1)?.read ?? 0,
    expandedUncertainty,
    unit,
    method: "in place, through its own wiring",
    reference: "reference thermometer",
    calibratedOn: "2031-03-10",
    validUntil: "2032-03-10",
    disturbedOn: null,
  };
}

const COOLANT: Table = [[0, -4], [40, 36.5], [80, 79], [100, 101.5], [120, 122.5]]; // biome-ignore format: a table
const CHT: Table = [[100, 97], [200, 199], [300, 303], [350, 355]]; // biome-ignore format: a table

type Gauge = [
  id: string,
  parameter: string,
  gaugeName: string,
  unit: Unit,
  low: number,
  high: number,
  marks: number,
  readable: number,
  u: number,
  table: Table,
];
const GAUGES: Gauge[] = [
  ["COOLANT-PANEL", "coolant", "Coolant", "degC", 0, 130, 5, 2.5, 3, COOLANT],
  ["CHT-PANEL", "cht", "CHT", "degF", 100, 400, 10, 5, 6, CHT],
  ["OIL-T", "oil-t", "Oil T", "degC", 0, 170, 5, 5, 4, truly(0, 60, 100, 130)],
  ["TIT", "tit", "TIT", "degC", 0, 1100, 20, 10, 10, truly(500, 700, 850, 950)],
  ["IAT", "iat", "IAT", "degC", -30, 150, 5, 2.5, 2, truly(0, 30, 50, 80)],
  ["OIL-P", "oil-p", "Oil P", "psi", 0, 145, 5, 2.5, 3, truly(0, 30, 60, 80, 110)],
  ["FUEL-P", "fuel-p", "Fuel P", "bar", 0, 6, 0.2, 0.1, 0.1, truly(2, 2.6, 3.2, 3.8)],
  ["RPM", "rpm", "RPM", "rpm", 0, 3300, 50, 10, 20, truly(800, 1800, 2600, 2800)],
  ["MAP", "map", "MAP", "inHg", 5, 40, 0.5, 0.25, 0.4, truly(15, 22, 29, 32)],
  ["OAT", "oat", "OAT", "degC", -30, 50, 1, 1, 1, truly(-20, 0, 20, 45)],
  ["ASI", "ias", "IAS", "kt", 0, 150, 2, 1, 2, truly(20, 60, 100, 140)],
  ["ASI-SPARE", "ias", "IAS", "kt", 0, 150, 5, 2.5, 2, truly(20, 60, 100, 140)],
  ["ALT", "altitude", "Height", "ft", -200, 13000, 20, 10, 50, truly(0, 3000, 7000, 12000)],
  ["REPEATER", "coolant", "Coolant", "degC", -20, 150, 0.1, 0.1, 1.5, truly(0, 50, 90, 125)],
  ["LOGGER-SKIN", "skin", "Skin", "degC", -20, 150, 0.1, 0.1, 3, truly(0, 50, 90, 120)],
  ["LOGGER-LINE", "line", "Line", "degC", -20, 150, 0.1, 0.1, 2, truly(0, 30, 50, 70)],
];

const onlyLogged = (id: string): boolean => id.startsWith("LOGGER");
const INSTRUMENTS: Instrument[] = GAUGES.map(([id, parameter, gaugeName, unit, low, high, markSpacing, readable, u, table]) => ({
  id,
  parameter,
  name: id,
  gaugeName,
  unit,
  shownOn: onlyLogged(id) ? "recorder" : id === "REPEATER" ? "repeater" : "panel",
  visibleTo: onlyLogged(id) ? ["observer"] : ["pilot", "observer"],
  low,
  high,
  markSpacing,
  readable,
  calibration: calibration(unit, table, u),
}));

type Measured = [
  code: string,
  short: string,
  unit: Unit,
  rule: HotDayRule,
  normal: [number, number] | null,
  safety: boolean,
  rate: number | null,
];
const MEASURED: Measured[] = [
  ["coolant", "Coolant", "degC", "plus-one", [75, 98], true, 2],
  ["cht", "CHT", "degC", "plus-one", [95, 140], true, 4],
  ["oil-t", "Oil T", "degC", "plus-one", [70, 105], true, 2],
  ["tit", "TIT", "degC", "plus-one", [700, 850], true, 10],
  ["iat", "IAT", "degC", "ratio", [10, 50], true, 2],
  ["oil-p", "Oil P", "psi", "none", [45, 65], true, null],
  ["fuel-p", "Fuel P", "bar", "none", null, false, null],
  ["skin", "Skin", "degC", "plus-one", null, false, null],
  ["line", "Fuel line", "degC", "plus-one", null, false, null],
  ["rpm", "RPM", "rpm", "none", null, false, null],
  ["map", "MAP", "inHg", "none", null, false, null],
  ["oat", "OAT", "degC", "none", null, false, null],
  ["ias", "IAS", "kt", "none", null, false, null],
  ["altitude", "Height", "ft", "none", null, false, null],
  ["volts", "Volts", "V", "none", null, false, null],
];
const PARAMETERS: Parameter[] = MEASURED.map(([code, shortName, unit, hotDayRule, normal, safety, rate]) => ({
  code,
  name: code === "oat" ? "Outside air" : shortName,
  shortName,
  unit,
  group: null,
  hotDayRule,
  normal: normal && { low: normal[0], high: normal[1], unit },
  safety,
  stabilises: ["coolant", "cht", "oil-t"].includes(code),
  // The CHT gauge and its rate are in °F, its limits in °C.
  standardRatePerMin: rate === null ? null : { value: rate, unit: code === "cht" ? "degF" : unit },
}));

type Row = [
  parameter: string,
  side: Side,
  when: LimitCondition,
  forS: number,
  placard: number,
  card: number,
  unit: Unit,
  statistic?: LimitStatistic,
];
const ROWS: Row[] = [
  ["coolant", "max", "always", 0, 115, 109, "degC"],
  ["coolant", "min", "take-off", 0, 50, 55, "degC"],
  ["cht", "max", "always", 0, 165, 155, "degC"],
  ["cht", "max", "always", 0, 30, 26, "degC/min", "rate"],
  ["oil-t", "max", "always", 0, 125, 118, "degC"],
  ["oil-t", "min", "full power", 0, 45, 50, "degC"],
  ["tit", "max", "always", 0, 900, 880, "degC"],
  ["iat", "max", "always", 0, 65, 60, "degC"],
  ["oil-p", "max", "always", 0, 75, 72, "psi"],
  ["oil-p", "min", "at power", 0, 30, 33, "psi"],
  ["oil-p", "min", "idle", 10, 12, 15, "psi"],
  ["rpm", "max", "full power", 0, 2750, 2730, "rpm"],
  ["rpm", "max", "at power", 300, 2600, 2580, "rpm"],
  ["map", "max", "full power", 0, 31, 30.5, "inHg"],
  ["map", "max", "at power", 300, 29.5, 29, "inHg"],
  ["fuel-p", "min", "always", 0, 2.4, 2.6, "bar"],
  ["skin", "max", "always", 0, 105, 98, "degC"],
  ["line", "max", "always", 0, 58, 52, "degC"],
];
const LIMITS: Limit[] = ROWS.flatMap(([parameter, side, appliesWhen, forS, placard, card, unit, statistic = "instant"]) => {
  const base = { parameter, side, unit, appliesWhen, forS, statistic };
  const id = `${parameter}-${side}-${appliesWhen}-${statistic}`.replaceAll(" ", "-");
  return [
    { ...base, id: `${id}-placard`, layer: "placard" as const, value: placard, source: "HF-4L-OM rev 6", authority: "engine" as const },
    { ...base, id: `${id}-card`, layer: "card" as const, value: card, source: "PL-01 rev 2", authority: "programme" as const },
  ];
});

export function numberAbort(
  parameter: string,
  instrument: string,
  trueValue: number,
  onGauge: number,
  over: Partial<Extract<AbortLine, { kind: "number" }>> = {},
): AbortLine {
  return {
    kind: "number",
    id: `abort-${parameter}`,
    parameter,
    side: "max",
    instrument,
    appliesWhen: "always",
    trueValue,
    onGauge,
    setBy: "rule",
    perMinute: false,
    windowS: null,
    calledBy: "pilot",
    ...over,
  };
}

const STANDING: AbortLine[] = [
  numberAbort("coolant", "COOLANT-PANEL", 105, 102.5),
  numberAbort("cht", "CHT-PANEL", 150.6, 300), // 303 °F
  numberAbort("oil-t", "OIL-T", 113, 110),
  numberAbort("tit", "TIT", 865, 860),
  numberAbort("iat", "IAT", 57, 55),
  numberAbort("oil-p", "OIL-P", 36, 37.5, { side: "min", appliesWhen: "at power" }),
  { kind: "event", id: "abort-smoke", text: "smoke, smell, vibration, fluid" },
];

export const PROGRAMME: ProgrammeSnapshot = {
  id: "programme",
  name: "Quillon R2 cooling",
  notice: "Invented limits, for no real aircraft.",
  hotDayBasis: "metric",
  airfield: { name: "Harrow Fen", elevationFt: 350 },
  aircraft: {
    registration: "Q-R2-01",
    type: "Quillon R2",
    engine: "HF-4L",
    maxMassKg: 600,
    emptyMassKg: 381,
    emptyArmM: 1.895,
    envelope: [
      { massKg: 380, cgM: 1.9 },
      { massKg: 500, cgM: 1.9 },
      { massKg: 600, cgM: 1.96 },
      { massKg: 600, cgM: 2.06 },
      { massKg: 380, cgM: 2.06 },
    ],
    stations: [
      { name: "Left seat", armM: 2.15, maxKg: 110 },
      { name: "Right seat", armM: 2.15, maxKg: 110 },
      { name: "Baggage", armM: 2.8, maxKg: 15 },
    ],
    fuelArmM: 2.23,
    fuelDensityKgPerL: 0.72,
    fuelCapacityL: 90,
    fuelUnusableL: 4,
    speeds: [
      { code: "V_FE", name: "wing flap out", valueKt: 80, airspeed: "KIAS" },
      { code: "V_NO", name: "smooth air above", valueKt: 115, airspeed: "KIAS" },
      { code: "V_NE", name: "never exceed", valueKt: 138, airspeed: "KIAS" },
    ],
    criticalAltitudeFt: 9000,
  },
  controls: [
    {
      name: "COWL",
      positions: [
        { name: "SHUT", groundOnly: false, maxSpeedKt: null, restricted: true },
        { name: "TRAIL", groundOnly: false, maxSpeedKt: null, restricted: false },
        { name: "OPEN", groundOnly: false, maxSpeedKt: 105, restricted: false },
        { name: "REMOVED", groundOnly: true, maxSpeedKt: null, restricted: false },
      ],
      recoverTo: "OPEN",
    },
  ],
  coolDown: { durationS: 180, text: "3 min at 1000 rpm" },
  callWords: [
    { word: "terminate", meaning: "stop the point, not a safety matter" },
    { word: "abort", meaning: "stop now, make safe" },
    { word: "knock it off", meaning: "everybody stops, go home" },
  ],
  goNoGo: ["wind 15 kt, gust spread 8, crosswind 8 or less"],
  thenLine: { air: "COWL OPEN (below 105 kt), 45 %, nose down, to strip, call", ground: "COWL OPEN, 1000 rpm, into wind, call" },
  thenActions: { air: ["COWL OPEN (below 105 kt)", "power back to 45 % over 5 s", "call"], ground: ["COWL OPEN", "1000 rpm", "call"] },
  standingAborts: STANDING,
  reactionMin: 0.5,
  fuelPlan: { taxiL: 3, returnL: 7, reserveL: 15 },
  daMaximumFt: 4000,
  configuration: {
    id: "c-14",
    number: "C-14",
    fitted: "lower cowl B",
    massKg: 381,
    armM: 1.895,
    signedBy: "mechanic",
    signedAt: "2031-05-01T08:00:00Z",
    gapsMeasuredOn: "2031-05-01",
    disturbedOn: "2031-04-30",
  },
  parameters: PARAMETERS,
  instruments: INSTRUMENTS,
  limits: LIMITS,
  hazards: [
    {
      code: "H1",
      title: "Coolant boils",
      cause: "exit flap jams shut",
      effect: "engine stops",
      before: { severity: 2, probability: "C" },
      after: { severity: 2, probability: "D" },
      mitigations: [{ kind: "design", text: "spring bias to open" }],
      owner: "engineer",
    },
  ],
  objectives: [
    { code: "O1", question: "Does it stay inside its limits in the climb?", success: "within placard on the hot day", priority: "must" },
  ],
};

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
