"use client";
import { ArrowDown, ArrowUp } from "lucide-react";
import type { ReactNode } from "react";
import { buttonClass } from "@/components/ui/button";
import type { CardDocument, CardPoint } from "@/lib/testcards/card";
import { COMPLETION_RULES, type CompletionRule } from "@/lib/testcards/words";
import { ChoiceField, LinesField, NumberField, TextField, TickField } from "../fields";
import { differencesFromShelf, type EditablePart } from "../shelf-difference";
import { AbortEditor } from "./abort-editor";
import { EntryEditor, StepEditor } from "./entry-editor";
import { LimitEditor } from "./limit-editor";
import { ReadingEditor } from "./reading-editor";

export type PointPartProps = {
  card: CardDocument;
  point: CardPoint;
  change: (patch: Partial<CardPoint>, what: string) => void;
  newId: () => string;
};

type EditorProps = PointPartProps & {
  index: number;
  count: number;
  shelf: CardPoint | undefined;
  open: string; // the section to show open
  onOpen: (section: string) => void;
  onMove: (to: number) => void;
  onRemove: () => void;
  onTakeBack: (part: EditablePart) => void;
};

/** One point of the card, changed in place; what differs from the shelf says so and can be taken back. */
export function PointEditor(props: EditorProps) {
  const { card, point, change, index, count, shelf, open, onOpen, onMove, onRemove, onTakeBack } = props;
  const differs = differencesFromShelf(point, shelf);
  const part = { card, point, change, newId: props.newId };
  const section = (key: string, title: string, parts: EditablePart[], body: ReactNode) => (
    <Section
      key={key}
      title={title}
      isOpen={open === key}
      onToggle={() => onOpen(open === key ? "" : key)}
      changed={differs.some((one) => parts.includes(one.part))}
    >
      {body}
    </Section>
  );
  return (
    <section aria-label={`Point ${index + 1}, ${point.title}`} data-testid="point-editor">
      <div className="flex items-start justify-between gap-2">
        <h2 className="font-bold text-lg">
          Point {index + 1} of {count}
          <span className="block font-normal text-ink-soft text-sm">
            {shelf?.template ? `From ${shelf.template.code}, revision ${shelf.template.revision}` : "Not on the shelf"}
          </span>
        </h2>
        <div className="flex">
          <button
            type="button"
            className={buttonClass("quiet")}
            aria-label="Move the point up"
            disabled={index === 0}
            onClick={() => onMove(index - 1)}
          >
            <ArrowUp aria-hidden className="size-5" />
          </button>
          <button
            type="button"
            className={buttonClass("quiet")}
            aria-label="Move the point down"
            disabled={index === count - 1}
            onClick={() => onMove(index + 1)}
          >
            <ArrowDown aria-hidden className="size-5" />
          </button>
        </div>
      </div>
      {differs.length > 0 ? (
        <div className="mt-2 border border-rule bg-wash-blue p-3 text-sm">
          <p className="font-bold">Differs from the shelf</p>
          <ul className="mt-1 flex flex-wrap gap-x-4 gap-y-1">
            {differs.map(({ part: key, label }) => (
              <li key={key}>
                {label}{" "}
                <button
                  type="button"
                  className="min-h-6 underline underline-offset-4"
                  onClick={() => onTakeBack(key)}
                  aria-label={`${label}: take back as on the shelf`}
                >
                  take back
                </button>
              </li>
            ))}
          </ul>
        </div>
      ) : null}
      <div className="mt-4 flex flex-col gap-3">
        <TextField
          label="Title, at most five words"
          value={point.title}
          maxLength={60}
          onChange={(title) => change({ title }, "title")}
          focusKey="title"
        />
        <div className="grid grid-cols-2 gap-2">
          <NumberField
            label="Duration, min"
            value={point.durationMin}
            low={0}
            high={600}
            focusKey="durationMin"
            onChange={(durationMin) => durationMin !== null && change({ durationMin }, "duration")}
          />
          <NumberField
            label="Fuel flow, L/h"
            value={point.fuelFlowLPerH}
            low={0}
            high={500}
            onChange={(fuelFlowLPerH) => fuelFlowLPerH !== null && change({ fuelFlowLPerH }, "fuel flow")}
          />
        </div>
      </div>
      <div className="mt-4">
        {section("entry", "Entry", ["positions", "entry", "entryText"], <EntryEditor {...part} />)}
        {section("steps", "Steps", ["steps"], <StepEditor {...part} />)}
        {section("readings", "Readings", ["readings", "grid"], <ReadingEditor {...part} />)}
        {section("limits", "Limits", ["limits"], <LimitEditor {...part} />)}
        {section("aborts", "Abort", ["aborts"], <AbortEditor {...part} />)}
        {section(
          "recovery",
          "Recovery",
          ["recovery"],
          <LinesField
            label="What to do after an abort, in order"
            value={point.recovery}
            rows={3}
            maxLength={300}
            focusKey="recovery"
            onChange={(recovery) => change({ recovery: recovery.replace(/\s*\n\s*/g, " ") }, "recovery")}
          />,
        )}
        {section("rules", "Completion, height and objectives", ["completion", "heightFloor", "objectives"], <RuleFields {...part} />)}
      </div>
      <button type="button" className={buttonClass("danger", "mt-4 w-full")} onClick={onRemove}>
        Take the point off the card
      </button>
    </section>
  );
}

function Section({
  title,
  isOpen,
  onToggle,
  changed,
  children,
}: {
  title: string;
  isOpen: boolean;
  onToggle: () => void;
  changed: boolean;
  children: ReactNode;
}) {
  return (
    <div className="border-rule border-t">
      <button
        type="button"
        aria-expanded={isOpen}
        onClick={onToggle}
        className="flex min-h-12 w-full items-center justify-between gap-2 text-left font-bold"
      >
        {title}
        <span className="font-normal text-ink-soft text-sm">
          {changed ? "changed" : ""} {isOpen ? "−" : "+"}
        </span>
      </button>
      {isOpen ? <div className="pb-4">{children}</div> : null}
    </div>
  );
}

function RuleFields({ card, point, change }: PointPartProps) {
  return (
    <div className="flex flex-col gap-3">
      <ChoiceField
        label="Completion rule"
        value={point.completion.rule}
        focusKey="completion"
        onChange={(rule) => change({ completion: { ...point.completion, rule: rule as CompletionRule } }, "completion rule")}
        choices={COMPLETION_RULES.map((rule) => ({ value: rule, label: rule }))}
      />
      {point.completion.rule === "whole run" ? (
        <NumberField
          label="Whole run, s"
          optional
          low={0}
          high={14400}
          value={point.completion.runS}
          onChange={(runS) => change({ completion: { ...point.completion, runS } }, "run time")}
        />
      ) : null}
      {point.place === "air" ? (
        <NumberField
          label="Not below, ft AGL"
          optional
          low={0}
          high={50000}
          focusKey="heightFloor"
          value={point.heightFloor?.value ?? null}
          onChange={(value) => change({ heightFloor: value === null ? null : { value, unit: "ft", reference: "AGL" } }, "height floor")}
        />
      ) : null}
      <fieldset>
        <legend className="text-ink-soft text-sm">Objectives it serves</legend>
        {card.programme.objectives.map(({ code, question }) => (
          <TickField
            key={code}
            label={`${code}  ${question}`}
            focusKey="objectives"
            checked={point.objectives.includes(code)}
            onChange={(on) =>
              change({ objectives: on ? [...point.objectives, code] : point.objectives.filter((one) => one !== code) }, "objectives")
            }
          />
        ))}
      </fieldset>
    </div>
  );
}
