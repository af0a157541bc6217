import { hash, verify } from "@node-rs/argon2";

/** Argon2id with 19 MiB, two passes, one lane: the least that OWASP's password storage sheet names. */
const COST = { memoryCost: 19_456, timeCost: 2, parallelism: 1 };

/** Longer input is refused before it is hashed: hashing megabytes is a way to stop a server. */
export const PASSWORD_LENGTH = { least: 8, most: 200 };

export function hashPassword(password: string): Promise<string> {
  return hash(password, COST);
}

let nobodysHash: Promise<string> | undefined;

/** Takes as long for an e-mail that nobody has as for a wrong password: there, an unguessable one is compared. */
export async function matchesPassword(passwordHash: string | null, typed: string): Promise<boolean> {
  nobodysHash ??= hashPassword(crypto.randomUUID());
  const usable = typed.length > 0 && typed.length <= PASSWORD_LENGTH.most;
  const matches = await verify(passwordHash ?? (await nobodysHash), usable ? typed : "-");
  return matches && usable && passwordHash !== null;
}
