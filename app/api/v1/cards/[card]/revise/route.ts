import { requestCtx } from "@/lib/auth/request-ctx";
import { readJson, readSubmission } from "@/lib/http/read-request";
import { json, respond } from "@/lib/http/respond";
import { reviseCard } from "@/lib/workflow/card/revise-card";

type Context = { params: Promise<{ card: string }> };

/** POST /api/v1/cards/{id}/revise: the next letter, in draft, from the newest revision. */
export function POST(request: Request, { params }: Context) {
  return respond(async () => {
    const ctx = await requestCtx(request);
    const body = await readJson(request);
    const submission = await readSubmission(request, body);
    const next = reviseCard({ ...ctx, submission }, { ...body, cardId: (await params).card });
    return json(next, { status: 201, version: next.version });
  });
}
