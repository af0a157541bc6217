import {
  approachRate,
  type GuardedLimit,
  guardedLimits,
  limitOnScale,
  rateLimits,
  rateOnScale,
  rateUncertaintyOn,
  steepestReading,
  uncertaintyOf,
} from "../abort-limit";
import { correctReading, roundToReadable } from "../calibration";
import type { AbortNumber, Instrument, Parameter } from "../card";
import { proposeAbort, proposeRateAbort } from "../propose-abort";
import { convert } from "../units";
import { atPoint, type CardFacts, isNumber, type PointFacts, type Problem, type Rule, whereItFits } from "./rule";
import { apart, figure, midSentence, onGaugeFigure, withUnit } from "./say";

/** A value within this of a mark is on the mark (team's own rule). */
const ON_THE_MARK = 1e-6;
/** Stored true values are written to one decimal: a turned-back gauge number may differ by that much. */
const AS_WRITTEN = 0.1 + ON_THE_MARK;

type Dial = { instrument: Instrument; parameter: Parameter; line: AbortNumber; at: PointFacts };

/** Six rules ask for the same lines of the same point. */
const dialsOf = new WeakMap<PointFacts, Dial[]>();

function dialsAt(facts: CardFacts, at: PointFacts): Dial[] {
  const known = dialsOf.get(at);
  if (known) return known;
  const dials = at.lines.filter(isNumber).flatMap((line) => {
    const instrument = facts.instruments.get(line.instrument);
    const parameter = facts.parameters.get(line.parameter);
    return instrument && parameter ? [{ instrument, parameter, line, at }] : [];
  });
  dialsOf.set(at, dials);
  return dials;
}

const isOwn = ({ line, at }: Dial): boolean => at.point.aborts.lines.some((own) => own.id === line.id);
const asShown = ({ line, instrument }: Dial): string => withUnit(onGaugeFigure(line.onGauge, instrument.readable), instrument.unit);
const past = (value: number, limit: number, side: AbortNumber["side"]): boolean =>
  side === "max" ? value > limit + ON_THE_MARK : value < limit - ON_THE_MARK;

/** One problem per point for its own lines, one for the whole card for a standing line that is wrong wherever it stands. */
function perLine(facts: CardFacts, check: (dial: Dial) => string | null, sameEverywhere: (dial: Dial) => boolean = () => true): Problem[] {
  const seen = new Set<string>();
  return facts.points.flatMap((at) =>
    dialsAt(facts, at).flatMap((dial): Problem[] => {
      const standing = !isOwn(dial) && sameEverywhere(dial);
      if (standing && (at.point.engine === "stopped" || seen.has(dial.line.id))) return [];
      if (standing) seen.add(dial.line.id);
      const message = whereItFits(() => check(dial));
      if (message === null) return [];
      const who = standing ? "Standing abort" : at.name;
      return [
        {
          message: `${who}: ${message}`,
          where: standing ? { at: "programme", field: "standingAborts" } : atPoint(at, "aborts", dial.line.id),
        },
      ];
    }),
  );
}

const usesStandardRate = ({ at, line }: Dial): boolean =>
  at.point.limits.length === 0 && !at.point.readings.some((r) => r.parameter === line.parameter && r.expectedRatePerMin !== null);

function callAt(facts: CardFacts, dial: Dial): string {
  const { line, instrument, at } = dial;
  const proposal = line.perMinute
    ? proposeRateAbort(facts.card, at.point, line.parameter, line.side, line.instrument, line.windowS ?? 60)
    : proposeAbort(facts.card, at.point, line.parameter, line.side, line.instrument, line.appliesWhen);
  if (!proposal?.inRange) return `${line.side === "max" ? "Lower" : "Raise"} it, or correct the conversion.`;
  const number = withUnit(onGaugeFigure(proposal.onGauge, instrument.readable), instrument.unit);
  return `Call it at ${number} or ${line.side === "max" ? "lower" : "higher"}.`;
}

