import type { Db } from "@/db/open";
import type { Actor } from "@/lib/auth/roles";

/** Everything a use case may know of the world: handed in, so that tests fake only time, ids and the session. */
export type Ctx = {
  readonly db: Db;
  readonly actor: Actor;
  readonly now: Date;
  readonly newId: () => string;
  /** The password was asked again and was right: what was shown, and when. */
  readonly proof?: { readonly userId: string; readonly digest: string; readonly at: Date };
};
