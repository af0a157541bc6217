import type { Limit } from "@/lib/testcards/card";
import type { Unit } from "@/lib/testcards/units";
import type { LimitCondition, LimitStatistic, Side } from "@/lib/testcards/words";
import { seedId } from "./ids";

type Row = {
  parameter: string;
  side: Side;
  unit: Unit;
  placard: number;
  card: number;
  when?: LimitCondition;
  forS?: number;
  statistic?: LimitStatistic;
  programme?: boolean; // set by the programme itself, on both layers
};

const PLACARDS = "HF-4L-OM rev 6";
const PROGRAMME = "PL-01 rev 2";

/** True values. "For" is how long a reading may stay beyond the limit, in seconds. */
const ROWS: Row[] = [
  { parameter: "coolant", side: "max", unit: "degC", placard: 115, card: 109 },
  { parameter: "coolant", side: "min", unit: "degC", placard: 50, card: 55, when: "take-off" },
  { parameter: "cht", side: "max", unit: "degC", placard: 165, card: 155 },
  { parameter: "oil-t", side: "max", unit: "degC", placard: 125, card: 118 },
  { parameter: "oil-t", side: "min", unit: "degC", placard: 45, card: 50, when: "full power" },
  { parameter: "tit", side: "max", unit: "degC", placard: 900, card: 880 },
  { parameter: "iat", side: "max", unit: "degC", placard: 65, card: 60 },
  { parameter: "oil-p", side: "max", unit: "psi", placard: 75, card: 72 },
  { parameter: "oil-p", side: "max", unit: "psi", placard: 100, card: 97, when: "cold start" },
  { parameter: "oil-p", side: "min", unit: "psi", placard: 30, card: 33, when: "at power" },
  { parameter: "oil-p", side: "min", unit: "psi", placard: 12, card: 15, when: "idle", forS: 10 },
  { parameter: "rpm", side: "max", unit: "rpm", placard: 2750, card: 2730, when: "full power" },
  { parameter: "map", side: "max", unit: "inHg", placard: 31, card: 30.5, when: "full power" },
  { parameter: "rpm", side: "max", unit: "rpm", placard: 2600, card: 2580, when: "at power", forS: 300 },
  { parameter: "map", side: "max", unit: "inHg", placard: 29.5, card: 29, when: "at power", forS: 300 },
  { parameter: "fuel-p", side: "min", unit: "bar", placard: 2.4, card: 2.6 },
  { parameter: "fuel-p", side: "max", unit: "bar", placard: 3.6, card: 3.4 },
  { parameter: "line", side: "max", unit: "degC", placard: 58, card: 52, programme: true },
  { parameter: "skin", side: "max", unit: "degC", placard: 105, card: 98, programme: true },
  { parameter: "cht", side: "max", unit: "degC/min", placard: 30, card: 26, statistic: "rate", programme: true },
];

export const LIMITS: Limit[] = ROWS.flatMap((row, index) =>
  (["placard", "card"] as const).map((layer, side) => ({
    id: seedId("limit", index * 2 + side + 1),
    parameter: row.parameter,
    side: row.side,
    layer,
    value: row[layer],
    unit: row.unit,
    appliesWhen: row.when ?? "always",
    forS: row.forS ?? 0,
    statistic: row.statistic ?? "instant",
    source: layer === "placard" && !row.programme ? PLACARDS : PROGRAMME,
    authority: layer === "placard" && !row.programme ? "engine" : "programme",
  })),
);
