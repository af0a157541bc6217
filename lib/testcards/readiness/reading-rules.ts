import type { CardPoint, Reading } from "../card";
import { dimensionOf, type Unit } from "../units";
import { atPoint, type CardFacts, isNumber, type PointFacts, type Problem, type Rule, whereItFits } from "./rule";
import { figure, list, midSentence } from "./say";

const MOST_NUMBERS = 6;
const SHORTEST_GAP_S = 60;

const isFigure = (reading: Reading): boolean => reading.kind === "number" || reading.kind === "count";

function recoveryMissing(facts: CardFacts): Problem[] {
  return facts.points.flatMap((at): Problem[] =>
    at.point.recovery.trim() === ""
      ? [{ message: `${at.name} has no recovery. Write what to do after an abort.`, where: atPoint(at, "recovery") }]
      : [],
  );
}

/** "0:30", "30 s", "2", "+3 min" as seconds; null where the label is no time. */
function rowSeconds(label: string): number | null {
  const text = label.trim().replace(/^\+/, "");
  const clock = /^(\d+):(\d\d)$/.exec(text);
  if (clock) return Number(clock[1]) * 60 + Number(clock[2]);
  const plain = /^(\d+(?:\.\d+)?)\s*(s|sec|min)?$/i.exec(text);
  if (!plain) return null;
  return Number(plain[1]) * (/^s/i.test(plain[2] ?? "") ? 1 : 60);
}

function closestRows(point: CardPoint): number | null {
  const { grid } = point;
  if (grid?.by !== "time") return null;
  const inSeconds = grid.unit === "s";
  const times = grid.rows.map(rowSeconds).filter((time) => time !== null);
  const gaps = times.slice(1).map((time, i) => (time - (times[i] ?? time)) / (inSeconds ? 60 : 1));
  return gaps.length > 0 ? Math.min(...gaps) : null;
}

function tooManyNumbers(facts: CardFacts): Problem[] {
  return facts.points.flatMap((at): Problem[] => {
    const written = at.point.readings.filter((r) => r.recordedBy === "pilot" && r.onSheet === "grid" && isFigure(r));
    if (written.length === 0) return [];
    const count = written.length + (at.point.grid?.timeColumn ? 1 : 0);
    if (count > MOST_NUMBERS)
      return [
        {
          message: `${at.name} asks the pilot for ${count} hand-written numbers a set, more than ${MOST_NUMBERS}. Give some to the recorder.`,
          where: atPoint(at, "grid"),
        },
      ];
    const gap = closestRows(at.point);
    if (gap === null || gap >= SHORTEST_GAP_S) return [];
    return [
      {
        message: `${at.name} has ${figure(gap)} s between record sets, under ${SHORTEST_GAP_S} s. Give some to the recorder.`,
        where: atPoint(at, "grid"),
      },
    ];
  });
}

/** Kinds of quantity that data reduction works on without a limit: heights, speeds, times, flows, masses. */
const REDUCED = ["length", "speed", "time", "volume", "volume flow", "mass", "angle", "force", "ratio"];
const isAmbient = (text: string): boolean => /\b(oat|ambient|outside air|qnh|wind)\b/i.test(text);

function feedsACheck(facts: CardFacts, { point, lines }: PointFacts, reading: Reading): boolean {
  if (point.limits.some((limit) => limit.reading === reading.id)) return true;
  if (reading.expected && (reading.expected.low !== null || reading.expected.high !== null)) return true;
  if (reading.low !== null || reading.high !== null || reading.kind === "count") return true;
  const unit: Unit | null = reading.unit;
  if (unit !== null && (whereItFits(() => REDUCED.includes(dimensionOf(unit))) ?? true)) return true;
  const code = reading.parameter;
  if (code === null) return false;
  const parameter = facts.parameters.get(code);
  if (parameter?.normal || isAmbient(`${code} ${parameter?.name ?? ""}`)) return true;
  if (facts.programme.limits.some((limit) => limit.parameter === code)) return true;
  return point.entry.some((e) => e.parameter === code) || lines.some((line) => isNumber(line) && line.parameter === code);
}

