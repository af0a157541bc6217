import type { SheetItem, SheetPage } from "@/lib/testcards/sheet-types";
import { type CodeMatrix, SheetDrawing } from "./sheet-drawing";

type TextItem = Extract<SheetItem, { kind: "text" }>;

/** The page's texts as lines, in reading order of the drawing: what a screen reader is told instead of the picture. */
function spokenLines(page: SheetPage): string[] {
  const texts = page.items.filter((item): item is TextItem => item.kind === "text");
  const lines: { baselineMm: number; role: string; text: string }[] = [];
  for (const { baselineMm, role, text } of texts) {
    const last = lines.at(-1);
    if (last && last.role === role && Math.abs(last.baselineMm - baselineMm) < 0.5) last.text += ` ${text}`;
    else lines.push({ baselineMm, role, text });
  }
  return lines.map((line) => line.text);
}

/** One page of a kneeboard sheet, black on white, drawn from the same items as the PDF. Without a width it fills its container. */
export function SheetPageView({ page, widthPx, code = null }: { page: SheetPage; widthPx?: number; code?: CodeMatrix | null }) {
  const name = `Sheet page ${page.number} of ${page.of}, ${page.kind === "cover" ? "cover" : "points"}`;
  const size = widthPx === undefined ? { width: "100%" } : { width: widthPx, height: (widthPx * page.heightMm) / page.widthMm };
  return (
    <>
      <svg
        {...size}
        viewBox={`0 0 ${page.widthMm} ${page.heightMm}`}
        role="img"
        aria-label={name}
        style={{ display: "block", background: "#fff", fontKerning: "none", fontFamily: "var(--font-b612, B612), B612, sans-serif" }}
      >
        <SheetDrawing items={page.items} code={code} />
      </svg>
      <ul className="sr-only" aria-label={`Text of ${name.toLowerCase()}`}>
        {spokenLines(page).map((line, index) => (
          // biome-ignore lint/suspicious/noArrayIndexKey: lines of one drawing, never reordered
          <li key={index}>{line}</li>
        ))}
      </ul>
    </>
  );
}
