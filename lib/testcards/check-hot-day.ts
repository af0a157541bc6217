/** Comparison (iii): what the highest value would have been on the hot day, against the placard. */
import { hotDayAmbient, pressureAltitudeFromQnh } from "./atmosphere";
import { type CardPoint, parameterOf, type Reading } from "./card";
import { emptyLine, judged, normalIn, noVerdict, type Subject, whyOf } from "./check-as-flown";
import type { Completion } from "./check-completion";
import {
  type Corrected,
  converted,
  correct,
  extremeOf,
  type Gauge,
  isUsable,
  momentOf,
  onTheDay,
  type Raw,
  rawRows,
  speaksFor,
} from "./check-gauge";
import type { AppliedLimit } from "./check-limits";
import { hotDayTemperature } from "./cooling";
import { OUTSIDE_AIR, outsideAirGauge, PRESSURE_ALTITUDE } from "./debrief";
import type { CheckLine } from "./debrief-types";
import { convert, convertDifference, sameDimension, type Unit } from "./units";
import { type Judgement, judge } from "./verdict";
import type { HotDayBasis, Reason } from "./words";

/** The air at the moment of the highest value, or why it is not known. */
type Air = { kelvin: number; expandedUncertaintyK: number | null; unit: Unit; altitudeFt: number; reasons: Reason[]; why: string };
type NoAir = { reason: Reason; why: string };

/** Only a placard maximum of a parameter with a hot-day rule is compared; "required" unless the point has no completion rule. */
export function hotDayLine(subject: Subject, limit: AppliedLimit, completion: Completion): CheckLine | null {
  const rule = parameterOf(subject.card, subject.reading.parameter)?.hotDayRule ?? "none";
  const level = limit.statistic === "instant" || limit.statistic === "sustained";
  if (rule === "none" || limit.comparison !== "as flown, placard" || limit.side !== "max" || !level) return null;
  if (!speaksFor(subject.reading, "max") || !sameDimension(limit.unit, "K")) return null;

  const raw = extremeOf(subject.reading, subject.entry, "max");
  const line: CheckLine = {
    ...emptyLine(subject, limit),
    comparison: "hot day, placard",
    onGauge: raw && { value: raw.value, unit: subject.gauge.unit },
    required: limit.printed && subject.point.completion.rule !== "none",
  };
  const withheld: Reason[] = [...subject.withheld.map(({ reason }) => reason), ...(completion.reason ? [completion.reason] : [])];
  if (!raw)
    return { ...line, ...noVerdict(["no reading", ...subject.gauge.reasons, ...withheld]), why: whyAll(subject, null, completion, "") };
  const corrected = correct(raw.value, subject.gauge, limit.unit);
  if (!corrected) {
    const reasons: Reason[] = subject.gauge.reasons.length > 0 ? subject.gauge.reasons : ["no reading"];
    return { ...line, ...noVerdict([...reasons, ...withheld]), why: whyAll(subject, null, completion, subject.gauge.why) };
  }
  const asTrue = corrected.beyond === null ? judged(corrected) : null;
  const basis = subject.card.programme.hotDayBasis;
  const air = airAt(subject, raw);
  if (basis === null || "reason" in air) {
    const lack = basis === null ? { reason: "no reading" as const, why: "the programme's hot-day basis is not set" } : (air as NoAir);
    const judgement = noVerdict([lack.reason, ...corrected.reasons, ...withheld]);
    return { ...line, asTrue, ...judgement, why: whyAll(subject, corrected, completion, lack.why) };
  }
  const own = onBasis(subject, corrected, limit, rule, air, basis, withheld);
  if (own === null) {
    const judgement = noVerdict(["no reading", ...withheld]);
    return {
      ...line,
      asTrue,
      ...judgement,
      why: whyAll(subject, corrected, completion, "outside air or height at that moment cannot be right"),
    };
  }
  const other = onBasis(subject, corrected, limit, rule, air, basis === "us" ? "metric" : "us", withheld);
  return {
    ...line,
    asTrue,
    hotDay: corrected.beyond === null ? own.hotDay : null,
    ...own.judgement,
    why: whyAll(subject, corrected, completion, air.why, own.judgement),
    otherBasis:
      other === null || other.judgement.verdict === own.judgement.verdict
        ? null
        : {
            basis: other.hotDay.basis,
            hotDay: judged({ ...corrected, ...other.hotDay }),
            verdict: other.judgement.verdict,
            margin: other.judgement.margin,
          },
  };
}

