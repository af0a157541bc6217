/** As flown: every limit that applies, on the right figure, and whatever takes a verdict away. Sums by hand from the sample gauge tables. */
import { describe, expect, test } from "vitest";
import type { CardDocument, CardPoint, Instrument, Limit, PointLimit, Reading } from "@/lib/testcards/card";
import type { CheckContext, CheckLine, PointDebrief, ReadingEntry } from "@/lib/testcards/debrief-types";
import { sampleCard, samplePoint, sampleProgramme, sampleReading } from "./support/sample-card";
import { checked, digit, lineOf, minuteRows, typedDebrief } from "./support/sample-debrief";

const ownLimit = (reading: string, over: Partial<PointLimit>): PointLimit => ({
  id: `own-${reading}`,
  reading,
  label: reading,
  side: "max",
  value: 0,
  unit: "degC",
  forS: 0,
  statistic: "instant",
  expandedUncertainty: null,
  source: "PL-01 rev 2",
  ...over,
});

type Case = {
  point?: Partial<CardPoint>;
  programme?: Parameters<typeof sampleProgramme>[0];
  context?: Partial<CheckContext>;
  said?: Partial<PointDebrief>;
};

/** One ground point with these readings, flown and typed. */
function run(readings: Reading[], typed: Record<string, Partial<ReadingEntry>>, { point, programme, context, said }: Case = {}) {
  const card: CardDocument = sampleCard([samplePoint({ readings, ...point })], programme ? { programme } : {});
  const { readings: _, point: __, ...rest } = said ?? {};
  return checked(card, typedDebrief(card, { p1: { ...rest, readings: typed } }), context);
}

const withInstrument = (id: string, change: (instrument: Instrument) => Partial<Instrument>) => ({
  instruments: sampleProgramme().instruments.map((one) => (one.id === id ? { ...one, ...change(one) } : one)),
});
const withCalibration = (over: object) =>
  withInstrument("COOLANT-PANEL", (one) => ({ calibration: one.calibration && { ...one.calibration, ...over } }));

const coolant = sampleReading("coolant", "highest");
const placardOf = (report: ReturnType<typeof run>, reading = "coolant"): CheckLine => lineOf(report, reading, "as flown, placard");

describe("which limits apply", () => {
  test("takes a maximum from a highest, and nothing about a minimum", () => {
    const report = run([sampleReading("oil-p", "highest")], { "oil-p": { value: 55 } });
    expect(report.lines.filter((line) => line.limit?.side === "min")).toEqual([]);
    expect(placardOf(report, "oil-p").verdict).toBe("within");
  });

  test("judges lowest and highest against their own sides: 38 − 3 = 35 ≥ 33; 70 + 3 = 73 > 72", () => {
    const report = run([sampleReading("oil-p", "lowest and highest")], { "oil-p": { lowest: 38, value: 70 } });
    expect(lineOf(report, "oil-p", "as flown, card", "at power")).toMatchObject({ verdict: "within", onGauge: { value: 38 } });
    expect(lineOf(report, "oil-p", "as flown, card")).toMatchObject({ verdict: "marginal", onGauge: { value: 70 } });
  });

  test("lets only cold start replace the always row of its parameter: 90 psi is within 100 − 3", () => {
    const cold = run([sampleReading("oil-p", "highest", { conditions: ["cold start"] })], { "oil-p": { value: 90 } });
    expect(cold.lines.filter((line) => line.comparison !== "abort").map((line) => line.limit?.appliesWhen)).toEqual([
      "cold start",
      "cold start",
    ]);
    expect(lineOf(cold, "oil-p", "as flown, placard", "cold start").verdict).toBe("within");
    const warm = run([sampleReading("oil-p", "highest")], { "oil-p": { value: 90 } });
    expect(placardOf(warm, "oil-p").verdict).toBe("exceeded");
  });

  test("keeps to limits whose condition occurs while the reading is taken", () => {
    const report = run([sampleReading("oil-t", "lowest", { conditions: [] })], { "oil-t": { value: 40 } });
    expect(report.lines).toEqual([]);
    const full = run([sampleReading("oil-t", "lowest", { conditions: ["full power"] })], { "oil-t": { value: 40 } });
    expect(lineOf(full, "oil-t", "as flown, placard", "full power").verdict).toBe("exceeded");
  });

  test("holds the placard without the card's table too, but asks for it only where the point prints a limit", () => {
    const bare = run([coolant], { coolant: { value: 90 } }, { point: { cardTable: false } });
    expect(bare.lines.map((line) => [line.comparison, line.required])).toEqual([
      ["abort", false],
      ["as flown, placard", false],
      ["hot day, placard", false],
    ]);
    const own = run([coolant], { coolant: { value: 90 } }, { point: { cardTable: false, limits: [ownLimit("coolant", { value: 109 })] } });
    expect(placardOf(own).required).toBe(true);
    expect(lineOf(own, "coolant", "as flown, card")).toMatchObject({ verdict: "within", required: true, limit: { authority: null } });
  });

  test("leaves yes-no, choice, text and photo alone", () => {
    const leak = sampleReading("oat", "single", { id: "leak", parameter: null, instrument: null, kind: "yes-no" });
    expect(run([leak], { leak: { answer: "yes" } }).lines).toEqual([]);
  });
});

