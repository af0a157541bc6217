import type { CardPoint, Reading } from "@/lib/testcards/card";
import { abortAt, abortIf, byTime, coolDown, counting, engineStop, ownLimit, power, testPoint } from "./build";
import { gapError, gapErrorLimit } from "./inspections";
import { note, oilBeforeFullPower, powerReadings, read, six, tit } from "./readings";

const catchTank = ownLimit("catch-tank", "max", 150, "mL", 10, "Catch tank");

const T18 = testPoint("T18", {
  title: "First run, leak check",
  purpose: "Tight and plumbed right, before anything is asked of it.",
  place: "ground",
  cowl: "REMOVED",
  entryText: "torque list signed, extinguisher manned",
  steps: [
    power("1200 rpm 5 min", 1200, null, 300),
    coolDown(),
    engineStop("Stop, look for leaks"),
    power("1800 rpm 5 min", 1800, null, 300),
    coolDown("1000 rpm 3 min, cool-down again"),
    engineStop("Stop, look; pressure-check the joints"),
    "COWL lever through the detents, measure gaps",
  ],
  readings: [
    read("time", { id: "oil-p-time", label: "Seconds to oil P 20 psi on the gauge", head: "OIL s", sampling: "single", sheet: "single" }),
    read("oilP", { label: "Oil P, cold start", sampling: "highest", sheet: "single", when: ["cold start"], expected: [15, 95] }),
    note("drips", "Any drip", "yes-no", { by: "observer" }),
    read("catchTank", { sampling: "single", sheet: "single", by: "observer" }),
    ...(["SHUT", "TRAIL", "OPEN"] as const).map((position) =>
      read("gap", {
        id: `gap-${position.toLowerCase()}`,
        label: `Exit gap, COWL ${position}`,
        sampling: "single",
        sheet: "single",
        by: "observer",
      }),
    ),
    gapError,
    read("force", { sheet: "single", by: "observer" }),
  ],
  conditions: ["cold start"],
  limits: [
    ownLimit("oil-p-time", "max", 10, "s", 0.3, "Oil P up in"),
    catchTank,
    gapErrorLimit,
    ownLimit("force", "max", 60, "N", 5, "Lever force"),
  ],
  aborts: abortIf("any leak", "no oil P at 10 s"),
  recovery: "Stop, fuel off, stand clear, cap closed",
  completion: "none",
  min: 30,
  flow: 8,
  objectives: ["O7"],
  hazards: ["H03", "H06", "H07"],
  parents: [],
  changes: [],
  order: "G1",
});

const T01 = testPoint("T01", {
  title: "Static ground cooling run",
  purpose: "Full power, then maximum continuous, held until the temperatures stand still.",
  place: "ground",
  cowl: "OPEN",
  entryText: "tied down, chocked, nose into wind 10 kt or less, 4 briefed",
  steps: [
    power("1200 rpm until coolant 62.5 °C on the gauge", 1200, null, null),
    power("2000 rpm 2 min; oil T 55 °C on the gauge or more", 2000, null, 120),
    power("2700/30.0 for 1 min", 2700, 30, 60),
    power("2550/28.5 until stabilised, 15 min at most", 2550, 28.5, 900),
    coolDown(),
    engineStop("Stop, unless T02 or T03 follows on this card"),
  ],
  grid: byTime("min", counting(1, 15)),
  readings: [
    ...six({ sampling: "series", when: ["at power"], expected: { coolant: [85, 98], cht: [235, 280], oil: [70, 95], iat: [30, 50] } }),
    tit(),
    oilBeforeFullPower([52, 95]),
    ...powerReadings(true),
    read("catchTank", { sampling: "single", sheet: "single", by: "observer" }),
  ],
  conditions: ["at power", "full power"],
  limits: [catchTank],
  recovery: "COWL OPEN, 1000 rpm, cool-down 3 min unless fire, stop, wait, cap closed",
  completion: "stabilised",
  min: 22,
  flow: 24,
  objectives: ["O2"],
  hazards: ["H03", "H04", "H06", "H07"],
  parents: ["T18", "T24"],
  changes: ["power"],
  order: "G2",
});

type SoakBands = { coolant: [number, number]; cht: [number, number]; skin: [number, number]; line: [number, number] };

/** The logger runs on after the stop; its coolant channel stands at the pilot's repeater, the others before an observer. */
const soakReadings = (bands: SoakBands): Reading[] => [
  read("coolant", {
    on: "COOLANT-REPEATER",
    sampling: "series",
    by: "observer",
    expected: bands.coolant,
    ratePerMin: { value: 5.5, unit: "degC" },
  }),
  read("cht", { sampling: "series", by: "observer", expected: bands.cht }),
  read("skin", { sampling: "series", by: "observer", expected: bands.skin, ratePerMin: { value: 6, unit: "degC" } }),
  read("line", { sampling: "series", by: "observer", expected: bands.line, ratePerMin: { value: 2.5, unit: "degC" } }),
  read("oat", { sampling: "single", by: "observer", sheet: "single" }),
  note("wind", "Wind on the nose or across, kt", "text", { by: "observer" }),
  read("catchTank", { sampling: "single", by: "observer", sheet: "single" }),
];

