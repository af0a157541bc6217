import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { calibratedAirspeed, equivalentAirspeed, trueAirspeed, windComponents, windFromLegs } from "@/lib/testcards/airspeed";
import { standardAtmosphere } from "@/lib/testcards/atmosphere";
import { convert } from "@/lib/testcards/units";
import speeds from "./truth/airspeed.json";

const kt = (value: number) => convert(value, "kt", "m/s");
const inKt = (value: number) => convert(value, "m/s", "kt");
const standardAt = (altitudeFt: number) => standardAtmosphere(convert(altitudeFt, "ft", "m"));
const kelvin = (value: number) => convert(value, "degC", "K");
const legs = (list: [number, number][]) => list.map(([knots, trackDeg]) => ({ groundSpeedMps: kt(knots), trackDeg }));

describe("trueAirspeed, calibratedAirspeed and equivalentAirspeed", () => {
  test.each(speeds.rows)("agree with the compressible table at $kcas KCAS, $altitudeFt ft", (row) => {
    const { pressurePa, temperatureK } = standardAt(row.altitudeFt);
    const tasMps = trueAirspeed({ casMps: kt(row.kcas), pressurePa, temperatureK });
    expect(Math.abs(inKt(tasMps) - row.ktas)).toBeLessThan(0.001);
    expect(Math.abs(inKt(equivalentAirspeed({ casMps: kt(row.kcas), pressurePa })) - row.keas)).toBeLessThan(0.001);
    expect(inKt(calibratedAirspeed({ tasMps, pressurePa, temperatureK }))).toBeCloseTo(row.kcas, 6);
    // The wrong way, CAS/√σ, reads higher.
    expect(inKt(tasMps)).toBeLessThan(row.incompressibleKtas);
  });

  // M 0.80 at 35,000 ft: 271.93 KCAS, 461.13 KTAS; 120 KCAS at 8,000 ft and 20 °C: 140.241 KTAS, 119.831 KEAS; computed independently.
  test("agree off the standard temperature and at Mach 0.80", () => {
    const high = standardAt(35_000);
    expect(inKt(calibratedAirspeed({ tasMps: 0.8 * high.soundMps, ...high }))).toBeCloseTo(271.93, 2);
    expect(inKt(0.8 * high.soundMps)).toBeCloseTo(461.13, 1);
    const { pressurePa } = standardAt(8000);
    expect(inKt(trueAirspeed({ casMps: kt(120), pressurePa, temperatureK: kelvin(20) }))).toBeCloseTo(140.241, 3);
    expect(inKt(equivalentAirspeed({ casMps: kt(120), pressurePa }))).toBeCloseTo(119.831, 3);
  });

  // CAS/√σ by hand: 68 kt at 4,200 ft and 14 °C -> 73.3; 100 kt at 3,000 ft and 9 °C -> 104.5. The difference at these speeds is below 0.1 kt.
  test.each([
    [68, 4200, 14, 73.3],
    [100, 3000, 9, 104.5],
  ])("give %d KCAS at %d ft and %d °C as %d KTAS", (kcas, altitudeFt, oatC, expected) => {
    const tas = trueAirspeed({ casMps: kt(kcas), pressurePa: standardAt(altitudeFt).pressurePa, temperatureK: kelvin(oatC) });
    expect(inKt(tas)).toBeCloseTo(expected, 1);
  });

  test("undo one another, and are one speed at sea level on the standard day", () => {
    const inputs = fc.record({
      casMps: fc.double({ min: 0, max: 120, noNaN: true }),
      altitudeM: fc.double({ min: -1000, max: 9000, noNaN: true }),
      temperatureK: fc.double({ min: 220, max: 320, noNaN: true }),
    });
    fc.assert(
      fc.property(inputs, ({ casMps, altitudeM, temperatureK }) => {
        const { pressurePa } = standardAtmosphere(altitudeM);
        const tasMps = trueAirspeed({ casMps, pressurePa, temperatureK });
        expect(calibratedAirspeed({ tasMps, pressurePa, temperatureK })).toBeCloseTo(casMps, 7);
      }),
    );
    const sea = standardAtmosphere(0);
    expect(trueAirspeed({ casMps: 50, ...sea })).toBeCloseTo(50, 9);
    expect(equivalentAirspeed({ casMps: 50, pressurePa: sea.pressurePa })).toBeCloseTo(50, 9);
  });

  test("refuse what no subsonic aircraft meets", () => {
    const air = { pressurePa: 101_325, temperatureK: 288 };
    expect(() => trueAirspeed({ casMps: -1, ...air })).toThrow(/casMps is -1/);
    expect(() => trueAirspeed({ casMps: 300, pressurePa: 20_000, temperatureK: 220 })).toThrow(/Mach number/);
    expect(() => trueAirspeed({ casMps: 50, pressurePa: 1013.25, temperatureK: 288 })).toThrow(/pressurePa is 1013.25/);
    expect(() => calibratedAirspeed({ tasMps: 500, ...air })).toThrow(/tasMps is 500/);
    expect(() => equivalentAirspeed({ casMps: Number.NaN, pressurePa: 101_325 })).toThrow(RangeError);
  });
});

