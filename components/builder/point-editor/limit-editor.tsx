"use client";
import { buttonClass } from "@/components/ui/button";
import { formatNumber } from "@/lib/format/number";
import { unitLabel, withUnit } from "@/lib/format/unit";
import { instrumentOf, type PointLimit, parameterOf } from "@/lib/testcards/card";
import { ChoiceField, NumberField, TextField, TickField } from "../fields";
import { gaugeFromTrue, tidy, trueFromGauge, uncertaintyIn } from "../gauge-both-ways";
import { RemoveButton } from "./abort-editor";
import type { PointPartProps } from "./point-editor";

/** The card table and the point's own limits; each own limit true and on the gauge, either one to be typed. */
export function LimitEditor({ card, point, change, newId }: PointPartProps) {
  const numbers = point.readings.filter(({ kind }) => kind === "number" || kind === "count");
  const set = (limits: PointLimit[], what: string) => change({ limits }, what);
  return (
    <div className="flex flex-col gap-3">
      <TickField
        label="Judge against every programme limit that applies (card table)"
        checked={point.cardTable}
        onChange={(cardTable) => change({ cardTable }, "card table")}
        focusKey="limits"
      />
      {point.limits.map((limit) => (
        <OwnLimit
          key={limit.id}
          card={card}
          point={point}
          limit={limit}
          put={(patch) =>
            set(
              point.limits.map((one) => (one === limit ? { ...one, ...patch } : one)),
              `limit ${limit.id}`,
            )
          }
          remove={() =>
            set(
              point.limits.filter((one) => one !== limit),
              "limit removed",
            )
          }
        />
      ))}
      <button
        type="button"
        className={buttonClass("outline")}
        disabled={numbers.length === 0}
        onClick={() => {
          const reading = numbers[0];
          if (!reading) return;
          const unit = parameterOf(card, reading.parameter)?.unit ?? reading.unit ?? "1";
          set(
            [
              ...point.limits,
              {
                id: newId(),
                reading: reading.id,
                label: reading.label,
                side: "max",
                value: 0,
                unit,
                forS: 0,
                statistic: "instant",
                expandedUncertainty: null,
                source: "",
              },
            ],
            "limit added",
          );
        }}
      >
        Add a limit of this point
      </button>
    </div>
  );
}

type OwnProps = Pick<PointPartProps, "card" | "point"> & {
  limit: PointLimit;
  put: (patch: Partial<PointLimit>) => void;
  remove: () => void;
};

function OwnLimit({ card, point, limit, put, remove }: OwnProps) {
  const reading = point.readings.find(({ id }) => id === limit.reading);
  const instrument = instrumentOf(card, reading?.instrument ?? null);
  const calibrated = instrument?.calibration ? instrument : undefined;
  const onGauge = calibrated ? gaugeFromTrue(limit.value, limit.unit, calibrated) : null;
  const U = limit.expandedUncertainty ?? (calibrated ? uncertaintyIn(calibrated, limit.unit) : null);
  return (
    <fieldset className="border border-rule p-3">
      <legend className="px-1 font-bold text-base">{limit.label || "Limit"}</legend>
      <div className="grid grid-cols-2 gap-2">
        <ChoiceField
          label="Reading"
          value={limit.reading}
          onChange={(id) => {
            const next = point.readings.find((one) => one.id === id);
            if (next) put({ reading: id, label: next.label, unit: parameterOf(card, next.parameter)?.unit ?? next.unit ?? limit.unit });
          }}
          choices={point.readings
            .filter(({ kind }) => kind === "number" || kind === "count")
            .map(({ id, label }) => ({ value: id, label }))}
        />
        <ChoiceField
          label="Side"
          value={limit.side}
          onChange={(side) => put({ side: side === "min" ? "min" : "max" })}
          choices={[
            { value: "max", label: "at most" },
            { value: "min", label: "at least" },
          ]}
        />
        <NumberField
          label="True"
          value={limit.value}
          unit={unitLabel(limit.unit)}
          focusKey={`limits ${limit.id}`}
          onChange={(value) => value !== null && put({ value })}
        />
        {calibrated ? (
          <NumberField
            label="On the gauge"
            value={onGauge === null ? null : tidy(onGauge)}
            unit={unitLabel(calibrated.unit)}
            onChange={(reading2) => {
              const actual = reading2 === null ? null : trueFromGauge(reading2, calibrated, limit.unit);
              if (actual !== null) put({ value: tidy(actual) });
            }}
          />
        ) : null}
        <NumberField
          label="Own U (k = 2)"
          optional
          low={0}
          value={limit.expandedUncertainty}
          unit={unitLabel(limit.unit)}
          hint={limit.expandedUncertainty === null && U !== null ? `The gauge's: ${withUnit(formatNumber(U, 1), limit.unit)}` : undefined}
          onChange={(expandedUncertainty) => put({ expandedUncertainty })}
        />
        <NumberField label="For, s" low={0} high={3600} value={limit.forS} onChange={(forS) => forS !== null && put({ forS })} />
      </div>
      <div className="mt-2 flex items-end gap-2">
        <div className="flex-1">
          <TextField label="Source and revision" value={limit.source} maxLength={60} onChange={(source) => put({ source })} />
        </div>
        <RemoveButton label={`Remove the limit on ${limit.label}`} onClick={remove} />
      </div>
    </fieldset>
  );
}
