import { type CardPlan, type LoadCase, planLoad } from "../card-plan";
import { type CardFacts, type Problem, type Rule, type SortieFacts, whereItFits } from "./rule";
import { amount, figure, withUnit } from "./say";

const EPSILON = 1e-6;

/** Returning, reserve and unusable fuel: the least at which the pilot must turn home. Only a flight has one. */
function bingoLow(facts: CardFacts): Problem[] {
  if (facts.content.kind !== "flight") return [];
  const { returnL, reserveL } = facts.programme.fuelPlan;
  const least = reserveL + returnL + facts.programme.aircraft.fuelUnusableL;
  const { bingoL } = facts.content;
  if (bingoL !== null && bingoL >= least - EPSILON) return [];
  const fault =
    bingoL === null
      ? "bingo fuel is missing"
      : `bingo fuel ${amount(bingoL, "L")} is below reserve plus return plus unusable, ${amount(least, "L", 1)}`;
  return [
    {
      message: `${facts.name}: ${fault}. Set it to ${amount(Math.ceil(least - EPSILON), "L")} or more.`,
      where: { at: "card", field: "bingoL" },
    },
  ];
}

/** The sortie's own load with the points of all its cards; the programme is that of its first card. */
function sortiePlan({ sortie, cards }: SortieFacts): CardPlan | null {
  const programme = cards[0]?.programme;
  if (!programme) return null;
  const points = cards.flatMap(({ content }) => content.points);
  return whereItFits(() => planLoad(programme, { ...sortie, points }));
}

function fuelShort(facts: SortieFacts): Problem[] {
  const plan = sortiePlan(facts);
  if (!plan || facts.sortie.kind === "inspection") return [];
  const onBoard = facts.sortie.fuelOnBoardL;
  const required = amount(plan.fuelRequiredL, "L", 1);
  const where = { at: "sortie", field: "fuelOnBoardL" } as const;
  if (onBoard === null) return [{ message: `Fuel required is ${required} and fuel on board is not stated. State it.`, where }];
  const short = plan.fuelRequiredL - onBoard;
  if (short <= EPSILON) return [];
  return [
    {
      message: `Fuel required ${required} exceeds fuel on board ${amount(onBoard, "L", 1)}, short ${withUnit(short.toFixed(1), "L")}. Add fuel and re-check mass, or cut time.`,
      where,
    },
  ];
}

function massOutside(facts: SortieFacts): Problem[] {
  const plan = sortiePlan(facts);
  if (!plan || facts.sortie.kind === "inspection") return [];
  const { aircraft } = facts.cards[0]?.programme ?? {};
  if (!aircraft) return [];
  const cases: [string, LoadCase | null][] = [
    ["take-off", plan.takeOff],
    ["landing", plan.landing],
    ["zero fuel", plan.zeroFuel],
  ];
  const outside = cases.filter((one): one is [string, LoadCase] => one[1] !== null && !one[1].inside);
  const figures = outside.map(([name, { massKg, cgM }]) => `${name} ${amount(massKg, "kg", 1)} at ${withUnit(cgM.toFixed(3), "m")}`);
  const heavy = outside.some(([, { massKg }]) => massKg > aircraft.maxMassKg + EPSILON)
    ? ` Maximum mass ${amount(aircraft.maxMassKg, "kg", 1)}.`
    : "";
  const envelope: Problem[] =
    outside.length > 0
      ? [
          {
            message: `Mass or CG leaves the envelope: ${figures.join("; ")}.${heavy} Change the load.`,
            where: { at: "sortie", field: "crew" },
          },
        ]
      : [];
  return [...envelope, ...overStation(facts)];
}

/** A seat or a locker loaded past its own mark. */
function overStation({ sortie, cards }: SortieFacts): Problem[] {
  const { aircraft } = cards[0]?.programme ?? {};
  if (!aircraft) return [];
  const over = (what: string, massKg: number, maxKg: number, field: string): Problem[] =>
    massKg > maxKg + EPSILON
      ? [
          {
            message: `${what} carries ${figure(massKg, 1)} of ${amount(maxKg, "kg", 1)} allowed. Change the load.`,
            where: { at: "sortie", field },
          },
        ]
      : [];
  if (sortie.fuelOnBoardL !== null && sortie.fuelOnBoardL > aircraft.fuelCapacityL + EPSILON)
    return [
      {
        message: `Fuel on board ${amount(sortie.fuelOnBoardL, "L", 1)} is more than the tank holds, ${amount(aircraft.fuelCapacityL, "L", 1)}. Correct it.`,
        where: { at: "sortie", field: "fuelOnBoardL" },
      },
    ];
  const baggage = aircraft.stations.find((station) => /\b(bag|baggage|luggage|locker|hold)/i.test(station.name));
  const heaviest = Math.max(0, ...aircraft.stations.filter((station) => station !== baggage).map((station) => station.maxKg));
  return [
    ...(baggage ? over(baggage.name, sortie.baggageKg, baggage.maxKg, "baggageKg") : []),
    ...(heaviest > 0 ? sortie.crew.flatMap((person) => over(`The seat of ${person.name}`, person.massKg, heaviest, "crew")) : []),
  ];
}

export const loadRules: Rule[] = [
  { number: "19", code: "fuel-short", severity: "must", at: "sortie", sortie: fuelShort },
  { number: "20", code: "bingo-low", severity: "must", at: "both", card: bingoLow },
  { number: "21", code: "mass-cg-outside", severity: "must", at: "sortie", sortie: massOutside },
];
