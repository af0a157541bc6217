import { SHEET_LAYOUT_VERSION } from "@/lib/testcards/sheet";
import type { SheetPage, SheetPaper } from "@/lib/testcards/sheet-types";

/** All that a kneeboard PDF is made of: plain data, so that it can go to another process. */
export type KneeboardModel = {
  pages: SheetPage[];
  title: string; // "Card 07 rev C, Climb cooling"
  subject: string; // "Quillon R2 Q-R2-01, released"
  codeUrl: string | null; // what the QR says; null while nothing is released
  recordedAt: string; // ISO instant of the record that is drawn: the PDF's date, for no clock is read here
};

/** Names a drawn sheet: a withdrawn card can never be answered from the cache of a released one. */
export function kneeboardCacheKey(sheet: { digest: string; state: string; paper: SheetPaper; layoutVersion?: string }): string {
  const { digest, state, paper, layoutVersion = SHEET_LAYOUT_VERSION } = sheet;
  return [digest, state.replaceAll(" ", "-"), paper, `v${layoutVersion}`].join(".");
}
