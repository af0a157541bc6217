import { correctReading, readingFor, roundToReadable } from "../calibration";
import type { Band, CalibrationRecord, CardDocument, Instrument } from "../card";
import { unitSymbol } from "../unit-symbols";
import { convert, convertDifference, rateUnitOf, sameDimension, type Unit } from "../units";
import type { Reason, Side } from "../words";

/** Decimals that a unit is spoken with even when they are nought: "MAP 29.0". */
const LEAST_DECIMALS: Partial<Record<Unit, number>> = { inHg: 1, bar: 1 };

/** A figure as printed: no more decimals than it has, with a real minus sign. */
export function figure(value: number, unit: Unit | null, mostDecimals = 2): string {
  const least = unit === null ? 0 : (LEAST_DECIMALS[unit] ?? 0);
  if (least === 0 && Number.isSafeInteger(value) && value >= 0) return `${value}`;
  const exact = Number(value.toFixed(mostDecimals));
  const decimals = exact.toString().split(".")[1]?.length ?? 0;
  return exact.toFixed(Math.max(decimals, least)).replace("-", "−");
}

export function withUnit(text: string, unit: Unit | null): string {
  const symbol = unit === null ? "" : unitSymbol(unit);
  return symbol === "" ? text : `${text}\u00a0${symbol}`;
}

/** Why a gauge has no number for a true value. The word prints in its place: a pilot would read a true value as the gauge's. */
export type NoNumber = Extract<Reason, "not calibrated" | "outside calibrated range">;
export type OnGauge = number | NoNumber;

/** What was proved about the gauge, in the gauge's own unit; null where nothing was. */
function proved({ calibration, unit }: Instrument): CalibrationRecord | null {
  return calibration !== null && calibration.unit === unit ? calibration : null;
}

export function isCalibrated(instrument: Instrument): boolean {
  return proved(instrument) !== null;
}

/** A true value as the gauge would show it, rounded to a mark the pilot can read on the cautious side. */
export function onGauge(trueValue: number, unit: Unit, side: Side, instrument: Instrument): OnGauge {
  const calibration = proved(instrument);
  if (calibration === null) return "not calibrated";
  const { reading, inRange } = readingFor(convert(trueValue, unit, instrument.unit), calibration);
  return inRange ? roundToReadable(reading, instrument.readable, side) : "outside calibrated range";
}

/** "102.5 °C", or the word for why there is no number. */
export function gaugeText(shown: OnGauge, unit: Unit): string {
  return typeof shown === "number" ? withUnit(figure(shown, unit), unit) : shown;
}

/**
 * A true difference (rate, spread, change) as the gauge would show it. The gauge's slope differs from place to place: the one is
 * taken that keeps the printed change on the cautious side of the true one.
 */
export function differenceOnGauge(trueDifference: number, unit: Unit, side: Side, instrument: Instrument): OnGauge {
  const calibration = proved(instrument);
  if (calibration === null) return "not calibrated";
  const target = sameDimension(unit, instrument.unit) ? instrument.unit : (rateUnitOf(instrument.unit) ?? instrument.unit);
  const slopes = slopesOf(calibration);
  const slope = side === "max" ? Math.max(...slopes) : Math.min(...slopes);
  return roundToReadable(convertDifference(trueDifference, unit, target) / slope, instrument.readable, side);
}

function slopesOf(calibration: CalibrationRecord): number[] {
  if (calibration.kind === "linear") return [calibration.gain];
  const middles = calibration.points.slice(1).map((point, i) => (point.read + (calibration.points[i]?.read ?? point.read)) / 2);
  return middles.map((read) => correctReading(read, calibration).slope);
}

/** A true band inside which the gauge should stand: its low end rounded up, its high end down. No half of a band is proved. */
export function bandOnGauge(band: Band, instrument: Instrument): { low: number | null; high: number | null } | NoNumber {
  const low = band.low === null ? null : onGauge(band.low, band.unit, "min", instrument);
  const high = band.high === null ? null : onGauge(band.high, band.unit, "max", instrument);
  if (typeof low === "string") return low;
  return typeof high === "string" ? high : { low, high };
}

/** "77.5–95", "below 95", "77.5 or more". */
export function bandText(low: number | null, high: number | null, unit: Unit | null): string {
  if (low !== null && high !== null) return `${figure(low, unit)}–${figure(high, unit)}`;
  if (high !== null) return `to ${figure(high, unit)}`;
  return low === null ? "" : `from ${figure(low, unit)}`;
}

/** The gauge the pilot looks at for a parameter: the panel's own before a repeater, what the pilot sees before what others see. */
export function pilotsGauge(card: CardDocument, parameter: string): Instrument | undefined {
  const rank = (instrument: Instrument) =>
    (instrument.visibleTo.includes("pilot") ? 0 : 10) + ["panel", "repeater", "hand held", "recorder"].indexOf(instrument.shownOn);
  return card.programme.instruments.filter((i) => i.parameter === parameter).sort((a, b) => rank(a) - rank(b))[0];
}
