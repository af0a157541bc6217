import { pressureAltitude, standardAtmosphere } from "./atmosphere";
import { checkFinite, checkPositive, checkRange } from "./check-range";

/**
 * Measured climb rate carried to standard mass.
 *
 *     geometric = pressure rate · T/T_std    at standard mass = geometric · m/m_std
 *
 * Source    [AC-23-8] climb reduction: tapeline correction and constant excess power. The small induced-drag term is left out.
 * Inputs    pressureRateMps from the altimeter; temperatureK actual and pressurePa at mid band.
 * Domain    rate −50 to 50 m/s, 180 to 340 K, masses above zero.
 * Throws    RangeError outside the domain.
 * Accuracy  for mass within some 10 % of standard; mean of reciprocal headings takes out wind gradient.
 */
export function climbRateToStandard(input: {
  pressureRateMps: number;
  temperatureK: number;
  pressurePa: number;
  massKg: number;
  standardMassKg: number;
}): number {
  checkRange("pressureRateMps", input.pressureRateMps, -50, 50);
  checkRange("temperatureK", input.temperatureK, 180, 340);
  checkPositive("massKg", input.massKg);
  checkPositive("standardMassKg", input.standardMassKg);
  const standardK = standardAtmosphere(pressureAltitude(input.pressurePa)).temperatureK;
  return (input.pressureRateMps * (input.temperatureK / standardK) * input.massKg) / input.standardMassKg;
}

/**
 * Stall speed carried to standard mass.
 *
 *     V_std = V · √(m_std/m)
 *
 * Source    [PHAK] ch. 4, stall speed and load: lift coefficient at the stall unchanged.
 * Inputs    speedMps calibrated; masses in kg.
 * Domain    all above zero.
 * Throws    RangeError outside the domain.
 * Accuracy  power and CG effects left out.
 */
export function stallSpeedToMass({
  speedMps,
  massKg,
  standardMassKg,
}: {
  speedMps: number;
  massKg: number;
  standardMassKg: number;
}): number {
  checkPositive("speedMps", speedMps);
  checkPositive("massKg", massKg);
  checkPositive("standardMassKg", standardMassKg);
  return speedMps * Math.sqrt(standardMassKg / massKg);
}

/**
 * Frequency, in hertz, of an order of rotation.
 *
 *     f = order · rpm/60
 *
 * Source    hand calculation. A four-stroke four fires on order 2.
 * Inputs    rpm of the shaft, order 1 = once a turn; half orders are real on a four-stroke.
 * Domain    both above zero.
 * Throws    RangeError outside the domain.
 * Accuracy  exact.
 */
export function vibrationOrder({ rpm, order }: { rpm: number; order: number }): number {
  return (checkPositive("rpm", rpm) / 60) * checkPositive("order", order);
}

/**
 * Velocity, in m/s, of a sinusoidal vibration from its acceleration.
 *
 *     v = a/(2π f)
 *
 * Source    hand calculation. Both peak, or both r.m.s.
 * Inputs    accelerationMps2, frequencyHz.
 * Domain    acceleration ≥ 0, frequency above zero.
 * Throws    RangeError outside the domain.
 * Accuracy  one frequency at a time.
 */
export function vibrationVelocity({ accelerationMps2, frequencyHz }: { accelerationMps2: number; frequencyHz: number }): number {
  checkRange("accelerationMps2", accelerationMps2, 0, Number.POSITIVE_INFINITY);
  return accelerationMps2 / (2 * Math.PI * checkPositive("frequencyHz", frequencyHz));
}

/**
 * Intercooler effectiveness: share of the possible cooling that it does.
 *
 *     ε = (T_compressor − T_intercooler)/(T_compressor − T_ambient)
 *
 * Source    hand calculation from the definition of a heat exchanger's effectiveness.
 * Inputs    kelvins; air out of the compressor, out of the intercooler, and ambient.
 * Domain    ambient ≤ intercooler out ≤ compressor out, compressor out above ambient.
 * Throws    RangeError outside the domain: check the probes.
 * Accuracy  that of the three temperatures.
 */
export function intercoolerEffectiveness(input: { compressorOutK: number; intercoolerOutK: number; ambientK: number }): number {
  const { compressorOutK, intercoolerOutK, ambientK } = input;
  checkPositive("ambientK", ambientK);
  checkFinite("compressorOutK", compressorOutK);
  if (compressorOutK <= ambientK) throw new RangeError(`compressorOutK is ${compressorOutK}; it must be above ambientK, ${ambientK}.`);
  checkRange("intercoolerOutK", intercoolerOutK, ambientK, compressorOutK);
  return (compressorOutK - intercoolerOutK) / (compressorOutK - ambientK);
}
