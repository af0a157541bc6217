"use client";
import { useDeferredValue, useMemo } from "react";
import { B612_WIDTHS } from "@/lib/testcards/b612-widths";
import { assembleCard, type CardContent, type CardIdentity, type ProgrammeSnapshot } from "@/lib/testcards/card";
import { planCard } from "@/lib/testcards/card-plan";
import { reviewCard } from "@/lib/testcards/readiness";
import type { CardContext } from "@/lib/testcards/readiness-types";
import { measuredSheet } from "@/lib/testcards/sheet";
import type { CardState } from "@/lib/testcards/words";

type PaperInput = {
  programme: ProgrammeSnapshot;
  identity: CardIdentity;
  content: CardContent;
  context: Omit<CardContext, "widths">;
  state: CardState;
};

/** The document, its pages and its findings, all by the same core as the server's; the typing never waits for them. */
export function useCardPaper({ programme, identity, content, context, state }: PaperInput) {
  const settled = useDeferredValue(content);
  return useMemo(() => {
    const card = assembleCard(programme, identity, settled);
    const sheet = measuredSheet(card, { paper: "a5", state, widths: B612_WIDTHS });
    const findings = reviewCard(card, { ...context, widths: B612_WIDTHS, digest: null, releasedDigest: null }, sheet);
    return { card, pages: sheet.pages, findings, facts: factsOf(card, sheet.pages.length) };
  }, [programme, identity, settled, context, state]);
}

const COUNTS = ["no", "one", "two", "three", "four", "five", "six"];

function factsOf(card: ReturnType<typeof assembleCard>, pageCount: number): string[] {
  const plan = planCard(card);
  const { fuelOnBoardL, bingoL } = card.content;
  const pointPages = pageCount - 1;
  return [
    `Planned ${Math.floor(plan.minutes / 60)} h ${String(Math.round(plan.minutes % 60)).padStart(2, "0")}`,
    ...(fuelOnBoardL !== null && plan.fuelRequiredL <= fuelOnBoardL
      ? [`Fuel ${Math.ceil(plan.fuelRequiredL)} L of ${fuelOnBoardL} L${bingoL === null ? "" : `, bingo ${bingoL} L`}`]
      : []),
    `Cover and ${COUNTS[pointPages] ?? pointPages} ${pointPages === 1 ? "page" : "pages"}, A5`,
  ];
}
