import type { Db } from "@/db/open";
import * as table from "@/db/schema";
import { climb } from "../testcards/support/ready-card";
import { PROGRAMME } from "../testcards/support/ready-programme";

const AT = "2031-05-01T08:00:00.000Z";

/** A programme with nothing in it but an aircraft. */
export function insertBareProgramme(db: Db, teamId: string, newId: () => string): string {
  const {
    aircraft,
    id: _id,
    name,
    hotDayBasis,
    configuration: _c,
    parameters: _p,
    instruments: _i,
    limits: _l,
    hazards: _h,
    objectives: _o,
    ...settings
  } = structuredClone(PROGRAMME);
  const [aircraftId, programmeId] = [newId(), newId()];
  db.insert(table.aircraft)
    .values({ id: aircraftId, teamId, registration: aircraft.registration, type: aircraft.type, data: aircraft })
    .run();
  db.insert(table.programmes).values({ id: programmeId, teamId, aircraftId, name, hotDayBasis, settings, createdAt: AT }).run();
  return programmeId;
}

/** The invented Quillon R2 of the readiness tests as rows of one team; a configuration that is signed, parents that are clear. */
export function insertProgramme(
  db: Db,
  teamId: string,
  mechanicId: string,
  newId: () => string,
): { programmeId: string; configurationId: string } {
  const { configuration, parameters, instruments, limits, hazards, objectives } = structuredClone(PROGRAMME);
  const programmeId = insertBareProgramme(db, teamId, newId);
  const configurationId = newId();
  if (!configuration) throw new Error("The ready programme has a configuration.");
  db.insert(table.configurations)
    .values({
      ...configuration,
      id: configurationId,
      programmeId,
      details: [],
      isCurrent: true,
      signedBy: mechanicId,
      signedAt: AT,
      createdAt: AT,
    })
    .run();
  for (const [position, row] of parameters.entries())
    db.insert(table.parameters)
      .values({ ...row, id: newId(), programmeId, position })
      .run();
  instruments.forEach(({ calibration, ...row }, position) => {
    db.insert(table.instruments)
      .values({ ...row, programmeId, position })
      .run();
    if (calibration)
      db.insert(table.calibrations)
        .values({ ...calibration, id: newId(), instrumentId: row.id, createdAt: AT })
        .run();
  });
  for (const [position, row] of limits.entries())
    db.insert(table.limits)
      .values({ ...row, id: newId(), programmeId, position })
      .run();
  for (const data of hazards) db.insert(table.hazards).values({ id: newId(), programmeId, code: data.code, data }).run();
  for (const row of objectives)
    db.insert(table.objectives)
      .values({ ...row, id: newId(), programmeId })
      .run();
  const shelf = {
    id: newId(),
    programmeId,
    code: "T10",
    revision: 1,
    title: "Climb cooling",
    content: climb(),
    isNewest: true,
    position: 0,
    createdAt: AT,
  };
  db.insert(table.testPoints).values(shelf).run();
  for (const [position, code] of ["T01", "T09", "T11"].entries()) {
    db.insert(table.testPoints)
      .values({ ...shelf, id: newId(), code, content: climb({ parents: [] }), position: position + 1 })
      .run();
    db.insert(table.stepDecisions)
      .values({
        id: newId(),
        programmeId,
        testPointCode: code,
        step: code,
        computed: "clear to next step",
        decision: "clear to next step",
        because: [],
        origin: "paper records",
        position,
        createdAt: AT,
      })
      .run();
  }
  return { programmeId, configurationId };
}
