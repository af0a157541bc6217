import { requestCtx } from "@/lib/auth/request-ctx";
import { toPage } from "@/lib/http/page";
import { json, respond } from "@/lib/http/respond";
import { listProgrammes } from "@/lib/workflow/programme/queries";

/** GET /api/v1/programmes: the team's programmes. */
export function GET(request: Request) {
  return respond(async () => {
    const { db, actor } = await requestCtx(request);
    return json(toPage(request, listProgrammes(db, actor)));
  });
}
