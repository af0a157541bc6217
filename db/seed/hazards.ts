import type { Hazard } from "@/lib/testcards/card";

type Grade = `${1 | 2 | 3 | 4}${"A" | "B" | "C" | "D" | "E" | "F"}`;
type Mitigation = Hazard["mitigations"][number];

const grade = (text: Grade): Hazard["before"] => ({
  severity: Number(text[0]) as Hazard["before"]["severity"],
  probability: text[1] as Hazard["before"]["probability"],
});
const design = (text: string): Mitigation => ({ kind: "design", text });
const procedure = (text: string): Mitigation => ({ kind: "procedure", text });
const training = (text: string): Mitigation => ({ kind: "training", text });
const equipment = (text: string): Mitigation => ({ kind: "equipment", text });

const hazard = (
  number: number,
  title: string,
  cause: string,
  effect: string,
  before: Grade,
  after: Grade,
  mitigations: Mitigation[],
): Hazard => ({
  code: `H${String(number).padStart(2, "0")}`,
  title,
  cause,
  effect,
  before: grade(before),
  after: grade(after),
  mitigations,
  owner: "Test engineer",
});

export const HAZARDS: Hazard[] = [
  hazard(1, "Engine stops after take-off", "Coolant loss, vapour lock or fuel starvation", "Forced landing off the strip", "1D", "1E", [
    procedure("Climb overhead the strip to 1000 AGL"),
    training("Land-ahead drill briefed and said aloud before take-off"),
    procedure("T01 to T07 accepted first"),
  ]),
  hazard(
    2,
    "COWL jams SHUT and coolant boils",
    "Cable or hinge jams, lever not moved back",
    "Coolant lost, engine damaged, power lost",
    "2C",
    "2D",
    [
      design("Spring bias to OPEN"),
      procedure("Lever moved through all detents before take-off"),
      procedure("Held in gliding range of the strip; time available known from T13"),
    ],
  ),
  hazard(
    3,
    "Turbine over-temperature or fire",
    "Lean mixture, leak at the exhaust, stop from high power",
    "Fire under the cowl",
    "2C",
    "2D",
    [
      procedure("TIT abort line on every card"),
      procedure("Timed cool-down before every stop"),
      equipment("Fire cover at every start and run"),
    ],
  ),
  hazard(4, "Induction air too hot, detonation", "Intercooler leaks or is starved of air", "Piston damage, power lost", "2C", "2D", [
    procedure("IAT abort line on every card"),
    procedure("Rich mixture at full power"),
    design("Intercooler sealed and pressure-checked"),
  ]),
  hazard(5, "COWL or its hinge lost, OPEN too fast", "OPEN above 105 KIAS", "Part leaves the aircraft, drag and buffet", "2D", "2E", [
    equipment("105 kt line on card and placard"),
    procedure("Hinge inspected in T25 after every sortie"),
  ]),
  hazard(6, "Scald when the cap is opened", "Cap opened on a hot, pressurised system", "Burns to hands and face", "3B", "3D", [
    equipment('Cap taped "HOT"'),
    procedure("45 min wait before the cap is touched"),
  ]),
  hazard(7, "Propeller strikes a person", "People near a running or hot engine", "Death or maiming", "1D", "1E", [
    equipment("Taped line on the ground that nobody crosses"),
    procedure("One person commands the start"),
  ]),
  hazard(8, "Collision while heads-down", "Pilot writes and watches gauges", "Mid-air collision", "1D", "1E", [
    procedure("Height block agreed, radio watch kept"),
    design("At most six numbers a point by hand, the rest to the recorder"),
  ]),
  hazard(
    9,
    "Cowl or fuel line too hot after the stop",
    "Heat soak with the coolant pump standing still",
    "Fire, or a line fails",
    "2C",
    "2D",
    [
      equipment("Skin and line sensors read by an observer"),
      equipment("Extinguisher manned until peak and 10 min"),
      procedure("T02 before T03 before T04"),
    ],
  ),
  hazard(
    10,
    "Wrong lever moved",
    "COWL and WING FLAP levers side by side",
    "WING FLAP moved at speed, or COWL left where it was",
    "2D",
    "2E",
    [design("Knobs of different shape"), procedure("The words COWL and WING FLAP on every line and call")],
  ),
  hazard(11, "Spin from a stall", "Yaw at the stall, late recovery", "Loss of control at low height", "1D", "1E", [
    procedure("3500 AGL or above, recover at the first sign, stop at 2500 AGL"),
    training("Exit policy and spin recovery briefed the same day"),
  ]),
  hazard(
    12,
    "Leaves the ground or the strip in a fast taxi",
    "Gust, too much speed, one brake fades",
    "Aircraft damaged, people struck",
    "2D",
    "2E",
    [
      procedure("28 kt call, wind 8 kt or less, two runs in 20 min at most"),
      procedure("Strip three times the stop distance, clear of people"),
    ],
  ),
];
