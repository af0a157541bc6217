import type { FindingPlace } from "../readiness-types";
import { convert, convertDifference, dimensionOf, type Unit } from "../units";
import { atPoint, type CardFacts, isNumber, type Problem, type Rule, whereItFits } from "./rule";
import { amount, figure, withUnit } from "./say";

/** A temperature difference or a rate, and the figure of the same thing it should agree with. */
type Pair = { what: string; value: number; unit: Unit; of: number; ofUnit: Unit; where: FindingPlace };

const DIFFERENCES = ["rate", "spread", "peak to peak", "change from baseline"];

/** The temperature unit behind a rate, so that both kinds are compared alike. */
const scaleOf = (unit: Unit): Unit => (unit === "degC/min" ? "degC" : unit === "degF/min" ? "degF" : unit === "K/s" ? "K" : unit);

function withThe32({ value, unit, of, ofUnit }: Pair): number | null {
  const [to, from] = [scaleOf(unit), scaleOf(ofUnit)];
  if (to === from || dimensionOf(to) !== "temperature" || dimensionOf(from) !== "temperature") return null;
  const wrong = convert(of, from, to);
  const right = convertDifference(of, from, to);
  // Half a degree of rounding is room enough: the two ways lie 32 (or 17.8) apart.
  return Math.abs(value - wrong) <= 0.51 && Math.abs(value - right) > 1 ? right : null;
}

function limitPairs(facts: CardFacts): Pair[] {
  const rows = facts.programme.limits.filter((l) => DIFFERENCES.includes(l.statistic));
  const programme = rows.flatMap((card) =>
    rows
      .filter((p) => card.layer === "card" && p.layer === "placard" && p.parameter === card.parameter && p.statistic === card.statistic)
      .map(
        (p): Pair => ({
          what: `The card limit on the ${card.statistic} of ${card.parameter}`,
          value: card.value,
          unit: card.unit,
          of: p.value,
          ofUnit: p.unit,
          where: { at: "limit", limit: card.id },
        }),
      ),
  );
  const own = facts.points.flatMap((at) =>
    at.point.limits.flatMap((limit) => {
      const parameter = at.point.readings.find((r) => r.id === limit.reading)?.parameter;
      return rows
        .filter((row) => row.parameter === parameter && row.statistic === limit.statistic)
        .map(
          (row): Pair => ({
            what: `${at.name}: the limit ${limit.label}`,
            value: limit.value,
            unit: limit.unit,
            of: row.value,
            ofUnit: row.unit,
            where: atPoint(at, "limits", limit.id),
          }),
        );
    }),
  );
  return [...programme, ...own];
}

function ratePairs(facts: CardFacts): Pair[] {
  return facts.points.flatMap((at) => {
    const own = at.point.readings.flatMap((r): Pair[] => {
      const standard = r.parameter === null ? null : facts.parameters.get(r.parameter)?.standardRatePerMin;
      if (!r.expectedRatePerMin || !standard) return [];
      return [
        {
          what: `${at.name}: the expected rate of ${r.label}`,
          ...r.expectedRatePerMin,
          of: standard.value,
          ofUnit: standard.unit,
          where: atPoint(at, "readings", r.id),
        },
      ];
    });
    const aborts = at.lines.filter(isNumber).flatMap((line): Pair[] => {
      const instrument = facts.instruments.get(line.instrument);
      const parameter = facts.parameters.get(line.parameter);
      if (!line.perMinute || !instrument || !parameter) return [];
      return [
        {
          what: `${at.name}: the abort rate of ${parameter.shortName}`,
          value: line.onGauge,
          unit: instrument.unit,
          of: line.trueValue,
          ofUnit: parameter.unit,
          where: atPoint(at, "aborts", line.id),
        },
      ];
    });
    return [...own, ...aborts];
  });
}

function deltaAsTemperature(facts: CardFacts): Problem[] {
  return [...limitPairs(facts), ...ratePairs(facts)].flatMap((pair): Problem[] => {
    const right = whereItFits(() => withThe32(pair));
    if (right === null) return [];
    const from = amount(pair.of, scaleOf(pair.ofUnit));
    const message = `${pair.what}, ${amount(pair.value, scaleOf(pair.unit))}, is ${from} of difference converted with the 32. Convert by 1.8 alone: ${withUnit(figure(right, 1), scaleOf(pair.unit))}.`;
    return [{ message, where: pair.where }];
  });
}

export const differenceRules: Rule[] = [
  { number: "8", code: "delta-as-temperature", severity: "must", at: "card", card: deltaAsTemperature },
];
