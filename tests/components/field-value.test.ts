import { describe, expect, test } from "vitest";
import { parseClock, parseFigure, parseStopwatch, readTyped } from "@/components/debrief/field-value";

describe("what is typed on the phone", () => {
  test.each([
    ["92.5", 92.5],
    ["92,5", 92.5],
    ["−5", -5],
    ["1e9", null],
    ["NaN", null],
    ["", null],
    ["9🙂", null],
  ])("reads the figure %j as %s", (typed, value) => {
    expect(parseFigure(typed)).toBe(value);
  });

  test.each([
    ["5:20", 320],
    ["520", 320],
    ["12", 720],
    ["5:60", null],
    ["x", null],
  ])("reads the stopwatch %j as %s s", (typed, value) => {
    expect(parseStopwatch(typed)).toBe(value);
  });

  test.each([
    ["0912", "09:12"],
    ["9:12", "09:12"],
    ["23.59", "23:59"],
    ["24:00", null],
    ["12", null],
  ])("reads the time %j as %s", (typed, value) => {
    expect(parseClock(typed)).toBe(value);
  });
});

describe("what a typed text means for its field", () => {
  const field = {
    key: "p.outcome",
    section: "point",
    point: "p",
    reading: null,
    part: "outcome",
    label: "Outcome",
    kind: "choice",
    unit: null,
    low: null,
    high: null,
    step: null,
    expected: null,
    choices: ["flown", "skipped"],
    rows: [],
    required: true,
    recordedBy: "pilot",
  } as const;

  test("keeps a choice, a yes or no and words as they are", () => {
    for (const kind of ["choice", "yes-no", "text", "photo"] as const)
      expect(readTyped({ ...field, kind, choices: [], rows: [] }, "flown")).toEqual({ value: "flown", problem: null });
  });

  test("says what to write where a figure is none", () => {
    expect(readTyped({ ...field, kind: "number", choices: [], rows: [] }, "about 90")).toEqual({ value: null, problem: "Write a number." });
  });
});
