import { eq, max } from "drizzle-orm";
import { sorties } from "@/db/schema";
import { getProgramme } from "../programme/queries";
import { defineUseCase } from "../use-case";
import { currentConfiguration, requireCards, requireConfiguration, requireMembers, requireNearDay, setCards, setCrew } from "./internal";
import { PlanSortieInput } from "./schema";

/** Date, crew and cards, released or not yet: what still stands in the way shows from this moment on. */
export const planSortie = defineUseCase({
  name: "sortie.plan",
  permission: "plan sorties",
  input: PlanSortieInput,
  run(tx, { actor, now, today, newId }, { programmeId, kind, plannedOn, configurationId, crew, revisionIds, settings }) {
    getProgramme(tx, actor, programmeId);
    requireNearDay(plannedOn, today);
    requireMembers(tx, actor, crew);
    requireCards(tx, programmeId, revisionIds);
    if (configurationId !== null) requireConfiguration(tx, programmeId, configurationId);
    const last = tx
      .select({ number: max(sorties.number) })
      .from(sorties)
      .where(eq(sorties.programmeId, programmeId))
      .get();
    const sortie = {
      id: newId(),
      programmeId,
      number: (last?.number ?? 0) + 1,
      kind,
      state: "planned" as const,
      plannedOn,
      configurationId: configurationId ?? currentConfiguration(tx, programmeId),
      settings,
      plannedBy: actor.id,
      createdAt: now.toISOString(),
    };
    tx.insert(sorties).values(sortie).run();
    setCrew(tx, sortie.id, crew);
    setCards(tx, sortie.id, revisionIds);
    return {
      out: { id: sortie.id, number: sortie.number, state: sortie.state, version: 1 },
      audit: { subject: `sortie/${sortie.id}`, after: { ...sortie, crew, revisionIds } },
    };
  },
});
