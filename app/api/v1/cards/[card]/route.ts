import { requestCtx } from "@/lib/auth/request-ctx";
import { readIfMatch, readJson } from "@/lib/http/read-request";
import { json, respond } from "@/lib/http/respond";
import { getCardRevision } from "@/lib/workflow/card/queries";
import { saveDraft } from "@/lib/workflow/card/save-draft";

type Context = { params: Promise<{ card: string }> };

/** GET /api/v1/cards/{id}: the newest revision, with its findings and what this person may do. */
export function GET(request: Request, { params }: Context) {
  return respond(async () => {
    const { db, actor, today } = await requestCtx(request);
    const { card, revision, revisions, document, digest, findings, comments, stamp, may } = getCardRevision(
      db,
      actor,
      (await params).card,
      { today },
    );
    const { id: revisionId, letter, state, version, answers } = revision;
    const letters = revisions.map((other) => ({
      letter: other.letter,
      state: other.state,
      digest: other.digest,
      releasedAt: other.releasedAt,
    }));
    const shown = { revisionId, letter, state, version, answers, author: document.identity.author, content: document.content };
    return json({ ...card, ...shown, digest, revisions: letters, findings, comments, stamp, may }, { version });
  });
}

/** PATCH /api/v1/cards/{id}: saves the draft's content. If-Match names the version it was made on. */
export function PATCH(request: Request, { params }: Context) {
  return respond(async () => {
    const ctx = await requestCtx(request);
    const version = readIfMatch(request);
    const saved = saveDraft(ctx, { ...(await readJson(request)), cardId: (await params).card, version });
    return json(saved, { version: saved.version });
  });
}
