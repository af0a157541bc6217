import type { Unit } from "./units";

const SYMBOLS: Partial<Record<Unit, string>> = {
  degC: "°C",
  degF: "°F",
  degR: "°R",
  USgal: "US gal",
  impgal: "imp gal",
  m3: "m³",
  "m3/s": "m³/s",
  "USgal/h": "US gal/h",
  deg: "°",
  "1": "",
  "degC/min": "°C/min",
  "degF/min": "°F/min",
};

/** How a unit is written for a reader: "°C" for degC, nothing for the unit one. */
export function unitSymbol(unit: Unit): string {
  return SYMBOLS[unit] ?? unit;
}

/** U+202F: between a value and its unit, so that the two are never parted. */
export const THIN_SPACE = "\u202f";

/** Puts a unit behind a figure; an angle's degree sign stands close to it. */
export function withUnit(text: string, unit: Unit | null): string {
  const symbol = unit === null ? "" : unitSymbol(unit);
  if (symbol === "") return text;
  return unit === "deg" ? `${text}${symbol}` : `${text}${THIN_SPACE}${symbol}`;
}
