import { abortsOf, type CardDocument, type CardPoint, type Control } from "../card";
import type { FindingPlace } from "../readiness-types";
import { atPoint, type CardFacts, type InstrumentUse, isNumber, type PointFacts, type SheetFacts } from "./rule";
import { statedSpeeds } from "./speeds";

export function cardFacts(card: CardDocument, context: CardFacts["context"], on: string, sheet: SheetFacts): CardFacts {
  const { programme, content } = card;
  const instruments = new Map(programme.instruments.map((instrument) => [instrument.id, instrument]));
  const points = content.points.map((point, i): PointFacts => {
    const taken = positionsTaken(programme.controls, point);
    return { point, name: `Point ${i + 1}`, lines: abortsOf(programme, point), speeds: statedSpeeds(point), taken };
  });
  return {
    card,
    content,
    programme,
    context,
    on,
    name: `Card ${card.identity.number}`,
    points,
    parameters: new Map(programme.parameters.map((parameter) => [parameter.code, parameter])),
    instruments,
    used: instrumentsUsed(points, instruments),
    sheet,
  };
}

function usesAt(instruments: CardFacts["instruments"], at: PointFacts): InstrumentUse[] {
  const { point, name, lines } = at;
  const used = (id: string, use: string, where: FindingPlace): InstrumentUse => ({ id, instrument: instruments.get(id), use, where });
  const judged = point.readings.filter((r) => r.kind === "number" || r.kind === "count");
  return [
    ...judged.flatMap((r) => (r.instrument ? [used(r.instrument, `${name}, ${r.label}`, atPoint(at, "readings", r.id))] : [])),
    ...lines.filter(isNumber).map((l) => used(l.instrument, `${name}, abort`, atPoint(at, "aborts", l.id))),
    ...point.entry.flatMap((e) => (e.instrument ? [used(e.instrument, `${name}, entry`, atPoint(at, "entry", e.id))] : [])),
  ];
}

/** Every instrument that a reading, an abort number or an entry condition of this card is read on, each once. */
function instrumentsUsed(points: readonly PointFacts[], instruments: CardFacts["instruments"]): InstrumentUse[] {
  const seen = new Map<string, InstrumentUse>();
  for (const at of points) for (const use of usesAt(instruments, at)) if (!seen.has(use.id)) seen.set(use.id, use);
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

const asWords = (text: string): string => ` ${text.toUpperCase().replace(/[^\p{L}\p{N}]+/gu, " ")} `;

/** A control's position that the entry line states or a step sets. */
function positionsTaken(controls: readonly Control[], point: CardPoint): PointFacts["taken"] {
  const steps = point.steps.map((step) => asWords(step.text));
  return controls.flatMap((control) =>
    control.positions
      .filter((position) => {
        const words = asWords(`${control.name} ${position.name}`);
        const stated = point.positions.some((p) => p.control === control.name && p.position === position.name);
        return stated || steps.some((step) => step.includes(words));
      })
      .map((position) => ({ control, position })),
  );
}

/** "COWL SHUT" inside a longer line, whatever the case. */
export const saysPosition = (text: string, control: string, position: string): boolean =>
  asWords(text).includes(asWords(`${control} ${position}`));

/** A restricted position (one that needs height, crew and a way back) taken in the air. */
export function restrictedInAir({ point, taken }: PointFacts): string | null {
  const found = point.place === "air" ? taken.find(({ position }) => position.restricted) : undefined;
  return found ? `${found.control.name} ${found.position.name}` : null;
}
