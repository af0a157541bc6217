import type { CardDocument } from "./card";
import type { CheckContext, Debrief, ReadingEntry } from "./debrief-types";

const PROPERTIES = ["value", "lowest", "atS", "altitudeFt", "oat"] as const;

/**
 * A copy of the debrief with an engineer's amendments in place of what was typed; the raw debrief is not touched.
 * An amendment names a reading, or a field by its key ("<point>.<reading>.oat", "<point>.<reading>.rows.3"). The last one wins.
 */
export function amended(card: CardDocument, debrief: Debrief, amendments: CheckContext["amendments"]): Debrief {
  if (amendments.length === 0) return debrief;
  const points = debrief.points.map((said) => {
    const known = card.content.points.some((point) => point.id === said.point);
    if (!known) return said;
    return { ...said, readings: said.readings.map((entry) => amendments.reduce((now, one) => amendEntry(said.point, now, one), entry)) };
  });
  return { ...debrief, points };
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
