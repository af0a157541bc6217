import type { CardPoint } from "@/lib/testcards/card";
import { abortAt, abortIf, byTime, counting, ownLimit, power, testPoint } from "./build";
import { entry, note, powerReadings, read, six, tit } from "./readings";

/** One straight line through the steps of this series predicts the next power. */
export const COWL_SHUT_SERIES = "COWL SHUT, power held";

const T13 = testPoint("T13", {
  title: "COWL SHUT, level",
  purpose:
    "Time available if COWL sticks SHUT, and the power that can be held. 45 %, then 50, 55, 60, 65 %, one a decision. Repeater out: call 100 °C on the panel gauge, by a new revision.",
  place: "air",
  cowl: "SHUT",
  entryText: "at the clock, OPEN before; 45 % stabilised, in gliding range",
  steps: [
    power("45 %, 2200/20.0, level, stabilised", 2200, 20, null),
    "COWL SHUT, start the clock",
    "Hold until stabilised, 8 min at most",
    "COWL OPEN",
  ],
  grid: byTime("min", counting(0, 8, 2)),
  readings: [
    read("coolant", {
      on: "COOLANT-REPEATER",
      head: "REP",
      sampling: "series",
      sheet: "grid",
      expected: [80, 90],
      ratePerMin: { value: 6, unit: "degC" },
    }),
    ...six({ sampling: "series", when: ["at power"], expected: { cht: [205, 285], oil: [70, 107], iat: [15, 52] } }).slice(1),
    tit(),
    ...powerReadings(false),
  ],
  conditions: ["at power"],
  aborts: [abortAt("coolant", "COOLANT-REPEATER", 104.5, 104.5)],
  recovery: "COWL OPEN (below 105 kt), 45 %, 80 kt until coolant 85 °C on the gauge, not above 105 kt",
  completion: "stabilised",
  min: 30,
  flow: 20,
  objectives: ["O4"],
  hazards: ["H01", "H02", "H10"],
  parents: ["T09"],
  series: { name: COWL_SHUT_SERIES, level: { value: 45, unit: "%" }, base: true },
  changes: ["position"],
  order: "F5",
  heightFloor: { value: 2500, unit: "ft", reference: "AGL" },
  needsHeightFloor: true,
  minimumCrewOnly: true,
});

const T14 = testPoint("T14", {
  title: "COWL position survey",
  purpose:
    "What each detent does; whether the thermostat valve regulates. OPEN, then TRAIL, power untouched. The SHUT leg is its own card, after T13 at 65 % is clear.",
  place: "air",
  cowl: "OPEN",
  entryText: "first; level 65 %, 3000 ft ±100, 100 kt or less, smooth",
  entry: [entry("altitude", "about", 3000, 100), entry("ias", "at most", 100)],
  steps: [power("65 %, 2350/24.0, stabilised, 8 min or more", 2350, 24, 480), "COWL TRAIL, power untouched, 8 min or more", "COWL OPEN"],
  grid: byTime("min", counting(1, 16)),
  readings: [
    ...six({ sampling: "series", when: ["at power"], expected: { coolant: [82, 95], cht: [205, 285], oil: [70, 107], iat: [10, 50] } }),
    read("coolant", {
      id: "coolant-logger",
      label: "Coolant on the logger",
      on: "COOLANT-REPEATER",
      sampling: "series",
      expected: [82, 95],
    }),
    tit(),
    ...powerReadings(false),
    note("lever", "COWL lever force, 1 light to 5 heavy", "choice", { choices: ["1", "2", "3", "4", "5"] }),
  ],
  conditions: ["at power"],
  limits: [ownLimit("coolant-logger", "max", 6, "degC", 0.5, "Swing in 5 min", { statistic: "peak to peak" })],
  aborts: abortIf("coolant swing over 5 °C on the repeater"),
  recovery: "COWL OPEN (below 105 kt), 45 %, 80 kt, land",
  completion: "stabilised",
  min: 40,
  flow: 22,
  objectives: ["O4"],
  hazards: ["H05", "H08", "H10"],
  parents: ["T09"],
  changes: ["position"],
  order: "F3",
  smoothAir: true,
});

export const COWL_POSITIONS: CardPoint[] = [T13, T14];
