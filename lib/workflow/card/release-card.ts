import { randomBytes } from "node:crypto";
import { and, eq } from "drizzle-orm";
import type { Tx } from "@/db/open";
import { cardRevisions, signatures } from "@/db/schema";
import type { AuditEntry } from "@/lib/audit/append-audit";
import type { Ctx } from "../context";
import { canonicalJson, sha256 } from "../digest";
import { Refusal } from "../errors";
import { requireProof } from "../proof";
import { dropToPlanned } from "../sortie/drop-to-planned";
import { defineUseCase } from "../use-case";
import { openCard, refuseFindings, requireState, reviewNow, updateRevision } from "./internal";
import { openMusts, toSheetCode, unanswered, wroteIt } from "./policy";
import { ReleaseCardInput } from "./schema";

/** In review → released: frozen as canonical JSON with its digest, signed, and in force in place of the revision before it. */
export const releaseCard = defineUseCase({
  name: "card.release",
  permission: "release cards",
  input: ReleaseCardInput,
  run(tx, ctx, { cardId, digest: shown }) {
    const { actor } = ctx;
    const open = openCard(tx, actor, cardId);
    const { revision } = open;
    requireState(revision, "in review", "released");
    if (wroteIt(actor, revision)) throw new Refusal("forbidden", "You wrote this card, so another reviewer has to release it.");
    if (shown !== open.digest)
      throw new Refusal("stale", "The card or its programme changed since this page was shown. Read it again before you sign.", undefined, {
        digest: open.digest,
      });
    requireProof(ctx, open.digest);
    const findings = reviewNow(tx, ctx, open);
    refuseFindings(openMusts(findings), "Not released. These are open");
    refuseFindings(unanswered(findings, revision.answers), "Not released. These have no answer yet: return the card to its author");

    const document = canonicalJson(open.document);
    const digest = sha256(document);
    const at = ctx.now.toISOString();
    const superseded = supersedeEarlier(tx, ctx, open.card.id, revision.letter);
    const code = toSheetCode((ctx.randomBytes ?? randomBytes)(10));
    updateRevision(tx, revision, {
      state: "released",
      document,
      digest,
      code,
      findings,
      releasedAt: at,
      releasedBy: actor.id,
      updatedAt: at,
    });
    const subject = `card-revision/${revision.id}`;
    tx.insert(signatures)
      .values({
        id: ctx.newId(),
        teamId: actor.teamId,
        subject,
        meaning: "released",
        digest,
        signedBy: actor.id,
        name: actor.name,
        role: "reviewer",
        signedAt: at,
      })
      .run();
    const released: AuditEntry = { subject, before: { state: "in review" }, after: { state: "released", digest, code } };
    return { out: { revisionId: revision.id, letter: revision.letter, digest, code, releasedAt: at }, audit: [...superseded, released] };
  },
});

function supersedeEarlier(tx: Tx, ctx: Ctx, cardId: string, by: string): AuditEntry[] {
  const earlier = tx
    .select({ id: cardRevisions.id, letter: cardRevisions.letter, digest: cardRevisions.digest })
    .from(cardRevisions)
    .where(and(eq(cardRevisions.cardId, cardId), eq(cardRevisions.state, "released")))
    .all();
  return earlier.flatMap(({ id, letter, digest }): AuditEntry[] => {
    tx.update(cardRevisions)
      .set({ state: "superseded", endedAt: ctx.now.toISOString(), endedBy: ctx.actor.id, endedWhy: `superseded by revision ${by}` })
      .where(eq(cardRevisions.id, id))
      .run();
    const change: AuditEntry = {
      action: "card.supersede",
      subject: `card-revision/${id}`,
      before: { state: "released", digest },
      after: { state: "superseded", by },
    };
    return [change, ...dropToPlanned(tx, id, `revision ${letter} was superseded by ${by}`)];
  });
}
