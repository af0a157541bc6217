import { requestCtx } from "@/lib/auth/request-ctx";
import { readIfMatch, readJson } from "@/lib/http/read-request";
import { json, respond } from "@/lib/http/respond";
import { submitCard } from "@/lib/workflow/card/submit-card";

type Context = { params: Promise<{ card: string }> };

/** POST /api/v1/cards/{id}/submit: draft to in review, with a line for each "should". */
export function POST(request: Request, { params }: Context) {
  return respond(async () => {
    const ctx = await requestCtx(request);
    const version = readIfMatch(request);
    const sent = submitCard(ctx, { answers: {}, ...(await readJson(request)), cardId: (await params).card, version });
    return json(sent, { version: sent.version });
  });
}
