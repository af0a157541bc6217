import type { Band, EntryCondition, Quantity, Reading } from "@/lib/testcards/card";
import type { Unit } from "@/lib/testcards/units";
import type { LimitCondition, Sampling } from "@/lib/testcards/words";
import { instrumentNamed } from "../instruments";

const PREDICTION = "Prediction of the programme plan, PL-01 rev 2";

export type Range = [low: number, high: number];
export type Expected = { coolant?: Range; cht?: Range; oil?: Range; iat?: Range; oilP?: Range; tit?: Range };

export type ReadingOptions = {
  id?: string;
  label?: string;
  head?: string;
  on?: string;
  sampling?: Sampling;
  sheet?: Reading["onSheet"];
  by?: Reading["recordedBy"];
  when?: LimitCondition[];
  expected?: Range | undefined;
  ratePerMin?: Quantity;
};

type Known = { parameter: string; label: string; head: string; on: string; bandUnit: Unit };
const KNOWN = {
  coolant: { parameter: "coolant", label: "Coolant", head: "COOL", on: "COOLANT-PANEL", bandUnit: "degC" },
  cht: { parameter: "cht", label: "CHT", head: "CHT", on: "CHT-PANEL", bandUnit: "degF" },
  oilT: { parameter: "oil-t", label: "Oil T", head: "OIL", on: "OIL-T", bandUnit: "degC" },
  oilP: { parameter: "oil-p", label: "Oil P", head: "OIL P", on: "OIL-P", bandUnit: "psi" },
  tit: { parameter: "tit", label: "TIT", head: "TIT", on: "TIT", bandUnit: "degC" },
  iat: { parameter: "iat", label: "IAT", head: "IAT", on: "IAT", bandUnit: "degC" },
  oat: { parameter: "oat", label: "OAT", head: "OAT", on: "OAT", bandUnit: "degC" },
  rpm: { parameter: "rpm", label: "RPM", head: "RPM", on: "RPM", bandUnit: "rpm" },
  map: { parameter: "map", label: "MAP", head: "MAP", on: "MAP", bandUnit: "inHg" },
  fuelP: { parameter: "fuel-p", label: "Fuel P", head: "FUEL P", on: "FUEL-P", bandUnit: "bar" },
  skin: { parameter: "skin", label: "Cowl inner skin", head: "SKIN", on: "LOGGER-SKIN", bandUnit: "degC" },
  line: { parameter: "line", label: "Fuel line skin", head: "LINE", on: "LOGGER-LINE", bandUnit: "degC" },
  ias: { parameter: "ias", label: "IAS", head: "IAS", on: "ASI", bandUnit: "kt" },
  altitude: { parameter: "altitude", label: "Pressure altitude", head: "PA", on: "ALT", bandUnit: "ft" },
  fuelFlow: { parameter: "fuel-flow", label: "Fuel flow", head: "FF", on: "FUEL-FLOW", bandUnit: "L/h" },
  time: { parameter: "time", label: "Time", head: "TIME", on: "STOPWATCH", bandUnit: "s" },
  groundSpeed: { parameter: "ground-speed", label: "Ground speed", head: "GS", on: "GPS-SPEED", bandUnit: "kt" },
  track: { parameter: "track", label: "Track", head: "TRACK", on: "GPS-TRACK", bandUnit: "deg" },
  catchTank: { parameter: "catch-tank", label: "Catch tank, gained", head: "CATCH", on: "CATCH-TANK", bandUnit: "mL" },
  gap: { parameter: "exit-gap", label: "Exit gap", head: "GAP", on: "GAP-RULE", bandUnit: "mm" },
  force: { parameter: "lever-force", label: "Lever force, highest", head: "FORCE", on: "SPRING-BALANCE", bandUnit: "N" },
  vibration: { parameter: "vibration", label: "Vibration", head: "VIB", on: "VIBRATION", bandUnit: "mm/s" },
  held: { parameter: "compression", label: "Held", head: "HELD", on: "COMPRESSION", bandUnit: "psi" },
  drop: { parameter: "wing-drop", label: "Wing drop", head: "DROP", on: "INCLINOMETER", bandUnit: "deg" },
} as const satisfies Record<string, Known>;

const kebab = (text: string): string => text.replace(/[A-Z]/g, (letter) => `-${letter.toLowerCase()}`);
const band = (range: Range | undefined, unit: Unit): Band | null => (range ? { low: range[0], high: range[1], unit } : null);

