import { requestCtx } from "@/lib/auth/request-ctx";
import { readJson, readSubmission } from "@/lib/http/read-request";
import { json, respond } from "@/lib/http/respond";
import { recordPrint } from "@/lib/workflow/card/record-print";

type Context = { params: Promise<{ card: string; letter: string }> };

/** POST …/revisions/{letter}/prints: records the print and answers its address. */
export function POST(request: Request, { params }: Context) {
  return respond(async () => {
    const ctx = await requestCtx(request);
    const { card, letter } = await params;
    const body = await readJson(request);
    const submission = await readSubmission(request, body);
    return json(recordPrint({ ...ctx, submission }, { paper: "a5", ...body, cardId: card, letter }), { status: 201 });
  });
}
