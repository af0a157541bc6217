"use client";
import { Plus, Trash2 } from "lucide-react";
import { buttonClass } from "@/components/ui/button";
import { formatOnGauge, unitLabel } from "@/lib/format/unit";
import { correctReading } from "@/lib/testcards/calibration";
import type { AbortLine, AbortNumber, CardDocument, CardPoint, Instrument } from "@/lib/testcards/card";
import { abortsOf } from "@/lib/testcards/card";
import { proposeAbort, proposeRateAbort } from "@/lib/testcards/propose-abort";
import type { LimitCondition, Side } from "@/lib/testcards/words";
import { ChoiceField, NumberField, TextField, TickField } from "../fields";
import { gaugeFromTrue, gaugeFromTrueRate, tidy, trueFromGauge, trueRateFromGauge } from "../gauge-both-ways";
import type { PointPartProps } from "./point-editor";

/** Abort lines: a number set on the gauge shows what it truly is, and the other way round; the rule proposes one. */
export function AbortEditor({ card, point, change, newId }: PointPartProps) {
  const { aborts } = point;
  const set = (lines: AbortLine[], what: string) => change({ aborts: { ...aborts, lines } }, what);
  const put = (line: AbortLine) =>
    set(
      aborts.lines.map((one) => (one.id === line.id ? line : one)),
      `abort ${line.id}`,
    );
  const inherited = abortsOf(card.programme, { ...point, aborts: { ...aborts, lines: [] } });
  const addFor = (instrument: Instrument, side: Side) => {
    const line = newLine(card, point, instrument, side, newId());
    if (line) set([...aborts.lines, line], "abort line added");
  };
  return (
    <div className="flex flex-col gap-3">
      <TickField
        label={`Use the ${card.programme.standingAborts.length} standing lines`}
        checked={aborts.standing}
        onChange={(standing) => change({ aborts: { ...aborts, standing } }, "standing aborts")}
        focusKey="aborts"
      />
      {aborts.standing ? <p className="text-sm text-ink-soft">{inherited.map((line) => lineWords(card, line)).join(" · ")}</p> : null}
      {aborts.lines.map((line) =>
        line.kind === "number" ? (
          <NumberLineEditor
            key={line.id}
            card={card}
            point={point}
            line={line}
            onChange={put}
            onRemove={() =>
              set(
                aborts.lines.filter((one) => one !== line),
                "abort line removed",
              )
            }
          />
        ) : (
          <div key={line.id} className="flex items-start gap-2 [&>button]:mt-6">
            <div className="flex-1">
              <TextField
                label="Event"
                value={line.text}
                maxLength={60}
                onChange={(text) => put({ ...line, text })}
                focusKey={`aborts ${line.id}`}
              />
            </div>
            <RemoveButton
              label={`Remove ${line.text}`}
              onClick={() =>
                set(
                  aborts.lines.filter((one) => one !== line),
                  "abort line removed",
                )
              }
            />
          </div>
        ),
      )}
      <div className="grid grid-cols-2 gap-2">
        <AddNumber card={card} point={point} onAdd={addFor} />
        <button
          type="button"
          className={buttonClass("outline")}
          onClick={() => set([...aborts.lines, { kind: "event", id: newId(), text: "" }], "abort event added")}
        >
          <Plus aria-hidden className="size-4" /> Event
        </button>
      </div>
    </div>
  );
}

function AddNumber({ card, point, onAdd }: { card: CardDocument; point: CardPoint; onAdd: (instrument: Instrument, side: Side) => void }) {
  const read = new Set(point.readings.flatMap(({ parameter }) => parameter ?? []));
  const offered = card.programme.instruments.filter((one) => read.has(one.parameter));
  return (
    <ChoiceField
      label="Add a number"
      hideLabel
      value=""
      onChange={(value) => {
        const [id, side] = value.split("|");
        const instrument = offered.find((one) => one.id === id);
        if (instrument) onAdd(instrument, side === "min" ? "min" : "max");
      }}
      choices={[
        { value: "", label: "Add a number for …" },
        ...offered.flatMap((one) => [
          { value: `${one.id}|max`, label: `${one.gaugeName} above (${one.name})` },
          { value: `${one.id}|min`, label: `${one.gaugeName} below (${one.name})` },
        ]),
      ]}
    />
  );
}

/** When the line holds: always where the programme has such a limit, else the first condition of this point that has one. */
function conditionOf(card: CardDocument, point: CardPoint, parameter: string, side: Side): LimitCondition {
  const rows = card.programme.limits.filter((limit) => limit.layer === "card" && limit.parameter === parameter && limit.side === side);
  const whens = rows.map((limit) => limit.appliesWhen);
  return whens.includes("always") ? "always" : (whens.find((when) => point.conditions.includes(when)) ?? "always");
}

