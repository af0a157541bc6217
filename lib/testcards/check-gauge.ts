/** From what was typed to what was true: which calibration holds on the day, and what it makes of a reading. */
import { checkCalibration, correctReading } from "./calibration";
import { type CalibrationRecord, type CardDocument, type Instrument, instrumentOf, type Reading } from "./card";
import type { CheckContext, ReadingEntry } from "./debrief-types";
import { convert, convertDifference, sameDimension, type Unit } from "./units";
import type { Reason, Side } from "./words";

/** A gauge as it stood on the day of the flight. `calibration` is null where nothing was ever proved, or not in this unit. */
export type Gauge = {
  instrument: Instrument | null;
  unit: Unit;
  readable: number;
  calibration: CalibrationRecord | null;
  reasons: Reason[];
  why: string;
};

/** A reading in the limit's unit. Beyond the table, `value` is the true value at that end and must not be quoted. */
export type Corrected = {
  value: number;
  expandedUncertainty: number | null;
  unit: Unit;
  slope: number; // true change per change on the gauge, in the gauge's unit
  beyond: "low" | "high" | null;
  reasons: Reason[];
};

export function gaugeOf(card: CardDocument, reading: Reading, entry: ReadingEntry | null, context: CheckContext): Gauge {
  const instrument = instrumentOf(card, reading.instrument) ?? null;
  if (instrument === null) {
    // a stopwatch, a measuring cup, a count: taken as read, with the U that its own limit states
    return { instrument: null, unit: entry?.unit ?? reading.unit ?? "1", readable: 0, calibration: null, reasons: [], why: "" };
  }
  return onTheDay(instrument, entry?.unit ?? null, context);
}

export function onTheDay(instrument: Instrument, typedUnit: Unit | null, context: CheckContext): Gauge {
  const unit = typedUnit ?? instrument.unit;
  const gauge = { instrument, unit, readable: instrument.readable };
  const later = context.calibrations?.[instrument.id];
  const calibration = later ?? instrument.calibration;
  const missing = (why: string) => ({ ...gauge, calibration: null, reasons: ["not calibrated" as const], why });
  if (!calibration) return missing(`${instrument.name} has no calibration`);
  if (!later && unit !== instrument.unit) return missing(`${instrument.name} was changed: the new gauge has no calibration`);
  if (!isCalibration(calibration) || !sameDimension(calibration.unit, unit))
    return missing(`the calibration of ${instrument.name} does not hold`);
  const fault = later ? movedBefore(later, context.flownOn) : notValidOn(calibration, context.flownOn);
  return { ...gauge, calibration, reasons: fault ? ["not calibrated"] : [], why: fault ? `${instrument.name} ${fault}` : "" };
}

/** Days are YYYY-MM-DD and compare as text. */
function notValidOn({ calibratedOn, validUntil, disturbedOn }: CalibrationRecord, day: string): string | null {
  if (day < calibratedOn) return `was calibrated only on ${calibratedOn}`;
  if (day > validUntil) return `was calibrated until ${validUntil}`;
  if (disturbedOn !== null && disturbedOn >= calibratedOn && disturbedOn <= day) return `was disturbed on ${disturbedOn}`;
  return null;
}

/** A recalibration after the flight speaks for the flight unless the sensor was moved in between. */
function movedBefore({ calibratedOn, disturbedOn }: CalibrationRecord, day: string): string | null {
  const between = disturbedOn !== null && disturbedOn >= day && disturbedOn < calibratedOn;
  return between ? `was disturbed on ${disturbedOn}, before it was calibrated again` : null;
}

function isCalibration(calibration: CalibrationRecord): boolean {
  try {
    checkCalibration(calibration);
    return true;
  } catch {
    return false;
  }
}

/**
 * A reading corrected and turned into `unit`; null where it cannot be: no calibration at all, or a unit of another kind.
 * `ownU` is a limit's own expanded uncertainty, in `unit`; it stands in place of the gauge's.
 */
