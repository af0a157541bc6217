"use client";
import { useId } from "react";
import { formatNumber, ownDecimals } from "@/lib/format/number";
import { unitLabel } from "@/lib/format/unit";
import { instrumentOf, parameterOf, type Reading } from "@/lib/testcards/card";
import { askAsRead } from "@/lib/testcards/debrief";
import { emptyEntry } from "@/lib/testcards/debrief-blank";
import type { CheckLine, DebriefField, ReadingEntry } from "@/lib/testcards/debrief-types";
import { Choices, Panel, Problem, Words, YES_NO } from "./controls";
import { fieldValue, parseFigure, withEntry } from "./field-value";
import { Converted, FigureField } from "./figure-field";
import type { PointProps } from "./point-screen";
import { ReadingMark, ReadingVerdict } from "./reading-verdict";

type ReadingProps = PointProps & { reading: Reading; own: DebriefField[]; lines: CheckLine[]; shares: Reading | null };

/** One reading as the card asked for it: figure, unit of the gauge, expected band, moment, verdict. */
export function ReadingField(props: ReadingProps) {
  const { card, point, reading, own, draft, errors, change, type, shares } = props;
  const refused = own.some(({ key }) => errors.has(key)); // a refused figure has no verdict
  const lines = refused ? [] : props.lines;
  const instrument = instrumentOf(card, reading.instrument);
  const parameter = parameterOf(card, reading.parameter);
  const entry =
    draft.debrief.points.find((one) => one.point === point.id)?.readings.find((one) => one.reading === reading.id) ?? emptyEntry(reading);
  const put = (patch: Partial<ReadingEntry>) => change((now) => withEntry(now, point.id, reading.id, patch));
  const figures = own.filter(({ part }) => part === "value" || part === "highest" || part === "lowest");
  const rows = own.find(({ part }) => part === "rows");
  const answer = own.find(({ part }) => part === "answer");
  const moment = own.filter(({ part }) => part === "at" || part === "altitude" || part === "oat");
  if (answer) return <Answer {...props} field={answer} />;
  return (
    <Panel label={reading.label}>
      <div className="mb-2 flex flex-wrap items-start justify-between gap-2">
        <div>
          <h3 className="font-bold">{reading.label}</h3>
          <p className="text-ink-soft">
            {instrument ? `${instrument.gaugeName} on the ${instrument.shownOn}` : "By hand"}
            {expectedWords(figures[0] ?? rows)}
          </p>
        </div>
        <ReadingMark lines={lines} />
      </div>
      {figures.map((field) => {
        const value = fieldValue(draft.debrief, field);
        const error = errors.get(field.key);
        return (
          <div key={field.key} className="mb-2">
            <FigureField
              field={{ ...field, label: figures.length > 1 ? (field.part === "lowest" ? "Lowest" : "Highest") : field.label }}
              hideLabel={figures.length === 1}
              typed={draft.typed[field.key] ?? ""}
              error={error}
              unit={entry.unit}
              mayChangeGauge
              onUnit={(unit) => put({ unit })}
              onType={(text) => type(field, text)}
              under={
                typeof value === "number" && entry.unit === null && instrument && parameter && !error ? (
                  <Converted value={value} from={instrument.unit} to={parameter.unit} />
                ) : null
              }
            />
            {typeof value === "number" && !error && askAsRead(field, value) && !entry.asRead ? (
              <div className="mt-2 border-2 border-ink p-3">
                <p className="mb-2">Outside what was expected. As read?</p>
                <button
                  type="button"
                  className="min-h-14 w-full rounded-md border-2 border-ink bg-sheet font-bold"
                  onClick={() => put({ asRead: true })}
                >
                  Yes, {formatNumber(value, ownDecimals(value))} as read
                </button>
              </div>
            ) : null}
          </div>
        );
      })}
      {rows ? <Rows {...props} field={rows} entry={entry} put={put} /> : null}
      {moment.length > 0 && (entry.rows.length > 0 || figures.some((field) => typeof fieldValue(draft.debrief, field) === "number")) ? (
        <Moment {...props} fields={moment} entry={entry} put={put} shares={shares} />
      ) : null}
      <ReadingVerdict lines={lines} parameter={parameter} instrument={instrument} />
    </Panel>
  );
}

function expectedWords(field: DebriefField | undefined): string {
  const { low = null, high = null } = field?.expected ?? {};
  const unit = field?.unit ? `\u202f${unitLabel(field.unit)}` : "";
  if (low !== null && high !== null) return `, expected ${low} to ${high}${unit}`;
  if (high !== null) return `, expected at most ${high}${unit}`;
  return low === null ? "" : `, expected at least ${low}${unit}`;
}

type EntryProps = ReadingProps & { entry: ReadingEntry; put: (patch: Partial<ReadingEntry>) => void };

