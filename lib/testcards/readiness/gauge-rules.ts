import type { EntryCondition, Instrument } from "../card";
import { atPoint, type CardFacts, type PointFacts, type Problem, type Rule } from "./rule";
import { onGaugeFigure, sentence, withUnit } from "./say";

const EPSILON = 1e-9;

function whyNotCalibrated(instrument: Instrument, on: string): string | null {
  const c = instrument.calibration;
  if (!c) return "has no calibration";
  if (c.calibratedOn > on) return `was calibrated on ${c.calibratedOn}, after the planned date ${on}`;
  if (c.validUntil < on) return `has a calibration valid until ${c.validUntil}, before the planned date ${on}`;
  return null;
}

function notCalibrated(facts: CardFacts): Problem[] {
  return facts.used.flatMap(({ instrument, use, where }): Problem[] => {
    if (!instrument)
      return [{ message: `${use}: its instrument is not in the programme. Choose one that is fitted and calibrated.`, where }];
    const why = whyNotCalibrated(instrument, facts.on);
    if (!why) return [];
    return [
      {
        message: `${instrument.name} ${why}. Calibrate it or drop the reading (${use}).`,
        where: { at: "instrument", instrument: instrument.id },
      },
    ];
  });
}

function sensorMoved(facts: CardFacts): Problem[] {
  return facts.used.flatMap(({ instrument }): Problem[] => {
    const c = instrument?.calibration;
    if (!instrument || !c?.disturbedOn || c.disturbedOn < c.calibratedOn) return [];
    const message = `${instrument.name}'s sensor was moved, re-wired or replaced on ${c.disturbedOn}, since its calibration of ${c.calibratedOn}. Recalibrate it in place.`;
    return [{ message, where: { at: "instrument", instrument: instrument.id } }];
  });
}

function tolerances(
  facts: CardFacts,
  judge: (condition: EntryCondition, tolerance: number, instrument: Instrument) => string | null,
): Problem[] {
  const check = (at: PointFacts, condition: EntryCondition): Problem[] => {
    const instrument = condition.instrument === null ? undefined : facts.instruments.get(condition.instrument);
    if (!instrument || condition.tolerance === null || condition.relation !== "about") return [];
    const why = judge(condition, condition.tolerance, instrument);
    if (!why) return [];
    const parameter = facts.parameters.get(condition.parameter)?.shortName ?? condition.parameter;
    const shown = withUnit(`±${onGaugeFigure(condition.tolerance, condition.tolerance)}`, condition.unit);
    return [
      { message: `${at.name}: the entry tolerance ${sentence(parameter)} ${shown} ${why}`, where: atPoint(at, "entry", condition.id) },
    ];
  };
  return facts.points.flatMap((at) => at.point.entry.flatMap((condition) => check(at, condition)));
}

const shows = (instrument: Instrument): string => withUnit(onGaugeFigure(instrument.readable, instrument.readable), instrument.unit);

function finerThanGauge(facts: CardFacts): Problem[] {
  return tolerances(facts, (_, tolerance, instrument) =>
    tolerance < instrument.readable - EPSILON
      ? `is finer than ${instrument.name} can show, marked every ${withUnit(onGaugeFigure(instrument.markSpacing, instrument.markSpacing), instrument.unit)} and readable to ${shows(instrument)}. Widen it or change the gauge.`
      : null,
  );
}

function finerThanUncertainty(facts: CardFacts): Problem[] {
  return tolerances(facts, (_, tolerance, instrument) => {
    if (tolerance < instrument.readable - EPSILON) return null;
    const uncertainty = instrument.calibration?.expandedUncertainty ?? null;
    if (tolerance < 2 * instrument.readable - EPSILON)
      return `is finer than twice the ${shows(instrument)} that ${instrument.name} shows. Widen it or say why.`;
    if (uncertainty === null || tolerance >= uncertainty - EPSILON) return null;
    return `is finer than the uncertainty of ${instrument.name}, U ${withUnit(onGaugeFigure(uncertainty, 0.1), instrument.unit)}. Widen it or say why.`;
  });
}

export const gaugeRules: Rule[] = [
  { number: "5", code: "gauge-not-calibrated", severity: "must", at: "both", card: notCalibrated },
  { number: "10a", code: "entry-finer-than-gauge", severity: "must", at: "card", card: finerThanGauge },
  { number: "10b", code: "entry-finer-than-uncertainty", severity: "should", at: "card", card: finerThanUncertainty },
  { number: "43", code: "sensor-moved", severity: "must", at: "both", card: sensorMoved },
];
