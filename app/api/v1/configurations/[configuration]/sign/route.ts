import { requestCtx } from "@/lib/auth/request-ctx";
import { verifyPassword } from "@/lib/auth/verify-password";
import { readJson } from "@/lib/http/read-request";
import { json, respond } from "@/lib/http/respond";
import { signConfiguration } from "@/lib/workflow/configuration/sign-configuration";
import { requirePermission } from "@/lib/workflow/permissions";
import { SignedBody } from "@/lib/workflow/signed-body";

type Context = { params: Promise<{ configuration: string }> };

/** POST /api/v1/configurations/{id}/sign: the mechanic signs what is fitted, with the password asked again. */
export function POST(request: Request, { params }: Context) {
  return respond(async () => {
    const ctx = await requestCtx(request);
    requirePermission(ctx.actor, "sign configuration");
    const { password, digest } = SignedBody.parse(await readJson(request));
    const proof = await verifyPassword(ctx, password, digest);
    return json(signConfiguration({ ...ctx, proof }, { configurationId: (await params).configuration, digest }));
  });
}
