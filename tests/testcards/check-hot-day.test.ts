/** The hot day and the completion rules. Sums by hand: metric hot day 38 − 1.98 °C per 1000 ft; coolant gauge as in the sample card. */
import { describe, expect, test } from "vitest";
import type { CardPoint, Reading } from "@/lib/testcards/card";
import type { CheckContext, Debrief, PointDebrief, ReadingEntry } from "@/lib/testcards/debrief-types";
import { sampleCard, samplePoint, sampleProgramme, sampleReading } from "./support/sample-card";
import { checked, digit, lineOf, minuteRows, typedDebrief } from "./support/sample-debrief";

type Case = {
  point?: Partial<CardPoint>;
  programme?: Parameters<typeof sampleProgramme>[0];
  context?: Partial<CheckContext>;
  said?: Partial<Omit<PointDebrief, "readings" | "point">>;
  weather?: Partial<Debrief["weather"]>;
};

const WEATHER: Debrief["weather"] = { oat: null, qnh: null, windFromDeg: null, windKt: null, turbulence: null };
const whole: CardPoint["completion"] = { rule: "whole run", runS: 600, pastPeakS: null };

function hot(
  readings: Reading[],
  typed: Record<string, Partial<ReadingEntry>>,
  { point, programme, context, said, weather }: Case = {},
  of = "coolant",
) {
  const card = sampleCard([samplePoint({ readings, completion: whole, ...point })], programme ? { programme } : {});
  const debrief = typedDebrief(card, { p1: { ranForS: 600, ...said, readings: typed } }, { weather: { ...WEATHER, ...weather } });
  return lineOf(checked(card, debrief, context), of, "hot day, placard");
}

const coolant = sampleReading("coolant", "highest");
const oat = sampleReading("oat", "single");
const withOat = { coolant: { value: 92.5, atS: 300 }, oat: { value: 21 } };