function overLimit(facts: CardFacts, dial: Dial, limit: GuardedLimit): string | null {
  const { line, instrument, parameter, at } = dial;
  const calibration = instrument.calibration;
  if (!calibration) return null;
  const back = correctReading(line.onGauge, calibration).value;
  const scale = limitOnScale(limit, instrument);
  const uncertainty = uncertaintyOf(limit, instrument);
  const what = `${midSentence(parameter.shortName)} abort ${asShown(dial)} on the gauge`;
  if (uncertainty === null)
    return `${what} cannot be held against the card limit, for the uncertainty of ${instrument.name} is not known. State it.`;
  const { perMin } = approachRate(at.point, parameter, line.side, instrument.unit);
  const reaction = facts.programme.reactionMin;
  const drawnOut = uncertainty + perMin * reaction;
  const reached = line.side === "max" ? back + drawnOut : back - drawnOut;
  if (!past(reached, scale, line.side)) return null;
  const limitText = withUnit(figure(scale, 1), instrument.unit);
  if (past(back, scale, line.side))
    return `${what} is ${withUnit(apart(back, scale), instrument.unit)} true, past the card limit ${limitText}. ${callAt(facts, dial)}`;
  const rate = perMin > 0 ? ` and ${withUnit(figure(perMin, 1), instrument.unit)} a minute for ${figure(reaction * 60)} s` : "";
  const true_ = withUnit(figure(back, 1), instrument.unit);
  return `${what} is ${true_} true; with U ${figure(uncertainty, 1)}${rate} it reaches ${apart(reached, scale)}, past the card limit ${limitText}. ${callAt(facts, dial)}`;
}

function overRateLimit(facts: CardFacts, dial: Dial): string | null {
  const { line, instrument, parameter, at } = dial;
  const atReading = steepestReading(instrument);
  if (line.windowS === null || line.windowS <= 0)
    return `${midSentence(parameter.shortName)} abort ${asShown(dial)} is a change without the time in which it is judged. State the seconds.`;
  if (!instrument.calibration || atReading === null) return null;
  const windowMin = line.windowS / 60;
  const { slope } = correctReading(atReading, instrument.calibration);
  const perMin = (line.onGauge * slope) / windowMin;
  const reached = perMin + rateUncertaintyOn(instrument, windowMin, slope);
  const limits = rateLimits(facts.card, at.point, line.parameter, line.side).flatMap((l) => rateOnScale(l, instrument) ?? []);
  const tightest = Math.min(...limits);
  if (limits.length === 0 || !past(reached, tightest, "max")) return null;
  const unit = instrument.unit;
  return `${midSentence(parameter.shortName)} abort ${asShown(dial)} in ${line.windowS} s on the gauge is ${withUnit(figure(perMin, 1), unit)} a minute true; with U it reaches ${apart(reached, tightest)}, past the card limit ${figure(tightest, 1)}. ${callAt(facts, dial)}`;
}

function abortPastLimit(facts: CardFacts): Problem[] {
  const check = (dial: Dial): string | null => {
    const { line, at } = dial;
    if (line.perMinute) return overRateLimit(facts, dial);
    const limits = guardedLimits(facts.card, at.point, line.parameter, line.side, line.appliesWhen);
    return limits.map((limit) => overLimit(facts, dial, limit)).find((message) => message !== null) ?? null;
  };
  return perLine(facts, check, usesStandardRate);
}

/** The number that prints as a gauge number is on the wrong side of the true value it is meant to stand for. */
export function trueValueOnGaugeLine(facts: CardFacts): Problem[] {
  return perLine(facts, ({ line, instrument, parameter }) => {
    if (!instrument.calibration || line.perMinute) return null;
    const back = correctReading(line.onGauge, instrument.calibration);
    if (!back.inRange) return null;
    const isTrue = convert(back.value, instrument.unit, parameter.unit);
    const meant = line.trueValue;
    if (line.side === "max" ? isTrue <= meant + AS_WRITTEN : isTrue >= meant - AS_WRITTEN) return null;
    const gauge = withUnit(onGaugeFigure(line.onGauge, instrument.readable), instrument.unit);
    return `${midSentence(parameter.shortName)} abort ${gauge} prints as a gauge number, but on ${instrument.name} it is ${withUnit(apart(isTrue, meant), parameter.unit)} true, not ${figure(meant, 1)}. Print the gauge number and say so.`;
  });
}

