import { type CardDocument, type CardPoint, instrumentOf, type Reading } from "../card";
import type { FontWidths, SheetPaper } from "../sheet-types";
import { unitSymbol } from "../unit-symbols";
import { sameDimension } from "../units";
import { bandOnGauge, bandText } from "./gauge-figures";
import { HAIRLINE_MM, LABEL_COLUMN_MM, LABEL_PT, MOST_CELLS, PAPERS, RULE_MM } from "./paper";
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
  type Run,
  regular,
  type SetLine,
  setLines,
  textWidthMm,
} from "./typesetting";

const HEAD_PITCH_MM = 3.9;
const HEAD_LEAST_MM = 8;
const CELL_PAD_MM = 0.5;
const HEAD_PAD_MM = 0.35; // a band of two decimals then stands unbroken over the least cell of six on half letter

type Column = { reading: Reading | null; head: string; sub: string };
export type GridBlocks = { head: Block; rows: Block[]; labels: string[] };
type Across = { paper: SheetPaper; widthMm: number; widths: FontWidths };

/** The expected band on the gauge of a reading, as it stands in a cell's head; none where the gauge has no number for it. */
export function expectedText(card: CardDocument, reading: Reading): string {
  const instrument = instrumentOf(card, reading.instrument);
  if (reading.expected === null) return "";
  if (!instrument || !sameDimension(reading.expected.unit, instrument.unit))
    return bandText(reading.expected.low, reading.expected.high, null);
  const band = bandOnGauge(reading.expected, instrument);
  return typeof band === "string" ? "" : bandText(band.low, band.high, instrument.unit);
}

function headWithUnit(head: string, reading: Reading): string {
  const symbol = reading.unit === null ? "" : unitSymbol(reading.unit);
  return symbol === "" ? head : `${head} ${symbol}`;
}

/** How many cells a row of the grid asks for. */
export function cellsInRow(point: CardPoint): number {
  return (point.grid?.timeColumn ? 1 : 0) + point.readings.filter((r) => r.onSheet === "grid").length;
}

function gridColumns(card: CardDocument, point: CardPoint): Column[] {
  const time: Column[] = point.grid?.timeColumn ? [{ reading: null, head: "time", sub: "mm:ss" }] : [];
  const readings = point.readings.filter((r) => r.onSheet === "grid");
  return [
    ...time,
    ...readings.map((reading) => ({ reading, head: headWithUnit(reading.cellHead, reading), sub: expectedText(card, reading) })),
  ];
}

function centred(
  ink: Ink,
  lines: readonly SetLine[],
  xMm: number,
  widthMm: number,
  topMm: number,
  heightMm: number,
  role: "grid" | "cell",
): void {
  const top = topMm + (heightMm - lines.length * HEAD_PITCH_MM) / 2;
  for (const [row, line] of lines.entries()) {
    const baseline = top + row * HEAD_PITCH_MM + (HEAD_PITCH_MM + capHeightMm(LABEL_PT)) / 2;
    inkLine(ink, line, xMm + (widthMm - line.widthMm) / 2, baseline, { sizePt: LABEL_PT, role });
  }
}

const linesIn = (runs: Run[][], widthMm: number, widths: FontWidths, padMm = CELL_PAD_MM) =>
  runs.flatMap((run) => setLines(run, widthMm - 2 * padMm, LABEL_PT, widths));

/** A row of labelled heads: what is written below, its unit and what is expected there. */
function headRow(heads: readonly { xMm: number; widthMm: number; runs: Run[][] }[], widths: FontWidths): Block {
  const ink: Ink = [];
  const set = heads.map((head) => ({ ...head, lines: linesIn(head.runs, head.widthMm, widths, HEAD_PAD_MM) }));
  const heightMm = Math.max(HEAD_LEAST_MM, Math.max(0, ...set.map((h) => h.lines.length)) * HEAD_PITCH_MM + 0.2);
  for (const { xMm, widthMm, lines } of set) {
    inkBox(ink, { xMm, yMm: 0, widthMm, heightMm }, HAIRLINE_MM, "grid");
    centred(ink, lines, xMm, widthMm, 0, heightMm, "grid");
  }
  return { ink, heightMm };
}

const widestWordMm = (text: string, widths: FontWidths) =>
  Math.max(0, ...text.split(" ").map((word) => textWidthMm(word, "bold", LABEL_PT, widths)));

