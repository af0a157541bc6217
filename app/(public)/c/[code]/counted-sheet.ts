import { addressOf } from "@/lib/auth/options";
import { publicDb } from "@/lib/auth/public-ctx";
import { countTry } from "@/lib/auth/rate-limit";
import { findSheet } from "@/lib/workflow/card/queries";

/** One look-up of a code without sign-in, counted by address so that codes cannot be tried in bulk. */
export async function findCountedSheet(code: string, forwardedFor: string | null) {
  const db = publicDb();
  await countTry(db, "sheet look-up", addressOf({ "x-forwarded-for": forwardedFor ?? undefined }));
  return findSheet(db, code);
}
