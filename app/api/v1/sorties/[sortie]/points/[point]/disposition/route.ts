import { requestCtx } from "@/lib/auth/request-ctx";
import { readJson } from "@/lib/http/read-request";
import { json, respond } from "@/lib/http/respond";
import { disposePoint } from "@/lib/workflow/sortie/dispose-point";

type Context = { params: Promise<{ sortie: string; point: string }> };

/** POST …/points/{id}/disposition: what a flown point is worth; makes a new version of the check. */
export function POST(request: Request, { params }: Context) {
  return respond(async () => {
    const ctx = await requestCtx(request);
    const { sortie, point } = await params;
    return json(disposePoint(ctx, { ...(await readJson(request)), sortieId: sortie, pointId: point }), { status: 201 });
  });
}
