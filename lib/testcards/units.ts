import { checkFinite, checkResult } from "./check-range";

/** A unit that does not exist, or two units that measure different things. */
export class UnitError extends RangeError {
  override name = "UnitError";
}

/** Exact by definition [SP-811] unless marked; each factor turns one of the unit into the SI unit of its row. */
const INCH_M = 0.0254;
const FOOT_M = 0.3048;
const NAUTICAL_MILE_M = 1852;
const MILE_M = 1609.344;
const POUND_KG = 0.45359237;
const STANDARD_GRAVITY_MPS2 = 9.80665;
const POUND_FORCE_N = POUND_KG * STANDARD_GRAVITY_MPS2;
const PSI_PA = POUND_FORCE_N / INCH_M ** 2;
const INCH_OF_MERCURY_PA = 3386.389; // conventional [SP-811], not exact
const US_GALLON_M3 = 231 * INCH_M ** 3;
const IMPERIAL_GALLON_M3 = 4.54609e-3;
const HORSEPOWER_W = 550 * FOOT_M * POUND_FORCE_N; // 550 ft·lbf/s, not the metric horsepower
const FAHRENHEIT_K = 5 / 9;

type Definition = { dimension: string; scale: number; zero?: number };

/** SI value = (value + zero) × scale. Only temperatures have a zero of their own. */
const DEFINITIONS = {
  K: { dimension: "temperature", scale: 1, zero: 0 },
  degC: { dimension: "temperature", scale: 1, zero: 273.15 },
  degF: { dimension: "temperature", scale: FAHRENHEIT_K, zero: 459.67 },
  degR: { dimension: "temperature", scale: FAHRENHEIT_K, zero: 0 },
  Pa: { dimension: "pressure", scale: 1 },
  hPa: { dimension: "pressure", scale: 100 },
  kPa: { dimension: "pressure", scale: 1000 },
  bar: { dimension: "pressure", scale: 1e5 },
  psi: { dimension: "pressure", scale: PSI_PA },
  inHg: { dimension: "pressure", scale: INCH_OF_MERCURY_PA },
  m: { dimension: "length", scale: 1 },
  ft: { dimension: "length", scale: FOOT_M },
  km: { dimension: "length", scale: 1000 },
  NM: { dimension: "length", scale: NAUTICAL_MILE_M },
  in: { dimension: "length", scale: INCH_M },
  mm: { dimension: "length", scale: 1e-3 },
  "m/s": { dimension: "speed", scale: 1 },
  kt: { dimension: "speed", scale: NAUTICAL_MILE_M / 3600 },
  "km/h": { dimension: "speed", scale: 1 / 3.6 },
  mph: { dimension: "speed", scale: MILE_M / 3600 },
  "ft/min": { dimension: "speed", scale: FOOT_M / 60 },
  "mm/s": { dimension: "speed", scale: 1e-3 },
  kg: { dimension: "mass", scale: 1 },
  lb: { dimension: "mass", scale: POUND_KG },
  m3: { dimension: "volume", scale: 1 },
  L: { dimension: "volume", scale: 1e-3 },
  mL: { dimension: "volume", scale: 1e-6 },
  USgal: { dimension: "volume", scale: US_GALLON_M3 },
  impgal: { dimension: "volume", scale: IMPERIAL_GALLON_M3 },
  "m3/s": { dimension: "volume flow", scale: 1 },
  "L/min": { dimension: "volume flow", scale: 1e-3 / 60 },
  "L/h": { dimension: "volume flow", scale: 1e-3 / 3600 },
  "USgal/h": { dimension: "volume flow", scale: US_GALLON_M3 / 3600 },
  W: { dimension: "power", scale: 1 },
  kW: { dimension: "power", scale: 1000 },
  hp: { dimension: "power", scale: HORSEPOWER_W },
  rpm: { dimension: "speed of rotation", scale: (2 * Math.PI) / 60 },
  s: { dimension: "time", scale: 1 },
  min: { dimension: "time", scale: 60 },
  h: { dimension: "time", scale: 3600 },
  rad: { dimension: "angle", scale: 1 },
  deg: { dimension: "angle", scale: Math.PI / 180 },
  "1": { dimension: "ratio", scale: 1 },
  "%": { dimension: "ratio", scale: 0.01 },
  N: { dimension: "force", scale: 1 },
  lbf: { dimension: "force", scale: POUND_FORCE_N },
  daN: { dimension: "force", scale: 10 },
  g: { dimension: "load factor", scale: STANDARD_GRAVITY_MPS2 },
  V: { dimension: "voltage", scale: 1 },
  A: { dimension: "current", scale: 1 },
  "K/s": { dimension: "temperature rate", scale: 1 },
  "degC/min": { dimension: "temperature rate", scale: 1 / 60 },
  "degF/min": { dimension: "temperature rate", scale: FAHRENHEIT_K / 60 },
} as const satisfies Record<string, Definition>;

