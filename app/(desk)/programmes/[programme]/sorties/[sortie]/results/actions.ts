"use server";
import { revalidatePath } from "next/cache";
import { requestCtx } from "@/lib/auth/request-ctx";
import { type FormState, toFormState } from "@/lib/http/form-state";
import { countersignStep } from "@/lib/workflow/step/countersign-step";
import { proposeStep } from "@/lib/workflow/step/propose-step";
import { sayHold } from "@/lib/workflow/step/say-hold";

export type FlownPoint = { programmeId: string; sortieId: string; revisionId: string; pointId: string };

const done = (words: string): FormState => ({ message: null, fieldErrors: {}, values: {}, done: words });
const show = (programmeId: string) => revalidatePath(`/programmes/${programmeId}`, "layout");

/** A proposal by the engineer, or a hold by anybody who works on the aircraft. */
export async function decideStepAction({ programmeId, ...where }: FlownPoint, _: FormState, form: FormData): Promise<FormState> {
  const ctx = await requestCtx();
  const decision = form.get("decision");
  const why = form.get("why");
  try {
    if (decision === "hold") sayHold(ctx, { ...where, why });
    else proposeStep(ctx, { ...where, decision, why });
  } catch (error) {
    return toFormState(error, form);
  }
  show(programmeId);
  return done(decision === "hold" ? "Held. It needs nobody’s countersignature." : "Proposed. It stands when a reviewer countersigns.");
}

export async function countersignStepAction(programmeId: string, stepId: string, _: FormState, form: FormData): Promise<FormState> {
  const ctx = await requestCtx();
  try {
    countersignStep(ctx, { stepId });
  } catch (error) {
    return toFormState(error, form);
  }
  show(programmeId);
  return done("Countersigned.");
}
