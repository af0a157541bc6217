import type { FontWeight, FontWidths, SheetItem, SheetRole } from "../sheet-types";

const MM_PER_PT = 25.4 / 72;

export type Run = { text: string; weight: FontWeight };
export type SetLine = { pieces: { text: string; weight: FontWeight; xMm: number }[]; widthMm: number };
export type Ink = SheetItem[];

/** Part of B612's em that stands above the baseline for capitals and figures: 1500 of 2000 units. */
const CAP_HEIGHT_EM = 0.75;

export function capHeightMm(sizePt: number): number {
  return CAP_HEIGHT_EM * sizePt * MM_PER_PT;
}

/** A sheet of twelve points holds some 1500 texts; a change to a card leaves nearly all of them as they were. */
const MOST_REMEMBERED = 6000;
const printed = new Map<string, string>();
const measured = { regular: new WeakMap<FontWidths, Map<string, number>>(), bold: new WeakMap<FontWidths, Map<string, number>>() };
const broken = new WeakMap<FontWidths, Map<string, readonly SetLine[]>>();

/** What was worked out before for the same key: text alone decides the answer, so it is never stale. */
function remembered<T>(memory: Map<string, T>, key: string, work: () => T): T {
  const known = memory.get(key);
  if (known !== undefined) return known;
  if (memory.size >= MOST_REMEMBERED) memory.clear();
  const found = work();
  memory.set(key, found);
  return found;
}

function memoryOf<T>(memories: WeakMap<FontWidths, Map<string, T>>, widths: FontWidths): Map<string, T> {
  const known = memories.get(widths);
  if (known) return known;
  const memory = new Map<string, T>();
  memories.set(widths, memory);
  return memory;
}

const REWRITTEN: Record<string, string> = {
  "\u202f": "\u00a0",
  "\u2009": "\u00a0",
  "\u2007": "\u00a0",
  "\t": " ",
  "\n": " ",
  "\r": " ",
  "≤": "max ",
  "≥": "min ",
  "\u2010": "-",
  "\u2011": "-",
};

/** A figure and the unit after it stay on one line. */
const FIGURE_AND_UNIT = /(\d) (?=(?:°C|°F|kt|ft|min|psi|bar|inHg|rpm|kg|mm|mL|NM|AGL|PA|[sLhmN%])(?![\p{L}\d]))/gu;

const NEEDS_REWRITING = /[\u202f\u2009\u2007\t\n\r≤≥\u2010\u2011]/g;

/** Text as the sheet's typeface can print it: composed, one line, thin spaces as plain ones that do not break. */
export function printable(text: string): string {
  return remembered(printed, text, () =>
    text
      .normalize("NFC")
      .replace(NEEDS_REWRITING, (letter) => REWRITTEN[letter] ?? letter)
      .replace(FIGURE_AND_UNIT, "$1\u00a0"),
  );
}

/** Letters that the typeface lacks; they would print as an empty box. */
export function unprintableLetters(text: string, widths: FontWidths): string[] {
  const lacking = new Set<string>();
  for (const letter of printable(text)) if (widths.regular[letter.codePointAt(0) ?? 0] === undefined) lacking.add(letter);
  return [...lacking];
}

export function textWidthMm(text: string, weight: FontWeight, sizePt: number, widths: FontWidths): number {
  const perMille = remembered(memoryOf(measured[weight], widths), text, () => {
    let sum = 0;
    for (const letter of text) sum += widths[weight][letter.codePointAt(0) ?? 0] ?? widths.missing;
    return sum;
  });
  return (perMille / 1000) * sizePt * MM_PER_PT;
}

type Word = { text: string; weight: FontWeight; gap: string };

function wordsOf(runs: readonly Run[]): Word[] {
  const words: Word[] = [];
  let gap = "";
  for (const run of runs) {
    for (const part of printable(run.text).split(/( +)/)) {
      if (part === "") continue;
      if (part.startsWith(" ")) gap += part;
      else {
        words.push({ text: part, weight: run.weight, gap });
        gap = "";
      }
    }
  }
  return words;
}

/** Cuts a word that is wider than a whole line into parts that are not: after a band's dash if that will do, else where it must. */
function cutToWidth(word: Word, widthMm: number, sizePt: number, widths: FontWidths): Word[] {
  const halves = word.text.split(/(?<=–)/).map((text, i) => ({ text, weight: word.weight, gap: i === 0 ? word.gap : "" }));
  if (halves.length > 1 && halves.every((h) => textWidthMm(h.text, h.weight, sizePt, widths) <= widthMm)) return halves;
  const parts: Word[] = [];
  let text = "";
  for (const letter of word.text) {
    if (text !== "" && textWidthMm(text + letter, word.weight, sizePt, widths) > widthMm) {
      parts.push({ text, weight: word.weight, gap: parts.length === 0 ? word.gap : "" });
      text = "";
    }
    text += letter;
  }
  parts.push({ text, weight: word.weight, gap: parts.length === 0 ? word.gap : "" });
  return parts;
}