describe("a limit that may be passed for a while", () => {
  const rpm = sampleReading("rpm", "single");
  const held = (seconds: number) => [
    { atS: 0, label: "", value: 2500 },
    { atS: 60, label: "", value: 2700 },
    { atS: 60 + seconds, label: "", value: 2700 },
    { atS: 120 + seconds, label: "", value: 2500 },
  ];

  test.each([
    [2550, "within", []],
    [2590, "marginal", []],
    [2700, "no verdict", ["no reading"]],
  ])("reads a single %d rpm against 2600 for 5:00 as %s", (value, verdict, reasons) => {
    const line = lineOf(run([rpm], { rpm: { value } }), "rpm", "as flown, placard", "at power");
    expect(line).toMatchObject({ verdict, reasons });
  });

  test("says that a single reading cannot show for how long", () => {
    const line = lineOf(run([rpm], { rpm: { value: 2700 } }), "rpm", "as flown, placard", "at power");
    expect(line.why).toContain("5:00 allowed");
  });

  // straight ramps of 200 rpm in 60 s: past 2600 for the time held and 2 × 30 s, past 2600 − 20 for 12 s more
  test.each([
    [60, "within", "beyond it for 2:00 of 5:00"],
    [235, "marginal", "beyond it for 4:55 of 5:00"],
    [241, "exceeded", "beyond it for 5:01 of 5:00"],
  ])("counts the longest stretch: held %d s is %s", (seconds, verdict, why) => {
    const line = lineOf(run([sampleReading("rpm", "series")], { rpm: { rows: held(seconds) } }), "rpm", "as flown, placard", "at power");
    expect(line).toMatchObject({ verdict, why, margin: null });
  });
});