export function correct(read: number, gauge: Gauge, unit: Unit, ownU: number | null = null, isCount = false): Corrected | null {
  if (!isUsable(read) || !sameDimension(gauge.unit, unit)) return null;
  if (gauge.instrument === null) {
    const expandedUncertainty = ownU ?? (isCount ? 0 : null);
    const value = converted(read, gauge.unit, unit);
    return value === null ? null : { value, expandedUncertainty, unit, slope: 1, beyond: null, reasons: [] };
  }
  const { calibration } = gauge;
  const onTable = calibration === null ? null : converted(read, gauge.unit, calibration.unit);
  if (calibration === null || onTable === null) return null;
  const corrected = correctReading(onTable, calibration);
  const u = corrected.expandedUncertainty;
  return {
    value: convert(corrected.value, calibration.unit, unit),
    expandedUncertainty: ownU ?? (u === null ? null : convertDifference(u, calibration.unit, unit)),
    unit,
    slope: corrected.slope,
    beyond: corrected.beyond,
    reasons: [...gauge.reasons, ...(corrected.beyond === null ? [] : (["outside calibrated range"] as const))],
  };
}

/** No gauge shows more; a figure past this counts as none. */
const LARGEST = 1e9;

export function isUsable(value: number): boolean {
  return Math.abs(value) <= LARGEST; // false for NaN too
}

/** Null for what no unit can hold, such as a temperature below absolute zero. */
export function converted(value: number, from: Unit, to: Unit): number | null {
  try {
    return convert(value, from, to);
  } catch {
    return null;
  }
}

/** One raw figure with its moment. `row` is its place among the rows of a series, else −1. */
export type Raw = { value: number; atS: number | null; label: string | null; row: number };

/** Whether the card asked for a figure that can speak about this side: a highest says nothing about a minimum. */
export function speaksFor(reading: Reading, side: Side): boolean {
  const { sampling } = reading;
  return side === "max" ? sampling !== "lowest" : sampling !== "highest";
}

/** The typed figure that counts for one side, or null where none was given. The first of several equal ones. */
export function extremeOf(reading: Reading, entry: ReadingEntry | null, side: Side): Raw | null {
  if (!entry) return null;
  if (reading.sampling === "series") {
    const rows = rawRows(entry);
    return rows.reduce<Raw | null>(
      (best, row) => (best === null || (side === "max" ? row.value > best.value : row.value < best.value) ? row : best),
      null,
    );
  }
  const value = side === "min" && reading.sampling === "lowest and highest" ? entry.lowest : entry.value;
  if (value === null || !isUsable(value)) return null;
  return { value, atS: side === "max" ? entry.atS : null, label: null, row: -1 };
}

export function rawRows(entry: ReadingEntry): Raw[] {
  return entry.rows.flatMap(({ value, atS, label }, row) => (isUsable(value) ? [{ value, atS, label, row }] : []));
}

/** The entry that carries the moment of a value: its own, or the one whose moment it shares. */
export function momentOf(entries: readonly ReadingEntry[], entry: ReadingEntry | null): ReadingEntry | null {
  const seen = new Set<string>();
  let holder = entry;
  while (holder?.sameMomentAs && !seen.has(holder.reading)) {
    seen.add(holder.reading);
    const shared = holder.sameMomentAs;
    holder = entries.find((candidate) => candidate.reading === shared) ?? null;
  }
  return holder;
}

export type TrueSeries = { timeS: number; value: number }[];

/** The timed rows of a series, true and in `unit`; null unless there are two or more, rising, and all inside the table. */
export function trueSeries(entry: ReadingEntry, gauge: Gauge, unit: Unit): TrueSeries | null {
  const series: TrueSeries = [];
  for (const { value, atS } of rawRows(entry)) {
    const corrected = correct(value, gauge, unit);
    if (atS === null || !isUsable(atS) || !corrected || corrected.beyond !== null) return null;
    if (series.length > 0 && atS <= (series.at(-1)?.timeS ?? 0)) return null;
    series.push({ timeS: atS, value: corrected.value });
  }
  return series.length >= 2 ? series : null;
}
