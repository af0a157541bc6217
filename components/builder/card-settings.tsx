"use client";
import { buttonClass } from "@/components/ui/button";
import type { CardContent } from "@/lib/testcards/card";
import { SORTIE_KINDS, type SortieKind } from "@/lib/testcards/words";
import { ChoiceField, LinesField, NumberField, TextField, TickField } from "./fields";
import { RemoveButton } from "./point-editor/abort-editor";

type SettingsProps = { content: CardContent; change: (patch: Partial<CardContent>, what: string) => void };

/** What stands on the cover: what kind of card, when, who, fuel and bingo. */
export function CardSettings({ content, change }: SettingsProps) {
  const { crew } = content;
  const setCrew = (next: CardContent["crew"], what: string) => change({ crew: next }, what);
  return (
    <section aria-label="Cover" className="flex flex-col gap-3" data-testid="card-settings">
      <h2 className="font-bold text-lg">Cover</h2>
      <TextField label="Title" value={content.title} maxLength={60} focusKey="title" onChange={(title) => change({ title }, "title")} />
      <div className="grid grid-cols-2 gap-2">
        <ChoiceField
          label="Kind"
          value={content.kind}
          onChange={(kind) => change({ kind: kind as SortieKind }, "kind")}
          choices={SORTIE_KINDS.map((kind) => ({ value: kind, label: kind }))}
        />
        <PlannedOn value={content.plannedOn} onChange={(plannedOn) => change({ plannedOn }, "planned day")} />
        <NumberField
          label="Fuel on board, L"
          optional
          low={0}
          high={10000}
          value={content.fuelOnBoardL}
          focusKey="fuelOnBoardL"
          onChange={(fuelOnBoardL) => change({ fuelOnBoardL }, "fuel")}
        />
        <NumberField
          label="Bingo fuel, L"
          optional
          low={0}
          high={10000}
          value={content.bingoL}
          focusKey="bingoL"
          onChange={(bingoL) => change({ bingoL }, "bingo")}
        />
        <NumberField
          label="Baggage, kg"
          low={0}
          high={2000}
          value={content.baggageKg}
          onChange={(baggageKg) => baggageKg !== null && change({ baggageKg }, "baggage")}
        />
      </div>
      <fieldset className="flex flex-col gap-2">
        <legend className="text-ink-soft text-sm">Crew</legend>
        {crew.map((member, index) => {
          const put = (patch: Partial<typeof member>) =>
            setCrew(
              crew.map((one, at) => (at === index ? { ...one, ...patch } : one)),
              `crew ${index}`,
            );
          return (
            // biome-ignore lint/suspicious/noArrayIndexKey: a seat is its place in the list
            <div key={index} className="grid grid-cols-[1fr_1fr_auto] items-end gap-2">
              <TextField label="Who" value={member.role} maxLength={40} focusKey="crew" onChange={(role) => put({ role })} />
              <NumberField
                label="Mass, kg"
                low={30}
                high={200}
                value={member.massKg}
                onChange={(massKg) => massKg !== null && put({ massKg })}
              />
              <RemoveButton
                label={`Remove ${member.role || "the seat"}`}
                onClick={() =>
                  setCrew(
                    crew.filter((_, at) => at !== index),
                    "crew",
                  )
                }
              />
            </div>
          );
        })}
        <button
          type="button"
          className={buttonClass("outline")}
          onClick={() => setCrew([...crew, { role: crew.length === 0 ? "pilot" : "observer", massKg: 80 }], "crew")}
        >
          Add a seat
        </button>
      </fieldset>
      <TickField
        label="First flight of a change"
        checked={content.firstFlightOfChange}
        onChange={(firstFlightOfChange) => change({ firstFlightOfChange }, "first flight")}
      />
      <LinesField
        label="Remarks for the team, not printed"
        value={content.remarks}
        maxLength={2000}
        rows={3}
        onChange={(remarks) => change({ remarks }, "remarks")}
      />
    </section>
  );
}

function PlannedOn({ value, onChange }: { value: string | null; onChange: (day: string | null) => void }) {
  return (
    <label className="min-w-0">
      <span className="mb-1 block text-ink-soft text-sm">Planned day</span>
      <input
        type="date"
        data-focus="plannedOn"
        className="min-h-14 w-full rounded-md border border-control bg-sheet px-3 text-ink hand:min-h-11"
        value={value ?? ""}
        onChange={(event) => onChange(event.target.value || null)}
      />
    </label>
  );
}
