import { and, asc, desc, eq, sql } from "drizzle-orm";
import { alias } from "drizzle-orm/sqlite-core";
import type { Db, Tx } from "@/db/open";
import { programmes, sorties, squawks, users } from "@/db/schema";
import type { Actor } from "@/lib/auth/roles";
import { Refusal } from "../errors";
import { getProgramme } from "../programme/queries";
import * as policy from "./policy";

type Reader = Db | Tx;
const assessor = alias(users, "assessor");
const disposer = alias(users, "disposer");
const verifier = alias(users, "verifier");
const closer = alias(users, "closer");

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
  assessedByName: assessor.name,
  assessedAt: squawks.assessedAt,
  assessedWhy: squawks.assessedWhy,
  dispositionWhy: squawks.dispositionWhy,
  dispositionLimit: squawks.dispositionLimit,
  entryReference: squawks.entryReference,
  dispositionedByName: disposer.name,
  dispositionedAt: squawks.dispositionedAt,
  verifiedReference: squawks.verifiedReference,
  verifiedByName: verifier.name,
  verifiedAt: squawks.verifiedAt,
  closedByName: closer.name,
  closedAt: squawks.closedAt,
};

const base = (db: Reader) =>
  db
    .select(columns)
    .from(squawks)
    .leftJoin(users, eq(users.id, squawks.raisedBy))
    .leftJoin(assessor, eq(assessor.id, squawks.assessedBy))
    .leftJoin(disposer, eq(disposer.id, squawks.dispositionedBy))
    .leftJoin(verifier, eq(verifier.id, squawks.verifiedBy))
    .leftJoin(closer, eq(closer.id, squawks.closedBy))
    .leftJoin(sorties, eq(sorties.id, squawks.sortieId));

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

/** What this person may do to this squawk now. */
export function squawkMay(actor: Actor, squawk: policy.SquawkFacts) {
  return {
    assess: policy.mayAssess(actor, squawk),
    rectify: policy.mayRectify(actor, squawk),
    accept: policy.mayAccept(actor, squawk),
    verify: policy.mayVerify(actor, squawk),
    close: policy.mayClose(actor, squawk),
  };
}
