import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { insideEnvelope, loadingOf } from "@/lib/testcards/loading";
import { convert } from "@/lib/testcards/units";

const lbIn = (list: [number, number][]) =>
  list.map(([lb, inches]) => ({ massKg: convert(lb, "lb", "kg"), armM: convert(inches, "in", "m") }));
const inches = (m: number) => convert(m, "m", "in");

describe("loadingOf", () => {
  // Pilot's Handbook of Aeronautical Knowledge ch. 10, computational method: 281,430/3,320 = 84.768 in.
  test("agrees with the handbook's computational method", () => {
    const loading = loadingOf(
      lbIn([
        [2100, 78.3],
        [340, 85],
        [350, 121],
        [450, 75],
        [80, 150],
      ]),
    );
    expect(convert(loading.massKg, "kg", "lb")).toBeCloseTo(3320, 9);
    expect(inches(loading.cgM)).toBeCloseTo(84.768, 3);
    expect(loading.momentKgM).toBeCloseTo(loading.massKg * loading.cgM, 9);
  });

  // PHAK, removal: 6,100 lb at 80 in less 100 lb at 150 in -> 78.83 in.
  test("takes a load away as a negative mass", () => {
    expect(
      inches(
        loadingOf(
          lbIn([
            [6100, 80],
            [-100, 150],
          ]),
        ).cgM,
      ),
    ).toBeCloseTo(78.83, 2);
  });

  // FAA-H-8083-1 nose-wheel aeroplane, from the main wheels: 340 lb at −78 in of 2,006 lb -> −13.22 in.
  test("knows arms ahead of the datum", () => {
    expect(
      inches(
        loadingOf(
          lbIn([
            [340, -78],
            [1666, 0],
          ]),
        ).cgM,
      ),
    ).toBeCloseTo(-13.22, 2);
  });

  // Invented aircraft, by hand: 381·1.895 + 164·2.150 + 6·2.800 + 46.08·2.230 = 1194.15; /597.08 = 2.000 m.
  test("agrees with a loading worked by hand", () => {
    const loading = loadingOf([
      { massKg: 381, armM: 1.895 },
      { massKg: 92 + 72, armM: 2.15 },
      { massKg: 6, armM: 2.8 },
      { massKg: 64 * 0.72, armM: 2.23 },
    ]);
    expect(loading.massKg).toBeCloseTo(597.1, 1);
    expect(loading.cgM).toBeCloseTo(2.0, 3);
  });

  test("refuses nothing at all, no mass, and figures that are none", () => {
    expect(() => loadingOf([])).toThrow(/stations holds 0 values/);
    expect(() =>
      loadingOf([
        { massKg: 5, armM: 1 },
        { massKg: -5, armM: 1 },
      ]),
    ).toThrow(/adds up to 0/);
    expect(() => loadingOf([{ massKg: Number.NaN, armM: 1 }])).toThrow(/massKg is NaN/);
  });
});

describe("insideEnvelope", () => {
  const corners = [
    { massKg: 380, cgM: 1.9 },
    { massKg: 500, cgM: 1.9 },
    { massKg: 600, cgM: 1.96 },
    { massKg: 600, cgM: 2.06 },
    { massKg: 380, cgM: 2.06 },
  ];

  // Forward limit between 500 and 600 kg by hand: 1.900 + 0.0006 · (m − 500); at 528.2 kg 1.917.
  test.each([
    ["take-off of the card", 597.1, 2.0, true, 2.9, 2.0 - 1.95826],
    ["two heavy people", 626.2, 2.0, false, -26.2, 0.04],
    ["one of them left behind", 528.2, 1.987, true, 71.8, 1.987 - 1.91692],
    ["the same at zero fuel", 487.9, 1.967, true, 107.9, 0.067],
    ["too far forward when heavy", 560, 1.93, false, -10, -0.006],
    ["lighter than the envelope", 370, 2.0, false, -10, 0.06],
    ["too far aft", 500, 2.07, false, 100, -0.01],
  ] as const)("judges %s", (_, massKg, cgM, inside, massMarginKg, cgMarginM) => {
    const found = insideEnvelope({ massKg, cgM }, corners);
    expect(found.inside).toBe(inside);
    expect(found.massMarginKg).toBeCloseTo(massMarginKg, 4);
    expect(found.cgMarginM).toBeCloseTo(cgMarginM, 4);
  });

  test("counts every corner and every edge as inside", () => {
    for (const corner of corners) expect(insideEnvelope(corner, corners).inside).toBe(true);
    expect(insideEnvelope({ massKg: 550, cgM: 1.93 }, corners)).toMatchObject({ inside: true });
    expect(insideEnvelope({ massKg: 550, cgM: 1.93 - 1e-6 }, corners).inside).toBe(false);
  });

  test("does not mind where the list of corners starts or which way it runs", () => {
    const turned = [...corners.slice(2), ...corners.slice(0, 2)].reverse();
    const loads = fc.record({
      massKg: fc.double({ min: 300, max: 700, noNaN: true }),
      cgM: fc.double({ min: 1.8, max: 2.2, noNaN: true }),
    });
    fc.assert(
      fc.property(loads, (load) => {
        const one = insideEnvelope(load, corners);
        const other = insideEnvelope(load, turned);
        expect(other.inside).toBe(one.inside);
        expect(other.cgMarginM).toBeCloseTo(one.cgMarginM, 9);
      }),
    );
  });

  test("refuses an envelope that encloses nothing", () => {
    expect(() => insideEnvelope({ massKg: 500, cgM: 2 }, corners.slice(0, 2))).toThrow(/at least 3/);
    const line = [380, 500, 600].map((massKg) => ({ massKg, cgM: 1.9 }));
    expect(() => insideEnvelope({ massKg: 500, cgM: 2 }, line)).toThrow(/enclose an area/);
    expect(() => insideEnvelope({ massKg: Number.NaN, cgM: 2 }, corners)).toThrow(/massKg is NaN/);
  });
});