/** When and where the highest stood: the hot-day rule needs the air of that moment. Rows have their own times. */
function Moment({ fields, entry, put, shares, draft, errors, type }: EntryProps & { fields: DebriefField[] }) {
  const id = useId();
  return (
    <div className="mt-3 border-rule border-t pt-3">
      {shares ? (
        <label htmlFor={id} className="flex min-h-14 items-center gap-3">
          <input
            id={id}
            type="checkbox"
            className="size-7 accent-spine"
            checked={entry.sameMomentAs !== null}
            onChange={(event) => put({ sameMomentAs: event.target.checked ? shares.id : null })}
          />
          Same moment as {shares.label.toLowerCase()}
        </label>
      ) : null}
      {entry.sameMomentAs === null ? (
        <div className="flex flex-col gap-3">
          {fields.map((field) => (
            <FigureField
              key={field.key}
              field={{ ...field, label: momentLabel(field, fields) }}
              typed={draft.typed[field.key] ?? ""}
              error={errors.get(field.key)}
              onType={(text) => type(field, text)}
            />
          ))}
        </div>
      ) : null}
    </div>
  );
}

const MOMENTS: Record<string, string> = {
  at: "When it was first there, mm:ss into the point",
  altitude: "Pressure altitude then",
  oat: "Outside air then",
};

/** "Then" wants a moment named before it; of rows it is where they are highest. */
function momentLabel({ part, label }: DebriefField, asked: DebriefField[]): string {
  const name = MOMENTS[part] ?? label;
  return asked.some((field) => field.part === "at") ? name : name.replace(/ then$/, " at the highest");
}

/** Rows as on the paper. What was not written is left empty; "same" repeats the row above. */
function Rows({ field, entry, put, draft, keepTyped, errors }: EntryProps & { field: DebriefField }) {
  const rowKey = (label: string) => `${field.key}#${label}`;
  const filled = entry.rows.length;
  const set = (label: string, atS: number | null, text: string) => {
    keepTyped(rowKey(label), text);
    const value = parseFigure(text);
    const others = entry.rows.filter((row) => row.label !== label);
    const next = value === null ? others : [...others, { label, atS, value }];
    put({ rows: field.rows.flatMap((planned) => next.find((row) => row.label === planned.label) ?? []), asRead: false });
  };
  return (
    <details open={filled > 0 || undefined}>
      <summary className="flex min-h-14 cursor-pointer items-center justify-between gap-2 font-bold">
        Rows as written, {unitLabel(field.unit ?? "1")}
        <span className="font-normal text-ink-soft">
          {filled} of {field.rows.length}
        </span>
      </summary>
      <ul>
        {field.rows.map(({ label, atS }, index) => {
          const before = field.rows.slice(0, index).findLast((row) => draft.typed[rowKey(row.label)]);
          const typed = draft.typed[rowKey(label)] ?? "";
          return (
            <li key={label} className="flex items-center gap-2 py-1">
              <label htmlFor={rowKey(label)} className="w-14 shrink-0 font-bold">
                {label}
              </label>
              <input
                id={rowKey(label)}
                inputMode="decimal"
                autoComplete="off"
                className="h-14 w-full rounded-md border-2 border-ink bg-sheet px-4 font-bold text-figure text-ink"
                value={typed}
                aria-invalid={typed !== "" && parseFigure(typed) === null ? true : undefined}
                onChange={(event) => set(label, atS, event.target.value)}
              />
              <button
                type="button"
                className="min-h-14 min-w-20 shrink-0 rounded-md border-2 border-ink bg-sheet disabled:border-rule disabled:text-ink-soft"
                disabled={!before}
                aria-label={`Row ${label}: same as above`}
                onClick={() => before && set(label, atS, draft.typed[rowKey(before.label)] ?? "")}
              >
                same
              </button>
            </li>
          );
        })}
      </ul>
      {errors.get(field.key) ? <Problem>{errors.get(field.key)}</Problem> : null}
    </details>
  );
}

function Answer({ field, draft, errors, type }: ReadingProps & { field: DebriefField }) {
  const value = (fieldValue(draft.debrief, field) as string | null) ?? null;
  return (
    <Panel>
      {field.kind === "photo" ? (
        <p>
          <span className="font-bold">{field.label}.</span> Take the picture with this phone’s camera and keep it with the flown sheet;
          write here what it shows.
        </p>
      ) : null}
      {field.choices.length > 0 ? (
        <Choices label={field.label} choices={field.choices} names={YES_NO} value={value} onChoose={(next) => type(field, next)} />
      ) : (
        <Words
          label={field.kind === "photo" ? "What the picture shows" : field.label}
          rows={2}
          value={value ?? ""}
          onChange={(next) => type(field, next)}
        />
      )}
      {errors.get(field.key) ? <Problem>{errors.get(field.key)}</Problem> : null}
    </Panel>
  );
}
