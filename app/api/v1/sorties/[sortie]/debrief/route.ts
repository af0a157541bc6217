import { requestCtx } from "@/lib/auth/request-ctx";
import { json, respond } from "@/lib/http/respond";
import { getSortie } from "@/lib/workflow/sortie/queries";

type Context = { params: Promise<{ sortie: string }> };

/** GET /api/v1/sorties/{id}/debrief: as submitted, or null while it is still on the phone. */
export function GET(request: Request, { params }: Context) {
  return respond(async () => {
    const { db, actor, today } = await requestCtx(request);
    const { sortie, debrief } = getSortie(db, actor, (await params).sortie, { today });
    return json({ sortieId: sortie.id, state: sortie.state, debrief });
  });
}
