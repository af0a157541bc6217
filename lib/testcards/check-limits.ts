/** Which limits speak about one reading: the card's table, the placards, and the point's own. */
import type { CardDocument, CardPoint, Limit, Reading } from "./card";
import type { CheckLine } from "./debrief-types";
import type { Unit } from "./units";
import type { Comparison, LimitCondition, LimitStatistic, Side } from "./words";

export type AppliedLimit = {
  id: string;
  comparison: Extract<Comparison, "as flown, card" | "as flown, placard">;
  side: Side;
  value: number;
  unit: Unit;
  forS: number;
  statistic: LimitStatistic;
  appliesWhen: LimitCondition;
  source: string;
  authority: Limit["authority"] | null; // null: the point's own
  ownUncertainty: number | null;
  printed: boolean; // a limit that the point prints must get a verdict
};

/**
 * Every programme limit whose condition occurs while the reading is taken. Card rows count only where the point takes the card's table;
 * a placard holds whatever the point says. Only "cold start" replaces the "always" row of its parameter.
 */
export function limitsOn(card: CardDocument, point: CardPoint, reading: Reading): AppliedLimit[] {
  const own = point.limits.filter((limit) => limit.reading === reading.id);
  const when = new Set<LimitCondition>(["always", ...reading.conditions]);
  const table = card.programme.limits.filter((limit) => limit.parameter === reading.parameter && when.has(limit.appliesWhen));
  const replaced = (limit: Limit) =>
    limit.appliesWhen === "always" &&
    table.some((other) => other.appliesWhen === "cold start" && other.side === limit.side && other.layer === limit.layer);
  const applied = table
    .filter((limit) => !replaced(limit) && (limit.layer === "placard" || point.cardTable))
    .map((limit): AppliedLimit => {
      const { id, side, value, unit, forS, statistic, appliesWhen, source, authority } = limit;
      const comparison = limit.layer === "card" ? "as flown, card" : "as flown, placard";
      const printed = point.cardTable || own.some((mine) => mine.side === side);
      return { id, comparison, side, value, unit, forS, statistic, appliesWhen, source, authority, ownUncertainty: null, printed };
    });
  return [
    ...applied,
    ...own.map(
      ({ id, side, value, unit, forS, statistic, source, expandedUncertainty }): AppliedLimit => ({
        id,
        comparison: "as flown, card",
        side,
        value,
        unit,
        forS,
        statistic,
        appliesWhen: "always",
        source,
        authority: null,
        ownUncertainty: expandedUncertainty,
        printed: true,
      }),
    ),
  ];
}

export function limitOnLine(limit: AppliedLimit): NonNullable<CheckLine["limit"]> {
  const { id, side, value, unit, source, authority, appliesWhen, forS } = limit;
  return { id, side, value, unit, source, authority, appliesWhen, forS };
}

/** "3:10" for 190 seconds. */
export function clock(seconds: number): string {
  const whole = Math.round(seconds);
  return `${Math.floor(whole / 60)}:${String(whole % 60).padStart(2, "0")}`;
}
