import type { Parameter } from "@/lib/testcards/card";
import type { Unit } from "@/lib/testcards/units";
import type { HotDayRule } from "@/lib/testcards/words";

type Extra = {
  normal?: [number, number];
  rule?: HotDayRule;
  safety?: boolean;
  stabilises?: boolean;
  ratePerMin?: number;
  rateUnit?: Unit;
  group?: string;
};

const parameter = (code: string, name: string, shortName: string, unit: Unit, extra: Extra = {}): Parameter => ({
  code,
  name,
  shortName,
  unit,
  group: extra.group ?? null,
  hotDayRule: extra.rule ?? "none",
  normal: extra.normal ? { low: extra.normal[0], high: extra.normal[1], unit } : null,
  safety: extra.safety ?? false,
  stabilises: extra.stabilises ?? false,
  standardRatePerMin: extra.ratePerMin === undefined ? null : { value: extra.ratePerMin, unit: extra.rateUnit ?? unit },
});

/** Rates are the fastest rise for which the standing abort numbers hold, in a minute (PL-01 rev 2). */
export const PARAMETERS: Parameter[] = [
  parameter("coolant", "Coolant out", "Coolant", "degC", {
    normal: [75, 98],
    rule: "plus-one",
    safety: true,
    stabilises: true,
    ratePerMin: 2,
  }),
  parameter("cht", "CHT, head metal, hottest of four", "CHT", "degC", {
    normal: [95, 140],
    rule: "plus-one",
    safety: true,
    stabilises: true,
    ratePerMin: 4,
    rateUnit: "degF",
    group: "cht",
  }),
  parameter("oil-t", "Oil temperature", "Oil T", "degC", {
    normal: [70, 105],
    rule: "plus-one",
    safety: true,
    stabilises: true,
    ratePerMin: 2,
  }),
  parameter("tit", "Turbine inlet temperature", "TIT", "degC", { normal: [700, 850], rule: "plus-one", safety: true, ratePerMin: 10 }),
  parameter("iat", "Induction air after the intercooler", "IAT", "degC", { normal: [10, 50], rule: "ratio", safety: true, ratePerMin: 2 }),
  parameter("oil-p", "Oil pressure", "Oil P", "psi", { normal: [45, 65], safety: true }),
  parameter("rpm", "Propeller speed", "RPM", "rpm"),
  parameter("map", "Manifold pressure", "MAP", "inHg"),
  parameter("fuel-p", "Fuel pressure", "Fuel P", "bar"),
  parameter("skin", "Cowl inner skin", "Skin", "degC", { rule: "plus-one" }),
  parameter("line", "Fuel line skin", "Fuel line", "degC", { rule: "plus-one" }),
  parameter("oat", "Outside air temperature", "OAT", "degC"),
  parameter("ias", "Indicated airspeed", "IAS", "kt"),
  parameter("altitude", "Pressure altitude", "Height", "ft"),
  parameter("fuel-flow", "Fuel flow", "FF", "L/h"),
  parameter("fuel", "Fuel quantity", "Fuel", "L"),
  parameter("time", "Elapsed time", "Time", "s"),
  parameter("ground-speed", "Ground speed", "GS", "kt"),
  parameter("track", "Track over the ground", "Track", "deg"),
  parameter("catch-tank", "Coolant caught in the tank", "Catch tank", "mL"),
  parameter("exit-gap", "COWL exit gap", "Gap", "mm"),
  parameter("lever-force", "COWL lever force", "Force", "N"),
  parameter("vibration", "Vibration velocity, peak", "Vibration", "mm/s"),
  parameter("compression", "Cylinder pressure held at 80 psi", "Held", "psi", { group: "cylinders" }),
  parameter("wing-drop", "Wing drop at the stall", "Drop", "deg"),
  parameter("mass", "Mass of the aircraft", "Mass", "kg"),
];