/** Twelve millimetres, or what the longest word of a row's name needs while the cells keep their least width. */
function labelColumnMm(rows: readonly string[], cells: number, { paper, widthMm, widths }: Across): number {
  const wanted = Math.max(...rows.map((row) => widestWordMm(row, widths)), 0) + 2 * CELL_PAD_MM;
  const most = Math.max(LABEL_COLUMN_MM, widthMm - cells * PAPERS[paper].cellWidthMm);
  return Math.min(Math.max(LABEL_COLUMN_MM, wanted), most);
}

/** One grid of at most six cells across; more columns make a second grid below the first. */
function gridOf(point: CardPoint, columns: readonly Column[], across: Across): GridBlocks {
  const { paper, widthMm, widths } = across;
  const grid = point.grid;
  const rows = grid?.rows ?? [];
  const labelMm = labelColumnMm(rows, columns.length, across);
  const cellMm = (widthMm - labelMm) / columns.length;
  const corner =
    grid === null ? "" : [grid.head, grid.unit === null ? "" : unitSymbol(grid.unit)].filter((t) => t !== "" && t !== "1").join(" ");
  const heads = columns.map(({ head, sub }, i) => ({ xMm: labelMm + i * cellMm, widthMm: cellMm, runs: [[bold(head)], [regular(sub)]] }));
  const head = headRow([{ xMm: 0, widthMm: labelMm, runs: [[bold(corner)]] }, ...heads], widths);
  const blocks = rows.map((row, index): Block => {
    const ink: Ink = [];
    const lines = linesIn([[bold(row)]], labelMm, widths);
    const heightMm = Math.max(PAPERS[paper].cellHeightMm, lines.length * HEAD_PITCH_MM + 0.4);
    inkBox(ink, { xMm: 0, yMm: 0, widthMm: labelMm, heightMm }, HAIRLINE_MM, "grid");
    centred(ink, lines, 0, labelMm, 0, heightMm, "grid");
    for (const [i, column] of columns.entries()) {
      const reading = column.reading?.id ?? null;
      ink.push({
        kind: "cell",
        xMm: labelMm + i * cellMm,
        yMm: 0,
        widthMm: cellMm,
        heightMm,
        strokeMm: HAIRLINE_MM,
        role: "cell",
        reading,
        row: index,
      });
    }
    return { ink, heightMm };
  });
  return { head, rows: blocks, labels: rows };
}

export function gridBlocks(card: CardDocument, point: CardPoint, across: Across): GridBlocks[] {
  const columns = gridColumns(card, point);
  if (columns.length === 0 || (point.grid?.rows.length ?? 0) === 0) return [];
  const grids = Math.ceil(columns.length / MOST_CELLS);
  const each = Math.ceil(columns.length / grids);
  return Array.from({ length: grids }, (_, i) => gridOf(point, columns.slice(i * each, (i + 1) * each), across));
}

type Single = { reading: Reading; label: Run[]; row: number; inside: string };

/** Readings written once. A grid reading on a point without rows is written once too. */
function singlesOf(card: CardDocument, point: CardPoint): Single[] {
  const rowless = (point.grid?.rows.length ?? 0) === 0;
  return point.readings
    .filter((r) => r.onSheet === "single" || (rowless && r.onSheet === "grid"))
    .flatMap((reading): Single[] => {
      const symbol = reading.unit === null ? "" : unitSymbol(reading.unit);
      const sub = [symbol, expectedText(card, reading)].filter((t) => t !== "").join(" ");
      const inside = (reading.kind === "yes-no" ? ["YES", "NO"] : reading.kind === "choice" ? reading.choices : []).join("    ");
      const named = (label: string) => [bold(label), regular(sub === "" ? "" : `  ${sub}`)];
      if (reading.sampling !== "lowest and highest") return [{ reading, label: named(reading.label), row: 0, inside }];
      const name = reading.label.replace(/, (lowest and )?highest$/, "");
      return ["lowest", "highest"].map((which, row) => ({ reading, label: named(`${name}, ${which}`), row, inside }));
    });
}

const SINGLE_LINES = 2;

/** How wide the cell of a single reading is when so many stand in a row; null where label or choices do not fit then. */
function singleCellMm({ label, inside, reading }: Single, across: number, { paper, widthMm, widths }: Across): number | null {
  const eachMm = widthMm / across;
  const insideMm = inside === "" ? 0 : textWidthMm(inside, "regular", LABEL_PT, widths) + 4 * CELL_PAD_MM;
  const roomy = reading.kind === "text" ? eachMm * 0.72 : across === 1 ? eachMm * 0.3 : 0;
  const cellMm = Math.max(PAPERS[paper].cellWidthMm + 1, insideMm, roomy);
  const labelMm = eachMm - cellMm - 2 * CELL_PAD_MM;
  const words = label.map((run) => widestWordMm(run.text, widths));
  const fits = labelMm > 0 && Math.max(...words) <= labelMm - 2 * CELL_PAD_MM && linesIn([label], labelMm, widths).length <= SINGLE_LINES;
  return fits ? cellMm : null;
}

