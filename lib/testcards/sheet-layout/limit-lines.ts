import { type CardDocument, type CardPoint, type Instrument, instrumentOf, type Limit, type PointLimit, parameterOf } from "../card";
import { unitSymbol } from "../unit-symbols";
import { rateUnitOf, sameDimension, type Unit } from "../units";
import type { LimitCondition, Side } from "../words";
import { bandText, differenceOnGauge, figure, gaugeText, type NoNumber, onGauge, pilotsGauge, withUnit } from "./gauge-figures";

/** One line of the LIMITS or ABORT list: a gauge's name and the number on it, or words alone. */
export type ListLine = { name: string; value: string };

/** These conditions make up a parameter's plain line; the others are moments of their own and print with their name. */
const PLAIN: readonly LimitCondition[] = ["always", "at power", "full power"];

type Row = { limit: Limit; gauge: number };
type Unproved = { limit: Limit; word: NoNumber };
type Rows = { rows: Row[]; unproved: Unproved[] };
type Plain = { low: Row | null; high: Row | null; others: Row[] };

const isPlainStatistic = (limit: Limit) => limit.statistic === "instant" || limit.statistic === "sustained";

/** The tightest layer of each kind: the card's own, or the placard's where the card sets none. */
export function limitsInForce(limits: readonly Limit[]): Limit[] {
  const kind = (l: Limit) => [l.parameter, l.side, l.appliesWhen, l.statistic].join("|");
  const ofCard = new Set(limits.filter((l) => l.layer === "card").map(kind));
  return limits.filter((l) => l.layer === "card" || !ofCard.has(kind(l)));
}

/** What the points read, watch or set: the parameters whose limits belong on the sheet. */
export function parametersOf(card: CardDocument, points: readonly CardPoint[]): Set<string> {
  const found = new Set<string>();
  const ofUnit = (unit: Unit) => card.programme.parameters.filter((p) => p.unit === unit).map((p) => p.code);
  for (const point of points.filter((p) => p.cardTable)) {
    for (const reading of point.readings) if (reading.parameter !== null) found.add(reading.parameter);
    for (const line of point.aborts.lines) if (line.kind === "number") found.add(line.parameter);
    for (const entry of point.entry) found.add(entry.parameter);
    if (point.aborts.standing) for (const line of card.programme.standingAborts) if (line.kind === "number") found.add(line.parameter);
    if (point.steps.some((s) => s.rpm !== null)) for (const code of ofUnit("rpm")) found.add(code);
    if (point.steps.some((s) => s.manifoldPressureInHg !== null)) for (const code of ofUnit("inHg")) found.add(code);
  }
  return found;
}

function rowsOf(limits: readonly Limit[], parameter: string, instrument: Instrument): Rows {
  const found: Rows = { rows: [], unproved: [] };
  for (const limit of limits) {
    if (limit.parameter !== parameter || !isPlainStatistic(limit) || !sameDimension(limit.unit, instrument.unit)) continue;
    const gauge = onGauge(limit.value, limit.unit, limit.side, instrument);
    if (typeof gauge === "number") found.rows.push({ limit, gauge });
    else found.unproved.push({ limit, word: gauge });
  }
  return found;
}

const stricter = (side: Side) => (a: Row, b: Row) => (side === "max" ? a.gauge - b.gauge : b.gauge - a.gauge);

function plainOf(rows: readonly Row[]): Plain {
  const of = (side: Side) => rows.filter((r) => r.limit.side === side).sort(stricter(side));
  const [high = null, ...looserHigh] = of("max");
  const [low = null, ...looserLow] = of("min");
  return { low, high, others: [...looserHigh, ...looserLow].filter((r) => r.gauge !== high?.gauge && r.gauge !== low?.gauge) };
}

/** Why a looser number stands beside the plain one: for how long the plain one may be passed, else the condition. */
function label(row: Row, plain: Plain): string {
  const tight = row.limit.side === "max" ? plain.high : plain.low;
  const s = tight?.limit.forS ?? 0;
  if (s === 0) return row.limit.appliesWhen;
  return s % 60 === 0 ? `${s / 60}\u00a0min` : `${s}\u00a0s`;
}

type Gauged = { name: string; unit: Unit; plain: Plain; unproved: Unproved[] };

