import { createHash } from "node:crypto";
import canonicalize from "canonicalize";
import { desc, eq } from "drizzle-orm";
import type { Tx } from "@/db/open";
import { auditEvents } from "@/db/schema";

/** `action` only where one use case has several effects; never a secret in before or after. */
export type AuditEntry = { subject: string; action?: string; before?: unknown; after?: unknown };

type Who = { actor: { id: string; name: string; teamId: string }; now: Date };

/** The digest of one event over everything it says and the digest before it: SHA-256 of canonical JSON (RFC 8785). */
export function eventDigest(event: Omit<typeof auditEvents.$inferSelect, "digest">): string {
  return createHash("sha256")
    .update(canonicalize(event) ?? "")
    .digest("hex");
}

export const CHAIN_START = "0".repeat(64);

/** Appends one event to the team's chain, in the caller's transaction. */
export function appendAudit(tx: Tx, { actor, now }: Who, action: string, { subject, before, after }: AuditEntry): void {
  const last = tx
    .select({ sequence: auditEvents.sequence, digest: auditEvents.digest })
    .from(auditEvents)
    .where(eq(auditEvents.teamId, actor.teamId))
    .orderBy(desc(auditEvents.sequence))
    .limit(1)
    .get();
  const event = {
    teamId: actor.teamId,
    sequence: (last?.sequence ?? 0) + 1,
    at: now.toISOString(),
    actorId: actor.id,
    actorName: actor.name,
    action,
    subject,
    before: before ?? null,
    after: after ?? null,
    previousDigest: last?.digest ?? CHAIN_START,
  };
  tx.insert(auditEvents)
    .values({ ...event, digest: eventDigest(event) })
    .run();
}
