import { B612_WIDTHS } from "@/lib/testcards/b612-widths";
import { textWidthMm } from "@/lib/testcards/sheet-layout/typesetting";
import type { FontWeight, SheetItem, SheetPage } from "@/lib/testcards/sheet-types";

export const PT_PER_MM = 72 / 25.4;
const INK = "#000000";
const PAPER = "#ffffff";
const OUTLINE_PT = 0.5;

/** What is used of the canvas that the PDF library hands out. */
export type Painter = {
  save(): Painter;
  restore(): Painter;
  rotate(degrees: number, options: { origin: [number, number] }): Painter;
  font(file: string): Painter;
  fontSize(pt: number): Painter;
  text(
    text: string,
    x: number,
    y: number,
    options: { lineBreak: boolean; baseline: string; fill: boolean; stroke: boolean; features: { kern: boolean } },
  ): Painter;
  fillColor(colour: string): Painter;
  strokeColor(colour: string): Painter;
  lineWidth(pt: number): Painter;
  rect(x: number, y: number, width: number, height: number): Painter;
  circle(x: number, y: number, radius: number): Painter;
  moveTo(x: number, y: number): Painter;
  lineTo(x: number, y: number): Painter;
  fill(): Painter;
  stroke(): Painter;
};

export type FontFiles = Record<FontWeight, string>;

/** The modules of a QR, dark where true. */
export type CodeModules = { size: number; dark: (row: number, column: number) => boolean };

const pt = (mm: number) => mm * PT_PER_MM;

type TextItem = Extract<SheetItem, { kind: "text" }>;

function paintText(painter: Painter, fonts: FontFiles, item: TextItem): void {
  const outlined = item.role === "watermark";
  const widthMm = textWidthMm(item.text, item.weight, item.sizePt, B612_WIDTHS);
  const share = { start: 0, middle: 0.5, end: 1 }[item.anchor];
  const origin: [number, number] = [pt(item.xMm), pt(item.baselineMm)];
  painter.save();
  if (item.turnDeg) painter.rotate(item.turnDeg, { origin });
  painter
    .fillColor(item.reversed ? PAPER : INK)
    .strokeColor(INK)
    .lineWidth(OUTLINE_PT);
  painter.font(fonts[item.weight]).fontSize(item.sizePt);
  // The core measured without kerning.
  const options = { lineBreak: false, baseline: "alphabetic", fill: !outlined, stroke: outlined, features: { kern: false } };
  painter.text(item.text, origin[0] - pt(widthMm * share), origin[1], options).restore();
}

function paintCode(
  painter: Painter,
  fonts: FontFiles,
  { xMm, yMm, sizeMm }: Extract<SheetItem, { kind: "code" }>,
  code: CodeModules | null,
): void {
  if (code === null) {
    painter.lineWidth(pt(0.2)).strokeColor(INK).rect(pt(xMm), pt(yMm), pt(sizeMm), pt(sizeMm)).stroke();
    for (const [row, text] of ["no", "code:", "draft"].entries()) {
      const baselineMm = yMm + sizeMm / 2 + 1.05 + (row - 1) * 3;
      const at = { xMm: xMm + sizeMm / 2, baselineMm, anchor: "middle", reversed: false, role: "footer" } as const;
      paintText(painter, fonts, { kind: "text", text, sizePt: 8, weight: "regular", ...at });
    }
    return;
  }
  const side = pt(sizeMm) / code.size;
  for (let row = 0; row < code.size; row += 1) {
    for (let column = 0; column < code.size; column += 1) {
      let run = 0;
      while (column + run < code.size && code.dark(row, column + run)) run += 1;
      if (run > 0) painter.rect(pt(xMm) + column * side, pt(yMm) + row * side, run * side, side);
      column += run;
    }
  }
  painter.fillColor(INK).fill();
}

function paintItem(painter: Painter, fonts: FontFiles, item: SheetItem, code: CodeModules | null): void {
  switch (item.kind) {
    case "text":
      paintText(painter, fonts, item);
      return;
    case "code":
      paintCode(painter, fonts, item, code);
      return;
    case "line":
      painter.moveTo(pt(item.x1Mm), pt(item.y1Mm)).lineTo(pt(item.x2Mm), pt(item.y2Mm));
      break;
    case "circle":
      painter.circle(pt(item.xMm), pt(item.yMm), pt(item.radiusMm));
      break;
    default:
      painter.rect(pt(item.xMm), pt(item.yMm), pt(item.widthMm), pt(item.heightMm));
  }
  if (item.kind === "rect" && item.filled) painter.fillColor(INK).fill();
  else painter.lineWidth(pt(item.strokeMm)).strokeColor(INK).stroke();
}

/** Draws one page's items where they stand, in order, black only. */
export function paintPage(painter: Painter, fonts: FontFiles, page: SheetPage, code: CodeModules | null): void {
  for (const item of page.items) paintItem(painter, fonts, item, code);
}
