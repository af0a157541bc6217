"use client";
import { Plus } from "lucide-react";
import { buttonClass } from "@/components/ui/button";
import { unitLabel } from "@/lib/format/unit";
import type { EntryCondition, Step } from "@/lib/testcards/card";
import { ChoiceField, LinesField, NumberField, TextField } from "../fields";
import { RemoveButton } from "./abort-editor";
import type { PointPartProps } from "./point-editor";

/** Control positions first, then numbers on the gauge with their tolerance, then words. */
export function EntryEditor({ card, point, change, newId }: PointPartProps) {
  const set = (entry: EntryCondition[], what: string) => change({ entry }, what);
  return (
    <div className="flex flex-col gap-3">
      {card.programme.controls.map((control) => {
        const now = point.positions.find((one) => one.control === control.name)?.position ?? "";
        return (
          <ChoiceField
            key={control.name}
            label={`${control.name} position`}
            focusKey="positions"
            value={now}
            onChange={(position) => {
              const others = point.positions.filter((one) => one.control !== control.name);
              change({ positions: position ? [...others, { control: control.name, position }] : others }, `${control.name} position`);
            }}
            choices={[
              { value: "", label: "not stated" },
              ...control.positions
                .filter(({ groundOnly }) => !groundOnly || point.place === "ground")
                .map(({ name }) => ({ value: name, label: name })),
            ]}
          />
        );
      })}
      {point.entry.map((condition) => {
        const put = (patch: Partial<EntryCondition>) =>
          set(
            point.entry.map((one) => (one === condition ? { ...one, ...patch } : one)),
            `entry ${condition.id}`,
          );
        const name = card.programme.instruments.find(({ id }) => id === condition.instrument)?.gaugeName ?? condition.parameter;
        return (
          <div key={condition.id} className="grid grid-cols-[1fr_1fr_1fr_auto] items-start gap-2 [&>button]:mt-6">
            <ChoiceField
              label={name}
              value={condition.relation}
              onChange={(relation) => put({ relation: relation as EntryCondition["relation"] })}
              choices={["about", "at least", "at most"].map((value) => ({ value, label: value }))}
            />
            <NumberField
              label="On the gauge"
              value={condition.value}
              unit={unitLabel(condition.unit)}
              focusKey={`entry ${condition.id}`}
              onChange={(value) => value !== null && put({ value })}
            />
            <NumberField
              label="Tolerance ±"
              optional
              low={0}
              value={condition.tolerance}
              disabled={condition.relation !== "about"}
              onChange={(tolerance) => put({ tolerance })}
            />
            <RemoveButton
              label={`Remove the ${name} condition`}
              onClick={() =>
                set(
                  point.entry.filter((one) => one !== condition),
                  "entry condition removed",
                )
              }
            />
          </div>
        );
      })}
      <ChoiceField
        label="Add an entry condition"
        hideLabel
        value=""
        onChange={(id) => {
          const instrument = card.programme.instruments.find((one) => one.id === id);
          if (instrument)
            set(
              [
                ...point.entry,
                {
                  id: newId(),
                  parameter: instrument.parameter,
                  instrument: id,
                  relation: "about",
                  value: instrument.low,
                  tolerance: instrument.markSpacing,
                  unit: instrument.unit,
                },
              ],
              "entry condition added",
            );
        }}
        choices={[
          { value: "", label: "Add a condition on …" },
          ...card.programme.instruments
            .filter(({ visibleTo }) => visibleTo.includes("pilot"))
            .map((one) => ({ value: one.id, label: `${one.gaugeName}, ${unitLabel(one.unit)} (${one.name})` })),
        ]}
      />
      <LinesField
        label="Entry, in words"
        value={point.entryText}
        maxLength={200}
        focusKey="entry"
        onChange={(entryText) => change({ entryText: entryText.replace(/\s*\n\s*/g, " ") }, "entry text")}
      />
    </div>
  );
}

const KINDS = [
  { value: "action", label: "action" },
  { value: "power", label: "power" },
  { value: "cool-down", label: "cool-down" },
  { value: "engine stop", label: "engine stop" },
];

export function StepEditor({ point, change, newId }: PointPartProps) {
  const set = (steps: Step[], what: string) => change({ steps }, what);
  return (
    <div className="flex flex-col gap-3">
      {point.steps.map((step, index) => {
        const put = (patch: Partial<Step>) =>
          set(
            point.steps.map((one) => (one === step ? { ...one, ...patch } : one)),
            `step ${step.id} ${Object.keys(patch).join()}`,
          );
        return (
          <fieldset key={step.id} className="border border-rule p-3">
            <legend className="px-1 text-ink-soft text-sm">Step {index + 1}</legend>
            <div className="flex items-start gap-2 [&>button]:mt-6">
              <div className="flex-1">
                <TextField
                  label="Verb first"
                  value={step.text}
                  maxLength={120}
                  hint={step.text.length > 60 ? `${step.text.length} of 60 characters` : undefined}
                  focusKey={`steps ${step.id}`}
                  onChange={(text) => put({ text })}
                />
              </div>
              <RemoveButton
                label={`Remove step ${index + 1}`}
                onClick={() =>
                  set(
                    point.steps.filter((one) => one !== step),
                    "step removed",
                  )
                }
              />
            </div>
            <div className="mt-2 grid grid-cols-2 gap-2">
              <ChoiceField label="Kind" value={step.kind} onChange={(kind) => put({ kind: kind as Step["kind"] })} choices={KINDS} />
              <NumberField
                label="Time, s"
                optional
                low={0}
                high={7200}
                value={step.durationS}
                onChange={(durationS) => put({ durationS })}
              />
              <NumberField label="rpm" optional low={0} high={9999} value={step.rpm} onChange={(rpm) => put({ rpm })} />
              <NumberField
                label="Manifold, inHg"
                optional
                low={0}
                high={99}
                value={step.manifoldPressureInHg}
                onChange={(manifoldPressureInHg) => put({ manifoldPressureInHg })}
              />
            </div>
          </fieldset>
        );
      })}
      <button
        type="button"
        className={buttonClass("outline")}
        onClick={() =>
          set(
            [...point.steps, { id: newId(), text: "", kind: "action", durationS: null, rpm: null, manifoldPressureInHg: null }],
            "step added",
          )
        }
      >
        <Plus aria-hidden className="size-4" /> Step
      </button>
    </div>
  );
}
