import type { CardDocument, CardPoint } from "../card";
import type { FontWidths, SheetPaper, SheetStamp } from "../sheet-types";
import { abortList, pageKey } from "./abort-lines";
import { limitLines } from "./limit-lines";
import { listBlock } from "./list-block";
import { footerHeightMm, inkHeader } from "./page-frame";
import { type Frame, RULE_MM, usableFrame } from "./paper";
import { gridBlocks, outcomeBlock, singleBlocks } from "./point-cells";
import { type Block, leadBlocks, titleBlock } from "./point-lead";
import type { Ink } from "./typesetting";

export const BLOCK_GAP_MM = 1;
const HEAD_GAP_MM = 1;
const LIST_GAP_MM = 1.2;
const FOOT_GAP_MM = 0.8;

export type Sheet = { card: CardDocument; paper: SheetPaper; stamp: SheetStamp | null; widths: FontWidths; frame: Frame };

/** What a point is made of, top to bottom. `head` is drawn before the first row of every part. */
type Member = { kind: "lead" | "row" | "single" | "outcome"; block: Block; head: Block | null; label: string };
type Whole = { point: CardPoint; numberOnCard: number; members: Member[] };

/** What of a point stands on one page. */
export type Part = { point: CardPoint; part: number; parts: number; ink: Ink; heightMm: number; rest: string };
export type PagePlan = { parts: Part[]; points: CardPoint[]; list: Block; roomMm: number };

export type Trouble = { point: string; page: number; message: string };

export function sheetOf(card: CardDocument, paper: SheetPaper, stamp: SheetStamp | null, widths: FontWidths): Sheet {
  return { card, paper, stamp, widths, frame: usableFrame(paper) };
}

export function headerHeightMm({ card, frame, widths }: Sheet): number {
  return inkHeader([], card, "SUPERSEDED", { number: 88, of: 88 }, frame, widths);
}

function wholeOf(sheet: Sheet, point: CardPoint, index: number): Whole {
  const { card, paper, widths, frame } = sheet;
  const across = { paper, widthMm: frame.widthMm, widths };
  const member =
    (kind: Member["kind"]) =>
    (block: Block): Member => ({ kind, block, head: null, label: "" });
  const rows = gridBlocks(card, point, across).flatMap(({ head, rows, labels }) =>
    rows.map((block, i): Member => ({ kind: "row", block, head, label: labels[i] ?? "" })),
  );
  return {
    point,
    numberOnCard: index + 1,
    members: [
      ...leadBlocks(card, point, frame.widthMm, widths).map(member("lead")),
      ...rows,
      ...singleBlocks(card, point, across).map(member("single")),
      member("outcome")(outcomeBlock(frame.widthMm)),
    ],
  };
}

const LEAD_AIR_MM = 0.5;

/** Height of a run of members under a title, grid heads included. */
function stackedMm(titleMm: number, members: readonly Member[]): number {
  let height = titleMm;
  let head: Block | null = null;
  for (const member of members) {
    if (member.head !== null && member.head !== head) height += member.head.heightMm;
    if (member.kind === "lead" && head === null) height += member === members[0] ? LEAD_AIR_MM : 0;
    head = member.head;
    height += member.block.heightMm;
  }
  return height;
}

function put(ink: Ink, block: Block, yMm: number): void {
  for (const item of block.ink) {
    if (item.kind === "text") ink.push({ ...item, baselineMm: item.baselineMm + yMm });
    else if (item.kind === "line") ink.push({ ...item, y1Mm: item.y1Mm + yMm, y2Mm: item.y2Mm + yMm });
    else ink.push({ ...item, yMm: item.yMm + yMm });
  }
}

function drawPart(sheet: Sheet, whole: Whole, part: number, members: readonly Member[], rest: readonly Member[]): Part {
  const { frame, widths } = sheet;
  const ink: Ink = [];
  const title = titleBlock(whole.numberOnCard, whole.point, part > 1, frame.widthMm, widths);
  put(ink, title, 0);
  let y = title.heightMm;
  let head: Block | null = null;
  for (const member of members) {
    if (member.head !== null && member.head !== head) {
      put(ink, member.head, y);
      y += member.head.heightMm;
    }
    if (member.kind === "lead" && member === members[0]) y += LEAD_AIR_MM;
    head = member.head;
    put(ink, member.block, y);
    y += member.block.heightMm;
  }
  ink.push({ kind: "rect", xMm: 0, yMm: 0, widthMm: frame.widthMm, heightMm: y, strokeMm: RULE_MM, filled: false, role: "point" });
  return { point: whole.point, part, parts: 1, ink, heightMm: y, rest: restWords(whole.members, rest) };
}

