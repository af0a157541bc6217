import type { CardDocument } from "../card";
import type { FontWidths, SheetStamp } from "../sheet-types";
import type { CardState } from "../words";
import { type Frame, LABEL_PITCH_MM, LABEL_PT, RULE_MM, STAMP_PITCH_MM, STAMP_PT } from "./paper";
import { bold, capHeightMm, type Ink, inkLine, inkLines, inkRule, inkText, type Run, regular, setLines, textWidthMm } from "./typesetting";

export type Place = { number: number; of: number };
export type StateWord = "RELEASED" | "DRAFT" | "SUPERSEDED" | "WITHDRAWN";

const STATE_WORDS: Record<CardState, StateWord> = {
  draft: "DRAFT",
  "in review": "DRAFT",
  released: "RELEASED",
  superseded: "SUPERSEDED",
  withdrawn: "WITHDRAWN",
};

export function stateWord(state: CardState): StateWord {
  return STATE_WORDS[state];
}

/** The largest of the sizes at which a text fits, or the smallest. */
export function fittingPt(text: string, widthMm: number, sizesPt: readonly number[], widths: FontWidths): number {
  return sizesPt.find((pt) => textWidthMm(text, "bold", pt, widths) <= widthMm) ?? sizesPt.at(-1) ?? LABEL_PT;
}

export function cardAndRevision(card: CardDocument): string {
  return `CARD ${card.identity.number}  REV ${card.identity.letter}`;
}

/** Aircraft, card and revision, state and page: the strip at the head of a point page. Answers the height used. */
export function inkHeader(ink: Ink, card: CardDocument, word: StateWord, place: Place, frame: Frame, widths: FontWidths): number {
  const title = cardAndRevision(card);
  const middleMm = frame.widthMm * 0.4;
  const sideMm = (frame.widthMm - middleMm) / 2 - 1;
  const lettering = { sizePt: LABEL_PT, role: "header" as const };
  const side = (runs: Run[][]) => runs.flatMap((run) => setLines(run, sideMm, LABEL_PT, widths));
  const left = side([[bold(card.programme.aircraft.type)], [regular(card.programme.aircraft.registration)]]);
  const right = side([[bold(word)], [regular(`PAGE ${place.number} of ${place.of}`)]]);
  const sizePt = fittingPt(title, middleMm, [16, 14, 12], widths);
  const middle = setLines([bold(title)], middleMm, sizePt, widths);
  const middlePitch = middle.length === 1 ? 2 * LABEL_PITCH_MM : sizePt * 0.45;
  const heightMm = Math.max(Math.max(left.length, right.length, 2) * LABEL_PITCH_MM, middle.length * middlePitch);
  inkLines(ink, left, frame.leftMm, frame.topMm, LABEL_PITCH_MM, lettering);
  for (const [row, line] of right.entries()) {
    const baseline = frame.topMm + row * LABEL_PITCH_MM + (LABEL_PITCH_MM + capHeightMm(LABEL_PT)) / 2;
    inkLine(ink, line, frame.rightMm - line.widthMm, baseline, lettering);
  }
  for (const [row, line] of middle.entries()) {
    const baseline = frame.topMm + row * middlePitch + (middlePitch + capHeightMm(sizePt)) / 2;
    inkLine(ink, line, frame.leftMm + (frame.widthMm - line.widthMm) / 2, baseline, { sizePt, role: "header" });
  }
  inkRule(ink, frame.leftMm, frame.rightMm, frame.topMm + heightMm + 0.2, RULE_MM, "header");
  return heightMm + 0.4;
}

export const CODE_MM = 10.2;
const CODE_GAP_MM = 2;

/** "2031-05-04 17:20Z" of an ISO instant. */
export function stampTime(at: string): string {
  return `${at.slice(0, 10)} ${at.slice(11, 16)}Z`;
}

export function releaseRuns(stamp: SheetStamp | null): Run[] {
  return stamp === null ? [regular("not released")] : [regular(`released ${stamp.name} (${stamp.role}) ${stampTime(stamp.at)}`)];
}

function recordRuns(card: CardDocument, stamp: SheetStamp | null, place: Place): Run[] {
  const digest = stamp === null ? "no digest  " : `digest ${stamp.shortDigest}  code ${stamp.code}  `;
  return [regular(digest), bold(`${cardAndRevision(card)}  PAGE ${place.number} of ${place.of}`)];
}

/** A line about where the points go on, the release, and the record. The tallest form decides how high every foot is. */
export function footerHeightMm(card: CardDocument, stamp: SheetStamp | null, frame: Frame, widths: FontWidths): number {
  const widthMm = frame.widthMm - CODE_MM - CODE_GAP_MM;
  const rows = [releaseRuns(stamp), recordRuns(card, stamp, { number: 88, of: 88 })];
  const lines = rows.flatMap((runs) => setLines(runs, widthMm, STAMP_PT, widths)).length;
  return Math.max(CODE_MM + 0.4, (lines + 1) * STAMP_PITCH_MM);
}

/** The foot of a page, in the lowest heightMm of the frame. */
export function inkFooter(
  ink: Ink,
  {
    card,
    stamp,
    place,
    note,
    frame,
    heightMm,
  }: { card: CardDocument; stamp: SheetStamp | null; place: Place; note: string; frame: Frame; heightMm: number },
  widths: FontWidths,
): void {
  const widthMm = frame.widthMm - CODE_MM - CODE_GAP_MM;
  const lettering = { sizePt: STAMP_PT, role: "footer" as const };
  const record = [releaseRuns(stamp), recordRuns(card, stamp, place)].flatMap((runs) => setLines(runs, widthMm, STAMP_PT, widths));
  const noteLines = setLines([bold(note)], widthMm, STAMP_PT, widths);
  inkLines(ink, noteLines, frame.leftMm, frame.bottomMm - heightMm, STAMP_PITCH_MM, lettering);
  const topMm = frame.bottomMm - record.length * STAMP_PITCH_MM;
  inkLines(ink, record, frame.leftMm, topMm, STAMP_PITCH_MM, lettering);
  ink.push({ kind: "code", xMm: frame.rightMm - CODE_MM, yMm: frame.bottomMm - CODE_MM, sizeMm: CODE_MM, role: "footer" });
}

/** The state across the page, corner to corner, in outline: it hides no figure. */
export function inkWatermark(ink: Ink, word: StateWord, frame: Frame, widths: FontWidths): void {
  if (word === "RELEASED") return;
  const angle = Math.atan2(frame.heightMm, frame.widthMm);
  const room = Math.hypot(frame.widthMm, frame.heightMm) * 0.76;
  const sizePt = Math.min(120, room / textWidthMm(word, "bold", 1, widths));
  const sink = capHeightMm(sizePt) / 2;
  inkText(
    ink,
    bold(word),
    {
      xMm: frame.leftMm + frame.widthMm / 2 + sink * Math.sin(angle),
      baselineMm: frame.topMm + frame.heightMm / 2 + sink * Math.cos(angle),
      anchor: "middle",
    },
    { sizePt, role: "watermark" },
  );
  const drawn = ink.at(-1);
  if (drawn?.kind === "text") drawn.turnDeg = (-angle * 180) / Math.PI;
}
