import type { CardDocument } from "./card";
import { inkCoverHead, planCover } from "./sheet-layout/cover";
import { inkFooter, inkHeader, inkWatermark, type Place, stateWord } from "./sheet-layout/page-frame";
import { BLOCK_GAP_MM, type PagePlan, planPages, type Sheet, sheetOf } from "./sheet-layout/paginate";
import { MOST_CELLS, PAPERS } from "./sheet-layout/paper";
import { cellsInRow } from "./sheet-layout/point-cells";
import { type Ink, moved, shifted, unprintableLetters } from "./sheet-layout/typesetting";
import type { FontWidths, SheetOverflow, SheetPage, SheetPaper, SheetRegion, SheetStamp } from "./sheet-types";
import type { CardState } from "./words";

/** Part of every cache key of a drawn sheet: raise it whenever the same card would be drawn otherwise. */
export const SHEET_LAYOUT_VERSION = "3";

export type SheetOptions = { paper: SheetPaper; state: CardState; widths: FontWidths; stamp?: SheetStamp | null };

/** The pages of a sheet, and what cannot be laid out on them. */
export type MeasuredSheet = { pages: SheetPage[]; overflow: SheetOverflow[] };

/**
 * Lays a card out as pages of drawn items, in millimetres from the top left of the paper: the cover, then the points. Screen and PDF
 * draw exactly these. Nothing is cut off and nothing is set below its least size; see sheetOverflow for what then does not fit.
 */
export function layOutSheet(card: CardDocument, options: SheetOptions): SheetPage[] {
  return measuredSheet(card, options).pages;
}

/** The pages and what does not fit on them from one laying out, for whoever wants both at every change. */
export function measuredSheet(card: CardDocument, { paper, state, widths, stamp = null }: SheetOptions): MeasuredSheet {
  const sheet = sheetOf(card, paper, stamp, widths);
  const { pages, trouble } = planPages(sheet);
  const startsOn = (covers: number) =>
    new Map(pages.flatMap((page, i) => page.parts.filter((p) => p.part === 1).map((p) => [p.point.id, covers + i + 1] as const)));
  let cover = planCover(sheet, startsOn(1));
  if (cover.pages.length > 1) cover = planCover(sheet, startsOn(cover.pages.length));
  const of = cover.pages.length + pages.length;
  const covers = cover.pages.map((page, i) => coverPage(sheet, state, page, cover.roomMm, { number: i + 1, of }, pages.length > 0));
  return {
    pages: [...covers, ...pages.map((plan, i) => pointPage(sheet, state, plan, { number: covers.length + i + 1, of }))],
    overflow: [
      ...coverTrouble(cover.overMm),
      ...trouble.map(({ point, page, message }) => ({ point, page: page + covers.length - 1, message })),
      ...tooManyCells(card, startsOn(covers.length)),
      ...unprintable(card, widths),
    ],
  };
}

function paperOf({ paper }: Sheet): { widthMm: number; heightMm: number } {
  const { widthMm, heightMm } = PAPERS[paper];
  return { widthMm, heightMm };
}

function coverPage(
  sheet: Sheet,
  state: CardState,
  page: { ink: Ink; usedMm: number },
  roomMm: number,
  place: Place,
  more: boolean,
): SheetPage {
  const { card, stamp, frame, widths, footerMm: heightMm } = sheet;
  const items: Ink = [];
  inkWatermark(items, stateWord(state), frame, widths);
  inkCoverHead(items, sheet, stateWord(state), place);
  items.push(...page.ink);
  inkFooter(
    items,
    { card, stamp, place, note: more ? `limits, aborts and points: page ${place.number + 1}` : "", frame, heightMm },
    widths,
  );
  return { kind: "cover", ...place, ...paperOf(sheet), items, regions: [], usedMm: page.usedMm, roomMm };
}