/** By the rule where it can say a number, else at the top or foot of the calibrated range, to be set by hand. */
function newLine(card: CardDocument, point: CardPoint, instrument: Instrument, side: Side, id: string): AbortNumber | null {
  const parameter = card.programme.parameters.find(({ code }) => code === instrument.parameter);
  if (!parameter || !instrument.calibration) return null;
  const appliesWhen = conditionOf(card, point, parameter.code, side);
  const proposal = proposeAbort(card, point, parameter.code, side, instrument.id, appliesWhen);
  const onGauge = proposal?.onGauge ?? (side === "max" ? instrument.calibration.high : instrument.calibration.low);
  const trueValue = proposal?.trueValue ?? trueFromGauge(onGauge, instrument, parameter.unit) ?? onGauge;
  const calledBy = instrument.visibleTo.includes("pilot") ? "pilot" : "observer";
  return {
    kind: "number",
    id,
    parameter: parameter.code,
    side,
    instrument: instrument.id,
    appliesWhen,
    trueValue,
    onGauge,
    setBy: proposal ? "rule" : "gauge",
    perMinute: false,
    windowS: null,
    calledBy,
  };
}

type LineProps = { card: CardDocument; point: CardPoint; line: AbortNumber; onChange: (line: AbortNumber) => void; onRemove: () => void };

function NumberLineEditor({ card, point, line, onChange, onRemove }: LineProps) {
  const instrument = card.programme.instruments.find(({ id }) => id === line.instrument);
  const parameter = card.programme.parameters.find(({ code }) => code === line.parameter);
  if (!instrument || !parameter) return null;
  const windowS = line.windowS ?? 60;
  const when = line.appliesWhen === "always" ? undefined : line.appliesWhen;
  const proposal = line.perMinute
    ? proposeRateAbort(card, point, line.parameter, line.side, line.instrument, windowS)
    : proposeAbort(card, point, line.parameter, line.side, line.instrument, when);
  const toTrue = (onGauge: number) =>
    line.perMinute ? trueRateFromGauge(onGauge, windowS, instrument, parameter.unit) : trueFromGauge(onGauge, instrument, parameter.unit);
  const toGauge = (trueValue: number) =>
    line.perMinute
      ? gaugeFromTrueRate(trueValue, parameter.unit, windowS, instrument)
      : gaugeFromTrue(trueValue, parameter.unit, instrument);
  const printedTrue = toTrue(line.onGauge);
  const offRule = proposal !== null && proposal.onGauge !== line.onGauge;
  return (
    <fieldset className="border border-rule p-3">
      <legend className="px-1 font-bold text-base">
        {instrument.gaugeName} {line.perMinute ? `change in ${windowS} s ` : ""}
        {line.side === "max" ? "at or above" : "at or below"}
      </legend>
      <div className="grid grid-cols-[1fr_1fr_auto] items-start gap-2 [&>button]:mt-6">
        <NumberField
          label="On the gauge"
          value={line.onGauge}
          unit={unitLabel(instrument.unit)}
          focusKey={`aborts ${line.id}`}
          onChange={(onGauge) => {
            if (onGauge !== null)
              onChange({
                ...line,
                onGauge,
                trueValue: tidy(toTrue(onGauge) ?? line.trueValue),
                setBy: "gauge",
              });
          }}
        />
        <NumberField
          label={`True${line.perMinute ? ", a minute" : ""}${line.setBy === "rule" ? ", by the rule" : ""}`}
          value={tidy(line.trueValue)}
          unit={unitLabel(parameter.unit)}
          onChange={(trueValue) => {
            const onGauge = trueValue === null ? null : toGauge(trueValue);
            if (trueValue !== null && onGauge !== null) onChange({ ...line, trueValue, onGauge: tidy(onGauge), setBy: "true" });
          }}
        />
        <RemoveButton label={`Remove the ${instrument.gaugeName} line`} onClick={onRemove} />
      </div>
      <p className="mt-2 text-sm text-ink-soft">
        {proposal
          ? `By the rule: ${tidy(proposal.trueValue)} true${line.perMinute ? " a minute" : ""}, which prints as ${proposal.onGauge} on the gauge.`
          : "The rule has no card limit to start from here."}
        {printedTrue === null || line.setBy !== "rule"
          ? ""
          : ` As printed it is ${tidy(printedTrue)} true${line.perMinute ? " a minute" : ""}.`}
        {!line.perMinute && instrument.calibration && !correctReading(line.onGauge, instrument.calibration).inRange
          ? " This number lies outside the calibrated range."
          : ""}
      </p>
      {offRule && proposal ? (
        <button
          type="button"
          className="mt-2 min-h-11 underline underline-offset-4"
          onClick={() => onChange({ ...line, onGauge: proposal.onGauge, trueValue: proposal.trueValue, setBy: "rule" })}
        >
          Use {proposal.onGauge} on the gauge
        </button>
      ) : null}
    </fieldset>
  );
}

export function RemoveButton({ label, onClick }: { label: string; onClick: () => void }) {
  return (
    <button
      type="button"
      aria-label={label}
      title={label}
      onClick={onClick}
      className="flex size-11 shrink-0 items-center justify-center rounded-[6px] text-ink-soft hover:bg-wash-red hover:text-ink-red"
    >
      <Trash2 aria-hidden className="size-5" />
    </button>
  );
}

function lineWords(card: CardDocument, line: AbortLine): string {
  if (line.kind === "event") return line.text;
  const instrument = card.programme.instruments.find(({ id }) => id === line.instrument);
  return `${instrument?.gaugeName ?? line.parameter} ${line.side === "min" ? "below " : ""}${instrument ? formatOnGauge(line.onGauge, instrument) : line.onGauge}`;
}
