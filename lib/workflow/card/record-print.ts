import { prints } from "@/db/schema";
import { digestOf } from "../digest";
import { defineUseCase } from "../use-case";
import { getDocument } from "./rows";
import { RecordPrintInput } from "./schema";

/** Who printed what, by digest: so that old prints can be found and destroyed. Drafts print too, marked as such. */
export const recordPrint = defineUseCase({
  name: "card.print",
  permission: "read and print",
  input: RecordPrintInput,
  run(tx, { actor, now, newId }, { cardId, letter, paper }) {
    const { revision, document } = getDocument(tx, actor, cardId, letter);
    const digest = revision.digest ?? digestOf(document);
    const print = {
      id: newId(),
      revisionId: revision.id,
      paper,
      state: revision.state,
      digest,
      printedBy: actor.id,
      printedAt: now.toISOString(),
    };
    tx.insert(prints).values(print).run();
    return {
      out: { id: print.id, printedAt: print.printedAt, href: `/api/v1/cards/${cardId}/revisions/${letter}/kneeboard.pdf?paper=${paper}` },
      audit: { subject: `card-revision/${revision.id}`, after: { paper, state: revision.state, digest } },
    };
  },
});
