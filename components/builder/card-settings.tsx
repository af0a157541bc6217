"use client";
import { useState } from "react";
import { buttonClass } from "@/components/ui/button";
import { formatNumber } from "@/lib/format/number";
import type { CardContent, CardDocument } from "@/lib/testcards/card";
import { planCard } from "@/lib/testcards/card-plan";
import { SORTIE_KINDS, type SortieKind } from "@/lib/testcards/words";
import { ChoiceField, LinesField, NumberField, TextField, TickField } from "./fields";
import { RemoveButton } from "./point-editor/abort-editor";

type SettingsProps = { card: CardDocument; content: CardContent; change: (patch: Partial<CardContent>, what: string) => void };

/** What stands on the cover: what kind of card, when, who, fuel and bingo. */
export function CardSettings({ card, content, change }: SettingsProps) {
  const { crew } = content;
  const { fuelCapacityL } = card.programme.aircraft;
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
          high={fuelCapacityL}
          value={content.fuelOnBoardL}
          focusKey="fuelOnBoardL"
          onChange={(fuelOnBoardL) => change({ fuelOnBoardL }, "fuel")}
        />
        <NumberField
          label="Bingo fuel, L"
          optional
          low={0}
          high={fuelCapacityL}
          value={content.bingoL}
          focusKey="bingoL"
          onChange={(bingoL) => change({ bingoL }, "bingo")}
        />
        <NumberField
          label="Baggage, kg"
          low={0}
          high={500}
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
            <div key={index} className="grid grid-cols-[1fr_1fr_auto] items-start gap-2 [&>button]:mt-6">
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
        <NewSeat role={crew.length === 0 ? "pilot" : "observer"} onAdd={(seat) => setCrew([...crew, seat], "crew")} />
      </fieldset>
      <Loading card={card} />
      <TickField
        label="First flight of a change"
        checked={content.firstFlightOfChange}
        onChange={(firstFlightOfChange) => change({ firstFlightOfChange }, "first flight")}
      />
      <LinesField
        label="Remarks, printed on the cover"
        value={content.remarks}
        maxLength={2000}
        rows={3}
        onChange={(remarks) => change({ remarks }, "remarks")}
      />
    </section>
  );
}

/** Nobody is on the card until their mass is known: it goes into mass and CG. */
function NewSeat({ role: usual, onAdd }: { role: string; onAdd: (seat: CardContent["crew"][number]) => void }) {
  const [role, setRole] = useState<string | null>(null);
  const [massKg, setMassKg] = useState<number | null>(null);
  if (role === null)
    return (
      <button type="button" className={buttonClass("outline")} onClick={() => setRole(usual)}>
        Add a seat
      </button>
    );
  const close = () => {
    setRole(null);
    setMassKg(null);
  };
  return (
    <div className="grid grid-cols-[1fr_1fr_auto] items-start gap-2">
      <TextField label="Who" value={role} maxLength={40} onChange={setRole} />
      <NumberField label="Mass, kg" low={30} high={200} optional value={massKg} onChange={setMassKg} />
      <button
        type="button"
        className={buttonClass("outline", "mt-6")}
        disabled={massKg === null || role.trim() === ""}
        onClick={() => {
          if (massKg === null) return;
          onAdd({ role: role.trim(), massKg });
          close();
        }}
      >
        Add
      </button>
    </div>
  );
}

/** Mass and CG of this card as they follow from what is typed, each said to be inside or outside the envelope. */
function Loading({ card }: { card: CardDocument }) {
  const { takeOff, landing, zeroFuel } = planCard(card);
  const cases = [
    ["Take-off", takeOff],
    ["Landing", landing],
    ["Zero fuel", zeroFuel],
  ] as const;
  return (
    <div>
      <h3 className="text-ink-soft text-sm">Mass and CG</h3>
      <ul>
        {cases.map(([name, load]) => (
          <li key={name} className="flex justify-between gap-3 border-rule border-b py-1.5">
            <span>{name}</span>
            {load ? (
              <span className={load.inside ? undefined : "font-bold text-ink-red"}>
                {formatNumber(load.massKg, 1)} kg, {formatNumber(load.cgM, 3)} m, {load.inside ? "inside" : "OUTSIDE the envelope"}
              </span>
            ) : (
              <span className="text-ink-soft">fuel not stated</span>
            )}
          </li>
        ))}
      </ul>
    </div>
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
