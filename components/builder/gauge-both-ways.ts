import { steepestReading } from "@/lib/testcards/abort-limit";
import { correctReading, readingFor } from "@/lib/testcards/calibration";
import type { Instrument } from "@/lib/testcards/card";
import { convert, convertDifference, type Unit } from "@/lib/testcards/units";

/** As many decimals as an editor shows. */
export const tidy = (value: number): number => Number(value.toFixed(2));

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

/** True change per change on this dial where its table is steepest: the cautious place for a rate. */
function steepestSlope(instrument: Instrument): number | null {
  const at = steepestReading(instrument);
  return instrument.calibration && at !== null ? correctReading(at, instrument.calibration).slope : null;
}

/** The true rate, a difference in `unit` per minute, behind a change on the gauge in so many seconds. */
export function trueRateFromGauge(change: number, windowS: number, instrument: Instrument, unit: Unit): number | null {
  const slope = steepestSlope(instrument);
  return slope === null || windowS <= 0 ? null : convertDifference((change * slope * 60) / windowS, instrument.unit, unit);
}

/** The change on the gauge in so many seconds that stands for a true rate, unrounded. */
export function gaugeFromTrueRate(perMin: number, unit: Unit, windowS: number, instrument: Instrument): number | null {
  const slope = steepestSlope(instrument);
  return slope === null || slope === 0 ? null : (convertDifference(perMin, unit, instrument.unit) * windowS) / 60 / slope;
}

/** U of the instrument in another unit: a difference, never converted as a temperature. */
export function uncertaintyIn(instrument: Instrument, unit: Unit): number | null {
  const U = instrument.calibration?.expandedUncertainty;
  return U === null || U === undefined ? null : convertDifference(U, instrument.unit, unit);
}
