/** The fixed words of the trade, once. Schema, forms, screens and prints import them from here. */

export const VERDICTS = ["within", "marginal", "exceeded", "no verdict"] as const;
export type Verdict = (typeof VERDICTS)[number];

/** Why a verdict is withheld, in the order in which the first that applies is shown. */
export const REASONS = [
  "no reading",
  "wrong configuration",
  "not calibrated",
  "outside calibrated range",
  "uncertainty unknown",
  "off condition",
  "not stabilised",
  "stopped early",
] as const;
export type Reason = (typeof REASONS)[number];

export const NOTES = ["above normal", "below normal", "by less than U", "clearly"] as const;
export type Note = (typeof NOTES)[number];

export const READING_KINDS = ["number", "count", "yes-no", "choice", "text", "photo"] as const;
export type ReadingKind = (typeof READING_KINDS)[number];

/** What the debrief asks of a number: one value, its highest, its lowest, both, or rows. */
export const SAMPLINGS = ["single", "highest", "lowest", "lowest and highest", "series"] as const;
export type Sampling = (typeof SAMPLINGS)[number];

export const COMPLETION_RULES = ["stabilised", "5 min past peak", "whole run", "none"] as const;
export type CompletionRule = (typeof COMPLETION_RULES)[number];

export const OUTCOMES = ["flown", "part", "aborted", "skipped"] as const;
export type Outcome = (typeof OUTCOMES)[number];

export const DISPOSITIONS = ["accept", "repeat", "void"] as const;
export type Disposition = (typeof DISPOSITIONS)[number];

export const ABORT_DISCIPLINES = ["called", "missed", "early"] as const;
export type AbortDiscipline = (typeof ABORT_DISCIPLINES)[number];

export const STEP_DECISIONS = ["clear to next step", "smaller step", "hold"] as const;
export type StepDecision = (typeof STEP_DECISIONS)[number];

export const CARD_STATES = ["draft", "in review", "released", "superseded", "withdrawn"] as const;
export type CardState = (typeof CARD_STATES)[number];

export const SORTIE_STATES = ["planned", "briefed", "flown", "debriefed", "closed"] as const;
export type SortieState = (typeof SORTIE_STATES)[number];

export const SORTIE_KINDS = ["ground run", "taxi", "flight", "inspection"] as const;
export type SortieKind = (typeof SORTIE_KINDS)[number];

export const SQUAWK_SEVERITIES = ["grounding", "before next test", "monitor"] as const;
export type SquawkSeverity = (typeof SQUAWK_SEVERITIES)[number];

export const SQUAWK_STATES = ["open", "assessed", "dispositioned", "verified", "closed"] as const;
export type SquawkState = (typeof SQUAWK_STATES)[number];

export const SQUAWK_DISPOSITIONS = ["rectified", "no fault found", "deferred with limit", "accepted as is"] as const;
export type SquawkDisposition = (typeof SQUAWK_DISPOSITIONS)[number];

export const SEVERITIES = ["must", "should"] as const;
export type FindingSeverity = (typeof SEVERITIES)[number];

export const SHEET_STANDINGS = ["in force", "not in force: do not fly with it", "unknown"] as const;
export type SheetStanding = (typeof SHEET_STANDINGS)[number];

export const ROLES = ["admin", "engineer", "reviewer", "pilot", "mechanic", "observer"] as const;
export type Role = (typeof ROLES)[number];

export const LIMIT_CONDITIONS = ["always", "at power", "idle", "take-off", "full power", "cold start"] as const;
export type LimitCondition = (typeof LIMIT_CONDITIONS)[number];

export const LIMIT_STATISTICS = ["instant", "sustained", "rate", "spread", "peak to peak", "change from baseline"] as const;
export type LimitStatistic = (typeof LIMIT_STATISTICS)[number];

export const LIMIT_LAYERS = ["placard", "card"] as const;
export type LimitLayer = (typeof LIMIT_LAYERS)[number];

export const SIDES = ["max", "min"] as const;
export type Side = (typeof SIDES)[number];

export const COMPARISONS = ["abort", "as flown, card", "as flown, placard", "hot day, placard"] as const;
export type Comparison = (typeof COMPARISONS)[number];

export const CALL_WORDS = ["terminate", "abort", "knock it off"] as const;
export type CallWord = (typeof CALL_WORDS)[number];

export const HOT_DAY_RULES = ["plus-one", "barrel", "ratio", "none"] as const;
export type HotDayRule = (typeof HOT_DAY_RULES)[number];

export const HOT_DAY_BASES = ["us", "metric"] as const;
export type HotDayBasis = (typeof HOT_DAY_BASES)[number];

export const RISK_LEVELS = ["Eliminated", "Low", "Medium", "Serious", "High"] as const;
export type RiskLevel = (typeof RISK_LEVELS)[number];

export const PROBABILITIES = ["A", "B", "C", "D", "E", "F"] as const;
export type Probability = (typeof PROBABILITIES)[number];
export type HazardSeverity = 1 | 2 | 3 | 4;

/** Printed on every sheet and report. */
export const SHEET_CAUTION =
  "Planning and record aid. Not an approval, not an airworthiness release. The pilot in command decides. Follow the aircraft and engine makers' current instructions and the law where you fly.";
/** First line of the first debrief screen. */
export const DEBRIEF_CAUTION = "Cap stays closed. Keep clear of the propeller.";
export const SCAN_CAUTION = "In force is not permission to fly.";
