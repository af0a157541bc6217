import { describe, expect, test } from "vitest";
import { type BuilderState, build, copyPoint, startBuilder } from "@/components/builder/builder-state";
import { differencesFromShelf } from "@/components/builder/shelf-difference";
import type { CardContent, CardPoint } from "@/lib/testcards/card";

function point(id: string, over: Partial<CardPoint> = {}): CardPoint {
  return {
    id,
    template: { id: `t-${id}`, code: id.toUpperCase(), revision: 1 },
    title: `Point ${id}`,
    purpose: "",
    place: "air",
    engine: "running",
    positions: [{ control: "LOUVRE", position: "WIDE" }],
    entryText: "",
    entry: [{ id: "e1", parameter: "ias", instrument: null, relation: "about", value: 68, tolerance: 2, unit: "kt" }],
    steps: [{ id: "s1", text: "Hold", kind: "action", durationS: null, rpm: null, manifoldPressureInHg: null }],
    grid: null,
    readings: [
      {
        id: "r1",
        parameter: "coolant",
        label: "Coolant",
        cellHead: "COOL",
        kind: "number",
        instrument: "g1",
        unit: "degC",
        recordedBy: "pilot",
        onSheet: "single",
        sampling: "single",
        conditions: [],
        expected: null,
        expectedOrigin: null,
        expectedRatePerMin: null,
        choices: [],
        low: null,
        high: null,
      },
    ],
    cardTable: true,
    conditions: ["at power"],
    limits: [
      {
        id: "l1",
        reading: "r1",
        label: "Own",
        side: "max",
        value: 90,
        unit: "degC",
        forS: 0,
        statistic: "instant",
        expandedUncertainty: 1,
        source: "T rev 1",
      },
    ],
    aborts: { standing: true, lines: [{ kind: "event", id: "a1", text: "smoke" }], ifReached: false },
    recovery: "LOUVRE WIDE",
    completion: { rule: "none", runS: null, pastPeakS: null },
    durationMin: 5,
    fuelFlowLPerH: 20,
    objectives: ["O1"],
    hazards: [],
    parents: [],
    series: null,
    changes: [],
    order: "F1",
    heightFloor: null,
    needsHeightFloor: false,
    minimumCrewOnly: false,
    smoothAir: false,
    wingFlap: false,
    firstFlight: false,
    soak: false,
    ...over,
  };
}

function card(...points: CardPoint[]): CardContent {
  return {
    title: "Card",
    kind: "flight",
    crew: [],
    baggageKg: 0,
    fuelOnBoardL: 60,
    bingoL: 26,
    plannedOn: null,
    firstFlightOfChange: false,
    remarks: "",
    points,
  };
}

const order = (state: BuilderState) => state.content.points.map(({ id }) => id).join("");

describe("the builder's reducer", () => {
  const start = startBuilder(card(point("a"), point("b"), point("c")), 3);

  test.each([
    ["a", 2, "bca"],
    ["c", 0, "cab"],
    ["b", 1, "abc"],
    ["a", 99, "bca"],
  ])("moves %s to place %i and gives %s", (moved, to, expected) => {
    expect(order(build(start, { type: "move", point: moved, to }))).toBe(expected);
  });

  test("inserts, removes, undoes and does again without losing a point", () => {
    const inserted = build(start, { type: "insert", point: point("d"), at: 1 });
    expect(order(inserted)).toBe("adbc");
    const removed = build(inserted, { type: "remove", point: "a" });
    expect(order(removed)).toBe("dbc");
    const undone = build(build(removed, { type: "undo" }), { type: "undo" });
    expect(order(undone)).toBe("abc");
    expect(order(build(build(undone, { type: "redo" }), { type: "redo" }))).toBe("dbc");
  });

  test("makes the typing of one field one step of undo and another field a second", () => {
    const typed = ["C", "Cl", "Climb"].reduce(
      (state, title) => build(state, { type: "change point", point: "a", patch: { title }, what: "title" }),
      start,
    );
    const both = build(typed, { type: "change point", point: "a", patch: { recovery: "Level" }, what: "recovery" });
    expect(both.past).toHaveLength(2);
    const back = build(build(both, { type: "undo" }), { type: "undo" });
    expect(back.content.points[0]?.title).toBe("Point a");
  });

  test("stays unsaved when something was typed while the save was under way", () => {
    const changed = build(start, { type: "change card", patch: { title: "One" }, what: "title" });
    const saving = build(changed, { type: "saving" });
    const typedOn = build(saving, { type: "change card", patch: { title: "Two" }, what: "title" });
    expect(build(typedOn, { type: "saved", version: 4, edits: changed.edits }).save.kind).toBe("unsaved");
    expect(build(saving, { type: "saved", version: 4, edits: changed.edits }).save.kind).toBe("saved");
  });

  test("keeps my card within one undo when theirs is taken after a stale save", () => {
    const mine = build(start, { type: "change card", patch: { title: "Mine" }, what: "title" });
    const stale = build(mine, { type: "stale", theirs: card(point("z")), theirVersion: 9 });
    const theirs = build(stale, { type: "take theirs" });
    expect([order(theirs), theirs.version]).toEqual(["z", 9]);
    expect(build(theirs, { type: "undo" }).content.title).toBe("Mine");
  });
});

describe("a copy of a shelf point", () => {
  let next = 0;
  const newId = () => `id-${++next}`;

  test("has ids of its own and its limits still name its own readings", () => {
    const copy = copyPoint(point("a"), newId);
    expect(copy.id).not.toBe("a");
    expect(copy.limits[0]?.reading).toBe(copy.readings[0]?.id);
  });

  test("differs from the shelf only where it was changed", () => {
    const shelf = point("a");
    const copy = copyPoint(shelf, newId);
    expect(differencesFromShelf(copy, shelf)).toEqual([]);
    const changed = { ...copy, durationMin: 9, limits: copy.limits.map((limit) => ({ ...limit, value: 95 })) };
    expect(differencesFromShelf(changed, shelf).map(({ part }) => part)).toEqual(["limits", "durationMin"]);
  });
});
