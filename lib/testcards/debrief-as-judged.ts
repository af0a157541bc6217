import type { CardDocument } from "./card";
import { secondsOf } from "./debrief";
import type { CheckContext, Debrief, ReadingEntry } from "./debrief-types";

const PROPERTIES = ["value", "lowest", "atS", "altitudeFt", "oat"] as const;

/**
 * A copy of the debrief as it is judged: an engineer's amendments in place of what was typed, and rows of a grid by time at the time that
 * their label says. The raw debrief is not touched. An amendment names a reading, or a field by its key ("<point>.<reading>.oat",
 * "<point>.<reading>.rows.3"); of several for one field the last wins.
 */
export function debriefAsJudged(card: CardDocument, debrief: Debrief, amendments: CheckContext["amendments"]): Debrief {
  const points = debrief.points.map((said) => {
    const point = card.content.points.find((candidate) => candidate.id === said.point);
    if (!point) return said;
    const readings = said.readings.map((entry) => amendments.reduce((now, one) => amendEntry(said.point, now, one), entry));
    return { ...said, readings: point.grid?.by === "time" ? readings.map(timedRows) : readings };
  });
  return { ...debrief, points };
}

function timedRows(entry: ReadingEntry): ReadingEntry {
  return { ...entry, rows: entry.rows.map((row) => (row.atS === null ? { ...row, atS: secondsOf(row.label) } : row)) };
}

function amendEntry(point: string, entry: ReadingEntry, { reading, value }: { reading: string; value: number }): ReadingEntry {
  const key = reading.startsWith(`${point}.`) ? reading.slice(point.length + 1) : reading;
  if (!Number.isFinite(value)) return entry;
  if (key === entry.reading) return { ...entry, value };
  if (!key.startsWith(`${entry.reading}.`)) return entry;
  const what = key.slice(entry.reading.length + 1);
  const property = PROPERTIES.find((candidate) => candidate === what);
  if (property) return { ...entry, [property]: value };
  const row = /^rows\.(\d+)$/.exec(what);
  return row ? { ...entry, rows: entry.rows.map((old, index) => (index === Number(row[1]) ? { ...old, value } : old)) } : entry;
}
