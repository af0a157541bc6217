import { eq } from "drizzle-orm";
import type { Db } from "@/db/open";
import { users } from "@/db/schema";
import { WrongPassword } from "./errors";
import { matchesPassword } from "./password";
import { countTry, forgetTries } from "./rate-limit";
import type { Actor } from "./roles";

export type Proof = { userId: string; digest: string; at: Date };

/** The password asked again before a signature: hand the proof to the use case as `{ ...ctx, proof }`. `digest` is of what was shown. */
export async function verifyPassword(ctx: { db: Db; actor: Actor; now: Date }, password: string, digest: string): Promise<Proof> {
  const { db, actor, now } = ctx;
  await countTry(db, "password asked again", actor.id);
  const row = db.select({ passwordHash: users.passwordHash }).from(users).where(eq(users.id, actor.id)).get();
  if (!(await matchesPassword(row?.passwordHash ?? null, password))) throw new WrongPassword();
  await forgetTries(db, "password asked again", actor.id);
  return { userId: actor.id, digest, at: now };
}
