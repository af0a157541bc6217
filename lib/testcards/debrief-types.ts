/** The debrief as typed on the phone, the fields it is made of, and the report the check answers. */
import type { Limit, Quantity } from "./card";
import type { Finding } from "./readiness-types";
import type { Unit } from "./units";
import type {
  AbortDiscipline,
  CallWord,
  Comparison,
  Disposition,
  HotDayBasis,
  LimitCondition,
  LimitStatistic,
  Note,
  Outcome,
  Reason,
  Side,
  SortieKind,
  SquawkSeverity,
  StepDecision,
  Verdict,
} from "./words";

export type Turbulence = "none" | "light" | "moderate" | "severe";

/** A value always stands in the gauge's own unit unless `unit` says that the gauge was changed. */
export type ReadingEntry = {
  reading: string;
  value: number | null; // single, highest or lowest, by the reading's sampling; for "lowest and highest" the highest
  lowest: number | null; // for "lowest and highest"
  atS: number | null; // when, from the start of the point
  altitudeFt: number | null; // pressure altitude then, on the altimeter
  oat: number | null; // on the OAT gauge then
  sameMomentAs: string | null; // another reading whose moment it shares
  rows: { atS: number | null; label: string; value: number }[]; // for sampling "series"
  answer: string | null; // yes-no ("yes" | "no"), choice, text
  unit: Unit | null; // only with "gauge changed"
  asRead: boolean; // outside the expected band and confirmed
};

export type AbortCall = {
  point: string;
  word: CallWord | null; // null while it is not said yet
  trigger: string; // a parameter code, or words
  onGauge: number | null;
  durationS: number | null;
  action: string;
  recovered: boolean | null;
};

export type PointDebrief = {
  point: string;
  outcome: Outcome | null;
  positions: { control: string; position: string }[]; // as flown
  onCondition: boolean | null;
  ranForS: number | null; // how long the point itself ran
  topAltitudeFt: number | null;
  readings: ReadingEntry[];
  comment: string;
};

export type DebriefTimes = {
  offBlocks: string | null;
  takeOff: string | null;
  landing: string | null;
  onBlocks: string | null;
  engineStart: string | null;
  engineStop: string | null;
  start: string | null;
  end: string | null;
};

export type Debrief = {
  kind: SortieKind;
  revisionsFlown: { card: string; letter: string; note: string }[]; // letter "other" with a note
  times: DebriefTimes; // UTC hh:mm
  fuel: { start: Quantity | null; end: Quantity | null; uplift: Quantity | null };
  weather: { oat: Quantity | null; qnh: Quantity | null; windFromDeg: number | null; windKt: number | null; turbulence: Turbulence | null };
  safety: { limitExceeded: boolean | null; callMade: boolean | null; rough: boolean | null; calls: AbortCall[]; note: string };
  points: PointDebrief[];
  squawks: { id: string; system: string; text: string; flyAgain: boolean | null }[];
  comment: string;
};

export type FieldPart =
  | "value"
  | "lowest"
  | "highest"
  | "at"
  | "altitude"
  | "oat"
  | "rows"
  | "answer"
  | "outcome"
  | "position"
  | "on condition"
  | "ran for"
  | "top altitude"
  | "comment"
  | "time"
  | "fuel"
  | "weather"
  | "revision"
  | "safety";

/** One thing the phone asks. Form, schema and the server's check all come from this list. */
export type DebriefField = {
  key: string; // "times.takeOff", "<pointId>.outcome", "<pointId>.<readingId>.value"
  section: "flight" | "safety" | "point";
  point: string | null;
  reading: string | null;
  part: FieldPart;
  label: string;
  kind: "number" | "count" | "yes-no" | "choice" | "text" | "time of day" | "duration" | "series" | "photo";
  unit: Unit | null;
  low: number | null; // refusal range, in `unit`
  high: number | null;
  step: number | null; // readable
  expected: { low: number | null; high: number | null } | null; // on the gauge: outside it the form asks "as read?"
  choices: string[];
  rows: { label: string; atS: number | null }[]; // for "series"
  required: boolean;
  recordedBy: "pilot" | "recorder" | "observer";
};

export type FieldError = { key: string; message: string };

export type JudgedValue = { value: number; unit: Unit; expandedUncertainty: number | null };

export type CheckLine = {
  point: string;
  reading: string;
  parameter: string | null;
  comparison: Comparison;
  statistic: LimitStatistic;
  onGauge: { value: number; unit: Unit } | null;
  asTrue: JudgedValue | null; // in the limit's unit
  hotDay:
    | (JudgedValue & {
        difference: number;
        clamped: boolean;
        ambient: Quantity;
        hotAmbient: Quantity;
        pressureAltitudeFt: number;
        basis: HotDayBasis;
      })
    | null;
  limit: {
    id: string | null;
    side: Side;
    value: number;
    unit: Unit;
    source: string;
    authority: Limit["authority"] | null;
    appliesWhen: LimitCondition;
    forS: number;
  } | null;
  verdict: Verdict;
  margin: number | null; // in hand to the limit, in its unit; negative is past it
  probabilityWithin: number | null;
  notes: (Note | Reason)[];
  reasons: Reason[];
  informationOnly: boolean;
  required: boolean;
  why: string; // the reason in figures: "ran 3:10 of 5:00", "slope known to 1.15 of 0.556 °C/min"
  otherBasis: { basis: HotDayBasis; hotDay: JudgedValue; verdict: Verdict; margin: number | null } | null; // only where it changes the verdict
  /** Only on "abort" lines. There the verdict says no more than whether the number was reached, and counts in no other verdict: show this word. */
  discipline?: AbortDiscipline | null;
};

export type DisciplineLine = {
  point: string;
  parameter: string;
  side: Side;
  instrument: string;
  worstOnGauge: number | null;
  thresholdOnGauge: number;
  unit: Unit;
  discipline: AbortDiscipline | null;
};

export type PointReport = {
  point: string;
  outcome: Outcome | null;
  completion: Reason | null; // null = its rule was met
  completionWhy: string;
  worst: Verdict;
  disciplines: DisciplineLine[];
  outsideExpected: { reading: string; asTrue: number; unit: Unit; low: number | null; high: number | null }[];
  decision: StepDecision;
  because: string[];
};

export type SuggestedSquawk = { point: string; reading: string; severity: SquawkSeverity; text: string };

/** What the check needs and neither card nor debrief holds. */
export type CheckContext = {
  flownOn: string; // YYYY-MM-DD: which calibrations were valid
  configurationId: string | null; // of the sortie
  stationPressureAltitudeFt: number | null; // null: from the elevation and the debrief's QNH
  calibrations: Record<string, import("./card").CalibrationRecord> | null; // by instrument: a recalibration after the flight
  amendments: { reading: string; value: number }[];
  dispositions: { point: string; disposition: Disposition }[];
  groundingOpen: boolean;
  baselines?: Record<string, number>; // by reading, on the gauge: what "change from baseline" is counted from
  starts?: { point: string; decision: StepDecision }[]; // of a point that continues a series: what decideStep gave
};

export type CheckReport = {
  coreVersion: string;
  card: { id: string; number: string; letter: string };
  basis: HotDayBasis | null;
  lines: CheckLine[];
  points: PointReport[];
  findings: Finding[];
  squawks: SuggestedSquawk[];
  decision: StepDecision;
  because: string[];
};
