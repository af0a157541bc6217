import type { Band, Quantity } from "@/lib/testcards/card";
import { unitSymbol, withUnit } from "@/lib/testcards/unit-symbols";
import type { Unit } from "@/lib/testcards/units";
import { decimalsOf, formatNumber, ownDecimals } from "./number";

/** A unit as the trade prints it. */
export const unitLabel = unitSymbol;

export { withUnit };

export function formatQuantity(quantity: Quantity, decimals = ownDecimals(quantity.value)): string {
  return withUnit(formatNumber(quantity.value, decimals), quantity.unit);
}

/** A figure as a person reads it: 92.0 on a gauge readable to 0.1, but 105 and 102.5 on one readable to 2.5. */
export function figureOnGauge(value: number, readable: number): string {
  const decimals = decimalsOf(readable);
  const readsEveryDigit = Math.abs(readable * 10 ** decimals - 1) < 1e-6;
  return formatNumber(value, readsEveryDigit ? decimals : ownDecimals(value, decimals));
}

export function formatOnGauge(value: number, instrument: { unit: Unit; readable: number }): string {
  return withUnit(figureOnGauge(value, instrument.readable), instrument.unit);
}

/** "75 to 98 °C", "98 °C or less", "55 °C or more". */
export function formatBand(band: Band, decimals?: number): string {
  const figure = (value: number) => formatNumber(value, decimals ?? ownDecimals(value));
  if (band.low !== null && band.high !== null) return withUnit(`${figure(band.low)} to ${figure(band.high)}`, band.unit);
  if (band.high !== null) return `${withUnit(figure(band.high), band.unit)} or less`;
  if (band.low !== null) return `${withUnit(figure(band.low), band.unit)} or more`;
  return "—";
}
