import { LinePlot, type PlotLimit } from "@/components/plot/line-plot";
import { formatOnGauge } from "@/lib/format/unit";
import { correctReading } from "@/lib/testcards/calibration";
import { type CardDocument, type CardPoint, instrumentOf } from "@/lib/testcards/card";
import { secondsOf } from "@/lib/testcards/debrief";
import type { CheckLine, CheckReport, Debrief, ReadingEntry } from "@/lib/testcards/debrief-types";
import { convert } from "@/lib/testcards/units";

type PlotsProps = { document: CardDocument; point: CardPoint; report: CheckReport; debrief: Debrief };

/** Readings typed row by row, drawn true against time, with the limits they were judged by on the picture. */
export function SeriesPlots({ document, point, report, debrief }: PlotsProps) {
  const said = debrief.points.find((one) => one.point === point.id);
  const drawn = point.readings.flatMap((reading) => {
    const entry = said?.readings.find((one) => one.reading === reading.id);
    const instrument = instrumentOf(document, reading.instrument);
    const lines = report.lines.filter((line) => line.point === point.id && line.reading === reading.id && line.statistic === "instant");
    const unit = lines.find(({ limit }) => limit)?.limit?.unit;
    if (!entry || entry.unit || !instrument?.calibration || !unit || point.grid?.by !== "time") return [];
    const { calibration } = instrument;
    const points = timesOf(entry).flatMap(({ minutes, value }) => {
      const corrected = correctReading(value, calibration);
      return corrected.inRange ? [{ x: minutes, y: convert(corrected.value, instrument.unit, unit) }] : [];
    });
    if (points.length < 3) return [];
    const highest = entry.rows.reduce((best, row) => (row.value > best.value ? row : best));
    return [
      {
        reading,
        points,
        unit,
        limits: limitLines(lines),
        summary: `${points.length} readings, highest ${formatOnGauge(highest.value, instrument)} on the gauge. Drawn true.`,
      },
    ];
  });
  if (drawn.length === 0) return null;
  return (
    <div className="mt-6 grid grid-cols-1 gap-8 wide:grid-cols-2">
      {drawn.map(({ reading, points, unit, limits, summary }) => (
        <LinePlot
          key={reading.id}
          title={reading.label}
          summary={summary}
          x={{ name: "Time", unit: "min" }}
          y={{ name: "True", unit }}
          points={points}
          limits={limits}
        />
      ))}
    </div>
  );
}

function timesOf(entry: ReadingEntry): { minutes: number; value: number }[] {
  return entry.rows.flatMap(({ atS, label, value }) => {
    const seconds = atS ?? secondsOf(label);
    return seconds === null ? [] : [{ minutes: seconds / 60, value }];
  });
}

function limitLines(lines: CheckLine[]): PlotLimit[] {
  return (["placard", "card"] as const).flatMap((layer) => {
    const limit = lines.find(({ comparison, limit: one }) => comparison === `as flown, ${layer}` && one?.side === "max")?.limit;
    return limit ? [{ value: limit.value, label: layer === "card" ? "card limit" : "placard", layer }] : [];
  });
}
