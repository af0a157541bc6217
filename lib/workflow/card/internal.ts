import { and, eq } from "drizzle-orm";
import type { Tx } from "@/db/open";
import { cardRevisions } from "@/db/schema";
import type { Actor } from "@/lib/auth/roles";
import { B612_WIDTHS } from "@/lib/testcards/b612-widths";
import type { CardDocument } from "@/lib/testcards/card";
import { reviewCard } from "@/lib/testcards/readiness";
import type { Finding } from "@/lib/testcards/readiness-types";
import type { CardState } from "@/lib/testcards/words";
import type { Ctx } from "../context";
import { digestOf } from "../digest";
import { Refusal } from "../errors";
import { getProgrammeSnapshot } from "../programme/snapshot";
import { getReadinessFacts } from "./context";
import { writersOf } from "./policy";
import { type CardRow, documentOf, getCard, getRevisionRow, type RevisionRow } from "./rows";

export type OpenCard = { card: CardRow; revision: RevisionRow; document: CardDocument; digest: string };

/** The newest revision as it stands inside this transaction, with the document it makes now and that document's digest. */
export function openCard(tx: Tx, actor: Actor, cardId: string): OpenCard {
  const card = getCard(tx, actor, cardId);
  const revision = getRevisionRow(tx, actor, cardId);
  const document = documentOf(card, revision, () => getProgrammeSnapshot(tx, actor, card.programmeId));
  return { card, revision, document, digest: revision.digest ?? digestOf(document) };
}

/** Readiness of a document that is about to be sent or signed, by the same rules the builder shows. */
export function reviewNow(tx: Tx, ctx: Ctx, { card, revision, document, digest }: OpenCard): Finding[] {
  const facts = getReadinessFacts(tx, ctx.actor, card.programmeId, { today: ctx.today, writers: writersOf(revision) });
  return reviewCard(document, { ...facts, digest, releasedDigest: null, widths: B612_WIDTHS });
}

const WHO_MOVES: Record<CardState, string> = {
  draft: "It is a draft; an engineer sends it for review.",
  "in review": "It is in review; a reviewer releases or returns it.",
  released: "It is released and frozen; an engineer makes the next revision.",
  superseded: "It is superseded; only the newest revision moves.",
  withdrawn: "It is withdrawn; an engineer makes the next revision.",
};

export function requireState(revision: Pick<RevisionRow, "state" | "letter">, wanted: CardState, act: string): void {
  if (revision.state !== wanted)
    throw new Refusal("conflict", `Revision ${revision.letter} cannot be ${act} now. ${WHO_MOVES[revision.state]}`, undefined, {
      state: revision.state,
    });
}

export function requireVersion(revision: Pick<RevisionRow, "version">, seen: number): void {
  if (revision.version !== seen)
    throw new Refusal(
      "stale",
      "This card was changed meanwhile, on another screen or by someone else. Nothing was overwritten. Load it again to see what changed.",
      undefined,
      {
        currentVersion: revision.version,
      },
    );
}

/** Refuses by the findings' names, so that the reader knows which rules stand in the way. */
export function refuseFindings(findings: Finding[], said: string): void {
  if (findings.length === 0) return;
  const names = [...new Set(findings.map((finding) => finding.code))].join(", ");
  throw new Refusal("conflict", `${said}: ${names}.`, undefined, { findings });
}

/** One update guarded by the version that was read: where another connection was first, nothing changes. */
export function updateRevision(
  tx: Tx,
  revision: Pick<RevisionRow, "id" | "version">,
  change: Partial<typeof cardRevisions.$inferInsert>,
): void {
  const changed = tx
    .update(cardRevisions)
    .set({ ...change, version: revision.version + 1 })
    .where(and(eq(cardRevisions.id, revision.id), eq(cardRevisions.version, revision.version)))
    .run();
  if (changed.changes !== 1) throw new Refusal("stale", "This card was changed meanwhile. Load it again.");
}
