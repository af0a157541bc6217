import type { CardPoint } from "@/lib/testcards/card";
import { abortIf, ownLimit, testPoint } from "./build";
import { note, read } from "./readings";

/** The worst of the three detents, so that one line on the sheet stands for all. */
export const gapError = note("gap-error", "Gap furthest off 12 / 45 / 110 mm, by", "number", {
  unit: "mm",
  low: 0,
  high: 100,
  by: "observer",
});
export const gapErrorLimit = ownLimit("gap-error", "max", 3, "mm", 0.5, "Gap off by");

const cylinder = (number: number) =>
  read("held", {
    id: `cylinder-${number}`,
    label: `Cylinder ${number} held at 80 psi`,
    head: `CYL ${number}`,
    sampling: "single",
    sheet: "single",
    by: "observer",
  });
const CYLINDERS = [1, 2, 3, 4];

const T24 = testPoint("T24", {
  title: "Compression and borescope",
  purpose: "Engine health, before and after. Baseline first; then after T01, T10, T13.",
  place: "ground",
  engine: "stopped",
  entryText: "engine hot, within 30 min; ignition off and grounded; two people",
  steps: [
    "80 psi to each cylinder at top dead centre",
    "Listen for the leak path",
    "Borescope the valves, photo each",
    "Spin the turbine by hand",
  ],
  readings: [
    ...CYLINDERS.map(cylinder),
    note("spread", "Highest less lowest", "number", { unit: "psi", low: 0, high: 80, by: "observer" }),
    note("change", "Largest change from baseline", "number", { unit: "psi", low: 0, high: 80, by: "observer" }),
    note("leak", "Leak path heard", "text", { by: "observer" }),
    note("turbine", "Turbine spins free", "yes-no", { by: "observer" }),
    note("valves", "Valves", "photo", { by: "observer" }),
  ],
  limits: [
    // 25 % of 80 psi lost: 60 psi still held
    ...CYLINDERS.map((number) => ownLimit(`cylinder-${number}`, "min", 60, "psi", 1, `Cyl ${number} held`, { source: "HF-4L-MM rev 4" })),
    ownLimit("spread", "max", 8, "psi", 1.4, "Spread"),
    ownLimit("change", "max", 5, "psi", 1.4, "Change"),
  ],
  standing: false,
  aborts: abortIf("coolant bubbles", "turbine rubs"),
  recovery: "Air off, propeller clear",
  completion: "none",
  min: 45,
  flow: 0,
  objectives: ["O7"],
  hazards: ["H07"],
  parents: ["T18"],
  changes: [],
  order: "G1",
});

const T25 = testPoint("T25", {
  title: "Post-flight inspection",
  purpose: "Catch it on the ground, after every sortie.",
  place: "ground",
  engine: "stopped",
  entryText: "within 30 min of the stop, cowl off, hot parts",
  steps: [
    "Photograph first",
    "Level, catch tank, leaks, hoses, radiator faces",
    "Duct seals, COWL hinge and cable, exit gaps, chafe",
    "Exhaust and turbine, mount bolts, oil level",
    "Cut the filter, read the heat strips",
    "Clean last",
  ],
  readings: [
    note("photos", "As found", "photo", { by: "observer" }),
    note("level", "Header tank at the mark", "yes-no", { by: "observer" }),
    read("catchTank", { sampling: "single", sheet: "single", by: "observer" }),
    note("leaks", "Any leak", "yes-no", { by: "observer" }),
    note("hinge", "COWL hinge and cable sound", "yes-no", { by: "observer" }),
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
    note("exhaust", "Exhaust, turbine, mount bolts sound", "yes-no", { by: "observer" }),
    note("filter", "Metal in the filter", "yes-no", { by: "observer" }),
    note("strips", "Heat strips, hoses, seals, chafe", "text", { by: "observer" }),
  ],
  limits: [ownLimit("catch-tank", "max", 150, "mL", 10, "Catch tank"), gapErrorLimit],
  standing: false,
  aborts: abortIf("metal in the filter: ground it", "crack, leak, loose hinge: ground it"),
  recovery: "Quarantine the aircraft, write the squawk",
  completion: "none",
  min: 40,
  flow: 0,
  objectives: ["O7"],
  hazards: ["H05", "H06"],
  parents: [],
  changes: [],
  order: "G1",
});

export const INSPECTIONS: CardPoint[] = [T24, T25];
