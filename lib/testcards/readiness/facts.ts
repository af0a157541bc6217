import { abortsOf, type CardDocument, type CardPoint, type Instrument } from "../card";
import type { FindingPlace } from "../readiness-types";
import { atPoint, type CardFacts, isNumber, type PointFacts, type SheetFacts } from "./rule";

export function cardFacts(card: CardDocument, context: CardFacts["context"], on: string, sheet: SheetFacts): CardFacts {
  const { programme, content } = card;
  return {
    card,
    content,
    programme,
    context,
    on,
    name: `Card ${card.identity.number}`,
    points: content.points.map((point, i) => ({ point, name: `Point ${i + 1}`, lines: abortsOf(programme, point) })),
    parameters: new Map(programme.parameters.map((parameter) => [parameter.code, parameter])),
    instruments: new Map(programme.instruments.map((instrument) => [instrument.id, instrument])),
    sheet,
  };
}

export type InstrumentUse = { id: string; instrument: Instrument | undefined; use: string; where: FindingPlace };

function usesAt(facts: CardFacts, at: PointFacts): InstrumentUse[] {
  const { point, name, lines } = at;
  const used = (id: string, use: string, where: FindingPlace): InstrumentUse => ({ id, instrument: facts.instruments.get(id), use, where });
  const judged = point.readings.filter((r) => r.kind === "number" || r.kind === "count");
  return [
    ...judged.flatMap((r) => (r.instrument ? [used(r.instrument, `${name}, ${r.label}`, atPoint(at, "readings", r.id))] : [])),
    ...lines.filter(isNumber).map((l) => used(l.instrument, `${name}, abort`, atPoint(at, "aborts", l.id))),
    ...point.entry.flatMap((e) => (e.instrument ? [used(e.instrument, `${name}, entry`, atPoint(at, "entry", e.id))] : [])),
  ];
}

/** Every instrument that a reading, an abort number or an entry condition of this card is read on, each once. */
export function instrumentsUsed(facts: CardFacts): InstrumentUse[] {
  const seen = new Map<string, InstrumentUse>();
  for (const use of facts.points.flatMap((at) => usesAt(facts, at))) if (!seen.has(use.id)) seen.set(use.id, use);
  return [...seen.values()];
}

export type PilotLine = { text: string; what: string; field: "entry" | "steps" | "recovery" | "aborts" | undefined; item?: string };

/** Every line of a point that a person writes and the pilot reads. */
export function pilotLines(point: CardPoint): PilotLine[] {
  return [
    { text: point.title, what: "title", field: undefined },
    { text: point.entryText, what: "entry line", field: "entry" },
    ...point.steps.map((step, i): PilotLine => ({ text: step.text, what: `step ${stepLetter(i)}`, field: "steps", item: step.id })),
    ...point.aborts.lines.flatMap((line): PilotLine[] =>
      line.kind === "event" ? [{ text: line.text, what: "abort line", field: "aborts", item: line.id }] : [],
    ),
    { text: point.recovery, what: "recovery", field: "recovery" },
  ];
}

export const stepLetter = (index: number): string => String.fromCharCode(97 + index);

/** A control's position that the entry line states or a step sets. */
export function positionsTaken(facts: CardFacts, point: CardPoint) {
  return facts.programme.controls.flatMap((control) =>
    control.positions
      .filter(
        (position) =>
          point.positions.some((p) => p.control === control.name && p.position === position.name) ||
          point.steps.some((step) => saysPosition(step.text, control.name, position.name)),
      )
      .map((position) => ({ control, position })),
  );
}

/** "COWL SHUT" inside a longer line, whatever the case. */
export function saysPosition(text: string, control: string, position: string): boolean {
  return ` ${text.toUpperCase().replace(/[^\p{L}\p{N}]+/gu, " ")} `.includes(` ${control.toUpperCase()} ${position.toUpperCase()} `);
}

/** A restricted position (one that needs height, crew and a way back) taken in the air. */
export function restrictedInAir(facts: CardFacts, point: CardPoint): string | null {
  if (point.place !== "air") return null;
  const taken = positionsTaken(facts, point).find(({ position }) => position.restricted);
  return taken ? `${taken.control.name} ${taken.position.name}` : null;
}
