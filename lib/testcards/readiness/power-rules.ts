import type { CardPoint, Limit, Step } from "../card";
import { convert } from "../units";
import { stepLetter } from "./facts";
import { atPoint, type CardFacts, type PointFacts, type Problem, type Rule, whereItFits } from "./rule";
import { amount, figure } from "./say";

const EPSILON = 1e-9;
const PAST_PEAK_S = 300;

const stopsEngine = (point: CardPoint): boolean => point.soak || point.steps.some((step) => step.kind === "engine stop");

function stopNotLast(facts: CardFacts): Problem[] {
  const last = facts.points.length - 1;
  return facts.points.flatMap((at, i): Problem[] =>
    i < last && stopsEngine(at.point)
      ? [
          {
            message: `${at.name} stops the engine and is not last on its card of ${last + 1} points. Move it to the end or to its own card.`,
            where: atPoint(at, "steps"),
          },
        ]
      : [],
  );
}

type Powered = { quantity: "rpm" | "inHg"; of: (step: Step) => number | null };
const POWERED: Powered[] = [
  { quantity: "rpm", of: (step) => step.rpm },
  { quantity: "inHg", of: (step) => step.manifoldPressureInHg },
];

/** Card rows where there are any, else placards: how high it may go and for how long. */
function ceilings(facts: CardFacts, unit: Powered["quantity"]): Limit[] {
  const measures = new Set(facts.programme.parameters.filter((p) => p.unit === unit).map((p) => p.code));
  const rows = facts.programme.limits.filter(
    (l) => l.side === "max" && measures.has(l.parameter) && (l.statistic === "instant" || l.statistic === "sustained"),
  );
  const cards = rows.filter((row) => row.layer === "card");
  return (cards.length > 0 ? cards : rows).map((row) => ({
    ...row,
    value: whereItFits(() => convert(row.value, row.unit, unit)) ?? row.value,
  }));
}

/** The longest unbroken hold beyond a ceiling. A step without a time is taken to last as long as its point. */
function longestHold(point: CardPoint, beyond: (step: Step) => boolean): { heldS: number; step: Step | null; index: number } {
  let longest = { heldS: 0, step: null as Step | null, index: 0 };
  let heldS = 0;
  for (const [index, step] of point.steps.entries()) {
    heldS = beyond(step) ? heldS + (step.durationS ?? point.durationMin * 60) : 0;
    if (heldS > longest.heldS) longest = { heldS, step, index };
  }
  return longest;
}

function heldTooLong(facts: CardFacts): Problem[] {
  const powered = POWERED.map((one) => ({ ...one, most: ceilings(facts, one.quantity) }));
  const check = (at: PointFacts, { quantity, of, most }: Powered & { most: Limit[] }): Problem[] => {
    const problems = most.flatMap((ceiling): Problem[] => {
      const beyond = (step: Step) => (of(step) ?? 0) > ceiling.value + EPSILON;
      const { heldS, step, index } = longestHold(at.point, beyond);
      if (!step || (heldS <= ceiling.forS + EPSILON && heldS > 0)) return [];
      const set = amount(of(step) ?? 0, quantity);
      const allowed = ceiling.forS === 0 ? "may never be passed" : `may be passed for ${figure(ceiling.forS)} s`;
      return [
        {
          message: `${at.name}, step ${stepLetter(index)}: ${set} is held ${figure(heldS)} s; ${amount(ceiling.value, quantity)} ${allowed}. Shorten it.`,
          where: atPoint(at, "steps", step.id),
        },
      ];
    });
    return problems.slice(0, 1);
  };
  return facts.points.flatMap((at) => (at.point.engine === "stopped" ? [] : powered.flatMap((one) => check(at, one))));
}

const HEIGHT = /(\d{1,3}(?:[\s,]\d{3})+|\d+)\s*ft\b/g;
const heightsIn = (text: string): number[] => [...text.matchAll(HEIGHT)].map((found) => Number((found[1] ?? "").replace(/[\s,]/g, "")));

/** The greatest height that the steps or the rows of a height grid reach, in feet. */
function plannedTopFt(point: CardPoint): number | null {
  const grid = point.grid?.by === "height" ? point.grid : null;
  const scale = grid && /\b1[\s,]?000\b/.test(grid.head) ? 1000 : 1;
  const rows = (grid?.rows ?? []).map((row) => Number.parseFloat(row.replace(/[\s,]/g, "")) * scale).filter(Number.isFinite);
  const heights = [...rows, ...point.steps.flatMap((step) => heightsIn(step.text))];
  return heights.length > 0 ? Math.max(...heights) : null;
}

function climbTooShort(facts: CardFacts): Problem[] {
  const critical = facts.programme.aircraft.criticalAltitudeFt;
  return facts.points.flatMap((at): Problem[] => {
    const { point, name } = at;
    if (point.completion.rule !== "5 min past peak") return [];
    const where = atPoint(at, "completion");
    const stated = point.steps.flatMap((step) =>
      [...step.text.matchAll(/(\d+(?:\.\d+)?)\s*min(?:utes)?\s+past/gi)].map((found) => Number(found[1]) * 60),
    );
    const pastPeakS = Math.min(...stated, point.completion.pastPeakS ?? PAST_PEAK_S);
    if (pastPeakS < PAST_PEAK_S - EPSILON)
      return [
        {
          message: `${name} is planned to end ${figure(pastPeakS / 60)} min past the highest temperature, short of 5 min. Lengthen it.`,
          where,
        },
      ];
    if (point.durationMin <= PAST_PEAK_S / 60)
      return [
        {
          message: `${name} is planned for ${figure(point.durationMin)} min, no longer than the 5 min past the peak. Lengthen it.`,
          where: atPoint(at, "durationMin"),
        },
      ];
    if (critical === null) return [];
    const top = plannedTopFt(point);
    if (top === null)
      return [
        {
          message: `${name} does not say to what height it climbs; it must pass the critical altitude ${amount(critical, "ft")}. Write it in a step.`,
          where,
        },
      ];
    return top >= critical
      ? []
      : [
          {
            message: `${name} is planned to end at ${amount(top, "ft")}, below the critical altitude ${amount(critical, "ft")}. Lengthen it.`,
            where,
          },
        ];
  });
}

function coolDownMissing(facts: CardFacts): Problem[] {
  const needed = facts.programme.coolDown;
  if (!needed) return [];
  return facts.points.flatMap((at) => {
    let cooledS = 0;
    return at.point.steps.flatMap((step): Problem[] => {
      if (step.kind === "cool-down") cooledS += step.durationS ?? 0;
      else if (step.kind === "power") cooledS = 0;
      else if (step.kind === "engine stop") {
        const enough = cooledS >= needed.durationS - EPSILON;
        const had = cooledS;
        cooledS = 0;
        if (!enough) {
          const fault = had > 0 ? `a cool-down of ${figure(had)} s, less than ${needed.durationS} s,` : "no timed cool-down";
          return [
            {
              message: `${at.name} has ${fault} before its engine stop. Add ${needed.text} before it.`,
              where: atPoint(at, "steps", step.id),
            },
          ];
        }
      }
      return [];
    });
  });
}

export const powerRules: Rule[] = [
  { number: "13", code: "stop-point-not-last", severity: "must", at: "card", card: stopNotLast },
  { number: "36", code: "power-held-too-long", severity: "must", at: "card", card: heldTooLong },
  { number: "37", code: "climb-too-short", severity: "must", at: "card", card: climbTooShort },
  { number: "51", code: "cool-down-missing", severity: "must", at: "card", card: coolDownMissing },
];
