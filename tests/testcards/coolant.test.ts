import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { standardAtmosphere } from "@/lib/testcards/atmosphere";
import { boilingMargin, boilingTemperature, heatRejected, saturationPressure, saturationTemperature } from "@/lib/testcards/coolant";
import { convert } from "@/lib/testcards/units";
import saturation from "./truth/saturation.json";

const kelvin = (value: number) => convert(value, "degC", "K");
const celsius = (value: number) => convert(value, "K", "degC");
const pressureAt = (altitudeFt: number) => standardAtmosphere(convert(altitudeFt, "ft", "m")).pressurePa;

describe("saturation of water", () => {
  test.each(saturation.table35)("returns table 35 of IAPWS-IF97 at $temperatureK K", ({ temperatureK, pressureMPa }) => {
    expect(saturationPressure(temperatureK) / 1e6 / pressureMPa).toBeCloseTo(1, 8);
  });

  test.each(saturation.table36)("returns table 36 of IAPWS-IF97 at $pressureMPa MPa", ({ pressureMPa, temperatureK }) => {
    expect(saturationTemperature(pressureMPa * 1e6)).toBeCloseTo(temperatureK, 6);
  });

  test.each(saturation.boilingAtAltitude)(
    "boils at $boilingC °C, $boilingF °F, at $altitudeFt ft",
    ({ altitudeFt, pressurePa, boilingC, boilingF }) => {
      expect(celsius(saturationTemperature(pressurePa))).toBeCloseTo(boilingC, 2.9);
      expect(convert(saturationTemperature(pressureAt(altitudeFt)), "K", "degF")).toBeCloseTo(boilingF, 2.9);
    },
  );

  // IAPWS-IF97 region 4, independently computed: station pressures in hPa.
  test.each([
    [1013.25, 100.0],
    [1000, 99.6],
    [977, 99.0],
    [965, 98.6],
    [898, 96.6],
  ])("boils under %d hPa at what prints as %d °C", (hPa, expected) => {
    expect(celsius(saturationTemperature(hPa * 100))).toBeCloseTo(expected, 1);
  });

  test("is one curve either way", () => {
    fc.assert(
      fc.property(fc.double({ min: 274, max: 640, noNaN: true }), (temperatureK) => {
        expect(saturationTemperature(saturationPressure(temperatureK))).toBeCloseTo(temperatureK, 5);
      }),
    );
  });

  test("refuses ice, the critical point and hectopascals", () => {
    expect(() => saturationPressure(273)).toThrow(/temperatureK is 273/);
    expect(() => saturationPressure(650)).toThrow(RangeError);
    expect(() => saturationTemperature(600)).toThrow(/pressurePa is 600/);
    expect(() => saturationTemperature(Number.NaN)).toThrow(RangeError);
  });
});

