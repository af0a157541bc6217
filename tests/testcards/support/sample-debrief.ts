/** A debrief of the sample card as a pilot would type it: only what is given is said. */
import type { CardDocument } from "@/lib/testcards/card";
import { checkDebrief } from "@/lib/testcards/check-debrief";
import { emptyDebrief, emptyEntry } from "@/lib/testcards/debrief-blank";
import type { CheckContext, CheckLine, CheckReport, Debrief, PointDebrief, ReadingEntry } from "@/lib/testcards/debrief-types";
import type { Comparison } from "@/lib/testcards/words";

export type Typed = { outcome?: PointDebrief["outcome"] } & Partial<Omit<PointDebrief, "point" | "readings" | "outcome">> & {
    readings?: Record<string, Partial<ReadingEntry>>;
  };

/** Every point flown on condition unless said otherwise; weather, calls and the rest through `over`. */
export function typedDebrief(card: CardDocument, points: Record<string, Typed>, over: Partial<Debrief> = {}): Debrief {
  const blank = emptyDebrief(card, card.content.kind);
  return {
    ...blank,
    revisionsFlown: [{ card: card.identity.id, letter: card.identity.letter, note: "" }],
    safety: { ...blank.safety, limitExceeded: false, callMade: false, rough: false },
    points: blank.points.map((point) => {
      const typed = points[point.point];
      if (!typed) return point;
      const { readings = {}, ...said } = typed;
      const entries = point.readings.map((entry) => ({ ...emptyEntry({ id: entry.reading }), ...readings[entry.reading] }));
      return { ...point, outcome: "flown", onCondition: true, ...said, readings: entries };
    }),
    ...over,
  };
}

export const CONTEXT: CheckContext = {
  flownOn: "2031-05-05",
  configurationId: "c-14",
  stationPressureAltitudeFt: 350,
  calibrations: null,
  amendments: [],
  dispositions: [],
  groundingOpen: false,
};

export function checked(card: CardDocument, debrief: Debrief, over: Partial<CheckContext> = {}): CheckReport {
  return checkDebrief(card, debrief, { ...CONTEXT, ...over });
}

/** The one line of a comparison; of several limits the one with this condition. */
export function lineOf(report: CheckReport, reading: string, comparison: Comparison, appliesWhen = "always"): CheckLine {
  const found = report.lines.filter((l) => l.reading === reading && l.comparison === comparison && l.limit?.appliesWhen === appliesWhen);
  const [line] = found;
  if (!line || found.length > 1) throw new Error(`${found.length} lines for ${reading}, ${comparison}, ${appliesWhen}`);
  return line;
}

/** One value a minute, the last of them at `lastMin`. */
export function minuteRows(values: number[], lastMin = values.length - 1): ReadingEntry["rows"] {
  return values.map((value, i) => {
    const minute = lastMin - (values.length - 1) + i;
    return { atS: minute * 60, label: String(minute), value };
  });
}

export const digit = (value: number | null | undefined): string => (value === null || value === undefined ? "none" : value.toFixed(1));
