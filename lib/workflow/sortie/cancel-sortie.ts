import { defineUseCase } from "../use-case";
import { requireOpen, requireSortieVersion, updateSortie } from "./internal";
import { getSortieRow, listSortieCards } from "./rows";
import { CancelSortieInput } from "./schema";

/** Planned or briefed → closed without a flight: a reason, and every point skipped. */
export const cancelSortie = defineUseCase({
  name: "sortie.cancel",
  permission: "plan sorties",
  input: CancelSortieInput,
  run(tx, { actor, now }, { sortieId, version, why }) {
    const sortie = getSortieRow(tx, actor, sortieId);
    requireOpen(sortie, "cancelled");
    requireSortieVersion(sortie, version);
    const skipped = listSortieCards(tx, actor, sortie).flatMap(({ revisionId, document }) =>
      document.content.points.map(({ id }) => ({ revisionId, point: id, outcome: "skipped" })),
    );
    const change = { state: "closed" as const, closedWhy: why, closedAt: now.toISOString(), closedBy: actor.id };
    updateSortie(tx, sortie, change);
    return {
      out: { id: sortieId, state: change.state, version: version + 1 },
      audit: { subject: `sortie/${sortieId}`, before: { state: sortie.state }, after: { ...change, points: skipped } },
    };
  },
});
