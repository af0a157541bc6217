import type { CardDocument } from "./card";
import type { FontWidths } from "./sheet-types";
import type { FindingSeverity, RiskLevel, SortieKind, StepDecision } from "./words";

/** Where a finding belongs, so that a screen can jump to it. */
export type FindingPlace =
  | { at: "card"; field?: "title" | "crew" | "fuelOnBoardL" | "bingoL" | "plannedOn" | "points" }
  | {
      at: "point";
      point: string;
      field?:
        | "positions"
        | "entry"
        | "steps"
        | "readings"
        | "limits"
        | "aborts"
        | "recovery"
        | "completion"
        | "durationMin"
        | "objectives"
        | "heightFloor"
        | "series"
        | "grid";
      item?: string;
    }
  | { at: "instrument"; instrument: string }
  | { at: "limit"; limit: string }
  | { at: "hazard"; hazard: string }
  | { at: "programme"; field?: string }
  | { at: "sortie"; field?: string };

export type Finding = { code: string; severity: FindingSeverity; message: string; where: FindingPlace };

/** How far a build-up parent has come: the last decision that stands on it, or why there is none. */
export type BuildUpState = { code: string; state: StepDecision | "not flown" | "not reviewed"; from: "flown" | "paper records" | null };

/** What a rule needs and the card does not hold. Plain data, gathered by the server, sent to the builder. */
export type CardContext = {
  today: string; // YYYY-MM-DD
  currentConfiguration: { id: string; number: string; signed: boolean } | null;
  releaser: { id: string; name: string; residualRisk: RiskLevel } | null; // who is about to release, if known
  buildUp: BuildUpState[];
  seriesResults: {
    series: string;
    parameter?: string;
    results: { level: number; value: number }[];
    expandedUncertainty: number | null;
    lastInBand: boolean;
  }[];
  groundingSquawks: { id: string; number: string; text: string }[];
  objectivesCovered: string[]; // by any point of the programme
  digest: string | null; // of this document as assembled now
  releasedDigest: string | null; // as it was signed, where it was
  widths: FontWidths;
};

export type SortiePlan = {
  id: string;
  kind: SortieKind;
  plannedOn: string;
  cards: {
    document: CardDocument;
    state: string;
    digest: string | null;
    releasedDigest: string | null;
    acceptance: { digest: string; at: string; accepted: boolean } | null;
  }[];
  crew: { name: string; role: string; massKg: number }[];
  baggageKg: number;
  fuelOnBoardL: number | null;
  configuration: { id: string; number: string } | null;
  forecastOatC: number | null;
  dayPlan: { daylight: string | null; dutyTime: string | null; runway: string | null };
};

export type SortieContext = Omit<CardContext, "digest" | "releasedDigest" | "widths">;
