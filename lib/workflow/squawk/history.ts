import { and, asc, eq } from "drizzle-orm";
import type { Db, Tx } from "@/db/open";
import { auditEvents, type squawks } from "@/db/schema";
import type { Actor } from "@/lib/auth/roles";
import { getSquawk } from "./queries";

export type SquawkEvent = {
  at: string;
  actorName: string;
  action: string;
  before: Partial<typeof squawks.$inferSelect>;
  after: Partial<typeof squawks.$inferSelect>;
};

/** Everything that was done to a squawk, oldest first, from the audit chain: what was said anew stays readable. */
export function listSquawkHistory(db: Db | Tx, actor: Actor, squawkId: string): SquawkEvent[] {
  getSquawk(db, actor, squawkId);
  return db
    .select({
      at: auditEvents.at,
      actorName: auditEvents.actorName,
      action: auditEvents.action,
      before: auditEvents.before,
      after: auditEvents.after,
    })
    .from(auditEvents)
    .where(and(eq(auditEvents.teamId, actor.teamId), eq(auditEvents.subject, `squawk/${squawkId}`)))
    .orderBy(asc(auditEvents.sequence))
    .all()
    .map(({ before, after, ...event }) => ({
      ...event,
      before: (before ?? {}) as SquawkEvent["before"],
      after: (after ?? {}) as SquawkEvent["after"],
    }));
}
