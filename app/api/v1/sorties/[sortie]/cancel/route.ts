import { requestCtx } from "@/lib/auth/request-ctx";
import { readIfMatch, readJson } from "@/lib/http/read-request";
import { json, respond } from "@/lib/http/respond";
import { cancelSortie } from "@/lib/workflow/sortie/cancel-sortie";

type Context = { params: Promise<{ sortie: string }> };

/** POST /api/v1/sorties/{id}/cancel: the version that was seen in If-Match, the reason in the body. */
export function POST(request: Request, { params }: Context) {
  return respond(async () => {
    const ctx = await requestCtx(request);
    const version = readIfMatch(request);
    const cancelled = cancelSortie(ctx, { ...(await readJson(request)), sortieId: (await params).sortie, version });
    return json(cancelled, { version: cancelled.version });
  });
}
