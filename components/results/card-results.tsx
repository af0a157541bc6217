import { ArcStrip } from "@/components/gauge/arc-strip";
import { stripOf } from "@/components/gauge/reading-strip";
import { StripKey } from "@/components/gauge/scale";
import { VerdictMark } from "@/components/gauge/verdict-mark";
import { Badge } from "@/components/ui/badge";
import { formatNumber, ownDecimals } from "@/lib/format/number";
import { withUnit } from "@/lib/format/unit";
import { asSentences } from "@/lib/format/words";
import { type CardDocument, instrumentOf, parameterOf } from "@/lib/testcards/card";
import type { CheckReport, Debrief, DisciplineLine, PointReport } from "@/lib/testcards/debrief-types";
import { type ResultRow, resultRows } from "./result-rows";
import { ResultsTable } from "./results-table";
import { SeriesPlots } from "./series-plots";

/** What the core made of one card, point by point, and what follows from it. */
export function CardResults({ document, report, debrief }: { document: CardDocument; report: CheckReport; debrief: Debrief }) {
  return (
    <div className="flex flex-col gap-10">
      {report.points.map((point, index) => (
        <PointResults key={point.point} document={document} report={report} debrief={debrief} point={point} index={index} />
      ))}
    </div>
  );
}

function PointResults({
  document,
  report,
  debrief,
  point,
  index,
}: {
  document: CardDocument;
  report: CheckReport;
  debrief: Debrief;
  point: PointReport;
  index: number;
}) {
  const planned = document.content.points.find(({ id }) => id === point.point);
  if (!planned) return null;
  const rows = resultRows(document, report, point.point);
  return (
    <section aria-labelledby={`point-${point.point}`} className="border-ink border-t-[1.5px] pt-4">
      <div className="flex flex-wrap items-center gap-x-4 gap-y-2">
        <h3 id={`point-${point.point}`} className="font-bold text-lg">
          {index + 1} {planned.title}
        </h3>
        <Badge>{point.outcome ?? "no outcome"}</Badge>
        {point.outcome === "skipped" ? null : <VerdictMark verdict={point.worst} />}
      </div>
      <p className="mt-1 text-ink-soft">
        Completion rule: {planned.completion.rule}
        {planned.completion.rule === "none" ? "" : point.completion ? `, not met: ${point.completion}` : ", met"}
        {point.completionWhy ? ` (${point.completionWhy})` : ""}
      </p>
      {point.outcome === "skipped" ? null : (
        <>
          <div className="mt-4">
            <ResultsTable label={`Results of ${planned.title}`} rows={rows} />
          </div>
          <Strips document={document} rows={rows} />
          <SeriesPlots document={document} point={planned} report={report} debrief={debrief} />
          <Discipline document={document} lines={point.disciplines} />
          {point.outsideExpected.length > 0 ? (
            <p className="mt-4">
              <span className="font-bold">Off prediction.</span>{" "}
              {point.outsideExpected
                .map(
                  ({ reading, asTrue, unit, low, high }) =>
                    `${planned.readings.find(({ id }) => id === reading)?.label ?? "Reading"} ${withUnit(formatNumber(asTrue, 1), unit)} true, expected ${low ?? "…"} to ${high ?? "…"}`,
                )
                .join("; ")}
              .
            </p>
          ) : null}
        </>
      )}
      <p className="mt-4">
        <span className="font-bold">Computed for the next step: {point.decision}.</span> {asSentences(point.because)}
      </p>
    </section>
  );
}

function Strips({ document, rows }: { document: CardDocument; rows: ResultRow[] }) {
  const drawn = rows.flatMap((row) => {
    const lines = [row.hotDay, row.placard, row.card].filter((line) => line !== null);
    const planned = document.content.points.flatMap(({ readings }) => readings).find(({ id }) => id === row.reading);
    const parameter = parameterOf(document, planned?.parameter ?? null);
    const instrument = instrumentOf(document, planned?.instrument ?? null);
    const main = row.hotDay ?? row.placard ?? row.card;
    const strip = main && stripOf(lines, main, parameter, instrument);
    return strip ? [{ row, strip, name: parameter?.name ?? row.label }] : [];
  });
  if (drawn.length === 0) return null;
  return (
    <div className="mt-6">
      <div className="grid grid-cols-1 gap-x-10 gap-y-5 hand:grid-cols-2 wide:grid-cols-3">
        {drawn.map(({ row, strip, name }) => (
          <figure key={row.key}>
            <figcaption className="text-sm">
              {name}
              {row.side === "min" ? ", minimum" : ""}
              {row.applies ? `, ${row.applies}` : ""}, {strip.marks.length > 0 && row.unit ? withUnit("", row.unit).trim() : ""}
            </figcaption>
            <ArcStrip title={name} strip={strip} />
          </figure>
        ))}
      </div>
      <div className="mt-4">
        <StripKey />
      </div>
    </div>
  );
}

const DISCIPLINE_WORDS = { called: "called", missed: "missed", early: "early" } as const;

/** Whether a call was due on the gauge and whether it came; a call is never criticised. */
function Discipline({ document, lines }: { document: CardDocument; lines: DisciplineLine[] }) {
  const read = lines.filter(({ worstOnGauge }) => worstOnGauge !== null);
  if (read.length === 0) return null;
  return (
    <div className="mt-6">
      <h4 className="font-bold">Abort discipline, on the gauge</h4>
      <ul className="mt-1 grid grid-cols-1 gap-x-10 hand:grid-cols-2">
        {read.map((line) => {
          const gauge = instrumentOf(document, line.instrument)?.gaugeName ?? line.parameter;
          const figure = (value: number) => withUnit(formatNumber(value, ownDecimals(value, 2)), line.unit);
          return (
            <li
              key={`${line.parameter} ${line.side} ${line.instrument}`}
              className="flex flex-wrap justify-between gap-x-4 border-rule border-b py-2"
            >
              <span>
                {gauge} {line.side === "min" ? "lowest" : "highest"} {figure(line.worstOnGauge ?? 0)}, abort at{" "}
                {figure(line.thresholdOnGauge)}
              </span>
              <span className={line.discipline === "missed" ? "font-bold text-ink-red" : "text-ink-soft"}>
                {line.discipline ? DISCIPLINE_WORDS[line.discipline] : "no call due"}
              </span>
            </li>
          );
        })}
      </ul>
    </div>
  );
}
