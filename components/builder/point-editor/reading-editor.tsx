"use client";
import { ArrowDown, ArrowUp, Plus } from "lucide-react";
import { buttonClass } from "@/components/ui/button";
import { unitLabel } from "@/lib/format/unit";
import type { Reading } from "@/lib/testcards/card";
import { READING_KINDS, type ReadingKind, SAMPLINGS, type Sampling } from "@/lib/testcards/words";
import { ChoiceField, NumberField, TextField } from "../fields";
import { RemoveButton } from "./abort-editor";
import type { PointPartProps } from "./point-editor";

const BY = [
  { value: "pilot", label: "Pilot, by hand" },
  { value: "recorder", label: "Recorder" },
  { value: "observer", label: "Observer" },
] as const;

/** What a reading does not say until somebody writes it. */
const UNSAID = {
  conditions: [],
  expected: null,
  expectedOrigin: null,
  expectedRatePerMin: null,
  choices: [],
  low: null,
  high: null,
} satisfies Partial<Reading>;

/** What is read, on which gauge, by whom, and what is expected. The unit is always the gauge's own. */
export function ReadingEditor(props: PointPartProps) {
  const { card, point, change, newId } = props;
  const { readings } = point;
  const set = (next: Reading[], what: string) => change({ readings: next }, what);
  const move = (index: number, by: number) => {
    const next = [...readings];
    const [one] = next.splice(index, 1);
    if (one) next.splice(index + by, 0, one);
    set(next, "readings moved");
  };
  const add = (instrumentId: string) => {
    const instrument = card.programme.instruments.find(({ id }) => id === instrumentId);
    const parameter = card.programme.parameters.find(({ code }) => code === instrument?.parameter);
    if (instrument && parameter)
      set(
        [
          ...readings,
          {
            id: newId(),
            parameter: parameter.code,
            label: parameter.name,
            cellHead: instrument.gaugeName.slice(0, 8),
            kind: "number",
            instrument: instrument.id,
            unit: instrument.unit,
            recordedBy: instrument.visibleTo.includes("pilot") ? "pilot" : "observer",
            onSheet: point.grid ? "grid" : "single",
            sampling: "highest",
            ...UNSAID,
          },
        ],
        "reading added",
      );
  };
  return (
    <div className="flex flex-col gap-3">
      {readings.map((reading, index) => (
        <details key={reading.id} className="border border-rule" data-item={reading.id}>
          <summary className="flex min-h-11 cursor-pointer items-center gap-2 px-3 py-2">
            <span className="flex-1 font-bold">{reading.label}</span>
            <span className="text-ink-soft text-sm">
              {reading.unit ? unitLabel(reading.unit) : reading.kind}, {reading.recordedBy}
            </span>
          </summary>
          <div className="flex flex-col gap-3 border-rule border-t p-3">
            <OneReading
              {...props}
              reading={reading}
              put={(patch) =>
                set(
                  readings.map((one) => (one === reading ? { ...one, ...patch } : one)),
                  `reading ${reading.id} ${Object.keys(patch).join(" ")}`,
                )
              }
            />
            <div className="flex justify-end gap-1">
              <button
                type="button"
                className={buttonClass("quiet")}
                disabled={index === 0}
                onClick={() => move(index, -1)}
                aria-label={`Move ${reading.label} up`}
              >
                <ArrowUp aria-hidden className="size-5" />
              </button>
              <button
                type="button"
                className={buttonClass("quiet")}
                disabled={index === readings.length - 1}
                onClick={() => move(index, 1)}
                aria-label={`Move ${reading.label} down`}
              >
                <ArrowDown aria-hidden className="size-5" />
              </button>
              <RemoveButton
                label={`Remove ${reading.label}`}
                onClick={() =>
                  change(
                    {
                      readings: readings.filter((one) => one !== reading),
                      limits: point.limits.filter((limit) => limit.reading !== reading.id),
                    },
                    "reading removed",
                  )
                }
              />
            </div>
          </div>
        </details>
      ))}
      <ChoiceField
        label="Add a reading"
        hideLabel
        value=""
        onChange={add}
        choices={[
          { value: "", label: "Add a reading from …" },
          ...card.programme.instruments.map((one) => ({ value: one.id, label: `${one.gaugeName} (${one.name}, ${unitLabel(one.unit)})` })),
        ]}
      />
      <button
        type="button"
        className={buttonClass("outline")}
        onClick={() =>
          set(
            [
              ...readings,
              {
                id: newId(),
                parameter: null,
                label: "Question",
                cellHead: "",
                kind: "yes-no",
                instrument: null,
                unit: null,
                recordedBy: "pilot",
                onSheet: "single",
                sampling: "single",
                ...UNSAID,
              },
            ],
            "question added",
          )
        }
      >
        <Plus aria-hidden className="size-4" /> Yes-no, choice or remark
      </button>
    </div>
  );
}

