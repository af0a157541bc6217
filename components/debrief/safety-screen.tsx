"use client";
import { abortsOf } from "@/lib/testcards/card";
import type { AbortCall } from "@/lib/testcards/debrief-types";
import { CALL_WORDS, type CallWord } from "@/lib/testcards/words";
import { Choices, Panel, Problem, Words, YES_NO } from "./controls";
import type { ScreenProps } from "./debrief-form";
import { parseFigure, parseStopwatch } from "./field-value";

const asAnswer = (value: boolean | null) => (value === null ? null : value ? "yes" : "no");

/** Screen two: three large questions. A call is written down as it was; nobody is asked to defend it. */
export function SafetyScreen(props: ScreenProps) {
  const { draft, fields, errors, change } = props;
  const { safety } = draft.debrief;
  const yes = safety.limitExceeded || safety.rough || safety.callMade;
  return (
    <div className="flex flex-col gap-5">
      {fields
        .filter(({ section }) => section === "safety")
        .map((field) => {
          const key = field.key.slice("safety.".length) as "limitExceeded" | "callMade" | "rough";
          return (
            <Panel key={field.key}>
              <Choices
                label={field.label}
                choices={["yes", "no"]}
                names={YES_NO}
                value={asAnswer(safety[key])}
                onChoose={(value) =>
                  change((now) => ({
                    ...now,
                    safety: {
                      ...now.safety,
                      [key]: value === "yes",
                      ...(key === "callMade"
                        ? { calls: value === "yes" ? (now.safety.calls.length > 0 ? now.safety.calls : [newCall(props)]) : [] }
                        : {}),
                    },
                  }))
                }
              />
              {errors.get(field.key) ? <Problem>{errors.get(field.key)}</Problem> : null}
              {key === "callMade" && safety.callMade ? <Calls {...props} /> : null}
            </Panel>
          );
        })}
      {yes ? (
        <Panel>
          <Words
            label="What happened"
            hint="What was seen, how long, what was done."
            value={safety.note}
            onChange={(note) => change((now) => ({ ...now, safety: { ...now.safety, note } }))}
          />
        </Panel>
      ) : null}
    </div>
  );
}

function newCall({ pack }: ScreenProps): AbortCall {
  const points = pack.cards.flatMap(({ document }) => document.content.points);
  return {
    point: points.length === 1 ? (points[0]?.id ?? "") : "",
    word: null,
    trigger: "",
    onGauge: null,
    durationS: null,
    action: "",
    recovered: null,
  };
}

function Calls(props: ScreenProps) {
  const { draft, change } = props;
  const { calls } = draft.debrief.safety;
  const set = (next: AbortCall[]) => change((now) => ({ ...now, safety: { ...now.safety, calls: next } }));
  return (
    <div className="mt-4 flex flex-col gap-6 border-rule border-t pt-4">
      {calls.map((call, index) => (
        <OneCall
          // biome-ignore lint/suspicious/noArrayIndexKey: calls are known by their order
          key={index}
          {...props}
          call={call}
          index={index}
          put={(patch) => set(calls.map((one, at) => (at === index ? { ...one, ...patch } : one)))}
        />
      ))}
      <button type="button" className="min-h-14 rounded-md border-2 border-ink bg-sheet" onClick={() => set([...calls, newCall(props)])}>
        Another call
      </button>
    </div>
  );
}

const SELECT = "min-h-14 w-full rounded-md border-2 border-ink bg-sheet px-3 text-ink";

function OneCall({
  pack,
  draft,
  keepTyped,
  call,
  index,
  put,
}: ScreenProps & { call: AbortCall; index: number; put: (patch: Partial<AbortCall>) => void }) {
  const cards = pack.cards.map(({ document }) => document);
  const card = cards.find(({ content }) => content.points.some(({ id }) => id === call.point));
  const point = card?.content.points.find(({ id }) => id === call.point);
  const numbers = card && point ? abortsOf(card.programme, point).flatMap((line) => (line.kind === "number" ? [line] : [])) : [];
  const known = [...new Set(numbers.map(({ parameter }) => parameter))];
  const line = numbers.find(({ parameter }) => parameter === call.trigger);
  const unit = card?.programme.instruments.find(({ id }) => id === line?.instrument)?.unit ?? "";
  const typedKey = (what: string) => `calls.${index}.${what}`;
  const figure = (label: string, what: "onGauge" | "durationS", parse: (text: string) => number | null) => (
    <label className="block">
      <span className="mb-1 block">{label}</span>
      <input
        inputMode="decimal"
        className="h-14 w-full rounded-md border-2 border-ink bg-sheet px-4 font-bold text-figure"
        value={draft.typed[typedKey(what)] ?? call[what] ?? ""}
        onChange={(event) => {
          keepTyped(typedKey(what), event.target.value);
          put({ [what]: parse(event.target.value) });
        }}
      />
    </label>
  );
  return (
    <div className="flex flex-col gap-4">
      <label className="block">
        <span className="mb-1 block">In which point</span>
        <select className={SELECT} value={call.point} onChange={(event) => put({ point: event.target.value })}>
          <option value="">choose the point</option>
          {cards.flatMap(({ content, identity }) =>
            content.points.map((one, at) => (
              <option key={one.id} value={one.id}>{`Card ${identity.number}, ${at + 1} ${one.title}`}</option>
            )),
          )}
        </select>
      </label>
      <Choices label="Word used" choices={CALL_WORDS} value={call.word} onChoose={(word) => put({ word: word as CallWord })} />
      <label className="block">
        <span className="mb-1 block">What for</span>
        <select
          className={SELECT}
          value={known.includes(call.trigger) ? call.trigger : "other"}
          onChange={(event) => put({ trigger: event.target.value === "other" ? "" : event.target.value })}
        >
          {known.map((code) => (
            <option key={code} value={code}>
              {card?.programme.parameters.find((one) => one.code === code)?.name ?? code}
            </option>
          ))}
          <option value="other">something else</option>
        </select>
      </label>
      {known.includes(call.trigger) ? (
        figure(`On the gauge${unit ? `, in its own unit` : ""}`, "onGauge", parseFigure)
      ) : (
        <Words label="In words" rows={2} value={call.trigger} onChange={(trigger) => put({ trigger })} />
      )}
      {figure("For how long, mm:ss", "durationS", parseStopwatch)}
      <Words label="What was done" rows={2} value={call.action} onChange={(action) => put({ action })} />
      <Choices
        label="Recovered?"
        choices={["yes", "no"]}
        names={YES_NO}
        value={asAnswer(call.recovered)}
        onChoose={(value) => put({ recovered: value === "yes" })}
      />
    </div>
  );
}
