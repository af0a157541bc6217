import { and, eq, getTableColumns } from "drizzle-orm";
import type { Tx } from "@/db/open";
import { programmes, squawks } from "@/db/schema";
import type { Actor } from "@/lib/auth/roles";
import type { SquawkState } from "@/lib/testcards/words";
import { Refusal } from "../errors";
import { FROM, NEXT } from "./policy";

export type SquawkRow = typeof squawks.$inferSelect;

/** The squawk of this team in a state from which the act is possible; `seen` is what the person looked at. */
export function getSquawkFor(
  tx: Tx,
  actor: Actor,
  { squawkId, from: seen }: { squawkId: string; from?: SquawkState | undefined },
  act: keyof typeof FROM,
): SquawkRow {
  const row = tx
    .select(getTableColumns(squawks))
    .from(squawks)
    .innerJoin(programmes, eq(programmes.id, squawks.programmeId))
    .where(and(eq(squawks.id, squawkId), eq(programmes.teamId, actor.teamId)))
    .get();
  if (!row) throw new Refusal("not-found", "No such squawk in your team.");
  if (seen !== undefined && seen !== row.state)
    throw new Refusal("stale", `Squawk ${row.number} is ${row.state} meanwhile. Nothing was changed. Load it again to see what was done.`);
  if (!(FROM[act] as readonly SquawkState[]).includes(row.state)) {
    const next = NEXT[row.state];
    throw new Refusal("conflict", `Squawk ${row.number} is ${row.state}. ${next ? `Next: ${next.by}` : "It stands as it is."}`, undefined, {
      state: row.state,
    });
  }
  return row;
}

type Change = Partial<typeof squawks.$inferInsert> & { state: SquawkState };

/** Writes the change and answers what a use case gives back: the state, and one event with only what changed. */
export function changeSquawk(tx: Tx, row: SquawkRow, change: Change) {
  tx.update(squawks).set(change).where(eq(squawks.id, row.id)).run();
  const before = Object.fromEntries((Object.keys(change) as (keyof Change & keyof SquawkRow)[]).map((key) => [key, row[key]]));
  const { id, number, severity, disposition } = { ...row, ...change };
  return {
    out: { id, number, state: change.state, severity, disposition },
    audit: { subject: `squawk/${row.id}`, before, after: change },
  };
}
