"use server";
import { revalidatePath } from "next/cache";
import { requestCtx } from "@/lib/auth/request-ctx";
import { type FormState, toFormState } from "@/lib/http/form-state";
import type { SquawkState } from "@/lib/testcards/words";
import type { Ctx } from "@/lib/workflow/context";
import { acceptSquawk } from "@/lib/workflow/squawk/accept-squawk";
import { assessSquawk } from "@/lib/workflow/squawk/assess-squawk";
import { closeSquawk } from "@/lib/workflow/squawk/close-squawk";
import { rectifySquawk } from "@/lib/workflow/squawk/rectify-squawk";
import { verifySquawk } from "@/lib/workflow/squawk/verify-squawk";

/** The squawk, and the state its page showed. */
export type Shown = { programmeId: string; squawkId: string; from: SquawkState };

async function act(form: FormData, programmeId: string, run: (ctx: Ctx) => unknown, done: string): Promise<FormState> {
  const ctx = await requestCtx();
  try {
    run(ctx);
  } catch (error) {
    return toFormState(error, form);
  }
  revalidatePath(`/programmes/${programmeId}`, "layout");
  return { message: null, fieldErrors: {}, values: {}, done };
}

export async function assessAction({ programmeId, ...which }: Shown, _: FormState, form: FormData): Promise<FormState> {
  const input = { ...which, severity: form.get("severity"), why: form.get("why") };
  return act(form, programmeId, (ctx) => assessSquawk(ctx, input), "The assessment is recorded.");
}

export async function rectifyAction({ programmeId, ...which }: Shown, _: FormState, form: FormData): Promise<FormState> {
  const input = { ...which, disposition: form.get("disposition"), why: form.get("why"), entryReference: form.get("entryReference") };
  return act(form, programmeId, (ctx) => rectifySquawk(ctx, input), "The disposition is recorded.");
}

export async function acceptAction({ programmeId, ...which }: Shown, _: FormState, form: FormData): Promise<FormState> {
  const input = { ...which, disposition: form.get("disposition"), why: form.get("why"), limit: form.get("limit") };
  return act(form, programmeId, (ctx) => acceptSquawk(ctx, input), "The disposition is recorded.");
}

export async function verifyAction({ programmeId, ...which }: Shown, _: FormState, form: FormData): Promise<FormState> {
  const input = { ...which, entryReference: form.get("entryReference") };
  return act(form, programmeId, (ctx) => verifySquawk(ctx, input), "It is verified.");
}

export async function closeAction({ programmeId, ...which }: Shown, _: FormState, form: FormData): Promise<FormState> {
  return act(form, programmeId, (ctx) => closeSquawk(ctx, which), "It is closed.");
}
