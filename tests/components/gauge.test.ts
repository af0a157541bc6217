import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { arcPath, onDial, place, roundStep, scaleAround, spreadLabels, ticks } from "@/components/gauge/geometry";
import { labelWidth, layOutStrip, type Strip } from "@/components/gauge/strip-layout";

describe("place", () => {
  // By hand: (115 − 60) / (130 − 60) × 140 = 110.
  test("puts a value where its share of the scale falls", () => {
    expect(place(115, { low: 60, high: 130 }, 140)).toEqual({ at: 110, beyond: null });
  });
  test("keeps what is off the scale at its end and says so", () => {
    expect(place(140, { low: 60, high: 130 }, 140)).toEqual({ at: 140, beyond: "high" });
    expect(place(20, { low: 60, high: 130 }, 140)).toEqual({ at: 0, beyond: "low" });
  });
});

describe("ticks", () => {
  test("stand on round values inside the scale", () => {
    expect(ticks({ low: 68, high: 121 }, 6)).toEqual([70, 80, 90, 100, 110, 120]);
    expect(ticks({ low: 2.3, high: 3.7 }, 8)).toEqual([2.4, 2.6, 2.8, 3, 3.2, 3.4, 3.6]);
  });
  test("never exceed the number asked for by more than the first mark", () => {
    fc.assert(
      fc.property(fc.double({ min: 0.01, max: 1e5, noNaN: true }), fc.integer({ min: 2, max: 12 }), (span, most) => {
        expect(span / roundStep(span, most)).toBeLessThanOrEqual(most + 1e-6);
      }),
    );
  });
});

test("a scale holds every value it was made for", () => {
  fc.assert(
    fc.property(fc.array(fc.double({ min: -500, max: 2000, noNaN: true }), { minLength: 1, maxLength: 8 }), (values) => {
      const scale = scaleAround(values);
      expect(scale.low).toBeLessThanOrEqual(Math.min(...values));
      expect(scale.high).toBeGreaterThanOrEqual(Math.max(...values));
    }),
  );
});

describe("spreadLabels", () => {
  test("leaves labels alone where there is room", () => {
    expect(
      spreadLabels(
        [
          { at: 50, width: 40 },
          { at: 200, width: 40 },
        ],
        320,
      ),
    ).toEqual([50, 200]);
  });
  test("lets no two overlap and none leave the strip, as long as all fit", () => {
    const label = fc.record({ at: fc.double({ min: 0, max: 320, noNaN: true }), width: fc.double({ min: 10, max: 60, noNaN: true }) });
    fc.assert(
      fc.property(fc.array(label, { minLength: 1, maxLength: 4 }), (labels) => {
        const centres = spreadLabels(labels, 320);
        const boxes = labels.map(({ width }, i) => ({ from: (centres[i] ?? 0) - width / 2, to: (centres[i] ?? 0) + width / 2 }));
        boxes.sort((a, b) => a.from - b.from);
        for (const [i, box] of boxes.entries()) {
          expect(box.from).toBeGreaterThanOrEqual(-1e-6);
          expect(box.to).toBeLessThanOrEqual(320 + 1e-6);
          if (i > 0) expect(box.from).toBeGreaterThanOrEqual((boxes[i - 1]?.to ?? 0) + 6 - 1e-6);
        }
      }),
    );
  });
});

describe("layOutStrip", () => {
  // Coolant: normal 75 to 98 °C, placard 115, card 109, on a scale of 60 to 130 drawn 140 long: 2 units a degree.
  const coolant: Strip = {
    scale: { low: 60, high: 130 },
    normal: { low: 75, high: 98 },
    limits: [
      { layer: "placard", side: "max", value: 115, label: "115" },
      { layer: "card", side: "max", value: 109, label: "109" },
    ],
    marks: [{ kind: "hot day", value: 115.2, expandedUncertainty: 3.2, label: "115.2 hot day" }],
  };

  test("draws green over the normal range and yellow from there to the placard, not to the card limit", () => {
    expect(layOutStrip(coolant, 140).zones).toEqual([
      { tone: "green", from: 30, to: 76 },
      { tone: "yellow", from: 76, to: 110 },
    ]);
  });

  test("a value past the placard stands past its radial, however little", () => {
    const { marks, radials } = layOutStrip(coolant, 140);
    expect(marks[0]?.at).toBeCloseTo(110.4, 9); // (115.2 − 60) × 2
    expect(marks[0]?.at).toBeGreaterThan(radials[0]?.at ?? Number.POSITIVE_INFINITY);
  });

  test("draws U as a bar from value − U to value + U", () => {
    const bar = layOutStrip(coolant, 140).marks[0]?.bar;
    expect(bar?.from).toBeCloseTo(104, 9); // (112.0 − 60) × 2
    expect(bar?.to).toBeCloseTo(116.8, 9); // (118.4 − 60) × 2
  });

  test("colours nothing where no normal range is known", () => {
    expect(layOutStrip({ ...coolant, normal: null }, 140).zones).toEqual([]);
  });

  test("a lower limit has its caution range below the normal one", () => {
    const oil: Strip = {
      scale: { low: 20, high: 90 },
      normal: { low: 45, high: 65 },
      limits: [{ layer: "placard", side: "min", value: 30, label: "30" }],
      marks: [],
    };
    expect(layOutStrip(oil, 140).zones).toContainEqual({ tone: "yellow", from: 20, to: 50 });
  });

  test("labels are given room by their length", () => {
    expect(labelWidth("109.4 hot day")).toBeGreaterThan(labelWidth("115"));
  });
});

describe("dials", () => {
  test("measure angles clockwise from straight up", () => {
    expect(onDial(0, 5, { x: 10, y: 10 })).toEqual({ x: 10, y: 5 });
    const right = onDial(90, 5, { x: 10, y: 10 });
    expect(right.x).toBeCloseTo(15, 9);
    expect(right.y).toBeCloseTo(10, 9);
  });
  test("take the long way round past half a turn", () => {
    expect(arcPath(-120, 120, 7, { x: 10, y: 10 })).toContain("A7 7 0 1 1");
    expect(arcPath(0, 90, 7, { x: 10, y: 10 })).toContain("A7 7 0 0 1");
  });
});
