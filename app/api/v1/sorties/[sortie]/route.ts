import { requestCtx } from "@/lib/auth/request-ctx";
import { readIfMatch, readJson } from "@/lib/http/read-request";
import { json, respond } from "@/lib/http/respond";
import { changeSortie } from "@/lib/workflow/sortie/change-sortie";
import { getSortie } from "@/lib/workflow/sortie/queries";

type Context = { params: Promise<{ sortie: string }> };

/** GET /api/v1/sorties/{id}: with each card's whole document, so that the phone has it before the flight. */
export function GET(request: Request, { params }: Context) {
  return respond(async () => {
    const { db, actor, today } = await requestCtx(request);
    const { sortie, crew, cards, findings, debrief, may } = getSortie(db, actor, (await params).sortie, { today });
    return json({ ...sortie, crew, cards, findings, debrief, may }, { version: sortie.version });
  });
}

/** PATCH /api/v1/sorties/{id}: changes what is sent; a briefed sortie drops to planned. */
export function PATCH(request: Request, { params }: Context) {
  return respond(async () => {
    const ctx = await requestCtx(request);
    const version = readIfMatch(request);
    const changed = changeSortie(ctx, { ...(await readJson(request)), sortieId: (await params).sortie, version });
    return json(changed, { version: changed.version });
  });
}
