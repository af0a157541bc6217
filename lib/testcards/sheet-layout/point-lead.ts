import { type CardDocument, type CardPoint, type EntryCondition, instrumentOf, parameterOf } from "../card";
import type { FontWidths } from "../sheet-types";
import { figure, withUnit } from "./gauge-figures";
import { LABEL_PT, RULE_MM, STEP_PITCH_MM, STEP_PT } from "./paper";
import {
  bold,
  capHeightMm,
  type Ink,
  inkLines,
  inkRule,
  inkText,
  printable,
  type Run,
  regular,
  type SetLine,
  setLines,
  textWidthMm,
} from "./typesetting";

/** A part of a point that no page break cuts. */
export type Block = { ink: Ink; heightMm: number };

export const PAD_MM = 1.4;
const TITLE_MM = 6.2;
const CIRCLE_MM = 2.6;
const LETTER_MM = 5; // the step's letter stands out to the left of its text

export function titleBlock(numberOnCard: number, point: CardPoint, continued: boolean, widthMm: number, widths: FontWidths): Block {
  const ink: Ink = [];
  const role = "point" as const;
  const minutes = continued ? "" : printable(`${figure(point.durationMin, "min")} min`);
  const minutesMm = textWidthMm(minutes, "bold", STEP_PT, widths);
  const textMm = PAD_MM + 2 * CIRCLE_MM + 2;
  const runs = [bold(point.title), regular(continued ? ", continued" : "")];
  const lines = setLines(runs, widthMm - textMm - minutesMm - 3, STEP_PT, widths);
  const heightMm = TITLE_MM + Math.max(0, lines.length - 1) * STEP_PITCH_MM;
  ink.push({ kind: "circle", xMm: PAD_MM + CIRCLE_MM, yMm: TITLE_MM / 2, radiusMm: CIRCLE_MM, strokeMm: RULE_MM, role });
  const numberBaseline = (TITLE_MM + capHeightMm(LABEL_PT)) / 2;
  inkText(
    ink,
    bold(String(numberOnCard)),
    { xMm: PAD_MM + CIRCLE_MM, baselineMm: numberBaseline, anchor: "middle" },
    { sizePt: LABEL_PT, role },
  );
  inkLines(ink, lines, textMm, (TITLE_MM - STEP_PITCH_MM) / 2, STEP_PITCH_MM, { sizePt: STEP_PT, role });
  const baselineMm = (TITLE_MM + capHeightMm(STEP_PT)) / 2;
  if (minutes !== "") inkText(ink, bold(minutes), { xMm: widthMm - PAD_MM, baselineMm, anchor: "end" }, { sizePt: STEP_PT, role });
  inkRule(ink, 0, widthMm, heightMm, RULE_MM, role);
  return { ink, heightMm };
}

const plain = (text: string) => printable(text).replaceAll("\u00a0", " ").replaceAll(" ", "").toLowerCase();

function entryWords(card: CardDocument, entry: EntryCondition): string {
  const name = instrumentOf(card, entry.instrument)?.gaugeName ?? parameterOf(card, entry.parameter)?.shortName ?? entry.parameter;
  const value = withUnit(figure(entry.value, entry.unit), entry.unit);
  if (entry.relation === "about") return `${name} ${value}${entry.tolerance === null ? "" : ` ±${figure(entry.tolerance, entry.unit)}`}`;
  return `${name} ${entry.relation} ${value}`;
}

/** Conditions that are asked in the debrief but that nobody wrote into the entry line or a step are added to it. */
function unwritten(card: CardDocument, point: CardPoint): string[] {
  const written = plain([point.entryText, ...point.steps.map((s) => s.text)].join(" "));
  const entries = point.entry
    .filter((e) => !written.includes(plain(withUnit(figure(e.value, e.unit), e.unit))) && !written.includes(figure(e.value, e.unit)))
    .map((e) => entryWords(card, e));
  const floor = point.heightFloor;
  const floorWords =
    floor && !written.includes(figure(floor.value, null)) ? [`at least ${figure(floor.value, null)} ${floor.unit} ${floor.reference}`] : [];
  return [
    ...entries,
    ...floorWords,
    ...(point.smoothAir && !written.includes("smooth") ? ["smooth air"] : []),
    ...(point.minimumCrewOnly && !/onboard|minimumcrew|alone/.test(written) ? ["minimum crew"] : []),
  ];
}

export function entryRuns(card: CardDocument, point: CardPoint): Run[] {
  const positions = point.positions.map((p) => `${p.control} ${p.position}`).join("  ");
  const rest = [point.entryText, ...unwritten(card, point)].filter((text) => text.trim() !== "").join(", ");
  return [bold(positions), regular(positions === "" || rest === "" ? rest : `  ${rest}`)];
}

type Lines = { lines: readonly SetLine[]; xMm: number; role: "entry" | "step" | "recovery" };

/** One block a line: a text too long for any page then still breaks between lines. */
function lineBlocks({ lines, xMm, role }: Lines): Block[] {
  return lines.map((line) => {
    const ink: Ink = [];
    return { ink, heightMm: inkLines(ink, [line], xMm, 0, STEP_PITCH_MM, { sizePt: STEP_PT, role }) };
  });
}

function runsBlocks(runs: Run[], role: "entry" | "recovery", widthMm: number, widths: FontWidths): Block[] {
  return lineBlocks({ lines: setLines(runs, widthMm - 2 * PAD_MM, STEP_PT, widths), xMm: PAD_MM, role });
}

/** "a" to "z", then "aa". */
function letter(index: number): string {
  const last = String.fromCharCode(97 + (index % 26));
  return index < 26 ? last : letter(Math.floor(index / 26) - 1) + last;
}

function stepBlocks(text: string, index: number, widthMm: number, widths: FontWidths): Block[] {
  const letterInk: Ink = [];
  const baselineMm = (STEP_PITCH_MM + capHeightMm(STEP_PT)) / 2;
  inkText(letterInk, bold(letter(index)), { xMm: PAD_MM, baselineMm }, { sizePt: STEP_PT, role: "step" });
  const lines = setLines([regular(text)], widthMm - 2 * PAD_MM - LETTER_MM, STEP_PT, widths);
  const [first, ...more] = lineBlocks({ lines, xMm: PAD_MM + LETTER_MM, role: "step" });
  return [{ ink: [...letterInk, ...(first?.ink ?? [])], heightMm: STEP_PITCH_MM }, ...more];
}

/** Entry line, steps and recovery of a point, in the order in which they are read. */
export function leadBlocks(card: CardDocument, point: CardPoint, widthMm: number, widths: FontWidths): Block[] {
  return [
    ...runsBlocks(entryRuns(card, point), "entry", widthMm, widths),
    ...point.steps.flatMap((step, index) => stepBlocks(step.text, index, widthMm, widths)),
    ...(point.recovery.trim() === "" ? [] : runsBlocks([bold("RECOVER"), regular(`  ${point.recovery}`)], "recovery", widthMm, widths)),
  ];
}
