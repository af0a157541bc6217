import { and, asc, eq, isNull } from "drizzle-orm";
import type { Db, Tx } from "@/db/open";
import { pointDispositions, users } from "@/db/schema";

/** The disposition in force of each point. Call with a sortie that was read for this actor. */
export function listDispositions(db: Db | Tx, sortieId: string) {
  return db
    .select({
      revisionId: pointDispositions.revisionId,
      pointId: pointDispositions.pointId,
      disposition: pointDispositions.disposition,
      why: pointDispositions.why,
      decidedByName: users.name,
      decidedAt: pointDispositions.decidedAt,
    })
    .from(pointDispositions)
    .innerJoin(users, eq(users.id, pointDispositions.decidedBy))
    .where(and(eq(pointDispositions.sortieId, sortieId), isNull(pointDispositions.supersededAt)))
    .orderBy(asc(pointDispositions.decidedAt), asc(pointDispositions.id))
    .all();
}
