/** Highest less lowest of several gauges: each value by its own table, and no spread from a value that its gauge cannot vouch for. */
import { describe, expect, test } from "vitest";
import type { PointLimit, Reading } from "@/lib/testcards/card";
import type { ReadingEntry } from "@/lib/testcards/debrief-types";
import { sampleCard, samplePoint, sampleProgramme, sampleReading } from "./support/sample-card";
import { checked, lineOf, typedDebrief } from "./support/sample-debrief";

const limit: PointLimit = {
  id: "own-spread",
  reading: "coolant",
  label: "Coolant spread",
  side: "max",
  value: 10,
  unit: "degC",
  forS: 0,
  statistic: "spread",
  expandedUncertainty: null,
  source: "PL-01 rev 2",
};
const panel = sampleReading("coolant", "highest");
const logger = sampleReading("coolant", "highest", { id: "logger", instrument: "LOGGER-COOLANT" });

function spreadOf(readings: Reading[], typed: Record<string, Partial<ReadingEntry>>, loggerUntil = "2032-03-10") {
  const instruments = sampleProgramme().instruments.map((one) =>
    one.id === "LOGGER-COOLANT" && one.calibration ? { ...one, calibration: { ...one.calibration, validUntil: loggerUntil } } : one,
  );
  const point = samplePoint({ readings, cardTable: false, limits: [limit] });
  const card = sampleCard([point], { programme: { instruments } });
  const report = checked(card, typedDebrief(card, { p1: { readings: typed } }));
  return lineOf(report, "coolant", "as flown, card");
}

describe("the spread of two gauges", () => {
  // 92.5 on the panel is 79 + 12.5 · 22.5/20 = 93.0625 true, 90 on the logger is 90: 3.0625; U = √2 · 3 = 4.243, the larger of the two.
  test("takes each value by its own table, and the larger U", () => {
    const line = spreadOf([panel, logger], { coolant: { value: 92.5 }, logger: { value: 90 } });
    expect(line.asTrue?.value).toBeCloseTo(3.0625, 9);
    expect(line.asTrue?.expandedUncertainty).toBeCloseTo(4.243, 3);
    expect(line).toMatchObject({ verdict: "within", why: "spread of 2" });
  });

  // 105 on the panel is 106.75: 106.75 − 93 = 13.75, past 10.
  test("finds a spread past its limit", () => {
    expect(spreadOf([panel, logger], { coolant: { value: 105 }, logger: { value: 93 } })).toMatchObject({ verdict: "exceeded" });
  });

  test("passes nothing on a gauge out of calibration", () => {
    const line = spreadOf([panel, logger], { coolant: { value: 92.5 }, logger: { value: 90 } }, "2031-05-01");
    expect(line).toMatchObject({ verdict: "no verdict", reasons: ["not calibrated"] });
  });

  test("passes nothing on a value beyond a table, or on one missing", () => {
    const beyond = spreadOf([panel, logger], { coolant: { value: 92.5 }, logger: { value: 130 } });
    expect(beyond).toMatchObject({ verdict: "no verdict", reasons: ["no reading"], why: "1 of 2 readings of the spread" });
    expect(spreadOf([panel, logger], { coolant: { value: 92.5 } })).toMatchObject({ verdict: "no verdict", reasons: ["no reading"] });
  });

  test("counts a remark on the same parameter as no member", () => {
    const remark = sampleReading("coolant", "single", { id: "remark", kind: "text", instrument: null, unit: null });
    const line = spreadOf([panel, remark, logger], { coolant: { value: 92.5 }, remark: { answer: "steady" }, logger: { value: 90 } });
    expect(line).toMatchObject({ verdict: "within", why: "spread of 2" });
  });
});