describe("the gauge", () => {
  test("proves a failure past the hot end of its table without quoting a number: 122.5 − 3.0 = 119.5 > 115", () => {
    const report = run([coolant], { coolant: { value: 125 } });
    expect(placardOf(report)).toMatchObject({ verdict: "exceeded", asTrue: null, margin: null });
    expect(placardOf(report).notes).toContain("outside calibrated range");
    expect(placardOf(report).why).toBe("the table ends at 120 °C on the gauge");
    expect(report.squawks).toEqual([expect.objectContaining({ severity: "grounding" })]);
  });

  test("proves nothing where the end of the table is not past the limit: 122.5 − 3.0 = 119.5 < 125", () => {
    const limits = sampleProgramme().limits.map((limit): Limit => (limit.parameter === "coolant" ? { ...limit, value: 125 } : limit));
    expect(placardOf(run([coolant], { coolant: { value: 125 } }, { programme: { limits } }))).toMatchObject({
      verdict: "no verdict",
      reasons: ["outside calibrated range"],
    });
  });

  test("mirrors at the cold end for a minimum, and says nothing there about a maximum", () => {
    const report = run([sampleReading("coolant", "single", { conditions: ["take-off"] })], { coolant: { value: -5 } });
    expect(lineOf(report, "coolant", "as flown, placard", "take-off").verdict).toBe("exceeded"); // −4.0 + 3.0 < 50
    expect(placardOf(report)).toMatchObject({ verdict: "no verdict", reasons: ["outside calibrated range"] });
  });

  test.each([
    ["none at all", withInstrument("COOLANT-PANEL", () => ({ calibration: null })), "COOLANT-PANEL has no calibration"],
    ["one that has run out", withCalibration({ validUntil: "2031-05-04" }), "COOLANT-PANEL was calibrated until 2031-05-04"],
    ["one made later", withCalibration({ calibratedOn: "2031-05-06" }), "COOLANT-PANEL was calibrated only on 2031-05-06"],
    ["one disturbed since", withCalibration({ disturbedOn: "2031-04-01" }), "COOLANT-PANEL was disturbed on 2031-04-01"],
    [
      "a table that does not rise",
      withCalibration({
        points: [
          { read: 0, actual: 9 },
          { read: 130, actual: 1 },
        ],
      }),
      "does not hold",
    ],
  ])("gives no verdict with a calibration: %s", (_, programme, why) => {
    const line = placardOf(run([coolant], { coolant: { value: 92.5 } }, { programme }));
    expect(line).toMatchObject({ verdict: "no verdict", reasons: ["not calibrated"] });
    expect(line.why).toContain(why);
  });

  test.each([
    ["valid to the day itself", { validUntil: "2031-05-05" }],
    ["disturbed only after the flight", { disturbedOn: "2031-05-06" }],
    ["disturbed before it was calibrated", { disturbedOn: "2031-03-09" }],
  ])("takes a calibration %s", (_, over) => {
    expect(placardOf(run([coolant], { coolant: { value: 92.5 } }, { programme: withCalibration(over) })).verdict).toBe("within");
  });

  test("takes a recalibration after the flight in place of the one on the card: gain 1, offset 4", () => {
    const calibration = {
      low: 0,
      high: 130,
      expandedUncertainty: 2,
      kind: "linear" as const,
      gain: 1,
      offset: 4,
      id: "again",
      unit: "degC" as const,
    };
    const record = {
      ...calibration,
      method: "bath",
      reference: "R",
      calibratedOn: "2031-06-01",
      validUntil: "2032-06-01",
      disturbedOn: null,
    };
    const report = run([coolant], { coolant: { value: 92.5 } }, { context: { calibrations: { "COOLANT-PANEL": record } } });
    expect(placardOf(report).asTrue).toEqual({ value: 96.5, unit: "degC", expandedUncertainty: 2 });
    const moved = run(
      [coolant],
      { coolant: { value: 92.5 } },
      { context: { calibrations: { "COOLANT-PANEL": { ...record, disturbedOn: "2031-05-20" } } } },
    );
    expect(placardOf(moved).reasons).toEqual(["not calibrated"]);
  });

  test("takes no old calibration for a changed gauge, and says so", () => {
    const report = run([coolant], { coolant: { value: 200, unit: "degF" } });
    expect(placardOf(report)).toMatchObject({ verdict: "no verdict", reasons: ["not calibrated"], onGauge: { value: 200, unit: "degF" } });
    expect(report.findings.map((finding) => finding.code)).toContain("gauge-changed");
  });

  test("without U passes nothing, but what is past the limit stays past it", () => {
    const programme = withCalibration({ expandedUncertainty: null });
    expect(placardOf(run([coolant], { coolant: { value: 92.5 } }, { programme }))).toMatchObject({
      verdict: "no verdict",
      reasons: ["uncertainty unknown"],
    });
    const past = placardOf(run([coolant], { coolant: { value: 115 } }, { programme })); // 117.25
    expect(past).toMatchObject({ verdict: "exceeded", notes: ["uncertainty unknown"] });
  });

  test("calls a missing reading no reading, and holds", () => {
    const report = run([coolant], {});
    expect(placardOf(report)).toMatchObject({ verdict: "no verdict", reasons: ["no reading"], onGauge: null, asTrue: null });
    expect(report.decision).toBe("hold");
  });
});

