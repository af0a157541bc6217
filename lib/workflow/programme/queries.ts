import { and, asc, desc, eq, getTableColumns, isNull, sql } from "drizzle-orm";
import type { Db, Tx } from "@/db/open";
import {
  aircraft,
  calibrations,
  configurations,
  hazards,
  instruments,
  limits,
  objectives,
  parameters,
  programmes,
  stepDecisions,
  testPoints,
  users,
} from "@/db/schema";
import type { Actor } from "@/lib/auth/roles";
import type { CalibrationRecord, Instrument, Limit, Objective, Parameter } from "@/lib/testcards/card";
import { Refusal } from "../errors";
import { toCalibration, toInstrument, toLimit, toParameter } from "./mapping";

type Reader = Db | Tx;

/** Every query below passes here first: a programme of another team does not exist for this actor. */
export function getProgramme(db: Reader, actor: Actor, programmeId: string) {
  const row = db
    .select({ ...getTableColumns(programmes), aircraft: aircraft.data })
    .from(programmes)
    .innerJoin(aircraft, eq(aircraft.id, programmes.aircraftId))
    .where(and(eq(programmes.id, programmeId), eq(programmes.teamId, actor.teamId)))
    .get();
  if (!row) throw new Refusal("not-found", "No such programme in your team.");
  return row;
}
export type Programme = ReturnType<typeof getProgramme>;

export function listProgrammes(db: Reader, actor: Actor) {
  return db
    .select({
      id: programmes.id,
      name: programmes.name,
      summary: programmes.summary,
      hotDayBasis: programmes.hotDayBasis,
      registration: aircraft.registration,
      type: aircraft.type,
      notice: sql<string | null>`json_extract(${programmes.settings}, '$.notice')`,
      createdAt: programmes.createdAt,
    })
    .from(programmes)
    .innerJoin(aircraft, eq(aircraft.id, programmes.aircraftId))
    .where(eq(programmes.teamId, actor.teamId))
    .orderBy(asc(programmes.createdAt), asc(programmes.id))
    .all();
}
export type ProgrammeListItem = ReturnType<typeof listProgrammes>[number];

/** The shelf: the newest revision of each template, in the order the programme keeps them. */
export function listTestPoints(db: Reader, actor: Actor, programmeId: string) {
  getProgramme(db, actor, programmeId);
  return db
    .select({
      id: testPoints.id,
      code: testPoints.code,
      revision: testPoints.revision,
      title: testPoints.title,
      content: testPoints.content,
    })
    .from(testPoints)
    .where(and(eq(testPoints.programmeId, programmeId), eq(testPoints.isNewest, true)))
    .orderBy(asc(testPoints.position), asc(testPoints.code))
    .all();
}
export type TestPoint = ReturnType<typeof listTestPoints>[number];

export function listParameters(db: Reader, actor: Actor, programmeId: string): Parameter[] {
  getProgramme(db, actor, programmeId);
  return db
    .select()
    .from(parameters)
    .where(eq(parameters.programmeId, programmeId))
    .orderBy(asc(parameters.position), asc(parameters.code))
    .all()
    .map(toParameter);
}

/** Instruments with the calibration in use. */
export function listInstruments(db: Reader, actor: Actor, programmeId: string): Instrument[] {
  getProgramme(db, actor, programmeId);
  return db
    .select({ instrument: instruments, calibration: calibrations })
    .from(instruments)
    .leftJoin(calibrations, and(eq(calibrations.instrumentId, instruments.id), isNull(calibrations.supersededAt)))
    .where(eq(instruments.programmeId, programmeId))
    .orderBy(asc(instruments.position), asc(instruments.name))
    .all()
    .map(({ instrument, calibration }) => toInstrument(instrument, calibration));
}

/** Every calibration an instrument ever had, the newest first; replaced ones stay. */
export function listCalibrations(
  db: Reader,
  actor: Actor,
  programmeId: string,
): (CalibrationRecord & { instrumentId: string; supersededAt: string | null })[] {
  getProgramme(db, actor, programmeId);
  return db
    .select(getTableColumns(calibrations))
    .from(calibrations)
    .innerJoin(instruments, eq(instruments.id, calibrations.instrumentId))
    .where(eq(instruments.programmeId, programmeId))
    .orderBy(asc(instruments.position), desc(calibrations.calibratedOn), desc(calibrations.id))
    .all()
    .map((row) => ({ ...toCalibration(row), instrumentId: row.instrumentId, supersededAt: row.supersededAt }));
}

export function listLimits(db: Reader, actor: Actor, programmeId: string): Limit[] {
  getProgramme(db, actor, programmeId);
  return db
    .select()
    .from(limits)
    .where(eq(limits.programmeId, programmeId))
    .orderBy(asc(limits.position), asc(limits.id))
    .all()
    .map(toLimit);
}

export function listObjectives(db: Reader, actor: Actor, programmeId: string): (Objective & { id: string; requirement: string })[] {
  getProgramme(db, actor, programmeId);
  return db
    .select({
      id: objectives.id,
      code: objectives.code,
      question: objectives.question,
      success: objectives.success,
      priority: objectives.priority,
      requirement: objectives.requirement,
    })
    .from(objectives)
    .where(eq(objectives.programmeId, programmeId))
    .orderBy(asc(objectives.code))
    .all();
}

export function listHazards(db: Reader, actor: Actor, programmeId: string) {
  getProgramme(db, actor, programmeId);
  return db
    .select({ data: hazards.data })
    .from(hazards)
    .where(eq(hazards.programmeId, programmeId))
    .orderBy(asc(hazards.code))
    .all()
    .map((row) => row.data);
}

export function listConfigurations(db: Reader, actor: Actor, programmeId: string) {
  getProgramme(db, actor, programmeId);
  return db
    .select({ ...getTableColumns(configurations), signedByName: users.name })
    .from(configurations)
    .leftJoin(users, eq(users.id, configurations.signedBy))
    .where(eq(configurations.programmeId, programmeId))
    .orderBy(desc(configurations.createdAt), desc(configurations.id))
    .all();
}
export type ConfigurationListItem = ReturnType<typeof listConfigurations>[number];

/** The build-up as the team has decided it, in order; earlier steps may come from paper records. */
export function listStepDecisions(db: Reader, actor: Actor, programmeId: string) {
  getProgramme(db, actor, programmeId);
  return db
    .select()
    .from(stepDecisions)
    .where(eq(stepDecisions.programmeId, programmeId))
    .orderBy(asc(stepDecisions.position), asc(stepDecisions.createdAt), asc(stepDecisions.id))
    .all();
}
export type StepDecisionRow = ReturnType<typeof listStepDecisions>[number];
