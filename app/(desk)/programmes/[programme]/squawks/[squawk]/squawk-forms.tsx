"use client";
import { type ReactNode, useActionState } from "react";
import { Field } from "@/components/form/field";
import { FormMessage } from "@/components/form/form-message";
import { SubmitButton } from "@/components/form/submit-button";
import { Input } from "@/components/ui/input";
import { Select } from "@/components/ui/select";
import { Textarea } from "@/components/ui/textarea";
import { EMPTY_FORM, type FormState } from "@/lib/http/form-state";
import { SQUAWK_SEVERITIES, type SquawkSeverity } from "@/lib/testcards/words";

type Action = (state: FormState, form: FormData) => Promise<FormState>;
type FormProps = { action: Action };

/** A form of one act: its heading, its words, its fields, one button. */
function ActForm({
  action,
  title,
  lead,
  button,
  waiting,
  main = true,
  children,
}: FormProps & {
  title: string;
  lead: string;
  button: string;
  waiting: string;
  main?: boolean;
  children?: (state: FormState) => ReactNode;
}) {
  const [state, submit] = useActionState(action, EMPTY_FORM);
  return (
    <form action={submit} noValidate aria-label={title} className="flex max-w-prose flex-col gap-4 border-rule border-t py-5">
      <div>
        <h3 className="font-bold text-lg">{title}</h3>
        <p className="text-ink-soft">{lead}</p>
      </div>
      <FormMessage message={state.message} done={state.done} />
      {children?.(state)}
      <div>
        <SubmitButton waiting={waiting} variant={main ? "main" : "outline"} className="max-hand:w-full">
          {button}
        </SubmitButton>
      </div>
    </form>
  );
}

export function AssessForm({ action, severity, fixed, again }: FormProps & { severity: SquawkSeverity; fixed: boolean; again: boolean }) {
  return (
    <ActForm
      action={action}
      title={again ? "Assess it anew" : "Assess"}
      lead={
        fixed
          ? "A reading lay past a placard: it stays grounding until the maker's inspection is done and entered."
          : "Confirm the severity, or change it and say why."
      }
      button="Record the assessment"
      waiting="Recording"
      main={!again}
    >
      {({ fieldErrors, values }) => (
        <>
          <Field id="assess-severity" name="severity" label="Severity" required error={fieldErrors.severity}>
            {(props) => (
              <Select key={values.severity} {...props} defaultValue={values.severity ?? severity}>
                {(fixed ? [severity] : SQUAWK_SEVERITIES).map((one) => (
                  <option key={one}>{one}</option>
                ))}
              </Select>
            )}
          </Field>
          <Field
            id="assess-why"
            name="why"
            label="Why"
            hint="Needed where the severity changes."
            required={fieldErrors.why !== undefined}
            error={fieldErrors.why}
          >
            {(props) => <Textarea {...props} rows={2} maxLength={300} defaultValue={values.why} />}
          </Field>
        </>
      )}
    </ActForm>
  );
}

function DispositionSelect({ id, options, state: { fieldErrors, values } }: { id: string; options: readonly string[]; state: FormState }) {
  return (
    <Field id={id} name="disposition" label="Disposition" required error={fieldErrors.disposition}>
      {(props) => (
        <Select key={values.disposition} {...props} defaultValue={values.disposition ?? ""}>
          <option value="" disabled>
            Choose
          </option>
          {options.map((one) => (
            <option key={one}>{one}</option>
          ))}
        </Select>
      )}
    </Field>
  );
}

export function RectifyForm({ action, again }: FormProps & { again: boolean }) {
  return (
    <ActForm
      action={action}
      title={again ? "Rectify it anew" : "Rectify"}
      lead="What was done, and where it is written up."
      button="Record the work"
      waiting="Recording"
      main={!again}
    >
      {(state) => (
        <>
          <DispositionSelect id="rectify-disposition" options={["rectified", "no fault found"]} state={state} />
          <Field id="rectify-why" name="why" label="What was done or looked at" required error={state.fieldErrors.why}>
            {(props) => <Textarea {...props} rows={2} maxLength={300} defaultValue={state.values.why} />}
          </Field>
          <Field
            id="rectify-entry"
            name="entryReference"
            label="Entry"
            hint="Where the work is written up, such as log 2, page 14."
            required
            error={state.fieldErrors.entryReference}
          >
            {(props) => <Input {...props} maxLength={120} defaultValue={state.values.entryReference} />}
          </Field>
        </>
      )}
    </ActForm>
  );
}

export function AcceptForm({ action }: FormProps) {
  return (
    <ActForm
      action={action}
      title="Defer, or accept as is"
      lead="An engineering reason stands beside it. A grounding squawk takes neither."
      button="Record the disposition"
      waiting="Recording"
      main={false}
    >
      {(state) => (
        <>
          <DispositionSelect id="accept-disposition" options={["deferred with limit", "accepted as is"]} state={state} />
          <Field id="accept-why" name="why" label="Engineering reason" required error={state.fieldErrors.why}>
            {(props) => <Textarea {...props} rows={2} maxLength={300} defaultValue={state.values.why} />}
          </Field>
          <Field
            id="accept-limit"
            name="limit"
            label="Limit"
            hint="Of a deferred one: until when, or within what, it is flown."
            required={state.fieldErrors.limit !== undefined}
            error={state.fieldErrors.limit}
          >
            {(props) => <Input {...props} maxLength={200} defaultValue={state.values.limit} />}
          </Field>
        </>
      )}
    </ActForm>
  );
}

export function VerifyForm({ action, grounding }: FormProps & { grounding: boolean }) {
  return (
    <ActForm
      action={action}
      title="Verify"
      lead={
        grounding
          ? "It then no longer stops release and brief, so it needs the licensed person's entry."
          : "Look at the aircraft, then say that it is as it is written up."
      }
      button="Verify"
      waiting="Verifying"
    >
      {({ fieldErrors, values }) => (
        <Field
          id="verify-entry"
          name="entryReference"
          label={grounding ? "Licensed person's entry" : "Entry"}
          hint="Name or licence, book and entry."
          required={grounding}
          error={fieldErrors.entryReference}
        >
          {(props) => <Input {...props} maxLength={120} defaultValue={values.entryReference} />}
        </Field>
      )}
    </ActForm>
  );
}

export function CloseForm({ action }: FormProps) {
  return (
    <ActForm action={action} title="Close" lead="What was done was read and is complete." button="Close the squawk" waiting="Closing" />
  );
}
