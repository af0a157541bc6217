"use server";
import { revalidatePath } from "next/cache";
import { requestCtx } from "@/lib/auth/request-ctx";
import { type FormState, toFormState } from "@/lib/http/form-state";
import { raiseSquawk } from "@/lib/workflow/squawk/raise-squawk";

export async function raiseSquawkAction(programmeId: string, _: FormState, form: FormData): Promise<FormState> {
  const ctx = await requestCtx();
  const sortieId = form.get("sortieId");
  let number: number;
  try {
    number = raiseSquawk(ctx, {
      programmeId,
      sortieId: sortieId === "" ? null : sortieId,
      system: form.get("system"),
      text: form.get("text"),
      severity: form.get("severity"),
    }).number;
  } catch (error) {
    return toFormState(error, form);
  }
  revalidatePath(`/programmes/${programmeId}`, "layout");
  return { message: null, fieldErrors: {}, values: {}, done: `Squawk ${number} is raised.` };
}
