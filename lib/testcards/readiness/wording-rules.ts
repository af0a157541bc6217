import { trueValueOnGaugeLine } from "./abort-rules";
import { type PilotLine, pilotLines, stepLetter } from "./facts";
import { atPoint, type CardFacts, type Problem, type Rule } from "./rule";

const LONGEST_STEP = 60;
const MOST_STEPS = 7;

/** Every pilot line of the card, and those of the programme that print on it. */
function onLines(facts: CardFacts, check: (line: PilotLine) => string | null): Problem[] {
  const points = facts.points.flatMap((at) =>
    pilotLines(at.point).flatMap((line): Problem[] => {
      const message = check(line);
      return message === null ? [] : [{ message: `${at.name}, ${line.what}: ${message}`, where: atPoint(at, line.field, line.item) }];
    }),
  );
  const programme = programmeLines(facts).flatMap(({ text, what, field }): Problem[] => {
    const message = check({ text, what, field: undefined });
    return message === null ? [] : [{ message: `${what}: ${message}`, where: { at: "programme", field } }];
  });
  return [...points, ...programme];
}

function programmeLines({ programme }: CardFacts): { text: string; what: string; field: string }[] {
  const { thenLine, thenActions } = programme;
  return [
    { text: thenLine.air, what: "THEN line in the air", field: "thenLine" },
    { text: thenLine.ground, what: "THEN line on the ground", field: "thenLine" },
    ...[...thenActions.air, ...thenActions.ground].map((text) => ({ text, what: "THEN action", field: "thenActions" })),
    ...programme.standingAborts.flatMap((line) =>
      line.kind === "event" ? [{ text: line.text, what: "Standing abort", field: "standingAborts" }] : [],
    ),
  ];
}

const SAYS_WHERE_READ = /\bon (the )?(gauge|panel|repeater|logger|recorder|display|dial|asi)\b/i;
const escaped = (text: string): string => text.replace(/[.*+?^${}()|[\]\\]/g, "\\$&");

/** "coolant 85" without "on the gauge": the name of a safety parameter that the pilot reads, then a number that is no time. */
function unsaidGauge(facts: CardFacts): RegExp | null {
  const names = facts.used.flatMap(({ instrument }) => {
    const parameter = instrument && facts.parameters.get(instrument.parameter);
    return instrument && parameter?.safety && instrument.visibleTo.includes("pilot")
      ? [parameter.shortName, parameter.name, instrument.gaugeName]
      : [];
  });
  const distinct = [...new Set(names.map((name) => name.trim()).filter((name) => name.length > 1))].sort((a, b) => b.length - a.length);
  if (distinct.length === 0) return null;
  return new RegExp(
    `\\b(?:${distinct.map(escaped).join("|")})\\b(?:\\s+(?:to|at|of|below|above|under|over|is|until|=|<|>|≤|≥))*\\s*(\\d+(?:\\.\\d+)?)(?![\\d.:]|\\s*(?:s|sec|min|h|times)\\b)`,
    "i",
  );
}

function gaugeTrueMixed(facts: CardFacts): Problem[] {
  const unsaid = unsaidGauge(facts);
  const lines = onLines(facts, ({ text }) => {
    if (/\d[^.;,]*\btrue\b|\btrue\b[^.;,]*\d/i.test(text))
      return `"${text}" shows a true value. Print the gauge number and say "on the gauge".`;
    const found = unsaid && !SAYS_WHERE_READ.test(text) ? unsaid.exec(text) : null;
    return found ? `"${found[0]}" stands without "on the gauge". Print the gauge number and say so.` : null;
  });
  return [...lines, ...trueValueOnGaugeLine(facts)];
}

function stepsTooLong(facts: CardFacts): Problem[] {
  return facts.points.flatMap((at): Problem[] => {
    const { steps } = at.point;
    const many: Problem[] =
      steps.length > MOST_STEPS
        ? [{ message: `${at.name} has ${steps.length} steps, more than ${MOST_STEPS}. Cut them.`, where: atPoint(at, "steps") }]
        : [];
    const long = steps.flatMap((step, i): Problem[] => {
      const length = [...step.text].length;
      if (length <= LONGEST_STEP) return [];
      return [
        {
          message: `${at.name}, step ${stepLetter(i)} has ${length} characters, more than ${LONGEST_STEP}. Cut it.`,
          where: atPoint(at, "steps", step.id),
        },
      ];
    });
    return [...many, ...long];
  });
}

function vagueWords(facts: CardFacts): Problem[] {
  return onLines(facts, ({ text }) => {
    const found = /\b(monitor|as required|normal|if possible)\b/i.exec(text);
    return found && !/\d/.test(text) ? `"${found[0]}" stands without a number. Give the number.` : null;
  });
}

/** The bare word, unless the two words before it name a control or the wing. */
function flapAlone(facts: CardFacts): Problem[] {
  const names = facts.programme.controls.flatMap((control) => control.name.toUpperCase().split(/\s+/)).filter((word) => word !== "FLAP");
  const owners = new Set(["WING", ...names]);
  const choice = [...facts.programme.controls.map((control) => control.name), "WING FLAP"].join(" or ");
  return onLines(facts, ({ text }) => {
    const words = text.toUpperCase().split(/[^\p{L}\p{N}]+/u);
    const alone = words.some(
      (word, i) => /^FLAPS?$/.test(word) && !words.slice(Math.max(0, i - 2), i).some((before) => owners.has(before)),
    );
    return alone ? `"flap" stands alone in "${text}". Write ${choice}.` : null;
  });
}

export const wordingRules: Rule[] = [
  { number: "4", code: "gauge-true-mixed", severity: "must", at: "card", card: gaugeTrueMixed },
  { number: "33", code: "step-too-long", severity: "should", at: "card", card: stepsTooLong },
  { number: "34", code: "vague-word", severity: "should", at: "card", card: vagueWords },
  { number: "47", code: "flap-word-ambiguous", severity: "must", at: "card", card: flapAlone },
];
