import { checkOneOf, checkPositive, checkRange } from "./check-range";
import { convert, convertDifference } from "./units";
import { HOT_DAY_BASES, type HotDayBasis } from "./words";

export type { HotDayBasis };

/** Constants of the standard atmosphere, exact by definition [ICAO-7488] [USSA-76]. */
export const SEA_LEVEL_TEMPERATURE_K = 288.15;
export const SEA_LEVEL_PRESSURE_PA = 101_325;
export const SEA_LEVEL_DENSITY_KG_M3 = 1.225;
export const GRAVITY_MPS2 = 9.80665;
export const GAS_CONSTANT_J_PER_KG_K = 287.05287;
export const HEAT_CAPACITY_RATIO = 1.4;
const LAPSE_K_PER_M = 0.0065;
const TROPOPAUSE_M = 11_000;
const TROPOPAUSE_K = SEA_LEVEL_TEMPERATURE_K - LAPSE_K_PER_M * TROPOPAUSE_M;
const PRESSURE_EXPONENT = GRAVITY_MPS2 / (GAS_CONSTANT_J_PER_KG_K * LAPSE_K_PER_M);
const TROPOPAUSE_DELTA = (TROPOPAUSE_K / SEA_LEVEL_TEMPERATURE_K) ** PRESSURE_EXPONENT;
const TROPOPAUSE_SIGMA = (TROPOPAUSE_DELTA * SEA_LEVEL_TEMPERATURE_K) / TROPOPAUSE_K;
const SCALE_HEIGHT_M = (GAS_CONSTANT_J_PER_KG_K * TROPOPAUSE_K) / GRAVITY_MPS2;

export const LOWEST_ALTITUDE_M = -2000;
export const HIGHEST_ALTITUDE_M = 20_000;

const deltaAt = (altitudeM: number): number =>
  altitudeM <= TROPOPAUSE_M
    ? (1 - (LAPSE_K_PER_M * altitudeM) / SEA_LEVEL_TEMPERATURE_K) ** PRESSURE_EXPONENT
    : TROPOPAUSE_DELTA * Math.exp(-(altitudeM - TROPOPAUSE_M) / SCALE_HEIGHT_M);

export type Atmosphere = {
  temperatureK: number;
  pressurePa: number;
  densityKgM3: number;
  soundMps: number;
  theta: number;
  delta: number;
  sigma: number;
};

/** Speed of sound in dry air, a = √(γ R T), m/s. */
export function speedOfSound(temperatureK: number): number {
  return Math.sqrt(HEAT_CAPACITY_RATIO * GAS_CONSTANT_J_PER_KG_K * checkPositive("temperatureK", temperatureK));
}

/**
 * Standard atmosphere at a geopotential altitude.
 *
 *     T = 288.15 − 0.0065 H    δ = (T/288.15)^(g/RL)    above 11 km: T = 216.65, δ falls as exp(−g(H − 11 000)/RT)    σ = δ/θ
 *
 * Source    [ICAO-7488] and [USSA-76], layers 0 to 20 km.
 * Inputs    altitudeM, geopotential (pressure) altitude in metres.
 * Domain    −2,000 to 20,000 m.
 * Throws    RangeError outside the domain.
 * Accuracy  the definition itself; density from p/RT, so 1.2250000 within 1e-7.
 */
export function standardAtmosphere(altitudeM: number): Atmosphere {
  checkRange("altitudeM", altitudeM, LOWEST_ALTITUDE_M, HIGHEST_ALTITUDE_M);
  const temperatureK = Math.max(SEA_LEVEL_TEMPERATURE_K - LAPSE_K_PER_M * altitudeM, TROPOPAUSE_K);
  const theta = temperatureK / SEA_LEVEL_TEMPERATURE_K;
  const delta = deltaAt(altitudeM);
  const pressurePa = SEA_LEVEL_PRESSURE_PA * delta;
  const densityKgM3 = pressurePa / (GAS_CONSTANT_J_PER_KG_K * temperatureK);
  return { temperatureK, pressurePa, densityKgM3, soundMps: speedOfSound(temperatureK), theta, delta, sigma: delta / theta };
}

/**
 * Pressure altitude: where the standard atmosphere has this pressure.
 *
 *     H = (288.15/0.0065) · (1 − δ^0.190263)    above 11 km: H = 11 000 − (RT/g) ln(δ/δ₁₁)
 *
 * Source    [ICAO-7488], inverted.
 * Inputs    pressurePa, static.
 * Domain    pressures of −2,000 to 20,000 m: about 127,800 to 5,475 Pa.
 * Throws    RangeError outside the domain.
 * Accuracy  exact inverse.
 */
