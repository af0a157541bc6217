import { CARD_FORMAT, type CardDocument, type CardPoint, type Reading } from "@/lib/testcards/card";
import type { Unit } from "@/lib/testcards/units";
import { abortEvent, abortNumber, sheetProgramme } from "./sheet-programme";

/** Card 07, a climb and what may stand around it. */

export function sheetReading(
  id: string,
  code: string,
  instrument: string,
  unit: Unit,
  cellHead: string,
  expected: [number, number, Unit] | null,
  more: Partial<Reading> = {},
): Reading {
  return {
    id,
    parameter: code,
    label: cellHead,
    cellHead,
    kind: "number",
    instrument,
    unit,
    recordedBy: "pilot",
    onSheet: "grid",
    sampling: "highest",
    conditions: [],
    expected: expected && { low: expected[0], high: expected[1], unit: expected[2] },
    expectedOrigin: null,
    expectedRatePerMin: null,
    choices: [],
    low: null,
    high: null,
    ...more,
  };
}

export const BLANK_POINT: CardPoint = {
  id: "blank",
  template: null,
  title: "Blank",
  purpose: "",
  place: "air",
  engine: "running",
  positions: [{ control: "COWL", position: "OPEN" }],
  entryText: "",
  entry: [],
  steps: [],
  grid: null,
  readings: [],
  cardTable: true,
  conditions: ["at power", "full power"],
  limits: [],
  aborts: { standing: true, lines: [], ifReached: false },
  recovery: "COWL OPEN (below 105 kt), level, 45 %, 80 kt",
  completion: { rule: "none", runS: null, pastPeakS: null },
  durationMin: 10,
  fuelFlowLPerH: 20,
  objectives: [],
  hazards: [],
  parents: [],
  series: null,
  changes: [],
  order: "F4",
  heightFloor: null,
  needsHeightFloor: false,
  minimumCrewOnly: false,
  smoothAir: false,
  wingFlap: false,
  firstFlight: false,
  soak: false,
};

const step = (id: string, text: string, rpm: number | null = null, manifoldPressureInHg: number | null = null) =>
  ({ id, text, kind: "power", durationS: 60, rpm, manifoldPressureInHg }) as const;

/** T10: eleven rows, one each 1000 ft, with time, OAT, coolant, CHT, oil T and IAT written by hand. */
export const CLIMB: CardPoint = {
  ...BLANK_POINT,
  id: "t10",
  title: "Climb cooling",
  entryText: "level 75 % stabilised, 1000 AGL or above",
  steps: [
    step("a", "2700/30.0 for 1 min, then 2550/28.5, 68 kt ±2", 2700, 30),
    step("b", "to 5 min past highest and above 9000 ft"),
    step("c", "level at 11 000 ft in any case"),
  ],
  grid: { head: "1000", unit: "ft", by: "height", rows: ["1", "2", "3", "4", "5", "6", "7", "8", "9", "10", "11"], timeColumn: true },
  readings: [
    sheetReading("t10-oat", "oat", "oat", "degC", "OAT", null),
    sheetReading("t10-coolant", "coolant", "coolant-panel", "degC", "COOL", [85, 101, "degC"]),
    sheetReading("t10-cht", "cht", "cht-panel", "degF", "CHT", [235, 290, "degF"]),
    sheetReading("t10-oil", "oil-t", "oil-t", "degC", "OIL", [80, 109, "degC"]),
    sheetReading("t10-iat", "iat", "iat", "degC", "IAT", [15, 50, "degC"]),
    sheetReading("t10-tit", "tit", "tit", "degC", "TIT", [700, 855, "degC"], { onSheet: "none", recordedBy: "recorder" }),
    sheetReading("t10-oil-p", "oil-p", "oil-p", "psi", "OIL P", [45, 65, "psi"], { onSheet: "none", recordedBy: "recorder" }),
  ],
  durationMin: 30,
};

