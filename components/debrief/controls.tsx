"use client";
import type { ReactNode } from "react";
import { classNames } from "@/components/ui/class-names";

/** Two to six large choices, one tap each; the chosen one is filled with ink and has a tick for whoever sees no colour. */
export function Choices({
  label,
  choices,
  value,
  onChoose,
  names = {},
  describedBy,
}: {
  label: string;
  choices: readonly string[];
  value: string | null;
  onChoose: (value: string) => void;
  names?: Record<string, string>;
  describedBy?: string;
}) {
  return (
    <fieldset aria-describedby={describedBy}>
      <legend className="mb-2 font-bold">{label}</legend>
      <div
        className={classNames(
          "grid gap-2",
          choices.length === 2 ? "grid-cols-2" : choices.length === 3 ? "grid-cols-3" : "grid-cols-2 hand:grid-cols-4",
        )}
      >
        {choices.map((choice) => (
          <button
            key={choice}
            type="button"
            aria-pressed={value === choice}
            onClick={() => onChoose(choice)}
            className="min-h-14 rounded-md border-2 border-ink bg-sheet px-2 text-ink aria-pressed:bg-ink aria-pressed:font-bold aria-pressed:text-sheet"
          >
            {names[choice] ?? choice}
          </button>
        ))}
      </div>
    </fieldset>
  );
}

export const YES_NO = { yes: "Yes", no: "No" };

export function Problem({ id, children }: { id?: string; children: ReactNode }) {
  return (
    <p id={id} className="mt-2 flex gap-2 font-bold text-ink-red" role="alert">
      <span aria-hidden>!</span>
      <span>{children}</span>
    </p>
  );
}

/** With a label it is a group of its own, so that "Lowest" or "Outside air then" is heard with the reading it belongs to. */
export function Panel({ children, className, label }: { children: ReactNode; className?: string; label?: string }) {
  const look = classNames("min-w-0 border border-rule bg-sheet p-4", className);
  if (!label) return <div className={look}>{children}</div>;
  return (
    <fieldset aria-label={label} className={look}>
      {children}
    </fieldset>
  );
}

export function Words({
  label,
  value,
  onChange,
  rows = 3,
  hint,
}: {
  label: string;
  value: string;
  onChange: (value: string) => void;
  rows?: number;
  hint?: string;
}) {
  return (
    <label className="block">
      <span className="mb-1 block font-bold">{label}</span>
      {hint ? <span className="mb-1 block text-ink-soft">{hint}</span> : null}
      <textarea
        className="w-full rounded-md border-2 border-ink bg-sheet p-3 text-ink"
        rows={rows}
        value={value}
        maxLength={500}
        onChange={(event) => onChange(event.target.value)}
      />
      {value.length > 400 ? <span className="text-ink-soft">{500 - value.length} characters left</span> : null}
    </label>
  );
}
