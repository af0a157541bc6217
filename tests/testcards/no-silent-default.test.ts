import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { calibratedAirspeed, equivalentAirspeed, trueAirspeed, windComponents, windFromLegs } from "@/lib/testcards/airspeed";
import { fitApproach } from "@/lib/testcards/approach";
import { densityAltitude, hotDayAmbient, pressureAltitude, pressureAltitudeFromQnh, standardAtmosphere } from "@/lib/testcards/atmosphere";
import { decideStep, predictNext } from "@/lib/testcards/buildup";
import {
  type Calibration,
  combinedUncertainty,
  correctReading,
  fitCalibration,
  gaugeAbort,
  gaugeRateAbort,
  rateUncertainty,
  readingFor,
} from "@/lib/testcards/calibration";
import { leakage, spread } from "@/lib/testcards/compression";
import { boilingMargin, heatRejected, saturationPressure, saturationTemperature } from "@/lib/testcards/coolant";
import { heatSoak, hotDayTemperature, peak, rate, steadySince, steadyState, windowToResolve } from "@/lib/testcards/cooling";
import { fuelFlowFactor, fuelPlan } from "@/lib/testcards/fuel";
import { insideEnvelope, loadingOf } from "@/lib/testcards/loading";
import {
  climbRateToStandard,
  intercoolerEffectiveness,
  stallSpeedToMass,
  vibrationOrder,
  vibrationVelocity,
} from "@/lib/testcards/performance";
import { convert, convertDifference, UNITS } from "@/lib/testcards/units";
import { abortDiscipline, groupSpread, judge, largestFall, peakToPeak, timeBeyond } from "@/lib/testcards/verdict";

/** Every number anywhere inside a result. */
function numbersIn(result: unknown): number[] {
  if (typeof result === "number") return [result];
  return result !== null && typeof result === "object" ? Object.values(result).flatMap(numbersIn) : [];
}

type Draw = { n: () => number; list: <T>(item: () => T) => T[] };
const side = (d: Draw) => (d.n() > 0 ? ("max" as const) : ("min" as const));
const series = (d: Draw) => {
  let timeS = 0;
  return d.list(() => {
    timeS += Math.abs(d.n());
    return { timeS, value: d.n() };
  });
};
const calibration = (d: Draw): Calibration =>
  d.n() > 0
    ? { kind: "linear", gain: d.n(), offset: d.n(), low: d.n(), high: d.n(), expandedUncertainty: d.n() }
    : { kind: "points", points: d.list(() => ({ read: d.n(), actual: d.n() })), low: d.n(), high: d.n(), expandedUncertainty: null };

