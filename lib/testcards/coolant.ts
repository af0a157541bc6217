import { checkOneOf, checkPositive, checkRange } from "./check-range";
import { convert } from "./units";

export type Coolant = "water" | "glycol50";
const COOLANTS = ["water", "glycol50"] as const;

/** [IAPWS-IF97] table 34, coefficients n1 to n10 of region 4, exact as released; p in MPa, T in K. */
const N1 = 0.11670521452767e4;
const N2 = -0.72421316703206e6;
const N3 = -0.17073846940092e2;
const N4 = 0.1202082470247e5;
const N5 = -0.32325550322333e7;
const N6 = 0.1491510861353e2;
const N7 = -0.48232657361591e4;
const N8 = 0.40511340542057e6;
const N9 = -0.23855557567849;
const N10 = 0.65017534844798e3;

const LOWEST_PRESSURE_PA = 611.213;
const HIGHEST_PRESSURE_PA = 22.064e6;
const LOWEST_TEMPERATURE_K = 273.15;
const HIGHEST_TEMPERATURE_K = 647.096;
const SEA_LEVEL_PRESSURE_PA = 101_325;

/**
 * Temperature, in kelvins, at which water boils under a pressure.
 *
 *     β = p^0.25    E = β² + n₃β + n₆    F = n₁β² + n₄β + n₇    G = n₂β² + n₅β + n₈    D = 2G/(−F − √(F² − 4EG))
 *     T = (n₁₀ + D − √((n₁₀ + D)² − 4(n₉ + n₁₀D)))/2
 *
 * Source    [IAPWS-IF97] region 4, backward equation; it returns table 36.
 * Inputs    pressurePa absolute: station pressure plus the cap's, never the altimeter setting.
 * Domain    611.213 to 22,064,000 Pa.
 * Throws    RangeError outside the domain.
 * Accuracy  0.1 K of the steam tables, and far better below 200 °C.
 */
export function saturationTemperature(pressurePa: number): number {
  checkRange("pressurePa", pressurePa, LOWEST_PRESSURE_PA, HIGHEST_PRESSURE_PA);
  const beta = (pressurePa / 1e6) ** 0.25;
  const E = beta ** 2 + N3 * beta + N6;
  const F = N1 * beta ** 2 + N4 * beta + N7;
  const G = N2 * beta ** 2 + N5 * beta + N8;
  const D = (2 * G) / (-F - Math.sqrt(F ** 2 - 4 * E * G));
  return (N10 + D - Math.sqrt((N10 + D) ** 2 - 4 * (N9 + N10 * D))) / 2;
}

/**
 * Pressure, in pascals, under which water boils at a temperature.
 *
 *     ϑ = T + n₉/(T − n₁₀)    A = ϑ² + n₁ϑ + n₂    B = n₃ϑ² + n₄ϑ + n₅    C = n₆ϑ² + n₇ϑ + n₈    p = (2C/(−B + √(B² − 4AC)))⁴
 *
 * Source    [IAPWS-IF97] region 4, basic equation; it returns table 35.
 * Inputs    temperatureK.
 * Domain    273.15 to 647.096 K.
 * Throws    RangeError outside the domain.
 * Accuracy  0.1 % of the steam tables.
 */
export function saturationPressure(temperatureK: number): number {
  checkRange("temperatureK", temperatureK, LOWEST_TEMPERATURE_K, HIGHEST_TEMPERATURE_K);
  const theta = temperatureK + N9 / (temperatureK - N10);
  const A = theta ** 2 + N1 * theta + N2;
  const B = N3 * theta ** 2 + N4 * theta + N5;
  const C = N6 * theta ** 2 + N7 * theta + N8;
  return ((2 * C) / (-B + Math.sqrt(B ** 2 - 4 * A * C))) ** 4 * 1e6;
}

/** 50/50 ethylene glycol by volume boils at 107.2 °C under 1013.25 hPa: handbook value, measured, to about 1 K. */
const GLYCOL50_BOILING_K = convert(107.2, "degC", "K");
/** The mix boils under p like water under p · k: scaling the saturation pressure, a stated approximation. */
const GLYCOL50_PRESSURE_RATIO = saturationPressure(GLYCOL50_BOILING_K) / SEA_LEVEL_PRESSURE_PA;

