import { describe, expect, test } from "vitest";
import { fitApproach } from "@/lib/testcards/approach";
import boxbod from "./truth/boxbod.json";
import misra1a from "./truth/misra1a.json";

const seriesOf = ({ x, y }: { x: number[]; y: number[] }) => x.map((timeS, i) => ({ timeS, value: y[i] ?? Number.NaN }));
const rise = (times: number[], initial: number, final: number, tau: number) =>
  times.map((timeS) => ({ timeS, value: final + (initial - final) * Math.exp(-timeS / tau) }));
const relative = (value: number, certified: number) => Math.abs(value / certified - 1);

// NIST StRD certified values: y = b1(1 − exp(−b2 x)), so final = b1, τ = 1/b2, se(τ) = se(b2)/b2². Six figures are asked for.
describe.each([
  ["Misra1a", misra1a],
  ["BoxBOD", boxbod],
])("fitApproach on NIST StRD %s", (_, data) => {
  const starts = [undefined, ...data.starts.map(([, b2]) => ({ timeConstantS: 1 / (b2 ?? 1) }))];

  test.each(starts.map((start) => [start ? `from τ = ${start.timeConstantS}` : "without a start", start] as const))(
    "converges %s",
    (_name, start) => {
      const fit = fitApproach(seriesOf(data), start ? { initial: 0, start } : { initial: 0 });
      expect(fit.converged).toBe(true);
      expect(relative(fit.final, data.b1)).toBeLessThan(1e-8);
      expect(relative(1 / fit.timeConstantS, data.b2)).toBeLessThan(1e-8);
      expect(relative(fit.finalSe, data.b1Sd)).toBeLessThan(1e-6);
      expect(relative(fit.timeConstantSe, data.b2Sd / data.b2 ** 2)).toBeLessThan(1e-6);
      expect(relative(fit.residualSumOfSquares, data.rss)).toBeLessThan(1e-8);
      expect(fit.initial).toBe(0);
    },
  );
});

describe("fitApproach", () => {
  const times = [0, 60, 120, 180, 240, 300, 420, 600];

  // Made from the formula itself, without scatter: the figures must come back.
  test.each([
    ["a rise", 60, 95, 180],
    ["a fall", 150, 80, 240],
    ["a quick one", 20, 90, 40],
  ])("returns the figures of %s", (_, initial, final, tau) => {
    const fit = fitApproach(rise(times, initial, final, tau));
    expect(fit.converged).toBe(true);
    expect(fit.initial).toBeCloseTo(initial, 5);
    expect(fit.final).toBeCloseTo(final, 5);
    expect(fit.timeConstantS).toBeCloseTo(tau, 3);
    expect(fit.finalSe).toBeLessThan(1e-4);
  });

  test("needs no reading at time zero, and gives the value there", () => {
    const late = rise([30, 90, 150, 210, 400], 60, 95, 180);
    expect(fitApproach(late).initial).toBeCloseTo(60, 4);
  });

  test("does not call a straight line converged", () => {
    const line = [0, 1, 2, 3, 4, 5].map((t) => ({ timeS: t * 60, value: 80 + t }));
    expect(fitApproach(line, { initial: 80 }).converged).toBe(false);
  });

  // Two equal times so late that adding the shortest step to the first rounds the step away: not rising, so refused, never searched.
  test("refuses equal times however late they are", () => {
    const late = 264_695_657_063.48483;
    const series = [72_357, 72_505, late, late, late + 107_627].map((timeS, i) => ({ timeS, value: i }));
    expect(() => fitApproach(series, { initial: 119_990 })).toThrow("times must rise");
  });

  test("refuses too few readings, no change, times before the start and figures that are none", () => {
    expect(() => fitApproach(rise(times.slice(0, 3), 60, 95, 180))).toThrow(/at least 4/);
    expect(() => fitApproach(times.map((timeS) => ({ timeS, value: 90 })))).toThrow(RangeError);
    expect(() => fitApproach(rise([-60, 0, 60, 120], 60, 95, 180))).toThrow(/timeS is -60/);
    expect(() => fitApproach(rise(times, 60, 95, 180), { initial: Number.NaN })).toThrow(/initial is NaN/);
    expect(() => fitApproach(rise(times, 60, 95, 180), { start: { timeConstantS: 0 } })).toThrow(RangeError);
  });
});