describe("windFromLegs", () => {
  // Gray 1998, three legs: TAS 130 (129.9985), wind 20.6 from 314.8.
  test("solves the published three-leg example, with no spread to show", () => {
    const found = windFromLegs(
      legs([
        [140, 192],
        [112, 283],
        [120, 20],
      ]),
    );
    expect(inKt(found.tasMps)).toBeCloseTo(129.9985, 3);
    expect(inKt(found.windMps)).toBeCloseTo(20.6, 1);
    expect(found.windFromDeg).toBeCloseTo(314.8, 1);
    expect(found.sdMps).toBeNull();
  });

  // National Test Pilot School sheet: 178/178, 185/82, 188/355, 184/265 -> mean 183.72669557, sample sd 0.82709635.
  test("solves the published four-leg example to eight figures", () => {
    const found = windFromLegs(
      legs([
        [178, 178],
        [185, 82],
        [188, 355],
        [184, 265],
      ]),
    );
    expect(inKt(found.tasMps)).toBeCloseTo(183.72669557, 7);
    expect(inKt(found.sdMps ?? 0)).toBeCloseTo(0.82709635, 7);
  });

  // 090/180/270/360 at 105/86/81/100 kt: TAS 93.5 (sd 0.31), CAS 89.0 at 3,000 ft and 12 °C, wind about 240/14; three legs 93.2 and 88.7.
  test("gives a position correction, and another without the fourth leg", () => {
    const four = legs([
      [105, 90],
      [86, 180],
      [81, 270],
      [100, 360],
    ]);
    const found = windFromLegs(four);
    const air = { pressurePa: standardAt(3000).pressurePa, temperatureK: kelvin(12) };
    expect(inKt(found.tasMps)).toBeCloseTo(93.5, 1);
    expect(inKt(found.sdMps ?? 0)).toBeCloseTo(0.31, 2);
    expect(Math.round(found.windFromDeg / 10) * 10).toBe(240);
    expect(inKt(found.windMps)).toBeCloseTo(14, 0);
    expect(inKt(calibratedAirspeed({ tasMps: found.tasMps, ...air }))).toBeCloseTo(89.0, 1);
    const three = windFromLegs(four.slice(0, 3));
    expect(inKt(three.tasMps)).toBeCloseTo(93.2, 1);
    expect(inKt(calibratedAirspeed({ tasMps: three.tasMps, ...air }))).toBeCloseTo(88.7, 1);
  });

  // Headings N, E, S, W at 100 kt in 20 kt from the west give 102, 120, 102, 80 kt: their mean, 101, is not the airspeed.
  test("is not the mean of the ground speeds", () => {
    const drift = (Math.atan2(20, 100) * 180) / Math.PI;
    const found = windFromLegs(
      legs([
        [Math.hypot(100, 20), drift],
        [120, 90],
        [Math.hypot(100, 20), 180 - drift],
        [80, 270],
      ]),
    );
    expect(inKt(found.tasMps)).toBeCloseTo(100, 6);
    expect(inKt(found.windMps)).toBeCloseTo(20, 6);
    expect(found.windFromDeg).toBeCloseTo(270, 6);
    expect(inKt(found.sdMps ?? 1)).toBeCloseTo(0, 6);
  });

  test("returns any wind that was put in", () => {
    const wind = fc.record({
      tas: fc.double({ min: 30, max: 80, noNaN: true }),
      north: fc.double({ min: -15, max: 15, noNaN: true }),
      east: fc.double({ min: -15, max: 15, noNaN: true }),
      first: fc.double({ min: 0, max: 360, noNaN: true }),
    });
    fc.assert(
      fc.property(wind, ({ tas, north, east, first }) => {
        const flown = [0, 90, 180, 270].map((turn) => {
          const heading = ((first + turn) * Math.PI) / 180;
          const n = tas * Math.cos(heading) + north;
          const e = tas * Math.sin(heading) + east;
          return { groundSpeedMps: Math.hypot(n, e), trackDeg: (Math.atan2(e, n) * 180) / Math.PI };
        });
        const found = windFromLegs(flown);
        expect(found.tasMps).toBeCloseTo(tas, 6);
        expect(found.windMps).toBeCloseTo(Math.hypot(north, east), 6);
        expect(found.windFromDeg).toBeGreaterThanOrEqual(0);
        expect(found.windFromDeg).toBeLessThan(360);
      }),
    );
  });

  test("refuses two legs, and three on one track", () => {
    expect(() =>
      windFromLegs(
        legs([
          [100, 0],
          [100, 90],
        ]),
      ),
    ).toThrow(/legs holds 2 values/);
    expect(() =>
      windFromLegs(
        legs([
          [100, 45],
          [100, 45],
          [90, 45],
        ]),
      ),
    ).toThrow(/tracks must differ/);
    expect(() =>
      windFromLegs(
        legs([
          [0, 45],
          [100, 135],
          [90, 270],
        ]),
      ),
    ).toThrow(/must be above 0/);
  });
});

describe("windComponents", () => {
  // FAA knowledge test, RWY 18 and 220/30: 23 head, 19 cross; the others by trigonometry: V cos a, V sin a.
  test.each([
    [180, 220, 30, 22.98, 19.28],
    [360, 60, 20, 10.0, 17.32],
    [220, 280, 15, 7.5, 12.99],
    [270, 240, 12, 10.39, -6.0],
    [350, 10, 25, 23.49, 8.55],
    [90, 270, 10, -10, 0],
  ])("on runway %d with wind %d at %d kt", (runwayDeg, windFromDeg, windKt, head, cross) => {
    const found = windComponents({ windMps: kt(windKt), windFromDeg, runwayDeg });
    expect(inKt(found.headMps)).toBeCloseTo(head, 2);
    expect(inKt(found.crossMps)).toBeCloseTo(cross, 2);
  });

  test("refuses a negative wind and a direction that is none", () => {
    expect(() => windComponents({ windMps: -1, windFromDeg: 0, runwayDeg: 0 })).toThrow(/windMps is -1/);
    expect(() => windComponents({ windMps: 1, windFromDeg: Number.NaN, runwayDeg: 0 })).toThrow(/windFromDeg/);
  });
});