describe("the air of the hottest moment", () => {
  test("on the ground is the point's own, at the height of elevation and QNH: 350 ft at 1013.25", () => {
    const line = hot([coolant, oat], withOat, {
      context: { stationPressureAltitudeFt: null },
      weather: { qnh: { value: 1013.25, unit: "hPa" } },
    });
    expect(line.hotDay?.pressureAltitudeFt).toBeCloseTo(350, 6);
    expect(digit(line.hotDay?.value)).toBe("109.4"); // 93.06 + 16.31
    expect(line.verdict).toBe("within");
  });

  test("falls back to the weather's, and prefers the moment's", () => {
    const weather = { oat: { value: 69.8, unit: "degF" as const } }; // 21 °C
    expect(digit(hot([coolant], { coolant: { value: 92.5 } }, { weather }).hotDay?.value)).toBe("109.4");
    const own = hot([coolant, oat], { ...withOat, coolant: { value: 92.5, oat: 31 } }, { weather });
    expect(own.hotDay?.ambient.value).toBeCloseTo(31, 9);
  });

  // Rows 90, 92.5 on the gauge in level flight: 93.06 true. At 3000 ft metric: 38 − 5.94 = 32.06; less 12 is 20.06: 113.1.
  test("of rows flown is what was given for where they are highest", () => {
    const series = sampleReading("coolant", "series");
    const level = { place: "air" as const };
    const typed = { rows: minuteRows([90, 92.5], 10), altitudeFt: 3000, oat: 12 };
    const line = hot([series], { coolant: typed }, { point: level });
    expect(line.hotDay?.pressureAltitudeFt).toBe(3000);
    expect(digit(line.hotDay?.value)).toBe("113.1");
    expect(hot([series], { coolant: { rows: typed.rows } }, { point: level })).toMatchObject({
      verdict: "no verdict",
      reasons: ["no reading"],
      why: "no outside air temperature at that moment",
    });
  });

  test("is refused where no air is so cold, on a table or without one", () => {
    const cold = { ...withOat, coolant: { value: 92.5, oat: -400 } };
    expect(hot([coolant, oat], cold)).toMatchObject({ verdict: "no verdict", reasons: ["no reading"], hotDay: null });
    const bare = { instruments: sampleProgramme().instruments.filter(({ parameter }) => parameter !== "oat") };
    const line = hot([coolant], { coolant: { value: 92.5, oat: -400 } }, { programme: bare });
    expect(line).toMatchObject({ verdict: "no verdict", reasons: ["no reading"], why: "the outside air temperature cannot be right" });
  });

  test("is asked for: no QNH, no outside air, no hot-day basis", () => {
    const noQnh = hot([coolant, oat], withOat, { context: { stationPressureAltitudeFt: null } });
    expect(noQnh).toMatchObject({
      verdict: "no verdict",
      reasons: ["no reading"],
      why: "no QNH for the height of the ground",
      hotDay: null,
    });
    expect(hot([coolant], { coolant: { value: 92.5 } })).toMatchObject({
      reasons: ["no reading"],
      why: "no outside air temperature at that moment",
    });
    expect(hot([coolant, oat], withOat, { programme: { hotDayBasis: null } }).why).toBe("the programme's hot-day basis is not set");
  });

  test("in the air is never the ground's, nor one without its height", () => {
    const air = {
      point: { place: "air" as const },
      weather: { oat: { value: 21, unit: "degC" as const }, qnh: { value: 1013, unit: "hPa" as const } },
    };
    expect(hot([coolant, oat], withOat, air)).toMatchObject({ verdict: "no verdict", reasons: ["no reading"] });
    expect(hot([coolant], { coolant: { value: 92.5, oat: 12 } }, air)).toMatchObject({
      reasons: ["no reading"],
      why: "no height at that moment",
    });
    const full = hot([coolant], { coolant: { value: 92.5, oat: 12, altitudeFt: 3000 } }, air);
    expect(digit(full.hotDay?.value)).toBe("113.1"); // 93.06 + 38 − 5.94 − 12
  });

  test("comes from the same row of a climb's grid, its height from the row's name", () => {
    const rows = (values: number[]) => values.map((value, i) => ({ atS: i * 60, label: String(i + 1), value }));
    const grid = { head: "1000 ft", unit: null, by: "height" as const, rows: ["1", "2", "3"], timeColumn: true };
    const line = hot(
      [sampleReading("coolant", "series"), sampleReading("oat", "series")],
      { coolant: { rows: rows([80, 95, 90]) }, oat: { rows: rows([20, 18, 16]) } },
      { point: { place: "air", grid } },
    );
    expect(line.hotDay).toMatchObject({ pressureAltitudeFt: 2000 });
    expect(line.hotDay?.ambient.value).toBeCloseTo(18, 9);
  });

  test("is corrected by its own gauge, whose U joins in: √(3² + 2²)", () => {
    const gauge = { ...calibrationOf("OAT"), kind: "linear" as const, gain: 1, offset: -1, expandedUncertainty: 2 };
    const line = hot([coolant, oat], withOat, { programme: replace("OAT", gauge) });
    expect(line.hotDay?.ambient.value).toBeCloseTo(20, 9);
    expect(line.hotDay?.expandedUncertainty).toBeCloseTo(Math.sqrt(13), 9);
  });

  test("read on a gauge that is not calibrated on the day gives no verdict", () => {
    const line = hot([coolant, oat], withOat, { programme: replace("OAT", { ...calibrationOf("OAT"), validUntil: "2031-05-02" }) });
    expect(line).toMatchObject({ verdict: "no verdict", reasons: ["not calibrated"], why: "OAT was calibrated until 2031-05-02" });
    const cold = hot([coolant, oat], { ...withOat, oat: { value: -25 } });
    expect(cold.reasons).toEqual(["outside calibrated range"]);
  });

  test("hotter than the hot day takes nothing off", () => {
    const line = hot([coolant, oat], { ...withOat, oat: { value: 41 } });
    expect(line.hotDay?.clamped).toBe(true);
    expect(line.hotDay?.difference).toBeCloseTo(-3.693, 6);
    expect(line.hotDay?.value).toBeCloseTo(93.0625, 9);
  });
});

function calibrationOf(id: string) {
  const found = sampleProgramme().instruments.find((instrument) => instrument.id === id)?.calibration;
  if (!found) throw new Error(id);
  return found;
}
function replace(id: string, calibration: ReturnType<typeof calibrationOf>) {
  return { instruments: sampleProgramme().instruments.map((one) => (one.id === id ? { ...one, calibration } : one)) };
}

