import { B612_WIDTHS } from "@/lib/testcards/b612-widths";
import type { CardDocument } from "@/lib/testcards/card";
import { layOutSheet } from "@/lib/testcards/sheet";
import type { SheetItem, SheetPage, SheetPaper } from "@/lib/testcards/sheet-types";
import type { CardState } from "@/lib/testcards/words";
import { STAMP } from "./sheet-card";

/** A laid-out sheet read back as the lines that a pilot sees. */
export const lay = (card: CardDocument, paper: SheetPaper = "a5", state: CardState = "released") =>
  layOutSheet(card, { paper, state, widths: B612_WIDTHS, stamp: STAMP });

export type TextItem = Extract<SheetItem, { kind: "text" }>;
export const texts = (page: SheetPage, role?: TextItem["role"]) =>
  page.items.filter((i): i is TextItem => i.kind === "text" && (role === undefined || i.role === role));

/** A page's lines of one role as they are read: pieces on one baseline, in one column, joined. */
export function lines(page: SheetPage, role: TextItem["role"]): string[] {
  const rows = new Map<number, TextItem[]>();
  for (const item of texts(page, role)) rows.set(item.baselineMm, [...(rows.get(item.baselineMm) ?? []), item]);
  return [...rows.values()].map((row) =>
    row
      .sort((a, b) => a.xMm - b.xMm)
      .map((i) => i.text)
      .join(" ")
      .replaceAll("\u00a0", " ")
      .replace(/ +/g, " "),
  );
}

export const cells = (page: SheetPage) => page.items.filter((i) => i.kind === "cell");
