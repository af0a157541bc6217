import type { CardDocument } from "@/lib/testcards/card";
import type { CheckLine, CheckReport } from "@/lib/testcards/debrief-types";
import type { Unit } from "@/lib/testcards/units";

/** One line of the results table: a reading against one kind of limit, with its comparisons side by side. */
export type ResultRow = {
  key: string;
  reading: string;
  label: string;
  side: "max" | "min" | null;
  applies: string; // "always" is left out
  unit: Unit | null;
  main: CheckLine; // the one whose figures lead
  card: CheckLine | null;
  placard: CheckLine | null;
  hotDay: CheckLine | null;
};

/** The comparisons of one point, grouped; the order of the card's readings stays. */
export function resultRows(document: CardDocument, report: CheckReport, point: string): ResultRow[] {
  const labels = new Map(
    document.content.points.flatMap(({ readings }) => readings.map((reading) => [reading.id, reading.label] as const)),
  );
  const rows = new Map<string, ResultRow>();
  for (const line of report.lines) {
    if (line.point !== point || line.comparison === "abort") continue;
    const applies = line.limit?.appliesWhen ?? "always";
    const alone = line.comparison === "as flown, card" && !hasPlacard(report, line);
    const key = [line.reading, line.limit?.side, applies, line.statistic, alone ? `${line.limit?.id} ${line.limit?.value}` : ""].join("|");
    const row = rows.get(key) ?? {
      key,
      reading: line.reading,
      label: labels.get(line.reading) ?? "Reading",
      side: line.limit?.side ?? null,
      applies: [applies === "always" ? "" : applies, line.statistic === "instant" ? "" : line.statistic].filter(Boolean).join(", "),
      unit: line.limit?.unit ?? null,
      main: line,
      card: null,
      placard: null,
      hotDay: null,
    };
    if (line.comparison === "as flown, card") row.card = line;
    else if (line.comparison === "as flown, placard") row.placard = line;
    else row.hotDay = line;
    rows.set(key, row);
  }
  return [...rows.values()];
}

/** Whether the same limit also has a placard line: a point's own limit has none and stands in a row of its own. */
function hasPlacard(report: CheckReport, line: CheckLine): boolean {
  return report.lines.some(
    (other) =>
      other.reading === line.reading &&
      other.comparison === "as flown, placard" &&
      other.statistic === line.statistic &&
      other.limit?.side === line.limit?.side &&
      other.limit?.appliesWhen === line.limit?.appliesWhen,
  );
}
