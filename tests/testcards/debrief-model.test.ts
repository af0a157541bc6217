/** Asked and refused: the field list against the practice of the debrief, refusal ranges and the expected bands turned to the gauge by hand. */
import { describe, expect, test } from "vitest";
import { askAsRead, debriefModel, secondsOf } from "@/lib/testcards/debrief";
import { emptyDebrief } from "@/lib/testcards/debrief-blank";
import type { Debrief, DebriefField, DebriefTimes, ReadingEntry } from "@/lib/testcards/debrief-types";
import { minutesBetween, validateDebrief } from "@/lib/testcards/validate-debrief";
import type { SortieKind } from "@/lib/testcards/words";
import { sampleCard, samplePoint, sampleReading } from "./support/sample-card";
import { typedDebrief } from "./support/sample-debrief";

const climb = samplePoint({
  id: "p1",
  place: "air",
  completion: { rule: "5 min past peak", runS: null, pastPeakS: null },
  readings: [
    sampleReading("coolant", "highest", { expected: { low: 75, high: 98, unit: "degC" } }),
    sampleReading("oil-p", "lowest and highest"),
    sampleReading("cht", "series", { recordedBy: "recorder" }),
    sampleReading("oat", "single", { id: "tries", parameter: null, instrument: null, unit: null, kind: "count", low: 0, high: 3 }),
    sampleReading("oat", "single", { id: "leak", parameter: null, instrument: null, unit: null, kind: "yes-no" }),
    sampleReading("oat", "single", {
      id: "rough",
      parameter: null,
      instrument: null,
      unit: null,
      kind: "choice",
      choices: ["0", "1", "2"],
    }),
    sampleReading("oat", "single", { id: "remark", parameter: null, instrument: null, unit: null, kind: "text" }),
    sampleReading("oat", "single", { id: "sheet", parameter: null, instrument: null, unit: null, kind: "photo" }),
  ],
  grid: { head: "min", unit: "min", by: "time", rows: ["0", "0:30", "2"], timeColumn: false },
});
const ground = samplePoint({
  id: "p2",
  completion: { rule: "whole run", runS: 900, pastPeakS: null },
  readings: [sampleReading("coolant", "highest")],
});
const card = sampleCard([climb, ground]);
const fields = debriefModel(card);
const fieldOf = (key: string): DebriefField => {
  const found = fields.find((candidate) => candidate.key === key);
  if (!found) throw new Error(`no field ${key}`);
  return found;
};

