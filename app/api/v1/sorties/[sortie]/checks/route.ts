import { requestCtx } from "@/lib/auth/request-ctx";
import { HttpRefusal } from "@/lib/http/http-refusal";
import { json, respond } from "@/lib/http/respond";
import { getSortieResults } from "@/lib/workflow/sortie/queries";

type Context = { params: Promise<{ sortie: string }> };

/** GET /api/v1/sorties/{id}/checks: the current reports, one a card; `?version=` an earlier set. */
export function GET(request: Request, { params }: Context) {
  return respond(async () => {
    const { db, actor } = await requestCtx(request);
    const asked = new URL(request.url).searchParams.get("version");
    if (asked !== null && !/^[1-9]\d{0,8}$/.test(asked)) throw new HttpRefusal(400, "Malformed", "version is a whole number from 1.");
    const results = getSortieResults(db, actor, (await params).sortie, asked === null ? {} : { version: Number(asked) });
    const reports = results.checks.map(({ card, report, why, createdAt }) => ({ revisionId: card.revisionId, why, createdAt, report }));
    const { version, versions, squawks, dispositions, flownUnbriefed } = results;
    return json({ version, versions, flownUnbriefed, reports, squawks, dispositions });
  });
}
