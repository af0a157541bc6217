import { requestCtx } from "@/lib/auth/request-ctx";
import { json, respond } from "@/lib/http/respond";
import { getSquawk } from "@/lib/workflow/squawk/queries";

type Context = { params: Promise<{ squawk: string }> };

/** GET /api/v1/squawks/{id} */
export function GET(request: Request, { params }: Context) {
  return respond(async () => {
    const { db, actor } = await requestCtx(request);
    return json(getSquawk(db, actor, (await params).squawk));
  });
}
