import type { Ctx } from "./context";
import { Refusal } from "./errors";

/** How long a password asked again stays fresh: the signature follows in the same request. */
const freshMs = 5 * 60_000;

/** Signing wants the password of the person who signs, asked again just now, for exactly this digest. */
export function requireProof({ actor, now, proof }: Ctx, digest: string): void {
  const fresh = proof && proof.userId === actor.id && proof.digest === digest && Math.abs(now.getTime() - proof.at.getTime()) <= freshMs;
  if (!fresh) throw new Refusal("invalid", "Type your password again to sign exactly what is shown.", "password");
}