export type Unit = keyof typeof DEFINITIONS;

/** Every unit known here, for forms and schemas. `g` is load factor, not gram. */
export const UNITS = Object.keys(DEFINITIONS) as Unit[];

function definitionOf(name: string, unit: Unit): Definition {
  if (!Object.hasOwn(DEFINITIONS, unit)) throw new UnitError(`${name} is ${JSON.stringify(unit)}; it must be one of ${UNITS.join(", ")}.`);
  return DEFINITIONS[unit];
}

function pair(from: Unit, to: Unit): [Definition, Definition] {
  const source = definitionOf("from", from);
  const target = definitionOf("to", to);
  if (source.dimension !== target.dimension)
    throw new UnitError(`from is ${from} (${source.dimension}) and to is ${to} (${target.dimension}); both must measure the same thing.`);
  return [source, target];
}

/** What a unit measures: "temperature", "pressure". Throws UnitError for an unknown unit. */
export function dimensionOf(unit: Unit): string {
  return definitionOf("unit", unit).dimension;
}

/** Whether one can be converted to the other. Throws UnitError for an unknown unit. */
export function sameDimension(a: Unit, b: Unit): boolean {
  return dimensionOf(a) === dimensionOf(b);
}

/** The unit of a change per minute of a quantity in `unit`, where one exists: degF → degF/min. */
export function rateUnitOf(unit: Unit): Unit | null {
  return unit === "degF" || unit === "degR" ? "degF/min" : unit === "degC" || unit === "K" ? "degC/min" : null;
}

/**
 * One value in another unit of the same kind; a temperature is converted as a point on its scale.
 *
 *     to = (value + zero_from) · scale_from / scale_to − zero_to
 *
 * Source    [SP-811] appendix B; °C = (°F − 32)/1.8, K = °C + 273.15.
 * Inputs    value in `from`. A difference or a rate of temperature goes through convertDifference or a …/min unit.
 * Domain    any finite value; a temperature not below absolute zero.
 * Throws    UnitError for an unknown unit or mixed kinds, RangeError outside the domain.
 * Accuracy  exact definitions, but for inHg (conventional, 7 figures); rounding below 1 part in 10¹⁴.
 */
export function convert(value: number, from: Unit, to: Unit): number {
  const [source, target] = pair(from, to);
  checkFinite("value", value);
  if (source.dimension === "temperature" && value + (source.zero ?? 0) < -1e-9)
    throw new RangeError(`value is ${value} ${from}; a temperature must be at least ${-(source.zero ?? 0)} ${from}, absolute zero.`);
  if (from === to) return value;
  if (source.dimension !== "temperature") return checkResult("value", (value * source.scale) / target.scale);
  return checkResult("value", ((value + (source.zero ?? 0)) * source.scale) / target.scale - (target.zero ?? 0));
}

/**
 * A difference (an uncertainty, a margin, a change) in another unit of the same kind: never with the 32.
 *
 *     to = value · scale_from / scale_to
 *
 * Source    [SP-811] appendix B: a difference of 1 °C is 1 K, 1.8 °F and 1.8 °R.
 * Inputs    value in `from`; may be negative.
 * Domain    any finite value.
 * Throws    UnitError for an unknown unit or mixed kinds, RangeError for a value that is not finite.
 * Accuracy  as convert.
 */
export function convertDifference(value: number, from: Unit, to: Unit): number {
  const [source, target] = pair(from, to);
  checkFinite("value", value);
  return from === to ? value : checkResult("value", (value * source.scale) / target.scale);
}
