import { asc, eq } from "drizzle-orm";
import type { Db } from "@/db/open";
import { auditEvents } from "@/db/schema";
import { CHAIN_START, eventDigest } from "./append-audit";

export type ChainCheck = { events: number; firstBroken: number | null };

/** Walks a team's chain from its start: each event's digest is over all it says and over the digest before it. */
export function verifyChain(db: Db, teamId: string): ChainCheck {
  const events = db.select().from(auditEvents).where(eq(auditEvents.teamId, teamId)).orderBy(asc(auditEvents.sequence)).all();
  let previousDigest = CHAIN_START;
  for (const [index, { digest, ...event }] of events.entries()) {
    const fits = event.sequence === index + 1 && event.previousDigest === previousDigest && eventDigest(event) === digest;
    if (!fits) return { events: events.length, firstBroken: event.sequence };
    previousDigest = digest;
  }
  return { events: events.length, firstBroken: null };
}
