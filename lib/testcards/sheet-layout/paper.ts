import type { SheetPaper } from "../sheet-types";

/**
 * Paper, margins and least sizes of the kneeboard sheet, in mm and pt.
 *
 * Source    A5: ISO 216. Half letter: ANSI letter halved, in the round 140 × 216 mm that printers' drivers use.
 *           Type: NASA CR-177605 advises an x-height of 2.5 mm, about 14 pt, for what matters, and a line gap of 25 to 33 %.
 *           Margins, cells and the other sizes: common practice, no source.
 */
export const PAPERS: Record<SheetPaper, { widthMm: number; heightMm: number; cellWidthMm: number; cellHeightMm: number }> = {
  a5: { widthMm: 148, heightMm: 210, cellWidthMm: 20, cellHeightMm: 10 },
  "half-letter": { widthMm: 140, heightMm: 216, cellWidthMm: 18, cellHeightMm: 9 },
};

export const TOP_MARGIN_MM = 15; // the clip
export const MARGIN_MM = 8;
export const LABEL_COLUMN_MM = 12;
export const MOST_CELLS = 6;

export const LIMIT_PT = 14;
export const STEP_PT = 12;
export const LABEL_PT = 10;
export const STAMP_PT = 8;

export const LIMIT_PITCH_MM = 6.2; // 14 pt with a gap of 26 %
export const STEP_PITCH_MM = 5.29; // 12 pt on 15 pt
export const LABEL_PITCH_MM = 4.2;
export const STAMP_PITCH_MM = 3.4;

export const HAIRLINE_MM = 0.2;
export const RULE_MM = 0.35;
export const HEAVY_MM = 0.9;

export type Frame = { leftMm: number; topMm: number; widthMm: number; heightMm: number; rightMm: number; bottomMm: number };

/** The part of the paper that may be printed on. */
export function usableFrame(paper: SheetPaper): Frame {
  const { widthMm, heightMm } = PAPERS[paper];
  const rightMm = widthMm - MARGIN_MM;
  const bottomMm = heightMm - MARGIN_MM;
  return { leftMm: MARGIN_MM, topMm: TOP_MARGIN_MM, widthMm: rightMm - MARGIN_MM, heightMm: bottomMm - TOP_MARGIN_MM, rightMm, bottomMm };
}
