import { checkCount, checkFinite, checkOneOf, checkPositive, checkRange } from "./check-range";
import { fitLine } from "./straight-line";
import type { Side } from "./words";

/**
 * What was proved about one gauge, over what readings. Every figure is in the gauge's own unit. `low` and `high` are
 * readings: the calibrated range. `expandedUncertainty` is U, k = 2, of a corrected reading; null = not known.
 */
export type Calibration = { low: number; high: number; expandedUncertainty: number | null } & (
  | { kind: "linear"; gain: number; offset: number }
  | { kind: "points"; points: { read: number; actual: number }[] }
);

export type CorrectedReading = {
  value: number;
  slope: number;
  expandedUncertainty: number | null;
  inRange: boolean;
  beyond: "low" | "high" | null;
};

/** Room for rounding when a reading is compared with an end of the table, in the gauge's unit. */
const ROUNDING = 1e-9;
/** A value this near to a mark is on the mark (team's own rule), in the gauge's unit. */
const ON_THE_MARK = 1e-6;

/** Throws RangeError unless the calibration is one: a rising table, a range inside its points, U ≥ 0. */
export function checkCalibration(c: Calibration): void {
  checkFinite("calibration.low", c.low);
  checkFinite("calibration.high", c.high);
  if (c.high <= c.low) throw new RangeError(`calibration.high is ${c.high}; it must be above calibration.low, ${c.low}.`);
  if (c.expandedUncertainty !== null) checkRange("calibration.expandedUncertainty", c.expandedUncertainty, 0, Number.POSITIVE_INFINITY);
  if (c.kind === "linear") {
    checkPositive("calibration.gain", c.gain);
    checkFinite("calibration.offset", c.offset);
    return;
  }
  checkCount("calibration.points", c.points, 2);
  let previous: { read: number; actual: number } | undefined;
  for (const point of c.points) {
    checkFinite("calibration.points.read", point.read);
    checkFinite("calibration.points.actual", point.actual);
    if (previous && (point.read < previous.read + ROUNDING || point.actual < previous.actual + ROUNDING))
      throw new RangeError(
        `calibration.points goes from ${previous.read} -> ${previous.actual} to ${point.read} -> ${point.actual}; both figures must rise.`,
      );
    previous = point;
  }
  const first = c.points[0]?.read ?? c.low;
  const last = previous?.read ?? c.high;
  checkRange("calibration.low", c.low, first - ROUNDING, last);
  checkRange("calibration.high", c.high, first, last + ROUNDING);
}

type Stretch = { fromRead: number; fromActual: number; toRead: number; toActual: number; slope: number };

function stretches(c: Calibration): Stretch[] {
  if (c.kind === "linear") {
    const at = (read: number) => c.gain * read + c.offset;
    return [{ fromRead: c.low, fromActual: at(c.low), toRead: c.high, toActual: at(c.high), slope: c.gain }];
  }
  return c.points.slice(1).map((to, i) => {
    const from = c.points[i] ?? to;
    const slope = (to.actual - from.actual) / (to.read - from.read);
    return { fromRead: from.read, fromActual: from.actual, toRead: to.read, toActual: to.actual, slope };
  });
}

/** The stretch that holds x; at a point of the table the steeper of its two neighbours, which is the cautious one for rates. */
function stretchAt(all: Stretch[], x: number, from: "fromRead" | "fromActual", to: "toRead" | "toActual"): Stretch {
  const holding = all.filter((s) => x >= s[from] - ROUNDING && x <= s[to] + ROUNDING);
  const steepest = holding.reduce<Stretch | undefined>((best, s) => (best && best.slope >= s.slope ? best : s), undefined);
  if (!steepest) throw new RangeError(`reading ${x} lies on no stretch of the calibration table.`);
  return steepest;
}

const actualAt = (s: Stretch, read: number): number => s.fromActual + s.slope * (read - s.fromRead);

/**
 * The true value behind a reading: straight lines between calibration points, nothing beyond them.
 *
 *     value = actual_i + slope_i · (read − read_i)
 *
 * Source    common practice, no source; the rule against extrapolation is the team's own.
 * Inputs    read and every figure of c in the gauge's unit.
 * Domain    any finite reading. Beyond the calibrated range: inRange false, value is the true value at that end, beyond says which.
 * Throws    RangeError for a reading that is not finite or a table that does not rise.
 * Accuracy  the calibration's own U, handed on unchanged; slope is d(true)/d(read), the steeper one at a point of the table.
 */
