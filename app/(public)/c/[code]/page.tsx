import type { Metadata } from "next";
import { headers } from "next/headers";
import { TooManyTries } from "@/lib/auth/errors";
import { sentenceCase } from "@/lib/format/words";
import { SCAN_CAUTION, type SheetStanding } from "@/lib/testcards/words";
import { findCountedSheet } from "./counted-sheet";

export const metadata: Metadata = { title: "Printed sheet", robots: { index: false } };

const EDGE: Record<SheetStanding, string> = {
  "in force": "border-arc-green",
  "not in force: do not fly with it": "border-arc-red",
  unknown: "border-ink",
};
const MEANING: Record<SheetStanding, string> = {
  "in force": "This revision is the released one.",
  "not in force: do not fly with it":
    "This sheet is a draft, or another revision has taken its place, or it was withdrawn. Destroy it and print the released one.",
  unknown: "No sheet carries this code. Check it against the foot of the page.",
};

/** What the code on a printed sheet leads to: one answer, and nothing else of the team's. */
export default async function SheetPage({ params }: { params: Promise<{ code: string }> }) {
  const code = readable((await params).code);
  let standing: SheetStanding;
  try {
    standing = (await findCountedSheet(code, (await headers()).get("x-forwarded-for"))).standing;
  } catch (error) {
    if (error instanceof TooManyTries) return <p className="mx-auto w-full max-w-xl px-4 py-10 text-lg">{error.message}</p>;
    throw error;
  }
  return (
    <div className="mx-auto w-full max-w-xl px-4 py-10">
      <div className={`border-4 bg-sheet p-6 ${EDGE[standing]}`}>
        <p className="break-all font-mono text-ink-soft">{code.slice(0, 40)}</p>
        <h1 className="flex items-start gap-3 pt-3 font-bold text-2xl">
          <StandingGlyph standing={standing} />
          {sentenceCase(standing)}
        </h1>
        <p className="pt-3">{MEANING[standing]}</p>
        <p className="mt-5 border-rule border-t pt-4 font-bold">{SCAN_CAUTION}</p>
      </div>
    </div>
  );
}

/** A code in the address may be escaped wrongly by whoever typed it: then it is shown as it came. */
function readable(code: string): string {
  try {
    return decodeURIComponent(code);
  } catch {
    return code;
  }
}

/** A tick, a cross, a question: the answer without colour. */
function StandingGlyph({ standing }: { standing: SheetStanding }) {
  const shape = {
    "in force": "M4 13L10 19L20 5",
    "not in force: do not fly with it": "M5 5L19 19M19 5L5 19",
    unknown: "M8 8a4 4 0 1 1 5.5 3.7c-1 .4-1.5 1-1.5 2.3M12 18v1",
  };
  return (
    <svg viewBox="0 0 24 24" aria-hidden="true" className="mt-0.5 size-8 shrink-0" fill="none" stroke="currentColor" strokeWidth="3">
      <path d={shape[standing]} />
    </svg>
  );
}
