import { checkFinite, checkOneOf, checkRange } from "./check-range";
import { fitLine } from "./straight-line";
import { studentT } from "./student-t";
import {
  ABORT_DISCIPLINES,
  type AbortDiscipline,
  DISPOSITIONS,
  type Disposition,
  type Outcome,
  SIDES,
  type Side,
  STEP_DECISIONS,
  type StepDecision,
  VERDICTS,
  type Verdict,
} from "./words";

export type { StepDecision };
export type StepResult = { level: number; value: number };

const CONFIDENCE = 0.95;
/** A step may be at most this many times the largest earlier one: common practice, no source. */
const LONGEST_STEP_RATIO = 1.5;
const FEWEST_RESULTS = 3;
const TOLERANCE = 1e-9;

/**
 * What the next level of a build-up is expected to give, with its prediction band.
 *
 *     ŷ from a straight line    h = t(ν = n − 2) · s · √(1 + 1/n + (x₀ − x̄)²/Sxx)    band = ŷ ± √(h² + U²)
 *
 * Source    [NIST-HANDBOOK] 4.5.1.2, prediction of a single new observation; U added in quadrature, [GUM] 5.1.2.
 * Inputs    accepted results of the series, level and value each in one unit; expandedUncertainty of the instrument on which the abort is called.
 * Domain    at least 3 results at 2 or more levels; confidence 0.01 to 0.999; U ≥ 0.
 * Throws    RangeError outside the domain.
 * Accuracy  a straight line through few points: a bend in what is measured is not seen before it comes.
 */
export function predictNext(
  results: readonly StepResult[],
  nextLevel: number,
  { confidence, expandedUncertainty = 0 }: { confidence: number; expandedUncertainty?: number },
): { value: number; low: number; high: number } {
  checkFinite("nextLevel", nextLevel);
  checkRange("expandedUncertainty", expandedUncertainty, 0, Number.POSITIVE_INFINITY);
  const fit = fitLine(
    "results",
    results.map(({ level, value }) => ({ x: level, y: value })),
  );
  const value = fit.intercept + fit.slope * nextLevel;
  const spread = Math.sqrt(1 + 1 / fit.count + (nextLevel - fit.meanX) ** 2 / fit.sumSquaresX);
  const halfWidth = Math.hypot(studentT(confidence, fit.count - 2) * fit.residualSd * spread, expandedUncertainty);
  return { value, low: value - halfWidth, high: value + halfWidth };
}

/**
 * Whether the next level of a series in one variable may be flown; `because` says every ground, in words for the reader.
 *
 *     hold: n < 3, last value outside its band, centre past the threshold    smaller step: far edge of the band past the threshold, or
 *     the step above 1.5 × the largest earlier    clear to next step: otherwise
 *
 * Source    team's own rule on the prediction of [NIST-HANDBOOK] 4.5.1.2, 95 %; the step rule is common practice, no source.
 * Inputs    threshold is the true abort threshold; expandedUncertainty of the instrument on which the abort is called, null = not known;
 *           lastInBand: whether the last result lay inside the band predicted for it.
 * Domain    finite figures, U ≥ 0.
 * Throws    RangeError outside the domain. Too few results, or all at one level, is a hold, not an error.
 * Accuracy  compared unrounded; on the threshold is not past it.
 */
export function decideStep(input: {
  results: readonly StepResult[];
  nextLevel: number;
  threshold: number;
  side: Side;
  expandedUncertainty: number | null;
  lastInBand: boolean;
}): { decision: StepDecision; because: string[] } {
  const { results, nextLevel, threshold, side, expandedUncertainty } = input;
  checkFinite("nextLevel", nextLevel);
  checkFinite("threshold", threshold);
  checkOneOf("side", side, SIDES);
  for (const { level, value } of results) {
    checkFinite("results.level", level);
    checkFinite("results.value", value);
  }
  if (expandedUncertainty !== null) checkRange("expandedUncertainty", expandedUncertainty, 0, Number.POSITIVE_INFINITY);

  const levels = [...new Set(results.map(({ level }) => level))].sort((a, b) => a - b);
  const hold: string[] = [];
  const smaller: string[] = [];
  if (results.length < FEWEST_RESULTS)
    hold.push(`${results.length} accepted results, at least ${FEWEST_RESULTS} are needed for a prediction`);
  else if (levels.length < 2) hold.push("all results are at one level, which predicts nothing about another");
  if (!input.lastInBand) hold.push("the last measured value lay outside its own predicted band");
  if (expandedUncertainty === null) hold.push("the uncertainty of the instrument on which the abort is called is not known");

  if (results.length >= FEWEST_RESULTS && levels.length >= 2 && expandedUncertainty !== null) {
    const { value, low, high } = predictNext(results, nextLevel, { confidence: CONFIDENCE, expandedUncertainty });
    const past = (x: number) => (side === "max" ? x - threshold : threshold - x) > TOLERANCE;
    const edge = side === "max" ? high : low;
    if (past(value)) hold.push(`predicted ${figure(value)} is past the abort threshold ${figure(threshold)}`);
    else if (past(edge))
      smaller.push(`predicted ${figure(value)}, but ${figure(edge)} with its uncertainty is past the abort threshold ${figure(threshold)}`);
  }
  const tooLong = stepTooLong(levels, nextLevel);
  if (tooLong) smaller.push(tooLong);

  if (hold.length > 0) return { decision: "hold", because: [...hold, ...smaller] };
  if (smaller.length > 0) return { decision: "smaller step", because: smaller };
  return { decision: "clear to next step", because: ["predicted value and its uncertainty stay inside the abort threshold"] };
}

