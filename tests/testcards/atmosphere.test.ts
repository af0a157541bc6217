import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { densityAltitude, hotDayAmbient, pressureAltitude, pressureAltitudeFromQnh, standardAtmosphere } from "@/lib/testcards/atmosphere";
import { convert } from "@/lib/testcards/units";
import altimeter from "./truth/altimeter-setting.json";
import atmosphere from "./truth/standard-atmosphere.json";

const ft = (value: number) => convert(value, "ft", "m");
const inFt = (value: number) => convert(value, "m", "ft");
const celsius = (value: number) => convert(value, "K", "degC");
const kelvin = (value: number) => convert(value, "degC", "K");

describe("standardAtmosphere", () => {
  test.each(atmosphere.rows)("agrees with the published table at $altitudeFt ft to the last printed digit", (row) => {
    const air = standardAtmosphere(ft(row.altitudeFt));
    expect(air.temperatureK).toBeCloseTo(row.temperatureK, 2.9);
    expect(Math.abs(air.pressurePa - row.pressurePa)).toBeLessThan(0.06);
    expect(convert(air.pressurePa, "Pa", "inHg")).toBeCloseTo(row.pressureInHg, 3.9);
    expect(air.densityKgM3).toBeCloseTo(row.densityKgM3, 4.9);
    expect(air.delta).toBeCloseTo(row.delta, 5.9);
    expect(air.sigma).toBeCloseTo(row.sigma, 5.9);
    expect(air.theta).toBeCloseTo(row.theta, 5.9);
    expect(Math.abs(air.soundMps - row.soundMps)).toBeLessThan(0.0006);
    expect(Math.abs(convert(air.soundMps, "m/s", "kt") - row.soundKt)).toBeLessThan(0.0016);
  });

  // ICAO Doc 7488, H = 11,000 m.
  test("gives the tropopause of ICAO Doc 7488", () => {
    const air = standardAtmosphere(11_000);
    expect(air.temperatureK).toBeCloseTo(216.65, 9);
    expect(air.pressurePa).toBeCloseTo(22_632.0, 0);
    expect(air.densityKgM3).toBeCloseTo(0.363918, 5);
  });

  // ISO 2533: 4,200 ft, 288.15 − 0.0019812 · 4200 = 279.83 K; δ = (279.83/288.15)^5.25588 = 0.85724.
  test("gives 6.68 °C and 868.6 hPa at 4,200 ft", () => {
    expect(celsius(standardAtmosphere(ft(4200)).temperatureK)).toBeCloseTo(6.68, 2);
    expect(standardAtmosphere(ft(4200)).pressurePa / 100).toBeCloseTo(868.6, 1);
  });

  test.each([-2001, 20_001, Number.NaN, Number.POSITIVE_INFINITY])("refuses %d m", (altitudeM) => {
    expect(() => standardAtmosphere(altitudeM)).toThrow(/altitudeM is/);
  });
});

describe("pressureAltitude", () => {
  test("is the inverse of the standard pressure everywhere", () => {
    fc.assert(
      fc.property(fc.double({ min: -2000, max: 20_000, noNaN: true }), (altitudeM) => {
        expect(pressureAltitude(standardAtmosphere(altitudeM).pressurePa)).toBeCloseTo(altitudeM, 6);
      }),
    );
  });

  test.each(altimeter.rows)("corrects a sea-level field at $settingInHg inHg by $correctionFt ft", ({ settingInHg, correctionFt }) => {
    const altitudeM = pressureAltitudeFromQnh({ elevationM: 0, qnhPa: convert(settingInHg, "inHg", "Pa") });
    expect(Math.abs(inFt(altitudeM) - correctionFt)).toBeLessThan(0.06);
  });

  // 350 ft, QNH 1003: about 10.25 hPa · 27.3 ft/hPa = 280 ft more; 630 to the nearest ten.
  test("adds the elevation to the correction", () => {
    const altitudeFt = inFt(pressureAltitudeFromQnh({ elevationM: ft(350), qnhPa: 100_300 }));
    expect(Math.round(altitudeFt / 10) * 10).toBe(630);
  });

  test("refuses pressures that no setting or height has", () => {
    expect(() => pressureAltitude(0)).toThrow(/pressurePa is 0/);
    expect(() => pressureAltitudeFromQnh({ elevationM: 0, qnhPa: 1003 })).toThrow(/qnhPa is 1003/);
    expect(() => pressureAltitudeFromQnh({ elevationM: 1e6, qnhPa: 101_325 })).toThrow(/elevationM/);
  });
});

