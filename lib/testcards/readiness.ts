import type { CardDocument } from "./card";
import { abortRules } from "./readiness/abort-rules";
import { buildUpRules } from "./readiness/build-up-rules";
import { controlRules } from "./readiness/control-rules";
import { differenceRules } from "./readiness/difference-rules";
import { cardFacts } from "./readiness/facts";
import { gaugeRules } from "./readiness/gauge-rules";
import { hazardRules } from "./readiness/hazard-rules";
import { limitsRules } from "./readiness/limits-rules";
import { loadRules } from "./readiness/load-rules";
import { objectiveRules } from "./readiness/objective-rules";
import { powerRules } from "./readiness/power-rules";
import { readingRules } from "./readiness/reading-rules";
import { releaseRules } from "./readiness/release-rules";
import type { CardFacts, Problem, Rule, SheetFacts } from "./readiness/rule";
import { measureSheet } from "./readiness/sheet-facts";
import { sheetRules } from "./readiness/sheet-rules";
import { sortieRules } from "./readiness/sortie-rules";
import { speedRules } from "./readiness/speed-rules";
import { wordingRules } from "./readiness/wording-rules";
import type { CardContext, Finding, SortieContext, SortiePlan } from "./readiness-types";

export type { SheetFacts } from "./readiness/rule";
export { measureSheet } from "./readiness/sheet-facts";

const byNumber = (a: Rule, b: Rule): number =>
  Number.parseInt(a.number, 10) - Number.parseInt(b.number, 10) || a.number.localeCompare(b.number);

const RULES: Rule[] = [
  ...abortRules,
  ...buildUpRules,
  ...controlRules,
  ...differenceRules,
  ...gaugeRules,
  ...hazardRules,
  ...limitsRules,
  ...loadRules,
  ...objectiveRules,
  ...powerRules,
  ...readingRules,
  ...releaseRules,
  ...sheetRules,
  ...sortieRules,
  ...speedRules,
  ...wordingRules,
].sort(byNumber);

/** Every rule, in the order in which its findings are listed. Codes are stable: never re-used. */
export const READINESS_RULES: readonly Pick<Rule, "number" | "code" | "severity" | "at">[] = RULES.map(
  ({ number, code, severity, at }) => ({ number, code, severity, at }),
);

const findings = ({ code, severity }: Rule, problems: readonly Problem[]): Finding[] =>
  problems.map(({ message, where }) => ({ code, severity, message, where }));

/** The same sentence about the same place is said once, however many cards it was found through. */
function once(found: readonly Finding[]): Finding[] {
  const seen = new Set<string>();
  return found.filter((finding) => {
    const key = `${finding.code}|${finding.message}|${JSON.stringify(finding.where)}`;
    if (seen.has(key)) return false;
    seen.add(key);
    return true;
  });
}

/**
 * What stands against releasing a card: every rule at the card, in the order of their numbers.
 * `sheet` is the sheet as laid out; without it the sheet is laid out here, which costs most of the time. Null passes over the paper.
 */
export function reviewCard(card: CardDocument, context: CardContext, sheet: SheetFacts = measureSheet(card, context.widths)): Finding[] {
  const facts = cardFacts(card, context, card.content.plannedOn ?? context.today, sheet);
  return once(RULES.flatMap((rule) => (rule.at === "sortie" || !rule.card ? [] : findings(rule, rule.card(facts)))));
}

/** What stands against briefing a sortie: the rules at the sortie, and those at both for each of its cards on the planned day. */
export function reviewSortie(sortie: SortiePlan, context: SortieContext): Finding[] {
  const cards: CardFacts[] = sortie.cards.map(({ document, digest, releasedDigest }) =>
    cardFacts(document, { ...context, digest, releasedDigest }, sortie.plannedOn, null),
  );
  const found = RULES.flatMap((rule) => {
    if (rule.at === "card") return [];
    const { card, sortie: whole } = rule;
    return findings(rule, [...(whole ? whole({ sortie, context, cards }) : []), ...(card ? cards.flatMap((facts) => card(facts)) : [])]);
  });
  return once(found);
}
