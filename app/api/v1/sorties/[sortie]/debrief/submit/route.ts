import { requestCtx } from "@/lib/auth/request-ctx";
import { readJson } from "@/lib/http/read-request";
import { json, respond } from "@/lib/http/respond";
import { submitDebrief } from "@/lib/workflow/debrief/submit-debrief";

type Context = { params: Promise<{ sortie: string }> };

/** POST /api/v1/sorties/{id}/debrief/submit: `id` was minted by the phone; the same debrief sent again answers the same. */
export function POST(request: Request, { params }: Context) {
  return respond(async () => {
    const ctx = await requestCtx(request);
    return json(submitDebrief(ctx, { ...(await readJson(request)), sortieId: (await params).sortie }), { status: 201 });
  });
}
