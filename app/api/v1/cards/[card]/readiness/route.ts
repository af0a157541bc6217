import { requestCtx } from "@/lib/auth/request-ctx";
import { json, respond } from "@/lib/http/respond";
import { findingKey } from "@/lib/workflow/card/policy";
import { getCardRevision } from "@/lib/workflow/card/queries";

type Context = { params: Promise<{ card: string }> };

/** GET /api/v1/cards/{id}/readiness: what stands before release; `key` names the answer that a "should" wants. */
export function GET(request: Request, { params }: Context) {
  return respond(async () => {
    const { db, actor, today } = await requestCtx(request);
    const { findings, revision, digest } = getCardRevision(db, actor, (await params).card, { today });
    const items = findings.map((finding) => ({
      key: findingKey(finding),
      ...finding,
      answer: revision.answers[findingKey(finding)] ?? null,
    }));
    return json({ letter: revision.letter, state: revision.state, digest, items }, { version: revision.version });
  });
}
