import { requestCtx } from "@/lib/auth/request-ctx";
import { toPage } from "@/lib/http/page";
import { readJson, readSubmission } from "@/lib/http/read-request";
import { json, respond } from "@/lib/http/respond";
import { createCard } from "@/lib/workflow/card/create-card";
import { listCards } from "@/lib/workflow/card/queries";

type Context = { params: Promise<{ programme: string }> };

/** GET /api/v1/programmes/{id}/cards: each card with its newest revision and the one in force. */
export function GET(request: Request, { params }: Context) {
  return respond(async () => {
    const { db, actor } = await requestCtx(request);
    return json(toPage(request, listCards(db, actor, (await params).programme)));
  });
}

/** POST /api/v1/programmes/{id}/cards: a new card, revision A, in draft. */
export function POST(request: Request, { params }: Context) {
  return respond(async () => {
    const ctx = await requestCtx(request);
    const body = await readJson(request);
    const submission = await readSubmission(request, body);
    const card = createCard({ ...ctx, submission }, { ...body, programmeId: (await params).programme });
    return json(card, { status: 201, version: card.version });
  });
}
