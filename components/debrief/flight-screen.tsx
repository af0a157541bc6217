"use client";
import { useId } from "react";
import type { DebriefField } from "@/lib/testcards/debrief-types";
import { minutesBetween } from "@/lib/testcards/validate-debrief";
import { DEBRIEF_CAUTION } from "@/lib/testcards/words";
import { Choices, Panel, Problem, Words } from "./controls";
import type { ScreenProps } from "./debrief-form";
import { fieldValue, parseClock } from "./field-value";
import { FigureField } from "./figure-field";

/** Screen one: which sheet was on the knee, the times, the fuel and the air. */
export function FlightScreen(props: ScreenProps) {
  const { pack, draft, fields, errors, change, type } = props;
  const of = (part: DebriefField["part"]) => fields.filter((field) => field.part === part);
  const { debrief } = draft;
  return (
    <div className="flex flex-col gap-5">
      <p className="border-2 border-ink bg-sheet p-4 font-bold text-lg" data-testid="caution">
        {DEBRIEF_CAUTION}
      </p>
      {of("revision").map((field) => {
        const card = pack.cards.find(({ document }) => document.identity.id === field.key.slice("revisionsFlown.".length));
        const letter = card?.document.identity.letter ?? "";
        const flown = debrief.revisionsFlown.find(({ card: id }) => id === card?.document.identity.id);
        return (
          <Panel key={field.key}>
            <p className="text-ink-soft">
              Card {card?.document.identity.number}, {card?.document.content.title}
            </p>
            <p className="py-1 font-bold text-2xl">REV {letter}</p>
            <Choices
              label="Is this what stood on the sheet on your knee?"
              choices={field.choices}
              names={{ [letter]: `Yes, rev ${letter}`, other: "No, another" }}
              value={flown?.letter ?? null}
              onChoose={(value) => type(field, value)}
            />
            {flown?.letter === "other" ? (
              <div className="mt-3">
                <p className="mb-2 font-bold">
                  Say so to the engineer before anything else. Everything you enter is kept, and judged on rev {letter}.
                </p>
                <Words
                  label="What stood on the sheet?"
                  rows={2}
                  value={flown.note}
                  onChange={(note) =>
                    change((now) => ({
                      ...now,
                      revisionsFlown: now.revisionsFlown.map((one) => (one.card === flown.card ? { ...one, note } : one)),
                    }))
                  }
                />
              </div>
            ) : null}
          </Panel>
        );
      })}
      <Panel>
        <h3 className="mb-3 font-bold">Times, UTC</h3>
        <div className="flex flex-col gap-4">
          {of("time").map((field) => (
            <ClockField
              key={field.key}
              field={field}
              typed={draft.typed[field.key] ?? ""}
              error={errors.get(field.key)}
              onType={(text) => type(field, text)}
            />
          ))}
        </div>
        {of("time").some(({ key }) => errors.has(key)) ? null : <Running {...props} />}
      </Panel>
      <Panel className="flex flex-col gap-4">
        <h3 className="font-bold">Fuel</h3>
        {of("fuel").map((field) => {
          const which = field.key.slice("fuel.".length) as "start" | "end" | "uplift";
          const unit = debrief.fuel[which]?.unit ?? null;
          return (
            <FigureField
              key={field.key}
              field={field}
              typed={draft.typed[field.key] ?? ""}
              error={errors.get(field.key)}
              unit={unit}
              units={["L", "USgal", "impgal", "kg"]}
              onUnit={(next) => type(field, draft.typed[field.key] ?? "", next)}
              onType={(text) => type(field, text, unit)}
            />
          );
        })}
      </Panel>
      <Panel className="flex flex-col gap-4">
        <h3 className="font-bold">Air, at the strip</h3>
        {of("weather").map((field) => {
          if (field.kind === "choice")
            return (
              <Choices
                key={field.key}
                label={field.label}
                choices={field.choices}
                value={fieldValue(debrief, field) as string | null}
                onChoose={(value) => type(field, value)}
              />
            );
          const quantity = field.key === "weather.oat" ? debrief.weather.oat : field.key === "weather.qnh" ? debrief.weather.qnh : null;
          const changeable = field.key === "weather.qnh";
          return (
            <FigureField
              key={field.key}
              field={field}
              typed={draft.typed[field.key] ?? ""}
              error={errors.get(field.key)}
              unit={quantity?.unit ?? null}
              {...(changeable
                ? { units: ["hPa" as const, "inHg" as const], onUnit: (next) => type(field, draft.typed[field.key] ?? "", next) }
                : {})}
              onType={(text) => type(field, text, quantity?.unit ?? null)}
            />
          );
        })}
      </Panel>
    </div>
  );
}

function ClockField({
  field,
  typed,
  error,
  onType,
}: {
  field: DebriefField;
  typed: string;
  error: string | undefined;
  onType: (text: string) => void;
}) {
  const id = useId();
  const now = () => new Date().toISOString().slice(11, 16);
  const utc = parseClock(typed);
  return (
    <div>
      <label htmlFor={id} className="mb-1 block">
        {field.label}
      </label>
      <div className="flex gap-2">
        <input
          id={id}
          data-field={field.key}
          inputMode="numeric"
          autoComplete="off"
          placeholder="hh:mm"
          value={typed}
          onChange={(event) => onType(event.target.value)}
          aria-invalid={error ? true : undefined}
          className="h-14 w-full rounded-md border-2 border-ink bg-sheet px-4 font-bold text-figure text-ink tabular-nums placeholder:font-normal placeholder:text-ink-soft aria-invalid:border-arc-red"
        />
        <button
          type="button"
          onClick={() => onType(now())}
          className="min-h-14 shrink-0 rounded-md border-2 border-ink bg-sheet px-4 font-bold"
          aria-label={`${field.label}: now`}
        >
          Now
        </button>
      </div>
      {utc ? <p className="mt-1 text-ink-soft">{localOf(utc)} local</p> : null}
      {error ? <Problem>{error}</Problem> : null}
    </div>
  );
}

function localOf(utc: string): string {
  const [hours, minutes] = utc.split(":").map(Number);
  const day = new Date();
  day.setUTCHours(hours ?? 0, minutes ?? 0);
  return `${String(day.getHours()).padStart(2, "0")}:${String(day.getMinutes()).padStart(2, "0")}`;
}

function Running({ draft }: ScreenProps) {
  const { times } = draft.debrief;
  const spans: [string, number | null][] = [
    ["Block", minutesBetween(times.offBlocks, times.onBlocks)],
    ["Airborne", minutesBetween(times.takeOff, times.landing)],
    ["Running", minutesBetween(times.engineStart, times.engineStop)],
    ["Taken", minutesBetween(times.start, times.end)],
  ];
  const known = spans.filter((span): span is [string, number] => span[1] !== null);
  if (known.length === 0) return null;
  return <p className="mt-4 border-rule border-t pt-3">{known.map(([name, minutes]) => `${name} ${minutes} min`).join(" · ")}</p>;
}
