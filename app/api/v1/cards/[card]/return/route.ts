import { requestCtx } from "@/lib/auth/request-ctx";
import { readJson } from "@/lib/http/read-request";
import { json, respond } from "@/lib/http/respond";
import { returnCard } from "@/lib/workflow/card/return-card";

type Context = { params: Promise<{ card: string }> };

/** POST /api/v1/cards/{id}/return: back to its author, with a comment. */
export function POST(request: Request, { params }: Context) {
  return respond(async () => {
    const ctx = await requestCtx(request);
    return json(returnCard(ctx, { ...(await readJson(request)), cardId: (await params).card }));
  });
}
