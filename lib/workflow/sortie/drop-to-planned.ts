import { and, eq, inArray, sql } from "drizzle-orm";
import type { Tx } from "@/db/open";
import { sortieCards, sorties } from "@/db/schema";
import type { AuditEntry } from "@/lib/audit/append-audit";

/** A briefed sortie that flies a revision which is no longer released has to be briefed again. */
export function dropToPlanned(tx: Tx, revisionId: string, why: string): AuditEntry[] {
  const flying = tx.select({ id: sortieCards.sortieId }).from(sortieCards).where(eq(sortieCards.revisionId, revisionId));
  const briefed = tx
    .update(sorties)
    .set({ state: "planned", briefedAt: null, briefedBy: null, goNoGo: null, version: sql`${sorties.version} + 1` })
    .where(and(eq(sorties.state, "briefed"), inArray(sorties.id, flying)))
    .returning({ id: sorties.id })
    .all();
  return briefed.map(({ id }) => ({
    action: "sortie.drop-to-planned",
    subject: `sortie/${id}`,
    before: { state: "briefed" },
    after: { state: "planned", why },
  }));
}
