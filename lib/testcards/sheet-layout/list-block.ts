import type { FontWidths, SheetRole } from "../sheet-types";
import type { AbortList } from "./abort-lines";
import type { ListLine } from "./limit-lines";
import { HEAVY_MM, LABEL_PT, LIMIT_PITCH_MM, LIMIT_PT, RULE_MM, STEP_PITCH_MM, STEP_PT } from "./paper";
import { bold, capHeightMm, type Ink, inkBox, inkLines, inkText, regular, type SetLine, setLines, textWidthMm } from "./typesetting";

const PAD_MM = 1.8;
const ABORT_PAD_MM = 2.4; // inside the heaviest rule
const HEAD_MM = 5.4;
const FOOT_MM = 0.6;
const NAME_GAP_MM = 2.4;
const LETTERING = { sizePt: LIMIT_PT };

/** Names in one column and values in another where that fits; a longer line runs on, or breaks, and loses nothing. */
function listLines(lines: readonly ListLine[], widthMm: number, widths: FontWidths): SetLine[] {
  const wide = (text: string) => textWidthMm(text, "bold", LIMIT_PT, widths);
  const names = lines.filter((l) => l.name !== "").map((l) => wide(l.name));
  const column = Math.max(0, ...names.filter((w) => w <= widthMm * 0.45)) + NAME_GAP_MM;
  return lines.flatMap(({ name, value }) => {
    if (name !== "" && wide(name) <= column - NAME_GAP_MM && column + wide(value) <= widthMm) {
      const set = setLines([bold(value)], widthMm - column, LIMIT_PT, widths);
      const piece = { text: name, weight: "bold" as const, xMm: 0 };
      return set.map((line, row) => ({
        pieces: [...(row === 0 ? [piece] : []), ...line.pieces.map((p) => ({ ...p, xMm: p.xMm + column }))],
        widthMm: column + line.widthMm,
      }));
    }
    return setLines([bold(name === "" ? value : `${name}  ${value}`)], widthMm, LIMIT_PT, widths);
  });
}

/** Events share a line while they fit whole, for a bare list is read at a glance. */
function eventLines(events: readonly string[], widthMm: number, widths: FontWidths): SetLine[] {
  const rows: string[] = [];
  for (const event of events) {
    const joined = rows.length === 0 ? event : `${rows.at(-1)}, ${event}`;
    if (rows.length > 0 && textWidthMm(joined, "bold", LIMIT_PT, widths) <= widthMm) rows[rows.length - 1] = joined;
    else rows.push(event);
  }
  return rows.flatMap((row) => setLines([bold(row)], widthMm, LIMIT_PT, widths));
}

type Column = { xMm: number; yMm: number; widthMm: number; heightMm: number };

function inkLimits(ink: Ink, lines: readonly SetLine[], at: Column, widths: FontWidths): void {
  const role: SheetRole = "limits";
  const baselineMm = at.yMm + (HEAD_MM + capHeightMm(LABEL_PT)) / 2;
  inkBox(ink, at, RULE_MM, role);
  inkText(ink, bold("LIMITS"), { xMm: at.xMm + PAD_MM, baselineMm }, { sizePt: LABEL_PT, role });
  inkText(
    ink,
    regular("on the gauge"),
    { xMm: at.xMm + PAD_MM + textWidthMm("LIMITS", "bold", LABEL_PT, widths) + 1.8, baselineMm },
    { sizePt: LABEL_PT, role },
  );
  inkLines(ink, lines, at.xMm + PAD_MM, at.yMm + HEAD_MM, LIMIT_PITCH_MM, { ...LETTERING, role });
}

function inkAborts(ink: Ink, lines: readonly SetLine[], ifReached: boolean, at: Column, widths: FontWidths): void {
  const role: SheetRole = "abort";
  const inset = HEAVY_MM / 2;
  inkBox(
    ink,
    { xMm: at.xMm + inset, yMm: at.yMm + inset, widthMm: at.widthMm - HEAVY_MM, heightMm: at.heightMm - HEAVY_MM },
    HEAVY_MM,
    role,
  );
  const wordMm = textWidthMm("ABORT", "bold", LIMIT_PT, widths) + 2 * PAD_MM;
  inkBox(ink, { xMm: at.xMm, yMm: at.yMm, widthMm: wordMm, heightMm: HEAD_MM + 0.3 }, 0, role, true);
  const baselineMm = at.yMm + (HEAD_MM + 0.3 + capHeightMm(LIMIT_PT)) / 2;
  inkText(ink, bold("ABORT"), { xMm: at.xMm + PAD_MM, baselineMm, reversed: true }, { sizePt: LIMIT_PT, role });
  const head = ifReached ? bold("IF REACHED") : regular("on the gauge, if any:");
  inkText(ink, head, { xMm: at.xMm + wordMm + 1.8, baselineMm }, { sizePt: LABEL_PT, role });
  inkLines(ink, lines, at.xMm + ABORT_PAD_MM, at.yMm + HEAD_MM, LIMIT_PITCH_MM, { ...LETTERING, role });
}

/** LIMITS beside ABORT and the THEN line below them, from the top left of a block widthMm wide. */
export function listBlock(
  limits: readonly ListLine[],
  aborts: AbortList,
  thenLine: string,
  widthMm: number,
  widths: FontWidths,
): { ink: Ink; heightMm: number } {
  const columnMm = widthMm / 2;
  const inside = columnMm - 2 * PAD_MM;
  const insideAbort = columnMm - 2 * ABORT_PAD_MM;
  const left = listLines(limits.length > 0 ? limits : [{ name: "", value: "none on this page" }], inside, widths);
  const right = [...listLines(aborts.lines, insideAbort, widths), ...eventLines(aborts.events, insideAbort, widths)];
  const rows = Math.max(left.length, right.length, 1);
  const heightMm = HEAD_MM + rows * LIMIT_PITCH_MM + FOOT_MM;
  const ink: Ink = [];
  inkLimits(ink, left, { xMm: 0, yMm: 0, widthMm: columnMm, heightMm }, widths);
  inkAborts(ink, right, aborts.ifReached, { xMm: columnMm, yMm: 0, widthMm: columnMm, heightMm }, widths);
  const then = setLines([bold("THEN"), regular(`  ${thenLine}`)], widthMm - 2 * PAD_MM, STEP_PT, widths);
  const thenMm = then.length * STEP_PITCH_MM + 0.9;
  inkBox(ink, { xMm: 0, yMm: heightMm, widthMm, heightMm: thenMm }, RULE_MM, "then");
  inkLines(ink, then, PAD_MM, heightMm + 0.45, STEP_PITCH_MM, { sizePt: STEP_PT, role: "then" });
  return { ink, heightMm: heightMm + thenMm };
}
