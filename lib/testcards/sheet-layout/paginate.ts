import type { CardDocument, CardPoint, Reading } from "../card";
import type { FontWidths, SheetPaper, SheetStamp } from "../sheet-types";
import { abortList, pageKey } from "./abort-lines";
import { limitLines } from "./limit-lines";
import { listBlock } from "./list-block";
import { footerHeightMm, inkHeader } from "./page-frame";
import { type Frame, RULE_MM, usableFrame } from "./paper";
import { gridBlocks, isReadFirst, outcomeBlock, singleBlocks } from "./point-cells";
import { type Block, leadBlocks, titleBlock } from "./point-lead";
import { type Ink, moved, shifted } from "./typesetting";

export const BLOCK_GAP_MM = 1;
const HEAD_GAP_MM = 1;
const LIST_GAP_MM = 1.2;
const FOOT_GAP_MM = 0.8;

export type Sheet = {
  card: CardDocument;
  paper: SheetPaper;
  stamp: SheetStamp | null;
  widths: FontWidths;
  frame: Frame;
  headerMm: number;
  footerMm: number;
};

/** What a point is made of, top to bottom. `head` is drawn before the first row of every part. */
type Member = { kind: "lead" | "row" | "single" | "outcome"; block: Block; head: Block | null; label: string };
type Whole = { point: CardPoint; numberOnCard: number; members: Member[] };

/** What of a point stands on one page. */
export type Part = { point: CardPoint; part: number; parts: number; ink: Ink; heightMm: number; rest: string };
export type PagePlan = { parts: Part[]; points: CardPoint[]; list: Block; roomMm: number };

export type Trouble = { point: string; page: number; message: string };

export function sheetOf(card: CardDocument, paper: SheetPaper, stamp: SheetStamp | null, widths: FontWidths): Sheet {
  const frame = usableFrame(paper);
  const headerMm = inkHeader([], card, "SUPERSEDED", { number: 88, of: 88 }, frame, widths);
  return { card, paper, stamp, widths, frame, headerMm, footerMm: footerHeightMm(card, stamp, frame, widths) };
}

/** What the foot calls single readings that stand on the next page: by name where they are read before the grid, lest they be missed. */
function singlesName(point: CardPoint): string {
  const singles = point.readings.filter((r) => r.onSheet === "single");
  const names = singles.map((r) => r.label).join(", ");
  return singles.every(isReadFirst) && names.length <= LONGEST_NAMES ? names : "";
}

const FIRST_PAGE_ROWS = 5;
const LONGEST_NAMES = 36; // the foot's note has one line

/** A point's parts in the order in which they are read, unless that would cost the first page one of five rows of the grid. */
function wholeOf(sheet: Sheet, point: CardPoint, index: number, roomMm: number): Whole {
  const { card, paper, widths, frame } = sheet;
  const across = { paper, widthMm: frame.widthMm, widths };
  const member =
    (kind: Member["kind"]) =>
    (block: Block): Member => ({ kind, block, head: null, label: "" });
  const rows = gridBlocks(card, point, across).flatMap(({ head, rows, labels }) =>
    rows.map((block, i): Member => ({ kind: "row", block, head, label: labels[i] ?? "" })),
  );
  const leads = leadBlocks(card, point, frame.widthMm, widths).map(member("lead"));
  const singles = (wanted: (reading: Reading) => boolean) => singleBlocks(card, point, across, wanted).map(member("single"));
  const outcome = member("outcome")(outcomeBlock(frame.widthMm));
  const whole = (members: Member[]): Whole => ({ point, numberOnCard: index + 1, members });
  const label = singlesName(point);
  const after = whole([...leads, ...rows, ...singles(() => true).map((single) => ({ ...single, label })), outcome]);
  if (rows.length === 0 || !point.readings.some(isReadFirst)) return after;
  const first = whole([...leads, ...singles(isReadFirst), ...rows, ...singles((reading) => !isReadFirst(reading)), outcome]);
  const kept = Math.min(FIRST_PAGE_ROWS, rowsOnFirstPage(sheet, after, roomMm));
  return rowsOnFirstPage(sheet, first, roomMm) < kept ? after : first;
}

