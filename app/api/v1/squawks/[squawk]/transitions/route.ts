import { requestCtx } from "@/lib/auth/request-ctx";
import { readJson, readSubmission } from "@/lib/http/read-request";
import { json, respond } from "@/lib/http/respond";
import type { Ctx } from "@/lib/workflow/context";
import { acceptSquawk } from "@/lib/workflow/squawk/accept-squawk";
import { assessSquawk } from "@/lib/workflow/squawk/assess-squawk";
import { closeSquawk } from "@/lib/workflow/squawk/close-squawk";
import { rectifySquawk } from "@/lib/workflow/squawk/rectify-squawk";
import { TransitionInput } from "@/lib/workflow/squawk/schema";
import { verifySquawk } from "@/lib/workflow/squawk/verify-squawk";

type Context = { params: Promise<{ squawk: string }> };

/** POST /api/v1/squawks/{id}/transitions: `to` the next state, with what that state asks for; `from` the state that was seen. */
export function POST(request: Request, { params }: Context) {
  return respond(async () => {
    const ctx = await requestCtx(request);
    const body = await readJson(request);
    const submission = await readSubmission(request, body);
    return json(transit({ ...ctx, submission }, (await params).squawk, body));
  });
}

function transit(ctx: Ctx, squawkId: string, body: Record<string, unknown>) {
  const { to, ...rest } = TransitionInput.parse(body);
  const input = { ...rest, squawkId };
  if (to === "assessed") return assessSquawk(ctx, input);
  if (to === "verified") return verifySquawk(ctx, input);
  if (to === "closed") return closeSquawk(ctx, input);
  const byMechanic = rest.disposition === "rectified" || rest.disposition === "no fault found";
  return byMechanic ? rectifySquawk(ctx, input) : acceptSquawk(ctx, input);
}
