import type { Hazard } from "../card";
import { riskLevel } from "../risk";
import { RISK_LEVELS, type RiskLevel } from "../words";
import { atPoint, type CardFacts, type Problem, type Rule } from "./rule";

/** Hazards named by the card's points, each once, in the hazard sheet's order. */
function hazardsOf(facts: CardFacts): Hazard[] {
  const named = new Set(facts.content.points.flatMap((point) => point.hazards));
  return facts.programme.hazards.filter((hazard) => named.has(hazard.code));
}

const acts = (hazard: Hazard) => hazard.mitigations.filter(({ text }) => !saysNothing(text));

/** "Eliminated" is a state reached by design; a procedure or a warning alone never earns it. */
function residual(hazard: Hazard): RiskLevel {
  const { severity, probability } = hazard.after;
  const byDesign = acts(hazard).some(({ kind }) => kind === "design");
  return riskLevel(severity, probability === "F" && !byDesign ? "E" : probability);
}

const rank = (level: RiskLevel): number => RISK_LEVELS.indexOf(level);

function riskAboveSigner(facts: CardFacts): Problem[] {
  const { releaser } = facts.context;
  return hazardsOf(facts).flatMap((hazard): Problem[] => {
    const level = residual(hazard);
    const where = { at: "hazard", hazard: hazard.code } as const;
    if (level === "High")
      return [{ message: `${hazard.code} ${hazard.title}: residual risk High, which nobody may accept. Lower it before release.`, where }];
    if (!releaser || rank(level) <= rank(releaser.residualRisk)) return [];
    return [
      {
        message: `${hazard.code} ${hazard.title}: residual risk ${level} is above what ${releaser.name} may accept, ${releaser.residualRisk}. Get the higher signature.`,
        where,
      },
    ];
  });
}

/** "Be careful" and its kin: words that change nothing. */
function saysNothing(text: string): boolean {
  const rest = text
    .toLowerCase()
    .replace(/\b(please|pilot|crew|always|very|to|and|the|a|must|should|is|are)\b/g, " ")
    .replace(
      /\b(be|take|use|with|exercise)?\s*(careful(ly)?|care|caution|cautious(ly)?|attention|attentive|aware(ness)?|alert|vigilan(t|ce)|mindful|briefed to|pay)\b/g,
      " ",
    )
    .replace(/[^\p{L}\p{N}]+/gu, "");
  return rest === "";
}

function notMitigated(facts: CardFacts): Problem[] {
  const known = new Set(facts.programme.hazards.map((hazard) => hazard.code));
  const bare = hazardsOf(facts).flatMap((hazard): Problem[] => {
    if (acts(hazard).length > 0) return [];
    const fault = hazard.mitigations.length === 0 ? "has no mitigation" : `has only "${hazard.mitigations[0]?.text.trim()}"`;
    return [{ message: `${hazard.code} ${hazard.title} ${fault}. Add one that acts.`, where: { at: "hazard", hazard: hazard.code } }];
  });
  const unknown = facts.points.flatMap((at) =>
    at.point.hazards
      .filter((code) => !known.has(code))
      .map(
        (code): Problem => ({
          message: `${at.name} names hazard ${code}, which the hazard sheet does not hold. Enter it with its mitigations.`,
          where: atPoint(at),
        }),
      ),
  );
  return [...bare, ...unknown];
}

function severityCut(facts: CardFacts): Problem[] {
  return hazardsOf(facts).flatMap((hazard): Problem[] => {
    const { before, after, mitigations } = hazard;
    const byWords = mitigations.every(({ kind }) => kind === "procedure" || kind === "training");
    if (after.severity <= before.severity || !byWords) return [];
    const message = `${hazard.code} ${hazard.title}: severity was lowered from ${before.severity} to ${after.severity} by a procedure alone. Lower the probability instead, or show the design change.`;
    return [{ message, where: { at: "hazard", hazard: hazard.code } }];
  });
}

export const hazardRules: Rule[] = [
  { number: "16a", code: "risk-above-signer", severity: "must", at: "card", card: riskAboveSigner },
  { number: "16b", code: "hazard-not-mitigated", severity: "must", at: "card", card: notMitigated },
  { number: "17", code: "severity-cut-by-procedure", severity: "should", at: "card", card: severityCut },
];
