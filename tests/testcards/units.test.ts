import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { convert, convertDifference, dimensionOf, rateUnitOf, sameDimension, UNITS, type Unit, UnitError } from "@/lib/testcards/units";

describe("convert", () => {
  // NIST SP 811 appendix B; exact definitions unless a tolerance is given.
  test.each<[number, Unit, number, Unit, number]>([
    [1, "kt", 1852 / 3600, "m/s", 15],
    [1, "ft", 0.3048, "m", 15],
    [1, "lb", 0.45359237, "kg", 15],
    [1, "USgal", 3.785411784, "L", 12],
    [1, "impgal", 4.54609, "L", 12],
    [1, "psi", 6894.757293168, "Pa", 8],
    [1, "lbf", 4.4482216152605, "N", 12],
    [1, "hp", 745.69987158227, "W", 9],
    [1, "inHg", 3386.389, "Pa", 9],
    [101_325, "Pa", 29.92125, "inHg", 5],
    [1, "L/min", 15.8503, "USgal/h", 4],
    [1, "NM", 1852, "m", 12],
    [1, "mph", 1.609344, "km/h", 12],
    [1000, "ft/min", 5.08, "m/s", 12],
    [180, "deg", Math.PI, "rad", 14],
    [50, "%", 0.5, "1", 15],
    [1, "g", 1, "g", 15],
    [-40, "degF", -40, "degC", 10],
    [212, "degF", 100, "degC", 10],
    [0, "degC", 273.15, "K", 12],
    [32, "degF", 491.67, "degR", 10],
    [0, "degF", 459.67, "degR", 10],
  ])("turns %d %s into %d %s", (value, from, expected, to, digits) => {
    expect(convert(value, from, to)).toBeCloseTo(expected, digits);
  });

  // Engine limits of the demo programme, hand calculation: psi · 0.0689476, °C · 1.8 + 32.
  test.each<[number, Unit, number, Unit, number]>([
    [150, "psi", 10.34, "bar", 2],
    [58, "psi", 4.0, "bar", 2],
    [115, "degC", 239, "degF", 9],
    [165, "degC", 329, "degF", 9],
    [30, "degC/min", 54, "degF/min", 9],
    [6.4, "USgal", 24.2, "L", 1],
    [1, "inHg", 33.8639, "hPa", 4],
  ])("turns %d %s into %d %s as the shop prints it", (value, from, expected, to, digits) => {
    expect(convert(value, from, to)).toBeCloseTo(expected, digits);
  });

  // 10 °F as a temperature is −12.222 °C, as a difference 5.556 °C (NIST SP 811 appendix B).
  test("keeps a temperature and a difference apart", () => {
    expect(convert(10, "degF", "degC")).toBeCloseTo(-12.2222, 4);
    expect(convertDifference(10, "degF", "degC")).toBeCloseTo(5.5556, 4);
    expect(convertDifference(9, "degF", "K")).toBeCloseTo(5, 12);
  });

  test("comes back to where it started, in every pair of units of one kind", () => {
    const pairs = UNITS.flatMap((a) => UNITS.filter((b) => sameDimension(a, b)).map((b) => [a, b] as const));
    fc.assert(
      fc.property(fc.constantFrom(...pairs), fc.double({ min: 0, max: 1e5, noNaN: true }), ([a, b], value) => {
        const back = convert(convert(value, a, b), b, a);
        expect(Math.abs(back - value)).toBeLessThanOrEqual(1e-9 * Math.max(1, Math.abs(value)));
        const difference = convertDifference(convertDifference(-value, a, b), b, a);
        expect(Math.abs(difference + value)).toBeLessThanOrEqual(1e-12 * Math.max(1, value));
      }),
    );
  });

  test("gives the difference of two converted temperatures as the converted difference", () => {
    const temperatures = fc.constantFrom<Unit>("K", "degC", "degF", "degR");
    fc.assert(
      fc.property(
        temperatures,
        temperatures,
        fc.double({ min: 0, max: 900, noNaN: true }),
        fc.double({ min: 0, max: 900, noNaN: true }),
        (a, b, x, y) => {
          expect(convert(x, a, b) - convert(y, a, b)).toBeCloseTo(convertDifference(x - y, a, b), 9);
        },
      ),
    );
  });

  test("refuses units that do not exist or do not measure the same thing", () => {
    expect(() => convert(1, "psi", "degC")).toThrow(UnitError);
    expect(() => convert(1, "psi", "degC")).toThrow(/psi \(pressure\).*degC \(temperature\)/);
    expect(() => convertDifference(1, "kg", "L")).toThrow(UnitError);
    expect(() => convert(1, "degC", "degC/min")).toThrow(UnitError);
    expect(() => convert(1, "furlong" as Unit, "m")).toThrow(/from is "furlong"/);
    expect(() => convert(1, "toString" as Unit, "m")).toThrow(UnitError);
    expect(() => dimensionOf("" as Unit)).toThrow(UnitError);
  });

  test.each([Number.NaN, Number.POSITIVE_INFINITY, Number.NEGATIVE_INFINITY])("refuses %d", (value) => {
    expect(() => convert(value, "psi", "bar")).toThrow(RangeError);
    expect(() => convertDifference(value, "degF", "degC")).toThrow(RangeError);
  });

  test("refuses a temperature below absolute zero and a result that overflows, but not a falling difference", () => {
    expect(() => convert(-273.2, "degC", "K")).toThrow(/value is -273.2 degC.*-273.15/);
    expect(() => convert(-1, "K", "degC")).toThrow(RangeError);
    expect(() => convert(Number.MAX_VALUE, "km", "mm")).toThrow(RangeError);
    expect(convertDifference(-400, "degC", "degF")).toBeCloseTo(-720, 9);
    expect(convert(-273.15, "degC", "K")).toBeCloseTo(0, 9);
  });

  test("names the unit of a rate for temperatures only", () => {
    expect(rateUnitOf("degF")).toBe("degF/min");
    expect(rateUnitOf("K")).toBe("degC/min");
    expect(rateUnitOf("psi")).toBeNull();
  });
});
