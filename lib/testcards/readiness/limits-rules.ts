import { gaugeLimit } from "../calibration";
import type { Limit } from "../card";
import { unitSymbol } from "../unit-symbols";
import { convert, convertDifference, dimensionOf, sameDimension, UNITS, type Unit } from "../units";
import { atPoint, type CardFacts, isNumber, type Problem, type Rule, whereItFits } from "./rule";
import { amount, figure, midSentence, onGaugeFigure, sentence, withUnit } from "./say";

const ON_THE_MARK = 1e-6;
const DIFFERENCES = ["spread", "peak to peak", "change from baseline"];

const nameOf = (facts: CardFacts, code: string): string => facts.parameters.get(code)?.shortName ?? code;
const onScaleOf = (value: number, from: Unit, to: Unit, statistic: Limit["statistic"]): number =>
  DIFFERENCES.includes(statistic) ? convertDifference(value, from, to) : convert(value, from, to);

function placardOf(facts: CardFacts, limit: Limit): Limit | undefined {
  const rows = facts.programme.limits.filter(
    (l) =>
      l.layer === "placard" &&
      l.parameter === limit.parameter &&
      l.side === limit.side &&
      l.appliesWhen === limit.appliesWhen &&
      l.statistic === limit.statistic,
  );
  return rows.find((l) => l.forS === limit.forS) ?? (rows.length === 1 ? rows[0] : undefined);
}

function cardPastPlacard(facts: CardFacts): Problem[] {
  return facts.programme.limits.flatMap((limit): Problem[] => {
    const placard = limit.layer === "card" ? placardOf(facts, limit) : undefined;
    if (!placard) return [];
    const value = whereItFits(() => onScaleOf(limit.value, limit.unit, placard.unit, limit.statistic));
    if (value === null) return [];
    const looser = limit.side === "max" ? value > placard.value + ON_THE_MARK : value < placard.value - ON_THE_MARK;
    const longer = limit.forS > placard.forS;
    if (!looser && !longer) return [];
    const what = `${nameOf(facts, limit.parameter)} ${limit.side === "max" ? "maximum" : "minimum"}`;
    const message = looser
      ? `${what}: the card limit ${amount(limit.value, limit.unit)} is looser than the placard ${amount(placard.value, placard.unit)}. Bring it inside.`
      : `${what}: the card allows ${limit.forS} s beyond it, the placard ${placard.forS} s. Bring it inside.`;
    return [{ message, where: { at: "limit", limit: limit.id } }];
  });
}

/** A document and its revision: "HF rev 6", "AFM issue 2, amendment 1". */
const hasRevision = (source: string): boolean => /\S+.*\b(rev(ision)?|iss(ue)?|ed(ition)?|am(en)?d(men)?t)\b\.?\s*\S/i.test(source);

function noSource(facts: CardFacts): Problem[] {
  const said = (what: string, source: string) =>
    source.trim() === ""
      ? `${what} names no source document and revision. Add both.`
      : `${what} names the source "${source.trim()}" without its revision. Add both.`;
  const programme = facts.programme.limits.flatMap((l): Problem[] => {
    const what = `${sentence(nameOf(facts, l.parameter))} ${l.layer} limit ${amount(l.value, l.unit)}`;
    return hasRevision(l.source) ? [] : [{ message: said(what, l.source), where: { at: "limit", limit: l.id } }];
  });
  const own = facts.points.flatMap((at) =>
    at.point.limits.flatMap((l): Problem[] =>
      hasRevision(l.source) ? [] : [{ message: said(`${at.name}: the limit ${l.label}`, l.source), where: atPoint(at, "limits", l.id) }],
    ),
  );
  return [...programme, ...own];
}

const isUnit = (unit: Unit | null): unit is Unit => unit !== null && UNITS.includes(unit);

function limitUnits(facts: CardFacts): Problem[] {
  return facts.programme.limits.flatMap((l): Problem[] => {
    const parameter = facts.parameters.get(l.parameter);
    const rate = l.statistic === "rate" && isUnit(l.unit) && dimensionOf(l.unit) === "temperature rate";
    if (isUnit(l.unit) && (rate || !parameter || sameDimension(l.unit, parameter.unit))) return [];
    const fault = isUnit(l.unit) ? `is in ${unitSymbol(l.unit)}, which does not measure it` : "has no unit";
    return [
      {
        message: `${nameOf(facts, l.parameter)} ${l.layer} limit ${figure(l.value)} ${fault}. Use the unit on the panel.`,
        where: { at: "limit", limit: l.id },
      },
    ];
  });
}

