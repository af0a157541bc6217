/**
 * The card and everything it rests on, as one plain document.
 *
 * A draft is assembled from the programme as it stands; a released revision is this document frozen (RFC 8785 JSON and
 * its SHA-256). Print, scan, phone and check all read it, so nothing they need may live elsewhere.
 * Limits, bands and tolerances named "true" are in the parameter's unit; whatever a pilot reads is "on the gauge", in the
 * instrument's unit. Nothing of one aircraft stands in the code: controls, positions, speeds, names are data.
 */
import type { Calibration } from "./calibration";
import type { Unit } from "./units";
import type {
  CompletionRule,
  HazardSeverity,
  HotDayBasis,
  HotDayRule,
  LimitCondition,
  LimitLayer,
  LimitStatistic,
  Probability,
  ReadingKind,
  Sampling,
  Side,
} from "./words";

export const CARD_FORMAT = "greenarc.card/1";

export type Quantity = { value: number; unit: Unit };
export type Band = { low: number | null; high: number | null; unit: Unit };

export type Parameter = {
  code: string; // "coolant"
  name: string; // "Coolant out"
  shortName: string; // as on the sheet's lines: "Coolant"
  unit: Unit; // of its limits and bands
  group: string | null; // "cht": cylinders compared with one another
  hotDayRule: HotDayRule;
  normal: Band | null; // true
  safety: boolean; // wants an expected band and an abort wherever it is read
  stabilises: boolean; // asked to be steady by the rule "stabilised"
  standardRatePerMin: Quantity | null; // fastest rise the standing abort allows for, a difference per minute
};

export type CalibrationRecord = Calibration & {
  id: string;
  unit: Unit; // the gauge's; every figure of the calibration is in it
  method: string;
  reference: string;
  calibratedOn: string;
  validUntil: string;
  disturbedOn: string | null; // sensor moved, re-wired or replaced since
};

export type Instrument = {
  id: string;
  parameter: string;
  name: string; // "COOLANT-PANEL"
  gaugeName: string; // as on the panel: "Coolant"
  unit: Unit;
  shownOn: "panel" | "repeater" | "recorder" | "hand held";
  visibleTo: ("pilot" | "observer")[];
  low: number; // what it can show at all
  high: number;
  markSpacing: number;
  readable: number; // smallest difference a person can read, in the gauge's unit
  calibration: CalibrationRecord | null;
};

/** One programme limit, one layer. Placard and card rows of one kind share parameter, side, appliesWhen and statistic. */
export type Limit = {
  id: string;
  parameter: string;
  side: Side;
  layer: LimitLayer;
  value: number; // true
  unit: Unit;
  appliesWhen: LimitCondition;
  forS: number; // how long a reading may stay beyond it; 0 = never
  statistic: LimitStatistic;
  source: string; // document and revision: "HF-4L-OM rev 6"
  authority: "engine" | "aircraft" | "programme"; // who set it: decides the squawk's severity
};

/** A limit that belongs to one point alone, judged on one of its readings. */
export type PointLimit = {
  id: string;
  reading: string;
  label: string;
  side: Side;
  value: number;
  unit: Unit;
  forS: number;
  statistic: LimitStatistic;
  expandedUncertainty: number | null; // its own; null = the instrument's
  source: string;
};

/** A number to abort at, both ways, or an event ("smoke, smell"). */
export type AbortLine =
  | {
      kind: "number";
      id: string;
      parameter: string;
      side: Side;
      instrument: string;
      appliesWhen: LimitCondition;
      /** In the parameter's unit; of a rate, a difference in it per minute. Set by the rule: the threshold the rule came to, before the
       * number was rounded to a mark. Set true: as written. Set on the gauge: that number turned back. */
      trueValue: number;
      onGauge: number; // what prints, in the gauge's unit
      setBy: "rule" | "true" | "gauge"; // who decided: the rule's proposal, or a person on either scale
      perMinute: boolean; // a rate: a change on the gauge over windowS
      windowS: number | null;
      calledBy: "pilot" | "observer";
    }
  | { kind: "event"; id: string; text: string };