export function pressureAltitude(pressurePa: number): number {
  const highest = SEA_LEVEL_PRESSURE_PA * deltaAt(LOWEST_ALTITUDE_M);
  const lowest = SEA_LEVEL_PRESSURE_PA * deltaAt(HIGHEST_ALTITUDE_M);
  checkRange("pressurePa", pressurePa, lowest * (1 - 1e-12), highest * (1 + 1e-12));
  const delta = pressurePa / SEA_LEVEL_PRESSURE_PA;
  if (delta < TROPOPAUSE_DELTA) return TROPOPAUSE_M - SCALE_HEIGHT_M * Math.log(delta / TROPOPAUSE_DELTA);
  return (SEA_LEVEL_TEMPERATURE_K / LAPSE_K_PER_M) * (1 - delta ** (1 / PRESSURE_EXPONENT));
}

/**
 * Pressure altitude of a field from its elevation and the altimeter setting.
 *
 *     H = elevation + H(QNH)
 *
 * Source    [PHAK] ch. 10, field elevation corrected for the altimeter setting; the correction is [ICAO-7488], not 1,000 ft per inHg.
 * Inputs    elevationM in metres, qnhPa the setting at which the altimeter reads the elevation.
 * Domain    QNH 85,000 to 110,000 Pa; the answer from −2,000 to 20,000 m.
 * Throws    RangeError outside the domain.
 * Accuracy  exact for an altimeter built to the standard atmosphere.
 */
export function pressureAltitudeFromQnh({ elevationM, qnhPa }: { elevationM: number; qnhPa: number }): number {
  checkRange("elevationM", elevationM, LOWEST_ALTITUDE_M, HIGHEST_ALTITUDE_M);
  checkRange("qnhPa", qnhPa, 85_000, 110_000);
  return checkRange("elevationM corrected for qnhPa", elevationM + pressureAltitude(qnhPa), LOWEST_ALTITUDE_M, HIGHEST_ALTITUDE_M);
}

/**
 * Density altitude of dry air: where the standard atmosphere has this density.
 *
 *     σ = (p/p₀)/(T/T₀)    H = (288.15/0.0065) · (1 − σ^0.234969)
 *
 * Source    [ICAO-7488], inverted for density.
 * Inputs    pressurePa static, temperatureK actual.
 * Domain    180 to 340 K; densities of −2,000 to 20,000 m.
 * Throws    RangeError outside the domain.
 * Accuracy  humidity left out: moist air is up to some hundred feet worse.
 */
export function densityAltitude({ pressurePa, temperatureK }: { pressurePa: number; temperatureK: number }): number {
  checkPositive("pressurePa", pressurePa);
  checkRange("temperatureK", temperatureK, 180, 340);
  const sigma = ((pressurePa / SEA_LEVEL_PRESSURE_PA) * SEA_LEVEL_TEMPERATURE_K) / temperatureK;
  const altitudeM =
    sigma < TROPOPAUSE_SIGMA
      ? TROPOPAUSE_M - SCALE_HEIGHT_M * Math.log(sigma / TROPOPAUSE_SIGMA)
      : (SEA_LEVEL_TEMPERATURE_K / LAPSE_K_PER_M) * (1 - sigma ** (1 / (PRESSURE_EXPONENT - 1)));
  return checkRange("density altitude in metres", altitudeM, LOWEST_ALTITUDE_M, HIGHEST_ALTITUDE_M);
}

/** The hot day of each basis: [CFR-23.1043] (b), and the metric rule of [CS-27.1043] with 38.0 °C (team's own choice of rounding). */
const HOT_DAYS = {
  us: { seaLevelK: convert(100, "degF", "K"), fallKPerThousandFt: convertDifference(3.6, "degF", "K") },
  metric: { seaLevelK: convert(38, "degC", "K"), fallKPerThousandFt: 1.98 },
} as const;
/** −69.7 °F and −56.5 °C are the same temperature. */
const COLDEST_HOT_DAY_K = convert(-56.5, "degC", "K");

/**
 * Ambient temperature of the hot day at a pressure altitude.
 *
 *     us: 100 °F − 3.6 °F per 1,000 ft    metric: 38.0 °C − 1.98 °C per 1,000 ft    neither below −56.5 °C
 *
 * Source    [CFR-23.1043] (b); [CS-27.1043] (b) for the metric lapse. It is not "standard plus 41 °F": the lapse differs.
 * Inputs    pressureAltitudeM in metres; basis, one per programme.
 * Domain    −2,000 to 20,000 m; below sea level the line goes on, hotter.
 * Throws    RangeError outside the domain or for an unknown basis.
 * Accuracy  the rule itself.
 */
export function hotDayAmbient(pressureAltitudeM: number, basis: HotDayBasis): number {
  checkRange("pressureAltitudeM", pressureAltitudeM, LOWEST_ALTITUDE_M, HIGHEST_ALTITUDE_M);
  checkOneOf("basis", basis, HOT_DAY_BASES);
  const { seaLevelK, fallKPerThousandFt } = HOT_DAYS[basis];
  const thousandFt = convert(pressureAltitudeM, "m", "ft") / 1000;
  return Math.max(seaLevelK - fallKPerThousandFt * thousandFt, COLDEST_HOT_DAY_K);
}
