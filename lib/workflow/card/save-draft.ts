import { digestOf } from "../digest";
import { defineUseCase } from "../use-case";
import { openCard, requireState, requireVersion, updateRevision } from "./internal";
import { writersOf } from "./policy";
import { SaveDraftInput } from "./schema";

/** Saves what the builder holds. A save that changes nothing changes nothing; a stale one overwrites nothing. */
export const saveDraft = defineUseCase({
  name: "card.save-draft",
  permission: "write cards",
  input: SaveDraftInput,
  run(tx, { actor, now }, { cardId, version, content }) {
    const { revision } = openCard(tx, actor, cardId);
    requireState(revision, "draft", "edited");
    const before = digestOf(revision.content);
    const after = digestOf(content);
    if (before === after) return { out: { version: revision.version, savedAt: revision.updatedAt }, audit: "unchanged" };
    requireVersion(revision, version);
    const savedAt = now.toISOString();
    const editedBy = writersOf(revision).includes(actor.id) ? revision.editedBy : [...revision.editedBy, actor.id];
    updateRevision(tx, revision, { content, editedBy, updatedAt: savedAt });
    return {
      out: { version: revision.version + 1, savedAt },
      audit: { subject: `card-revision/${revision.id}`, before: { content: before }, after: { content: after } },
    };
  },
});
