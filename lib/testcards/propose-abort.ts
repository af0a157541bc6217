import {
  approachRate,
  guardedLimits,
  limitOnScale,
  rateLimits,
  rateOnScale,
  rateUncertaintyOn,
  steepestReading,
  uncertaintyOf,
} from "./abort-limit";
import { correctReading, gaugeAbort, gaugeRateAbort } from "./calibration";
import { type CardDocument, type CardPoint, instrumentOf, parameterOf } from "./card";
import { convert, convertDifference } from "./units";
import type { LimitCondition, Side } from "./words";

export type AbortProposal = {
  trueValue: number; // the threshold, in the parameter's unit; of a rate, a difference in it per minute
  onGauge: number; // what prints, in the gauge's unit
  inRange: boolean; // false: the gauge was not proved there, print nothing
};

/**
 * The abort number by the rule: card limit less U less the point's own rate × reaction time, turned to the gauge, rounded to
 * a mark on the cautious side. With several limits (the programme's and the point's own) the tightest number.
 * Null where a limit, a calibration or its U is missing: there is nothing to work from.
 */
export function proposeAbort(
  card: CardDocument,
  point: CardPoint,
  parameterCode: string,
  side: Side,
  instrumentId: string,
  appliesWhen?: LimitCondition,
): AbortProposal | null {
  const instrument = instrumentOf(card, instrumentId);
  const parameter = parameterOf(card, parameterCode);
  if (!instrument?.calibration || !parameter) return null;
  const { calibration, readable, unit } = instrument;
  const ratePerMin = approachRate(point, parameter, side, unit).perMin;

  let tightest: AbortProposal | null = null;
  for (const limit of guardedLimits(card, point, parameterCode, side, appliesWhen)) {
    const expandedUncertainty = uncertaintyOf(limit, instrument);
    if (expandedUncertainty === null) return null;
    const cardLimit = limitOnScale(limit, instrument);
    const reactionMin = card.programme.reactionMin;
    const abort = gaugeAbort({ cardLimit, side, expandedUncertainty, ratePerMin, reactionMin, calibration, readable });
    const proposal = { trueValue: convert(abort.trueValue, unit, parameter.unit), onGauge: abort.printed, inRange: abort.inRange };
    if (!tightest || (side === "max" ? proposal.onGauge < tightest.onGauge : proposal.onGauge > tightest.onGauge)) tightest = proposal;
  }
  return tightest;
}

/**
 * The change on the gauge over a window at which a rate limit is called: card rate less U, turned to the gauge by the steepest
 * part of its table.
 */
export function proposeRateAbort(
  card: CardDocument,
  point: CardPoint,
  parameterCode: string,
  side: Side,
  instrumentId: string,
  windowS: number,
): AbortProposal | null {
  const instrument = instrumentOf(card, instrumentId);
  const parameter = parameterOf(card, parameterCode);
  const atReading = instrument ? steepestReading(instrument) : null;
  if (!instrument?.calibration || !parameter || atReading === null || windowS <= 0) return null;
  const { calibration, readable } = instrument;
  const windowMin = windowS / 60;
  const { slope } = correctReading(atReading, calibration);
  const expandedUncertaintyPerMin = rateUncertaintyOn(instrument, windowMin, slope);
  const rates = rateLimits(card, point, parameterCode, side).flatMap((limit) => rateOnScale(limit, instrument) ?? []);
  const cardRatePerMin = Math.min(...rates);
  if (rates.length === 0 || ((cardRatePerMin - expandedUncertaintyPerMin) * windowMin) / slope < readable) return null;
  const { printed } = gaugeRateAbort({ cardRatePerMin, expandedUncertaintyPerMin, readable, windowMin, atReading, calibration });
  const trueValue = convertDifference(cardRatePerMin - expandedUncertaintyPerMin, instrument.unit, parameter.unit);
  return { trueValue, onGauge: printed, inRange: true };
}
