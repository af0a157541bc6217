/**
 * The invented Quillon R2 with its HF-4L engine as one real card document: gauges, limits and standing abort lines in full,
 * points cut down to what a check needs. Every figure is the demo programme's own.
 */

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
} from "@/lib/testcards/card";
import type { Unit } from "@/lib/testcards/units";
import type { LimitCondition, Sampling, Side } from "@/lib/testcards/words";
import { cowl, quillon } from "./quillon";

type Table = [read: number, actual: number][];

const truly = (...reads: number[]): Table => reads.map((read) => [read, read]);

function calibration(id: string, unit: Unit, table: Table, expandedUncertainty: number | null): CalibrationRecord {
  const points = table.map(([read, actual]) => ({ read, actual }));
  return {
    id: `cal-${id}`,
    kind: "points",
    points,
    low: points[0]?.read ?? 0,
    high: points.at(-1)?.read ?? 0,
    expandedUncertainty,
    unit,
    method: "in place, engine wiring",
    reference: "reference thermometer",
    calibratedOn: "2031-03-10",
    validUntil: "2032-03-10",
    disturbedOn: null,
  };
}

type Gauge = [
  id: string,
  parameter: string,
  unit: Unit,
  low: number,
  high: number,
  marks: number,
  readable: number,
  u: number,
  table: Table,
];

const GAUGES: Gauge[] = [
  [
    "COOLANT-PANEL",
    "coolant",
    "degC",
    0,
    130,
    5,
    2.5,
    3,
    [
      [0, -4],
      [40, 36.5],
      [80, 79],
      [100, 101.5],
      [120, 122.5],
    ],
  ],
  [
    "CHT-PANEL",
    "cht",
    "degF",
    100,
    400,
    10,
    5,
    6,
    [
      [100, 97],
      [200, 199],
      [300, 303],
      [350, 355],
    ],
  ],
  ["OIL-T", "oil-t", "degC", 0, 170, 5, 5, 4, truly(0, 60, 100, 130)],
  ["TIT", "tit", "degC", 0, 1100, 20, 10, 10, truly(500, 700, 850, 950)],
  ["IAT", "iat", "degC", -30, 150, 5, 2.5, 2, truly(0, 30, 50, 80)],
  ["OIL-P", "oil-p", "psi", 0, 145, 5, 2.5, 3, truly(0, 30, 60, 80, 110)],
  ["RPM", "rpm", "rpm", 0, 3300, 50, 10, 20, truly(800, 1800, 2600, 2800)],
  ["OAT", "oat", "degC", -30, 50, 1, 1, 1, truly(-20, 0, 20, 45)],
  ["LOGGER-COOLANT", "coolant", "degC", -20, 150, 0.1, 0.1, 1.5, truly(0, 50, 90, 125)],
  ["LOGGER-SKIN", "skin", "degC", -20, 150, 0.1, 0.1, 3, truly(0, 50, 90, 120)],
  ["LOGGER-LINE", "line", "degC", -20, 100, 0.1, 0.1, 2, truly(0, 30, 50, 70)],
];

const instruments: Instrument[] = GAUGES.map(([id, parameter, unit, low, high, markSpacing, readable, u, table]) => ({
  id,
  parameter,
  name: id,
  gaugeName: id,
  unit,
  shownOn: id.startsWith("LOGGER") ? "repeater" : "panel",
  visibleTo: ["pilot"],
  low,
  high,
  markSpacing,
  readable,
  calibration: calibration(id, unit, table, u),
}));

type Measured = [
  code: string,
  name: string,
  unit: Unit,
  rule: Parameter["hotDayRule"],
  normal: [number, number] | null,
  stabilises: boolean,
];

