import { eq } from "drizzle-orm";
import { cardRevisions } from "@/db/schema";
import { dropToPlanned } from "../sortie/drop-to-planned";
import { defineUseCase } from "../use-case";
import { requireState } from "./internal";
import { getRevisionRow } from "./rows";
import { WithdrawCardInput } from "./schema";

/** Released → withdrawn, by a person with a reason. Every print of it is out of force from now. */
export const withdrawCard = defineUseCase({
  name: "card.withdraw",
  permission: "release cards",
  input: WithdrawCardInput,
  run(tx, { actor, now }, { cardId, letter, why }) {
    const revision = getRevisionRow(tx, actor, cardId, letter);
    requireState(revision, "released", "withdrawn");
    tx.update(cardRevisions)
      .set({ state: "withdrawn", endedAt: now.toISOString(), endedBy: actor.id, endedWhy: why })
      .where(eq(cardRevisions.id, revision.id))
      .run();
    const dropped = dropToPlanned(tx, revision.id, `revision ${letter} was withdrawn: ${why}`);
    const before = { state: "released", digest: revision.digest };
    return {
      out: { letter, state: "withdrawn" as const },
      audit: [{ subject: `card-revision/${revision.id}`, before, after: { state: "withdrawn", why } }, ...dropped],
    };
  },
});
