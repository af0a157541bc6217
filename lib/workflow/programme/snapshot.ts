import type { Db, Tx } from "@/db/open";
import type { Actor } from "@/lib/auth/roles";
import type { ProgrammeSnapshot } from "@/lib/testcards/card";
import { toConfiguration } from "./mapping";
import { getProgramme, listConfigurations, listHazards, listInstruments, listLimits, listObjectives, listParameters } from "./queries";

/** The programme as a card sees it now. The only assembler: builder, release, print and check all start from here. */
export function getProgrammeSnapshot(db: Db | Tx, actor: Actor, programmeId: string): ProgrammeSnapshot {
  const programme = getProgramme(db, actor, programmeId);
  const { settings } = programme;
  const current = listConfigurations(db, actor, programmeId).find((configuration) => configuration.isCurrent);
  return {
    id: programme.id,
    name: programme.name,
    notice: settings.notice,
    hotDayBasis: programme.hotDayBasis,
    airfield: settings.airfield,
    aircraft: programme.aircraft,
    controls: settings.controls,
    coolDown: settings.coolDown,
    callWords: settings.callWords,
    goNoGo: settings.goNoGo,
    thenLine: settings.thenLine,
    thenActions: settings.thenActions,
    standingAborts: settings.standingAborts,
    reactionMin: settings.reactionMin,
    fuelPlan: settings.fuelPlan,
    daMaximumFt: settings.daMaximumFt,
    configuration: current ? toConfiguration(current, current.signedByName) : null,
    parameters: listParameters(db, actor, programmeId),
    instruments: listInstruments(db, actor, programmeId),
    limits: listLimits(db, actor, programmeId),
    hazards: listHazards(db, actor, programmeId),
    objectives: listObjectives(db, actor, programmeId).map(({ code, question, success, priority }) => ({
      code,
      question,
      success,
      priority,
    })),
  };
}
