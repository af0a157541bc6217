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

export type Column = { reading: Reading | null; head: string; sub: string };
export type GridBlocks = { head: Block; rows: Block[]; labels: string[] };
type Across = { paper: SheetPaper; widthMm: number; widths: FontWidths };

/** The expected band on the gauge of a reading, as it stands in a cell's head. */
export function expectedText(card: CardDocument, reading: Reading): string {
  const instrument = instrumentOf(card, reading.instrument);
  if (reading.expected === null) return "";
  if (!instrument || !sameDimension(reading.expected.unit, instrument.unit))
    return bandText(reading.expected.low, reading.expected.high, null);
  const { low, high } = bandOnGauge(reading.expected, instrument);
  return bandText(low, high, instrument.unit);
}

function headWithUnit(head: string, reading: Reading): string {
  const symbol = reading.unit === null ? "" : unitSymbol(reading.unit);
  return symbol === "" ? head : `${head} ${symbol}`;
}

export function gridColumns(card: CardDocument, point: CardPoint): Column[] {
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

const linesIn = (runs: Run[][], widthMm: number, widths: FontWidths) =>
  runs.flatMap((run) => setLines(run, widthMm - 2 * CELL_PAD_MM, LABEL_PT, widths));

/** A row of labelled heads: what is written below, its unit and what is expected there. */
function headRow(heads: readonly { xMm: number; widthMm: number; runs: Run[][] }[], widths: FontWidths): Block {
  const ink: Ink = [];
  const set = heads.map((head) => ({ ...head, lines: linesIn(head.runs, head.widthMm, widths) }));
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

type Single = { reading: Reading; runs: Run[][]; row: number; inside: string[] };

/** Readings written once. A grid reading on a point without rows is written once too. */
function singlesOf(card: CardDocument, point: CardPoint): Single[] {
  const rowless = (point.grid?.rows.length ?? 0) === 0;
  return point.readings
    .filter((r) => r.onSheet === "single" || (rowless && r.onSheet === "grid"))
    .flatMap((reading): Single[] => {
      const symbol = reading.unit === null ? "" : unitSymbol(reading.unit);
      const sub = [regular([symbol, expectedText(card, reading)].filter((t) => t !== "").join("  "))];
      const inside = reading.kind === "yes-no" ? ["YES", "NO"] : reading.kind === "choice" ? reading.choices : [];
      if (reading.sampling !== "lowest and highest") return [{ reading, runs: [[bold(reading.label)], sub], row: 0, inside }];
      return ["lowest", "highest"].map((which, row) => ({ reading, runs: [[bold(`${reading.label}, ${which}`)], sub], row, inside }));
    });
}

/** As many across as keep every label in two lines and uncut, and every choice inside its cell. */
function cellsAcross(singles: readonly Single[], { paper, widthMm, widths }: Across): number {
  const fits = (across: number) =>
    singles.every(({ runs, inside }) => {
      const label = runs[0]?.[0]?.text ?? "";
      const room = widthMm / across - 2 * CELL_PAD_MM;
      const insideMm = textWidthMm(inside.join("    "), "regular", LABEL_PT, widths);
      return linesIn([[bold(label)]], widthMm / across, widths).length <= 2 && widestWordMm(label, widths) <= room && insideMm <= room;
    });
  const most = Math.min(MOST_CELLS, singles.length, Math.floor(widthMm / PAPERS[paper].cellWidthMm));
  for (let across = most; across > 1; across -= 1) if (fits(across)) return Math.ceil(singles.length / Math.ceil(singles.length / across));
  return 1;
}

function singleRow(singles: readonly Single[], { paper, widthMm, widths }: Across): Block {
  const cellMm = widthMm / singles.length;
  const head = headRow(
    singles.map(({ runs }, i) => ({ xMm: i * cellMm, widthMm: cellMm, runs })),
    widths,
  );
  const ink: Ink = [...head.ink];
  const insides = singles.map(({ inside }) => linesIn([[regular(inside.join("    "))]], cellMm, widths));
  const cellHeightMm = Math.max(PAPERS[paper].cellHeightMm, Math.max(...insides.map((lines) => lines.length)) * HEAD_PITCH_MM + 2);
  for (const [i, { reading, row }] of singles.entries()) {
    const at = { xMm: i * cellMm, yMm: head.heightMm, widthMm: cellMm, heightMm: cellHeightMm };
    ink.push({ kind: "cell", ...at, strokeMm: HAIRLINE_MM, role: "cell", reading: reading.id, row });
    centred(ink, insides[i] ?? [], at.xMm, cellMm, at.yMm, cellHeightMm, "cell");
  }
  return { ink, heightMm: head.heightMm + cellHeightMm };
}

export function singleBlocks(card: CardDocument, point: CardPoint, across: Across): Block[] {
  const singles = singlesOf(card, point);
  const texts = singles.filter((s) => s.reading.kind === "text");
  const others = singles.filter((s) => s.reading.kind !== "text");
  const each = Math.max(1, cellsAcross(others, across));
  const rows = Array.from({ length: Math.ceil(others.length / each) }, (_, i) => others.slice(i * each, (i + 1) * each));
  return [...rows, ...texts.map((text) => [text])].map((row) => singleRow(row, across));
}

const OUTCOME_MM = 9;
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