export function correctReading(read: number, c: Calibration): CorrectedReading {
  checkFinite("read", read);
  checkCalibration(c);
  const beyond = read < c.low - ROUNDING ? "low" : read > c.high + ROUNDING ? "high" : null;
  const at = Math.min(Math.max(read, c.low), c.high);
  const stretch = stretchAt(stretches(c), at, "fromRead", "toRead");
  const value = actualAt(stretch, at);
  return { value, slope: stretch.slope, expandedUncertainty: c.expandedUncertainty, inRange: beyond === null, beyond };
}

/**
 * What the gauge shows when the true value is `actual`: the inverse of correctReading, for every number a pilot reads.
 *
 *     reading = read_i + (actual − actual_i)/slope_i
 *
 * Source    common practice, no source.
 * Inputs    actual in the gauge's unit.
 * Domain    any finite value. One the gauge was not proved to show: inRange false, reading is that end of the range.
 * Throws    RangeError for a value that is not finite or a table that does not rise.
 * Accuracy  exact inverse of the table.
 */
export function readingFor(actual: number, c: Calibration): { reading: number; slope: number; inRange: boolean } {
  checkFinite("actual", actual);
  checkCalibration(c);
  const lowest = correctReading(c.low, c).value;
  const highest = correctReading(c.high, c).value;
  const at = Math.min(Math.max(actual, lowest), highest);
  const stretch = stretchAt(stretches(c), at, "fromActual", "toActual");
  const reading = stretch.fromRead + (at - stretch.fromActual) / stretch.slope;
  return { reading, slope: stretch.slope, inRange: actual >= lowest - ROUNDING && actual <= highest + ROUNDING };
}

/**
 * The mark a pilot can read on the cautious side of a value: a maximum rounds down, a minimum up.
 *
 * Source    team's own rule; a value within 0.000001 of a mark is on the mark.
 * Inputs    value and readable in the gauge's unit.
 * Domain    readable > 0.
 * Throws    RangeError outside the domain.
 * Accuracy  a multiple of readable to 12 figures.
 */
export function roundToReadable(value: number, readable: number, side: Side): number {
  checkFinite("value", value);
  checkPositive("readable", readable);
  checkOneOf("side", side, ["max", "min"]);
  const marks = value / readable;
  const nearest = Math.round(marks);
  const onMark = Math.abs(value - nearest * readable) <= ON_THE_MARK;
  const whole = onMark ? nearest : side === "max" ? Math.floor(marks) : Math.ceil(marks);
  return whole === 0 ? 0 : Number((whole * readable).toPrecision(12));
}

export type GaugeAbort = { trueValue: number; onGauge: number; printed: number; printedTrue: number; inRange: boolean };

/**
 * The number to abort at: drawn in from the card limit by U and by what is lost while the pilot reacts, turned to the gauge, rounded inward.
 *
 *     max: true = limit − U − rate · reaction, gauge mark at or below    min: true = limit + U + rate · reaction, mark at or above
 *
 * Source    team's own rule after the guard band of [ILAC-G8] 4.2.
 * Inputs    every figure in the gauge's unit; ratePerMin is the point's own fastest expected approach, per minute; reactionMin in minutes.
 * Domain    U, rate and reaction not negative; readable > 0.
 * Throws    RangeError outside the domain.
 * Accuracy  exact arithmetic. inRange is false where the gauge was not proved at the threshold or at the printed mark: print nothing then.
 */
export function gaugeAbort(input: {
  cardLimit: number;
  side: Side;
  expandedUncertainty: number;
  ratePerMin: number;
  reactionMin: number;
  calibration: Calibration;
  readable: number;
}): GaugeAbort {
  const { cardLimit, side, calibration, readable } = input;
  checkFinite("cardLimit", cardLimit);
  checkOneOf("side", side, ["max", "min"]);
  checkRange("expandedUncertainty", input.expandedUncertainty, 0, Number.POSITIVE_INFINITY);
  checkRange("ratePerMin", input.ratePerMin, 0, Number.POSITIVE_INFINITY);
  checkRange("reactionMin", input.reactionMin, 0, Number.POSITIVE_INFINITY);

  const drawnIn = input.expandedUncertainty + input.ratePerMin * input.reactionMin;
  const trueValue = side === "max" ? cardLimit - drawnIn : cardLimit + drawnIn;
  const { reading: onGauge, inRange } = readingFor(trueValue, calibration);
  const printed = roundToReadable(onGauge, readable, side);
  const back = correctReading(printed, calibration);
  return { trueValue, onGauge, printed, printedTrue: back.value, inRange: inRange && back.inRange };
}

/** A limit or an end of a normal range as it prints for the pilot: gaugeAbort with nothing drawn in. */
export function gaugeLimit(input: { limit: number; side: Side; calibration: Calibration; readable: number }): GaugeAbort {
  const { limit, side, calibration, readable } = input;
  return gaugeAbort({ cardLimit: limit, side, expandedUncertainty: 0, ratePerMin: 0, reactionMin: 0, calibration, readable });
}