/** The kind with a number. */
export type AbortNumber = Extract<AbortLine, { kind: "number" }>;

export type EntryCondition = {
  id: string;
  parameter: string;
  instrument: string | null;
  relation: "about" | "at least" | "at most";
  value: number; // on the gauge
  tolerance: number | null; // on the gauge, for "about"
  unit: Unit;
};

export type Step = {
  id: string;
  text: string; // a verb first
  kind: "action" | "power" | "cool-down" | "engine stop";
  durationS: number | null;
  rpm: number | null;
  manifoldPressureInHg: number | null;
};

export type Reading = {
  id: string;
  parameter: string | null; // null for a yes-no, a choice, a remark
  label: string; // "Coolant, highest"
  cellHead: string; // as in the grid: "COOL"
  kind: ReadingKind;
  instrument: string | null;
  unit: Unit | null; // the gauge's own
  recordedBy: "pilot" | "recorder" | "observer";
  onSheet: "grid" | "single" | "none"; // where it is written by hand
  sampling: Sampling; // what the debrief asks
  conditions: LimitCondition[]; // when it is read; "always" is understood
  expected: Band | null; // true
  expectedOrigin: string | null;
  expectedRatePerMin: Quantity | null; // own rate where faster than the parameter's standard
  choices: string[]; // for kind "choice"
  low: number | null; // possible values where no instrument says
  high: number | null;
};

export type Completion = {
  rule: CompletionRule;
  runS: number | null; // "whole run": the time written
  pastPeakS: number | null; // "whole run" of a soak: logged to peak plus this
};

export type CardPoint = {
  id: string;
  template: { id: string; code: string; revision: number } | null;
  title: string; // at most five words
  purpose: string;
  place: "ground" | "air";
  engine: "running" | "stopped";
  positions: { control: string; position: string }[]; // printed first in the entry line
  entryText: string; // the rest of the entry line
  entry: EntryCondition[];
  steps: Step[];
  grid: { head: string; unit: Unit | null; by: "time" | "height" | "free"; rows: string[]; timeColumn: boolean } | null;
  readings: Reading[];
  cardTable: boolean; // judge against every programme limit whose "applies when" fits
  conditions: LimitCondition[]; // that occur in this point
  limits: PointLimit[];
  aborts: { standing: boolean; lines: AbortLine[]; ifReached: boolean };
  recovery: string;
  completion: Completion;
  durationMin: number;
  fuelFlowLPerH: number;
  objectives: string[]; // codes
  hazards: string[]; // codes
  parents: string[]; // template codes that must be clear first
  series: { name: string; level: Quantity; base: boolean } | null; // build-up in one variable
  changes: ("power" | "position" | "speed" | "height")[]; // what differs from its parent
  order: string; // "G2", "F4": ground before flight, lower first
  heightFloor: { value: number; unit: Unit; reference: "AGL" | "PA" } | null;
  needsHeightFloor: boolean; // stall, engine cut, restricted position in the air
  minimumCrewOnly: boolean;
  smoothAir: boolean;
  wingFlap: boolean;
  firstFlight: boolean;
  soak: boolean;
};

export type Hazard = {
  code: string;
  title: string;
  cause: string;
  effect: string;
  before: { severity: HazardSeverity; probability: Probability };
  after: { severity: HazardSeverity; probability: Probability };
  mitigations: { kind: "design" | "procedure" | "training" | "equipment"; text: string }[];
  owner: string;
};

export type Objective = { code: string; question: string; success: string; priority: "must" | "should" | "nice" };

/** A thing the pilot can set, with its named positions. */
export type Control = {
  name: string; // "COWL"
  positions: { name: string; groundOnly: boolean; maxSpeedKt: number | null; restricted: boolean }[];
  recoverTo: string; // the position a recovery starts with
};