function gaugedLines({ name, unit, plain, unproved }: Gauged): ListLine[] {
  const { low, high, others } = plain;
  const lines: ListLine[] = [];
  if (low && high) lines.push({ name, value: withUnit(bandText(low.gauge, high.gauge, unit), unit) });
  else if (high) lines.push({ name, value: withUnit(figure(high.gauge, unit), unit) });
  else if (low) lines.push({ name, value: `min ${withUnit(figure(low.gauge, unit), unit)}` });
  for (const row of others) lines.push({ name: label(row, plain), value: `${name} ${sided(row, unit)}` });
  for (const value of new Set(unproved.map(wordFor))) lines.push({ name, value });
  return lines;
}

/** A gauge that was never calibrated says so once; one calibrated elsewhere on its dial says for which limit. */
function wordFor({ limit, word }: Unproved): string {
  return word === "not calibrated" || limit.side === "max" ? word : `min ${word}`;
}

function sided({ limit, gauge }: Row, unit: Unit): string {
  return `${limit.side === "min" ? "min\u00a0" : ""}${withUnit(figure(gauge, unit), unit)}`;
}

const onlyMaxima = ({ plain, unproved }: Gauged) => plain.low === null && plain.high !== null && unproved.length === 0;
const sameShape = (a: Gauged, b: Gauged) =>
  a.plain.others.map((r) => label(r, a.plain)).join() === b.plain.others.map((r) => label(r, b.plain)).join();

/** RPM and manifold pressure are set together, so they stand on one line: "RPM 2580  MAP 29.0" and "5 min  2730 / 30.5". */
function powerLines(rpm: Gauged, pressure: Gauged): ListLine[] {
  const value = (g: Gauged, row: Row | null | undefined) => (row ? figure(row.gauge, g.unit) : "");
  const first = `${rpm.name} ${value(rpm, rpm.plain.high)}  ${pressure.name} ${value(pressure, pressure.plain.high)}`;
  const rest = rpm.plain.others.map((row, i) => ({
    name: label(row, rpm.plain),
    value: `${value(rpm, row)} / ${value(pressure, pressure.plain.others[i])}`,
  }));
  return [{ name: "", value: first }, ...rest];
}

function plainLines(gauged: readonly Gauged[]): ListLine[] {
  const rpm = gauged.find((g) => g.unit === "rpm" && onlyMaxima(g));
  const pressure = gauged.find((g) => g.unit === "inHg" && onlyMaxima(g));
  const paired = rpm && pressure && sameShape(rpm, pressure);
  return gauged.flatMap((g) => {
    if (paired && g === pressure) return [];
    return paired && g === rpm ? powerLines(rpm, pressure) : gaugedLines(g);
  });
}

type OfParameter = Rows & { instrument: Instrument };

/** Moments of their own (idle, take-off, cold start), only where one of the page's points has them. */
function momentLines(gauges: readonly OfParameter[], points: readonly CardPoint[]): ListLine[] {
  const occurring = new Set(points.filter((p) => p.cardTable).flatMap((p) => p.conditions));
  const now = ({ limit }: { limit: Limit }) => !PLAIN.includes(limit.appliesWhen) && occurring.has(limit.appliesWhen);
  return gauges.flatMap(({ instrument: { gaugeName, unit }, rows, unproved }) => [
    ...rows.filter(now).map((row) => ({ name: row.limit.appliesWhen, value: `${gaugeName} ${sided(row, unit)}` })),
    ...unproved.filter(now).map((row) => ({ name: row.limit.appliesWhen, value: `${gaugeName} ${wordFor(row)}` })),
  ]);
}

/** The lowest speed that a position set, or recovered to, allows. Positions carry indicated speeds: no correction. */
function speedLine(card: CardDocument, points: readonly CardPoint[], listed: readonly Gauged[]): ListLine[] {
  if (listed.some((g) => g.unit === "kt")) return [];
  const used = points.filter((p) => p.place === "air" || p.positions.length > 0).flatMap((p) => p.positions);
  const speeds = card.programme.controls.flatMap((control) =>
    control.positions
      .filter((p) => p.name === control.recoverTo || used.some((u) => u.control === control.name && u.position === p.name))
      .flatMap((p) => (p.maxSpeedKt === null ? [] : [p.maxSpeedKt])),
  );
  if (used.length === 0 || speeds.length === 0 || points.every((p) => p.place === "ground")) return [];
  const airspeed = card.programme.instruments.find((i) => i.unit === "kt" && i.visibleTo.includes("pilot"));
  return [{ name: airspeed?.gaugeName ?? "IAS", value: withUnit(figure(Math.min(...speeds), "kt"), "kt") }];
}

