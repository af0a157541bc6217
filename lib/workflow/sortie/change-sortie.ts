import { defineUseCase } from "../use-case";
import {
  requireCards,
  requireConfiguration,
  requireMembers,
  requireNearDay,
  requireOpen,
  requireSortieVersion,
  setCards,
  setCrew,
  UNBRIEFED,
  updateSortie,
} from "./internal";
import { getSortieRow, listCrew } from "./rows";
import { ChangeSortieInput } from "./schema";

/** Until it is flown. A briefed sortie that changes has to be briefed again. */
export const changeSortie = defineUseCase({
  name: "sortie.change",
  permission: "plan sorties",
  input: ChangeSortieInput,
  run(tx, { actor, today }, { sortieId, version, crew, revisionIds, ...change }) {
    const sortie = getSortieRow(tx, actor, sortieId);
    requireOpen(sortie, "changed");
    requireSortieVersion(sortie, version);
    if (change.plannedOn) requireNearDay(change.plannedOn, today);
    if (change.configurationId) requireConfiguration(tx, sortie.programmeId, change.configurationId);
    const crewBefore = crew ? listCrew(tx, sortieId) : undefined;
    if (crew) {
      requireMembers(tx, actor, crew);
      setCrew(tx, sortieId, crew);
    }
    if (revisionIds) {
      requireCards(tx, sortie.programmeId, revisionIds);
      setCards(tx, sortieId, revisionIds);
    }
    updateSortie(tx, sortie, { ...change, ...UNBRIEFED });
    const { kind, plannedOn, configurationId, settings, state } = sortie;
    return {
      out: { id: sortieId, version: version + 1, state: "planned" as const },
      audit: {
        subject: `sortie/${sortieId}`,
        before: { kind, plannedOn, configurationId, settings, state, ...(crewBefore ? { crew: crewBefore } : {}) },
        after: { ...change, state: "planned", ...(crew ? { crew } : {}), ...(revisionIds ? { revisionIds } : {}) },
      },
    };
  },
});
