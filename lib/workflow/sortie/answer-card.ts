import { and, eq } from "drizzle-orm";
import { signatures, sortieCards } from "@/db/schema";
import type { AuditEntry } from "@/lib/audit/append-audit";
import { Refusal } from "../errors";
import { defineUseCase } from "../use-case";
import { requireOpen, requireThisPilot, UNBRIEFED, updateSortie } from "./internal";
import { getSortieRow, listSortieCards } from "./rows";
import { AnswerCardInput } from "./schema";

type Answered = { answer: "accepted" | "declined"; digest: string; answeredAt: string | null };

/** The pilot accepts or declines exactly what was shown, by its digest. */
export const answerCard = defineUseCase({
  name: "sortie.answer-card",
  permission: "accept cards",
  input: AnswerCardInput,
  run(tx, { actor, now, newId }, { sortieId, revisionId, digest, answer, why }): { out: Answered; audit: AuditEntry | "unchanged" } {
    const sortie = getSortieRow(tx, actor, sortieId);
    requireOpen(sortie, "answered");
    requireThisPilot(tx, actor, sortieId);
    const card = listSortieCards(tx, actor, sortie).find((planned) => planned.revisionId === revisionId);
    if (!card) throw new Refusal("not-found", "This sortie has no such card.");
    if (card.digest !== digest)
      throw new Refusal("stale", "This card changed since it was shown. Read it again, then answer.", undefined, { digest: card.digest });
    if (answer === "accepted" && card.state !== "released")
      throw new Refusal(
        "conflict",
        `Card ${card.number} revision ${card.letter} is ${card.state}: only a released revision can be accepted. A reviewer releases it.`,
      );
    if (card.answer === answer && card.answeredDigest === digest && answer === "accepted")
      return { out: { answer, digest, answeredAt: card.answeredAt }, audit: "unchanged" };

    const answeredAt = now.toISOString();
    tx.update(sortieCards)
      .set({ answer, answeredDigest: digest, answeredBy: actor.id, answeredAt, declineWhy: answer === "declined" ? why : null })
      .where(and(eq(sortieCards.sortieId, sortieId), eq(sortieCards.revisionId, revisionId)))
      .run();
    const subject = `sortie-card/${sortieId}/${revisionId}`;
    tx.insert(signatures)
      .values({
        id: newId(),
        teamId: actor.teamId,
        subject,
        meaning: answer,
        digest,
        signedBy: actor.id,
        name: actor.name,
        role: "pilot",
        signedAt: answeredAt,
      })
      .run();
    if (answer === "declined" && sortie.state === "briefed") updateSortie(tx, sortie, UNBRIEFED);
    return {
      out: { answer, digest, answeredAt },
      audit: { subject, before: { answer: card.answer, digest: card.answeredDigest }, after: { answer, digest, why } },
    };
  },
});
