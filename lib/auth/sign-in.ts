import { and, asc, eq, isNull } from "drizzle-orm";
import type { Db } from "@/db/open";
import { memberships, users } from "@/db/schema";
import { matchesPassword } from "./password";
import { countTry, forgetTries, giveBackTry } from "./rate-limit";
import { openSession } from "./session";

export type SignInTry = { email: string; password: string; address: string; userAgent: string; now: Date; newId: () => string };
export type SignedIn = { sessionId: string; userId: string; name: string; email: string };

/** One answer for an unknown e-mail, a wrong password and a removed person, in the same time. */
export const SIGN_IN_REFUSED = "E-mail and password do not belong together. Check both, then try again.";

/** A new session row, or undefined. Throws TooManyTries past the limit for this e-mail or this address. */
export async function signIn(db: Db, { email, password, address, userAgent, now, newId }: SignInTry): Promise<SignedIn | undefined> {
  const asked = email.trim().toLowerCase().slice(0, 254);
  await countTry(db, "sign-in by address", address);
  await countTry(db, "sign-in by e-mail", asked);
  const person = db
    .select({ id: users.id, name: users.name, email: users.email, passwordHash: users.passwordHash, teamId: memberships.teamId })
    .from(users)
    .innerJoin(memberships, and(eq(memberships.userId, users.id), isNull(memberships.removedAt)))
    .where(eq(users.email, asked))
    .orderBy(asc(memberships.teamId))
    .get();
  const right = await matchesPassword(person?.passwordHash ?? null, password);
  if (!person || !right) return undefined;
  await forgetTries(db, "sign-in by e-mail", asked);
  await giveBackTry(db, "sign-in by address", address);
  const sessionId = newId();
  openSession(db, { id: sessionId, userId: person.id, teamId: person.teamId, now, userAgent });
  return { sessionId, userId: person.id, name: person.name, email: person.email };
}
