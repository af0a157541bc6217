"use client";
import { ArcStrip } from "@/components/gauge/arc-strip";
import { stripOf } from "@/components/gauge/reading-strip";
import { VerdictMark } from "@/components/gauge/verdict-mark";
import { formatMargin } from "@/lib/format/number";
import { unitLabel, withUnit } from "@/lib/format/unit";
import type { Instrument, Parameter } from "@/lib/testcards/card";
import type { CheckLine } from "@/lib/testcards/debrief-types";
import { worst } from "@/lib/testcards/verdict";

/** The lines of one reading that can be shown as soon as there is a figure; "no reading" says nothing yet. */
export function judgedLines(lines: CheckLine[]): CheckLine[] {
  return lines.filter(({ comparison, onGauge }) => comparison !== "abort" && onGauge !== null);
}

export function ReadingMark({ lines }: { lines: CheckLine[] }) {
  const judged = judgedLines(lines).filter(({ comparison, verdict }) => comparison !== "hot day, placard" || verdict !== "no verdict");
  if (judged.length === 0) return null;
  const verdict = worst(judged.map((line) => line.verdict));
  const reason = judged.find((line) => line.verdict === "no verdict")?.reasons[0] ?? null;
  return <VerdictMark verdict={verdict} reason={verdict === "no verdict" ? reason : null} />;
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
    if (!line?.limit || line.margin === null) return [];
    const to = line.comparison.split(", ")[1];
    const amount = withUnit(formatMargin(Math.abs(line.margin)), line.limit.unit);
    if (line.verdict === "exceeded") return [`${what} ${amount} past the ${to}.`];
    if (line.verdict === "marginal") return [`${what} ${amount} inside the ${to}, but within U: it cannot be shown to be inside.`];
    if (line.verdict === "within") return [`${what} ${amount} inside the ${to}.`];
    return [`${what} no verdict: ${line.reasons[0] ?? "not judged"}${line.why ? ` (${line.why})` : ""}.`];
  };
  return [...say(worstFlown, "As flown"), ...say(hot, "Hot day")];
}
