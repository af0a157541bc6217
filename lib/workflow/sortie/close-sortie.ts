import { Refusal } from "../errors";
import { defineUseCase } from "../use-case";
import { openForClosing } from "./closing";
import { updateSortie } from "./internal";
import { getSortieRow } from "./rows";
import { CloseSortieInput } from "./schema";

/** Debriefed → closed: every point disposed of, every flown step decided, every squawk of this sortie assessed. */
export const closeSortie = defineUseCase({
  name: "sortie.close",
  permission: "plan sorties",
  input: CloseSortieInput,
  run(tx, { actor, now }, { sortieId, why }) {
    const sortie = getSortieRow(tx, actor, sortieId);
    const { number, state, version } = sortie;
    if (state === "closed") return { out: { id: sortieId, state, version }, audit: "unchanged" };
    if (state !== "debriefed")
      throw new Refusal("conflict", `Sortie ${number} is ${state}: it is closed after its debrief, or cancelled before it is flown.`);
    const open = openForClosing(tx, actor, sortie);
    if (open.length > 0) throw new Refusal("conflict", `Not closed. These are open: ${open.join(" ")}`, undefined, { open });
    const change = { state: "closed" as const, closedWhy: why.trim() || null, closedAt: now.toISOString(), closedBy: actor.id };
    updateSortie(tx, sortie, change);
    return {
      out: { id: sortieId, state: change.state, version: version + 1 },
      audit: { subject: `sortie/${sortieId}`, before: { state }, after: change },
    };
  },
});
