import type { CardContent, CardPoint } from "@/lib/testcards/card";
import { dayFrom } from "./days";
import { seedId } from "./ids";
import { abortAt, power } from "./test-points/build";
import { testPointNamed } from "./test-points/shelf";

/** A shelf point as it goes on a card: a copy with an id of its own. */
const copyOf = (code: string, number: number, change: Partial<CardPoint> = {}): CardPoint => ({
  ...structuredClone(testPointNamed(code)),
  ...change,
  id: seedId("card point", number),
});

const pilot = { role: "pilot", massKg: 92 };
const observer = { role: "observer", massKg: 72 };

export const POINT_IDS = { T01: seedId("card point", 1), T05: seedId("card point", 2), T10: seedId("card point", 3) };

/** Days are counted from the demo date. */
export const DAYS = { groundRun: -15, climb: -4, taxi: 5, cowlShut: 7 };

export const groundRunCard = (demoDate: string): CardContent => ({
  title: "Static ground cooling run",
  kind: "ground run",
  crew: [pilot],
  baggageKg: 0,
  fuelOnBoardL: 40,
  bingoL: null,
  plannedOn: dayFrom(demoDate, DAYS.groundRun),
  firstFlightOfChange: false,
  remarks: "First run recorded here; the earlier ones stand in the paper records.",
  points: [copyOf("T01", 1)],
});

export const taxiCard = (demoDate: string): CardContent => ({
  title: "Taxi cooling, downwind",
  kind: "taxi",
  crew: [pilot],
  baggageKg: 0,
  fuelOnBoardL: 40,
  bingoL: null,
  plannedOn: dayFrom(demoDate, DAYS.taxi),
  firstFlightOfChange: false,
  remarks: "Again, on the warmest day of the month.",
  points: [copyOf("T05", 2)],
});

/** 381 + 92 + 72 + 6 kg and 64 L: 597.1 kg, CG 2.000 m. */
export const climbCard = (demoDate: string, fuelOnBoardL = 64): CardContent => ({
  title: "Climb cooling to the critical altitude",
  kind: "flight",
  crew: [pilot, observer],
  baggageKg: 6,
  fuelOnBoardL,
  bingoL: 26,
  plannedOn: dayFrom(demoDate, DAYS.climb),
  firstFlightOfChange: false,
  remarks: "Take-off mass 588-600 kg. Observer reads the logger.",
  points: [copyOf("T10", 3)],
});

/** Predicted by the straight line through 45, 50, 55 and 60 %: 98.65 °C, 97.0 to 100.3 with the logger's U of 1.5. */
export const cowlShutCard = (demoDate: string): CardContent => {
  const shelf = testPointNamed("T13");
  const point = copyOf("T13", 4, {
    entryText: "at the clock, OPEN before; 65 % stabilised, in gliding range",
    series: shelf.series && { ...shelf.series, level: { value: 65, unit: "%" }, base: false },
    changes: ["power"],
    readings: shelf.readings.map((reading) =>
      reading.id === "t13-coolant"
        ? {
            ...reading,
            expected: { low: 97, high: 100.3, unit: "degC" },
            expectedOrigin: "Straight line through 45, 50, 55 and 60 %, as flown",
          }
        : { ...reading },
    ),
    steps: shelf.steps.map((step) =>
      step.kind === "power" ? { id: step.id, ...power("65 %, 2350/24.0, level, stabilised", 2350, 24, null) } : { ...step },
    ),
  });
  return {
    title: "COWL SHUT at 65 %",
    kind: "flight",
    crew: [pilot],
    baggageKg: 0,
    fuelOnBoardL: 60,
    bingoL: 26,
    plannedOn: dayFrom(demoDate, DAYS.cowlShut),
    firstFlightOfChange: false,
    remarks: "One on board. One power, then the decision.",
    points: [point],
  };
};

/** Half written: the coolant abort of the second point was lifted to a number that is called too late. */
export const unfinishedCard = (): CardContent => {
  const shelf = testPointNamed("T12");
  const late = copyOf("T12", 6, {
    aborts: {
      ...shelf.aborts,
      lines: shelf.aborts.lines.map((line) =>
        line.kind === "number" && line.parameter === "coolant"
          ? { ...abortAt("coolant", "COOLANT-PANEL", 106.75, 105, { setBy: "gauge" }), id: line.id }
          : { ...line },
      ),
    },
  });
  return {
    title: "Descent and short climb",
    kind: "flight",
    crew: [pilot],
    baggageKg: 0,
    fuelOnBoardL: 60,
    bingoL: null,
    plannedOn: null,
    firstFlightOfChange: false,
    remarks: "",
    points: [copyOf("T15", 5), late],
  };
};
