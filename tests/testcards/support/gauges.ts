import type { Calibration } from "@/lib/testcards/calibration";

const points = (list: [number, number][], expandedUncertainty: number | null): Calibration => ({
  kind: "points",
  points: list.map(([read, actual]) => ({ read, actual })),
  low: list[0]?.[0] ?? 0,
  high: list.at(-1)?.[0] ?? 0,
  expandedUncertainty,
});

/** An invented panel gauge, °C: high when cool, low near the limit. */
export const COOLANT_PANEL = points(
  [
    [0, -4],
    [40, 36.5],
    [80, 79],
    [100, 101.5],
    [120, 122.5],
  ],
  3,
);

/** An invented panel gauge in °F. */
export const CHT_PANEL = points(
  [
    [100, 97],
    [200, 199],
    [300, 303],
    [350, 355],
  ],
  6,
);

/** A gauge that reads true over its range. */
export const readsTrue = (low: number, high: number, expandedUncertainty: number | null): Calibration =>
  points(
    [
      [low, low],
      [high, high],
    ],
    expandedUncertainty,
  );