/** T13: its own coolant number, on the repeater, in place of the standing one. */
export const SHUT: CardPoint = {
  ...BLANK_POINT,
  id: "t13",
  title: "COWL SHUT, 45 %",
  positions: [{ control: "COWL", position: "SHUT" }],
  entryText: "at the clock, OPEN before; in gliding range, one on board",
  heightFloor: { value: 2500, unit: "ft", reference: "AGL" },
  steps: [step("a", "COWL SHUT, clock"), step("b", "hold until stabilised, 8 min at most", 2200, 20), step("c", "COWL OPEN")],
  grid: { head: "min", unit: null, by: "time", rows: ["0", "2", "4", "6", "8"], timeColumn: false },
  readings: [
    ...CLIMB.readings.slice(0, 5).map((r) => ({ ...r, id: r.id.replace("t10", "t13") })),
    sheetReading("t13-oil-p", "oil-p", "oil-p", "psi", "OIL P", [45, 65, "psi"]),
  ],
  aborts: { standing: true, lines: [abortNumber("coolant", "coolant-repeater", 104.5, 104.5)], ifReached: false },
  durationMin: 30,
};

/** T18, after landing: single readings, a yes-no, a choice, a remark and a limit of its own. */
export const CHECK: CardPoint = {
  ...BLANK_POINT,
  id: "t18",
  title: "Leak check",
  place: "ground",
  positions: [],
  cardTable: false,
  conditions: [],
  entryText: "engine stopped, cowl off, within 30 min",
  steps: [step("a", "look at every joint, photograph first, clean last")],
  readings: [
    sheetReading("t18-catch", "catch-tank", "", "mL", "CATCH", null, {
      parameter: null,
      instrument: null,
      onSheet: "single",
      label: "Catch tank, gained",
    }),
    sheetReading("t18-drips", "", "", "1", "DRIPS", null, {
      parameter: null,
      instrument: null,
      unit: null,
      kind: "yes-no",
      onSheet: "single",
      label: "Any drips",
    }),
    sheetReading("t18-force", "", "", "1", "FORCE", null, {
      parameter: null,
      instrument: null,
      unit: null,
      kind: "choice",
      choices: ["1", "2", "3", "4", "5"],
      onSheet: "single",
      label: "Lever force",
    }),
    sheetReading("t18-remark", "", "", "1", "REMARK", null, {
      parameter: null,
      instrument: null,
      unit: null,
      kind: "text",
      onSheet: "single",
      label: "What was found",
    }),
  ],
  limits: [
    {
      id: "catch",
      reading: "t18-catch",
      label: "Catch tank",
      side: "max",
      value: 150,
      unit: "mL",
      forS: 0,
      statistic: "change from baseline",
      expandedUncertainty: 10,
      source: "PL-01 rev 2",
    },
  ],
  aborts: { standing: false, lines: [abortEvent("any leak")], ifReached: false },
  recovery: "stop, fuel off, stand clear",
  durationMin: 20,
};

export function sheetCard(points: CardPoint[] = [CLIMB], over: Partial<CardDocument["content"]> = {}): CardDocument {
  return {
    format: CARD_FORMAT,
    identity: { id: "card-07", number: "07", letter: "C", author: { id: "engineer", name: "A. Engineer" } },
    content: {
      title: "Climb cooling",
      kind: "flight",
      crew: [
        { role: "pilot", massKg: 92 },
        { role: "observer", massKg: 72 },
      ],
      baggageKg: 6,
      fuelOnBoardL: 64,
      bingoL: 26,
      plannedOn: "2031-05-05",
      firstFlightOfChange: false,
      remarks: "",
      points,
      ...over,
    },
    programme: sheetProgramme(),
  };
}

export const STAMP = { name: "A. Reviewer", role: "reviewer", at: "2031-05-04T17:20:00.000Z", shortDigest: "9F3C-21B0", code: "7KQ2M9" };
