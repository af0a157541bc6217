import type { z } from "zod";
import type { Tx } from "@/db/open";
import { type AuditEntry, appendAudit } from "@/lib/audit/append-audit";
import type { Ctx } from "./context";
import { type Permission, requirePermission } from "./permissions";
import { findSubmission, keepSubmission } from "./submission";

type Definition<S extends z.ZodType, Out> = {
  /** Also the audit action: "card.release". */
  name: string;
  permission: Permission;
  input: S;
  run: (tx: Tx, ctx: Ctx, input: z.output<S>) => { out: Out; audit: AuditEntry | AuditEntry[] | "unchanged" };
};

export type UseCase<Out> = ((ctx: Ctx, raw: unknown) => Out) & { readonly useCase: string; readonly permission: Permission };

/** Role, then input, then one transaction that holds both the change and its audit event. */
export function defineUseCase<S extends z.ZodType, Out>({ name, permission, input, run }: Definition<S, Out>): UseCase<Out> {
  const call = (ctx: Ctx, raw: unknown): Out => {
    requirePermission(ctx.actor, permission);
    const parsed = input.parse(raw);
    return ctx.db.transaction(
      (tx) => {
        const sent = findSubmission(tx, ctx);
        if (sent) return JSON.parse(sent.answer) as Out;
        const { out, audit } = run(tx, ctx, parsed);
        if (audit !== "unchanged") for (const entry of [audit].flat()) appendAudit(tx, ctx, entry.action ?? name, entry);
        keepSubmission(tx, ctx, out);
        return out;
      },
      { behavior: "immediate" },
    );
  };
  return Object.assign(call, { useCase: name, permission });
}
