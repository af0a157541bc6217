import { requestCtx } from "@/lib/auth/request-ctx";
import { toPage } from "@/lib/http/page";
import { readJson, readSubmission } from "@/lib/http/read-request";
import { json, respond } from "@/lib/http/respond";
import { listSquawks } from "@/lib/workflow/squawk/queries";
import { raiseSquawk } from "@/lib/workflow/squawk/raise-squawk";

type Context = { params: Promise<{ programme: string }> };

/** GET /api/v1/programmes/{id}/squawks: open ones first, the gravest first. */
export function GET(request: Request, { params }: Context) {
  return respond(async () => {
    const { db, actor } = await requestCtx(request);
    return json(toPage(request, listSquawks(db, actor, (await params).programme)));
  });
}

/** POST /api/v1/programmes/{id}/squawks */
export function POST(request: Request, { params }: Context) {
  return respond(async () => {
    const ctx = await requestCtx(request);
    const body = await readJson(request);
    const submission = await readSubmission(request, body);
    return json(raiseSquawk({ ...ctx, submission }, { ...body, programmeId: (await params).programme }), { status: 201 });
  });
}
