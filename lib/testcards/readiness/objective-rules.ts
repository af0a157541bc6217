import { atPoint, type CardFacts, type Problem, type Rule } from "./rule";

function pointWithoutObjective(facts: CardFacts): Problem[] {
  const known = new Set(facts.programme.objectives.map((objective) => objective.code));
  return facts.points.flatMap((at): Problem[] => {
    if (at.point.objectives.some((code) => known.has(code))) return [];
    const fault =
      at.point.objectives.length > 0
        ? `names ${at.point.objectives.join(", ")}, which the programme does not have, and serves no objective`
        : "serves no objective";
    return [{ message: `${at.name} ${fault}. Link one or drop the point.`, where: atPoint(at, "objectives") }];
  });
}

function objectiveWithoutPoint(facts: CardFacts): Problem[] {
  const covered = new Set([...facts.context.objectivesCovered, ...facts.content.points.flatMap((point) => point.objectives)]);
  return facts.programme.objectives
    .filter((objective) => !covered.has(objective.code))
    .map((objective) => ({
      message: `${objective.code} "${objective.question}" has no point. Plan one or say who shows it otherwise.`,
      where: { at: "programme", field: "objectives" },
    }));
}

export const objectiveRules: Rule[] = [
  { number: "18a", code: "point-no-objective", severity: "must", at: "card", card: pointWithoutObjective },
  { number: "18b", code: "objective-no-point", severity: "should", at: "card", card: objectiveWithoutPoint },
];
