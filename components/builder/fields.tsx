"use client";
import { type ReactNode, useEffect, useId, useState } from "react";
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

/** Keeps what was typed while it is no number, says so, and passes on only numbers in range. */
export function NumberField({ value, onChange, unit, optional = false, low, high, ...common }: NumberProps) {
  const id = useId();
  const [typed, setTyped] = useState(shown(value));
  useEffect(() => setTyped((now) => (readNumber(now) === value ? now : shown(value))), [value]);
  const number = readNumber(typed);
  const problem =
    typed.trim() === ""
      ? optional
        ? null
        : "Enter a number."
      : number === null
        ? "Enter a number, such as 102.5."
        : low !== undefined && number < low
          ? `Enter ${low} or more.`
          : high !== undefined && number > high
            ? `Enter ${high} or less.`
            : null;
  const [left, setLeft] = useState(false);
  return (
    <Frame id={id} {...common} error={common.error ?? (left ? problem : null)}>
      <div className="flex items-center gap-2">
        <input
          id={id}
          inputMode="decimal"
          autoComplete="off"
          className={`${CONTROL} tabular-nums`}
          value={typed}
          disabled={common.disabled}
          data-focus={common.focusKey}
          aria-invalid={left && problem ? true : undefined}
          aria-describedby={left && problem ? `${id}-error` : undefined}
          onBlur={() => setLeft(true)}
          onChange={(event) => {
            const next = event.target.value;
            setTyped(next);
            const read = readNumber(next);
            if (next.trim() === "" && optional) onChange(null);
            else if (read !== null && !(low !== undefined && read < low) && !(high !== undefined && read > high)) onChange(read);
          }}
        />
        {unit ? <span className="shrink-0 text-sm text-ink-soft">{unit}</span> : null}
      </div>
    </Frame>
  );
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
