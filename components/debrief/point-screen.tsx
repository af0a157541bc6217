"use client";
import type { CardDocument, CardPoint, Reading } from "@/lib/testcards/card";
import type { CheckLine, FieldPart } from "@/lib/testcards/debrief-types";
import { OUTCOMES } from "@/lib/testcards/words";
import { Choices, Panel, Problem, Words, YES_NO } from "./controls";
import type { ScreenProps } from "./debrief-form";
import { fieldValue } from "./field-value";
import { FigureField } from "./figure-field";
import { ReadingField } from "./reading-field";

export type PointProps = ScreenProps & { card: CardDocument; point: CardPoint };

const OUTCOME_NAMES: Record<string, string> = { flown: "Flown", part: "Part", aborted: "Aborted", skipped: "Skipped" };
const POINT_FIGURES: Record<string, string> = { "ran for": "Held for, mm:ss", "top altitude": "Highest pressure altitude" };

/** One point, one screen: outcome first, then only what the card asked for, in its order. */
export function PointScreen(props: PointProps & { lines: CheckLine[]; place: string }) {
  const { point, place, lines, fields, draft, errors, type, change } = props;
  const own = fields.filter((field) => field.point === point.id);
  const outcome = own.find(({ part }) => part === "outcome");
  const said = draft.debrief.points.find((one) => one.point === point.id);
  const skipped = said?.outcome === "skipped";
  const byPilot = point.readings.filter(({ recordedBy }) => recordedBy === "pilot");
  const byOthers = point.readings.filter(({ recordedBy }) => recordedBy !== "pilot");
  const draw = (reading: Reading) => (
    <ReadingField
      key={reading.id}
      {...props}
      reading={reading}
      own={own.filter((field) => field.reading === reading.id)}
      lines={lines.filter((line) => line.reading === reading.id)}
      shares={sharedMoment(props, reading)}
    />
  );
  return (
    <div className="flex flex-col gap-5">
      <header>
        <p className="text-ink-soft">{place}</p>
        <h2 className="font-bold text-xl">{point.title}</h2>
      </header>
      {outcome ? (
        <div>
          <Choices
            label="Outcome"
            choices={OUTCOMES}
            names={OUTCOME_NAMES}
            value={said?.outcome ?? null}
            onChoose={(value) => type(outcome, value)}
          />
          {errors.get(outcome.key) ? <Problem>{errors.get(outcome.key)}</Problem> : null}
        </div>
      ) : null}
      {skipped ? null : (
        <>
          {own
            .filter(({ part }) => part === "position")
            .map((field) => (
              <Choices
                key={field.key}
                label={field.label}
                choices={field.choices}
                value={fieldValue(draft.debrief, field) as string | null}
                onChoose={(value) => type(field, value)}
              />
            ))}
          {own
            .filter(({ part }) => part === "on condition")
            .map((field) => (
              <Choices
                key={field.key}
                label="Flown on condition, inside the entry tolerances?"
                choices={["yes", "no"]}
                names={YES_NO}
                value={said?.onCondition === null || said === undefined ? null : said.onCondition ? "yes" : "no"}
                onChoose={(value) =>
                  change((now) => ({
                    ...now,
                    points: now.points.map((one) => (one.point === point.id ? { ...one, onCondition: value === "yes" } : one)),
                  }))
                }
              />
            ))}
          {own
            .filter(({ part }) => part === "ran for" || part === "top altitude")
            .map((field) => (
              <Panel key={field.key}>
                <FigureField
                  field={{ ...field, label: POINT_FIGURES[field.part] ?? field.label }}
                  typed={draft.typed[field.key] ?? ""}
                  error={errors.get(field.key)}
                  onType={(text) => type(field, text)}
                />
              </Panel>
            ))}
          {byPilot.map(draw)}
          {byOthers.length > 0 ? (
            <details className="border-rule border-y" open={byPilot.length === 0 || undefined}>
              <summary className="flex min-h-14 cursor-pointer items-center font-bold">
                From the recorder and the observer ({byOthers.length})
              </summary>
              <p className="pb-3 text-ink-soft">Enter what you have. What stays empty gets no verdict: no reading.</p>
              <div className="flex flex-col gap-5 pb-5">{byOthers.map(draw)}</div>
            </details>
          ) : null}
        </>
      )}
      {own
        .filter(({ part }) => part === "comment")
        .map((field) => (
          <Words
            key={field.key}
            label={skipped ? "Why it was skipped" : "Comment"}
            value={said?.comment ?? ""}
            onChange={(value) => type(field, value)}
          />
        ))}
    </div>
  );
}

const MOMENT_PARTS: FieldPart[] = ["at", "altitude", "oat"];

/** The first reading of the point that has a moment of its own: later ones may share it by one tick. */
function sharedMoment({ point, fields }: PointProps, reading: Reading): Reading | null {
  const first = point.readings.find(({ id }) => fields.some((field) => field.reading === id && MOMENT_PARTS.includes(field.part)));
  return first && first.id !== reading.id ? first : null;
}
