import type { Aircraft, CardDocument, ProgrammeSnapshot } from "./card";
import { fuelPlan } from "./fuel";
import { insideEnvelope, type Load, loadingOf } from "./loading";

export type LoadCase = { massKg: number; cgM: number; inside: boolean };

export type CardPlan = {
  minutes: number;
  fuelRequiredL: number;
  bingoL: number; // reserve, return and unusable, rounded up to a litre
  takeOff: LoadCase | null; // null: fuel on board is not stated
  landing: LoadCase | null;
  zeroFuel: LoadCase; // with the unusable fuel
};

/** What a sortie, or a card alone, carries and flies. */
export type LoadedPlan = {
  kind: CardDocument["content"]["kind"];
  crew: readonly { massKg: number }[];
  baggageKg: number;
  fuelOnBoardL: number | null;
  points: readonly { durationMin: number; fuelFlowLPerH: number }[];
};

/** Minutes between two points where the programme states none: common practice, no source. */
const RESET_MIN = 2;

const isBaggage = (name: string): boolean => /\b(bag|baggage|luggage|locker|hold)/i.test(name);

/** The loads without fuel: the aircraft empty in its configuration, people on the seats in order, bags in the baggage station. */
function loadsOf(programme: ProgrammeSnapshot, plan: LoadedPlan): Load[] {
  const { aircraft, configuration } = programme;
  const seats = aircraft.stations.filter((station) => !isBaggage(station.name));
  const baggage = aircraft.stations.find((station) => isBaggage(station.name)) ?? aircraft.stations.at(-1);
  const empty = configuration
    ? { massKg: configuration.massKg, armM: configuration.armM }
    : { massKg: aircraft.emptyMassKg, armM: aircraft.emptyArmM };
  const people = plan.crew.map(({ massKg }, i) => ({ massKg, armM: (seats[i] ?? seats.at(-1))?.armM ?? empty.armM }));
  return [empty, ...people, { massKg: plan.baggageKg, armM: baggage?.armM ?? empty.armM }];
}

function caseOf(aircraft: Aircraft, loads: readonly Load[], fuelL: number): LoadCase {
  const { massKg, cgM } = loadingOf([...loads, { massKg: fuelL * aircraft.fuelDensityKgPerL, armM: aircraft.fuelArmM }]);
  const { inside } = insideEnvelope({ massKg, cgM }, aircraft.envelope);
  return { massKg, cgM, inside: inside && massKg <= aircraft.maxMassKg + 1e-9 };
}

/**
 * Time, fuel, mass and balance of a plan. A flight carries its return and its reserve; a run on the ground needs neither.
 * Landing: after the points and the return, with the taxi fuel burnt, never below the unusable fuel.
 * Throws RangeError for an envelope that is none or a mass that is not a number.
 */
export function planLoad(programme: ProgrammeSnapshot, plan: LoadedPlan): CardPlan {
  const { aircraft } = programme;
  const { taxiL, returnL, reserveL, taxiMin = 0, returnMin = 0, resetMin = RESET_MIN } = programme.fuelPlan;
  const flies = plan.kind === "flight";
  const transit = flies ? returnL : 0;
  const { required, bingo } = fuelPlan({
    taxi: plan.kind === "inspection" ? 0 : taxiL,
    points: plan.points.map((p) => ({ durationMin: p.durationMin, flowPerH: p.fuelFlowLPerH })),
    transit,
    reserve: flies ? reserveL : 0,
    unusable: aircraft.fuelUnusableL,
    onBoard: plan.fuelOnBoardL ?? 0,
  });
  const burnt = required - aircraft.fuelUnusableL - (flies ? reserveL : 0);
  const loads = loadsOf(programme, plan);
  const held = plan.points.reduce((sum, point) => sum + point.durationMin + resetMin, 0);
  const onBoard = plan.fuelOnBoardL;
  return {
    minutes: held + (plan.kind === "inspection" ? 0 : taxiMin) + (flies ? returnMin : 0),
    fuelRequiredL: required,
    bingoL: bingo,
    takeOff: onBoard === null ? null : caseOf(aircraft, loads, onBoard),
    landing: onBoard === null ? null : caseOf(aircraft, loads, Math.max(aircraft.fuelUnusableL, onBoard - burnt)),
    zeroFuel: caseOf(aircraft, loads, aircraft.fuelUnusableL),
  };
}

/** The plan of one card by itself, as its cover prints it. */
export function planCard({ programme, content }: CardDocument): CardPlan {
  return planLoad(programme, content);
}
