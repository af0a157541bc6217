import { predictNext } from "../buildup";
import { correctReading } from "../calibration";
import type { AbortNumber, CardPoint } from "../card";
import { convert, type Unit } from "../units";
import { atPoint, type CardFacts, isNumber, type PointFacts, type Problem, type Rule, whereItFits } from "./rule";
import { amount, apart, figure, list, midSentence, quantity, withUnit } from "./say";

const CONFIDENCE = 0.95;
const FEWEST_RESULTS = 3;
/** A step may be at most this many times the largest earlier one: common practice, no source. */
const LONGEST_STEP_RATIO = 1.5;
const EPSILON = 1e-9;

function parentNotClear(facts: CardFacts): Problem[] {
  const states = new Map(facts.context.buildUp.map((parent) => [parent.code, parent.state]));
  return facts.points.flatMap((at) =>
    at.point.parents.flatMap((parent): Problem[] => {
      const state = states.get(parent) ?? "not flown";
      if (state === "clear to next step" || state === "smaller step") return [];
      const fault = state === "hold" ? "is on hold" : `is ${state}`;
      return [
        { message: `${at.name}: its build-up parent ${parent} ${fault}. Fly or decide it first.`, where: atPoint(at, "series", parent) },
      ];
    }),
  );
}

const resultsFor = (facts: CardFacts, point: CardPoint) => facts.context.seriesResults.find((s) => s.series === point.series?.name);

function stepSkipped(facts: CardFacts): Problem[] {
  return facts.points.flatMap((at): Problem[] => {
    const { series } = at.point;
    if (!series || series.base) return [];
    const levels = [...new Set((resultsFor(facts, at.point)?.results ?? []).map((r) => r.level))].sort((a, b) => a - b);
    const where = atPoint(at, "series");
    const here = `${at.name}: ${series.name} at ${quantity(series.level)}`;
    if (levels.length < 2)
      return [
        {
          message: `${here} has ${levels.length} earlier level${levels.length === 1 ? "" : "s"} flown and accepted; a step is skipped. Fly the points between first.`,
          where,
        },
      ];
    const step = Math.min(...levels.map((level) => Math.abs(series.level.value - level)));
    const largest = Math.max(...levels.slice(1).map((level, i) => level - (levels[i] ?? level)));
    if (step <= LONGEST_STEP_RATIO * largest + EPSILON) return [];
    const unit = series.level.unit;
    return [
      {
        message: `${here} is a step of ${amount(step, unit)}, more than ${LONGEST_STEP_RATIO} times the largest earlier step, ${amount(largest, unit)}. Put in a point between.`,
        where,
      },
    ];
  });
}

/** Ground before flight, lower number first; null where the order is written in words. */
function orderOf(point: CardPoint): number | null {
  const found = /^([GF])(\d+)/.exec(point.order.trim());
  return found ? (found[1] === "F" ? 1000 : 0) + Number(found[2]) : null;
}

function outOfOrder(facts: CardFacts): Problem[] {
  return facts.points.flatMap((at, i): Problem[] => {
    const earlier = facts.points.slice(0, i);
    const twin = earlier.find((other) => other.point.id === at.point.id);
    if (twin) return [{ message: `${twin.name} and ${at.name} share a number. Renumber.`, where: atPoint(at) }];
    const mine = orderOf(at.point);
    const later = mine === null ? undefined : earlier.find((other) => (orderOf(other.point) ?? -1) > mine);
    if (!later) return [];
    return [
      {
        message: `${at.name} (${at.point.order}) prints after ${later.name} (${later.point.order}), out of build-up order. Move it before and renumber.`,
        where: atPoint(at),
      },
    ];
  });
}

function twoChanges(facts: CardFacts): Problem[] {
  return facts.points.flatMap((at): Problem[] => {
    const changes = [...new Set(at.point.changes)].filter((change) => change !== "height");
    if (changes.length < 2) return [];
    const control = facts.programme.controls[0]?.name;
    const names = changes.map((change) => (change === "position" && control ? `${control} position` : change));
    return [{ message: `${at.name} changes ${list(names)} in one build-up step. Change one.`, where: atPoint(at, "series") }];
  });
}

/** The abort number as the pilot will see it, turned back to true, in the parameter's unit. */
function thresholdOf(facts: CardFacts, line: AbortNumber): { value: number; name: string; unit: Unit } | null {
  const instrument = facts.instruments.get(line.instrument);
  const parameter = facts.parameters.get(line.parameter);
  const calibration = instrument?.calibration;
  if (!instrument || !parameter || !calibration || line.perMinute) return null;
  const value = whereItFits(() => {
    const back = correctReading(line.onGauge, calibration);
    return back.inRange ? convert(back.value, instrument.unit, parameter.unit) : null;
  });
  return value === null ? null : { value, name: midSentence(parameter.shortName), unit: parameter.unit };
}

/** The highest value that the point itself expects of a parameter, in that parameter's unit. */
function expectedHigh(facts: CardFacts, at: PointFacts, line: AbortNumber): number | null {
  const unit = facts.parameters.get(line.parameter)?.unit;
  const highs = at.point.readings.flatMap((r) => {
    const band = r.parameter === line.parameter ? r.expected : null;
    const high = band?.high ?? null;
    if (!band || high === null || !unit) return [];
    return whereItFits(() => convert(high, band.unit, unit)) ?? [];
  });
  return highs.length > 0 ? Math.max(...highs) : null;
}

function predicted(facts: CardFacts, at: PointFacts, line: AbortNumber): number | null {
  const { series } = at.point;
  const run = series && !series.base ? resultsFor(facts, at.point) : undefined;
  if (!series || !run || run.results.length < FEWEST_RESULTS) return null;
  const own = at.point.aborts.lines.filter(isNumber);
  const judged = run.parameter ?? (own[0] ?? at.lines.find(isNumber))?.parameter;
  if (line.parameter !== judged) return null;
  return whereItFits(() => predictNext(run.results, series.level.value, { confidence: CONFIDENCE }).value);
}

function predictionPastAbort(facts: CardFacts): Problem[] {
  return facts.points.flatMap((at) =>
    at.lines.filter(isNumber).flatMap((line): Problem[] => {
      if (line.side !== "max" || at.point.engine === "stopped") return [];
      const fit = predicted(facts, at, line);
      const value = fit ?? expectedHigh(facts, at, line);
      const threshold = value === null ? null : thresholdOf(facts, line);
      if (value === null || !threshold || value <= threshold.value + 1e-6) return [];
      const what = fit === null ? "the expected band tops at" : "predicted";
      const message = `${at.name}: ${threshold.name} ${what} ${withUnit(apart(value, threshold.value), threshold.unit)}, past the abort threshold ${withUnit(figure(threshold.value, 1), threshold.unit)}. Do not release it; take a smaller step.`;
      return [{ message, where: atPoint(at, "series", line.id) }];
    }),
  );
}

export const buildUpRules: Rule[] = [
  { number: "14", code: "parent-not-clear", severity: "must", at: "both", card: parentNotClear },
  { number: "15", code: "build-up-skipped", severity: "must", at: "card", card: stepSkipped },
  { number: "40", code: "points-out-of-order", severity: "must", at: "card", card: outOfOrder },
  { number: "49", code: "two-changes-at-once", severity: "must", at: "card", card: twoChanges },
  { number: "55", code: "prediction-past-abort", severity: "must", at: "both", card: predictionPastAbort },
];
