import { formatMargin, formatNumber } from "@/lib/format/number";
import { formatQuantity, withUnit } from "@/lib/format/unit";
import { decideStep, predictNext } from "@/lib/testcards/buildup";
import type { CardPoint, Instrument, Parameter } from "@/lib/testcards/card";
import { convertDifference, type Unit } from "@/lib/testcards/units";
import type { StepDecision } from "@/lib/testcards/words";
import type { StepDecisionRow } from "@/lib/workflow/programme/queries";

export type Rung = { key: string; name: string; state: "cleared" | "next" | "later" | "held"; words: string; because: string[] };

/** Where the series is called off: the point's own number, true, and the U of the gauge it is called on. */
function threshold(point: CardPoint, instruments: Instrument[], parameters: Parameter[]) {
  const line = point.aborts.lines.find((each) => each.kind === "number" && !each.perMinute);
  if (line?.kind !== "number") return null;
  const instrument = instruments.find(({ id }) => id === line.instrument);
  const unit = parameters.find(({ code }) => code === line.parameter)?.unit ?? instrument?.unit;
  if (!unit) return null;
  const U = instrument?.calibration?.expandedUncertainty ?? null;
  return {
    value: line.trueValue,
    side: line.side,
    unit,
    expandedUncertainty: U === null || !instrument ? null : convertDifference(U, instrument.unit, unit),
  };
}

type Step = StepDecisionRow & { level: number; measured: number };
const isMeasured = (row: StepDecisionRow): row is Step => row.level !== null && row.measured !== null;

const inBand = ({ predicted, measured }: Step) => predicted === null || (measured >= predicted.low && measured <= predicted.high);

/** The rungs of one series from the lowest up: those flown, the next, and the one after it. */
export function seriesRungs(point: CardPoint, rows: StepDecisionRow[], instruments: Instrument[], parameters: Parameter[]): Rung[] {
  const { series } = point;
  const limit = threshold(point, instruments, parameters);
  if (!series || !limit) return [];
  const flown = rows.filter(isMeasured);
  const nameAt = (level: number) => `${series.name}, ${formatQuantity({ value: level, unit: series.level.unit })}`;
  const rungs: Rung[] = flown.map((step) => ({
    key: step.id,
    name: nameAt(step.level),
    state: step.decision === "hold" ? "held" : "cleared",
    words: step.decision === "clear to next step" ? inHand(step.measured, limit) : `${step.decision}, ${inHand(step.measured, limit)}`,
    because: step.because,
  }));
  const last = flown.at(-1);
  if (!last) return [{ key: "first", name: nameAt(series.level.value), state: "next", words: "the first step", because: [] }];
  const size = flown.length > 1 ? last.level - (flown.at(-2)?.level ?? last.level) : series.level.value;
  const results = flown.map(({ level, measured }) => ({ level, value: measured }));
  for (const [i, level] of [last.level + size, last.level + 2 * size].entries()) {
    const { decision, because } = decideStep({
      results,
      nextLevel: level,
      threshold: limit.value,
      side: limit.side,
      expandedUncertainty: limit.expandedUncertainty,
      lastInBand: inBand(last),
    });
    const cleared = i === 0 && decision === "clear to next step" && last.decision === "clear to next step";
    rungs.push({
      key: `next-${i}`,
      name: nameAt(level),
      state: cleared ? "next" : "later",
      words: cleared ? expected(results, level, limit) : decisionWords(decision, last, i),
      because,
    });
  }
  return rungs;
}

function decisionWords(decision: StepDecision, last: Step, ahead: number): string {
  if (last.decision !== "clear to next step" && ahead === 0) return `waits: ${last.decision}`;
  return decision === "clear to next step" ? "after the step below it" : decision;
}

function inHand(measured: number, { value, side, unit }: { value: number; side: "max" | "min"; unit: Unit }): string {
  const margin = side === "max" ? value - measured : measured - value;
  return `${withUnit(formatMargin(margin), unit)} in hand`;
}

function expected(
  results: { level: number; value: number }[],
  level: number,
  { expandedUncertainty, unit }: { expandedUncertainty: number | null; unit: Unit },
): string {
  if (expandedUncertainty === null) return "U unknown: nothing can be expected";
  const { low, high } = predictNext(results, level, { confidence: 0.95, expandedUncertainty });
  return withUnit(`${formatNumber(low, 1)} to ${formatNumber(high, 1)}`, unit).concat(" expected");
}
