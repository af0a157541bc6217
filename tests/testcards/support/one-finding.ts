import { expect } from "vitest";
import type { CardDocument, CardPoint } from "@/lib/testcards/card";
import { reviewCard, reviewSortie } from "@/lib/testcards/readiness";
import type { CardContext, Finding, SortieContext, SortiePlan } from "@/lib/testcards/readiness-types";
import { readyCard, readyContext, readySortie, readySortieContext } from "./ready-card";

/** What one case breaks, in a card that is otherwise in order. */
export type Broken = { card: CardDocument; point: CardPoint; context: CardContext };

/** The card in order raises nothing; broken in one thing it raises this code and no other. Answers what was found. */
export function oneFinding(code: string | string[], points: CardPoint[], spoil: (broken: Broken) => void): Finding[] {
  const card = readyCard(points);
  const context = readyContext();
  expect(reviewCard(card, context)).toEqual([]);
  const point = card.content.points[0];
  if (!point) throw new Error("the card has no point");
  spoil({ card, point, context });
  const found = reviewCard(card, context);
  expect([...new Set(found.map((finding) => finding.code))]).toEqual([code].flat());
  return found;
}

/** The same for a sortie. */
export function oneSortieFinding(
  code: string,
  points: CardPoint[],
  spoil: (broken: { sortie: SortiePlan; card: CardDocument; context: SortieContext }) => void,
  over: Partial<SortiePlan> = {},
): Finding[] {
  const card = readyCard(points);
  const sortie = readySortie([card], over);
  const context = readySortieContext();
  expect(reviewSortie(sortie, context)).toEqual([]);
  spoil({ sortie, card, context });
  const found = reviewSortie(sortie, context);
  expect([...new Set(found.map((finding) => finding.code))]).toEqual([code]);
  return found;
}

/** The one message, with thin spaces and minus signs written plainly. */
export const plain = (found: readonly Finding[]): string => found.map(({ message }) => message.replaceAll("\u202f", " ")).join("\n");

export function must<T>(thing: T | null | undefined): T {
  if (thing === null || thing === undefined) throw new Error("the sample card lacks it");
  return thing;
}
