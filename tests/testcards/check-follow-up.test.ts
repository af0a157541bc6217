/** Abort discipline, squawks, findings, amendments and the decision that follows. Rules: the team's own; sums by hand. */
import fc from "fast-check";
import { describe, expect, test } from "vitest";
import type { AbortLine, CardPoint, Reading } from "@/lib/testcards/card";
import { checkDebrief } from "@/lib/testcards/check-debrief";
import type { AbortCall, CheckContext, Debrief, PointDebrief, ReadingEntry } from "@/lib/testcards/debrief-types";
import { OUTCOMES } from "@/lib/testcards/words";
import { sampleCard, samplePoint, sampleProgramme, sampleReading } from "./support/sample-card";
import { CONTEXT, checked, lineOf, minuteRows, typedDebrief } from "./support/sample-debrief";

const coolant = sampleReading("coolant", "highest");
const call = (over: Partial<AbortCall>): AbortCall => ({
  point: "p1",
  word: "abort",
  trigger: "coolant",
  onGauge: null,
  durationS: null,
  action: "",
  recovered: null,
  ...over,
});

type Case = {
  point?: Partial<CardPoint>;
  calls?: AbortCall[];
  context?: Partial<CheckContext>;
  said?: Partial<Omit<PointDebrief, "readings">>;
  over?: Partial<Debrief>;
  programme?: Parameters<typeof sampleProgramme>[0];
};

function run(
  readings: Reading[],
  typed: Record<string, Partial<ReadingEntry>>,
  { point, calls = [], context, said, over, programme }: Case = {},
) {
  const card = sampleCard([samplePoint({ readings, ...point })], programme ? { programme } : {});
  const debrief = typedDebrief(card, { p1: { ...said, readings: typed } }, over);
  return checked(card, { ...debrief, safety: { ...debrief.safety, calls } }, context);
}

const disciplineOf = (report: ReturnType<typeof run>, parameter: string, side = "max") =>
  report.points[0]?.disciplines.find((line) => line.parameter === parameter && line.side === side)?.discipline;

describe("abort discipline", () => {
  test.each([
    [102.5, [call({})], "called"],
    [102.5, [], "missed"],
    [100, [call({})], "early"],
    [100, [], null],
    [102.5, [call({ trigger: "Coolant out" })], "called"],
    [102.5, [call({ trigger: "tit" })], "missed"],
    [102.5, [call({ point: "p2" })], "missed"],
  ])("at %d on the gauge with %o: %s", (value, calls, discipline) => {
    expect(disciplineOf(run([coolant], { coolant: { value } }, { calls }), "coolant")).toBe(discipline);
  });

  test("takes a minimum from the lowest, while its condition holds", () => {
    const oil = (conditions: Reading["conditions"]) => [sampleReading("oil-p", "lowest and highest", { conditions })];
    expect(disciplineOf(run(oil(["at power"]), { "oil-p": { lowest: 37.5, value: 50 } }), "oil-p", "min")).toBe("missed");
    expect(disciplineOf(run(oil(["at power"]), { "oil-p": { lowest: 40, value: 50 } }), "oil-p", "min")).toBeNull();
    expect(disciplineOf(run(oil(["idle"]), { "oil-p": { lowest: 20, value: 50 } }), "oil-p", "min")).toBeNull();
  });

  test("takes the number on the instrument it is printed for: the point's own on the repeater", () => {
    const own: AbortLine = {
      kind: "number",
      id: "own",
      parameter: "coolant",
      side: "max",
      instrument: "LOGGER-COOLANT",
      appliesWhen: "always",
      trueValue: 104.5,
      onGauge: 104.5,
      setBy: "rule",
      perMinute: false,
      windowS: null,
      calledBy: "pilot",
    };
    const aborts = { standing: true, lines: [own], ifReached: false };
    const report = run(
      [coolant, sampleReading("coolant", "highest", { id: "repeater", instrument: "LOGGER-COOLANT" })],
      { coolant: { value: 110 }, repeater: { value: 104.4 } },
      { point: { aborts } },
    );
    expect(report.points[0]?.disciplines.filter((line) => line.parameter === "coolant")).toEqual([
      expect.objectContaining({ instrument: "LOGGER-COOLANT", worstOnGauge: 104.4, thresholdOnGauge: 104.5, discipline: null }),
    ]);
  });

  test("counts a fall on the gauge over its window: 40 °F in 60 s reached", () => {
    const fall: AbortLine = {
      kind: "number",
      id: "fall",
      parameter: "cht",
      side: "max",
      instrument: "CHT-PANEL",
      appliesWhen: "always",
      trueValue: 23.5,
      onGauge: 40,
      setBy: "rule",
      perMinute: true,
      windowS: 60,
      calledBy: "pilot",
    };
    const rows = [290, 270, 250, 240].map((value, i) => ({ atS: i * 30, label: "", value }));
    const report = run(
      [sampleReading("cht", "series")],
      { cht: { rows } },
      { point: { aborts: { standing: false, lines: [fall], ifReached: false } } },
    );
    expect(report.points[0]?.disciplines[0]).toMatchObject({ worstOnGauge: 40, discipline: "missed" });
  });

  test("never makes a verdict of it: a called abort stays within, and holds by its outcome alone", () => {
    const report = run([coolant], { coolant: { value: 102.5 } }, { calls: [call({})], said: { outcome: "aborted" } });
    expect(lineOf(report, "coolant", "abort")).toMatchObject({ discipline: "called", required: false });
    expect(report.points[0]).toMatchObject({ worst: "within", decision: "hold", because: ["outcome aborted"] });
  });
});

