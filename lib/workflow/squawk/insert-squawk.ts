import { eq, max } from "drizzle-orm";
import type { Tx } from "@/db/open";
import { squawks } from "@/db/schema";
import type { Ctx } from "../context";

export type NewSquawk = Pick<
  typeof squawks.$inferInsert,
  "programmeId" | "sortieId" | "system" | "text" | "severity" | "pointId" | "readingId" | "raisedFrom"
>;

/** The next number of the programme, open. */
export function insertSquawk(tx: Tx, { actor, now, newId }: Ctx, squawk: NewSquawk) {
  const last = tx
    .select({ number: max(squawks.number) })
    .from(squawks)
    .where(eq(squawks.programmeId, squawk.programmeId))
    .get();
  const row = {
    ...squawk,
    id: newId(),
    number: (last?.number ?? 0) + 1,
    state: "open" as const,
    raisedBy: actor.id,
    raisedAt: now.toISOString(),
  };
  tx.insert(squawks).values(row).run();
  return row;
}
