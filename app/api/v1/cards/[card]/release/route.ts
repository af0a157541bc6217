import { requestCtx } from "@/lib/auth/request-ctx";
import { verifyPassword } from "@/lib/auth/verify-password";
import { readJson } from "@/lib/http/read-request";
import { json, respond } from "@/lib/http/respond";
import { releaseCard } from "@/lib/workflow/card/release-card";
import { requirePermission } from "@/lib/workflow/permissions";
import { SignedBody } from "@/lib/workflow/signed-body";

type Context = { params: Promise<{ card: string }> };

/** POST /api/v1/cards/{id}/release: signs exactly the digest that was shown, with the password asked again. */
export function POST(request: Request, { params }: Context) {
  return respond(async () => {
    const ctx = await requestCtx(request);
    requirePermission(ctx.actor, "release cards");
    const { password, digest } = SignedBody.parse(await readJson(request));
    const proof = await verifyPassword(ctx, password, digest);
    return json(releaseCard({ ...ctx, proof }, { cardId: (await params).card, digest }));
  });
}
