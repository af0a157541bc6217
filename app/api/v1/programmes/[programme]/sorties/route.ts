import { requestCtx } from "@/lib/auth/request-ctx";
import { toPage } from "@/lib/http/page";
import { readJson, readSubmission } from "@/lib/http/read-request";
import { json, respond } from "@/lib/http/respond";
import { planSortie } from "@/lib/workflow/sortie/plan-sortie";
import { listSorties } from "@/lib/workflow/sortie/queries";

type Context = { params: Promise<{ programme: string }> };

/** GET /api/v1/programmes/{id}/sorties: the newest first. */
export function GET(request: Request, { params }: Context) {
  return respond(async () => {
    const { db, actor } = await requestCtx(request);
    return json(toPage(request, listSorties(db, actor, (await params).programme)));
  });
}

/** POST /api/v1/programmes/{id}/sorties: date, kind, crew and cards. */
export function POST(request: Request, { params }: Context) {
  return respond(async () => {
    const ctx = await requestCtx(request);
    const body = await readJson(request);
    const submission = await readSubmission(request, body);
    const sortie = planSortie({ ...ctx, submission }, { ...body, programmeId: (await params).programme });
    return json(sortie, { status: 201, version: sortie.version });
  });
}