/** "rows 6 to 11 and the outcome boxes": what the reader finds on the next page. */
function restWords(all: readonly Member[], rest: readonly Member[]): string {
  if (rest.length === 0) return "";
  const rows = all.filter((m) => m.kind === "row");
  const left = rest.filter((m) => m.kind === "row");
  const first = rows.indexOf(left[0] as Member) + 1;
  const words = [
    ...(rest.some((m) => m.kind === "lead") ? ["the rest of the steps"] : []),
    ...(left.length === 1 ? [`row ${first}`] : left.length > 1 ? [`rows ${first} to ${rows.length}`] : []),
    ...(rest.some((m) => m.kind === "single") ? ["the single readings"] : []),
    "the outcome boxes",
  ];
  return words.length === 1 ? (words[0] ?? "") : `${words.slice(0, -1).join(", ")} and ${words.at(-1)}`;
}

/** How many members may be set in heightMm: never a lead without its first cells, never the outcome boxes alone on the next page. */
function takes(titleMm: number, members: readonly Member[], heightMm: number): number {
  let count = 0;
  while (count < members.length && stackedMm(titleMm, members.slice(0, count + 1)) <= heightMm + 1e-6) count += 1;
  if (count === members.length) return count;
  const leads = members.filter((m) => m.kind === "lead").length;
  if (count <= leads) return 0;
  const onlyOutcomeLeft = count === members.length - 1;
  return onlyOutcomeLeft && count - 1 > leads ? count - 1 : count;
}

export function planPages(sheet: Sheet): { pages: PagePlan[]; trouble: Trouble[] } {
  const { card, widths, frame, stamp } = sheet;
  const all = card.content.points;
  const fixedMm = headerHeightMm(sheet) + HEAD_GAP_MM + LIST_GAP_MM + FOOT_GAP_MM + footerHeightMm(card, stamp, frame, widths);
  const blank = (points: CardPoint[]): PagePlan => {
    const [first] = points;
    const then = first?.place === "ground" ? card.programme.thenLine.ground : card.programme.thenLine.air;
    const aborts = first ? abortList(card, first) : { ifReached: false, lines: [], events: [] };
    const list = listBlock(limitLines(card, points, all), aborts, then, frame.widthMm, widths);
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
    if (!open || !first || pageKey(card, first) !== pageKey(card, point)) return null;
    const page = { ...blank([...open.points, point]), parts: open.parts };
    return usedMm(page) <= page.roomMm ? page : null;
  };

  for (const [index, point] of all.entries()) {
    const whole = wholeOf(sheet, point, index);
    const titleMm = (part: number) => titleBlock(whole.numberOnCard, point, part > 1, frame.widthMm, widths).heightMm;
    const fresh = blank([point]);
    let members = whole.members;
    const together = joined(point);
    const here = together === null ? 0 : takes(titleMm(1), members, together.roomMm - usedMm(together));
    const wholeOnFresh = stackedMm(titleMm(1), members) <= fresh.roomMm;
    if (together && (here === members.length || (here > 0 && !wholeOnFresh))) pages[pages.length - 1] = together;
    else pages.push(fresh);
    for (let part = 1; members.length > 0; part += 1) {
      if (part > 1) pages.push(blank([point]));
      const page = pages.at(-1) ?? fresh;
      let count = takes(titleMm(part), members, page.roomMm - usedMm(page));
      if (count === 0) {
        count = crammed(titleMm(part), members, page.roomMm);
        const wholeLead = members.slice(count).every((m) => m.kind !== "lead");
        const high = stackedMm(titleMm(part), members.slice(0, count));
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

/** As many members as fit when the rule about leads cannot be kept; at least one, so that the point is never lost. */
function crammed(titleMm: number, members: readonly Member[], roomMm: number): number {
  let count = 1;
  while (count < members.length && stackedMm(titleMm, members.slice(0, count + 1)) <= roomMm) count += 1;
  return count;
}

function crampedMessage({ numberOnCard, point }: Whole, overMm: number, page: PagePlan): string {
  const what = `Point ${numberOnCard}, ${point.title}`;
  if (overMm > 0) {
    const room = Math.round(Math.max(0, page.roomMm));
    return `${what}: the page has ${room} mm for points, ${Math.ceil(overMm)} mm too little. Shorten its text or the limits and aborts.`;
  }
  return `${what}: entry, steps and recovery do not fit on one page. Shorten them or split the point.`;
}
