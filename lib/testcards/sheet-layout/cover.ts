import {
  BODIES,
  type Body,
  blanksBlock,
  type CoverRange,
  cautionBlock,
  coverRanges,
  figuresBlock,
  goNoGoBlock,
  normalRangesBlock,
  pointsBlock,
  remarksBlock,
  thenBlock,
  wordsBlock,
} from "./cover-sections";
import { fittingPt, type Place, type StateWord } from "./page-frame";
import type { Sheet } from "./paginate";
import { HEAVY_MM, LABEL_PT, RULE_MM } from "./paper";
import type { Block } from "./point-lead";
import {
  bold,
  capHeightMm,
  type Ink,
  inkBox,
  inkLine,
  inkLines,
  inkRule,
  inkText,
  moved,
  regular,
  setLines,
  textWidthMm,
} from "./typesetting";

const ROLE = "header" as const;
const REV_BOX_MM = 11;
const TITLE_PT = 14;
const SECTION_GAP_MM = 0.6;

/** The cover's head: what flies, which card, which revision in large type, and the state. Answers the height used. */
export function inkCoverHead(ink: Ink, { card, frame, widths }: Sheet, word: StateWord, place: Place): number {
  const { aircraft } = card.programme;
  const half = frame.widthMm / 2 - 2;
  const small = { sizePt: 12, role: ROLE };
  const left = setLines([bold(aircraft.type), regular(`  ${aircraft.registration}`)], half, 12, widths);
  const right = setLines([bold(word), regular(`  COVER  PAGE ${place.number} of ${place.of}`)], half, LABEL_PT, widths);
  const topMm = inkLines(ink, left, frame.leftMm, frame.topMm, 5.3, small);
  for (const [row, line] of right.entries()) {
    const baseline = frame.topMm + row * 5.3 + (5.3 + capHeightMm(LABEL_PT)) / 2;
    inkLine(ink, line, frame.rightMm - line.widthMm, baseline, { sizePt: LABEL_PT, role: ROLE });
  }
  let y = frame.topMm + Math.max(topMm, right.length * 5.3) + 1;
  y += inkRevision(ink, card, frame, y, widths);
  inkRule(ink, frame.leftMm, frame.rightMm, y + 0.4, RULE_MM, ROLE);
  return y + 0.6 - frame.topMm;
}

/** Card, title and revision on one row where the title fits between them, else the title below. Answers the height used. */
function inkRevision(ink: Ink, { identity, content }: Sheet["card"], frame: Sheet["frame"], yMm: number, widths: Sheet["widths"]): number {
  const revision = `REV ${identity.letter}`;
  const number = `CARD ${identity.number}`;
  const boxMm = textWidthMm(revision, "bold", 24, widths) + 8;
  const room = frame.widthMm - boxMm - 3;
  const box = {
    xMm: frame.rightMm - boxMm + HEAVY_MM / 2,
    yMm: yMm + HEAVY_MM / 2,
    widthMm: boxMm - HEAVY_MM,
    heightMm: REV_BOX_MM - HEAVY_MM,
  };
  inkBox(ink, box, HEAVY_MM, ROLE);
  const baselineMm = yMm + (REV_BOX_MM + capHeightMm(24)) / 2;
  inkText(ink, bold(revision), { xMm: frame.rightMm - boxMm / 2, baselineMm, anchor: "middle" }, { sizePt: 24, role: ROLE });
  const sizePt = fittingPt(number, room, [24, 18, 14], widths);
  const lines = setLines([bold(number)], room, sizePt, widths);
  const numberMm = inkLines(ink, lines, frame.leftMm, yMm, lines.length === 1 ? REV_BOX_MM : sizePt * 0.45, { sizePt, role: ROLE });
  const heightMm = Math.max(REV_BOX_MM, numberMm) + 0.6;
  const [title, ...more] = setLines([bold(content.title)], frame.widthMm, TITLE_PT, widths);
  const besideMm = (lines[0]?.widthMm ?? 0) + 6;
  if (title && more.length === 0 && lines.length === 1 && besideMm + title.widthMm <= room) {
    inkLine(ink, title, frame.leftMm + besideMm, baselineMm, { sizePt: TITLE_PT, role: ROLE });
    return heightMm;
  }
  const below = title ? [title, ...more] : [];
  return heightMm + inkLines(ink, below, frame.leftMm, yMm + heightMm, 6.2, { sizePt: TITLE_PT, role: ROLE });
}

type SameInAnyType = { figures: Block; actions: Block; ranges: CoverRange[] };

function sectionsIn(sheet: Sheet, same: SameInAnyType, body: Body, pages: ReadonlyMap<string, number>, withPoints: boolean): Block[] {
  const { card, frame, widths } = sheet;
  const wide = frame.widthMm;
  return [
    blanksBlock(wide),
    same.figures,
    ...(card.programme.goNoGo.length > 0 ? [goNoGoBlock(card, body, wide, widths)] : []),
    ...(card.programme.callWords.length > 0 ? [wordsBlock(card, body, wide, widths)] : []),
    ...(same.ranges.length > 0 ? [normalRangesBlock(same.ranges, body, wide, widths)] : []),
    same.actions,
    ...(withPoints && card.content.points.length > 0 ? [pointsBlock(card, pages, body, wide, widths)] : []),
    ...[remarksBlock(card, body, wide, widths)].filter((block) => block !== null),
  ];
}

export type CoverPlan = { pages: { ink: Ink; usedMm: number }[]; roomMm: number; overMm: number };

const stack = (blocks: readonly Block[]) => blocks.reduce((sum, b) => sum + b.heightMm + SECTION_GAP_MM, 0);

/** The cover in the largest type that fits one page. In the least type what does not fit goes to a second cover page, whole. */
export function planCover(sheet: Sheet, pages: ReadonlyMap<string, number>): CoverPlan {
  const { card, frame, widths, footerMm } = sheet;
  const headMm = inkCoverHead([], sheet, "SUPERSEDED", { number: 8, of: 88 });
  const caution = cautionBlock(card, frame.widthMm, widths);
  const roomMm = frame.heightMm - headMm - caution.heightMm - footerMm - 1;
  // The list of points is a help, not a must: it goes before the type gets smaller.
  const same = {
    figures: figuresBlock(card, frame.widthMm, widths),
    actions: thenBlock(card, frame.widthMm, widths),
    ranges: coverRanges(card),
  };
  let blocks: Block[] = [];
  for (const [body, withPoints] of BODIES.flatMap((body) => [[body, true] as const, [body, false] as const])) {
    blocks = sectionsIn(sheet, same, body, pages, withPoints);
    if (stack(blocks) <= roomMm) break;
  }
  const plan: CoverPlan = { pages: [{ ink: [], usedMm: 0 }], roomMm, overMm: Math.max(0, stack(blocks) - roomMm) };
  for (const block of blocks) {
    let page = plan.pages.at(-1);
    if (!page || (page.usedMm > 0 && page.usedMm + block.heightMm > roomMm)) {
      page = { ink: [], usedMm: 0 };
      plan.pages.push(page);
    }
    page.ink.push(...moved(block.ink, frame.leftMm, frame.topMm + headMm + SECTION_GAP_MM + page.usedMm));
    page.usedMm += block.heightMm + SECTION_GAP_MM;
  }
  const cautionTopMm = frame.bottomMm - footerMm - caution.heightMm;
  plan.pages[0]?.ink.push(...moved(caution.ink, frame.leftMm, cautionTopMm));
  return plan;
}
