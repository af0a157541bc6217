import type { CardFacts, Problem, Rule, SortieFacts } from "./rule";

function configurationNotCurrent({ programme, context, name }: CardFacts): Problem[] {
  const mine = programme.configuration;
  const current = context.currentConfiguration;
  const where = { at: "programme", field: "configuration" } as const;
  if (!current) return [{ message: `${name}: the programme has no current configuration. Have one signed and put it on the card.`, where }];
  if (!mine) return [{ message: `${name} names no configuration; the current one is ${current.number}. Update the card.`, where }];
  if (mine.id !== current.id)
    return [
      {
        message: `${name} stands on ${mine.number}, but the current configuration is ${current.number}. Update the card or the aircraft.`,
        where,
      },
    ];
  if (!current.signed || mine.signedBy === null)
    return [{ message: `${name}: configuration ${current.number} is not signed. Have it signed, then update the card.`, where }];
  return [];
}

/** The configuration that the sortie names, beside what its cards name. */
function otherConfiguration({ sortie, context }: SortieFacts): Problem[] {
  const current = context.currentConfiguration;
  if (!current || sortie.configuration?.id === current.id) return [];
  const fault = sortie.configuration
    ? `is planned on ${sortie.configuration.number}, but the current configuration is ${current.number}`
    : `names no configuration; the current one is ${current.number}`;
  return [{ message: `The sortie ${fault}. Update the sortie or the aircraft.`, where: { at: "sortie", field: "configuration" } }];
}

function groundingSquawk({ context }: CardFacts): Problem[] {
  return context.groundingSquawks.map((squawk) => ({
    message: `Grounding squawk ${squawk.number} is open: ${squawk.text.trim().replace(/\.$/, "")}. Clear it before release or brief.`,
    where: { at: "programme", field: `squawks.${squawk.id}` },
  }));
}

function authorReleases({ card, context }: CardFacts): Problem[] {
  const { author } = card.identity;
  if (context.releaser?.id !== author.id) return [];
  return [{ message: `${author.name} wrote this card and is its only releaser. Get a second person.`, where: { at: "card" } }];
}

function editedAfterRelease({ name, context }: CardFacts): Problem[] {
  const { digest, releasedDigest } = context;
  if (releasedDigest === null || digest === null || digest === releasedDigest) return [];
  return [
    {
      message: `${name}: its content digest ${digest.slice(0, 8)} differs from the released ${releasedDigest.slice(0, 8)}. Make a new revision.`,
      where: { at: "card" },
    },
  ];
}

function callWordsMissing({ programme }: CardFacts): Problem[] {
  const where = { at: "programme", field: "callWords" } as const;
  if (programme.callWords.length === 0) return [{ message: "The call words are not defined on the cover. Print the team's own.", where }];
  return programme.callWords
    .filter(({ word, meaning }) => word.trim() === "" || meaning.trim() === "")
    .map(({ word }) => ({ message: `The call word "${word.trim()}" has no meaning on the cover. Print the team's own.`, where }));
}

function basisMissing({ programme }: CardFacts): Problem[] {
  if (programme.hotDayBasis !== null) return [];
  return [
    {
      message: "The programme's hot-day basis is not set, so it cannot be printed. Choose us or metric.",
      where: { at: "programme", field: "hotDayBasis" },
    },
  ];
}

export const releaseRules: Rule[] = [
  {
    number: "22",
    code: "configuration-not-current",
    severity: "must",
    at: "both",
    card: configurationNotCurrent,
    sortie: otherConfiguration,
  },
  { number: "23", code: "grounding-squawk-open", severity: "must", at: "both", card: groundingSquawk },
  { number: "30", code: "author-sole-releaser", severity: "must", at: "card", card: authorReleases },
  { number: "31", code: "edited-after-release", severity: "must", at: "both", card: editedAfterRelease },
  { number: "42", code: "call-words-missing", severity: "must", at: "card", card: callWordsMissing },
  { number: "53", code: "hot-day-basis-missing", severity: "must", at: "card", card: basisMissing },
];
