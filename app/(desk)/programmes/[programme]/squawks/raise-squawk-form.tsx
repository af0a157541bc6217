"use client";
import { useActionState } from "react";
import { Field } from "@/components/form/field";
import { FormMessage } from "@/components/form/form-message";
import { SubmitButton } from "@/components/form/submit-button";
import { Input } from "@/components/ui/input";
import { Select } from "@/components/ui/select";
import { Textarea } from "@/components/ui/textarea";
import type { FormState } from "@/lib/http/form-state";
import { SQUAWK_SEVERITIES } from "@/lib/testcards/words";

const NONE: FormState = { message: null, fieldErrors: {}, values: {} };

export function RaiseSquawkForm({
  action,
  sorties,
}: {
  action: (state: FormState, form: FormData) => Promise<FormState>;
  sorties: { id: string; label: string }[];
}) {
  const [state, submit] = useActionState(action, NONE);
  return (
    <form action={submit} noValidate className="grid gap-4 desk:grid-cols-2">
      <div className="desk:col-span-2">
        <FormMessage message={state.message} done={state.done} />
      </div>
      <Field name="system" label="System" hint="Such as cooling, fuel, ignition." required error={state.fieldErrors.system}>
        {(props) => <Input {...props} maxLength={60} defaultValue={state.values.system} />}
      </Field>
      <Field
        name="severity"
        label="Severity"
        hint="Grounding stops the next release and the next brief."
        required
        error={state.fieldErrors.severity}
      >
        {(props) => (
          <Select key={state.values.severity} {...props} defaultValue={state.values.severity ?? ""}>
            <option value="" disabled>
              Choose
            </option>
            {SQUAWK_SEVERITIES.map((severity) => (
              <option key={severity}>{severity}</option>
            ))}
          </Select>
        )}
      </Field>
      <Field
        name="text"
        label="What was seen"
        hint="One line, up to 500 characters."
        required
        error={state.fieldErrors.text}
        className="desk:col-span-2"
      >
        {(props) => <Textarea {...props} rows={2} maxLength={500} defaultValue={state.values.text} />}
      </Field>
      <Field name="sortieId" label="Sortie" error={state.fieldErrors.sortieId}>
        {(props) => (
          <Select key={state.values.sortieId} {...props} defaultValue={state.values.sortieId ?? ""}>
            <option value="">none</option>
            {sorties.map(({ id, label }) => (
              <option key={id} value={id}>
                {label}
              </option>
            ))}
          </Select>
        )}
      </Field>
      <div className="self-end">
        <SubmitButton waiting="Raising">Raise squawk</SubmitButton>
      </div>
    </form>
  );
}