function whyAll(subject: Subject, corrected: Corrected | null, completion: Completion, extra: string, judgement?: Judgement): string {
  const own = judgement ? whyOf(subject, judgement, corrected) : subject.withheld.map(({ why }) => why).join("; ");
  return [...new Set([extra, own, completion.reason ? completion.why : ""])].filter((part) => part !== "").join("; ");
}

type OnBasis = { hotDay: NonNullable<CheckLine["hotDay"]>; judgement: Judgement };

function onBasis(
  subject: Subject,
  corrected: Corrected,
  limit: AppliedLimit,
  rule: "plus-one" | "barrel" | "ratio",
  air: Air,
  basis: HotDayBasis,
  withheld: Reason[],
): OnBasis | null {
  const pressureAltitudeM = convert(air.altitudeFt, "ft", "m");
  const known = corrected.expandedUncertainty !== null && air.expandedUncertaintyK !== null;
  let hot: ReturnType<typeof hotDayTemperature>;
  try {
    hot = hotDayTemperature({
      measuredK: convert(corrected.value, limit.unit, "K"),
      ambientK: air.kelvin,
      pressureAltitudeM,
      rule,
      basis,
      ...(known
        ? {
            expandedUncertaintyK: convertDifference(corrected.expandedUncertainty ?? 0, limit.unit, "K"),
            ambientUncertaintyK: air.expandedUncertaintyK ?? 0,
          }
        : {}),
    });
  } catch {
    return null; // a temperature or a height that no air has: said by the caller
  }
  const value = convert(hot.hotDayK, "K", limit.unit);
  const expandedUncertainty = hot.expandedUncertaintyK === undefined ? null : convertDifference(hot.expandedUncertaintyK, "K", limit.unit);
  const reasons = [...corrected.reasons, ...air.reasons, ...withheld];
  const judgement = judge(
    { value, expandedUncertainty },
    { side: "max", limit: limit.value },
    { stage: "hot day", normal: normalIn(subject, limit.unit), withheld: reasons, beyond: corrected.beyond },
  );
  // an allowance in seconds cannot be carried to another day: past the limit is not proven by the highest value alone
  const timed = limit.forS > 0 && judgement.verdict === "exceeded" ? noVerdict(["no reading", ...reasons], true) : judgement;
  const hotAmbient = { value: convert(hotDayAmbient(pressureAltitudeM, basis), "K", air.unit), unit: air.unit };
  const hotDay = {
    value,
    unit: limit.unit,
    expandedUncertainty,
    difference: convertDifference(hot.differenceK, "K", limit.unit),
    clamped: hot.clamped,
    ambient: { value: convert(air.kelvin, "K", air.unit), unit: air.unit },
    hotAmbient,
    pressureAltitudeFt: air.altitudeFt,
    basis,
  };
  return { hotDay, judgement: timed };
}