function OneReading({ card, point, reading, put }: PointPartProps & { reading: Reading; put: (patch: Partial<Reading>) => void }) {
  const parameter = card.programme.parameters.find(({ code }) => code === reading.parameter);
  const gauges = card.programme.instruments.filter((one) => one.parameter === reading.parameter);
  const judged = reading.kind === "number" || reading.kind === "count";
  const band = reading.expected ?? (parameter ? { low: null, high: null, unit: parameter.unit } : null);
  const expect = (low: number | null, high: number | null) =>
    parameter &&
    put({
      expected: low === null && high === null ? null : { low, high, unit: parameter.unit },
      expectedOrigin: reading.expectedOrigin ?? "engineer",
    });
  return (
    <>
      <div className="grid grid-cols-[1fr_8rem] gap-2">
        <TextField
          label="Asked as"
          value={reading.label}
          maxLength={60}
          onChange={(label) => put({ label })}
          focusKey={`readings ${reading.id}`}
        />
        <TextField label="In the grid" value={reading.cellHead} maxLength={8} onChange={(cellHead) => put({ cellHead })} />
      </div>
      <div className="grid grid-cols-2 gap-2">
        {gauges.length > 0 ? (
          <ChoiceField
            label="Gauge"
            value={reading.instrument ?? ""}
            onChange={(id) => {
              const gauge = gauges.find((one) => one.id === id);
              if (gauge) put({ instrument: gauge.id, unit: gauge.unit });
            }}
            choices={gauges.map((one) => ({ value: one.id, label: `${one.name}, ${unitLabel(one.unit)}` }))}
          />
        ) : (
          <ChoiceField
            label="Kind"
            value={reading.kind}
            onChange={(kind) => put({ kind: kind as ReadingKind })}
            choices={READING_KINDS.map((kind) => ({ value: kind, label: kind }))}
          />
        )}
        <ChoiceField
          label="Written by"
          value={reading.recordedBy}
          onChange={(by) =>
            put({ recordedBy: by as Reading["recordedBy"], onSheet: by === "pilot" ? (point.grid ? "grid" : "single") : "none" })
          }
          choices={BY}
        />
        {judged ? (
          <ChoiceField
            label="Debrief asks"
            value={reading.sampling}
            onChange={(sampling) => put({ sampling: sampling as Sampling })}
            choices={SAMPLINGS.map((one) => ({ value: one, label: one }))}
          />
        ) : null}
        <ChoiceField
          label="On the sheet"
          value={reading.onSheet}
          onChange={(onSheet) => put({ onSheet: onSheet as Reading["onSheet"] })}
          choices={[
            ...(point.grid ? [{ value: "grid", label: "In the grid" }] : []),
            { value: "single", label: "One cell" },
            { value: "none", label: "Not on it" },
          ]}
        />
      </div>
      {reading.kind === "choice" ? (
        <TextField
          label="Choices, comma between"
          value={reading.choices.join(", ")}
          onChange={(text) =>
            put({
              choices: text
                .split(",")
                .map((one) => one.trim())
                .filter(Boolean),
            })
          }
        />
      ) : null}
      {judged && parameter && band ? (
        <div className="grid grid-cols-2 gap-2">
          <NumberField
            label="Expected from, true"
            optional
            value={band.low}
            unit={unitLabel(parameter.unit)}
            onChange={(low) => expect(low, band.high)}
          />
          <NumberField
            label="Expected to, true"
            optional
            value={band.high}
            unit={unitLabel(parameter.unit)}
            onChange={(high) => expect(band.low, high)}
          />
          <NumberField
            label="Own rate a minute"
            optional
            low={0}
            value={reading.expectedRatePerMin?.value ?? null}
            unit={unitLabel(parameter.unit)}
            onChange={(value) => put({ expectedRatePerMin: value === null ? null : { value, unit: parameter.unit } })}
          />
        </div>
      ) : null}
    </>
  );
}
