import { and, asc, desc, eq, sql } from "drizzle-orm";
import type { Db, Tx } from "@/db/open";
import { programmes, sorties, squawks, users } from "@/db/schema";
import type { Actor } from "@/lib/auth/roles";
import { Refusal } from "../errors";
import { getProgramme } from "../programme/queries";

type Reader = Db | Tx;

const columns = {
  id: squawks.id,
  programmeId: squawks.programmeId,
  number: squawks.number,
  system: squawks.system,
  text: squawks.text,
  severity: squawks.severity,
  state: squawks.state,
  disposition: squawks.disposition,
  sortieId: squawks.sortieId,
  sortieNumber: sorties.number,
  pointId: squawks.pointId,
  readingId: squawks.readingId,
  raisedFrom: squawks.raisedFrom,
  raisedByName: users.name,
  raisedAt: squawks.raisedAt,
  closedAt: squawks.closedAt,
};

const base = (db: Reader) =>
  db.select(columns).from(squawks).leftJoin(users, eq(users.id, squawks.raisedBy)).leftJoin(sorties, eq(sorties.id, squawks.sortieId));

/** Open ones first, the gravest first, then by number. */
export function listSquawks(db: Reader, actor: Actor, programmeId: string) {
  getProgramme(db, actor, programmeId);
  return base(db)
    .where(eq(squawks.programmeId, programmeId))
    .orderBy(
      asc(sql`${squawks.state} in ('verified', 'closed')`),
      asc(sql`case ${squawks.severity} when 'grounding' then 0 when 'before next test' then 1 else 2 end`),
      desc(squawks.number),
    )
    .all();
}
export type SquawkListItem = ReturnType<typeof listSquawks>[number];

/** Call with a sortie that was read for this actor. */
export function listSortieSquawks(db: Reader, sortieId: string): SquawkListItem[] {
  return base(db).where(eq(squawks.sortieId, sortieId)).orderBy(asc(squawks.number)).all();
}

export function getSquawk(db: Reader, actor: Actor, squawkId: string): SquawkListItem {
  const row = base(db)
    .innerJoin(programmes, eq(programmes.id, squawks.programmeId))
    .where(and(eq(squawks.id, squawkId), eq(programmes.teamId, actor.teamId)))
    .get();
  if (!row) throw new Refusal("not-found", "No such squawk in your team.");
  return row;
}