/** As many in a row as leave every label its two lines; a label that needs more gets them, one in a row. */
function singlesAcross(singles: readonly Single[], across: Across): number {
  return [3, 2].find((n) => n <= singles.length && singles.every((single) => singleCellMm(single, n, across) !== null)) ?? 1;
}

function singleRow(singles: readonly Single[], inRow: number, across: Across): Block {
  const { paper, widthMm, widths } = across;
  const eachMm = widthMm / inRow;
  const set = singles.map((single) => {
    const cellMm = singleCellMm(single, inRow, across) ?? Math.max(PAPERS[paper].cellWidthMm, eachMm * 0.4);
    const labelMm = eachMm - cellMm - 2 * CELL_PAD_MM;
    return {
      ...single,
      cellMm,
      lines: linesIn([single.label], labelMm, widths),
      insides: linesIn([[regular(single.inside)]], cellMm, widths),
    };
  });
  const lines = Math.max(...set.map((s) => Math.max(s.lines.length, s.insides.length)));
  const heightMm = Math.max(PAPERS[paper].cellHeightMm, lines * HEAD_PITCH_MM + 1);
  const ink: Ink = [];
  for (const [i, { reading, row, cellMm, lines, insides }] of set.entries()) {
    const xMm = i * eachMm;
    const cell = { xMm: xMm + eachMm - cellMm, yMm: 0, widthMm: cellMm, heightMm };
    inkBox(ink, { xMm, yMm: 0, widthMm: eachMm, heightMm }, HAIRLINE_MM, "grid");
    inkLines(ink, lines, xMm + 2 * CELL_PAD_MM, (heightMm - lines.length * HEAD_PITCH_MM) / 2, HEAD_PITCH_MM, {
      sizePt: LABEL_PT,
      role: "grid",
    });
    ink.push({ kind: "cell", ...cell, strokeMm: HAIRLINE_MM, role: "cell", reading: reading.id, row });
    centred(ink, insides, cell.xMm, cellMm, 0, heightMm, "cell");
  }
  return { ink, heightMm };
}

/** A least value that must be reached before the power is set is read before the first row of the grid; the others may come later. */
export function isReadFirst({ sampling, conditions, onSheet }: Reading): boolean {
  return onSheet === "single" && sampling === "lowest" && conditions.some((c) => c === "full power" || c === "take-off");
}

/** Rows of labelled cells; neighbours that allow it share a row. */
export function singleBlocks(card: CardDocument, point: CardPoint, across: Across, wanted: (reading: Reading) => boolean): Block[] {
  const rows: { singles: Single[]; inRow: number }[] = [];
  let rest = singlesOf(card, point).filter(({ reading }) => wanted(reading));
  while (rest.length > 0) {
    const inRow = [3, 2, 1].find((n) => n <= rest.length && singlesAcross(rest.slice(0, n), across) === n) ?? 1;
    rows.push({ singles: rest.slice(0, inRow), inRow });
    rest = rest.slice(inRow);
  }
  return rows.map(({ singles, inRow }) => singleRow(singles, inRow, across));
}

const OUTCOME_MM = 7;
const TICK_MM = 4.6;

export function outcomeBlock(widthMm: number): Block {
  const ink: Ink = [];
  const role = "outcome" as const;
  const eachMm = widthMm / 4;
  for (const [i, word] of ["FLOWN", "PART", "ABORTED", "SKIPPED"].entries()) {
    const xMm = i * eachMm + 3;
    inkBox(ink, { xMm, yMm: (OUTCOME_MM - TICK_MM) / 2, widthMm: TICK_MM, heightMm: TICK_MM }, RULE_MM, role);
    inkText(
      ink,
      bold(word),
      { xMm: xMm + TICK_MM + 1.6, baselineMm: (OUTCOME_MM + capHeightMm(LABEL_PT)) / 2 },
      { sizePt: LABEL_PT, role },
    );
  }
  inkRule(ink, 0, widthMm, 0, HAIRLINE_MM, role);
  return { ink, heightMm: OUTCOME_MM };
}
