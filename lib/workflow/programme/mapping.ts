import type { calibrations, configurations, instruments, limits, parameters } from "@/db/schema";
import type { CalibrationRecord, Configuration, Instrument, Limit, Parameter } from "@/lib/testcards/card";
import type { Unit } from "@/lib/testcards/units";

/** Units stand in the schema as text; only the programme's own forms and the seed write them, both through the core's list. */
const unit = (text: string) => text as Unit;

export function toParameter(row: typeof parameters.$inferSelect): Parameter {
  return {
    code: row.code,
    name: row.name,
    shortName: row.shortName,
    unit: unit(row.unit),
    group: row.group,
    hotDayRule: row.hotDayRule,
    normal: row.normal ?? null,
    safety: row.safety,
    stabilises: row.stabilises,
    standardRatePerMin: row.standardRatePerMin ?? null,
  };
}

export function toCalibration(row: typeof calibrations.$inferSelect): CalibrationRecord {
  const common = {
    id: row.id,
    unit: unit(row.unit),
    method: row.method,
    reference: row.reference,
    calibratedOn: row.calibratedOn,
    validUntil: row.validUntil,
    disturbedOn: row.disturbedOn,
    low: row.low,
    high: row.high,
    expandedUncertainty: row.expandedUncertainty,
  };
  if (row.kind === "points") return { ...common, kind: "points", points: row.points ?? [] };
  if (row.gain === null || row.offset === null) throw new Error(`Calibration ${row.id} is linear without gain and offset.`);
  return { ...common, kind: "linear", gain: row.gain, offset: row.offset };
}

export function toInstrument(row: typeof instruments.$inferSelect, calibration: typeof calibrations.$inferSelect | null): Instrument {
  return {
    id: row.id,
    parameter: row.parameter,
    name: row.name,
    gaugeName: row.gaugeName,
    unit: unit(row.unit),
    shownOn: row.shownOn,
    visibleTo: row.visibleTo,
    low: row.low,
    high: row.high,
    markSpacing: row.markSpacing,
    readable: row.readable,
    calibration: calibration && toCalibration(calibration),
  };
}

export function toLimit(row: typeof limits.$inferSelect): Limit {
  return {
    id: row.id,
    parameter: row.parameter,
    side: row.side,
    layer: row.layer,
    value: row.value,
    unit: unit(row.unit),
    appliesWhen: row.appliesWhen,
    forS: row.forS,
    statistic: row.statistic,
    source: row.source,
    authority: row.authority,
  };
}

export function toConfiguration(row: typeof configurations.$inferSelect, signedByName: string | null): Configuration {
  return {
    id: row.id,
    number: row.number,
    fitted: row.fitted,
    massKg: row.massKg,
    armM: row.armM,
    signedBy: signedByName,
    signedAt: row.signedAt,
    gapsMeasuredOn: row.gapsMeasuredOn,
    disturbedOn: row.disturbedOn,
  };
}