const calls: Record<string, (d: Draw) => unknown> = {
  convert: (d) => UNITS.slice(0, 4).map((unit) => convert(d.n(), unit, "degC")),
  convertDifference: (d) => convertDifference(d.n(), "degF", "K"),
  standardAtmosphere: (d) => standardAtmosphere(d.n()),
  pressureAltitude: (d) => pressureAltitude(d.n()),
  pressureAltitudeFromQnh: (d) => pressureAltitudeFromQnh({ elevationM: d.n(), qnhPa: d.n() }),
  densityAltitude: (d) => densityAltitude({ pressurePa: d.n(), temperatureK: d.n() }),
  hotDayAmbient: (d) => hotDayAmbient(d.n(), "us"),
  trueAirspeed: (d) => trueAirspeed({ casMps: d.n(), pressurePa: d.n(), temperatureK: d.n() }),
  calibratedAirspeed: (d) => calibratedAirspeed({ tasMps: d.n(), pressurePa: d.n(), temperatureK: d.n() }),
  equivalentAirspeed: (d) => equivalentAirspeed({ casMps: d.n(), pressurePa: d.n() }),
  windFromLegs: (d) => windFromLegs(d.list(() => ({ groundSpeedMps: d.n(), trackDeg: d.n() }))),
  windComponents: (d) => windComponents({ windMps: d.n(), windFromDeg: d.n(), runwayDeg: d.n() }),
  correctReading: (d) => correctReading(d.n(), calibration(d)),
  readingFor: (d) => readingFor(d.n(), calibration(d)),
  gaugeAbort: (d) =>
    gaugeAbort({
      cardLimit: d.n(),
      side: side(d),
      expandedUncertainty: d.n(),
      ratePerMin: d.n(),
      reactionMin: d.n(),
      calibration: calibration(d),
      readable: d.n(),
    }),
  gaugeRateAbort: (d) =>
    gaugeRateAbort({
      cardRatePerMin: d.n(),
      expandedUncertaintyPerMin: d.n(),
      readable: d.n(),
      windowMin: d.n(),
      atReading: d.n(),
      calibration: calibration(d),
    }),
  rateUncertainty: (d) => rateUncertainty({ readable: d.n(), windowMin: d.n() }),
  combinedUncertainty: (d) =>
    combinedUncertainty({ reference: d.n(), resolution: d.n(), reading: d.n(), drift: d.n(), installation: d.n() }),
  fitCalibration: (d) => fitCalibration(d.list(() => ({ read: d.n(), actual: d.n() }))),
  judge: (d) =>
    judge({ value: d.n(), expandedUncertainty: d.n() }, { side: side(d), limit: d.n() }, { normal: { low: d.n(), high: d.n() } }),
  timeBeyond: (d) => timeBeyond(series(d), { side: side(d), limit: d.n() }),
  groupSpread: (d) => groupSpread(d.list(() => ({ id: "1", value: d.n() }))),
  peakToPeak: (d) => peakToPeak(series(d), { windowS: d.n() }),
  largestFall: (d) => largestFall(series(d), { windowS: d.n() }),
  abortDiscipline: (d) => abortDiscipline({ worstOnGauge: d.n(), threshold: d.n(), side: side(d), calledForThis: d.n() > 0 }),
  hotDayTemperature: (d) =>
    hotDayTemperature({
      measuredK: d.n(),
      ambientK: d.n(),
      pressureAltitudeM: d.n(),
      rule: "ratio",
      basis: "metric",
      expandedUncertaintyK: d.n(),
      ambientUncertaintyK: d.n(),
    }),
  rate: (d) => rate(series(d), { windowS: d.n() }),
  steadySince: (d) => steadySince(series(d), { perMinute: d.n(), windowS: d.n(), readingUncertainty: d.n() }),
  windowToResolve: (d) => windowToResolve({ readableTrue: d.n(), perMinute: d.n() }),
  peak: (d) => peak(series(d)),
  heatSoak: (d) => heatSoak(series(d), { ambientK: d.n() }),
  fitApproach: (d) => fitApproach(series(d), d.n() > 0 ? { initial: d.n() } : {}),
  steadyState: (d) => steadyState(d.n(), d.n(), d.n(), d.n()),
  saturationTemperature: (d) => saturationTemperature(d.n()),
  saturationPressure: (d) => saturationPressure(d.n()),
  heatRejected: (d) => heatRejected({ flowM3s: d.n(), inletK: d.n(), outletK: d.n(), fluid: "water" }),
  boilingMargin: (d) => boilingMargin({ coolantK: d.n(), capGaugePa: d.n(), ambientPa: d.n(), fluid: "glycol50" }),
  leakage: (d) => leakage({ referencePa: d.n(), heldPa: d.n() }),
  spread: (d) => spread(d.list(() => d.n())),
  loadingOf: (d) => loadingOf(d.list(() => ({ massKg: d.n(), armM: d.n() }))),
  insideEnvelope: (d) =>
    insideEnvelope(
      { massKg: d.n(), cgM: d.n() },
      d.list(() => ({ massKg: d.n(), cgM: d.n() })),
    ),
  fuelPlan: (d) => fuelPlan({ taxi: d.n(), points: d.n(), transit: d.n(), reserve: d.n(), unusable: d.n(), onBoard: d.n() }),
  fuelFlowFactor: (d) => fuelFlowFactor({ metered: d.n(), filled: d.n(), factor: d.n() }),
  climbRateToStandard: (d) =>
    climbRateToStandard({ pressureRateMps: d.n(), temperatureK: d.n(), pressurePa: d.n(), massKg: d.n(), standardMassKg: d.n() }),
  stallSpeedToMass: (d) => stallSpeedToMass({ speedMps: d.n(), massKg: d.n(), standardMassKg: d.n() }),
  vibrationOrder: (d) => vibrationOrder({ rpm: d.n(), order: d.n() }),
  vibrationVelocity: (d) => vibrationVelocity({ accelerationMps2: d.n(), frequencyHz: d.n() }),
  intercoolerEffectiveness: (d) => intercoolerEffectiveness({ compressorOutK: d.n(), intercoolerOutK: d.n(), ambientK: d.n() }),
  predictNext: (d) =>
    predictNext(
      d.list(() => ({ level: d.n(), value: d.n() })),
      d.n(),
      { confidence: 0.95, expandedUncertainty: d.n() },
    ),
  decideStep: (d) =>
    decideStep({
      results: d.list(() => ({ level: d.n(), value: d.n() })),
      nextLevel: d.n(),
      threshold: d.n(),
      side: side(d),
      expandedUncertainty: d.n(),
      lastInBand: true,
    }),
};

/** Ordinary figures of the trade, awkward ones, and the impossible. */
const figure = fc.oneof(
  fc.constantFrom(0, -0, 1, -1, 1e-300, 1e308, -1e308, Number.NaN, Number.POSITIVE_INFINITY, Number.NEGATIVE_INFINITY),
  fc.double({ min: -500, max: 500, noNaN: true }),
  fc.integer({ min: 0, max: 120_000 }),
  fc.double(),
);

describe("whatever it is given", () => {
  test.each(Object.entries(calls))("%s answers finite numbers or refuses with a RangeError", (_, call) => {
    fc.assert(
      fc.property(fc.array(figure, { minLength: 12, maxLength: 12 }), fc.integer({ min: 0, max: 7 }), (figures, length) => {
        let next = 0;
        const n = () => figures[next++ % figures.length] ?? 0;
        const draw: Draw = { n, list: (item) => Array.from({ length }, item) };
        try {
          for (const value of numbersIn(call(draw))) expect(Number.isFinite(value)).toBe(true);
        } catch (error) {
          if (!(error instanceof RangeError)) throw error;
        }
      }),
      { numRuns: 400 },
    );
  });
});
