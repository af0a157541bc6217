"use client";
import { ArcStrip } from "@/components/gauge/arc-strip";
import { stripOf } from "@/components/gauge/reading-strip";
import { VerdictMark } from "@/components/gauge/verdict-mark";
import { formatDerived, formatMargin } from "@/lib/format/number";
import { unitLabel, withUnit } from "@/lib/format/unit";
import type { Instrument, Parameter } from "@/lib/testcards/card";
import type { CheckLine } from "@/lib/testcards/debrief-types";
import { worst } from "@/lib/testcards/verdict";

/** The lines of one reading that can be shown as soon as there is a figure; "no reading" says nothing yet. */
export function judgedLines(lines: CheckLine[]): CheckLine[] {
  return lines.filter(({ comparison, onGauge }) => comparison !== "abort" && onGauge !== null);
}

/** As flown and hot day each with a mark of its own: a withheld hot day never hides behind a green one. */
export function ReadingMark({ lines }: { lines: CheckLine[] }) {
  const judged = judgedLines(lines);
  const flown = judged.filter(({ comparison }) => comparison !== "hot day, placard");
  const hot = judged.filter((line) => line.comparison === "hot day, placard" && !waitsForTheAir(line));
  return (
    <span className="flex flex-col items-end gap-1">
      {[
        { name: "As flown", group: flown },
        { name: "Hot day", group: hot },
      ].map(({ name, group }) =>
        group.length > 0 ? (
          <span key={name} className="flex items-center gap-2">
            <span className="text-ink-soft">{name}</span>
            <GroupMark lines={group} />
          </span>
        ) : null,
      )}
    </span>
  );
}

function GroupMark({ lines }: { lines: CheckLine[] }) {
  const verdict = worst(lines.map((line) => line.verdict));
  const reason = lines.find((line) => line.verdict === "no verdict")?.reasons[0] ?? null;
  return <VerdictMark verdict={verdict} reason={verdict === "no verdict" ? reason : null} />;
}

/** A figure is there, but the air, the height or the time that the hot day needs is not typed yet. */
function waitsForTheAir({ comparison, verdict, reasons }: CheckLine): boolean {
  return comparison === "hot day, placard" && verdict === "no verdict" && reasons[0] === "no reading";
}

/** The reading on a strip with its true and hot-day values, and in words; provisional until the engineer has looked. */
export function ReadingVerdict({
  lines,
  parameter,
  instrument,
}: {
  lines: CheckLine[];
  parameter: Parameter | undefined;
  instrument: Instrument | undefined;
}) {
  const judged = judgedLines(lines);
  const main = judged.find(({ comparison }) => comparison === "hot day, placard") ?? judged[0];
  if (!main) return null;
  const strip = stripOf(judged, main, parameter, instrument);
  return (
    <div className="mt-3" aria-live="polite">
      {strip ? (
        <>
          <ArcStrip title={parameter?.name ?? "Reading"} strip={strip} />
          {main.limit ? (
            <p className="text-ink-soft">Scale in {unitLabel(main.limit.unit)}. Open mark: on the gauge; filled: true; diamond: hot day.</p>
          ) : null}
        </>
      ) : null}
      <p className="mt-1">
        {sentences(judged).join(" ")} <span className="text-ink-soft">Provisional until the engineer has reviewed.</span>
      </p>
    </div>
  );
}

function sentences(lines: CheckLine[]): string[] {
  const flown = lines.filter(({ comparison }) => comparison.startsWith("as flown"));
  const worstFlown = [...flown].sort((a, b) => (a.margin ?? 0) - (b.margin ?? 0))[0];
  const hot = lines.find(({ comparison }) => comparison === "hot day, placard");
  const say = (line: CheckLine | undefined, what: string) => {
    if (!line?.limit) return [];
    if (waitsForTheAir(line)) return [`${what}: no verdict yet, ${line.why || "a reading it needs is missing"}.`];
    if (line.verdict === "no verdict") {
      const figure = line.hotDay ? `, ${withUnit(formatDerived(line.hotDay.value), line.hotDay.unit)} for information only` : "";
      return [`${what}: no verdict, ${line.reasons[0] ?? "not judged"}${line.why ? ` (${line.why})` : ""}${figure}.`];
    }
    if (line.margin === null) return [`${what}: ${line.verdict}.`];
    const to = line.comparison.split(", ")[1];
    const amount = withUnit(formatMargin(Math.abs(line.margin)), line.limit.unit);
    if (line.verdict === "exceeded") return [`${what} ${amount} past the ${to}.`];
    if (line.verdict === "marginal") return [`${what} ${amount} inside the ${to}, but within U: it cannot be shown to be inside.`];
    if (line.verdict === "within") return [`${what} ${amount} inside the ${to}.`];
    return [];
  };
  return [...say(worstFlown, "As flown"), ...say(hot, "Hot day")];
}
