import { cardRevisions } from "@/db/schema";
import { Refusal } from "../errors";
import { defineUseCase } from "../use-case";
import { openCard } from "./internal";
import { isFrozen, nextLetter } from "./policy";
import { ReviseCardInput } from "./schema";

/** The next letter, in draft, starting from the newest revision; that one stays as it is and in force. */
export const reviseCard = defineUseCase({
  name: "card.revise",
  permission: "write cards",
  input: ReviseCardInput,
  run(tx, { actor, now, newId }, { cardId }) {
    const { revision } = openCard(tx, actor, cardId);
    if (!isFrozen(revision.state))
      throw new Refusal("conflict", `Revision ${revision.letter} is still ${revision.state}: finish that one first.`, undefined, {
        state: revision.state,
      });
    const letter = nextLetter(revision.letter);
    const at = now.toISOString();
    const next = {
      id: newId(),
      cardId,
      letter,
      state: "draft" as const,
      content: revision.content,
      authorId: actor.id,
      createdAt: at,
      updatedAt: at,
      answers: {},
    };
    tx.insert(cardRevisions).values(next).run();
    return {
      out: { revisionId: next.id, letter, version: 1 },
      audit: {
        subject: `card-revision/${next.id}`,
        before: { letter: revision.letter, digest: revision.digest },
        after: { letter, state: "draft" },
      },
    };
  },
});