const soak: Pick<
  Parameters<typeof testPoint>[1],
  "place" | "grid" | "limits" | "aborts" | "standing" | "ifReached" | "completion" | "min" | "flow" | "objectives" | "soak"
> = {
  place: "ground",
  grid: byTime("min", counting(0, 20)),
  limits: [catchTank],
  standing: false,
  ifReached: true,
  aborts: [
    abortAt("coolant", "COOLANT-REPEATER", 104.75, 104.7, { by: "observer" }),
    abortAt("cht", "CHT-PANEL", (303 - 32) / 1.8, 300, { by: "observer" }),
    abortAt("skin", "LOGGER-SKIN", 92, 92, { by: "observer" }),
    abortAt("line", "LOGGER-LINE", 48.75, 48.7, { by: "observer" }),
    ...abortIf("venting", "smell"),
  ],
  completion: { rule: "whole run", runS: null, pastPeakS: 600 },
  min: 35,
  flow: 18,
  objectives: ["O3"],
  soak: true,
};

const T02 = testPoint("T02", {
  ...soak,
  title: "Heat soak, COWL OPEN",
  purpose: "Peak and time to peak after an ordinary stop, the kinder case. Run a nose into wind, run b crosswind, each on its own card.",
  cowl: "OPEN",
  entryText: "straight from T01 stabilised; nose into wind 3-8 kt",
  steps: [coolDown(), "COWL OPEN, leave it", engineStop("Stop; clock from here"), "Log to peak and 10 min more"],
  readings: soakReadings({ coolant: [84, 98], cht: [215, 270], skin: [50, 85], line: [28, 46] }),
  recovery: 'COWL OPEN, call "stand clear", extinguisher ready, no restart, cap closed',
  hazards: ["H06", "H09"],
  parents: ["T01"],
  changes: [],
  order: "G3",
});

const T03 = testPoint("T03", {
  ...soak,
  title: "Heat soak, COWL SHUT",
  purpose: "Worst parked case: not opened, or stuck. Run a into wind, run b crosswind, each on its own card, after T02 a and b.",
  cowl: "OPEN",
  entryText: "to the last 30 s of the cool-down; then as T02",
  steps: [coolDown(), "COWL SHUT in the last 30 s of it", engineStop("Stop; clock from here"), "Log to peak and 10 min more"],
  readings: soakReadings({ coolant: [88, 104], cht: [220, 280], skin: [55, 88], line: [30, 48] }),
  recovery: 'COWL OPEN if still seated, call "stand clear", extinguisher ready, no restart, cap closed',
  hazards: ["H03", "H06", "H09"],
  parents: ["T02"],
  changes: ["position"],
  order: "G4",
});

const T04 = testPoint("T04", {
  title: "Hot restart",
  purpose: "Starts and runs hot, without vapour trouble.",
  place: "ground",
  cowl: "OPEN",
  entryText: "10-15 min after T02 or T03, fuel line 40-48 °C on the logger",
  steps: ["Hot-start drill, 3 tries of 10 s at most, 1 min apart", power("1200 rpm 3 min", 1200, null, 180)],
  readings: [
    note("tries", "Tries to start", "count", { low: 1, high: 9 }),
    read("time", { id: "cranking", label: "Cranking, longest", head: "CRANK", sampling: "highest", sheet: "single" }),
    note("roughness", "Roughness, 0 smooth to 3 rough", "choice", { choices: ["0", "1", "2", "3"] }),
    read("fuelP", { sampling: "lowest and highest", sheet: "single" }),
    read("time", { id: "oil-p-time", label: "Seconds to oil P 20 psi on the gauge", head: "OIL s", sampling: "single", sheet: "single" }),
    read("coolant", { sheet: "single", expected: [80, 103] }),
    read("oilP", { sampling: "lowest and highest", when: ["at power"], expected: [15, 65] }),
  ],
  conditions: ["idle", "at power"],
  limits: [
    ownLimit("tries", "max", 3, "1", 0, "Tries"),
    ownLimit("cranking", "max", 10, "s", 0.3, "Cranking"),
    ownLimit("oil-p-time", "max", 10, "s", 0.3, "Oil P up in"),
  ],
  aborts: abortIf("oil P below 20 psi on the gauge at 10 s", "3 tries used", "fuel smell"),
  recovery: "COWL OPEN, all off, 20 min cool, inspect",
  completion: "none",
  min: 15,
  flow: 12,
  objectives: ["O3"],
  hazards: ["H03", "H07", "H09"],
  parents: ["T03"],
  changes: [],
  order: "G5",
});

export const GROUND_RUNS: CardPoint[] = [T01, T02, T03, T04, T18];