describe("debriefModel", () => {
  test("asks revision, times, fuel, weather, the three safety questions, then point by point in card order", () => {
    expect(fields.map((field) => field.key)).toEqual([
      "revisionsFlown.card-07",
      "times.offBlocks",
      "times.takeOff",
      "times.landing",
      "times.onBlocks",
      "fuel.start",
      "fuel.end",
      "fuel.uplift",
      "weather.oat",
      "weather.qnh",
      "weather.windFromDeg",
      "weather.windKt",
      "weather.turbulence",
      "safety.limitExceeded",
      "safety.callMade",
      "safety.rough",
      "p1.outcome",
      "p1.positions.COWL",
      "p1.onCondition",
      "p1.ranForS",
      "p1.topAltitudeFt",
      "p1.coolant.value",
      "p1.coolant.atS",
      "p1.coolant.altitudeFt",
      "p1.coolant.oat",
      "p1.oil-p.lowest",
      "p1.oil-p.value",
      "p1.cht.rows",
      "p1.cht.altitudeFt",
      "p1.cht.oat",
      "p1.tries.value",
      "p1.leak.answer",
      "p1.rough.answer",
      "p1.remark.answer",
      "p1.sheet.answer",
      "p1.comment",
      "p2.outcome",
      "p2.positions.COWL",
      "p2.onCondition",
      "p2.ranForS",
      "p2.coolant.value",
      "p2.coolant.atS",
      "p2.coolant.oat",
      "p2.comment",
    ]);
  });

  test.each<[SortieKind, string[]]>([
    ["flight", ["times.offBlocks", "times.takeOff", "times.landing", "times.onBlocks"]],
    ["taxi", ["times.offBlocks", "times.onBlocks"]],
    ["ground run", ["times.engineStart", "times.engineStop"]],
    ["inspection", ["times.start", "times.end"]],
  ])("asks a %s for its own times only", (kind, keys) => {
    const asked = debriefModel(card, kind).filter((field) => field.part === "time");
    expect(asked.map((field) => field.key)).toEqual(keys);
  });

  // true 75 -> 76.24 on the gauge, next mark up 77.5; true 98 -> 96.89, next mark down 95
  test("prints the expected band inward on readable marks", () => {
    expect(fieldOf("p1.coolant.value")).toMatchObject({ unit: "degC", low: 0, high: 130, step: 2.5, expected: { low: 77.5, high: 95 } });
  });

  test("keeps the gauge's own unit and names what the sampling asks", () => {
    expect(fieldOf("p1.cht.rows")).toMatchObject({ kind: "series", unit: "degF", low: 100, high: 400, recordedBy: "recorder" });
    expect(fieldOf("p1.cht.rows").rows).toEqual([
      { label: "0", atS: 0 },
      { label: "0:30", atS: 30 },
      { label: "2", atS: 120 },
    ]);
    expect(fieldOf("p1.oil-p.lowest").part).toBe("lowest");
    expect(fieldOf("p1.oil-p.value").part).toBe("highest");
    expect(fieldOf("p1.tries.value")).toMatchObject({ kind: "count", low: 0, high: 3, step: 1 });
  });

  test("asks when rows were highest only where their labels are no times", () => {
    const keysBy = (by: "time" | "free") =>
      debriefModel(sampleCard([{ ...climb, grid: { head: "at", unit: null, by, rows: ["1", "2"], timeColumn: false } }])).map(
        ({ key }) => key,
      );
    expect(keysBy("time")).not.toContain("p1.cht.atS");
    expect(keysBy("free")).toContain("p1.cht.atS");
  });

  test("offers a position for the ground only on the ground", () => {
    expect(fieldOf("p1.positions.COWL").choices).toEqual(["SHUT", "TRAIL", "OPEN", "other"]);
    expect(fieldOf("p2.positions.COWL").choices).toEqual(["SHUT", "TRAIL", "OPEN", "REMOVED", "other"]);
  });

  test("requires the safety answers and the outcomes, nothing else", () => {
    expect(fields.filter((field) => field.required).map((field) => field.key)).toEqual([
      "safety.limitExceeded",
      "safety.callMade",
      "safety.rough",
      "p1.outcome",
      "p2.outcome",
    ]);
  });

  test("asks nothing expected of a gauge without a calibration", () => {
    const instruments = card.programme.instruments.map((instrument) => ({ ...instrument, calibration: null }));
    const bare = debriefModel(sampleCard([climb], { programme: { instruments } })).find((field) => field.key === "p1.coolant.value");
    expect(bare?.expected).toBeNull();
  });

  test.each([
    [77.4, true],
    [77.5, false],
    [95, false],
    [95.1, true],
  ])("asks as read? of %d on the gauge: %s", (value, asks) => {
    expect(askAsRead(fieldOf("p1.coolant.value"), value)).toBe(asks);
  });

  test.each([
    ["8", 480],
    ["8 min", 480],
    ["+3", 180],
    ["12:30", 750],
    ["1.5", 90],
    ["start", null],
    ["1000 ft", null],
  ])("reads the row label %s as %s seconds", (label, seconds) => {
    expect(secondsOf(label)).toBe(seconds);
  });
});

