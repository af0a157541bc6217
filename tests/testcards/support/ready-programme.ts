/** The programme behind the ready cards: the invented Quillon R2's gauges, limits and standing aborts, every one in order. */

import type { AbortLine, CalibrationRecord, Instrument, Limit, Parameter, ProgrammeSnapshot } from "@/lib/testcards/card";
import type { Unit } from "@/lib/testcards/units";
import type { HotDayRule, LimitCondition, LimitStatistic, Side } from "@/lib/testcards/words";
import { cowl, quillon } from "./quillon";

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

const COOLANT: Table = [
  [0, -4],
  [40, 36.5],
  [80, 79],
  [100, 101.5],
  [120, 122.5],
];
const CHT: Table = [
  [100, 97],
  [200, 199],
  [300, 303],
  [350, 355],
];

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
export const PARAMETERS: Parameter[] = MEASURED.map(([code, shortName, unit, hotDayRule, normal, safety, rate]) => ({
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
  aircraft: quillon(),
  controls: [cowl()],
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
