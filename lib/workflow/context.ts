import type { Db } from "@/db/open";
import type { Actor } from "@/lib/auth/roles";

/** Everything a use case may know of the world: handed in, so that tests fake only time, ids and the session. */
export type Ctx = {
  readonly db: Db;
  readonly actor: Actor;
  readonly now: Date;
  /** The calendar day (UTC) that the rules go by, YYYY-MM-DD. */
  readonly today: string;
  readonly newId: () => string;
  /** Chance for the code on the sheet's foot; the system's own unless the demo wants the same codes every time. */
  readonly randomBytes?: (size: number) => Uint8Array;
  /** The password was asked again and was right: what was shown, and when. */
  readonly proof?: { readonly userId: string; readonly digest: string; readonly at: Date };
  /** The caller's Idempotency-Key and the digest of what came with it: the same pair answers the first result. */
  readonly submission?: { readonly key: string; readonly bodyDigest: string };
};
