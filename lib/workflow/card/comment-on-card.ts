import { reviewComments } from "@/db/schema";
import { Refusal } from "../errors";
import { defineUseCase } from "../use-case";
import { openCard, requireState } from "./internal";
import { CommentOnCardInput } from "./schema";

/** A comment on the card or on one of its points, while it is in review. */
export const commentOnCard = defineUseCase({
  name: "card.comment",
  permission: "comment in review",
  input: CommentOnCardInput,
  run(tx, { actor, now, newId }, { cardId, pointId, text }) {
    const { revision } = openCard(tx, actor, cardId);
    requireState(revision, "in review", "commented on");
    if (pointId !== null && !revision.content.points.some((point) => point.id === pointId))
      throw new Refusal("not-found", "This card has no such point.", "pointId");
    const comment = { id: newId(), revisionId: revision.id, pointId, authorId: actor.id, text, createdAt: now.toISOString() };
    tx.insert(reviewComments).values(comment).run();
    return {
      out: { id: comment.id, createdAt: comment.createdAt },
      audit: { subject: `card-revision/${revision.id}`, after: { pointId, text } },
    };
  },
});
