"use client";
import { useActionState } from "react";
import { FormMessage } from "@/components/form/form-message";
import { SubmitButton } from "@/components/form/submit-button";
import type { FormState } from "@/lib/http/form-state";

type Action = (state: FormState, form: FormData) => Promise<FormState>;
const NONE: FormState = { message: null, fieldErrors: {}, values: {} };

export function EndSession({ action, sessionId, label }: { action: Action; sessionId: string; label: string }) {
  const [state, submit] = useActionState(action, NONE);
  return (
    <form action={submit} className="flex flex-col items-end gap-2">
      <input type="hidden" name="sessionId" value={sessionId} />
      <SubmitButton variant="outline" waiting="Ending">
        {label}
      </SubmitButton>
      <FormMessage message={state.message} done={state.done} />
    </form>
  );
}

export function EndAllSessions({ action }: { action: Action }) {
  const [state, submit] = useActionState(action, NONE);
  return (
    <form action={submit} className="flex flex-col items-start gap-2">
      <SubmitButton variant="danger" waiting="Signing out">
        Sign out everywhere
      </SubmitButton>
      <FormMessage message={state.message} />
    </form>
  );
}
