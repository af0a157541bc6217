import { describe, expect, test } from "vitest";
import { standardAtmosphere } from "@/lib/testcards/atmosphere";
import {
  climbRateToStandard,
  intercoolerEffectiveness,
  stallSpeedToMass,
  vibrationOrder,
  vibrationVelocity,
} from "@/lib/testcards/performance";
import { convert } from "@/lib/testcards/units";

const fpm = (value: number) => convert(value, "ft/min", "m/s");
const inFpm = (value: number) => convert(value, "m/s", "ft/min");
const kelvin = (value: number) => convert(value, "degC", "K");
const pressureAt = (altitudeFt: number) => standardAtmosphere(convert(altitudeFt, "ft", "m")).pressurePa;

describe("climbRateToStandard", () => {
  // Tapeline correction: 600 ft/min at 5,000 ft and 20 °C is 600 · 293.15/278.244 = 632.14 ft/min.
  test("takes the altimeter's feet for what they are on a warm day", () => {
    const climb = { pressureRateMps: fpm(600), temperatureK: kelvin(20), pressurePa: pressureAt(5000), massKg: 600, standardMassKg: 600 };
    expect(inFpm(climbRateToStandard(climb))).toBeCloseTo(632.14, 1);
  });

  // 1,000 ft in 62 and 64 s, mid 2,500 ft (10.05 °C standard), 16 °C, 560 kg: 967.7 -> 988.1 -> 922; 937.5 -> 957.2 -> 893; mean 908.
  test("gives the mean of two headings at standard mass", () => {
    const at = (seconds: number) =>
      inFpm(
        climbRateToStandard({
          pressureRateMps: convert(1000, "ft", "m") / seconds,
          temperatureK: kelvin(16),
          pressurePa: pressureAt(2500),
          massKg: 560,
          standardMassKg: 600,
        }),
      );
    expect(Math.round(at(62))).toBe(922);
    expect(Math.round(at(64))).toBe(893);
    expect(Math.round((at(62) + at(64)) / 2)).toBe(908);
  });

  test("refuses feet a minute given for metres a second", () => {
    const climb = { pressureRateMps: 900, temperatureK: 289, pressurePa: 92_000, massKg: 560, standardMassKg: 600 };
    expect(() => climbRateToStandard(climb)).toThrow(/pressureRateMps is 900/);
    expect(() => climbRateToStandard({ ...climb, pressureRateMps: 4, temperatureK: 16 })).toThrow(/temperatureK is 16/);
    expect(() => climbRateToStandard({ ...climb, pressureRateMps: 4, massKg: 0 })).toThrow(/massKg is 0/);
  });
});

describe("stallSpeedToMass", () => {
  // 43.0 · √(600/560) = 44.5; 50 · √(2000/2300) = 46.63.
  test.each([
    [43.0, 560, 600, 44.5, 1],
    [50, 2300, 2000, 46.63, 2],
  ])("carries %d at %d to %d", (speed, mass, standard, expected, digits) => {
    expect(stallSpeedToMass({ speedMps: speed, massKg: mass, standardMassKg: standard })).toBeCloseTo(expected, digits);
  });

  test("doubles for four times the mass, and refuses no mass", () => {
    expect(stallSpeedToMass({ speedMps: 20, massKg: 500, standardMassKg: 2000 })).toBeCloseTo(40, 12);
    expect(() => stallSpeedToMass({ speedMps: 20, massKg: 0, standardMassKg: 600 })).toThrow(/massKg is 0/);
  });
});

describe("vibration", () => {
  // 2,700/60 = 45.0 Hz; the firing order of a four-stroke four is twice that.
  test("turns rpm and order into hertz", () => {
    expect(vibrationOrder({ rpm: 2700, order: 1 })).toBe(45);
    expect(vibrationOrder({ rpm: 2700, order: 2 })).toBe(90);
    expect(() => vibrationOrder({ rpm: 0, order: 1 })).toThrow(/rpm is 0/);
  });

  // 1 g at 45 Hz: 9.80665/(2π · 45) = 34.68 mm/s.
  test("turns acceleration into velocity", () => {
    expect(vibrationVelocity({ accelerationMps2: 9.80665, frequencyHz: 45 }) * 1000).toBeCloseTo(34.68, 2);
    expect(() => vibrationVelocity({ accelerationMps2: 1, frequencyHz: 0 })).toThrow(/frequencyHz is 0/);
  });
});

describe("intercoolerEffectiveness", () => {
  // (92 − 48)/(92 − 18) = 0.595.
  test("is the share of the possible cooling", () => {
    const air = { compressorOutK: kelvin(92), intercoolerOutK: kelvin(48), ambientK: kelvin(18) };
    expect(intercoolerEffectiveness(air)).toBeCloseTo(0.595, 3);
    expect(intercoolerEffectiveness({ ...air, intercoolerOutK: air.ambientK })).toBe(1);
    expect(intercoolerEffectiveness({ ...air, intercoolerOutK: air.compressorOutK })).toBe(0);
  });

  test("refuses air that leaves hotter than it came, or colder than the day", () => {
    const air = { compressorOutK: 365, intercoolerOutK: 321, ambientK: 291 };
    expect(() => intercoolerEffectiveness({ ...air, intercoolerOutK: 370 })).toThrow(/intercoolerOutK is 370/);
    expect(() => intercoolerEffectiveness({ ...air, intercoolerOutK: 280 })).toThrow(/intercoolerOutK is 280/);
    expect(() => intercoolerEffectiveness({ ...air, compressorOutK: 291 })).toThrow(/compressorOutK is 291/);
  });
});
