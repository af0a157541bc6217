import type { CardDocument } from "../card";
import { measuredSheet } from "../sheet";
import type { FontWidths } from "../sheet-types";
import type { SheetFacts } from "./rule";

/** The sheet as it will print on A5, the smaller paper: the work that a builder may do once and hand to reviewCard. */
export function measureSheet(card: CardDocument, widths: FontWidths): SheetFacts {
  return measuredSheet(card, { paper: "a5", state: "draft", widths });
}
