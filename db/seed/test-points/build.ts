import type { AbortLine, AbortNumber, CardPoint, EntryCondition, PointLimit, Reading, Step } from "@/lib/testcards/card";
import type { Unit } from "@/lib/testcards/units";
import type { LimitCondition, LimitStatistic, Side } from "@/lib/testcards/words";
import { seedId } from "../ids";
import { instrumentNamed } from "../instruments";

const POINT_LIMITS = "PL-01 rev 2";

export function ownLimit(
  reading: string,
  side: Side,
  value: number,
  unit: Unit,
  expandedUncertainty: number | null,
  label: string,
  extra: { forS?: number; statistic?: LimitStatistic; source?: string } = {},
): PointLimit {
  const { forS = 0, statistic = "instant", source = POINT_LIMITS } = extra;
  return {
    id: `${reading}-${side}${forS ? "-held" : ""}`,
    reading,
    label,
    side,
    value,
    unit,
    forS,
    statistic,
    expandedUncertainty,
    source,
  };
}

type AbortOptions = { side?: Side; when?: LimitCondition; setBy?: AbortNumber["setBy"]; by?: AbortNumber["calledBy"]; windowS?: number };

/** `trueValue` is the threshold of the rule in the parameter's unit, `onGauge` the number that prints. */
export function abortAt(parameter: string, on: string, trueValue: number, onGauge: number, options: AbortOptions = {}): AbortNumber {
  const side = options.side ?? "max";
  return {
    kind: "number",
    id: `abort-${parameter}-${side}${options.windowS ? "-rate" : ""}`,
    parameter,
    side,
    instrument: instrumentNamed(on).id,
    appliesWhen: options.when ?? "always",
    trueValue,
    onGauge,
    setBy: options.setBy ?? "rule",
    perMinute: options.windowS !== undefined,
    windowS: options.windowS ?? null,
    calledBy: options.by ?? "pilot",
  };
}

export const abortIf = (...texts: string[]): AbortLine[] =>
  texts.map((text, index) => ({ kind: "event", id: `abort-event-${index + 1}`, text }));

type StepDraft = string | Omit<Step, "id">;
const step = (text: string, kind: Step["kind"], durationS: number | null, rpm: number | null, map: number | null): Omit<Step, "id"> => ({
  text,
  kind,
  durationS,
  rpm,
  manifoldPressureInHg: map,
});
export const power = (text: string, rpm: number, map: number | null, durationS: number | null) => step(text, "power", durationS, rpm, map);
export const coolDown = (text = "1000 rpm 3 min, turbine cool-down") => step(text, "cool-down", 180, 1000, null);
export const engineStop = (text: string) => step(text, "engine stop", null, null, null);

export type Spec = {
  title: string;
  purpose: string;
  place: CardPoint["place"];
  cowl?: string;
  entryText: string;
  entry?: EntryCondition[];
  steps: StepDraft[];
  grid?: CardPoint["grid"];
  readings: Reading[];
  conditions?: LimitCondition[];
  limits?: PointLimit[];
  aborts?: AbortLine[];
  recovery: string;
  completion: CardPoint["completion"]["rule"] | CardPoint["completion"];
  min: number;
  flow: number;
  objectives: string[];
  hazards: string[];
  parents: string[];
  changes: CardPoint["changes"];
  order: string;
} & Partial<
  Pick<
    CardPoint,
    | "engine"
    | "cardTable"
    | "series"
    | "heightFloor"
    | "needsHeightFloor"
    | "minimumCrewOnly"
    | "smoothAir"
    | "wingFlap"
    | "firstFlight"
    | "soak"
  >
> & {
    standing?: boolean;
    ifReached?: boolean;
  };

export function testPoint(code: `T${string}`, spec: Spec): CardPoint {
  // ids inside a template are "<code>-<name>", so that they stay apart on a card of several points
  const inside = (id: string) => `${code.toLowerCase()}-${id}`;
  const named = <T extends { id: string }>(items: T[] = []): T[] => items.map((item) => ({ ...item, id: inside(item.id) }));
  const id = seedId("test point", Number(code.slice(1)));
  return {
    id,
    template: { id, code, revision: 1 },
    title: spec.title,
    purpose: spec.purpose,
    place: spec.place,
    engine: spec.engine ?? "running",
    positions: spec.cowl ? [{ control: "COWL", position: spec.cowl }] : [],
    entryText: spec.entryText,
    entry: named(spec.entry),
    steps: spec.steps.map((item, index) => ({
      id: inside(`step-${index + 1}`),
      ...(typeof item === "string" ? step(item, "action", null, null, null) : item),
    })),
    grid: spec.grid ?? null,
    readings: named(spec.readings),
    cardTable: spec.cardTable ?? true,
    conditions: spec.conditions ?? [],
    limits: (spec.limits ?? []).map((limit) => ({ ...limit, id: inside(`limit-${limit.id}`), reading: inside(limit.reading) })),
    aborts: { standing: spec.standing ?? true, lines: named(spec.aborts), ifReached: spec.ifReached ?? false },
    recovery: spec.recovery,
    completion: typeof spec.completion === "string" ? { rule: spec.completion, runS: null, pastPeakS: null } : spec.completion,
    durationMin: spec.min,
    fuelFlowLPerH: spec.flow,
    objectives: spec.objectives,
    hazards: spec.hazards,
    parents: spec.parents,
    series: spec.series ?? null,
    changes: spec.changes,
    order: spec.order,
    heightFloor: spec.heightFloor ?? null,
    needsHeightFloor: spec.needsHeightFloor ?? false,
    minimumCrewOnly: spec.minimumCrewOnly ?? false,
    smoothAir: spec.smoothAir ?? false,
    wingFlap: spec.wingFlap ?? false,
    firstFlight: spec.firstFlight ?? false,
    soak: spec.soak ?? false,
  };
}

export const byTime = (head: string, rows: string[]): CardPoint["grid"] => ({ head, unit: null, by: "time", rows, timeColumn: false });
export const byHeight = (rows: string[]): CardPoint["grid"] => ({ head: "1000 ft", unit: null, by: "height", rows, timeColumn: true });
export const freely = (head: string, rows: string[], unit: Unit | null = null): CardPoint["grid"] => ({
  head,
  unit,
  by: "free",
  rows,
  timeColumn: false,
});
export const counting = (from: number, to: number, by = 1): string[] =>
  Array.from({ length: Math.floor((to - from) / by) + 1 }, (_, index) => String(from + index * by));
export const within = (runMin: number): CardPoint["completion"] => ({ rule: "whole run", runS: runMin * 60, pastPeakS: null });