describe("what takes the hot-day verdict away", () => {
  test("a short run proves no pass, but it proves a failure: 101.5 + 16.31 = 117.8 > 115", () => {
    const early = { said: { ranForS: 599 } };
    expect(hot([coolant, oat], withOat, early)).toMatchObject({
      verdict: "no verdict",
      reasons: ["stopped early"],
      informationOnly: true,
      why: "ran 9:59 of 10:00",
    });
    const past = hot([coolant, oat], { ...withOat, coolant: { value: 100 } }, early);
    expect(past).toMatchObject({ verdict: "exceeded", reasons: [] });
    expect(past.notes).toEqual(["by less than U", "stopped early"]);
  });

  test("off condition always does, even past the limit; as flown it takes nothing", () => {
    const trail = { said: { positions: [{ control: "COWL", position: "TRAIL" }] } };
    const line = hot([coolant, oat], { ...withOat, coolant: { value: 100 } }, trail);
    expect(line).toMatchObject({ verdict: "no verdict", reasons: ["off condition"], why: "flown COWL TRAIL, the card says OPEN" });
    expect(hot([coolant, oat], withOat, { said: { onCondition: false } }).reasons).toEqual(["off condition"]);
    const card = sampleCard([samplePoint({ readings: [coolant, oat] })]);
    const report = checked(card, typedDebrief(card, { p1: { ...trail.said, readings: withOat } }));
    expect(lineOf(report, "coolant", "as flown, placard").verdict).toBe("within");
    expect(report).toMatchObject({ decision: "hold" });
  });

  test("another configuration always does, even past the limit", () => {
    const other = { context: { configurationId: "c-15" } };
    const line = hot([coolant, oat], { ...withOat, coolant: { value: 100 } }, other);
    expect(line).toMatchObject({ verdict: "no verdict", reasons: ["wrong configuration"], why: "the card is for configuration C-14" });
    const card = sampleCard([samplePoint({ readings: [coolant, oat] })]);
    const report = checked(card, typedDebrief(card, { p1: { readings: withOat } }), other.context);
    expect(lineOf(report, "coolant", "as flown, card").verdict).toBe("within");
    expect(report).toMatchObject({ decision: "hold" });
  });

  test("lists every reason in the fixed order", () => {
    const line = hot([coolant, oat], withOat, {
      context: { configurationId: "c-15" },
      said: { ranForS: 60, onCondition: false },
      programme: replace("COOLANT-PANEL", { ...calibrationOf("COOLANT-PANEL"), validUntil: "2031-05-02", expandedUncertainty: null }),
    });
    expect(line.reasons).toEqual(["wrong configuration", "not calibrated", "uncertainty unknown", "off condition", "stopped early"]);
  });

  test("is not required of a point without a completion rule", () => {
    const line = hot([coolant, oat], withOat, { point: { completion: { rule: "none", runS: null, pastPeakS: null } } });
    expect(line).toMatchObject({ verdict: "no verdict", reasons: ["stopped early"], informationOnly: true, required: false });
    expect(digit(line.hotDay?.value)).toBe("109.4");
  });
});