function readingUnits(facts: CardFacts): Problem[] {
  return facts.points.flatMap((at) => {
    const { point, name } = at;
    const gauges = point.readings.flatMap((r): Problem[] => {
      const instrument = r.instrument === null ? undefined : facts.instruments.get(r.instrument);
      if (r.kind !== "number" || (isUnit(r.unit) && (!instrument || instrument.unit === r.unit))) return [];
      const fault =
        isUnit(r.unit) && instrument
          ? `is asked in ${unitSymbol(r.unit)}, but ${instrument.name} shows ${unitSymbol(instrument.unit)}`
          : "has no unit";
      return [{ message: `${name}: the reading ${r.label} ${fault}. Use the unit on the panel.`, where: atPoint(at, "readings", r.id) }];
    });
    const limits = point.limits.flatMap((l): Problem[] => {
      const reading = point.readings.find((r) => r.id === l.reading);
      const comparable =
        isUnit(l.unit) &&
        (l.statistic === "rate" ||
          !reading ||
          reading.kind === "count" ||
          !isUnit(reading.unit) ||
          l.unit === "%" ||
          sameDimension(l.unit, reading.unit));
      if (comparable) return [];
      const fault = isUnit(l.unit)
        ? `is in ${unitSymbol(l.unit)}, but its reading is in ${reading?.unit ? unitSymbol(reading.unit) : "no unit"}`
        : "has no unit";
      return [{ message: `${name}: the limit ${l.label} ${fault}. Use the unit on the panel.`, where: atPoint(at, "limits", l.id) }];
    });
    const entries = point.entry.flatMap((e): Problem[] => {
      const instrument = e.instrument === null ? undefined : facts.instruments.get(e.instrument);
      if (isUnit(e.unit) && (!instrument || instrument.unit === e.unit)) return [];
      return [
        {
          message: `${name}: the entry condition ${nameOf(facts, e.parameter)} has no unit, or not the gauge's own. Use the unit on the panel.`,
          where: atPoint(at, "entry", e.id),
        },
      ];
    });
    return [...gauges, ...limits, ...entries];
  });
}

function normalReachesAbort(facts: CardFacts): Problem[] {
  const seen = new Set<string>();
  return facts.points.flatMap((at) =>
    at.lines.filter(isNumber).flatMap((line): Problem[] => {
      const instrument = facts.instruments.get(line.instrument);
      const parameter = facts.parameters.get(line.parameter);
      const normal = parameter?.normal;
      const calibration = instrument?.calibration;
      if (!instrument || !parameter || !calibration || normal?.high == null || line.side !== "max" || line.perMinute) return [];
      const key = `${line.id} ${line.instrument}`;
      if (seen.has(key)) return [];
      seen.add(key);
      const high = normal.high;
      const top = whereItFits(() =>
        gaugeLimit({ limit: convert(high, normal.unit, instrument.unit), side: "max", calibration, readable: instrument.readable }),
      );
      if (!top || top.printed < line.onGauge - ON_THE_MARK) return [];
      const shown = (value: number) => withUnit(onGaugeFigure(value, instrument.readable), instrument.unit);
      const message = `${at.name}: the normal range of ${midSentence(parameter.shortName)} tops at ${shown(top.printed)} on the gauge, at or past the abort number ${shown(line.onGauge)}. Narrow it.`;
      return [{ message, where: atPoint(at, "aborts", line.id) }];
    }),
  );
}

export const limitsRules: Rule[] = [
  { number: "2", code: "card-limit-past-placard", severity: "must", at: "card", card: cardPastPlacard },
  { number: "3", code: "limit-no-source", severity: "must", at: "card", card: noSource },
  { number: "7", code: "unit-missing", severity: "must", at: "card", card: (facts) => [...limitUnits(facts), ...readingUnits(facts)] },
  { number: "54", code: "normal-reaches-abort", severity: "should", at: "card", card: normalReachesAbort },
];
