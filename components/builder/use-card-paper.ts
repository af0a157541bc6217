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

/** What follows from the card so far; `well` is false where it will stand against the flight. */
export type CardFact = { text: string; well: boolean };

function factsOf(card: ReturnType<typeof assembleCard>, pageCount: number): CardFact[] {
  if (card.content.points.length === 0) return [{ text: "No test point is on the card yet.", well: false }];
  const { minutes, fuelRequiredL, takeOff, landing, zeroFuel } = planCard(card);
  const { fuelOnBoardL, bingoL } = card.content;
  const pointPages = pageCount - 1;
  const outside = [takeOff, landing, zeroFuel].some((load) => load !== null && !load.inside);
  const bingo = bingoL === null ? "" : `, bingo ${bingoL} L`;
  const needed = Math.ceil(fuelRequiredL);
  return [
    { text: `Planned ${Math.floor(minutes / 60)} h ${String(Math.round(minutes % 60)).padStart(2, "0")}`, well: true },
    fuelOnBoardL === null
      ? { text: `Fuel ${needed} L wanted, none stated`, well: false }
      : { text: `Fuel ${needed} L of ${fuelOnBoardL} L${bingo}`, well: fuelRequiredL <= fuelOnBoardL },
    outside
      ? { text: "Mass or CG is outside the envelope: see Cover", well: false }
      : { text: "Mass and CG inside the envelope", well: true },
    { text: `Cover and ${COUNTS[pointPages] ?? pointPages} ${pointPages === 1 ? "page" : "pages"}, A5`, well: true },
  ];
}
