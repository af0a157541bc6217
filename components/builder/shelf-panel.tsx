"use client";
import { useDraggable } from "@dnd-kit/core";
import { GripVertical, Plus } from "lucide-react";
import { useMemo, useState } from "react";
import { CONTROL } from "@/components/ui/input";
import { Select } from "@/components/ui/select";
import type { CardPoint, Hazard, Parameter } from "@/lib/testcards/card";
import { riskLevel } from "@/lib/testcards/risk";
import { RISK_LEVELS, type RiskLevel } from "@/lib/testcards/words";

type ShelfProps = {
  shelf: CardPoint[];
  hazards: Hazard[];
  parameters: Parameter[];
  onCard: Map<string, number>;
  onPut: (point: CardPoint) => void;
};

type Place = "all" | CardPoint["place"];

/** The highest residual risk of a point's hazards; null where it has none. */
export function riskOf(point: CardPoint, hazards: Hazard[]): RiskLevel | null {
  const levels = hazards
    .filter(({ code }) => point.hazards.includes(code))
    .map(({ after }) => riskLevel(after.severity, after.probability));
  return levels.length === 0 ? null : (RISK_LEVELS[Math.max(...levels.map((level) => RISK_LEVELS.indexOf(level)))] ?? null);
}

/** Every word typed must stand in the point's code, title, purpose, readings or hazards. */
export function matchesShelf(point: CardPoint, words: string, hazards: Hazard[], parameters: Parameter[]): boolean {
  const text = [
    point.template?.code,
    point.title,
    point.purpose,
    ...point.readings.flatMap(({ label, parameter }) => [label, parameters.find(({ code }) => code === parameter)?.name]),
    ...hazards.filter(({ code }) => point.hazards.includes(code)).map(({ title }) => title),
  ]
    .join(" ")
    .toLowerCase();
  return words
    .toLowerCase()
    .split(/\s+/)
    .every((word) => text.includes(word));
}

export function ShelfPanel({ shelf, hazards, parameters, onCard, onPut }: ShelfProps) {
  const [words, setWords] = useState("");
  const [place, setPlace] = useState<Place>("all");
  const [risk, setRisk] = useState<RiskLevel | "all">("all");
  const [parameter, setParameter] = useState("all");
  const shown = useMemo(
    () =>
      shelf.filter(
        (point) =>
          (place === "all" || point.place === place) &&
          (risk === "all" || riskOf(point, hazards) === risk) &&
          (parameter === "all" || point.readings.some((reading) => reading.parameter === parameter)) &&
          matchesShelf(point, words, hazards, parameters),
      ),
    [shelf, place, risk, parameter, words, hazards, parameters],
  );
  const filtered = words !== "" || place !== "all" || risk !== "all" || parameter !== "all";
  const clear = () => {
    setWords("");
    setPlace("all");
    setRisk("all");
    setParameter("all");
  };
  return (
    <section aria-label="Test points on the shelf" className="flex flex-col">
      <h2 className="font-bold text-lg">Test points</h2>
      <input
        type="search"
        value={words}
        onChange={(event) => setWords(event.target.value)}
        placeholder="Name, reading or hazard"
        aria-label="Find a test point"
        className={`${CONTROL} mt-3`}
      />
      <fieldset className="mt-3 flex">
        <legend className="sr-only">Where flown</legend>
        {(["all", "ground", "air"] as const).map((one) => (
          <label
            key={one}
            className="flex min-h-11 flex-1 cursor-pointer items-center justify-center border border-control bg-sheet text-base first-of-type:rounded-s-md last:rounded-e-md has-checked:border-ink has-checked:bg-ink has-checked:text-sheet has-focus-visible:outline-3 has-focus-visible:outline-focus has-focus-visible:outline-offset-2"
          >
            <input type="radio" name="shelf-place" className="sr-only" checked={place === one} onChange={() => setPlace(one)} />
            {one === "all" ? "All" : one === "ground" ? "Ground" : "Air"}
          </label>
        ))}
      </fieldset>
      <div className="mt-2 grid grid-cols-[2fr_3fr] gap-2">
        <Select aria-label="Residual risk" value={risk} onChange={(event) => setRisk(event.target.value as RiskLevel | "all")}>
          <option value="all">Any risk</option>
          {RISK_LEVELS.filter((level) => level !== "Eliminated").map((level) => (
            <option key={level}>{level}</option>
          ))}
        </Select>
        <Select aria-label="Parameter read" value={parameter} onChange={(event) => setParameter(event.target.value)}>
          <option value="all">Any reading</option>
          {parameters.map(({ code, name }) => (
            <option key={code} value={code}>
              {name}
            </option>
          ))}
        </Select>
      </div>
      <p className="mt-3 border-ink border-b-[1.5px] pb-2 text-sm text-ink-soft" aria-live="polite">
        {filtered ? `${shown.length} of ${shelf.length} on the shelf` : `On the shelf, ${shelf.length}`}
      </p>
      <ul>
        {shown.map((point) => (
          <ShelfItem
            key={point.id}
            point={point}
            risk={riskOf(point, hazards)}
            used={onCard.get(point.template?.code ?? "") ?? 0}
            onPut={onPut}
          />
        ))}
      </ul>
      {shown.length === 0 ? (
        <div className="py-6 text-ink-soft">
          <p>No test point fits.</p>
          <button type="button" className="mt-2 underline underline-offset-4" onClick={clear}>
            Show all {shelf.length}
          </button>
        </div>
      ) : null}
    </section>
  );
}

function ShelfItem({
  point,
  risk,
  used,
  onPut,
}: {
  point: CardPoint;
  risk: RiskLevel | null;
  used: number;
  onPut: (point: CardPoint) => void;
}) {
  const { attributes, listeners, setNodeRef, setActivatorNodeRef } = useDraggable({
    id: `shelf/${point.id}`,
    data: { from: "shelf", template: point.id, title: point.title },
  });
  const facts = [
    point.place === "ground" ? "Ground" : "Air",
    `${point.durationMin} min`,
    `${point.readings.length} readings`,
    ...(used > 0 ? [used === 1 ? "on this card" : `${used} × on this card`] : []),
  ];
  return (
    <li ref={setNodeRef} className="flex items-stretch border-rule border-b">
      <button
        type="button"
        ref={setActivatorNodeRef}
        {...listeners}
        {...attributes}
        aria-label={`${point.title}: drag to the card`}
        className="flex min-w-0 flex-1 cursor-grab touch-none gap-1 py-2 text-left hover:bg-wash-blue"
      >
        <GripVertical aria-hidden className="mt-1 size-4 shrink-0 text-ink-soft" />
        <span className="min-w-0 flex-1">
          <span className="flex justify-between gap-2">
            <span className="font-bold">{point.title}</span>
            <span className="shrink-0 text-sm text-ink-soft">{risk ?? ""}</span>
          </span>
          <span className="block text-sm text-ink-soft">
            {point.template?.code} · {facts.join(", ")}
          </span>
        </span>
      </button>
      <button
        type="button"
        onClick={() => onPut(point)}
        aria-label={`Put ${point.title} on the card`}
        title="Put on card"
        className="flex w-11 shrink-0 items-center justify-center hover:bg-wash-blue"
      >
        <Plus aria-hidden className="size-5" />
      </button>
    </li>
  );
}