/** Breaks runs of text into lines no wider than widthMm. Words break only where one alone is too wide. Nothing is dropped. */
export function setLines(runs: readonly Run[], widthMm: number, sizePt: number, widths: FontWidths): readonly SetLine[] {
  const key = `${sizePt} ${widthMm} ${runs.map((run) => run.weight + run.text).join("\u0000")}`;
  return remembered(memoryOf(broken, widths), key, () => breakIntoLines(runs, widthMm, sizePt, widths));
}

function breakIntoLines(runs: readonly Run[], widthMm: number, sizePt: number, widths: FontWidths): SetLine[] {
  const lines: SetLine[] = [];
  let line: SetLine = { pieces: [], widthMm: 0 };
  const fits = (word: Word) => textWidthMm(word.text, word.weight, sizePt, widths) <= widthMm;
  for (const word of wordsOf(runs).flatMap((w) => (fits(w) ? [w] : cutToWidth(w, widthMm, sizePt, widths)))) {
    const wide = textWidthMm(word.text, word.weight, sizePt, widths);
    const gap = line.pieces.length === 0 ? "" : word.gap;
    const gapMm = textWidthMm(gap, word.weight, sizePt, widths);
    if (line.pieces.length > 0 && line.widthMm + gapMm + wide > widthMm) {
      lines.push(line);
      line = { pieces: [{ text: word.text, weight: word.weight, xMm: 0 }], widthMm: wide };
      continue;
    }
    const last = line.pieces.at(-1);
    if (last && last.weight === word.weight) last.text += gap + word.text;
    else line.pieces.push({ text: word.text, weight: word.weight, xMm: line.widthMm + gapMm });
    line.widthMm += gapMm + wide;
  }
  if (line.pieces.length > 0) lines.push(line);
  return lines;
}

export function regular(text: string): Run {
  return { text, weight: "regular" };
}

export function bold(text: string): Run {
  return { text, weight: "bold" };
}

type Lettering = { sizePt: number; role: SheetRole };

/** Draws one set line with its left end at xMm. */
export function inkLine(ink: Ink, line: SetLine, xMm: number, baselineMm: number, { sizePt, role }: Lettering): void {
  for (const { text, weight, xMm: offset } of line.pieces) {
    ink.push({ kind: "text", xMm: xMm + offset, baselineMm, text, sizePt, weight, anchor: "start", reversed: false, role });
  }
}

/** Draws lines in a column of rows pitchMm high, capitals centred in each row; answers the height used. */
export function inkLines(ink: Ink, lines: readonly SetLine[], xMm: number, topMm: number, pitchMm: number, lettering: Lettering): number {
  const baseline = (pitchMm + capHeightMm(lettering.sizePt)) / 2;
  for (const [row, line] of lines.entries()) inkLine(ink, line, xMm, topMm + row * pitchMm + baseline, lettering);
  return lines.length * pitchMm;
}

/** One unbroken text at an anchor. The caller has made sure that it fits. */
export function inkText(
  ink: Ink,
  run: Run,
  at: { xMm: number; baselineMm: number; anchor?: "start" | "middle" | "end"; reversed?: boolean },
  { sizePt, role }: Lettering,
): void {
  const { xMm, baselineMm, anchor = "start", reversed = false } = at;
  ink.push({ kind: "text", xMm, baselineMm, text: printable(run.text), sizePt, weight: run.weight, anchor, reversed, role });
}

export function inkBox(
  ink: Ink,
  box: { xMm: number; yMm: number; widthMm: number; heightMm: number },
  strokeMm: number,
  role: SheetRole,
  filled = false,
): void {
  ink.push({ kind: "rect", ...box, strokeMm, filled, role });
}

export function inkRule(ink: Ink, x1Mm: number, x2Mm: number, yMm: number, strokeMm: number, role: SheetRole): void {
  ink.push({ kind: "line", x1Mm, y1Mm: yMm, x2Mm, y2Mm: yMm, strokeMm, role });
}

/** Moves a drawing that stands nowhere else yet: a sheet has thousands of items, and copying each at every step costs the most time. */
export function moved(ink: Ink, dxMm: number, dyMm: number): Ink {
  for (const item of ink) {
    if (item.kind === "line") {
      item.x1Mm += dxMm;
      item.x2Mm += dxMm;
      item.y1Mm += dyMm;
      item.y2Mm += dyMm;
    } else {
      item.xMm += dxMm;
      if (item.kind === "text") item.baselineMm += dyMm;
      else item.yMm += dyMm;
    }
  }
  return ink;
}

/** The same drawing once more, further down or across. */
export function shifted(ink: Ink, dxMm: number, dyMm: number): Ink {
  return moved(
    ink.map((item) => ({ ...item })),
    dxMm,
    dyMm,
  );
}
