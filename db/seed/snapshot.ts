import type { Instrument, ProgrammeSnapshot } from "@/lib/testcards/card";
import { AIRCRAFT, CONFIGURATIONS, PROGRAMME_ID } from "./aircraft";
import { dayFrom, instantOn, twelveMonthsFrom } from "./days";
import { HAZARDS } from "./hazards";
import { seedId } from "./ids";
import { INSTRUMENTS } from "./instruments";
import { LIMITS } from "./limits";
import { OBJECTIVES } from "./objectives";
import { PARAMETERS } from "./parameters";
import { PEOPLE } from "./people";
import { PROGRAMME_NAME, SETTINGS } from "./settings";

/** All gauges were calibrated on one day, some seven weeks before the demo date. */
export const CALIBRATED = -52;

export function calibratedInstruments(demoDate: string): Instrument[] {
  const calibratedOn = dayFrom(demoDate, CALIBRATED);
  return INSTRUMENTS.map(({ table, expandedUncertainty, method, reference, ...instrument }, index) => {
    const points = table.map(([read, actual]) => ({ read, actual }));
    return {
      ...instrument,
      calibration: {
        id: seedId("calibration", index + 1),
        kind: "points",
        points,
        low: Math.min(...points.map((point) => point.read)),
        high: Math.max(...points.map((point) => point.read)),
        expandedUncertainty,
        unit: instrument.unit,
        method,
        reference,
        calibratedOn,
        validUntil: twelveMonthsFrom(calibratedOn),
        disturbedOn: null,
      },
    };
  });
}

/** The demo programme as a card sees it, without a database. */
export function demoSnapshot(demoDate: string): ProgrammeSnapshot {
  const current = CONFIGURATIONS.find((configuration) => configuration.isCurrent);
  if (!current) throw new Error("The demo has no current configuration.");
  return {
    id: PROGRAMME_ID,
    name: PROGRAMME_NAME,
    hotDayBasis: "metric",
    aircraft: AIRCRAFT,
    ...SETTINGS,
    configuration: {
      id: current.id,
      number: current.number,
      fitted: current.fitted,
      massKg: current.massKg,
      armM: current.armM,
      signedBy: PEOPLE.mechanic.name,
      signedAt: instantOn(demoDate, current.signed, "16:30").toISOString(),
      gapsMeasuredOn: dayFrom(demoDate, current.gapsMeasured),
      disturbedOn: current.disturbed === null ? null : dayFrom(demoDate, current.disturbed),
    },
    parameters: PARAMETERS,
    instruments: calibratedInstruments(demoDate),
    limits: LIMITS,
    hazards: HAZARDS,
    objectives: OBJECTIVES.map(({ requirement: _requirement, ...objective }) => objective),
  };
}