/** Temperature, in kelvins, at which a coolant boils; water as saturationTemperature, the mix by the scaled pressure. */
export function boilingTemperature(pressurePa: number, fluid: Coolant): number {
  checkOneOf("fluid", fluid, COOLANTS);
  checkPositive("pressurePa", pressurePa);
  return saturationTemperature(fluid === "glycol50" ? pressurePa * GLYCOL50_PRESSURE_RATIO : pressurePa);
}

/**
 * Kelvins left before the coolant boils; negative is past boiling.
 *
 *     margin = T_boil(p_ambient + p_cap) − T
 *
 * Source    [IAPWS-IF97] region 4; the 50/50 mix by scaling the pressure, hand calculation from its boiling point.
 * Inputs    coolantK at the hottest place; capGaugePa above ambient, 0 for a cap that leaks; ambientPa static, at that height.
 * Domain    coolant 250 to 450 K, cap 0 to 500,000 Pa, ambient 5,000 to 130,000 Pa.
 * Throws    RangeError outside the domain or for an unknown fluid.
 * Accuracy  water 0.1 K; the mix about 1 K near its boiling point at sea level, 2 K elsewhere.
 */
export function boilingMargin(input: { coolantK: number; capGaugePa: number; ambientPa: number; fluid: Coolant }): number {
  checkRange("coolantK", input.coolantK, 250, 450);
  checkRange("capGaugePa", input.capGaugePa, 0, 500_000);
  checkRange("ambientPa", input.ambientPa, 5000, 130_000);
  return boilingTemperature(input.ambientPa + input.capGaugePa, input.fluid) - input.coolantK;
}

export type CoolantProperties = { densityKgM3: number; specificHeatJPerKgK: number };

/** Handbook values of the 50/50 mix near 85 °C, measured; a programme may give its own. */
const GLYCOL50: CoolantProperties = { densityKgM3: 1030, specificHeatJPerKgK: 3600 };

/** Water at 0.101325 MPa, [IAPWS-IF97] region 1: °C, kg/m³, J/(kg·K). */
const WATER_TABLE = [
  [20, 998.206, 4184.79],
  [40, 992.224, 4178.55],
  [60, 983.211, 4182.76],
  [80, 971.803, 4195.52],
  [90, 965.319, 4205.02],
  [95, 961.895, 4210.57],
  [100, 958.354, 4216.65],
] as const;

function waterAt(temperatureK: number): CoolantProperties {
  const celsius = convert(temperatureK, "K", "degC");
  checkRange("inletK in °C", celsius, 20, 100);
  const upper = WATER_TABLE.findIndex(([t]) => t >= celsius);
  const [t1, rho1, c1] = WATER_TABLE[upper] ?? WATER_TABLE[0];
  const [t0, rho0, c0] = WATER_TABLE[Math.max(upper - 1, 0)] ?? WATER_TABLE[0];
  const share = t1 === t0 ? 0 : (celsius - t0) / (t1 - t0);
  return { densityKgM3: rho0 + share * (rho1 - rho0), specificHeatJPerKgK: c0 + share * (c1 - c0) };
}

/**
 * Heat carried by the coolant between two places, in watts; positive whichever of the two is the hotter.
 *
 *     Q = V̇ · ρ · c · |T_in − T_out|
 *
 * Source    energy balance; water from [IAPWS-IF97] at the inlet, where the flow is metered; the mix from handbook values near 85 °C.
 * Inputs    flowM3s volume flow at the inlet; kelvins; properties in place of the handbook's where the programme has its own.
 * Domain    flow ≥ 0; water 20 to 100 °C; the mix 0 to 130 °C.
 * Throws    RangeError outside the domain or for an unknown fluid.
 * Accuracy  water 0.3 %, the mix 3 % away from 85 °C; the flow meter and a small difference of two gauges weigh more.
 */
export function heatRejected(input: {
  flowM3s: number;
  inletK: number;
  outletK: number;
  fluid: Coolant;
  properties?: CoolantProperties;
}): number {
  checkOneOf("fluid", input.fluid, COOLANTS);
  checkRange("flowM3s", input.flowM3s, 0, 1);
  checkRange("inletK", input.inletK, 273.15, 403.15);
  checkRange("outletK", input.outletK, 273.15, 403.15);
  const { densityKgM3, specificHeatJPerKgK } = input.properties ?? (input.fluid === "water" ? waterAt(input.inletK) : GLYCOL50);
  checkPositive("properties.densityKgM3", densityKgM3);
  checkPositive("properties.specificHeatJPerKgK", specificHeatJPerKgK);
  return input.flowM3s * densityKgM3 * specificHeatJPerKgK * Math.abs(input.inletK - input.outletK);
}
