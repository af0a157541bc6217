import { checkPositive, checkRange } from "./check-range";

/** Fuel of one test point: minutes at a flow per hour, in the plan's unit. */
export type PointFuel = { durationMin: number; flowPerH: number };

const WHOLE_LITRE_ROUNDING = 1e-9;

/**
 * Fuel required against fuel on board, and the bingo figure.
 *
 *     required = taxi + Σ(duration · flow) + transit + reserve + unusable    bingo = reserve + transit + unusable, rounded up to a whole unit
 *
 * Source    sum: common practice, no source; the reserve's legal floor is [CFR-91.151], 30 min by day.
 * Inputs    every figure in one unit of volume; points as one sum or one entry a point; transit is the way back.
 * Domain    none negative.
 * Throws    RangeError outside the domain.
 * Accuracy  exact; inHand negative is how much is short.
 */
export function fuelPlan(input: {
  taxi: number;
  points: number | readonly PointFuel[];
  transit: number;
  reserve: number;
  unusable: number;
  onBoard: number;
}): { required: number; inHand: number; bingo: number } {
  const { taxi, transit, reserve, unusable, onBoard } = input;
  for (const [name, value] of Object.entries({ taxi, transit, reserve, unusable, onBoard }))
    checkRange(name, value, 0, Number.POSITIVE_INFINITY);
  const points = typeof input.points === "number" ? input.points : input.points.reduce((sum, point) => sum + pointFuel(point), 0);
  checkRange("points", points, 0, Number.POSITIVE_INFINITY);

  const required = taxi + points + transit + reserve + unusable;
  const bingo = Math.ceil(reserve + transit + unusable - WHOLE_LITRE_ROUNDING);
  return { required, inHand: onBoard - required, bingo };
}

function pointFuel({ durationMin, flowPerH }: PointFuel): number {
  checkRange("points.durationMin", durationMin, 0, Number.POSITIVE_INFINITY);
  checkRange("points.flowPerH", flowPerH, 0, Number.POSITIVE_INFINITY);
  return (durationMin / 60) * flowPerH;
}

/**
 * Correction of a fuel-flow meter from one fill to a mark.
 *
 *     new factor = old · metered/filled    true flow = shown · filled/metered
 *
 * Source    hand calculation: the factor counts pulses per volume.
 * Inputs    metered and filled volume in one unit; factor in use during the run.
 * Domain    all above zero.
 * Throws    RangeError outside the domain.
 * Accuracy  that of the fill: 0.5 L in 32 L is 1.6 %.
 */
export function fuelFlowFactor({ metered, filled, factor }: { metered: number; filled: number; factor: number }): {
  factor: number;
  trueOverShown: number;
} {
  checkPositive("metered", metered);
  checkPositive("filled", filled);
  checkPositive("factor", factor);
  return { factor: (factor * metered) / filled, trueOverShown: filled / metered };
}
