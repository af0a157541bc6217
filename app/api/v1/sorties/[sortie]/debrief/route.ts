import { requestCtx } from "@/lib/auth/request-ctx";
import { json, respond } from "@/lib/http/respond";
import { getSortie } from "@/lib/workflow/sortie/queries";

type Context = { params: Promise<{ sortie: string }> };

/** GET /api/v1/sorties/{id}/debrief: what the phone needs to ask it, and the debrief itself once it was submitted. */
export function GET(request: Request, { params }: Context) {
  return respond(async () => {
    const { db, actor, today } = await requestCtx(request);
    const { sortie, cards, debrief, may } = getSortie(db, actor, (await params).sortie, { today });
    const { id, number, kind, state, plannedOn, programmeId, configurationId } = sortie;
    return json({
      sortie: { id, number, kind, state, plannedOn, programmeId, configurationId },
      cards: cards.map(({ revisionId, digest, document }) => ({ revisionId, digest, document })),
      submitted: debrief && { id: debrief.id, submittedAt: debrief.submittedAt, by: debrief.submittedByName },
      debrief,
      me: { id: actor.id, name: actor.name },
      mayDebrief: may.debrief,
    });
  });
}
