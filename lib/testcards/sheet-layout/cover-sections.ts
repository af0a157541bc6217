import type { CardDocument } from "../card";
import type { FontWidths } from "../sheet-types";
import { SHEET_CAUTION } from "../words";
import { type CoverFigure, coverFigures } from "./cover-figures";
import { bandOnGauge, bandText, pilotsGauge, withUnit } from "./gauge-figures";
import { HAIRLINE_MM, HEAVY_MM, LABEL_PITCH_MM, LABEL_PT, RULE_MM, STAMP_PITCH_MM, STAMP_PT, STEP_PITCH_MM, STEP_PT } from "./paper";
import type { Block } from "./point-lead";
import {
  bold,
  capHeightMm,
  type Ink,
  inkBox,
  inkLines,
  inkRule,
  inkText,
  moved,
  type Run,
  regular,
  type SetLine,
  setLines,
  textWidthMm,
} from "./typesetting";

/** Type of the cover's lists: 12 pt where all fits, down to the least size of a label. */
export type Body = { sizePt: number; pitchMm: number };
export const BODIES: readonly Body[] = [
  { sizePt: STEP_PT, pitchMm: STEP_PITCH_MM },
  { sizePt: 11, pitchMm: 4.8 },
  { sizePt: LABEL_PT, pitchMm: LABEL_PITCH_MM },
  { sizePt: LABEL_PT, pitchMm: 3.9 },
];

const ROLE = "cover" as const;
const HEAD_MM = 4.4;

function section(head: Run[], body: Block, widthMm: number, widths: FontWidths): Block {
  const ink: Ink = [];
  inkRule(ink, 0, widthMm, 0, HAIRLINE_MM, ROLE);
  const lines = setLines(head, widthMm, LABEL_PT, widths);
  const headMm = inkLines(ink, lines, 0, 0.3, HEAD_MM, { sizePt: LABEL_PT, role: ROLE }) + 0.3;
  ink.push(...moved(body.ink, 0, headMm));
  return { ink, heightMm: headMm + body.heightMm + 0.4 };
}

/** Date, pilot and sortie, to be written in by hand. */
export function blanksBlock(widthMm: number): Block {
  const ink: Ink = [];
  const heightMm = 10;
  const shares = [0.28, 0.44, 0.28];
  let x = 0;
  for (const [i, word] of ["date", "pilot", "sortie"].entries()) {
    const wide = widthMm * (shares[i] ?? 0);
    ink.push({ kind: "cell", xMm: x, yMm: 0, widthMm: wide, heightMm, strokeMm: HAIRLINE_MM, role: "cell", reading: null, row: 0 });
    inkText(ink, regular(word), { xMm: x + 1.2, baselineMm: 1 + capHeightMm(LABEL_PT) }, { sizePt: LABEL_PT, role: ROLE });
    x += wide;
  }
  return { ink, heightMm };
}

const FIGURE_MM = 10.6;

export function figuresBlock(card: CardDocument, widthMm: number, widths: FontWidths): Block {
  const figures = coverFigures(card);
  const across = 4;
  const wide = widthMm / across;
  const ink: Ink = [];
  for (const [i, item] of figures.entries()) inkFigure(ink, item, (i % across) * wide, Math.floor(i / across) * FIGURE_MM, wide, widths);
  return { ink, heightMm: Math.ceil(figures.length / across) * FIGURE_MM };
}

function inkFigure(ink: Ink, { label, value, boxed }: CoverFigure, xMm: number, yMm: number, widthMm: number, widths: FontWidths): void {
  const at = boxed
    ? { xMm: xMm + HEAVY_MM / 2, yMm: yMm + HEAVY_MM / 2, widthMm: widthMm - HEAVY_MM, heightMm: FIGURE_MM - HEAVY_MM }
    : { xMm, yMm, widthMm, heightMm: FIGURE_MM };
  inkBox(ink, at, boxed ? HEAVY_MM : HAIRLINE_MM, ROLE);
  const name = boxed ? bold(label) : regular(label);
  inkText(ink, name, { xMm: xMm + 1.6, baselineMm: yMm + 1.5 + capHeightMm(LABEL_PT) }, { sizePt: LABEL_PT, role: ROLE });
  const sizePt = [14, 12, 10, 8].find((pt) => textWidthMm(value, "bold", pt, widths) <= widthMm - 2.8) ?? 8;
  inkText(ink, bold(value), { xMm: xMm + 1.6, baselineMm: yMm + FIGURE_MM - 1.6 }, { sizePt, role: ROLE });
}