function rowsOnFirstPage({ frame, widths }: Sheet, { numberOnCard, point, members }: Whole, roomMm: number): number {
  const title = titleBlock(numberOnCard, point, false, frame.widthMm, widths);
  return members.slice(0, takes(title.heightMm, members, roomMm)).filter((m) => m.kind === "row").length;
}

const LEAD_AIR_MM = 0.5;

/** Heights of a title with none, one, two … of the members under it, grid heads included. */
function stackedMm(titleMm: number, members: readonly Member[]): number[] {
  const heights = [titleMm];
  let height = titleMm;
  let head: Block | null = null;
  for (const member of members) {
    if (member.head !== null && member.head !== head) height += member.head.heightMm;
    if (member.kind === "lead" && head === null) height += member === members[0] ? LEAD_AIR_MM : 0;
    head = member.head;
    height += member.block.heightMm;
    heights.push(height);
  }
  return heights;
}

/** How many members stand within heightMm. */
function fitting(heights: readonly number[], heightMm: number): number {
  const over = heights.findIndex((height, count) => count > 0 && height > heightMm);
  return over < 0 ? heights.length - 1 : over - 1;
}

function drawPart(sheet: Sheet, whole: Whole, part: number, members: readonly Member[], rest: readonly Member[]): Part {
  const { frame, widths } = sheet;
  const title = titleBlock(whole.numberOnCard, whole.point, part > 1, frame.widthMm, widths);
  const ink: Ink = [...title.ink];
  let y = title.heightMm;
  let head: Block | null = null;
  for (const member of members) {
    if (member.head !== null && member.head !== head) {
      ink.push(...shifted(member.head.ink, 0, y)); // drawn again on the next page
      y += member.head.heightMm;
    }
    if (member.kind === "lead" && member === members[0]) y += LEAD_AIR_MM;
    head = member.head;
    ink.push(...moved(member.block.ink, 0, y));
    y += member.block.heightMm;
  }
  ink.push({ kind: "rect", xMm: 0, yMm: 0, widthMm: frame.widthMm, heightMm: y, strokeMm: RULE_MM, filled: false, role: "point" });
  return { point: whole.point, part, parts: 1, ink, heightMm: y, rest: restWords(rest) };
}

const LONGEST_LABEL = 8;

/** Rows by the names they carry on the sheet, for a pilot looks for those; by their count where the names are long or none. */
function rowWords(labels: readonly string[]): string[] {
  const [first = "", last = first] = [labels[0], labels.at(-1)];
  if (labels.length === 0) return [];
  const named = [first, last].every((label) => label.trim() !== "" && label.length <= LONGEST_LABEL);
  if (labels.length === 1) return [named ? `row ${first}` : "1 row"];
  return [named ? `rows ${first} to ${last}` : `${labels.length} rows`];
}

/** "rows 6 to 11 and the outcome boxes": what the reader finds on the next page. */
function restWords(rest: readonly Member[]): string {
  if (rest.length === 0) return "";
  const left = rest.filter((m) => m.kind === "row");
  const words = [
    ...(rest.some((m) => m.kind === "lead") ? ["the rest of the steps"] : []),
    ...rowWords(left.map((m) => m.label)),
    ...rest
      .filter((m) => m.kind === "single")
      .slice(0, 1)
      .map((m) => m.label || "the single readings"),
    "the outcome boxes",
  ];
  return words.length === 1 ? (words[0] ?? "") : `${words.slice(0, -1).join(", ")} and ${words.at(-1)}`;
}

/** How many members may be set in heightMm: never a lead without its first cells, never the outcome boxes alone on the next page. */
function takes(titleMm: number, members: readonly Member[], heightMm: number): number {
  const count = fitting(stackedMm(titleMm, members), heightMm + 1e-6);
  if (count === members.length) return count;
  const leads = members.filter((m) => m.kind === "lead").length;
  if (count <= leads) return 0;
  const onlyOutcomeLeft = count === members.length - 1;
  return onlyOutcomeLeft && count - 1 > leads ? count - 1 : count;
}

