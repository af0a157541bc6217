"use client";
import { useState } from "react";
import { v7 as newId } from "uuid";
import { VerdictMark } from "@/components/gauge/verdict-mark";
import { RawDebrief } from "@/components/results/raw-debrief";
import type { CheckReport, Debrief, DebriefField } from "@/lib/testcards/debrief-types";
import { validateDebrief } from "@/lib/testcards/validate-debrief";
import { Choices, Panel, Problem, Words, YES_NO } from "./controls";
import type { ScreenProps } from "./debrief-form";
import { fieldValue } from "./field-value";

/** Anything seen that a mechanic should look at; a person decides how serious it is. */
export function SquawkScreen({ draft, change }: ScreenProps) {
  const { squawks, comment } = draft.debrief;
  const set = (next: typeof squawks) => change((now) => ({ ...now, squawks: next }));
  return (
    <div className="flex flex-col gap-5">
      <h2 className="font-bold text-xl">Squawks</h2>
      <p>Anything on the aircraft that was not as it should be. Nothing to write down? Go on.</p>
      {squawks.map((squawk) => {
        const put = (patch: Partial<typeof squawk>) => set(squawks.map((one) => (one.id === squawk.id ? { ...one, ...patch } : one)));
        return (
          <Panel key={squawk.id} className="flex flex-col gap-4">
            <label className="block">
              <span className="mb-1 block font-bold">System</span>
              <input
                className="h-14 w-full rounded-md border-2 border-ink bg-sheet px-4 text-ink"
                value={squawk.system}
                maxLength={60}
                onChange={(event) => put({ system: event.target.value })}
              />
            </label>
            <Words label="What was seen" value={squawk.text} onChange={(text) => put({ text })} />
            <Choices
              label="Would you fly it again as it is?"
              choices={["yes", "no"]}
              names={YES_NO}
              value={squawk.flyAgain === null ? null : squawk.flyAgain ? "yes" : "no"}
              onChoose={(value) => put({ flyAgain: value === "yes" })}
            />
            <button
              type="button"
              className="min-h-14 rounded-md border-2 border-ink bg-sheet"
              onClick={() => set(squawks.filter((one) => one.id !== squawk.id))}
            >
              Take this squawk off
            </button>
          </Panel>
        );
      })}
      <button
        type="button"
        className="min-h-14 rounded-md border-2 border-ink bg-sheet font-bold"
        onClick={() => set([...squawks, { id: newId(), system: "", text: "", flyAgain: null }])}
      >
        Write down a squawk
      </button>
      <Words
        label="Anything else"
        hint="For the whole sortie."
        value={comment}
        onChange={(next) => change((now) => ({ ...now, comment: next }))}
      />
    </div>
  );
}

type LookOverProps = ScreenProps & {
  reports: CheckReport[];
  screens: { title: string; keys: (key: string) => boolean }[];
  onSend: () => void;
  sending: boolean;
  problem: string | null;
};

