"use client";
import { useActionState } from "react";
import { Field } from "@/components/form/field";
import { FormMessage } from "@/components/form/form-message";
import { SubmitButton } from "@/components/form/submit-button";
import { Input } from "@/components/ui/input";
import { Select } from "@/components/ui/select";
import { EMPTY_FORM, type FormState } from "@/lib/http/form-state";
import { SORTIE_KINDS } from "@/lib/testcards/words";

export function NewCardForm({ action }: { action: (state: FormState, form: FormData) => Promise<FormState> }) {
  const [state, send] = useActionState(action, EMPTY_FORM);
  return (
    <form action={send} noValidate className="flex max-w-md flex-col gap-4">
      <Field name="title" label="Title" hint="As it stands on the sheet, such as Climb cooling." required error={state.fieldErrors.title}>
        {(props) => <Input {...props} maxLength={80} defaultValue={state.values.title} />}
      </Field>
      <Field name="kind" label="Kind" required error={state.fieldErrors.kind}>
        {(props) => (
          <Select {...props} defaultValue={state.values.kind ?? "flight"} key={state.values.kind}>
            {SORTIE_KINDS.map((kind) => (
              <option key={kind}>{kind}</option>
            ))}
          </Select>
        )}
      </Field>
      <FormMessage message={Object.keys(state.fieldErrors).length > 0 ? null : state.message} />
      <SubmitButton waiting="Starting">Start the card</SubmitButton>
    </form>
  );
}
