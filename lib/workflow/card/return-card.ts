import { reviewComments } from "@/db/schema";
import { Refusal } from "../errors";
import { defineUseCase } from "../use-case";
import { openCard, requireState, updateRevision } from "./internal";
import { wroteIt } from "./policy";
import { ReturnCardInput } from "./schema";

/** In review → draft, with the comment that says what to change. */
export const returnCard = defineUseCase({
  name: "card.return",
  permission: "release cards",
  input: ReturnCardInput,
  run(tx, { actor, now, newId }, { cardId, text }) {
    const { revision } = openCard(tx, actor, cardId);
    requireState(revision, "in review", "returned");
    if (wroteIt(actor, revision)) throw new Refusal("forbidden", "You wrote this card, so a second reviewer has to return it.");
    const at = now.toISOString();
    tx.insert(reviewComments)
      .values({ id: newId(), revisionId: revision.id, pointId: null, authorId: actor.id, text, isReturn: true, createdAt: at })
      .run();
    updateRevision(tx, revision, { state: "draft", updatedAt: at });
    return {
      out: { version: revision.version + 1, state: "draft" as const },
      audit: { subject: `card-revision/${revision.id}`, before: { state: "in review" }, after: { state: "draft", comment: text } },
    };
  },
});