export type Configuration = {
  id: string;
  number: string; // "C-14"
  fitted: string;
  massKg: number;
  armM: number;
  signedBy: string | null;
  signedAt: string | null;
  gapsMeasuredOn: string | null;
  disturbedOn: string | null;
};

export type Aircraft = {
  registration: string;
  type: string;
  engine: string;
  maxMassKg: number;
  emptyMassKg: number;
  emptyArmM: number;
  envelope: { massKg: number; cgM: number }[];
  stations: { name: string; armM: number; maxKg: number }[];
  fuelArmM: number;
  fuelDensityKgPerL: number;
  fuelCapacityL: number;
  fuelUnusableL: number;
  speeds: { code: string; name: string; valueKt: number; airspeed: "KIAS" | "KCAS" }[]; // V_NE, V_FE, V_NO, V_S1 …
  criticalAltitudeFt: number | null;
  minimumCrew?: number; // 1 unless stated
};

/** The programme as a card sees it: all that the document freezes besides the card itself. */
export type ProgrammeSnapshot = {
  id: string;
  name: string;
  notice: string | null; // "Invented limits, for no real aircraft."
  hotDayBasis: HotDayBasis | null;
  airfield: { name: string; elevationFt: number };
  aircraft: Aircraft;
  controls: Control[];
  coolDown: { durationS: number; text: string } | null; // the timed step before an engine stop
  callWords: { word: string; meaning: string }[];
  goNoGo: string[];
  thenLine: { air: string; ground: string };
  thenActions: { air: string[]; ground: string[] };
  standingAborts: AbortLine[];
  reactionMin: number;
  fuelPlan: { taxiL: number; returnL: number; reserveL: number; taxiMin?: number; returnMin?: number; resetMin?: number }; // reset: minutes between points, 2 unless stated
  daMaximumFt: number | null;
  configuration: Configuration | null;
  parameters: Parameter[];
  instruments: Instrument[];
  limits: Limit[];
  hazards: Hazard[];
  objectives: Objective[];
};

/** What an engineer writes: the part that a draft saves. */
export type CardContent = {
  title: string;
  kind: "ground run" | "taxi" | "flight" | "inspection";
  crew: { role: string; massKg: number }[];
  baggageKg: number;
  fuelOnBoardL: number | null;
  bingoL: number | null;
  plannedOn: string | null;
  firstFlightOfChange: boolean;
  remarks: string;
  points: CardPoint[];
};

export type CardIdentity = { id: string; number: string; letter: string; author: { id: string; name: string } };

export type CardDocument = {
  format: typeof CARD_FORMAT;
  programme: ProgrammeSnapshot;
  identity: CardIdentity;
  content: CardContent;
};

/** Puts a card and its programme together; nothing is computed and nothing dropped. */
export function assembleCard(programme: ProgrammeSnapshot, identity: CardIdentity, content: CardContent): CardDocument {
  return { format: CARD_FORMAT, programme, identity, content };
}

export function instrumentOf(card: CardDocument, id: string | null): Instrument | undefined {
  return id === null ? undefined : card.programme.instruments.find((instrument) => instrument.id === id);
}

export function parameterOf(card: CardDocument, code: string | null): Parameter | undefined {
  return code === null ? undefined : card.programme.parameters.find((parameter) => parameter.code === code);
}

/** The abort lines in force at a point: its own number replaces the standing one for the same parameter and side. */
export function abortsOf(programme: ProgrammeSnapshot, point: CardPoint): AbortLine[] {
  const own = point.aborts.lines;
  const replaced = (line: AbortLine) =>
    line.kind === "number" &&
    own.some((o) => o.kind === "number" && o.parameter === line.parameter && o.side === line.side && o.perMinute === line.perMinute);
  return [...(point.aborts.standing ? programme.standingAborts.filter((line) => !replaced(line)) : []), ...own];
}