describe("densityAltitude", () => {
  // Computed independently from the defining constants; 12,000 ft at +50 °F is 14,130 in the FAA knowledge-test bank.
  test.each([
    [12_000, convert(50, "degF", "degC"), 14_134],
    [5000, 30, 7801],
    [4750, 30, 7498],
    [8000, 20, 10_362],
    [0, 40, 2816],
  ])("at %d ft and %d °C is %d ft", (altitudeFt, oatC, expected) => {
    const { pressurePa } = standardAtmosphere(ft(altitudeFt));
    expect(Math.abs(inFt(densityAltitude({ pressurePa, temperatureK: kelvin(oatC) })) - expected)).toBeLessThan(1);
  });

  // DA = (1 − σ^0.234970)/6.87559e-6, to the nearest ten: hand calculation.
  test.each([
    [350, 31, 2260],
    [630, 33, 2820],
    [4200, 14, 5050],
  ])("at %d ft and %d °C prints %d ft", (altitudeFt, oatC, expected) => {
    const { pressurePa } = standardAtmosphere(ft(altitudeFt));
    expect(Math.round(inFt(densityAltitude({ pressurePa, temperatureK: kelvin(oatC) })) / 10) * 10).toBe(expected);
  });

  test("is the altitude itself in the standard atmosphere, in both layers", () => {
    fc.assert(
      fc.property(fc.double({ min: -1999, max: 19_999, noNaN: true }), (altitudeM) => {
        expect(densityAltitude(standardAtmosphere(altitudeM))).toBeCloseTo(altitudeM, 5);
      }),
    );
    expect(() => densityAltitude({ pressurePa: 101_325, temperatureK: 20 })).toThrow(/temperatureK is 20/);
  });
});

describe("hotDayAmbient", () => {
  // 14 CFR 23.1043(b): 100 °F less 3.6 °F per 1,000 ft, not below −69.7 °F, reached at 47,139 ft.
  test.each([
    [0, 100],
    [4000, 85.6],
    [5000, 82],
    [8000, 71.2],
    [10_000, 64],
    [47_139, -69.7],
    [60_000, -69.7],
  ])("of the us basis at %d ft is %d °F", (altitudeFt, expectedF) => {
    expect(convert(hotDayAmbient(ft(altitudeFt), "us"), "K", "degF")).toBeCloseTo(expectedF, 2);
  });

  // 38.0 − 1.98 · h/1000 and 37.778 − 2.00 · h/1000, by hand.
  test.each([
    [350, "us", 37.08],
    [350, "metric", 37.31],
    [5900, "us", 25.98],
    [5900, "metric", 26.32],
    [60_000, "metric", -56.5],
  ] as const)("at %d ft on the %s basis is %d °C", (altitudeFt, basis, expected) => {
    expect(celsius(hotDayAmbient(ft(altitudeFt), basis))).toBeCloseTo(expected, 2);
  });

  // T_hot − standard: 41.00 °F at sea level, 40.66 at 10,000, 40.32 at 20,000 ft: not "standard plus 41".
  test.each([
    [0, 41.0],
    [5000, 40.83],
    [10_000, 40.66],
    [20_000, 40.32],
  ])("lies over the standard temperature at %d ft by %d °F", (altitudeFt, expected) => {
    const difference = (hotDayAmbient(ft(altitudeFt), "us") - standardAtmosphere(ft(altitudeFt)).temperatureK) * 1.8;
    expect(difference).toBeCloseTo(expected, 2);
  });

  test("refuses a basis nobody defined and a height outside the model", () => {
    expect(() => hotDayAmbient(0, "tropical" as "us")).toThrow(/basis is "tropical"/);
    expect(() => hotDayAmbient(-5000, "us")).toThrow(/pressureAltitudeM is -5000/);
  });
});