/** Everything once more before it locks: what is missing, what is wrong, how each point stands. */
export function LookOverScreen({ pack, draft, fields, errors, reports, screens, go, onSend, sending, problem }: LookOverProps) {
  const [tried, setTried] = useState(false);
  const complete = pack.cards.flatMap(({ document }) => validateDebrief(document, draft.debrief, { complete: true }));
  const revisions = pack.cards
    .filter(({ document }) => !draft.debrief.revisionsFlown.some(({ card }) => card === document.identity.id))
    .map(({ document }) => ({
      key: `revisionsFlown.${document.identity.id}`,
      message: `Say which revision of card ${document.identity.number} was flown.`,
    }));
  const wrong = new Map([...revisions, ...complete].map(({ key, message }) => [key, message]));
  for (const [key, message] of errors) wrong.set(key, message);
  const empty = leftEmpty(fields, draft.debrief);
  const blank = draft.debrief.squawks.filter(({ text }) => text.trim() === "").length;
  return (
    <div className="flex flex-col gap-5">
      <h2 className="font-bold text-xl">Look over</h2>
      {wrong.size > 0 ? (
        <Panel>
          <h3 className="mb-2 font-bold">
            {wrong.size === 1 ? "One thing before it can be sent" : `${wrong.size} things before it can be sent`}
          </h3>
          <ul>
            {[...wrong].map(([key, message]) => {
              const screen = screens.findIndex(({ keys }) => keys(key));
              return (
                <li key={key} className="border-rule border-t first:border-t-0">
                  <button
                    type="button"
                    className="min-h-14 w-full py-2 text-left underline underline-offset-4"
                    onClick={() => go(Math.max(0, screen))}
                  >
                    {screens[screen]?.title ? `${screens[screen].title}: ` : ""}
                    {message}
                  </button>
                </li>
              );
            })}
          </ul>
        </Panel>
      ) : null}
      {reports.map((report) => {
        const document = pack.cards.find(({ document: one }) => one.identity.id === report.card.id)?.document;
        return (
          <Panel key={report.card.id}>
            <h3 className="font-bold">
              Card {report.card.number} rev {report.card.letter}
            </h3>
            <ul>
              {report.points.map((point, index) => (
                <li
                  key={point.point}
                  className="flex min-h-14 flex-wrap items-center justify-between gap-2 border-rule border-b py-2 last:border-b-0"
                >
                  <span>
                    {index + 1} {document?.content.points.find(({ id }) => id === point.point)?.title}
                    <span className="block text-ink-soft">{point.outcome ?? "no outcome yet"}</span>
                  </span>
                  {point.outcome && point.outcome !== "skipped" ? <VerdictMark verdict={point.worst} /> : null}
                </li>
              ))}
            </ul>
          </Panel>
        );
      })}
      {blank > 0 ? (
        <p>{blank === 1 ? "One squawk says nothing" : `${blank} squawks say nothing`} yet: write down what was seen, or take it off.</p>
      ) : null}
      {empty.length > 0 ? (
        <p>
          <span className="font-bold">Left empty:</span> {empty.join(", ")}. It can be sent so; a reading that is missing gets no verdict:
          no reading.
        </p>
      ) : null}
      <details className="border-rule border-y">
        <summary className="flex min-h-14 cursor-pointer items-center font-bold">Everything you typed</summary>
        <div className="pb-4">
          <RawDebrief debrief={draft.debrief} documents={pack.cards.map(({ document }) => document)} />
        </div>
      </details>
      <p className="text-ink-soft">
        The readings lock when they are sent. A correction is made later by the engineer, beside them and with a reason.
      </p>
      {problem ? <Problem>{problem}</Problem> : null}
      {tried && wrong.size > 0 ? <Problem>Mend what stands above first. Everything you typed is kept.</Problem> : null}
      <button
        type="button"
        disabled={sending}
        onClick={() => {
          setTried(true);
          if (wrong.size === 0) onSend();
        }}
        className="min-h-14 rounded-md border-2 border-ink bg-spine font-bold text-spine-ink text-lg"
      >
        {sending ? "Sending …" : "Send the debrief"}
      </button>
    </div>
  );
}

/** What was asked and left empty, by name. */
function leftEmpty(fields: DebriefField[], debrief: Debrief): string[] {
  const skipped = new Set(debrief.points.filter(({ outcome }) => outcome === "skipped").map(({ point }) => point));
  const named = fields.flatMap((field) => {
    if (field.point && skipped.has(field.point)) return [];
    const asked =
      field.part === "time" || field.part === "fuel" || field.part === "weather" || (field.reading !== null && ASKED.has(field.part));
    if (!asked || field.key === "fuel.uplift") return [];
    const rows = debrief.points.find(({ point }) => point === field.point)?.readings.find(({ reading }) => reading === field.reading)?.rows;
    const empty = field.kind === "series" ? (rows ?? []).length === 0 : fieldValue(debrief, field) === null;
    return empty ? [field.label] : [];
  });
  return [...new Set(named)];
}

const ASKED = new Set<DebriefField["part"]>(["value", "lowest", "highest", "rows", "answer"]);