const MEASURED: Measured[] = [
  ["coolant", "Coolant out", "degC", "plus-one", [75, 98], true],
  ["cht", "Head metal, hottest", "degC", "plus-one", [95, 140], true],
  ["oil-t", "Oil temperature", "degC", "plus-one", [70, 105], true],
  ["tit", "Turbine inlet", "degC", "plus-one", [700, 850], false],
  ["iat", "Induction air", "degC", "ratio", [10, 50], false],
  ["skin", "Cowl inner skin", "degC", "plus-one", null, false],
  ["line", "Fuel line skin", "degC", "plus-one", null, false],
  ["oil-p", "Oil pressure", "psi", "none", [45, 65], false],
  ["rpm", "RPM", "rpm", "none", null, false],
  ["oat", "Outside air", "degC", "none", null, false],
];

const parameters: Parameter[] = MEASURED.map(([code, name, unit, hotDayRule, normal, stabilises]) => ({
  code,
  name,
  shortName: name,
  unit,
  group: null,
  hotDayRule,
  normal: normal && { low: normal[0], high: normal[1], unit },
  safety: hotDayRule !== "none",
  stabilises,
  standardRatePerMin: null,
}));

type Row = [parameter: string, side: Side, appliesWhen: LimitCondition, forS: number, placard: number, card: number, unit: Unit];

const ROWS: Row[] = [
  ["coolant", "max", "always", 0, 115, 109, "degC"],
  ["coolant", "min", "take-off", 0, 50, 55, "degC"],
  ["cht", "max", "always", 0, 165, 155, "degC"],
  ["oil-t", "max", "always", 0, 125, 118, "degC"],
  ["oil-t", "min", "full power", 0, 45, 50, "degC"],
  ["tit", "max", "always", 0, 900, 880, "degC"],
  ["iat", "max", "always", 0, 65, 60, "degC"],
  ["skin", "max", "always", 0, 105, 98, "degC"],
  ["line", "max", "always", 0, 58, 52, "degC"],
  ["oil-p", "max", "always", 0, 75, 72, "psi"],
  ["oil-p", "max", "cold start", 0, 100, 97, "psi"],
  ["oil-p", "min", "at power", 0, 30, 33, "psi"],
  ["oil-p", "min", "idle", 10, 12, 15, "psi"],
  ["rpm", "max", "full power", 0, 2750, 2730, "rpm"],
  ["rpm", "max", "at power", 300, 2600, 2580, "rpm"],
];

const limits: Limit[] = ROWS.flatMap(([parameter, side, appliesWhen, forS, placard, card, unit]) => {
  const base = { parameter, side, unit, appliesWhen, forS, statistic: "instant" as const };
  const id = `${parameter}-${side}-${appliesWhen.replace(" ", "-")}`;
  return [
    { ...base, id: `${id}-placard`, layer: "placard" as const, value: placard, source: "HF-4L-OM rev 6", authority: "engine" as const },
    { ...base, id: `${id}-card`, layer: "card" as const, value: card, source: "PL-01 rev 2", authority: "programme" as const },
  ];
});

function abortAt(parameter: string, instrument: string, side: Side, trueValue: number, onGauge: number, when: LimitCondition): AbortLine {
  return {
    kind: "number",
    id: `abort-${parameter}`,
    parameter,
    side,
    instrument,
    appliesWhen: when,
    trueValue,
    onGauge,
    setBy: "rule",
    perMinute: false,
    windowS: null,
    calledBy: "pilot",
  };
}

const standingAborts: AbortLine[] = [
  abortAt("coolant", "COOLANT-PANEL", "max", 105, 102.5, "always"),
  abortAt("cht", "CHT-PANEL", "max", 150.56, 300, "always"),
  abortAt("oil-t", "OIL-T", "max", 113, 110, "always"),
  abortAt("tit", "TIT", "max", 865, 860, "always"),
  abortAt("iat", "IAT", "max", 57, 55, "always"),
  abortAt("oil-p", "OIL-P", "min", 36, 37.5, "at power"),
  { kind: "event", id: "abort-smoke", text: "smoke, smell" },
];

