import { requestCtx } from "@/lib/auth/request-ctx";
import { readJson } from "@/lib/http/read-request";
import { json, respond } from "@/lib/http/respond";
import { closeSortie } from "@/lib/workflow/sortie/close-sortie";

type Context = { params: Promise<{ sortie: string }> };

/** POST /api/v1/sorties/{id}/close: refused with `open`, what still stands in the way. */
export function POST(request: Request, { params }: Context) {
  return respond(async () => {
    const ctx = await requestCtx(request);
    const closed = closeSortie(ctx, { ...(await readJson(request)), sortieId: (await params).sortie });
    return json(closed, { version: closed.version });
  });
}
