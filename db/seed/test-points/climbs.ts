import type { CardPoint, Reading } from "@/lib/testcards/card";
import { abortAt, abortIf, byHeight, counting, freely, power, testPoint } from "./build";
import { type Expected, entry, note, oilBeforeFullPower, powerReadings, read, six, tit } from "./readings";

const RECOVER = "COWL OPEN (below 105 kt), level, 45 %, 80 kt";

/** Time, OAT, coolant, CHT, oil T and IAT make six cells a row; oil P goes to the recorder. */
const climbReadings = (expected: Expected): Reading[] => [
  read("oat", { sampling: "single", sheet: "grid" }),
  read("coolant", { sheet: "grid", expected: expected.coolant }),
  read("cht", { sheet: "grid", expected: expected.cht }),
  read("oilT", { sheet: "grid", expected: expected.oil }),
  read("iat", { sheet: "grid", expected: expected.iat }),
  read("oilP", { sampling: "lowest and highest", when: ["at power", "full power"], expected: [45, 65] }),
  tit(),
  oilBeforeFullPower([70, 105]),
  ...powerReadings(true),
];

const climb: Pick<Parameters<typeof testPoint>[1], "place" | "cowl" | "conditions" | "recovery" | "objectives" | "hazards"> = {
  place: "air",
  cowl: "OPEN",
  conditions: ["at power", "full power"],
  recovery: RECOVER,
  objectives: ["O1"],
  hazards: ["H02", "H04", "H05", "H08"],
};

const T10 = testPoint("T10", {
  ...climb,
  title: "Climb cooling",
  purpose: "Hot-day margin up to the critical altitude. Take-off mass 588-600 kg; oxygen as the law requires.",
  entryText: "level 75 % stabilised   1000 AGL or above",
  entry: [entry("ias", "about", 68, 2)],
  steps: [
    power("2700/30.0 for 1 min, then 2550/28.5, 68 kt ±2", 2700, 30, 60),
    "to 5 min past highest and above 9000 ft",
    "level at 11 000 ft in any case",
  ],
  grid: byHeight(counting(1, 11)),
  readings: climbReadings({ coolant: [85, 101], cht: [235, 290], oil: [80, 109], iat: [15, 50] }),
  completion: "5 min past peak",
  min: 30,
  flow: 28,
  parents: ["T09", "T11"],
  changes: ["height"],
  order: "F4",
});

const T11 = testPoint("T11", {
  ...climb,
  title: "Climb cooling, by speed",
  purpose: "Comes to V_Y from the cool side: 85 kt first, then 75, then 68, one speed a decision.",
  entryText: "level 75 % stabilised   1000 AGL or above",
  entry: [entry("ias", "about", 85, 2)],
  steps: [power("2700/30.0 for 1 min, then 2550/28.5, 85 kt ±2", 2700, 30, 60), "level at 4000 ft"],
  grid: byHeight(counting(1, 4)),
  readings: climbReadings({ coolant: [82, 100], cht: [225, 285], oil: [75, 107], iat: [15, 48] }),
  completion: "none",
  min: 15,
  flow: 28,
  parents: ["T09"],
  changes: ["speed"],
  order: "F3",
});

const T12 = testPoint("T12", {
  ...climb,
  title: "Best-angle short climb",
  purpose: "Cooling over an obstacle: low speed, full power, two minutes.",
  entryText: "above 1500 AGL, coolant 85 °C ±5 on the gauge, 58 kt ±2",
  entry: [entry("coolant", "about", 85, 5), entry("ias", "about", 58, 2)],
  steps: [power("2700/30.0, 58 kt ±2, 2 min at most", 2700, 30, 120), "level"],
  grid: freely("at", ["start", "end"]),
  readings: [
    ...six({
      sampling: "highest",
      when: ["at power"],
      expected: { coolant: [80, 99], cht: [225, 290], oil: [75, 105], iat: [15, 50] },
      rate: { coolant: { value: 4, unit: "degC" }, cht: { value: 10, unit: "degF" } },
    }),
    tit(),
    oilBeforeFullPower([70, 105]),
    ...powerReadings(true).slice(0, 2),
  ],
  aborts: [abortAt("coolant", "COOLANT-PANEL", 104, 100), abortAt("cht", "CHT-PANEL", (300 - 32) / 1.8, 295), ...abortIf("stall buffet")],
  recovery: "COWL OPEN, nose to 75 kt, 65 %",
  completion: "none",
  min: 6,
  flow: 30,
  parents: ["T10"],
  changes: ["speed"],
  order: "F6",
  heightFloor: { value: 1500, unit: "ft", reference: "AGL" },
});

const SAWTOOTH_ROWS = ["82", "82 back", "75", "75 back", "68", "68 back", "62", "62 back", "58", "58 back"];

const T20 = testPoint("T20", {
  ...climb,
  title: "Sawtooth climbs",
  purpose: "Best-rate speed: one speed after another, out and back across the wind.",
  entryText: "for the whole set; 2000-3000 ft, CHT 250 °F on the gauge or less",
  entry: [entry("cht", "at most", 250), entry("ias", "about", 82, 2)],
  steps: [
    "Enter 300 ft low, crosswind heading",
    power("2550/28.5, time 1000 ft", 2550, 28.5, 130),
    "Back on the reciprocal",
    "Next speed: 75, 68, 62, 58 kt ±2",
  ],
  grid: freely("kt", SAWTOOTH_ROWS),
  readings: [
    read("time", { label: "Seconds for 1000 ft", head: "TIME", sampling: "series", sheet: "grid" }),
    read("oat", { label: "OAT mid-band", sampling: "single", sheet: "grid" }),
    read("coolant", { sheet: "grid", expected: [82, 100] }),
    read("cht", { sheet: "grid", expected: [225, 285] }),
    read("oilT", { sheet: "grid", expected: [75, 107] }),
    note("mass", "Mass at mid-set", "number", { unit: "kg", low: 380, high: 600 }),
    read("iat", { expected: [15, 50] }),
    read("oilP", { sampling: "lowest and highest", when: ["at power"], expected: [45, 65] }),
    tit(),
    ...powerReadings(false),
  ],
  conditions: ["at power"],
  recovery: "COWL OPEN, 45 %, 80 kt, 3 min cool",
  completion: "none",
  min: 35,
  flow: 27,
  objectives: ["O6"],
  hazards: ["H02", "H05", "H08"],
  parents: ["T10"],
  changes: ["speed"],
  order: "F5",
});

export const CLIMBS: CardPoint[] = [T10, T11, T12, T20];