function pointPage(sheet: Sheet, state: CardState, plan: PagePlan, place: Place): SheetPage {
  const { card, stamp, frame, widths, footerMm: heightMm } = sheet;
  const items: Ink = [];
  inkWatermark(items, stateWord(state), frame, widths);
  inkHeader(items, card, stateWord(state), place, frame, widths);
  let y = frame.topMm + sheet.headerMm + 1;
  items.push(...shifted(plan.list.ink, frame.leftMm, y)); // pages of one point share it
  y += plan.list.heightMm + 1.2;
  const regions: SheetRegion[] = [];
  for (const part of plan.parts) {
    items.push(...moved(part.ink, frame.leftMm, y));
    regions.push({
      point: part.point.id,
      part: part.part,
      parts: part.parts,
      xMm: frame.leftMm,
      yMm: y,
      widthMm: frame.widthMm,
      heightMm: part.heightMm,
    });
    y += part.heightMm + BLOCK_GAP_MM;
  }
  const rest = plan.parts.at(-1)?.rest ?? "";
  inkFooter(items, { card, stamp, place, note: rest === "" ? "" : `${rest}: page ${place.number + 1}`, frame, heightMm }, widths);
  const usedMm = plan.parts.reduce((sum, p) => sum + p.heightMm + BLOCK_GAP_MM, 0);
  return { kind: "points", ...place, ...paperOf(sheet), items, regions, usedMm, roomMm: plan.roomMm };
}

/** What cannot be laid out without cutting, and what the sheet's rules do not allow. A card with any of these is not released. */
export function sheetOverflow(card: CardDocument, widths: FontWidths, paper: SheetPaper = "a5"): SheetOverflow[] {
  return measuredSheet(card, { paper, state: "draft", widths }).overflow;
}

function tooManyCells(card: CardDocument, startsOn: ReadonlyMap<string, number>): SheetOverflow[] {
  return card.content.points.flatMap((point): SheetOverflow[] => {
    const cells = cellsInRow(point);
    if (cells <= MOST_CELLS) return [];
    const message = `The grid asks for ${cells} cells in a row. At most ${MOST_CELLS} fit: give the others to the recorder.`;
    return [{ point: point.id, page: startsOn.get(point.id) ?? null, message }];
  });
}

function coverTrouble(overMm: number): SheetOverflow[] {
  if (overMm <= 1) return [];
  const message = `The cover holds ${Math.ceil(overMm)} mm too much. Shorten the go/no-go lines, the words, the THEN actions or the remarks.`;
  return [{ point: null, page: 1, message }];
}

/** Letters that the typeface lacks would print as boxes: they are named instead. */
function unprintable(card: CardDocument, widths: FontWidths): SheetOverflow[] {
  const said = (letters: string[]) => `The sheet's typeface has no ${letters.map((l) => `“${l}”`).join(", ")}. Write it another way.`;
  const { programme, content } = card;
  const ofCard = [content.title, content.remarks, ...programme.goNoGo, ...programme.callWords.flatMap((w) => [w.word, w.meaning])];
  const ofLines = [
    ...Object.values(programme.thenLine),
    ...programme.thenActions.air,
    ...programme.thenActions.ground,
    programme.notice ?? "",
  ];
  const onCover = unprintableLetters([...ofCard, ...ofLines].join(" "), widths);
  return [
    ...(onCover.length > 0 ? [{ point: null, page: 1, message: said(onCover) }] : []),
    ...content.points.flatMap((point): SheetOverflow[] => {
      const heads = point.readings.flatMap((r) => [r.label, r.cellHead, ...r.choices]);
      const events = point.aborts.lines.flatMap((l) => (l.kind === "event" ? [l.text] : []));
      const words = [point.title, point.entryText, point.recovery, ...point.steps.map((s) => s.text), ...(point.grid?.rows ?? [])];
      const letters = unprintableLetters([...words, ...heads, ...events, ...point.limits.map((l) => l.label)].join(" "), widths);
      return letters.length === 0 ? [] : [{ point: point.id, page: null, message: said(letters) }];
    }),
  ];
}
