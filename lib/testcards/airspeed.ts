import { SEA_LEVEL_PRESSURE_PA, SEA_LEVEL_TEMPERATURE_K, speedOfSound } from "./atmosphere";
import { checkCount, checkFinite, checkPositive, checkRange } from "./check-range";

const SEA_LEVEL_SOUND_MPS = speedOfSound(SEA_LEVEL_TEMPERATURE_K);
const RAD_PER_DEG = Math.PI / 180;
/** Twice the area of the triangle of three ground-speed tips over the square of the speed: below this they lie on one line. */
const LEAST_TURN = 1e-6;

type Air = { pressurePa: number; temperatureK: number };

function checkAir(pressurePa: number, temperatureK: number): void {
  checkRange("pressurePa", pressurePa, 5000, 130_000);
  checkRange("temperatureK", temperatureK, 180, 340);
}

/** Impact pressure over static pressure at a Mach number, and back: isentropic flow, γ = 1.4. */
const impactRatio = (mach: number): number => Math.expm1(3.5 * Math.log1p(0.2 * mach * mach));
const machOf = (ratio: number): number => Math.sqrt(5 * Math.expm1((2 / 7) * Math.log1p(ratio)));

function machFromCalibrated(casMps: number, pressurePa: number): number {
  checkRange("casMps", casMps, 0, SEA_LEVEL_SOUND_MPS);
  const mach = machOf((SEA_LEVEL_PRESSURE_PA * impactRatio(casMps / SEA_LEVEL_SOUND_MPS)) / pressurePa);
  return checkRange("Mach number", mach, 0, 1);
}

/**
 * True airspeed from calibrated airspeed, compressible and subsonic.
 *
 *     qc = p₀[(1 + 0.2 (V_c/a₀)²)^3.5 − 1]    M = √(5[(qc/p + 1)^(2/7) − 1])    TAS = M · a(T)
 *
 * Source    isentropic pitot equation, γ = 1.4; [ICAO-7488] for p₀ and a₀.
 * Inputs    casMps calibrated: instrument and position corrections are already in; pressurePa static, temperatureK actual.
 * Domain    0 ≤ CAS ≤ a₀, Mach ≤ 1, 5,000 to 130,000 Pa, 180 to 340 K.
 * Throws    RangeError outside the domain.
 * Accuracy  exact for dry air; CAS/√σ reads up to 0.2 % high at 100 kt and 10,000 ft.
 */
export function trueAirspeed({ casMps, pressurePa, temperatureK }: Air & { casMps: number }): number {
  checkAir(pressurePa, temperatureK);
  return machFromCalibrated(casMps, pressurePa) * speedOfSound(temperatureK);
}

/**
 * Calibrated airspeed from true airspeed: the inverse of trueAirspeed.
 *
 *     M = TAS/a    qc = p[(1 + 0.2 M²)^3.5 − 1]    V_c = a₀ √(5[(qc/p₀ + 1)^(2/7) − 1])
 *
 * Source    isentropic pitot equation, γ = 1.4; [ICAO-7488].
 * Inputs    tasMps, pressurePa static, temperatureK actual.
 * Domain    Mach 0 to 1, 5,000 to 130,000 Pa, 180 to 340 K.
 * Throws    RangeError outside the domain.
 * Accuracy  exact for dry air.
 */
export function calibratedAirspeed({ tasMps, pressurePa, temperatureK }: Air & { tasMps: number }): number {
  checkAir(pressurePa, temperatureK);
  checkRange("tasMps", tasMps, 0, speedOfSound(temperatureK));
  const ratio = (pressurePa / SEA_LEVEL_PRESSURE_PA) * impactRatio(tasMps / speedOfSound(temperatureK));
  return SEA_LEVEL_SOUND_MPS * machOf(ratio);
}

/**
 * Equivalent airspeed from calibrated airspeed.
 *
 *     EAS = a₀ · M · √δ
 *
 * Source    isentropic pitot equation, γ = 1.4; [ICAO-7488].
 * Inputs    casMps, pressurePa static. Temperature plays no part.
 * Domain    0 ≤ CAS ≤ a₀, Mach ≤ 1, 5,000 to 130,000 Pa.
 * Throws    RangeError outside the domain.
 * Accuracy  exact for dry air.
 */
export function equivalentAirspeed({ casMps, pressurePa }: { casMps: number; pressurePa: number }): number {
  checkAir(pressurePa, SEA_LEVEL_TEMPERATURE_K);
  return SEA_LEVEL_SOUND_MPS * machFromCalibrated(casMps, pressurePa) * Math.sqrt(pressurePa / SEA_LEVEL_PRESSURE_PA);
}

