import { defineUseCase } from "../use-case";
import { requireOpen, requireSortieVersion, requireThisPilot, UNBRIEFED, updateSortie } from "./internal";
import { getSortieRow } from "./rows";
import { EnterLoadingInput } from "./schema";

/** Loading, fuel, forecast and the day's plan, by the pilot who flies. */
export const enterLoading = defineUseCase({
  name: "sortie.enter-loading",
  permission: "brief and debrief",
  input: EnterLoadingInput,
  run(tx, { actor }, { sortieId, version, settings }) {
    const sortie = getSortieRow(tx, actor, sortieId);
    requireOpen(sortie, "changed");
    requireSortieVersion(sortie, version);
    requireThisPilot(tx, actor, sortieId);
    updateSortie(tx, sortie, { settings, ...UNBRIEFED });
    return {
      out: { id: sortieId, version: version + 1, state: "planned" as const },
      audit: {
        subject: `sortie/${sortieId}`,
        before: { settings: sortie.settings, state: sortie.state },
        after: { settings, state: "planned" },
      },
    };
  },
});
