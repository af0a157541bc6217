import { and, eq, isNull } from "drizzle-orm";
import { debriefs, pointDispositions } from "@/db/schema";
import { runCheck } from "../debrief/run-check";
import { Refusal } from "../errors";
import { defineUseCase } from "../use-case";
import { requireNotClosed } from "./internal";
import { getSortieRow, listSortieCards } from "./rows";
import { DisposePointInput } from "./schema";

/** What a flown point is worth: accept, repeat or void. It makes a new version of the check, since the step decision rests on it. */
export const disposePoint = defineUseCase({
  name: "point.dispose",
  permission: "amend readings",
  input: DisposePointInput,
  run(tx, ctx, { sortieId, revisionId, pointId, disposition, why }) {
    const { actor, now, newId } = ctx;
    const sortie = getSortieRow(tx, actor, sortieId);
    requireNotClosed(sortie, "what its points are worth");
    const debrief = tx.select({ content: debriefs.content }).from(debriefs).where(eq(debriefs.sortieId, sortieId)).get();
    if (!debrief) throw new Refusal("conflict", "This sortie has no debrief yet, so there is nothing to dispose of. The pilot submits it.");
    const flown = listSortieCards(tx, actor, sortie);
    const point = flown.find((card) => card.revisionId === revisionId)?.document.content.points.find(({ id }) => id === pointId);
    if (!point) throw new Refusal("not-found", "This sortie has no such point.");
    const here = and(
      eq(pointDispositions.sortieId, sortieId),
      eq(pointDispositions.revisionId, revisionId),
      eq(pointDispositions.pointId, pointId),
    );
    const inForce = and(here, isNull(pointDispositions.supersededAt));
    const before = tx.select().from(pointDispositions).where(inForce).get();
    if (before?.disposition === disposition && before.why === why) return { out: { disposition, version: null }, audit: "unchanged" };
    const decidedAt = now.toISOString();
    tx.update(pointDispositions).set({ supersededAt: decidedAt }).where(inForce).run();
    tx.insert(pointDispositions)
      .values({ id: newId(), sortieId, revisionId, pointId, disposition, why, decidedBy: actor.id, decidedAt })
      .run();
    const checks = runCheck(tx, ctx, { sortie, flown, debrief: debrief.content, why: `disposition of ${point.title}: ${disposition}` });
    return {
      out: { disposition, version: checks[0]?.version ?? null },
      audit: {
        subject: `sortie/${sortieId}/point/${pointId}`,
        before: before ? { disposition: before.disposition, why: before.why } : null,
        after: { disposition, why },
      },
    };
  },
});