describe("completion", () => {
  const rule = (completion: Partial<CardPoint["completion"]>): Partial<CardPoint> => ({
    completion: { rule: "whole run", runS: null, pastPeakS: null, ...completion },
  });
  const air = { place: "air" as const, ...rule({ rule: "5 min past peak" }) };
  const top = { value: 92.5, atS: 600, altitudeFt: 5900, oat: 7 };

  test.each([
    [900, 9000, []],
    [899, 9000, ["stopped early"]],
    [900, 8990, ["stopped early"]],
    [900, null, ["stopped early"]],
    [null, 9000, ["stopped early"]],
  ])("ran %s s past a highest at 600, to %s ft: %o", (ranForS, topAltitudeFt, reasons) => {
    expect(hot([coolant], { coolant: top }, { point: air, said: { ranForS, topAltitudeFt } }).reasons).toEqual(reasons);
  });

  test("needs the time of each parameter's own highest", () => {
    const line = hot([coolant], { coolant: { ...top, atS: null } }, { point: air, said: { ranForS: 900, topAltitudeFt: 9500 } });
    expect(line).toMatchObject({ reasons: ["stopped early"], why: "time of the highest value not given" });
  });

  test("asks no height of an engine without a critical altitude", () => {
    const aircraft = { ...sampleProgramme().aircraft, criticalAltitudeFt: null };
    expect(hot([coolant], { coolant: top }, { point: air, programme: { aircraft }, said: { ranForS: 900 } }).reasons).toEqual([]);
  });

  test("logs a soak to its peak and the time written past it", () => {
    const soak = { point: rule({ pastPeakS: 600 }), said: { ranForS: null } };
    const rows = (minutes: number) => minuteRows([88, 92, 90, ...Array<number>(minutes - 2).fill(85)]); // highest at 1 min
    const read = [sampleReading("coolant", "series"), oat];
    expect(hot(read, { coolant: { rows: rows(11) }, oat: { value: 21 } }, soak).reasons).toEqual([]);
    expect(hot(read, { coolant: { rows: rows(10) }, oat: { value: 21 } }, soak)).toMatchObject({
      reasons: ["stopped early"],
      why: "ran 9:00 of 10:00 past the highest",
    });
  });

  test("takes the written steps where the card gives no time for the whole run", () => {
    const steps = [300, 600].map((durationS, i) => ({
      id: `s${i}`,
      text: "hold",
      kind: "power" as const,
      durationS,
      rpm: null,
      manifoldPressureInHg: null,
    }));
    const line = hot([coolant, oat], withOat, { point: { ...rule({}), steps }, said: { ranForS: 890 } });
    expect(line.why).toBe("ran 14:50 of 15:00");
  });

  test("needs rows to call a temperature steady, close enough together, and not rising", () => {
    const stabilised = { point: rule({ rule: "stabilised" }) };
    const series = [sampleReading("coolant", "series"), oat];
    const of = (rows: ReadingEntry["rows"]) => hot(series, { coolant: { rows }, oat: { value: 21 } }, stabilised);
    expect(hot([coolant, oat], withOat, stabilised)).toMatchObject({
      reasons: ["not stabilised"],
      why: "Coolant out has no rows to show that it was steady",
    });
    expect(of(minuteRows(Array<number>(6).fill(92.5))).reasons).toEqual([]);
    expect(of(minuteRows(Array<number>(5).fill(92.5))).why).toBe("Coolant out slope known to 0.57 of 0.556 °C/min"); // 2.296/4
    expect(of(minuteRows([82.5, 85, 87.5, 90, 92.5, 95])).why).toMatch(/^Coolant out changing 2\.[78] of 1\.11 °C\/min$/); // 2.5 × 1.125 = 2.8 above 80
    expect(of([0, 150, 300].map((atS) => ({ atS, label: "", value: 92.5 }))).reasons).toEqual(["not stabilised"]);
    expect(of(Array.from({ length: 6 }, (_, i) => ({ atS: null, label: String(i), value: 92.5 }))).reasons).toEqual(["not stabilised"]);
  });

  test("places rows of a grid by time where their labels say", () => {
    const grid = { head: "min", unit: "min" as const, by: "time" as const, rows: ["8", "9"], timeColumn: false };
    const rows = Array.from({ length: 6 }, (_, i) => ({ atS: null, label: String(8 + i), value: 92.5 }));
    const line = hot(
      [sampleReading("coolant", "series"), oat],
      { coolant: { rows }, oat: { value: 21 } },
      { point: { ...rule({ rule: "stabilised" }), grid } },
    );
    expect(line.reasons).toEqual([]);
  });

  test("lets every other reading follow the worst of those that must be steady", () => {
    const readings = [sampleReading("coolant", "series"), sampleReading("cht", "series"), sampleReading("tit", "highest"), oat];
    const typed = {
      coolant: { rows: minuteRows(Array<number>(6).fill(92.5)) },
      cht: { rows: minuteRows([255, 255, 255]) },
      tit: { value: 790 },
      oat: { value: 21 },
    };
    const of = (reading: string) => hot(readings, typed, { point: rule({ rule: "stabilised" }) }, reading).reasons;
    expect([of("coolant"), of("cht"), of("tit")]).toEqual([[], ["not stabilised"], ["not stabilised"]]);
  });
});
