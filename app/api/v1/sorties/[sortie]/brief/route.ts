import { requestCtx } from "@/lib/auth/request-ctx";
import { readJson } from "@/lib/http/read-request";
import { json, respond } from "@/lib/http/respond";
import { briefSortie } from "@/lib/workflow/sortie/brief-sortie";

type Context = { params: Promise<{ sortie: string }> };

/** POST /api/v1/sorties/{id}/brief: planned to briefed. */
export function POST(request: Request, { params }: Context) {
  return respond(async () => {
    const ctx = await requestCtx(request);
    const briefed = briefSortie(ctx, { ...(await readJson(request)), sortieId: (await params).sortie });
    return json(briefed, { version: briefed.version });
  });
}
