import { requestCtx } from "@/lib/auth/request-ctx";
import { toPage } from "@/lib/http/page";
import { json, respond } from "@/lib/http/respond";
import { listTestPoints } from "@/lib/workflow/programme/queries";

type Context = { params: Promise<{ programme: string }> };

/** GET /api/v1/programmes/{id}/test-points: the shelf, newest revisions. */
export function GET(request: Request, { params }: Context) {
  return respond(async () => {
    const { db, actor } = await requestCtx(request);
    return json(toPage(request, listTestPoints(db, actor, (await params).programme)));
  });
}