/** Lines with a box to tick before each. */
export function goNoGoBlock(card: CardDocument, body: Body, widthMm: number, widths: FontWidths): Block {
  const ink: Ink = [];
  const tickMm = Math.min(3.4, body.pitchMm - 0.8); // boxes that touch are ticked for one another
  const textMm = 5.8;
  let y = 0;
  for (const text of card.programme.goNoGo) {
    const lines = setLines([regular(text)], widthMm - textMm, body.sizePt, widths);
    inkBox(ink, { xMm: 0.2, yMm: y + (body.pitchMm - tickMm) / 2, widthMm: tickMm, heightMm: tickMm }, RULE_MM, ROLE);
    y += inkLines(ink, lines, textMm, y, body.pitchMm, { sizePt: body.sizePt, role: ROLE });
  }
  return section([bold("GO / NO-GO"), regular("  any NO stops")], { ink, heightMm: y }, widthMm, widths);
}

export function wordsBlock(card: CardDocument, body: Body, widthMm: number, widths: FontWidths): Block {
  const ink: Ink = [];
  const column = Math.min(
    widthMm / 2,
    Math.max(0, ...card.programme.callWords.map((w) => textWidthMm(w.word, "bold", body.sizePt, widths))) + 3,
  );
  const lettering = { sizePt: body.sizePt, role: ROLE };
  let y = 0;
  for (const { word, meaning } of card.programme.callWords) {
    const words = setLines([bold(word)], column - 1, body.sizePt, widths);
    const meanings = setLines([regular(meaning)], widthMm - column, body.sizePt, widths);
    inkLines(ink, words, 0, y, body.pitchMm, lettering);
    inkLines(ink, meanings, column, y, body.pitchMm, lettering);
    y += Math.max(words.length, meanings.length) * body.pitchMm;
  }
  return section([bold("WORDS")], { ink, heightMm: y }, widthMm, widths);
}

export type CoverRange = { name: string; value: string };

/** Normal ranges, on the gauge, of what the card's gauges show. */
export function coverRanges(card: CardDocument): CoverRange[] {
  return card.programme.parameters.flatMap(({ code, normal }) => {
    const instrument = pilotsGauge(card, code);
    if (!normal || !instrument) return [];
    const band = bandOnGauge(normal, instrument);
    const value = typeof band === "string" ? band : withUnit(bandText(band.low, band.high, instrument.unit), instrument.unit);
    return [{ name: instrument.gaugeName, value }];
  });
}

/** As many ranges across as the longest allows. */
export function normalRangesBlock(ranges: readonly CoverRange[], body: Body, widthMm: number, widths: FontWidths): Block {
  const widest = Math.max(...ranges.map((r) => textWidthMm(`${r.name}  ${r.value}`, "bold", body.sizePt, widths)));
  const across = Math.max(1, Math.min(3, Math.floor(widthMm / (widest + 2))));
  const ink: Ink = [];
  let y = 0;
  for (let at = 0; at < ranges.length; at += across) {
    const set: (readonly SetLine[])[] = ranges
      .slice(at, at + across)
      .map(({ name, value }) => setLines([bold(name), regular(`  ${value}`)], widthMm / across - 1, body.sizePt, widths));
    for (const [i, lines] of set.entries())
      inkLines(ink, lines, (i * widthMm) / across, y, body.pitchMm, { sizePt: body.sizePt, role: ROLE });
    y += Math.max(...set.map((lines) => lines.length)) * body.pitchMm;
  }
  return section([bold("NORMAL RANGES"), regular("  on the gauge")], { ink, heightMm: y }, widthMm, widths);
}

