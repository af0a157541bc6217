import { createHash } from "node:crypto";
import { eq } from "drizzle-orm";
import type { Db } from "@/db/open";
import { cardRevisions, cards } from "@/db/schema";
import { appendAudit } from "@/lib/audit/append-audit";
import { toActor } from "@/lib/auth/roles";
import type { CardContent } from "@/lib/testcards/card";
import { findingKey } from "@/lib/workflow/card/policy";
import { getCardRevision } from "@/lib/workflow/card/queries";
import { releaseCard } from "@/lib/workflow/card/release-card";
import { getDocument } from "@/lib/workflow/card/rows";
import { saveDraft } from "@/lib/workflow/card/save-draft";
import { submitCard } from "@/lib/workflow/card/submit-card";
import type { Ctx } from "@/lib/workflow/context";
import { digestOf } from "@/lib/workflow/digest";
import { PROGRAMME_ID } from "./aircraft";
import { dayFrom, instantOn } from "./days";
import { type SeedSubject, seedId } from "./ids";
import { PEOPLE, TEAM } from "./people";

/** One line for each "should" that the demo's cards and sorties meet, by its code. */
const ANSWERS: Record<string, string> = {
  "too-many-numbers": "The observer writes beside the pilot.",
  "reading-unused": "Kept for the record beside the limits.",
  "far-from-hot-day": "Said in the report; flown again on a warmer day.",
  "day-plan-missing": "Stated at the brief.",
};
const ANSWER = "Discussed at the review and left so.";

export type Desk = ReturnType<typeof openDesk>;

/** The people of the demo at their work, on a day and at a time, with ids and codes that come out the same every time. */
export function openDesk(db: Db, demoDate: string) {
  let made = 0;
  const next = (subject: SeedSubject) => () => {
    made += 1;
    return seedId(subject, made);
  };
  const newId = next("made");
  const randomBytes = (size: number) => createHash("sha256").update(`demo code ${newId()}`).digest().subarray(0, size);

  const as = (who: keyof typeof PEOPLE, offset: number, hhmm: string, signing?: string): Ctx => {
    const { id, name, email, roles, residualRisk } = PEOPLE[who];
    const now = instantOn(demoDate, offset, hhmm);
    const sessionId = seedId("session", 1);
    const actor = toActor({ id, name, email, roles, residualRisk, teamId: TEAM.id, sessionId });
    const proof = signing === undefined ? {} : { proof: { userId: id, digest: signing, at: now } };
    return { db, actor, now, today: dayFrom(demoDate, offset), newId, randomBytes, ...proof };
  };

  /** Card numbers have gaps, for not every card of the programme was written here. */
  const writeCard = (number: string, offset: number, content: CardContent): string => {
    const ctx = as("engineer", offset, "09:00");
    const at = ctx.now.toISOString();
    const card = { id: newId(), programmeId: PROGRAMME_ID, number, createdAt: at, createdBy: ctx.actor.id };
    const revision = {
      id: newId(),
      cardId: card.id,
      letter: "A",
      state: "draft" as const,
      authorId: ctx.actor.id,
      createdAt: at,
      updatedAt: at,
    };
    db.insert(cards).values(card).run();
    db.insert(cardRevisions)
      .values({ ...revision, content: { ...content, points: [] }, answers: {} })
      .run();
    appendAudit(db, ctx, "card.create", { subject: `card/${card.id}`, after: { number, title: content.title, kind: content.kind } });
    saveDraft(as("engineer", offset, "09:40"), { cardId: card.id, version: 1, content });
    return card.id;
  };

  const versionOf = (cardId: string): number => {
    const rows = db
      .select({ version: cardRevisions.version, state: cardRevisions.state })
      .from(cardRevisions)
      .where(eq(cardRevisions.cardId, cardId))
      .all();
    const open = rows.find((row) => row.state === "draft" || row.state === "in review");
    if (!open) throw new Error(`Card ${cardId} has no open revision.`);
    return open.version;
  };

  const rewrite = (cardId: string, offset: number, content: CardContent): void => {
    saveDraft(as("engineer", offset, "10:00"), { cardId, version: versionOf(cardId), content });
  };

  const sendForReview = (cardId: string, offset: number): void => {
    const ctx = as("engineer", offset, "11:00");
    const { findings } = getCardRevision(db, ctx.actor, cardId, { today: ctx.today });
    const answers = answersTo(findings);
    submitCard(ctx, { cardId, version: versionOf(cardId), answers });
  };

  const release = (cardId: string, offset: number): string => {
    const reader = as("reviewer", offset, "17:20");
    const digest = digestOf(getDocument(db, reader.actor, cardId).document);
    return releaseCard(as("reviewer", offset, "17:20", digest), { cardId, digest }).revisionId;
  };

  return { as, writeCard, rewrite, sendForReview, release, newDebriefId: next("debrief") };
}

export function answersTo(findings: readonly Parameters<typeof findingKey>[0][]): Record<string, string> {
  const shoulds = findings.filter((finding) => finding.severity === "should");
  return Object.fromEntries(shoulds.map((finding) => [findingKey(finding), ANSWERS[finding.code] ?? ANSWER]));
}
