import { atPoint, type CardFacts, type Problem, type Rule } from "./rule";
import { list } from "./say";

function positionMissing(facts: CardFacts): Problem[] {
  return facts.points.flatMap((at) => {
    if (at.point.engine === "stopped") return [];
    const air = at.point.place === "air";
    return facts.programme.controls.flatMap((control): Problem[] => {
      const stated = at.point.positions.find((p) => p.control === control.name);
      const known = control.positions.find((p) => p.name === stated?.position);
      if (known && !(air && known.groundOnly)) return [];
      const anywhere = control.positions.filter((p) => !p.groundOnly).map((p) => p.name);
      const ground = control.positions.filter((p) => p.groundOnly).map((p) => p.name);
      const write = `Write ${list(anywhere, "or")} first in the entry line${ground.length > 0 ? ` (${list(ground, "or")} on the ground only)` : ""}.`;
      const fault = !stated
        ? `states no ${control.name} position`
        : known
          ? `states ${control.name} ${known.name} in the air`
          : `states ${control.name} ${stated.position}, which it has not`;
      return [{ message: `${at.name} ${fault}. ${write}`, where: atPoint(at, "positions", control.name) }];
    });
  });
}

function recoveryWithoutOpening(facts: CardFacts): Problem[] {
  return facts.points.flatMap((at) => {
    const powered = at.point.conditions.includes("at power") || at.point.conditions.includes("full power");
    if (!powered || at.point.engine === "stopped") return [];
    return at.taken.flatMap(({ control, position }): Problem[] => {
      const first = `${control.name} ${control.recoverTo}`;
      if (!position.restricted || at.point.recovery.trim().toUpperCase().startsWith(first.toUpperCase())) return [];
      return [
        {
          message: `${at.name} takes ${control.name} ${position.name} at power and its recovery does not start with ${first}. Put it first.`,
          where: atPoint(at, "recovery"),
        },
      ];
    });
  });
}

function gapNotMeasured(facts: CardFacts): Problem[] {
  const configuration = facts.programme.configuration;
  const controls = facts.programme.controls.map((control) => control.name);
  if (!configuration || controls.length === 0) return [];
  const { gapsMeasuredOn, disturbedOn, number } = configuration;
  if (gapsMeasuredOn && (!disturbedOn || gapsMeasuredOn >= disturbedOn)) return [];
  const fault = gapsMeasuredOn
    ? `were measured on ${gapsMeasuredOn}, but not since they were disturbed on ${disturbedOn}`
    : "were never measured";
  const message = `The gaps of ${list(controls)} in ${number} ${fault}. Measure them at every position.`;
  return [{ message, where: { at: "programme", field: "configuration" } }];
}

export const controlRules: Rule[] = [
  { number: "45", code: "cowl-position-missing", severity: "must", at: "card", card: positionMissing },
  { number: "48", code: "cowl-shut-no-opening", severity: "must", at: "card", card: recoveryWithoutOpening },
  { number: "50", code: "exit-gap-not-measured", severity: "should", at: "both", card: gapNotMeasured },
];
