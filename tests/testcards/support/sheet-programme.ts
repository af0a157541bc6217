import type { AbortLine, Instrument, Limit, Parameter, ProgrammeSnapshot } from "@/lib/testcards/card";
import type { Unit } from "@/lib/testcards/units";
import type { LimitCondition, Side } from "@/lib/testcards/words";
import { cowl, quillon } from "./quillon";

/** An invented aircraft and engine, for tests of the sheet. */

const parameter = (code: string, shortName: string, unit: Unit, normal: [number, number] | null = null): Parameter => ({
  code,
  name: shortName,
  shortName,
  unit,
  group: null,
  hotDayRule: "none",
  normal: normal && { low: normal[0], high: normal[1], unit },
  safety: normal !== null,
  stabilises: false,
  standardRatePerMin: null,
});

function gauge(
  id: string,
  code: string,
  gaugeName: string,
  unit: Unit,
  readable: number,
  points: [number, number][],
  more: Partial<Instrument> = {},
): Instrument {
  const table = points.map(([read, actual]) => ({ read, actual }));
  return {
    id,
    parameter: code,
    name: id,
    gaugeName,
    unit,
    shownOn: "panel",
    visibleTo: ["pilot", "observer"],
    low: 0,
    high: 3300,
    markSpacing: readable * 2,
    readable,
    calibration: {
      id: `cal-${id}`,
      unit,
      kind: "points",
      points: table,
      low: table[0]?.read ?? 0,
      high: table.at(-1)?.read ?? 0,
      expandedUncertainty: 3,
      method: "bath",
      reference: "thermometer",
      calibratedOn: "2031-03-10",
      validUntil: "2032-03-10",
      disturbedOn: null,
    },
    ...more,
  };
}

const asTrue = (...at: number[]): [number, number][] => at.map((x) => [x, x]);

const INSTRUMENTS: Instrument[] = [
  gauge("coolant-panel", "coolant", "Coolant", "degC", 2.5, [
    [0, -4],
    [40, 36.5],
    [80, 79],
    [100, 101.5],
    [120, 122.5],
  ]),
  gauge("coolant-repeater", "coolant", "Repeater", "degC", 0.1, asTrue(0, 50, 90, 125), { shownOn: "repeater" }),
  gauge("cht-panel", "cht", "CHT", "degF", 5, [
    [100, 97],
    [200, 199],
    [300, 303],
    [350, 355],
  ]),
  gauge("oil-t", "oil-t", "Oil T", "degC", 5, asTrue(0, 60, 100, 130)),
  gauge("tit", "tit", "TIT", "degC", 10, asTrue(500, 700, 850, 950)),
  gauge("iat", "iat", "IAT", "degC", 2.5, asTrue(0, 30, 50, 80)),
  gauge("oil-p", "oil-p", "Oil P", "psi", 2.5, asTrue(0, 30, 60, 80, 110)),
  gauge("rpm", "rpm", "RPM", "rpm", 10, asTrue(800, 1800, 2600, 2800)),
  gauge("map", "map", "MAP", "inHg", 0.25, asTrue(15, 22, 29, 32)),
  gauge("oat", "oat", "OAT", "degC", 1, asTrue(-20, 0, 20, 45)),
  gauge("asi", "ias", "IAS", "kt", 1, asTrue(20, 60, 100, 140)),
  gauge("logger-skin", "skin", "Skin", "degC", 0.1, asTrue(0, 50, 90, 120), { shownOn: "recorder", visibleTo: ["observer"] }),
];

const PARAMETERS: Parameter[] = [
  parameter("coolant", "Coolant", "degC", [75, 98]),
  parameter("cht", "CHT", "degC", [95, 140]),
  parameter("oil-t", "Oil T", "degC", [70, 105]),
  parameter("tit", "TIT", "degC", [700, 850]),
  parameter("iat", "IAT", "degC", [10, 50]),
  parameter("oil-p", "Oil P", "psi", [45, 65]),
  parameter("rpm", "RPM", "rpm"),
  parameter("map", "MAP", "inHg"),
  parameter("oat", "OAT", "degC"),
  parameter("ias", "IAS", "kt"),
  parameter("skin", "Skin", "degC"),
];

function limit(
  code: string,
  side: Side,
  unit: Unit,
  placard: number,
  card: number,
  appliesWhen: LimitCondition = "always",
  forS = 0,
): Limit[] {
  return (["placard", "card"] as const).map((layer) => ({
    id: `${code}-${side}-${appliesWhen}-${layer}`,
    parameter: code,
    side,
    layer,
    value: layer === "card" ? card : placard,
    unit,
    appliesWhen,
    forS,
    statistic: "instant",
    source: layer === "card" ? "PL-01 rev 2" : "HF-4L-OM rev 6",
    authority: layer === "card" ? "programme" : "engine",
  }));
}

