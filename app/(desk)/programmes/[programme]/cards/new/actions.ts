"use server";
import { createHash } from "node:crypto";
import { revalidatePath } from "next/cache";
import { redirect } from "next/navigation";
import { requestCtx } from "@/lib/auth/request-ctx";
import { type FormState, toFormState } from "@/lib/http/form-state";
import { createCard } from "@/lib/workflow/card/create-card";

/** A second press of the same form answers the first card: `key` was minted with the page. */
export async function createCardAction(programmeId: string, key: string, _: FormState, form: FormData): Promise<FormState> {
  const ctx = await requestCtx();
  const input = { programmeId, title: form.get("title"), kind: form.get("kind") };
  let cardId: string;
  try {
    const bodyDigest = createHash("sha256").update(JSON.stringify(input)).digest("hex");
    cardId = createCard({ ...ctx, submission: { key, bodyDigest } }, input).id;
  } catch (error) {
    return toFormState(error, form);
  }
  revalidatePath(`/programmes/${programmeId}/cards`);
  redirect(`/programmes/${programmeId}/cards/${cardId}`);
}