/** A point's own limit, turned to the gauge of its reading where it has one. */
function ownLine(card: CardDocument, point: CardPoint, limit: PointLimit): ListLine {
  const reading = point.readings.find((r) => r.id === limit.reading);
  const instrument = instrumentOf(card, reading?.instrument ?? null);
  const said = (text: string): ListLine => ({ name: limit.label, value: limit.side === "min" ? `min ${text}` : text });
  if (!instrument) return said(withUnit(figure(limit.value, limit.unit), limit.unit));
  if (limit.statistic !== "instant" && limit.statistic !== "sustained") {
    const change = [instrument.unit, rateUnitOf(instrument.unit)].find((unit) => unit !== null && sameDimension(limit.unit, unit));
    if (change) return said(gaugeText(differenceOnGauge(limit.value, limit.unit, limit.side, instrument), change));
  }
  if (!sameDimension(limit.unit, instrument.unit)) return said(withUnit(figure(limit.value, limit.unit), limit.unit));
  return said(gaugeText(onGauge(limit.value, limit.unit, limit.side, instrument), instrument.unit));
}

/** A programme's rate limit prints where a point watches that rate: as the change on the gauge in one minute. */
function rateLines(card: CardDocument, limits: readonly Limit[], points: readonly CardPoint[]): ListLine[] {
  const watched = points.flatMap((p) => p.aborts.lines).flatMap((l) => (l.kind === "number" && l.perMinute ? [l] : []));
  return limits
    .filter((l) => l.statistic === "rate")
    .flatMap((limit) => {
      const line = watched.find((w) => w.parameter === limit.parameter && w.side === limit.side);
      const instrument = line && instrumentOf(card, line.instrument);
      if (!instrument) return [];
      const value = differenceOnGauge(limit.value, limit.unit, limit.side, instrument);
      const name = parameterOf(card, limit.parameter)?.shortName ?? instrument.gaugeName;
      if (typeof value === "string") return [{ name: `${name} in 60\u00a0s`, value }];
      return [{ name, value: `${figure(value, instrument.unit)}\u00a0${unitSymbol(instrument.unit)} in 60\u00a0s` }];
    });
}

/**
 * The LIMITS list of a page, on the gauge: the plain lines of the whole card, then what only this page's points add.
 * What all pages share is worked out once.
 */
export function limitLines(card: CardDocument): (points: readonly CardPoint[]) => ListLine[] {
  const onCard = card.content.points;
  const limits = limitsInForce(card.programme.limits);
  const parameters = parametersOf(card, onCard);
  const powers = new Set(onCard.flatMap((p) => p.conditions));
  const gauges = card.programme.parameters
    .filter((p) => parameters.has(p.code))
    .flatMap(({ code }): OfParameter[] => {
      const instrument = pilotsGauge(card, code);
      return instrument ? [{ instrument, ...rowsOf(limits, code, instrument) }] : [];
    });
  const occurs = ({ limit: { appliesWhen } }: { limit: Limit }) =>
    appliesWhen === "always" || (PLAIN.includes(appliesWhen) && powers.has(appliesWhen));
  const gauged = gauges.flatMap(({ instrument, ...found }): Gauged[] => {
    const rows = found.rows.filter(occurs);
    const unproved = found.unproved.filter(occurs);
    if (rows.length + unproved.length === 0) return [];
    return [{ name: instrument.gaugeName, unit: instrument.unit, plain: plainOf(rows), unproved }];
  });
  const shared = [...plainLines(gauged), ...speedLine(card, onCard, gauged)];
  return (points) => [
    ...shared,
    ...momentLines(gauges, points),
    ...rateLines(card, limits, points),
    ...points.flatMap((point) => point.limits.map((limit) => ownLine(card, point, limit))),
  ];
}