export type Leg = { groundSpeedMps: number; trackDeg: number };
export type WindAndSpeed = { tasMps: number; sdMps: number | null; windMps: number; windFromDeg: number };
type Vector = { north: number; east: number };

/**
 * True airspeed and wind from ground-speed legs flown at one indicated airspeed and height on different tracks.
 *
 *     the tips of the ground-speed vectors lie on a circle: its centre is the wind, its radius the true airspeed
 *
 * Source    [GRAY-1998] three legs; [NTPS-GPS] four legs: mean and sample standard deviation of the radius over every triple.
 * Inputs    ground speed and true track over the ground of 3 or more legs; tracks in degrees from one north.
 * Domain    at least 3 legs, speeds above zero, tips not on one line.
 * Throws    RangeError outside the domain.
 * Accuracy  three legs are exact and show no spread (sdMps null). A sample sd above 1 kt: reject, common practice. windFromDeg 0 to below 360.
 */
export function windFromLegs(legs: readonly Leg[]): WindAndSpeed {
  checkCount("legs", legs, 3);
  const tips = legs.map(({ groundSpeedMps, trackDeg }): Vector => {
    checkPositive("legs.groundSpeedMps", groundSpeedMps);
    checkFinite("legs.trackDeg", trackDeg);
    const track = trackDeg * RAD_PER_DEG;
    return { north: groundSpeedMps * Math.cos(track), east: groundSpeedMps * Math.sin(track) };
  });
  const circles = triples(tips).map(([a, b, c]) => circleThrough(a, b, c));
  const mean = (pick: (circle: Vector & { radius: number }) => number) => circles.reduce((sum, c) => sum + pick(c), 0) / circles.length;
  const tasMps = mean((c) => c.radius);
  const north = mean((c) => c.north);
  const east = mean((c) => c.east);
  const sdMps = circles.length < 2 ? null : Math.sqrt(circles.reduce((sum, c) => sum + (c.radius - tasMps) ** 2, 0) / (circles.length - 1));
  const towardsDeg = Math.atan2(east, north) / RAD_PER_DEG;
  return { tasMps, sdMps, windMps: Math.hypot(north, east), windFromDeg: (towardsDeg + 540) % 360 };
}

function triples(tips: readonly Vector[]): [Vector, Vector, Vector][] {
  return tips.flatMap((a, i) => tips.slice(i + 1).flatMap((b, j) => tips.slice(i + j + 2).map((c): [Vector, Vector, Vector] => [a, b, c])));
}

function circleThrough(a: Vector, b: Vector, c: Vector): Vector & { radius: number } {
  const bn = b.north - a.north;
  const be = b.east - a.east;
  const cn = c.north - a.north;
  const ce = c.east - a.east;
  const cross = 2 * (bn * ce - be * cn);
  const size = a.north ** 2 + a.east ** 2;
  if (Math.abs(cross) < LEAST_TURN * size)
    throw new RangeError("legs.trackDeg: three of the legs are too alike; tracks must differ, best by 90° or 120°.");
  const b2 = bn ** 2 + be ** 2;
  const c2 = cn ** 2 + ce ** 2;
  const north = (ce * b2 - be * c2) / cross;
  const east = (bn * c2 - cn * b2) / cross;
  return { north: a.north + north, east: a.east + east, radius: Math.hypot(north, east) };
}

/**
 * Wind along and across a runway.
 *
 *     head = V cos(from − runway)    cross = V sin(from − runway)
 *
 * Source    [PHAK] ch. 10, crosswind component chart; the chart's trigonometry.
 * Inputs    windFromDeg and runwayDeg from the same north: magnetic or true, not one of each.
 * Domain    wind ≥ 0, angles finite.
 * Throws    RangeError outside the domain.
 * Accuracy  exact. headMps < 0 is a tail wind, crossMps > 0 comes from the right.
 */
export function windComponents(input: { windMps: number; windFromDeg: number; runwayDeg: number }): { headMps: number; crossMps: number } {
  checkRange("windMps", input.windMps, 0, Number.POSITIVE_INFINITY);
  const angle = (checkFinite("windFromDeg", input.windFromDeg) - checkFinite("runwayDeg", input.runwayDeg)) * RAD_PER_DEG;
  return { headMps: input.windMps * Math.cos(angle), crossMps: input.windMps * Math.sin(angle) };
}
