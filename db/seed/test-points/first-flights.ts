import type { CardPoint } from "@/lib/testcards/card";
import { abortIf, byTime, counting, freely, power, testPoint } from "./build";
import { entry, powerReadings, read, six, tit } from "./readings";

const T08 = testPoint("T08", {
  title: "First take-off and climb",
  purpose: "First short look in the air after the change.",
  place: "air",
  cowl: "OPEN",
  entryText: "and not moved; DA 2500 ft, wind 10, crosswind 5 kt or less; 50-65 L",
  entry: [entry("oilT", "at least", 55), entry("coolant", "at least", 62.5)],
  steps: [
    power("Take-off 2700/30.0, 75 kt ±3", 2700, 30, 120),
    "1000 AGL overhead, level",
    power("65 %, 2350/24.0, 15 min overhead", 2350, 24, 900),
    "Land",
  ],
  grid: freely("at", ["500", "1000", "+3", "+6", "+10"]),
  readings: [
    ...six({ sampling: "highest", when: ["at power"], expected: { coolant: [78, 98], cht: [205, 275], oil: [65, 100], iat: [15, 48] } }),
    read("coolant", {
      id: "coolant-before",
      label: "Coolant before take-off",
      sampling: "lowest",
      sheet: "single",
      when: ["take-off"],
      expected: [64, 98],
    }),
    read("oilT", {
      id: "oil-t-before",
      label: "Oil T before take-off",
      head: "OIL",
      sampling: "lowest",
      sheet: "single",
      when: ["full power"],
      expected: [55, 100],
    }),
    tit(),
    ...powerReadings(true),
  ],
  conditions: ["take-off", "full power", "at power"],
  aborts: abortIf("any change of note"),
  recovery: "COWL OPEN, stay overhead, glide 65 kt, land; below 500 AGL land ahead",
  completion: "none",
  min: 25,
  flow: 24,
  objectives: ["O6"],
  hazards: ["H01", "H02", "H03", "H10"],
  parents: ["T01", "T02", "T03", "T04", "T05", "T06", "T07"],
  changes: ["height"],
  order: "F1",
  firstFlight: true,
  minimumCrewOnly: true,
});

const T09 = testPoint("T09", {
  title: "Level cruise, several powers",
  purpose: "Stabilised base data. COWL OPEN first; COWL TRAIL on a later sortie, its own card.",
  place: "air",
  cowl: "OPEN",
  entryText: "3000 ft ±100, smooth",
  entry: [entry("altitude", "about", 3000, 100)],
  steps: [
    power("45 %, 2200/20.0, until stabilised, 8 min or more", 2200, 20, 480),
    power("55 %, 2300/22.0, the same", 2300, 22, 480),
    power("65 %, 2350/24.0, the same", 2350, 24, 480),
    power("75 %, 2400/26.0, the same", 2400, 26, 480),
  ],
  grid: byTime("min", counting(1, 32)),
  readings: [
    ...six({ sampling: "series", when: ["at power"], expected: { coolant: [78, 95], cht: [205, 270], oil: [65, 102], iat: [10, 45] } }),
    tit(),
    ...powerReadings(false),
    read("fuelFlow"),
  ],
  conditions: ["at power"],
  recovery: "COWL OPEN (below 105 kt), 45 %, 80 kt, toward the strip",
  completion: "stabilised",
  min: 45,
  flow: 21,
  objectives: ["O6"],
  hazards: ["H05", "H08"],
  parents: ["T08"],
  changes: ["power"],
  order: "F2",
  smoothAir: true,
});

export const FIRST_FLIGHTS: CardPoint[] = [T08, T09];