const LIMITS: Limit[] = [
  ...limit("coolant", "max", "degC", 115, 109),
  ...limit("coolant", "min", "degC", 50, 55, "take-off"),
  ...limit("cht", "max", "degC", 165, 155),
  ...limit("oil-t", "max", "degC", 125, 118),
  ...limit("tit", "max", "degC", 900, 880),
  ...limit("iat", "max", "degC", 65, 60),
  ...limit("oil-p", "max", "psi", 75, 72),
  ...limit("oil-p", "min", "psi", 30, 33, "at power"),
  ...limit("oil-p", "min", "psi", 12, 15, "idle", 10),
  ...limit("rpm", "max", "rpm", 2750, 2730, "full power"),
  ...limit("map", "max", "inHg", 31, 30.5, "full power"),
  ...limit("rpm", "max", "rpm", 2600, 2580, "at power", 300),
  ...limit("map", "max", "inHg", 29.5, 29, "at power", 300),
  ...limit("skin", "max", "degC", 105, 98),
];

export function abortNumber(parameterCode: string, instrument: string, trueValue: number, onGauge: number, side: Side = "max"): AbortLine {
  return {
    kind: "number",
    id: `abort-${parameterCode}-${side}`,
    parameter: parameterCode,
    side,
    instrument,
    appliesWhen: "always",
    trueValue,
    onGauge,
    setBy: "rule",
    perMinute: false,
    windowS: null,
    calledBy: "pilot",
  };
}

export const abortEvent = (text: string): AbortLine => ({ kind: "event", id: `event-${text}`, text });

const STANDING: AbortLine[] = [
  abortNumber("coolant", "coolant-panel", 105, 102.5),
  abortNumber("cht", "cht-panel", 150.56, 300),
  abortNumber("oil-t", "oil-t", 113, 110),
  abortNumber("tit", "tit", 865, 860),
  abortNumber("iat", "iat", 57, 55),
  abortNumber("oil-p", "oil-p", 36, 37.5, "min"),
  abortEvent("COWL lever stuck"),
  abortEvent("smoke, smell"),
  abortEvent("vibration, fluid"),
];

export const sheetProgramme = (): ProgrammeSnapshot => ({
  id: "programme",
  name: "Cowl exit and radiator trial",
  notice: "Invented limits, for no real aircraft.",
  hotDayBasis: "metric",
  airfield: { name: "Harrow Fen", elevationFt: 350 },
  aircraft: quillon({ speeds: [] }),
  controls: [cowl()],
  coolDown: { durationS: 180, text: "1000 rpm 3 min" },
  callWords: [
    { word: "terminate", meaning: "stop the point, not a safety matter" },
    { word: "abort", meaning: "stop now, make safe" },
    { word: "knock it off", meaning: "everybody stops, go home" },
  ],
  goNoGo: [
    "wind 15 kt, gust spread 8, crosswind 8 or less",
    "cloud base 3000 AGL, visibility 8 km or more",
    "DA 4000 ft or less, OAT 5–38 °C, runway dry",
    "no grounding squawk, calibrations in date",
    "configuration signed, exit gaps measured",
    "mass and CG inside, fuel at least plan",
    "fire cover, phone or radio relay",
    "pilot rested and content, REV read aloud, equal",
  ],
  thenLine: {
    air: "COWL OPEN (below 105 kt), 45 %, nose down, to strip, call, not above 105 kt",
    ground: "COWL OPEN, 1000 rpm, into wind, cool-down 3 min unless fire, stop, call",
  },
  thenActions: {
    air: [
      "COWL OPEN (below 105 kt; if faster, slow first)",
      "power back to 45 % over 5 s, never slammed shut",
      "nose down if climbing",
      "turn to the strip",
      "call",
      "not above 105 kt",
    ],
    ground: ["COWL OPEN", "1000 rpm, nose into wind", "cool-down 3 min unless fire", "stop", "call"],
  },
  standingAborts: STANDING,
  reactionMin: 0.5,
  fuelPlan: { taxiL: 3, returnL: 7, reserveL: 15, taxiMin: 8, returnMin: 10, resetMin: 2 },
  daMaximumFt: 4000,
  configuration: {
    id: "c-14",
    number: "C-14",
    fitted: "",
    massKg: 381,
    armM: 1.895,
    signedBy: "M. Mechanic",
    signedAt: null,
    gapsMeasuredOn: null,
    disturbedOn: null,
  },
  parameters: PARAMETERS,
  instruments: INSTRUMENTS,
  limits: LIMITS,
  hazards: [],
  objectives: [],
});
