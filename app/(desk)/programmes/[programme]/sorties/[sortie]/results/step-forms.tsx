"use client";
import { useActionState } from "react";
import { FormMessage } from "@/components/form/form-message";
import { SubmitButton } from "@/components/form/submit-button";
import { Input } from "@/components/ui/input";
import { Select } from "@/components/ui/select";
import { EMPTY_FORM, type FormState } from "@/lib/http/form-state";
import { STEP_DECISIONS, type StepDecision } from "@/lib/testcards/words";

type Action = (state: FormState, form: FormData) => Promise<FormState>;

/** As computed or stricter, never looser; whoever may only hold sees only that. */
export function DecideStep({
  action,
  name,
  computed,
  mayPropose,
}: {
  action: Action;
  name: string;
  computed: StepDecision;
  mayPropose: boolean;
}) {
  const [state, send] = useActionState(action, EMPTY_FORM);
  const offered = mayPropose ? STEP_DECISIONS.slice(STEP_DECISIONS.indexOf(computed)) : (["hold"] as const);
  return (
    <form action={send} className="grid items-center gap-3 hand:grid-cols-[1fr_12rem_1fr_auto]">
      <p>
        {name}
        <span className="block text-ink-soft text-sm">computed: {computed}</span>
      </p>
      <Select
        name="decision"
        aria-label={`Decision after ${name}`}
        key={state.values.decision ?? computed}
        defaultValue={state.values.decision ?? offered[0]}
      >
        {offered.map((one) => (
          <option key={one}>{one}</option>
        ))}
      </Select>
      <Input
        name="why"
        aria-label={`What the decision after ${name} rests on`}
        placeholder="What it rests on, in one line"
        maxLength={300}
        defaultValue={state.values.why}
        aria-invalid={state.fieldErrors.why ? true : undefined}
      />
      <SubmitButton variant="outline" waiting="Recording">
        {mayPropose ? "Propose" : "Hold"}
      </SubmitButton>
      {state.message || state.done ? (
        <div className="hand:col-span-4">
          <FormMessage message={state.fieldErrors.why ?? state.message} done={state.done} />
        </div>
      ) : null}
    </form>
  );
}

export function Countersign({ action, decision }: { action: Action; decision: string }) {
  const [state, send] = useActionState(action, EMPTY_FORM);
  return (
    <form action={send}>
      <SubmitButton variant="outline" waiting="Countersigning">
        Countersign “{decision}”
      </SubmitButton>
      <FormMessage message={state.message} />
    </form>
  );
}
