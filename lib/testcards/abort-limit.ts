import { correctReading, rateUncertainty } from "./calibration";
import type { CardDocument, CardPoint, Instrument, Limit, Parameter } from "./card";
import { convert, convertDifference, rateUnitOf, type Unit } from "./units";
import type { LimitCondition, LimitStatistic, Side } from "./words";

/** The card-side limit that an abort number guards. `own` U is the point limit's; null = the instrument's. */
export type GuardedLimit = { value: number; unit: Unit; ownUncertainty: number | null };

const OF_A_VALUE: readonly LimitStatistic[] = ["instant", "sustained"];
/** Which row speaks where nobody says: the widest condition first. */
const WIDEST_FIRST: readonly LimitCondition[] = ["always", "at power", "full power", "take-off", "idle", "cold start"];

function programmeRows(card: CardDocument, parameter: string, side: Side): Limit[] {
  const rows = card.programme.limits.filter(
    (l) => l.layer === "card" && l.parameter === parameter && l.side === side && OF_A_VALUE.includes(l.statistic),
  );
  const atOnce = rows.filter((row) => row.forS === 0);
  // Where a level may be held for a time, the row that may never be passed is the one to stop at.
  return rows.filter((row) => row.forS === 0 || !atOnce.some((other) => other.appliesWhen === row.appliesWhen));
}

function programmeLimit(card: CardDocument, parameter: string, side: Side, appliesWhen: LimitCondition | undefined): Limit | undefined {
  const rows = programmeRows(card, parameter, side);
  const order = appliesWhen === undefined ? WIDEST_FIRST : [appliesWhen, "always" as const];
  return order.map((when) => rows.find((row) => row.appliesWhen === when)).find((row) => row !== undefined);
}

/** Every limit an abort number of this parameter must stay inside at this point: the programme's row and the point's own. */
export function guardedLimits(
  card: CardDocument,
  point: CardPoint,
  parameter: string,
  side: Side,
  appliesWhen?: LimitCondition,
): GuardedLimit[] {
  const readings = new Set(point.readings.filter((r) => r.parameter === parameter).map((r) => r.id));
  const own = point.limits.filter((l) => readings.has(l.reading) && l.side === side && OF_A_VALUE.includes(l.statistic));
  const atOnce = own.some((l) => l.forS === 0) ? own.filter((l) => l.forS === 0) : own;
  const row = programmeLimit(card, parameter, side, appliesWhen);
  return [
    ...(row ? [{ value: row.value, unit: row.unit, ownUncertainty: null }] : []),
    ...atOnce.map((l) => ({ value: l.value, unit: l.unit, ownUncertainty: l.expandedUncertainty })),
  ];
}

/** The programme's and the point's own limits on how fast a parameter may move. */
export function rateLimits(card: CardDocument, point: CardPoint, parameter: string, side: Side): { value: number; unit: Unit }[] {
  const readings = new Set(point.readings.filter((r) => r.parameter === parameter).map((r) => r.id));
  return [
    ...card.programme.limits.filter((l) => l.layer === "card" && l.parameter === parameter && l.side === side && l.statistic === "rate"),
    ...point.limits.filter((l) => readings.has(l.reading) && l.side === side && l.statistic === "rate"),
  ];
}

/**
 * How fast the value is expected to move towards a limit, in `unit` per minute: the point's own rate where one is given,
 * else the rate the standing aborts allow for. An own rate is a rise; a fall is negative and counts towards a minimum.
 */
export function approachRate(point: CardPoint, parameter: Parameter, side: Side, unit: Unit): { perMin: number; own: boolean } {
  const own = point.readings
    .filter((r) => r.parameter === parameter.code && r.expectedRatePerMin !== null)
    .map((r) => (r.expectedRatePerMin ? convertDifference(r.expectedRatePerMin.value, r.expectedRatePerMin.unit, unit) : 0))
    .map((rise) => (side === "max" ? rise : -rise))
    .filter((rate) => rate > 0);
  if (own.length > 0) return { perMin: Math.max(...own), own: true };
  const standard = parameter.standardRatePerMin;
  return { perMin: side === "max" && standard ? convertDifference(standard.value, standard.unit, unit) : 0, own: false };
}

/** A limit in the gauge's unit. */
export const limitOnScale = (limit: GuardedLimit, instrument: Instrument): number => convert(limit.value, limit.unit, instrument.unit);

/** U of a reading on this gauge against this limit, in the gauge's unit; null = not known. */
export function uncertaintyOf(limit: GuardedLimit, instrument: Instrument): number | null {
  if (limit.ownUncertainty !== null) return convertDifference(limit.ownUncertainty, limit.unit, instrument.unit);
  return instrument.calibration?.expandedUncertainty ?? null;
}

/** The reading at which a change on this dial stands for the most true change: the cautious place for a rate. */
export function steepestReading(instrument: Instrument): number | null {
  const c = instrument.calibration;
  if (!c) return null;
  const marks = c.kind === "points" ? c.points.map((p) => p.read).filter((read) => read >= c.low && read <= c.high) : [c.low];
  const slopeAt = (read: number) => correctReading(read, c).slope;
  return marks.reduce<number | null>((best, read) => (best === null || slopeAt(read) > slopeAt(best) ? read : best), null);
}

/** U of a true rate read from this dial over a window, in the gauge's unit per minute. */
export function rateUncertaintyOn(instrument: Instrument, windowMin: number, slope: number): number {
  return rateUncertainty({ readable: instrument.readable, windowMin }) * slope;
}

/** A rate limit in the gauge's unit per minute: only temperatures have one. */
export function rateOnScale(limit: { value: number; unit: Unit }, instrument: Instrument): number | null {
  const unit = rateUnitOf(instrument.unit);
  return unit === null ? null : convert(limit.value, limit.unit, unit);
}