describe("squawks", () => {
  test("an engine placard exceeded as flown grounds, and holds every point of the card: 117.25 > 115", () => {
    const card = sampleCard([samplePoint({ readings: [coolant] }), samplePoint({ id: "p2" })]);
    const report = checked(card, typedDebrief(card, { p1: { readings: { coolant: { value: 115 } } }, p2: {} }));
    expect(report.squawks).toEqual([
      {
        point: "p1",
        reading: "coolant",
        severity: "grounding",
        text: expect.stringContaining("Coolant out: 117.3\u202f°C as flown, exceeded"),
      },
    ]);
    expect(report.points[1]).toMatchObject({ decision: "hold", because: ["a grounding squawk is open"] });
  });

  test.each([
    ["a placard only marginal as flown, 112.5 + 3", "coolant", 110.5, "before next test"],
    ["a programme limit passed", "coolant", 107.5, "before next test"],
  ])("%s comes before the next test", (_, reading, value, severity) => {
    expect(run([coolant], { [reading]: { value } }).squawks).toEqual([expect.objectContaining({ severity })]);
  });

  test("a placard of the programme's own does not ground", () => {
    const limits = sampleProgramme().limits.map((limit) => ({ ...limit, authority: "programme" as const }));
    expect(run([coolant], { coolant: { value: 115 } }, { programme: { limits } }).squawks).toEqual([
      expect.objectContaining({ severity: "before next test" }),
    ]);
  });

  test("nothing is raised where everything is within", () => {
    expect(run([coolant], { coolant: { value: 90 } }).squawks).toEqual([]);
  });
});

describe("findings", () => {
  const codes = (report: ReturnType<typeof run>) => report.findings.map((finding) => finding.code);
  const flown = (letter: string): Partial<Debrief> => ({ revisionsFlown: [{ card: "card-07", letter, note: "" }] });

  test("another revision flown is a finding and is judged on the one in force", () => {
    const report = run([coolant], { coolant: { value: 90 } }, { over: flown("B") });
    expect(report.findings[0]).toMatchObject({ code: "revision-mismatch", severity: "must" });
    expect(report.card.letter).toBe("C");
    expect(lineOf(report, "coolant", "as flown, card").verdict).toBe("within");
    expect(codes(run([coolant], { coolant: { value: 90 } }, { over: { revisionsFlown: [] } }))).toContain("revision-not-stated");
  });

  test("a reading outside its band asks for confirmation and holds the step either way", () => {
    const expected = { low: 85, high: 91, unit: "degC" as const };
    const read = [sampleReading("coolant", "highest", { expected })];
    const open = run(read, { coolant: { value: 92.5 } });
    expect(codes(open)).toContain("outside-expected-unconfirmed");
    expect(open.points[0]?.outsideExpected).toEqual([{ reading: "coolant", asTrue: 93.0625, unit: "degC", low: 85, high: 91 }]);
    expect(open.decision).toBe("hold");
    const confirmed = run(read, { coolant: { value: 92.5, asRead: true } });
    expect(codes(confirmed)).toContain("outside-expected");
    expect(confirmed.decision).toBe("hold");
    expect(run(read, { coolant: { value: 90 } }).points[0]?.outsideExpected).toEqual([]); // 90.25 true
  });

  test("tells of an exceedance that the pilot did not see, and of a condition not stated", () => {
    expect(codes(run([coolant], { coolant: { value: 107.5 } }))).toContain("exceedance-not-noticed");
    expect(codes(run([coolant], { coolant: { value: 90 } }, { said: { onCondition: null } }))).toContain("condition-not-stated");
    expect(codes(run([coolant], { coolant: { value: 90 } }, { context: { configurationId: null } }))).toContain("configuration-not-stated");
  });
});

