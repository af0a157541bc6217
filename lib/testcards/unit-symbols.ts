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
