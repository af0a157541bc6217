"use server";
import { revalidatePath } from "next/cache";
import { redirect } from "next/navigation";
import { requestCtx } from "@/lib/auth/request-ctx";
import { type FormState, toFormState } from "@/lib/http/form-state";
import { endAllSessions } from "@/lib/workflow/team/end-all-sessions";
import { endSession } from "@/lib/workflow/team/end-session";

export async function endSessionAction(_: FormState, form: FormData): Promise<FormState> {
  const ctx = await requestCtx();
  let wasThisOne: boolean;
  try {
    wasThisOne = endSession(ctx, { sessionId: form.get("sessionId") }).wasThisOne;
  } catch (error) {
    return toFormState(error, form);
  }
  if (wasThisOne) redirect("/sign-in");
  revalidatePath("/account");
  return { message: null, fieldErrors: {}, values: {}, done: "That sign-in is ended." };
}

export async function endAllSessionsAction(_: FormState, form: FormData): Promise<FormState> {
  const ctx = await requestCtx();
  try {
    endAllSessions(ctx, {});
  } catch (error) {
    return toFormState(error, form);
  }
  redirect("/sign-in");
}
