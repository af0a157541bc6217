import { requestCtx } from "@/lib/auth/request-ctx";
import { HttpRefusal } from "@/lib/http/http-refusal";
import { respond } from "@/lib/http/respond";
import { getCanonicalDocument } from "@/lib/workflow/card/queries";

type Context = { params: Promise<{ card: string; letter: string }> };

/** GET …/revisions/{letter}/document: the bytes that were signed; their SHA-256 is the digest in the ETag. */
export function GET(request: Request, { params }: Context) {
  return respond(async () => {
    const { db, actor } = await requestCtx(request);
    const { card, letter } = await params;
    const frozen = getCanonicalDocument(db, actor, card, letter);
    if (!frozen) throw new HttpRefusal(404, "Not found", "This revision is not released yet, so it has no signed document.");
    return new Response(frozen.text, {
      headers: { "Content-Type": "application/json", ETag: `"${frozen.digest}"`, "Cache-Control": "private, no-cache" },
    });
  });
}
