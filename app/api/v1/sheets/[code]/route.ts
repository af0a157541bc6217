import { addressOf } from "@/lib/auth/options";
import { publicDb } from "@/lib/auth/public-ctx";
import { countTry } from "@/lib/auth/rate-limit";
import { json, respond } from "@/lib/http/respond";
import { SCAN_CAUTION } from "@/lib/testcards/words";
import { findSheet } from "@/lib/workflow/card/queries";

type Context = { params: Promise<{ code: string }> };

/** GET /api/v1/sheets/{code}: whether a printed sheet is in force. No sign-in; nothing else of the team's is told. */
export function GET(request: Request, { params }: Context) {
  return respond(async () => {
    const db = publicDb();
    await countTry(db, "sheet look-up", addressOf({ "x-forwarded-for": request.headers.get("x-forwarded-for") ?? undefined }));
    return json({ standing: findSheet(db, (await params).code).standing, caution: SCAN_CAUTION });
  });
}