function offTable(facts: CardFacts): Problem[] {
  return perLine(facts, (dial) => {
    const { instrument, line, parameter } = dial;
    const c = instrument.calibration;
    if (!c || line.perMinute || correctReading(line.onGauge, c).inRange) return null;
    const range = withUnit(
      `${onGaugeFigure(c.low, instrument.readable)} to ${onGaugeFigure(c.high, instrument.readable)}`,
      instrument.unit,
    );
    return `${midSentence(parameter.shortName)} abort ${asShown(dial)} lies outside ${instrument.name}'s calibrated range, ${range}. Add a calibration point beyond it.`;
  });
}

function offMark(facts: CardFacts): Problem[] {
  return perLine(facts, (dial) => {
    const { instrument, line, parameter } = dial;
    const mark = roundToReadable(line.onGauge, instrument.readable, line.side);
    if (Math.abs(mark - line.onGauge) <= ON_THE_MARK) return null;
    const readable = withUnit(onGaugeFigure(instrument.readable, instrument.readable), instrument.unit);
    return `${midSentence(parameter.shortName)} abort ${asShown(dial)} is not one the pilot can read on ${instrument.name}, readable to ${readable}. Round it to ${withUnit(onGaugeFigure(mark, instrument.readable), instrument.unit)}.`;
  });
}

function abortMissing(facts: CardFacts): Problem[] {
  return facts.points.flatMap((at): Problem[] => {
    if (at.lines.length === 0) return [{ message: `${at.name} has no abort criteria. Add them.`, where: atPoint(at, "aborts") }];
    if (at.point.engine === "stopped") return [];
    const called = new Set(at.lines.filter(isNumber).map((line) => line.parameter));
    const read = new Map(at.point.readings.filter((r) => r.kind === "number" && r.parameter !== null).map((r) => [r.parameter, r]));
    return [...read.values()].flatMap((reading): Problem[] => {
      const parameter = reading.parameter === null ? undefined : facts.parameters.get(reading.parameter);
      if (!parameter?.safety || called.has(parameter.code)) return [];
      return [
        {
          message: `${at.name} reads ${midSentence(parameter.shortName)} but has no abort number for it. Add one.`,
          where: atPoint(at, "aborts", reading.id),
        },
      ];
    });
  });
}

function abortNotVisible(facts: CardFacts): Problem[] {
  const unseen = perLine(facts, (dial) => {
    const { instrument, line, parameter } = dial;
    if (instrument.visibleTo.includes(line.calledBy)) return null;
    return `${midSentence(parameter.shortName)} abort ${asShown(dial)} is on ${instrument.name}, which the ${line.calledBy} who must call it cannot see. Give the ${line.calledBy} that display, or print the number of a gauge they can see.`;
  });
  const unknown = facts.points.flatMap((at) =>
    at.lines.filter(isNumber).flatMap((line): Problem[] => {
      if (facts.instruments.has(line.instrument)) return [];
      return [
        {
          message: `${at.name}: the ${line.parameter} abort stands on an instrument that the programme does not have. Choose one that is fitted.`,
          where: atPoint(at, "aborts", line.id),
        },
      ];
    }),
  );
  return [...unseen, ...unknown];
}

export const abortRules: Rule[] = [
  { number: "1", code: "abort-past-limit", severity: "must", at: "card", card: abortPastLimit },
  { number: "6", code: "abort-off-table", severity: "must", at: "card", card: offTable },
  { number: "9", code: "abort-not-on-mark", severity: "should", at: "card", card: offMark },
  { number: "11", code: "abort-missing", severity: "must", at: "card", card: abortMissing },
  { number: "56", code: "abort-not-visible", severity: "must", at: "card", card: abortNotVisible },
];