describe("emptyDebrief", () => {
  test("pre-sets positions and says nothing else", () => {
    const blank = emptyDebrief([card], "flight");
    expect(blank.points.map((point) => point.positions)).toEqual([
      [{ control: "COWL", position: "OPEN" }],
      [{ control: "COWL", position: "OPEN" }],
    ]);
    expect(blank.points.every((point) => point.outcome === null && point.onCondition === null)).toBe(true);
    expect(blank.points[0]?.readings.every((entry) => entry.value === null && entry.rows.length === 0)).toBe(true);
    expect(validateDebrief(card, blank)).toEqual([]);
  });
});

describe("validateDebrief", () => {
  const with_ = (over: Partial<Debrief>): Debrief => typedDebrief(card, { p1: {}, p2: {} }, over);
  const keysOf = (debrief: Debrief, complete = false) => validateDebrief(card, debrief, { complete }).map((error) => error.key);
  const times = (kind: SortieKind, given: Partial<DebriefTimes>): Debrief => {
    const debrief = with_({ kind });
    return { ...debrief, times: { ...debrief.times, ...given } };
  };
  const entry = (reading: string, said: Partial<ReadingEntry>, point: { ranForS?: number } = {}): Debrief =>
    typedDebrief(card, { p1: { ...point, readings: { [reading]: said } }, p2: {} });

  test.each<[string, Partial<DebriefTimes>, string[]]>([
    ["in order", { offBlocks: "09:12", takeOff: "09:21", landing: "10:04", onBlocks: "10:10" }, []],
    ["over midnight", { offBlocks: "23:40", takeOff: "23:52", landing: "00:35", onBlocks: "00:41" }, []],
    [
      "with a landing before the take-off",
      { offBlocks: "09:12", takeOff: "09:21", landing: "09:04", onBlocks: "10:10" },
      ["times.landing"],
    ],
    ["airborne exactly three hours", { takeOff: "09:00", landing: "12:00" }, []],
    ["airborne for more than three hours", { takeOff: "09:00", landing: "12:01" }, ["times.landing"]],
    ["that do not exist", { offBlocks: "24:00", takeOff: "9:5" }, ["times.offBlocks", "times.takeOff"]],
  ])("judges times %s", (_, given, keys) => {
    expect(keysOf(times("flight", given))).toEqual(keys);
  });

  test("says which two times to check", () => {
    const [error] = validateDebrief(card, times("flight", { takeOff: "09:21", landing: "09:04" }));
    expect(error?.message).toBe("Landing 09:04 is before take-off 09:21: check both.");
  });

  test("reckons minutes over midnight", () => {
    expect(minutesBetween("09:12", "10:10")).toBe(58);
    expect(minutesBetween("23:52", "00:35")).toBe(43);
    expect(minutesBetween(null, "00:35")).toBeNull();
  });

  // 23.8 US gal = 90.09 L, past the tanks' 90; 64.8 kg at 0.72 = 90.0 L, just inside
  test.each([
    [{ value: 90, unit: "L" as const }, []],
    [{ value: 90.1, unit: "L" as const }, ["fuel.start"]],
    [{ value: 23.8, unit: "USgal" as const }, ["fuel.start"]],
    [{ value: 64.8, unit: "kg" as const }, []],
    [{ value: -1, unit: "L" as const }, ["fuel.start"]],
    [{ value: Number.NaN, unit: "L" as const }, ["fuel.start"]],
    [{ value: 40, unit: "psi" as const }, ["fuel.start"]],
  ])("judges fuel %o", (start, keys) => {
    expect(keysOf(with_({ fuel: { start, end: null, uplift: null } }))).toEqual(keys);
  });

  test("refuses more fuel at the end than at the start unless there was an uplift", () => {
    const start = { value: 40, unit: "L" as const };
    const end = { value: 50, unit: "L" as const };
    expect(keysOf(with_({ fuel: { start, end, uplift: null } }))).toEqual(["fuel.end"]);
    expect(keysOf(with_({ fuel: { start, end, uplift: { value: 24, unit: "L" } } }))).toEqual([]);
  });

  test.each([
    [{ oat: { value: -30, unit: "degC" as const } }, []],
    [{ oat: { value: 51, unit: "degC" as const } }, ["weather.oat"]],
    [{ oat: { value: 86, unit: "degF" as const } }, []], // 30 °C
    [{ qnh: { value: 939, unit: "hPa" as const } }, ["weather.qnh"]],
    [{ qnh: { value: 29.92, unit: "inHg" as const } }, []],
    [{ qnh: { value: 31.1, unit: "inHg" as const } }, ["weather.qnh"]],
    [{ windFromDeg: 361 }, ["weather.windFromDeg"]],
    [{ windKt: 41 }, ["weather.windKt"]],
  ])("judges weather %o", (weather, keys) => {
    const blank = with_({});
    expect(keysOf({ ...blank, weather: { ...blank.weather, ...weather } })).toEqual(keys);
  });

  test.each<[string, Partial<ReadingEntry>, string[]]>([
    ["coolant", { value: 130 }, []],
    ["coolant", { value: 130.5 }, ["p1.coolant.value"]],
    ["coolant", { value: -1 }, ["p1.coolant.value"]],
    ["coolant", { value: Number.POSITIVE_INFINITY }, ["p1.coolant.value"]],
    ["coolant", { value: 200, unit: "degF" }, []], // 93.3 °C on a changed gauge
    ["coolant", { value: 300, unit: "degF" }, ["p1.coolant.value"]], // 148.9 °C
    ["coolant", { value: 50, unit: "psi" }, ["p1.coolant.value"]],
    ["coolant", { oat: 51 }, ["p1.coolant.oat"]],
    ["coolant", { altitudeFt: -201 }, ["p1.coolant.altitudeFt"]],
    ["coolant", { sameMomentAs: "nothing" }, ["p1.coolant.atS"]],
    ["oil-p", { lowest: 60, value: 50 }, ["p1.oil-p.lowest"]],
    ["tries", { value: 2.5 }, ["p1.tries.value"]],
    ["tries", { value: 4 }, ["p1.tries.value"]],
    ["rough", { answer: "5" }, ["p1.rough.answer"]],
    ["remark", { answer: "x".repeat(501) }, ["p1.remark.answer"]],
    ["cht", { rows: [{ atS: 0, label: "0", value: 99 }] }, ["p1.cht.rows"]],
    [
      "cht",
      {
        rows: [
          { atS: 60, label: "1", value: 200 },
          { atS: 30, label: "0:30", value: 210 },
        ],
      },
      ["p1.cht.rows"],
    ],
  ])("judges %s %o", (reading, said, keys) => {
    expect(keysOf(entry(reading, said))).toEqual(keys);
  });

  test("refuses a moment after the end of the point", () => {
    expect(keysOf(entry("coolant", { value: 90, atS: 700 }, { ranForS: 600 }))).toEqual(["p1.coolant.atS"]);
  });

  test("says what is possible and keeps the words of the gauge", () => {
    const [error] = validateDebrief(card, entry("coolant", { value: 860 }));
    expect(error?.message).toBe("coolant: possible are 0 to 130\u202f°C. Check the number and which gauge it is from.");
  });

  test("misses safety answers and outcomes only when the debrief is to be complete", () => {
    const blank = emptyDebrief(card, "flight");
    expect(keysOf(blank)).toEqual([]);
    expect(keysOf(blank, true)).toEqual(["safety.limitExceeded", "safety.callMade", "safety.rough", "p1.outcome", "p2.outcome"]);
  });

  test("refuses text past 500 characters and says by how many", () => {
    expect(validateDebrief(card, with_({ comment: "y".repeat(520) }))).toEqual([
      { key: "comment", message: "Shorten this by 20 characters: 500 fit." },
    ]);
    const squawks = [{ id: "s1", system: "cowl", text: "z".repeat(501), flyAgain: null }];
    expect(keysOf(with_({ squawks }))).toEqual(["squawks.s1.text"]);
  });
});
