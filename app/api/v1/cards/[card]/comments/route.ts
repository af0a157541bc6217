import { requestCtx } from "@/lib/auth/request-ctx";
import { toPage } from "@/lib/http/page";
import { readJson, readSubmission } from "@/lib/http/read-request";
import { json, respond } from "@/lib/http/respond";
import { commentOnCard } from "@/lib/workflow/card/comment-on-card";
import { listComments } from "@/lib/workflow/card/queries";

type Context = { params: Promise<{ card: string }> };

/** GET /api/v1/cards/{id}/comments: of every revision, oldest first. */
export function GET(request: Request, { params }: Context) {
  return respond(async () => {
    const { db, actor } = await requestCtx(request);
    return json(toPage(request, listComments(db, actor, (await params).card)));
  });
}

/** POST /api/v1/cards/{id}/comments: on the card or on one point, while it is in review. */
export function POST(request: Request, { params }: Context) {
  return respond(async () => {
    const ctx = await requestCtx(request);
    const body = await readJson(request);
    const submission = await readSubmission(request, body);
    return json(commentOnCard({ ...ctx, submission }, { ...body, cardId: (await params).card }), { status: 201 });
  });
}
