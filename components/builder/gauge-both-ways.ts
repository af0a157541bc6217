import { correctReading, readingFor } from "@/lib/testcards/calibration";
import type { Instrument } from "@/lib/testcards/card";
import { convert, convertDifference, type Unit } from "@/lib/testcards/units";

/** The true value behind a gauge number, in `unit`; null where the gauge proves nothing there. */
export function trueFromGauge(onGauge: number, instrument: Instrument, unit: Unit): number | null {
  if (!instrument.calibration) return null;
  const { value, inRange } = correctReading(onGauge, instrument.calibration);
  return inRange ? convert(value, instrument.unit, unit) : null;
}

/** The gauge number that stands for a true value, unrounded; null outside the calibrated range. */
export function gaugeFromTrue(trueValue: number, unit: Unit, instrument: Instrument): number | null {
  if (!instrument.calibration) return null;
  const { reading, inRange } = readingFor(convert(trueValue, unit, instrument.unit), instrument.calibration);
  return inRange ? reading : null;
}

/** U of the instrument in another unit: a difference, never converted as a temperature. */
export function uncertaintyIn(instrument: Instrument, unit: Unit): number | null {
  const U = instrument.calibration?.expandedUncertainty;
  return U === null || U === undefined ? null : convertDifference(U, instrument.unit, unit);
}
