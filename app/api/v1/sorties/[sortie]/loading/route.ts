import { requestCtx } from "@/lib/auth/request-ctx";
import { readIfMatch, readJson } from "@/lib/http/read-request";
import { json, respond } from "@/lib/http/respond";
import { enterLoading } from "@/lib/workflow/sortie/enter-loading";

type Context = { params: Promise<{ sortie: string }> };

/** PUT /api/v1/sorties/{id}/loading: loading, fuel, forecast and the day's plan, by the pilot. */
export function PUT(request: Request, { params }: Context) {
  return respond(async () => {
    const ctx = await requestCtx(request);
    const version = readIfMatch(request);
    const changed = enterLoading(ctx, { ...(await readJson(request)), sortieId: (await params).sortie, version });
    return json(changed, { version: changed.version });
  });
}
