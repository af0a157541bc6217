import { requestCtx } from "@/lib/auth/request-ctx";
import { json, respond } from "@/lib/http/respond";
import { getProgrammeSnapshot } from "@/lib/workflow/programme/snapshot";

type Context = { params: Promise<{ programme: string }> };

/** GET /api/v1/programmes/{id}: everything a card rests on, as it stands. */
export function GET(request: Request, { params }: Context) {
  return respond(async () => {
    const { db, actor } = await requestCtx(request);
    return json(getProgrammeSnapshot(db, actor, (await params).programme));
  });
}