/**
 * The change on the gauge, over one window, at which a rate limit is called.
 *
 *     change = (card rate − U) · window / slope, mark at or below
 *
 * Source    team's own rule.
 * Inputs    cardRatePerMin and expandedUncertaintyPerMin in the gauge's unit per minute, both true and not negative; windowMin in minutes;
 *           atReading is where on the dial the change is watched.
 * Domain    rate above its U, window > 0, readable > 0, atReading inside the calibrated range.
 * Throws    RangeError outside the domain, and where the change is smaller than one readable step: the gauge cannot show it.
 * Accuracy  the slope of the table at atReading holds for the whole change.
 */
export function gaugeRateAbort(input: {
  cardRatePerMin: number;
  expandedUncertaintyPerMin: number;
  readable: number;
  windowMin: number;
  atReading: number;
  calibration: Calibration;
}): { changeOnGauge: number; printed: number } {
  checkRange("expandedUncertaintyPerMin", input.expandedUncertaintyPerMin, 0, Number.POSITIVE_INFINITY);
  checkPositive("windowMin", input.windowMin);
  checkPositive("readable", input.readable);
  checkPositive("cardRatePerMin less its U", input.cardRatePerMin - input.expandedUncertaintyPerMin);
  const { slope, inRange } = correctReading(input.atReading, input.calibration);
  if (!inRange)
    throw new RangeError(
      `atReading is ${input.atReading}; it must be from ${input.calibration.low} to ${input.calibration.high}, the calibrated range.`,
    );

  const changeOnGauge = ((input.cardRatePerMin - input.expandedUncertaintyPerMin) * input.windowMin) / slope;
  const printed = roundToReadable(changeOnGauge, input.readable, "max");
  if (printed <= 0) throw new RangeError(`readable is ${input.readable}; it must be at most the change on the gauge, ${changeOnGauge}.`);
  return { changeOnGauge, printed };
}

/**
 * Expanded uncertainty (k = 2), per minute, of a rate read from the two ends of a window on a dial.
 *
 *     U = 2 · readable/√6 / window
 *
 * Source    [GUM] 4.3.7 rectangular distribution, two readings; more readings between do not help a dial that sticks on one number.
 * Inputs    readable in the gauge's unit (times the table's slope, for a true rate); windowMin in minutes.
 * Domain    readable ≥ 0, window > 0.
 * Throws    RangeError outside the domain.
 * Accuracy  reading resolution only.
 */
export function rateUncertainty({ readable, windowMin }: { readable: number; windowMin: number }): number {
  checkRange("readable", readable, 0, Number.POSITIVE_INFINITY);
  checkPositive("windowMin", windowMin);
  return (2 * readable) / Math.sqrt(6) / windowMin;
}

/**
 * Combined standard and expanded uncertainty of a corrected reading.
 *
 *     u = √(u_reference² + (resolution/√12)² + u_reading² + u_drift² + u_installation²)    U = 2 u
 *
 * Source    [GUM] 5.1.2 and 4.3.7; k = 2, [GUM] 6.2.
 * Inputs    standard uncertainties in one unit, but resolution: the display's full step.
 * Domain    none negative.
 * Throws    RangeError outside the domain.
 * Accuracy  independent parts.
 */
export function combinedUncertainty(parts: {
  reference: number;
  resolution: number;
  reading: number;
  drift: number;
  installation: number;
}): {
  standard: number;
  expanded: number;
} {
  for (const [name, part] of Object.entries(parts)) checkRange(name, part, 0, Number.POSITIVE_INFINITY);
  const standard = Math.hypot(parts.reference, parts.resolution / Math.sqrt(12), parts.reading, parts.drift, parts.installation);
  return { standard, expanded: 2 * standard };
}

/**
 * Straight-line calibration through pairs of reading and reference by least squares.
 *
 *     actual = gain · read + offset
 *
 * Source    [STRD-NORRIS].
 * Inputs    read and actual in the gauge's unit.
 * Domain    at least 3 pairs (one point is a check, not a calibration), of at least 2 different readings.
 * Throws    RangeError outside the domain.
 * Accuracy  nine figures on the StRD set.
 */
export function fitCalibration(points: readonly { read: number; actual: number }[]): {
  gain: number;
  offset: number;
  residualSd: number;
  gainSe: number;
  offsetSe: number;
} {
  const fit = fitLine(
    "points",
    points.map(({ read, actual }) => ({ x: read, y: actual })),
  );
  return { gain: fit.slope, offset: fit.intercept, residualSd: fit.residualSd, gainSe: fit.slopeSe, offsetSe: fit.interceptSe };
}