/** Never the ground's air for a point in the air: there, temperature and height must belong to the moment of the highest value. */
function airAt(subject: Subject, raw: Raw): Air | NoAir {
  const { card, point, debrief, context } = subject;
  const holder = momentOf(subject.said?.readings ?? [], subject.entry);
  const instrument = outsideAirGauge(card, point);
  const gauge: Gauge | null = instrument ? onTheDay(instrument, null, context) : null;
  const weather = debrief.weather.oat;
  const measured =
    holder?.oat ??
    sameMoment(subject, raw, OUTSIDE_AIR) ??
    (point.place === "ground" && weather ? converted(weather.value, weather.unit, instrument?.unit ?? "degC") : null);
  if (measured === null || !isUsable(measured)) return { reason: "no reading", why: "no outside air temperature at that moment" };
  const altitudeFt =
    point.place === "ground" ? groundAltitudeFt(subject) : (holder?.altitudeFt ?? sameMoment(subject, raw, PRESSURE_ALTITUDE));
  if (altitudeFt === null || !isUsable(altitudeFt))
    return { reason: "no reading", why: point.place === "ground" ? "no QNH for the height of the ground" : "no height at that moment" };
  if (!gauge) {
    const kelvin = converted(measured, "degC", "K");
    if (kelvin === null) return { reason: "no reading", why: "the outside air temperature cannot be right" };
    return { kelvin, expandedUncertaintyK: null, unit: "degC", altitudeFt, reasons: [], why: "no gauge for outside air is listed" };
  }
  const corrected = correct(measured, gauge, "K");
  if (!corrected)
    return gauge.calibration
      ? { reason: "no reading", why: "the outside air temperature cannot be right" }
      : { reason: "not calibrated", why: gauge.why };
  if (corrected.beyond !== null)
    return { reason: "outside calibrated range", why: `outside air is beyond the table of ${gauge.instrument?.name ?? "its gauge"}` };
  const { value: kelvin, expandedUncertainty: expandedUncertaintyK, reasons } = corrected;
  return { kelvin, expandedUncertaintyK, unit: gauge.unit, altitudeFt, reasons, why: reasons.length > 0 ? gauge.why : "" };
}

const NEAR_S = 60; // a row this close in time counts as the same moment

/** The point's own reading of the air (or of the height) at the moment of the value, on its gauge; null where none belongs to it. */
function sameMoment(subject: Subject, raw: Raw, parameter: string): number | null {
  const { point, said, reading } = subject;
  const source = point.readings.find((other) => other.parameter?.toLowerCase() === parameter);
  const entry = source && said?.readings.find((candidate) => candidate.reading === source.id);
  const byHeight = parameter === PRESSURE_ALTITUDE ? heightOfRow(point, raw) : null;
  if (!source || !entry) return byHeight;
  if (source.sampling !== "series") return ownMoment(point, reading, source) ? entry.value : byHeight;
  const rows = rawRows(entry);
  const named = raw.label === null || raw.label === "" ? undefined : rows.find((row) => row.label === raw.label);
  const away = (row: Raw) => (row.atS === null || raw.atS === null ? Number.POSITIVE_INFINITY : Math.abs(row.atS - raw.atS));
  const nearest = rows.reduce<Raw | null>(
    (best, row) => (away(row) < (best === null ? Number.POSITIVE_INFINITY : away(best)) ? row : best),
    null,
  );
  if (named) return named.value;
  if (nearest && (point.place === "ground" || away(nearest) <= NEAR_S)) return nearest.value;
  return point.place === "ground" ? (rows.at(-1)?.value ?? null) : byHeight;
}

/** One outside air value speaks for a ground point as a whole; in the air only for another single value, read with it. */
function ownMoment(point: CardPoint, reading: Reading, source: Reading): boolean {
  return point.place === "ground" || (reading.sampling === "single" && source.sampling === "single");
}

/** A grid by height names the height in its rows: head "1000 ft", row "6". */
function heightOfRow(point: CardPoint, raw: Raw): number | null {
  const head = point.grid?.by === "height" ? /^(\d+)\s*ft$/.exec(point.grid.head.trim()) : null;
  const row = raw.label === null ? null : /^\d+(\.\d+)?$/.exec(raw.label.trim());
  return head?.[1] && row ? Number(head[1]) * Number(row[0]) : null;
}

function groundAltitudeFt({ card, debrief, context }: Subject): number | null {
  if (context.stationPressureAltitudeFt !== null) return context.stationPressureAltitudeFt;
  const { qnh } = debrief.weather;
  if (!qnh || !sameDimension(qnh.unit, "Pa")) return null;
  const elevationM = convert(card.programme.airfield.elevationFt, "ft", "m");
  try {
    return convert(pressureAltitudeFromQnh({ elevationM, qnhPa: convert(qnh.value, qnh.unit, "Pa") }), "m", "ft");
  } catch {
    return null; // a pressure that no weather has
  }
}
