import type { CardDocument } from "@/lib/testcards/card";
import { riskLevel } from "@/lib/testcards/risk";

type Props = { document: CardDocument; differences: { point: string; parts: string[] }[] };

/** What a reviewer weighs beside the sheet: each hazard before and after, and where a point no longer reads as on the shelf. */
export function RisksAndChanges({ document, differences }: Props) {
  const { points } = document.content;
  const codes = new Set(points.flatMap(({ hazards }) => hazards));
  const hazards = document.programme.hazards.filter(({ code }) => codes.has(code));
  return (
    <>
      <section aria-label="Hazards">
        <h2 className="font-bold text-lg">Hazards</h2>
        {hazards.length === 0 ? <p className="text-ink-soft">None is linked to these points.</p> : null}
        <ul>
          {hazards.map(({ code, title, before, after, mitigations }) => (
            <li key={code} className="border-rule border-b py-2">
              <span className="flex justify-between gap-3">
                <span className="font-bold">{title}</span>
                <span className="shrink-0 text-sm">
                  {before.severity}
                  {before.probability} {riskLevel(before.severity, before.probability)} → {after.severity}
                  {after.probability} {riskLevel(after.severity, after.probability)}
                </span>
              </span>
              <span className="text-ink-soft text-sm">{mitigations.map(({ text }) => text).join("; ")}</span>
            </li>
          ))}
        </ul>
      </section>
      <section aria-label="Differs from the shelf">
        <h2 className="font-bold text-lg">Differs from the shelf</h2>
        {differences.length === 0 ? <p className="text-ink-soft">Every point reads as on the shelf.</p> : null}
        <ul>
          {differences.map(({ point, parts }) => {
            const index = points.findIndex(({ id }) => id === point);
            return (
              <li key={point} className="border-rule border-b py-2">
                Point {index + 1}, {points[index]?.title}: {parts.join(", ").toLowerCase()}
              </li>
            );
          })}
        </ul>
      </section>
    </>
  );
}