export function sampleProgramme(over: Partial<ProgrammeSnapshot> = {}): ProgrammeSnapshot {
  return {
    id: "programme-r2",
    name: "Quillon R2 cooling",
    notice: "Invented limits, for no real aircraft.",
    hotDayBasis: "metric",
    airfield: { name: "Harrow Fen", elevationFt: 350 },
    aircraft: quillon({
      stations: [
        { name: "Seats", armM: 2.15, maxKg: 220 },
        { name: "Baggage", armM: 2.8, maxKg: 15 },
      ],
      speeds: [{ code: "V_NE", name: "never exceed", valueKt: 138, airspeed: "KIAS" }],
    }),
    controls: [cowl()],
    coolDown: { durationS: 180, text: "1000 rpm 3 min turbine cool-down" },
    callWords: [{ word: "abort", meaning: "stop now, make safe" }],
    goNoGo: ["wind 15 kt or less"],
    thenLine: { air: "COWL OPEN, 45 %, nose down, to strip, call", ground: "COWL OPEN, 1000 rpm, into wind, call" },
    thenActions: { air: ["COWL OPEN"], ground: ["COWL OPEN"] },
    standingAborts,
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
      disturbedOn: null,
    },
    parameters,
    instruments,
    limits,
    hazards: [],
    objectives: [{ code: "O1", question: "Does it stay inside its limits?", success: "within on the hot day", priority: "must" }],
    ...over,
  };
}

const INSTRUMENT_OF: Record<string, string> = {
  coolant: "COOLANT-PANEL",
  cht: "CHT-PANEL",
  "oil-t": "OIL-T",
  tit: "TIT",
  iat: "IAT",
  "oil-p": "OIL-P",
  skin: "LOGGER-SKIN",
  line: "LOGGER-LINE",
  rpm: "RPM",
  oat: "OAT",
};

/** One reading on its panel gauge; the id is the parameter's code unless given. */
export function sampleReading(parameter: string, sampling: Sampling, over: Partial<Reading> = {}): Reading {
  return {
    id: parameter,
    parameter,
    label: parameter,
    cellHead: parameter.toUpperCase(),
    kind: "number",
    instrument: INSTRUMENT_OF[parameter] ?? null,
    unit: instruments.find((instrument) => instrument.id === INSTRUMENT_OF[parameter])?.unit ?? null,
    recordedBy: "pilot",
    onSheet: "grid",
    sampling,
    conditions: ["at power"],
    expected: null,
    expectedOrigin: null,
    expectedRatePerMin: null,
    choices: [],
    low: null,
    high: null,
    ...over,
  };
}

export function samplePoint(over: Partial<CardPoint> = {}): CardPoint {
  return {
    id: "p1",
    template: null,
    title: "Static ground cooling",
    purpose: "Full power held until temperatures stabilise.",
    place: "ground",
    engine: "running",
    positions: [{ control: "COWL", position: "OPEN" }],
    entryText: "tied down, chocked, nose into wind",
    entry: [],
    steps: [],
    grid: null,
    readings: [],
    cardTable: true,
    conditions: ["always", "at power"],
    limits: [],
    aborts: { standing: true, lines: [], ifReached: false },
    recovery: "COWL OPEN, 1000 rpm, cool-down 3 min unless fire",
    completion: { rule: "none", runS: null, pastPeakS: null },
    durationMin: 20,
    fuelFlowLPerH: 24,
    objectives: ["O1"],
    hazards: [],
    parents: [],
    series: null,
    changes: [],
    order: "G2",
    heightFloor: null,
    needsHeightFloor: false,
    minimumCrewOnly: false,
    smoothAir: false,
    wingFlap: false,
    firstFlight: false,
    soak: false,
    ...over,
  };
}

export function sampleCard(
  points: CardPoint[],
  over: { programme?: Partial<ProgrammeSnapshot>; content?: Partial<CardContent> } = {},
): CardDocument {
  return assembleCard(
    sampleProgramme(over.programme),
    { id: "card-07", number: "07", letter: "C", author: { id: "engineer", name: "Engineer" } },
    {
      title: "Cooling",
      kind: "flight",
      crew: [{ role: "pilot", massKg: 92 }],
      baggageKg: 6,
      fuelOnBoardL: 64,
      bingoL: 26,
      plannedOn: "2031-05-05",
      firstFlightOfChange: false,
      remarks: "",
      points,
      ...over.content,
    },
  );
}
