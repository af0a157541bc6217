"use client";
import { type ReactNode, useId, useState } from "react";
import { FigureInput } from "@/components/ui/input";
import { formatNumber, ownDecimals } from "@/lib/format/number";
import { unitLabel, withUnit } from "@/lib/format/unit";
import type { DebriefField } from "@/lib/testcards/debrief-types";
import { convert, sameDimension, type Unit } from "@/lib/testcards/units";
import { Problem } from "./controls";

const ON_GAUGES: Unit[] = [
  "degC",
  "degF",
  "psi",
  "bar",
  "kPa",
  "hPa",
  "inHg",
  "L",
  "USgal",
  "impgal",
  "kg",
  "lb",
  "kt",
  "km/h",
  "mph",
  "ft",
  "m",
  "rpm",
];

type FigureProps = {
  field: DebriefField;
  typed: string;
  error: string | undefined;
  onType: (text: string) => void;
  unit?: Unit | null; // other than the field's own: the gauge was changed
  onUnit?: (unit: Unit | null) => void;
  hideLabel?: boolean;
  units?: Unit[]; // to choose from, where not every unit of the kind makes sense
  mayChangeGauge?: boolean;
  beside?: ReactNode;
  under?: ReactNode;
};

/** One figure off one gauge. The button beside it says the gauge's unit; it changes what the gauge reads in, never the figure. */
export function FigureField({
  field,
  typed,
  error,
  onType,
  unit = null,
  onUnit,
  hideLabel = false,
  units,
  mayChangeGauge = false,
  beside,
  under,
}: FigureProps) {
  const id = useId();
  const [choosing, setChoosing] = useState(false);
  const own = field.unit;
  const shown = unit ?? own;
  const others = units ?? (own ? ON_GAUGES.filter((one) => sameDimension(one, own)) : []);
  return (
    <div>
      <div className="mb-1 flex items-baseline justify-between gap-3">
        <label htmlFor={id} className={hideLabel ? "sr-only" : "font-bold"}>
          {field.label}
        </label>
        {beside}
      </div>
      <div className="flex gap-2">
        <FigureInput
          id={id}
          value={typed}
          data-field={field.key}
          aria-invalid={error ? true : undefined}
          aria-describedby={error ? `${id}-error` : undefined}
          onChange={(event) => onType(event.target.value)}
        />
        {shown && shown !== "1" && field.kind !== "duration" ? (
          onUnit && others.length > 1 ? (
            <button
              type="button"
              onClick={() => setChoosing(!choosing)}
              aria-expanded={choosing}
              aria-label={`Read in ${unitLabel(shown)}; change the unit`}
              className="min-h-14 min-w-20 shrink-0 rounded-md border-2 border-ink bg-sheet px-3 font-bold"
            >
              {unitLabel(shown)}
            </button>
          ) : (
            <span className="flex min-h-14 min-w-20 shrink-0 items-center justify-center px-2 font-bold">{unitLabel(shown)}</span>
          )
        ) : null}
      </div>
      {choosing && own ? (
        <div className="mt-2 border border-rule p-3">
          <p className="mb-2">
            {mayChangeGauge
              ? "Was the gauge changed for one in another unit? The figure stays as you read it."
              : "Which unit did you read?"}
          </p>
          <div className="grid grid-cols-2 gap-2">
            {others.map((one) => (
              <button
                key={one}
                type="button"
                aria-pressed={one === shown}
                className="min-h-14 rounded-md border-2 border-ink bg-sheet aria-pressed:bg-ink aria-pressed:text-sheet"
                onClick={() => {
                  onUnit?.(one === own ? null : one);
                  setChoosing(false);
                }}
              >
                {unitLabel(one)}
              </button>
            ))}
          </div>
        </div>
      ) : null}
      {error ? <Problem id={`${id}-error`}>{error}</Problem> : null}
      {under}
    </div>
  );
}

/** "265 °F is 129.4 °C", small, never in place of what was typed. */
export function Converted({ value, from, to }: { value: number; from: Unit; to: Unit }) {
  if (from === to || !sameDimension(from, to)) return null;
  return (
    <p className="mt-1 text-ink-soft">
      {withUnit(formatNumber(value, ownDecimals(value)), from)} is {withUnit(formatNumber(convert(value, from, to), 1), to)}, on the gauge
    </p>
  );
}