export function planPages(sheet: Sheet): { pages: PagePlan[]; trouble: Trouble[] } {
  const { card, widths, frame } = sheet;
  const all = card.content.points;
  const limitsOf = limitLines(card);
  const fixedMm = sheet.headerMm + HEAD_GAP_MM + LIST_GAP_MM + FOOT_GAP_MM + sheet.footerMm;
  const abortsOf = new Map(all.map((point) => [point, abortList(card, point)]));
  const keys = new Map([...abortsOf].map(([point, aborts]) => [point, pageKey(point, aborts)]));
  const blank = (points: CardPoint[]): PagePlan => {
    const [first] = points;
    const then = first?.place === "ground" ? card.programme.thenLine.ground : card.programme.thenLine.air;
    const aborts = (first && abortsOf.get(first)) ?? { ifReached: false, lines: [], events: [] };
    const list = listBlock(limitsOf(points), aborts, then, frame.widthMm, widths);
    return { parts: [], points, list, roomMm: frame.heightMm - fixedMm - list.heightMm };
  };
  const pages: PagePlan[] = [];
  const trouble: Trouble[] = [];
  const usedMm = (page: PagePlan) => page.parts.reduce((sum, p) => sum + p.heightMm + BLOCK_GAP_MM, 0);
  const pageNumber = () => pages.length + 1; // the cover is page 1

  /** The open page with one more point on it, if the point's abort list and place are the page's own. */
  const joined = (point: CardPoint): PagePlan | null => {
    const open = pages.at(-1);
    const [first] = open?.points ?? [];
    if (!open || !first || keys.get(first) !== keys.get(point)) return null;
    const page = { ...blank([...open.points, point]), parts: open.parts };
    return usedMm(page) <= page.roomMm ? page : null;
  };

  for (const [index, point] of all.entries()) {
    const fresh = blank([point]);
    const whole = wholeOf(sheet, point, index, fresh.roomMm);
    const titleMm = (part: number) => titleBlock(whole.numberOnCard, point, part > 1, frame.widthMm, widths).heightMm;
    let members = whole.members;
    const together = joined(point);
    const here = together === null ? 0 : takes(titleMm(1), members, together.roomMm - usedMm(together));
    const wholeOnFresh = (stackedMm(titleMm(1), members).at(-1) ?? 0) <= fresh.roomMm;
    if (together && (here === members.length || (here > 0 && !wholeOnFresh))) pages[pages.length - 1] = together;
    else pages.push(fresh);
    for (let part = 1; members.length > 0; part += 1) {
      if (part > 1) pages.push({ ...fresh, parts: [] });
      const page = pages.at(-1) ?? fresh;
      let count = takes(titleMm(part), members, page.roomMm - usedMm(page));
      if (count === 0) {
        const heights = stackedMm(titleMm(part), members);
        count = Math.max(1, fitting(heights, page.roomMm)); // at least one, so that the point is never lost
        const wholeLead = members.slice(count).every((m) => m.kind !== "lead");
        const high = heights[count] ?? 0;
        if (!wholeLead || high > page.roomMm + 1e-6) {
          trouble.push({ point: point.id, page: pageNumber(), message: crampedMessage(whole, high - page.roomMm, page) });
        }
      }
      page.parts.push(drawPart(sheet, whole, part, members.slice(0, count), members.slice(count)));
      members = members.slice(count);
      if (members.length === 0) for (const p of pages.flatMap((page) => page.parts)) if (p.point === point) p.parts = part;
    }
  }
  return { pages, trouble };
}

function crampedMessage({ numberOnCard, point }: Whole, overMm: number, page: PagePlan): string {
  const what = `Point ${numberOnCard}, ${point.title}`;
  if (overMm > 0) {
    const room = Math.round(Math.max(0, page.roomMm));
    return `${what}: the page has ${room} mm for points, ${Math.ceil(overMm)} mm too little. Shorten its text or the limits and aborts.`;
  }
  return `${what}: entry, steps and recovery do not fit on one page. Shorten them or split the point.`;
}