describe("boilingMargin", () => {
  // Water with a cap that adds to the local ambient, computed independently: 15 psi and 7 psi.
  test.each([
    [15, 0, 120.96],
    [15, 5000, 118.22],
    [15, 10_000, 115.71],
    [7, 0, 111.27],
  ])("of water under a %d psi cap at %d ft leaves nothing at %d °C", (psi, altitudeFt, boilingC) => {
    const margin = boilingMargin({
      coolantK: kelvin(boilingC),
      capGaugePa: convert(psi, "psi", "Pa"),
      ambientPa: pressureAt(altitudeFt),
      fluid: "water",
    });
    expect(margin).toBeCloseTo(0, 1.9);
  });

  // Scaled pressure, k = 1304.03/1013.25 = 1.28698, by hand: open, and with a 1.1 bar cap.
  test.each([
    [0, 107.2, 130.2],
    [350, 106.8, 130.0],
    [4200, 102.8, 127.9],
    [5900, 100.9, 126.9],
    [10_000, 96.6, 124.9],
  ])("of the 50/50 mix at %d ft: open %d °C, cap holding %d °C", (altitudeFt, open, holding) => {
    const at = { coolantK: kelvin(100), ambientPa: pressureAt(altitudeFt), fluid: "glycol50" } as const;
    expect(boilingMargin({ ...at, capGaugePa: 0 }) + 100).toBeCloseTo(open, 1);
    expect(boilingMargin({ ...at, capGaugePa: 110_000 }) + 100).toBeCloseTo(holding, 1);
  });

  // At 350 ft, hot-day coolant 116.7: 130.0 − 116.7 = 13.3 with the cap, 106.8 − 116.7 = −9.9 without.
  test("goes negative where the coolant boils", () => {
    const soak = { coolantK: kelvin(116.73), ambientPa: pressureAt(350), fluid: "glycol50" } as const;
    expect(boilingMargin({ ...soak, capGaugePa: 110_000 })).toBeCloseTo(13.3, 1);
    expect(boilingMargin({ ...soak, capGaugePa: 0 })).toBeCloseTo(-9.9, 1);
    expect(boilingTemperature(101_325, "glycol50")).toBeCloseTo(kelvin(107.2), 3);
  });

  test("refuses a fluid nobody defined, and degrees given for kelvins", () => {
    const at = { coolantK: 380, capGaugePa: 0, ambientPa: 101_325, fluid: "water" } as const;
    expect(() => boilingMargin({ ...at, fluid: "oil" as "water" })).toThrow(/fluid is "oil"/);
    expect(() => boilingMargin({ ...at, coolantK: 105 })).toThrow(/coolantK is 105/);
    expect(() => boilingMargin({ ...at, capGaugePa: -1 })).toThrow(/capGaugePa is -1/);
  });
});

describe("heatRejected", () => {
  const lPerMin = (value: number) => convert(value, "L/min", "m3/s");

  // 95/60 · 1.03 · 3.6 · 8 = 46.97 kW; 25 L/h · 0.72 · 43.5/3600 = 217.5 kW, of which 21.6 %.
  test("of the 50/50 mix agrees with the hand calculation, and with the fuel's power", () => {
    const watts = heatRejected({ flowM3s: lPerMin(95), inletK: kelvin(81), outletK: kelvin(89), fluid: "glycol50" });
    expect(watts / 1000).toBeCloseTo(46.97, 2);
    expect(watts / 217_500).toBeCloseTo(0.216, 3);
  });

  // Water 25 L/min entering at 90 °C, drop 8 °C: 0.40222 kg/s, 13.53 kW, IAPWS-IF97 density and specific heat.
  test("of water takes density and specific heat at the inlet", () => {
    expect(heatRejected({ flowM3s: lPerMin(25), inletK: kelvin(90), outletK: kelvin(82), fluid: "water" }) / 1000).toBeCloseTo(13.53, 2);
  });

  // Engine trial of a textbook: 180 kg in 40 min, rise 45 °C, c 4.18 -> 14.11 kW.
  test("takes a programme's own properties", () => {
    const own = { densityKgM3: 1000, specificHeatJPerKgK: 4180 };
    const watts = heatRejected({ flowM3s: 0.18 / 2400, inletK: kelvin(20), outletK: kelvin(65), fluid: "water", properties: own });
    expect(watts / 1000).toBeCloseTo(14.11, 2);
  });

  test("is the same seen from the engine and from the radiator, and grows with flow", () => {
    const at = { flowM3s: 0.001, inletK: kelvin(80), outletK: kelvin(90), fluid: "glycol50" } as const;
    expect(heatRejected({ ...at, inletK: at.outletK, outletK: at.inletK })).toBeCloseTo(heatRejected(at), 6);
    expect(heatRejected({ ...at, flowM3s: 0.002 })).toBeCloseTo(2 * heatRejected(at), 6);
  });

  test("refuses litres a minute given for cubic metres a second, and water off its table", () => {
    const at = { flowM3s: 0.001, inletK: kelvin(80), outletK: kelvin(90), fluid: "water" } as const;
    expect(() => heatRejected({ ...at, flowM3s: 95 })).toThrow(/flowM3s is 95/);
    expect(() => heatRejected({ ...at, inletK: kelvin(5) })).toThrow(/must be from 20 to 100/);
    expect(() => heatRejected({ ...at, properties: { densityKgM3: 0, specificHeatJPerKgK: 1 } })).toThrow(/densityKgM3 is 0/);
  });
});