describe("amendments", () => {
  test("are judged in place of the raw value, which stays: 58 psi typed, 56 amended", () => {
    const card = sampleCard([samplePoint({ readings: [sampleReading("oil-p", "single")] })]);
    const debrief = typedDebrief(card, { p1: { readings: { "oil-p": { value: 58 } } } });
    const before = structuredClone(debrief);
    const report = checked(card, debrief, { amendments: [{ reading: "oil-p", value: 56 }] });
    expect(lineOf(report, "oil-p", "as flown, placard")).toMatchObject({ onGauge: { value: 56, unit: "psi" }, margin: 19 });
    expect(debrief).toEqual(before);
  });

  test("may name a field by its key, a row of a series, and the last one wins", () => {
    const read = [sampleReading("coolant", "series")];
    const rows = minuteRows([90, 95, 90]);
    const report = run(
      read,
      { coolant: { rows } },
      {
        context: {
          amendments: [
            { reading: "p1.coolant.rows.1", value: 120 },
            { reading: "p1.coolant.rows.1", value: 92.5 },
          ],
        },
      },
    );
    expect(lineOf(report, "coolant", "as flown, placard").onGauge?.value).toBe(92.5);
  });
});

describe("the decision", () => {
  const good = { coolant: { value: 90 } };
  test.each([
    ["nothing against it", {}, "clear to next step"],
    ["a disposition repeat", { context: { dispositions: [{ point: "p1", disposition: "repeat" as const }] } }, "hold"],
    ["a disposition accept", { context: { dispositions: [{ point: "p1", disposition: "accept" as const }] } }, "clear to next step"],
    ["an open grounding squawk", { context: { groundingOpen: true } }, "hold"],
    ["a smaller step by the prediction", { context: { starts: [{ point: "p1", decision: "smaller step" as const }] } }, "smaller step"],
    ["an outcome of part", { said: { outcome: "part" as const } }, "hold"],
    ["no outcome", { said: { outcome: null } }, "hold"],
    ["another configuration", { context: { configurationId: "c-15" } }, "hold"],
  ])("with %s", (_, more, decision) => {
    expect(run([coolant], good, more).decision).toBe(decision);
  });

  test("a marginal verdict allows a smaller step at best: 70 + 3 > 72 psi", () => {
    expect(run([sampleReading("oil-p", "highest")], { "oil-p": { value: 70 } }).decision).toBe("smaller step");
  });

  test("a card without points proves nothing", () => {
    const card = sampleCard([]);
    expect(checked(card, typedDebrief(card, {})).decision).toBe("hold");
  });
});

describe("whatever is typed", () => {
  const number = fc.oneof(fc.constant(null), fc.double({ noNaN: true, noDefaultInfinity: true }), fc.integer({ min: -300, max: 1200 }));
  const unit = fc.constantFrom(null, null, "degF" as const, "psi" as const, "degC" as const);
  const row = fc.record({
    atS: fc.oneof(fc.constant(null), fc.integer({ min: -10, max: 4000 })),
    label: fc.string({ maxLength: 4 }),
    value: fc.integer({ min: -300, max: 900 }),
  });
  const entry = fc.record({
    value: number,
    lowest: number,
    atS: number,
    altitudeFt: number,
    oat: number,
    sameMomentAs: fc.constantFrom(null, "coolant", "cht", "tit"),
    rows: fc.array(row, { maxLength: 8 }),
    unit,
  });
  const readings = [
    coolant,
    sampleReading("cht", "series"),
    sampleReading("tit", "single"),
    sampleReading("iat", "lowest and highest"),
    sampleReading("oil-p", "lowest"),
    sampleReading("oat", "series"),
  ];
  const rules = ["stabilised", "5 min past peak", "whole run", "none"] as const;

  test("never throws and never answers with NaN", () => {
    fc.assert(
      fc.property(
        fc.constantFrom(...rules),
        fc.constantFrom("air" as const, "ground" as const),
        fc.constantFrom(null, ...OUTCOMES),
        fc.tuple(entry, entry, entry, entry, entry, entry),
        number,
        (rule, place, outcome, entries, ranForS) => {
          const card = sampleCard([samplePoint({ readings, place, completion: { rule, runS: null, pastPeakS: null } })]);
          const typed = Object.fromEntries(readings.map((reading, i) => [reading.id, entries[i] ?? {}]));
          const debrief = typedDebrief(card, { p1: { outcome, ranForS, topAltitudeFt: ranForS, readings: typed } });
          const weather = {
            ...debrief.weather,
            oat: { value: ranForS ?? 0, unit: "psi" as const },
            qnh: { value: ranForS ?? 0, unit: "hPa" as const },
          };
          const report = checkDebrief(card, { ...debrief, weather }, { ...CONTEXT, stationPressureAltitudeFt: null });
          expect(
            JSON.stringify(report, (_, value) => (typeof value === "number" && !Number.isFinite(value) ? "BROKEN" : value)),
          ).not.toContain("BROKEN");
          for (const line of report.lines) expect(line.verdict === "no verdict").toBe(line.reasons.length > 0);
        },
      ),
      { numRuns: 300 },
    );
  });
});
