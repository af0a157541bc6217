import { fieldValue } from "@/components/debrief/field-value";
import { formatNumber, ownDecimals } from "@/lib/format/number";
import { formatStopwatch } from "@/lib/format/time";
import { withUnit } from "@/lib/format/unit";
import type { CardDocument } from "@/lib/testcards/card";
import { debriefModel } from "@/lib/testcards/debrief";
import type { Debrief, DebriefField } from "@/lib/testcards/debrief-types";

/** Every answer as it was given, in the order it was asked; what was left empty is not listed. */
export function RawDebrief({ debrief, documents }: { debrief: Debrief; documents: CardDocument[] }) {
  const [first] = documents;
  const flight = first ? debriefModel(first).filter(({ section }) => section !== "point") : [];
  return (
    <div className="flex flex-col gap-6">
      <RawList title="Flight and safety" fields={flight} debrief={debrief} />
      {documents.flatMap((document) =>
        document.content.points.map((point, index) => {
          const fields = debriefModel(document).filter((field) => field.point === point.id);
          return (
            <RawList
              key={point.id}
              title={`Card ${document.identity.number}, ${index + 1} ${point.title}`}
              fields={fields}
              debrief={debrief}
            />
          );
        }),
      )}
      {debrief.safety.calls.length > 0 ? (
        <div>
          <h3 className="font-bold">Calls</h3>
          <ul>
            {debrief.safety.calls.map((call, index) => (
              <li
                // biome-ignore lint/suspicious/noArrayIndexKey: locked, never reordered
                key={index}
              >{`${call.word}, for ${call.trigger || "no reason given"}${call.onGauge === null ? "" : `, ${call.onGauge} on the gauge`}${call.durationS === null ? "" : `, for ${formatStopwatch(call.durationS)}`}. ${call.action}`}</li>
            ))}
          </ul>
        </div>
      ) : null}
      {[debrief.safety.note, debrief.comment].filter(Boolean).map((text) => (
        <p key={text} className="whitespace-pre-wrap break-words">
          {text}
        </p>
      ))}
    </div>
  );
}

function RawList({ title, fields, debrief }: { title: string; fields: DebriefField[]; debrief: Debrief }) {
  const said = fields.flatMap((field) => {
    const words = wordsOf(field, debrief);
    return words === null ? [] : [{ field, words }];
  });
  if (said.length === 0) return null;
  return (
    <div>
      <h3 className="font-bold">{title}</h3>
      <dl className="grid grid-cols-1 gap-x-8 hand:grid-cols-2">
        {said.map(({ field, words }) => (
          <div key={field.key} className="flex justify-between gap-4 border-rule border-b py-1.5">
            <dt className="text-ink-soft">{field.label}</dt>
            <dd className="break-words text-end tabular-nums">{words}</dd>
          </div>
        ))}
      </dl>
    </div>
  );
}

function wordsOf(field: DebriefField, debrief: Debrief): string | null {
  const entry = debrief.points.find(({ point }) => point === field.point)?.readings.find(({ reading }) => reading === field.reading);
  const unit = entry?.unit ?? field.unit;
  if (field.kind === "series")
    return entry && entry.rows.length > 0
      ? withUnit(entry.rows.map(({ label, value }) => `${label}: ${formatNumber(value, ownDecimals(value))}`).join(", "), unit)
      : null;
  const value = fieldValue(debrief, field);
  if (value === null || value === "" || value === undefined) return null;
  if (typeof value === "boolean") return value ? "yes" : "no";
  if (typeof value === "string") return value;
  if (field.kind === "duration") return formatStopwatch(value);
  return withUnit(formatNumber(value, ownDecimals(value)), unit);
}
