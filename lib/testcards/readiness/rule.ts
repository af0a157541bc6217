import type {
  AbortLine,
  AbortNumber,
  CardContent,
  CardDocument,
  CardPoint,
  Control,
  Instrument,
  Parameter,
  ProgrammeSnapshot,
} from "../card";
import type { Finding, FindingPlace, SortieContext, SortiePlan } from "../readiness-types";
import type { SheetOverflow, SheetPage } from "../sheet-types";

/** One thing a rule found: the sentence and the place. Code and severity are the rule's. */
export type Problem = { message: string; where: FindingPlace };

/** The sheet as laid out, for the rules that look at paper. Null: nothing was laid out, those rules stay silent. */
export type SheetFacts = { overflow: SheetOverflow[]; pages: SheetPage[] } | null;

export type PointFacts = {
  point: CardPoint;
  name: string; // "Point 2", the number in its circle
  lines: AbortLine[]; // in force here: standing ones and its own
  speeds: StatedSpeed[];
  taken: { control: Control; position: Control["positions"][number] }[]; // stated in the entry line or set by a step
};

export type InstrumentUse = { id: string; instrument: Instrument | undefined; use: string; where: FindingPlace };
export type StatedSpeed = { kt: number; said: string; field: "entry" | "steps"; item?: string };

/** A card looked up once, so that no rule searches a list again. */
export type CardFacts = {
  card: CardDocument;
  content: CardContent;
  programme: ProgrammeSnapshot;
  context: SortieContext & { digest: string | null; releasedDigest: string | null };
  on: string; // the day it is planned for, or today
  name: string; // "Card 07"
  points: PointFacts[];
  parameters: Map<string, Parameter>;
  instruments: Map<string, Instrument>;
  used: InstrumentUse[]; // each instrument of the card once
  sheet: SheetFacts;
};

export type SortieFacts = { sortie: SortiePlan; context: SortieContext; cards: CardFacts[] };

export type Rule = {
  number: string; // "10a"
  code: string; // stable: never re-used
  severity: Finding["severity"];
  at: "card" | "both" | "sortie";
  card?: (facts: CardFacts) => Problem[];
  sortie?: (facts: SortieFacts) => Problem[];
};

export const isNumber = (line: AbortLine): line is AbortNumber => line.kind === "number";

type PointField = Extract<FindingPlace, { at: "point" }>["field"];

export function atPoint({ point }: PointFacts, field?: PointField, item?: string): FindingPlace {
  return { at: "point", point: point.id, ...(field && { field }), ...(item && { item }) };
}

/** A draft may hold units that do not fit one another; the unit rule says so, the others pass over the figure. */
export function whereItFits<T>(work: () => T): T | null {
  try {
    return work();
  } catch (error) {
    if (error instanceof RangeError) return null;
    throw error;
  }
}
