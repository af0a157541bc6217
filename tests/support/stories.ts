import type { CardContent } from "@/lib/testcards/card";
import type { Debrief } from "@/lib/testcards/debrief-types";
import type { Role } from "@/lib/testcards/words";
import { createCard } from "@/lib/workflow/card/create-card";
import { findingKey } from "@/lib/workflow/card/policy";
import { getCardRevision } from "@/lib/workflow/card/queries";
import { releaseCard } from "@/lib/workflow/card/release-card";
import { saveDraft } from "@/lib/workflow/card/save-draft";
import { submitCard } from "@/lib/workflow/card/submit-card";
import { answerCard } from "@/lib/workflow/sortie/answer-card";
import { briefSortie } from "@/lib/workflow/sortie/brief-sortie";
import { planSortie } from "@/lib/workflow/sortie/plan-sortie";
import { getSortie } from "@/lib/workflow/sortie/queries";
import { readyCard } from "../testcards/support/ready-card";
import { type Typed, typedDebrief } from "../testcards/support/sample-debrief";
import { type Desk, TODAY } from "./new-desk";

/** The steps of the main thread, each by the role whose step it is. */
export const readyContent = (over: Partial<CardContent> = {}): CardContent => ({ ...readyCard().content, ...over });

export function draftCard(desk: Desk, over: Partial<CardContent> = {}) {
  const card = createCard(desk.as("engineer"), { programmeId: desk.programmeId, title: "Climb cooling", kind: "flight" });
  const saved = saveDraft(desk.as("engineer"), { cardId: card.id, version: 1, content: readyContent(over) });
  return { cardId: card.id, version: saved.version };
}

/** One line for each "should" that stands. */
export function answersFor(desk: Desk, cardId: string): Record<string, string> {
  const { findings } = getCardRevision(desk.db, desk.as("engineer").actor, cardId, { today: TODAY });
  return Object.fromEntries(
    findings.filter(({ severity }) => severity === "should").map((finding) => [findingKey(finding), "Known and wanted."]),
  );
}

export function cardInReview(desk: Desk, over: Partial<CardContent> = {}) {
  const { cardId, version } = draftCard(desk, over);
  submitCard(desk.as("engineer"), { cardId, version, answers: answersFor(desk, cardId) });
  return { cardId };
}

/** What a reviewer sees is what is signed. */
export function release(desk: Desk, cardId: string, role: Role = "reviewer") {
  const { digest } = getCardRevision(desk.db, desk.as(role).actor, cardId, { today: TODAY });
  const proof = { userId: desk.people[role].id, digest, at: desk.clock.now };
  return releaseCard(desk.as(role, { proof }), { cardId, digest });
}

export function releasedCard(desk: Desk, over: Partial<CardContent> = {}) {
  const { cardId } = cardInReview(desk, over);
  return { cardId, ...release(desk, cardId) };
}

export function sortieInput(desk: Desk, revisionIds: string[]) {
  return {
    programmeId: desk.programmeId,
    kind: "flight",
    plannedOn: "2031-05-05",
    crew: [
      { userId: desk.people.pilot.id, name: "The pilot", role: "pilot", massKg: 92 },
      { userId: null, name: "D. Observer", role: "observer", massKg: 72 },
    ],
    revisionIds,
    settings: {
      baggageKg: 6,
      fuelOnBoardL: 64,
      forecastOatC: 30,
      dayPlan: { daylight: "sunset 19:40 UTC, land by 18:40", dutyTime: "8 h from 06:00 UTC", runway: "27, dry, 700 m" },
    },
  };
}

export function plannedSortie(desk: Desk, over: Partial<CardContent> = {}) {
  const card = releasedCard(desk, over);
  const sortie = planSortie(desk.as("engineer"), sortieInput(desk, [card.revisionId]));
  return { ...card, sortieId: sortie.id };
}

export function accept(desk: Desk, { sortieId, revisionId, digest }: { sortieId: string; revisionId: string; digest: string }) {
  return answerCard(desk.as("pilot"), { sortieId, revisionId, digest, answer: "accepted" });
}

export function brief(desk: Desk, sortieId: string) {
  const { findings } = getSortie(desk.db, desk.as("pilot").actor, sortieId, { today: TODAY });
  const answers = Object.fromEntries(
    findings.filter(({ severity }) => severity === "should").map((finding) => [findingKey(finding), "Known."]),
  );
  return briefSortie(desk.as("pilot"), {
    sortieId,
    goNoGo: [{ line: "wind 15 kt, gust spread 8, crosswind 8 or less", go: true }],
    answers,
  });
}

export function briefedSortie(desk: Desk) {
  const planned = plannedSortie(desk);
  accept(desk, planned);
  brief(desk, planned.sortieId);
  return planned;
}

export function debriefOf(desk: Desk, sortieId: string, points: Record<string, Typed> = {}, over: Partial<Debrief> = {}): Debrief {
  const card = getSortie(desk.db, desk.as("pilot").actor, sortieId, { today: TODAY }).cards[0];
  if (!card) throw new Error("The sortie has no card.");
  return typedDebrief(card.document, points, over);
}
