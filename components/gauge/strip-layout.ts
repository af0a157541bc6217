import type { Side } from "@/lib/testcards/words";
import { place, type Span, scaleAround, spreadLabels } from "./geometry";

/** Everything of one strip stands in one unit, the limit's; the caller has converted. */
export type StripMark = { kind: "reading" | "true" | "hot day"; value: number; expandedUncertainty?: number | null; label: string };
export type StripLimit = { layer: "placard" | "card" | "abort"; side: Side; value: number; label: string };
export type StripBand = { low: number | null; high: number | null };
export type Strip = { normal: StripBand | null; limits: StripLimit[]; marks: StripMark[]; scale?: Span };

export type StripLayout = {
  scale: Span;
  zones: { tone: "green" | "yellow"; from: number; to: number }[];
  radials: { layer: StripLimit["layer"]; side: Side; at: number; label: string; labelAt: number }[];
  marks: {
    kind: StripMark["kind"];
    at: number;
    beyond: "low" | "high" | null;
    bar: { from: number; to: number } | null;
    label: string;
    labelAt: number;
  }[];
};

const CHARACTER = 10; // mean advance of B612 at 16 px, the phone's size

/** Room a label takes on the strip. */
export const labelWidth = (label: string) => label.length * CHARACTER;

const outermost = (limits: StripLimit[], side: Side): number | null => {
  const placards = limits.filter((limit) => limit.side === side && limit.layer === "placard");
  const values = (placards.length > 0 ? placards : limits.filter((limit) => limit.side === side)).map((limit) => limit.value);
  if (values.length === 0) return null;
  return side === "max" ? Math.min(...values) : Math.max(...values);
};

/** Green is the normal range, yellow lies between it and the limit; where no normal range is known nothing is coloured. */
export function layOutStrip({ normal, limits, marks, scale: given }: Strip, length: number): StripLayout {
  const bars = marks.flatMap(({ value, expandedUncertainty: u }) => (u ? [value - u, value + u] : [value]));
  const ends = [normal?.low, normal?.high].filter((value): value is number => typeof value === "number");
  const scale = given ?? scaleAround([...limits.map((limit) => limit.value), ...bars, ...ends]);
  const at = (value: number) => place(value, scale, length).at;
  const max = outermost(limits, "max");
  const min = outermost(limits, "min");

  const zones: StripLayout["zones"] = [];
  if (normal) {
    const low = normal.low ?? min ?? scale.low;
    const high = normal.high ?? max ?? scale.high;
    zones.push({ tone: "green", from: at(low), to: at(high) });
    if (max !== null && max > high) zones.push({ tone: "yellow", from: at(high), to: at(max) });
    if (min !== null && min < low) zones.push({ tone: "yellow", from: at(min), to: at(low) });
  }

  const above = spreadLabels(
    limits.map((limit) => ({ at: at(limit.value), width: labelWidth(limit.label) })),
    length,
  );
  const below = spreadLabels(
    marks.map((mark) => ({ at: at(mark.value), width: labelWidth(mark.label) })),
    length,
  );
  return {
    scale,
    zones,
    radials: limits.map(({ layer, side, value, label }, i) => ({ layer, side, at: at(value), label, labelAt: above[i] ?? at(value) })),
    marks: marks.map(({ kind, value, expandedUncertainty: u, label }, i) => {
      const where = place(value, scale, length);
      return { kind, ...where, bar: u ? { from: at(value - u), to: at(value + u) } : null, label, labelAt: below[i] ?? where.at };
    }),
  };
}
