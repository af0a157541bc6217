import { requestCtx } from "@/lib/auth/request-ctx";
import { readJson } from "@/lib/http/read-request";
import { json, respond } from "@/lib/http/respond";
import { withdrawCard } from "@/lib/workflow/card/withdraw-card";

type Context = { params: Promise<{ card: string }> };

/** POST /api/v1/cards/{id}/withdraw: takes a released revision out of force. */
export function POST(request: Request, { params }: Context) {
  return respond(async () => {
    const ctx = await requestCtx(request);
    return json(withdrawCard(ctx, { ...(await readJson(request)), cardId: (await params).card }));
  });
}