/** The actions in full and in order, one list a place where the card has points there. */
export function thenBlock(card: CardDocument, widthMm: number, widths: FontWidths): Block {
  const points = card.content.points;
  const there = (["air", "ground"] as const).filter((place) => points.some((p) => p.place === place));
  const places = there.length > 0 ? there : (["air"] as const);
  const ink: Ink = [];
  let y = 0;
  for (const place of places) {
    const part: Ink = [];
    const lead = places.length > 1 ? { air: "In the air", ground: "On the ground" }[place] : "";
    const heightMm = inkActions(part, lead, card.programme.thenActions[place], widthMm, widths);
    ink.push(...moved(part, 0, y));
    y += heightMm;
  }
  return section([bold("THEN"), regular("  in full, in this order")], { ink, heightMm: y }, widthMm, widths);
}

/** Numbered actions. Short ones share a line; a line breaks between actions before it breaks within one. */
function inkActions(ink: Ink, lead: string, actions: readonly string[], widthMm: number, widths: FontWidths): number {
  const gapMm = 5;
  const [first] = setLines([bold(lead)], widthMm, STEP_PT, widths);
  if (first) inkLines(ink, [first], 0, 0, STEP_PITCH_MM, { sizePt: STEP_PT, role: ROLE });
  let row = first ? 0 : -1;
  let x = first ? first.widthMm : widthMm;
  for (const [i, action] of actions.entries()) {
    const lines = setLines([bold(`${i + 1}`), regular(` ${action}`)], widthMm, STEP_PT, widths);
    const wide = lines[0]?.widthMm ?? 0;
    if (lines.length > 1 || x + gapMm + wide > widthMm) {
      row += 1;
      x = -gapMm;
    }
    inkLines(ink, lines, x + gapMm, row * STEP_PITCH_MM, STEP_PITCH_MM, { sizePt: STEP_PT, role: ROLE });
    row += lines.length - 1;
    x = lines.length > 1 ? widthMm : x + gapMm + wide;
  }
  return (row + 1) * STEP_PITCH_MM;
}

/** The card's points with the pages they stand on, and the remarks. */
export function pointsBlock(
  card: CardDocument,
  pages: ReadonlyMap<string, number>,
  body: Body,
  widthMm: number,
  widths: FontWidths,
): Block {
  const ink: Ink = [];
  const lettering = { sizePt: body.sizePt, role: ROLE };
  let y = 0;
  for (const [i, point] of card.content.points.entries()) {
    const runs = [bold(`${i + 1}  ${point.title}`), regular(`  ${point.durationMin} min, page ${pages.get(point.id) ?? "?"}`)];
    y += inkLines(ink, setLines(runs, widthMm, body.sizePt, widths), 0, y, body.pitchMm, lettering);
  }
  return section([bold("POINTS")], { ink, heightMm: y }, widthMm, widths);
}

export function remarksBlock(card: CardDocument, body: Body, widthMm: number, widths: FontWidths): Block | null {
  if (card.content.remarks.trim() === "") return null;
  const ink: Ink = [];
  const lines = setLines([regular(card.content.remarks)], widthMm, body.sizePt, widths);
  const heightMm = inkLines(ink, lines, 0, 0, body.pitchMm, { sizePt: body.sizePt, role: ROLE });
  return section([bold("REMARKS")], { ink, heightMm }, widthMm, widths);
}

/** The programme's notice and the caution, in stamp size, just above the foot. */
export function cautionBlock(card: CardDocument, widthMm: number, widths: FontWidths): Block {
  const ink: Ink = [];
  const runs: Run[][] = [...(card.programme.notice ? [[bold(card.programme.notice)]] : []), [regular(SHEET_CAUTION)]];
  const lines = runs.flatMap((run) => setLines(run, widthMm, STAMP_PT, widths));
  const heightMm = inkLines(ink, lines, 0, 0.4, STAMP_PITCH_MM, { sizePt: STAMP_PT, role: ROLE });
  return { ink, heightMm: heightMm + 0.8 };
}
