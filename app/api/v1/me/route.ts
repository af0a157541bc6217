import { requestCtx } from "@/lib/auth/request-ctx";
import { json, respond } from "@/lib/http/respond";
import { getTeam } from "@/lib/workflow/team/queries";

/** GET /api/v1/me: who is signed in, in which team, with which roles. */
export function GET(request: Request) {
  return respond(async () => {
    const { db, actor } = await requestCtx(request);
    const { id, name, email, roles, residualRisk } = actor;
    return json({ id, name, email, roles, residualRisk, team: getTeam(db, actor) });
  });
}