describe("a point's own limit", () => {
  const tank = (over: Partial<PointLimit>, value: number, kind: Reading["kind"] = "number") => {
    const reading = sampleReading("oat", "single", {
      id: "tank",
      parameter: null,
      instrument: null,
      unit: kind === "count" ? "1" : "mL",
      kind,
    });
    const unit = kind === "count" ? "1" : "mL";
    return lineOf(
      run([reading], { tank: { value } }, { point: { limits: [ownLimit("tank", { unit, value: 150, ...over })] } }),
      "tank",
      "as flown, card",
    );
  };

  test.each([
    [120, "within"],
    [140, "within"],
    [145, "marginal"],
    [151, "exceeded"],
  ])("takes its own U of 10: %d of 150 mL is %s", (value, verdict) => {
    expect(tank({ expandedUncertainty: 10 }, value).verdict).toBe(verdict);
  });

  test("has no verdict without any U, but counts are exact", () => {
    expect(tank({}, 120).reasons).toEqual(["uncertainty unknown"]);
    expect(tank({ value: 3 }, 3, "count")).toMatchObject({ verdict: "within", margin: 0 });
  });

  // A reading of what was held 30 s can show that 12 was passed for 30 s: 13 is past it, 11.5 is within 1 of it.
  test.each([
    [13, "exceeded", "held 0:30 or more"],
    [11.5, "marginal", ""],
    [10, "within", ""],
  ])("judges a sustained limit on the value that was held: %d mm/s is %s", (value, verdict, why) => {
    const held = sampleReading("oat", "highest", { id: "held", parameter: null, instrument: null, unit: "mm/s" });
    const own = ownLimit("held", { unit: "mm/s", value: 12, forS: 30, statistic: "sustained", expandedUncertainty: 1 });
    const line = lineOf(run([held], { held: { value } }, { point: { limits: [own] } }), "held", "as flown, card");
    expect(line).toMatchObject({ verdict, why });
  });

  test("holds the spread of a row of cylinders: 78 − 58 = 20 against 8", () => {
    const held = sampleReading("oat", "series", { id: "held", parameter: null, instrument: null, unit: "psi" });
    const rows = [77, 78, 58, 76].map((value, i) => ({ atS: null, label: `Cyl ${i + 1}`, value }));
    const limits = [ownLimit("held", { unit: "psi", value: 8, statistic: "spread", expandedUncertainty: 1.4 })];
    const line = lineOf(run([held], { held: { rows } }, { point: { limits } }), "held", "as flown, card");
    expect(line).toMatchObject({ verdict: "exceeded", notes: ["clearly"], asTrue: { value: 20, unit: "psi" }, margin: -12 });
  });

  test("holds the change from a baseline, from rows or as given, and asks for one", () => {
    const limits = [ownLimit("held", { unit: "psi", value: 5, statistic: "change from baseline", expandedUncertainty: 1.4 })];
    const series = sampleReading("oat", "series", { id: "held", parameter: null, instrument: null, unit: "psi" });
    const rows = [76, 60].map((value) => ({ atS: null, label: "", value }));
    expect(lineOf(run([series], { held: { rows } }, { point: { limits } }), "held", "as flown, card")).toMatchObject({
      asTrue: { value: 16 },
      verdict: "exceeded",
    });
    const single = { ...series, sampling: "single" as const };
    const given = run([single], { held: { value: 74 } }, { point: { limits }, context: { baselines: { held: 76 } } });
    expect(lineOf(given, "held", "as flown, card")).toMatchObject({ asTrue: { value: 2 }, verdict: "within" });
    const bare = lineOf(run([single], { held: { value: 74 } }, { point: { limits } }), "held", "as flown, card");
    expect(bare).toMatchObject({ verdict: "no verdict", reasons: ["no reading"], why: "no baseline to compare with" });
  });

  test("holds a swing peak to peak over its window: 92.25 − 87.75 = 4.5, U √2 · 1.5", () => {
    const logger = sampleReading("coolant", "series", { instrument: "LOGGER-COOLANT" });
    const limits = [ownLimit("coolant", { value: 6, statistic: "peak to peak", forS: 300, expandedUncertainty: 0.5 })];
    const report = run(
      [logger],
      { coolant: { rows: minuteRows([90, 92.25, 89, 87.75, 90, 91]) } },
      { point: { cardTable: false, limits } },
    );
    const line = lineOf(report, "coolant", "as flown, card");
    expect(line.asTrue?.value).toBeCloseTo(4.5, 9);
    expect(line).toMatchObject({ verdict: "within", why: "peak to peak over 5:00" });
  });
});

describe("a limit on the fall in any minute", () => {
  const rate: Limit = {
    id: "cht-fall",
    parameter: "cht",
    side: "max",
    layer: "card",
    value: 26,
    unit: "degC/min",
    appliesWhen: "always",
    forS: 0,
    statistic: "rate",
    source: "PL-01 rev 2",
    authority: "programme",
  };
  const fall = (rows: ReadingEntry["rows"]) =>
    run([sampleReading("cht", "series")], { cht: { rows } }, { programme: { limits: [rate] } }).lines.filter(
      (line) => line.statistic === "rate",
    );
  const halfMinutes = (values: number[]) => values.map((value, i) => ({ atS: i * 30, label: "", value }));

  // slope 1.04 between 200 and 300 °F: 40 °F is 41.6 true = 23.1 °C; U = 2 · 5 · 1.04/√6/1 min = 4.25 °F = 2.36 °C/min
  test.each([
    [[300, 280, 260, 250], "23.1", "within"],
    [[300, 275, 255, 250], "26.0", "marginal"],
    [[300, 275, 250, 245], "28.9", "exceeded"],
  ])("reads %o as a fall of %s °C/min, %s", (values, perMin, verdict) => {
    const [line] = fall(halfMinutes(values));
    expect(digit(line?.asTrue?.value)).toBe(perMin);
    expect(line?.asTrue?.expandedUncertainty).toBeCloseTo(2.359, 3);
    expect(line?.verdict).toBe(verdict);
  });

  test("has no line where the rows are further apart than the minute, and no reading where they end before it", () => {
    expect(fall([0, 120, 240].map((atS) => ({ atS, label: "", value: 250 })))).toEqual([]);
    expect(fall(halfMinutes([250, 250]))).toEqual([expect.objectContaining({ verdict: "no verdict", reasons: ["no reading"] })]);
  });
});
