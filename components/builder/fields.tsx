"use client";
import { type ReactNode, useEffect, useId, useRef, useState } from "react";
import { CONTROL } from "@/components/ui/input";

type Common = { label: string; hideLabel?: boolean; error?: string | null; hint?: ReactNode; disabled?: boolean; focusKey?: string };

function Frame({ id, label, hideLabel, error, hint, children }: Common & { id: string; children: ReactNode }) {
  return (
    <div className="min-w-0">
      <label htmlFor={id} className={hideLabel ? "sr-only" : "mb-1 block text-sm text-ink-soft"}>
        {label}
      </label>
      {children}
      {hint ? <p className="mt-1 text-sm text-ink-soft">{hint}</p> : null}
      {error ? (
        <p id={`${id}-error`} className="mt-1 text-sm text-ink-red">
          {error}
        </p>
      ) : null}
    </div>
  );
}

export function TextField({
  value,
  onChange,
  maxLength = 200,
  placeholder,
  ...common
}: Common & { value: string; onChange: (value: string) => void; maxLength?: number; placeholder?: string }) {
  const id = useId();
  return (
    <Frame id={id} {...common}>
      <input
        id={id}
        className={CONTROL}
        value={value}
        maxLength={maxLength}
        placeholder={placeholder}
        disabled={common.disabled}
        data-focus={common.focusKey}
        aria-invalid={common.error ? true : undefined}
        aria-describedby={common.error ? `${id}-error` : undefined}
        onChange={(event) => onChange(event.target.value)}
      />
    </Frame>
  );
}

export function LinesField({
  value,
  onChange,
  rows = 2,
  maxLength = 500,
  ...common
}: Common & { value: string; onChange: (value: string) => void; rows?: number; maxLength?: number }) {
  const id = useId();
  return (
    <Frame id={id} {...common}>
      <textarea
        id={id}
        className={`${CONTROL} py-2`}
        rows={rows}
        value={value}
        maxLength={maxLength}
        disabled={common.disabled}
        data-focus={common.focusKey}
        onChange={(event) => onChange(event.target.value)}
      />
    </Frame>
  );
}

const NUMBER = /^\s*[-+−]?\d{1,9}([.,]\d{1,6})?\s*$/;

export function readNumber(typed: string): number | null {
  return NUMBER.test(typed) ? Number(typed.trim().replace("−", "-").replace(",", ".")) : null;
}

type NumberProps = Common & {
  value: number | null;
  onChange: (value: number | null) => void;
  unit?: string;
  optional?: boolean;
  low?: number;
  high?: number;
};

/** Keeps what was typed while it cannot be used and says so at once; the card then holds no number rather than an older one. */
export function NumberField({ value, onChange, unit, optional = false, low, high, ...common }: NumberProps) {
  const id = useId();
  const [typed, setTyped] = useState(shown(value));
  const passedOn = useRef(value);
  useEffect(() => {
    if (passedOn.current === value) return;
    passedOn.current = value;
    setTyped(shown(value));
  }, [value]);
  const [left, setLeft] = useState(false);
  const number = readNumber(typed);
  const outside = number === null ? null : rangeProblem(number, low, high);
  const missing = typed.trim() === "" ? (optional ? null : "Enter a number.") : number === null ? "Enter a number, such as 102.5." : null;
  const problem = outside ?? (left ? missing : null);
  const type = (next: string) => {
    setTyped(next);
    const read = readNumber(next);
    const usable = read !== null && rangeProblem(read, low, high) === null ? read : null;
    if (usable === null && !optional) return;
    passedOn.current = usable;
    onChange(usable);
  };
  return (
    <Frame id={id} {...common} error={common.error ?? problem}>
      <div className="flex items-center gap-2">
        <input
          id={id}
          inputMode="decimal"
          autoComplete="off"
          className={`${CONTROL} tabular-nums`}
          value={typed}
          disabled={common.disabled}
          data-focus={common.focusKey}
          aria-invalid={problem ? true : undefined}
          aria-describedby={problem ? `${id}-error` : undefined}
          onBlur={() => setLeft(true)}
          onChange={(event) => type(event.target.value)}
        />
        {unit ? <span className="shrink-0 text-sm text-ink-soft">{unit}</span> : null}
      </div>
    </Frame>
  );
}

function rangeProblem(number: number, low: number | undefined, high: number | undefined): string | null {
  if (low !== undefined && number < low) return `Enter ${low} or more.`;
  return high !== undefined && number > high ? `Enter ${high} or less.` : null;
}

function shown(value: number | null): string {
  return value === null ? "" : String(Number(value.toFixed(6))).replace("-", "−");
}

type Choice = { value: string; label: string };

export function ChoiceField({
  value,
  onChange,
  choices,
  ...common
}: Common & { value: string; onChange: (value: string) => void; choices: readonly Choice[] }) {
  const id = useId();
  return (
    <Frame id={id} {...common}>
      <select
        id={id}
        className={CONTROL}
        value={value}
        disabled={common.disabled}
        data-focus={common.focusKey}
        onChange={(event) => onChange(event.target.value)}
      >
        {choices.map((choice) => (
          <option key={choice.value} value={choice.value}>
            {choice.label}
          </option>
        ))}
      </select>
    </Frame>
  );
}

export function TickField({
  checked,
  onChange,
  label,
  disabled,
  focusKey,
}: {
  checked: boolean;
  onChange: (checked: boolean) => void;
  label: string;
  disabled?: boolean;
  focusKey?: string;
}) {
  return (
    <label className="flex min-h-11 items-center gap-3 text-base">
      <input
        type="checkbox"
        className="size-5 shrink-0 accent-spine"
        checked={checked}
        disabled={disabled}
        data-focus={focusKey}
        onChange={(event) => onChange(event.target.checked)}
      />
      {label}
    </label>
  );
}
