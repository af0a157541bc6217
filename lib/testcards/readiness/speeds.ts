import type { CardPoint } from "../card";
import { convert, sameDimension, type Unit } from "../units";
import { type StatedSpeed, whereItFits } from "./rule";

const AIRSPEED_UNITS: readonly Unit[] = ["kt", "km/h", "mph", "m/s"];
const IN_TEXT = /((?:\d+(?:\.\d+)?\s*\/\s*)*\d+(?:\.\d+)?)\s*(?:±\s*(\d+(?:\.\d+)?)\s*)?(?:kt|KIAS|KCAS)\b(?:\s*±\s*(\d+(?:\.\d+)?))?/g;
/** "below 105 kt" is a bound, and a wind is no airspeed of the aircraft. */
const NOT_FLOWN = /(?:below|under|not above|at most|less than|wind|gusts?|max(?:imum)?|<=?|≤)\s*$/i;

function spokenIn(text: string, field: "entry" | "steps", item?: string): StatedSpeed[] {
  return [...text.matchAll(IN_TEXT)].flatMap((found): StatedSpeed[] => {
    if (NOT_FLOWN.test(text.slice(0, found.index))) return [];
    const speeds = (found[1] ?? "").split("/").map(Number);
    return [{ kt: Math.max(...speeds) + Number(found[2] ?? found[3] ?? 0), said: found[0].trim(), field, ...(item && { item }) }];
  });
}

/** The speeds a point flies, each at the fast end of its tolerance, in knots. Indicated and calibrated are taken alike. */
export function statedSpeeds(point: CardPoint): StatedSpeed[] {
  const entry = point.entry.flatMap((e): StatedSpeed[] => {
    if (!AIRSPEED_UNITS.includes(e.unit) || !whereItFits(() => sameDimension(e.unit, "kt"))) return [];
    const fastest = convert(e.value + (e.relation === "about" ? (e.tolerance ?? 0) : 0), e.unit, "kt");
    return [{ kt: fastest, said: `${e.value} ${e.unit}${e.tolerance === null ? "" : ` ±${e.tolerance}`}`, field: "entry", item: e.id }];
  });
  return [...entry, ...spokenIn(point.entryText, "entry"), ...point.steps.flatMap((step) => spokenIn(step.text, "steps", step.id))];
}