/** Distance from the nearest level flown against the largest step between neighbouring levels flown. */
function stepTooLong(levels: readonly number[], nextLevel: number): string | null {
  if (levels.length < 2) return null;
  const step = Math.min(...levels.map((level) => Math.abs(nextLevel - level)));
  const largest = Math.max(...levels.slice(1).map((level, i) => level - (levels[i] ?? level)));
  if (step <= LONGEST_STEP_RATIO * largest + TOLERANCE) return null;
  return `step of ${figure(step)} is more than ${LONGEST_STEP_RATIO} times the largest earlier step, ${figure(largest)}`;
}

/** Two decimals at most, for a sentence; never compared. */
const figure = (value: number): string => String(Math.round(value * 100) / 100);

/**
 * The decision after a point was flown: `start` brought down by what was found, never raised.
 *
 *     hold: an exceeded, a missed abort, a no verdict, an outcome other than flown, a repeat or void, an open grounding squawk, a reading
 *     outside its expected band    smaller step at best: a marginal    otherwise: start
 *
 * Source    team's own rule.
 * Inputs    verdicts of the required comparisons only; disciplines and outcomes may hold null (neither, or not answered).
 * Domain    the fixed words.
 * Throws    RangeError for an unknown word.
 * Accuracy  an outcome that was not answered counts as not flown: missing evidence is never a pass.
 */
export function decideAfterFlight(input: {
  start: StepDecision;
  verdicts: readonly Verdict[];
  disciplines: readonly (AbortDiscipline | null)[];
  dispositions: readonly Disposition[];
  outcomes: readonly (Outcome | null)[];
  groundingOpen: boolean;
  outsideExpected: boolean;
}): { decision: StepDecision; because: string[] } {
  const { start, verdicts, disciplines, dispositions, outcomes } = input;
  checkOneOf("start", start, STEP_DECISIONS);
  for (const verdict of verdicts) checkOneOf("verdicts", verdict, VERDICTS);
  for (const discipline of disciplines) if (discipline !== null) checkOneOf("disciplines", discipline, ABORT_DISCIPLINES);
  for (const disposition of dispositions) checkOneOf("dispositions", disposition, DISPOSITIONS);

  const notFlown = outcomes.filter((outcome) => outcome !== "flown");
  const hold: string[] = [];
  if (verdicts.includes("exceeded")) hold.push("a limit is exceeded");
  if (disciplines.includes("missed")) hold.push("an abort threshold was reached and not called");
  if (input.groundingOpen) hold.push("a grounding squawk is open");
  if (verdicts.includes("no verdict")) hold.push("a required comparison has no verdict");
  if (notFlown.length > 0) hold.push(`outcome ${[...new Set(notFlown.map((outcome) => outcome ?? "not given"))].join(", ")}`);
  if (dispositions.includes("repeat")) hold.push("to be repeated");
  if (dispositions.includes("void")) hold.push("void");
  if (input.outsideExpected) hold.push("a reading fell outside its expected band");

  if (hold.length > 0 || start === "hold") return { decision: "hold", because: hold.length > 0 ? hold : ["the prediction holds the step"] };
  if (verdicts.includes("marginal")) return { decision: "smaller step", because: ["a verdict is marginal"] };
  return { decision: start, because: start === "smaller step" ? ["the prediction allows a smaller step"] : ["nothing found against it"] };
}
