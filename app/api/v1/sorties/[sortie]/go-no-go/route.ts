import { requestCtx } from "@/lib/auth/request-ctx";
import { json, respond } from "@/lib/http/respond";
import { getProgramme } from "@/lib/workflow/programme/queries";
import { getSortie } from "@/lib/workflow/sortie/queries";

type Context = { params: Promise<{ sortie: string }> };

/** GET /api/v1/sorties/{id}/go-no-go: the lines to tick, and what stands in the way of the brief. */
export function GET(request: Request, { params }: Context) {
  return respond(async () => {
    const { db, actor, today } = await requestCtx(request);
    const { sortie, findings } = getSortie(db, actor, (await params).sortie, { today });
    const { settings } = getProgramme(db, actor, sortie.programmeId);
    return json({ lines: settings.goNoGo, ticked: sortie.goNoGo, findings }, { version: sortie.version });
  });
}
