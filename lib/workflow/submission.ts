import { and, eq } from "drizzle-orm";
import type { Tx } from "@/db/open";
import { submissions } from "@/db/schema";
import type { Ctx } from "./context";
import { digestOf } from "./digest";
import { Refusal } from "./errors";

/** For a form: the key its page minted, and the digest of what was sent, so that a double click is one act. */
export function toSubmission(key: string, body: unknown): NonNullable<Ctx["submission"]> {
  return { key, bodyDigest: digestOf(body) };
}

/** The first answer to this Idempotency-Key; another body under the same key is refused. */
export function findSubmission(tx: Tx, { actor, submission }: Ctx): { answer: string } | undefined {
  if (!submission) return undefined;
  const sent = tx
    .select({ answer: submissions.answer, bodyDigest: submissions.bodyDigest })
    .from(submissions)
    .where(and(eq(submissions.userId, actor.id), eq(submissions.key, submission.key)))
    .get();
  if (sent && sent.bodyDigest !== submission.bodyDigest)
    throw new Refusal("conflict", "This Idempotency-Key was used before with other content. Send new content under a new key.");
  return sent;
}

export function keepSubmission(tx: Tx, { actor, now, submission }: Ctx, out: unknown): void {
  if (!submission) return;
  tx.insert(submissions)
    .values({ userId: actor.id, ...submission, answer: JSON.stringify(out ?? null), createdAt: now.toISOString() })
    .run();
}