function readingUnused(facts: CardFacts): Problem[] {
  return facts.points.flatMap((at) => {
    const { point, name } = at;
    const idle = point.readings
      .filter((reading) => isFigure(reading) && !feedsACheck(facts, at, reading))
      .map(
        (reading): Problem => ({
          message: `${name}: the reading ${reading.label} feeds no check. Remove it or add one.`,
          where: atPoint(at, "readings", reading.id),
        }),
      );
    const unread = point.limits
      .filter((limit) => !point.readings.some((reading) => reading.id === limit.reading))
      .map(
        (limit): Problem => ({
          message: `${name}: the limit ${limit.label} has no reading. Remove it or add one.`,
          where: atPoint(at, "limits", limit.id),
        }),
      );
    return [...idle, ...unread, ...ruleUnread(facts, at)];
  });
}

/** A completion rule that no reading can show. */
function ruleUnread(facts: CardFacts, at: PointFacts): Problem[] {
  const { completion, readings } = at.point;
  const codes = readings.filter(isFigure).flatMap((r) => r.parameter ?? []);
  const judged = codes.some((code) =>
    completion.rule === "stabilised" ? facts.parameters.get(code)?.stabilises : facts.parameters.get(code)?.hotDayRule !== "none",
  );
  if (completion.rule === "none" || completion.rule === "whole run" || judged) return [];
  return [
    {
      message: `${at.name}: its completion rule "${completion.rule}" has no reading. Remove it or add one.`,
      where: atPoint(at, "completion"),
    },
  ];
}

/** Every safety parameter that the point reads while the engine turns, with all its readings. */
function safetyReadings(facts: CardFacts, point: CardPoint): Map<string, Reading[]> {
  const byParameter = new Map<string, Reading[]>();
  for (const reading of point.engine === "running" ? point.readings : []) {
    if (reading.kind !== "number" || reading.parameter === null || !facts.parameters.get(reading.parameter)?.safety) continue;
    byParameter.set(reading.parameter, [...(byParameter.get(reading.parameter) ?? []), reading]);
  }
  return byParameter;
}

function expectedMissing(facts: CardFacts): Problem[] {
  return facts.points.flatMap((at) =>
    [...safetyReadings(facts, at.point)].flatMap(([code, readings]): Problem[] => {
      const parameter = facts.parameters.get(code);
      const band = readings.some((r) => r.expected && (r.expected.low !== null || r.expected.high !== null));
      // Pressures have no rate of rise that an abort allows for; temperatures do.
      const rate =
        parameter?.hotDayRule === "none" || parameter?.standardRatePerMin != null || readings.some((r) => r.expectedRatePerMin !== null);
      if (band && rate) return [];
      const fault = list([...(band ? [] : ["band"]), ...(rate ? [] : ["rate"])]);
      return [
        {
          message: `${at.name}: ${midSentence(parameter?.shortName ?? code)} has no expected ${fault}. Predict it.`,
          where: atPoint(at, "readings", readings[0]?.id),
        },
      ];
    }),
  );
}

function soakOneSensor(facts: CardFacts): Problem[] {
  return facts.points.flatMap((at): Problem[] => {
    if (!at.point.soak) return [];
    const hot = new Set(
      at.point.readings.flatMap((r) =>
        r.parameter && (facts.parameters.get(r.parameter)?.hotDayRule ?? "none") !== "none" ? [r.parameter] : [],
      ),
    );
    if (hot.size > 1) return [];
    const only = [...hot].map((code) => midSentence(facts.parameters.get(code)?.shortName ?? code));
    const reads = only[0] ? `${only[0]} only` : "no temperature";
    return [
      {
        message: `${at.name} soaks after shutdown and reads ${reads}, and the pump stands still then. Add head metal and skin.`,
        where: atPoint(at, "readings"),
      },
    ];
  });
}

export const readingRules: Rule[] = [
  { number: "12", code: "recovery-missing", severity: "must", at: "card", card: recoveryMissing },
  { number: "27", code: "too-many-numbers", severity: "should", at: "card", card: tooManyNumbers },
  { number: "35", code: "reading-unused", severity: "should", at: "card", card: readingUnused },
  { number: "41", code: "expected-missing", severity: "should", at: "card", card: expectedMissing },
  { number: "52", code: "soak-one-sensor", severity: "should", at: "card", card: soakOneSensor },
];
