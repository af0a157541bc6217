import { hotDayAmbient } from "../atmosphere";
import { convert } from "../units";
import { restrictedInAir } from "./facts";
import { type CardFacts, type Problem, type Rule, type SortieFacts, whereItFits } from "./rule";
import { amount, list, plural } from "./say";

const MOST_ON_A_CARD = 6;
const MOST_ON_A_SORTIE = 12;
const MOST_ON_A_FIRST_FLIGHT = 3;
const STALE_AFTER_DAYS = 7;
const FAR_FROM_HOT_DAY_C = 10;
const DAY_MS = 86_400_000;

const firstFlight = ({ content }: CardFacts): boolean =>
  content.kind === "flight" && (content.firstFlightOfChange || content.points.some((point) => point.firstFlight));

function manyOnCard(facts: CardFacts): Problem[] {
  const count = facts.content.points.length;
  const most = firstFlight(facts) ? MOST_ON_A_FIRST_FLIGHT : MOST_ON_A_CARD;
  if (count <= most) return [];
  const kind = most === MOST_ON_A_CARD ? "a card" : "on the first flight of a change";
  return [{ message: `${facts.name} has ${count} points, more than ${most} ${kind}. Split it.`, where: { at: "card", field: "points" } }];
}

function manyOnSortie({ cards }: SortieFacts): Problem[] {
  const count = cards.reduce((sum, { content }) => sum + content.points.length, 0);
  const first = cards.some(firstFlight);
  const most = first ? MOST_ON_A_FIRST_FLIGHT : MOST_ON_A_SORTIE;
  if (count <= most || cards.length < 2) return [];
  return [
    {
      message: `The sortie has ${count} points, more than ${most} ${first ? "on the first flight of a change" : "a sortie"}. Split it.`,
      where: { at: "sortie", field: "cards" },
    },
  ];
}

/** Nothing can be accepted before it is released: an unreleased card is refused at the brief by its state. */
function acceptanceMissing({ sortie }: SortieFacts): Problem[] {
  return sortie.cards.flatMap(({ document, state, digest, releasedDigest, acceptance }): Problem[] => {
    const inForce = releasedDigest ?? digest;
    if (state !== "released" || (acceptance?.accepted && acceptance.digest === inForce)) return [];
    const { number, letter } = document.identity;
    const fault = !acceptance ? "has not accepted" : acceptance.accepted ? "accepted another content than" : "declined";
    return [
      {
        message: `The pilot ${fault} card ${number} rev ${letter}. Brief and accept it.`,
        where: { at: "sortie", field: `acceptance.${document.identity.id}` },
      },
    ];
  });
}

function acceptanceStale({ sortie, context }: SortieFacts): Problem[] {
  return sortie.cards.flatMap(({ document, acceptance }): Problem[] => {
    if (!acceptance?.accepted) return [];
    const days = Math.floor((Date.parse(context.today) - Date.parse(acceptance.at.slice(0, 10))) / DAY_MS);
    if (!(days > STALE_AFTER_DAYS)) return [];
    const { number, letter } = document.identity;
    return [
      {
        message: `The pilot accepted card ${number} rev ${letter} ${plural(days, "day")} ago, more than ${STALE_AFTER_DAYS}. Read it again together.`,
        where: { at: "sortie", field: `acceptance.${document.identity.id}` },
      },
    ];
  });
}

function farFromHotDay({ sortie, cards }: SortieFacts): Problem[] {
  const programme = cards[0]?.programme;
  const { forecastOatC } = sortie;
  if (!programme?.hotDayBasis || forecastOatC === null || sortie.kind === "inspection") return [];
  const { hotDayBasis, airfield } = programme;
  const hotK = whereItFits(() => hotDayAmbient(convert(airfield.elevationFt, "ft", "m"), hotDayBasis));
  if (hotK === null) return [];
  const hotC = convert(hotK, "K", "degC");
  const below = hotC - forecastOatC;
  if (below <= FAR_FROM_HOT_DAY_C + 1e-9) return [];
  return [
    {
      message: `Forecast ${amount(forecastOatC, "degC", 1)} is ${amount(below, "degC", 1)} below the ${hotDayBasis} hot day of ${amount(hotC, "degC", 1)} at ${airfield.name}. The correction is large: say so in the report.`,
      where: { at: "sortie", field: "forecastOatC" },
    },
  ];
}

function dayPlanMissing({ sortie }: SortieFacts): Problem[] {
  if (sortie.kind === "inspection") return [];
  const { daylight, dutyTime, runway } = sortie.dayPlan;
  const asked: [string, string | null][] = [
    ["daylight", daylight],
    ["duty time", dutyTime],
    ...(sortie.kind === "ground run" ? [] : [["runway", runway] as [string, string | null]]),
  ];
  const missing = asked.filter(([, text]) => !text?.trim()).map(([name]) => name);
  if (missing.length === 0) return [];
  const said = list(missing);
  return [
    {
      message: `${said.charAt(0).toUpperCase()}${said.slice(1)} ${missing.length === 1 ? "is" : "are"} not stated. State ${missing.length === 1 ? "it" : "them"}.`,
      where: { at: "sortie", field: "dayPlan" },
    },
  ];
}

function crewAboveMinimum({ sortie, cards }: SortieFacts): Problem[] {
  const minimum = cards[0]?.programme.aircraft.minimumCrew ?? 1;
  const aboard = sortie.crew.length;
  if (sortie.kind !== "flight" || aboard <= minimum) return [];
  const reasons = cards.flatMap((facts) => [
    ...(firstFlight(facts) ? ["a first flight of a change"] : []),
    ...facts.points.flatMap((at) => {
      const restricted = restrictedInAir(at);
      if (restricted) return [`${restricted} in the air at ${facts.name} ${at.name.toLowerCase()}`];
      return at.point.minimumCrewOnly && at.point.place === "air" ? [`${facts.name} ${at.name.toLowerCase()}`] : [];
    }),
  ]);
  if (reasons.length === 0) return [];
  return [
    {
      message: `${plural(aboard, "person", "people")} aboard for ${reasons[0]}, which carries the minimum crew of ${minimum}. Leave the others behind.`,
      where: { at: "sortie", field: "crew" },
    },
  ];
}

export const sortieRules: Rule[] = [
  { number: "26", code: "too-many-points", severity: "should", at: "both", card: manyOnCard, sortie: manyOnSortie },
  { number: "32a", code: "acceptance-missing", severity: "must", at: "sortie", sortie: acceptanceMissing },
  { number: "32b", code: "acceptance-stale", severity: "should", at: "sortie", sortie: acceptanceStale },
  { number: "38", code: "far-from-hot-day", severity: "should", at: "sortie", sortie: farFromHotDay },
  { number: "39", code: "day-plan-missing", severity: "should", at: "sortie", sortie: dayPlanMissing },
  { number: "44", code: "crew-above-minimum", severity: "must", at: "sortie", sortie: crewAboveMinimum },
];
