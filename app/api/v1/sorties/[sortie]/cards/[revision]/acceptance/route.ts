import { requestCtx } from "@/lib/auth/request-ctx";
import { readJson } from "@/lib/http/read-request";
import { json, respond } from "@/lib/http/respond";
import { answerCard } from "@/lib/workflow/sortie/answer-card";

type Context = { params: Promise<{ sortie: string; revision: string }> };

/** POST …/acceptance: accepts or declines exactly the digest that was shown. */
export function POST(request: Request, { params }: Context) {
  return respond(async () => {
    const ctx = await requestCtx(request);
    const { sortie, revision } = await params;
    return json(answerCard(ctx, { ...(await readJson(request)), sortieId: sortie, revisionId: revision }));
  });
}
