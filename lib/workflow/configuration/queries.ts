import { and, eq, getTableColumns } from "drizzle-orm";
import type { Db, Tx } from "@/db/open";
import { configurations, programmes } from "@/db/schema";
import type { Actor } from "@/lib/auth/roles";
import { digestOf } from "../digest";
import { Refusal } from "../errors";

/** One configuration with the digest a signature binds to: what is fitted, not who signed. */
export function getConfiguration(db: Db | Tx, actor: Actor, configurationId: string) {
  const row = db
    .select(getTableColumns(configurations))
    .from(configurations)
    .innerJoin(programmes, eq(programmes.id, configurations.programmeId))
    .where(and(eq(configurations.id, configurationId), eq(programmes.teamId, actor.teamId)))
    .get();
  if (!row) throw new Refusal("not-found", "No such configuration in your team.");
  const { id, number, fitted, details, massKg, armM } = row;
  return { ...row, digest: digestOf({ id, number, fitted, details, massKg, armM }) };
}