/** A number read on one of the programme's instruments, by default the highest, left to the recorder. */
export function read(what: keyof typeof KNOWN, options: ReadingOptions = {}): Reading {
  const known = KNOWN[what];
  const instrument = instrumentNamed(options.on ?? known.on);
  const sampling = options.sampling ?? "highest";
  return {
    id: options.id ?? kebab(what),
    parameter: known.parameter,
    label: options.label ?? (sampling === "highest" ? `${known.label}, highest` : known.label),
    cellHead: options.head ?? known.head,
    kind: "number",
    instrument: instrument.id,
    unit: instrument.unit,
    recordedBy: options.by ?? (options.sheet && options.sheet !== "none" ? "pilot" : "recorder"),
    onSheet: options.sheet ?? "none",
    sampling,
    conditions: options.when ?? [],
    expected: band(options.expected, known.bandUnit),
    expectedOrigin: options.expected ? PREDICTION : null,
    expectedRatePerMin: options.ratePerMin ?? null,
    choices: [],
    low: null,
    high: null,
  };
}

type PlainReading = {
  by?: Reading["recordedBy"];
  choices?: string[];
  low?: number;
  high?: number;
  unit?: Unit;
  sheet?: Reading["onSheet"];
};

/** A reading without an instrument: a count, a yes or no, a choice, a remark, a photo, a figure worked out by hand. */
export function note(
  id: string,
  label: string,
  kind: Reading["kind"],
  { by, choices, low, high, unit, sheet }: PlainReading = {},
): Reading {
  return {
    id,
    parameter: null,
    label,
    cellHead: label.toUpperCase().slice(0, 8),
    kind,
    instrument: null,
    unit: unit ?? (kind === "count" ? "1" : null),
    recordedBy: by ?? "pilot",
    onSheet: sheet ?? (kind === "photo" ? "none" : "single"),
    sampling: "single",
    conditions: [],
    expected: null,
    expectedOrigin: null,
    expectedRatePerMin: null,
    choices: choices ?? [],
    low: low ?? null,
    high: high ?? null,
  };
}

export type SixOptions = {
  sampling: Sampling;
  expected: Expected;
  when: LimitCondition[];
  sheet?: Reading["onSheet"];
  rate?: Partial<Record<"coolant" | "cht", Quantity>>;
};

/** The six that the pilot writes: coolant, hottest CHT, oil T, oil P, IAT, OAT. */
export function six({ sampling, expected, when, sheet = "grid", rate = {} }: SixOptions): Reading[] {
  const rated = (quantity: Quantity | undefined) => (quantity ? { ratePerMin: quantity } : {});
  return [
    read("coolant", { sampling, sheet, when: when.filter((w) => w === "take-off"), expected: expected.coolant, ...rated(rate.coolant) }),
    read("cht", { sampling, sheet, expected: expected.cht, ...rated(rate.cht) }),
    read("oilT", { sampling, sheet, expected: expected.oil }),
    read("oilP", {
      sampling: "lowest and highest",
      sheet,
      when: when.filter((w) => w === "at power" || w === "idle"),
      expected: expected.oilP ?? [45, 65],
    }),
    read("iat", { sampling: "highest", sheet, expected: expected.iat }),
    read("oat", { sampling: "single", sheet }),
  ];
}

export const tit = (expected: Range = [700, 855]): Reading => read("tit", { expected });

/** RPM and MAP at full power, where it is used, and at the power held. */
export function powerReadings(full: boolean): Reading[] {
  return [
    ...(full
      ? [
          read("rpm", { id: "rpm-full", label: "RPM at full power, highest", when: ["full power"] }),
          read("map", { id: "map-full", label: "MAP at full power, highest", when: ["full power"] }),
        ]
      : []),
    read("rpm", { label: full ? "RPM after that, highest" : "RPM, highest", when: ["at power"] }),
    read("map", { label: full ? "MAP after that, highest" : "MAP, highest", when: ["at power"] }),
  ];
}

/** Oil must be warm before full power is set; read once, just before. */
export const oilBeforeFullPower = (expected: Range): Reading =>
  read("oilT", {
    id: "oil-t-before",
    label: "Oil T before full power",
    head: "OIL",
    sampling: "lowest",
    sheet: "single",
    when: ["full power"],
    expected,
  });

/** A condition to be met at the start, on the gauge. */
export function entry(
  what: keyof typeof KNOWN,
  relation: EntryCondition["relation"],
  value: number,
  tolerance: number | null = null,
): EntryCondition {
  const instrument = instrumentNamed(KNOWN[what].on);
  return {
    id: `entry-${kebab(what)}`,
    parameter: KNOWN[what].parameter,
    instrument: instrument.id,
    relation,
    value,
    tolerance,
    unit: instrument.unit,
  };
}
