import type { Tx } from "@/db/open";
import {
  aircraft,
  calibrations,
  configurations,
  hazards,
  instruments,
  limits,
  memberRoles,
  memberships,
  objectives,
  parameters,
  programmes,
  signatures,
  stepDecisions,
  teams,
  testPoints,
  users,
} from "@/db/schema";
import { digestOf } from "@/lib/workflow/digest";
import { AIRCRAFT, AIRCRAFT_ID, CONFIGURATIONS, PROGRAMME_ID } from "./aircraft";
import { dayFrom, instantOn } from "./days";
import { HAZARDS } from "./hazards";
import { seedId } from "./ids";
import { paperSteps } from "./ladder";
import { LIMITS } from "./limits";
import { OBJECTIVES } from "./objectives";
import { PARAMETERS } from "./parameters";
import { PEOPLE, TEAM } from "./people";
import { PROGRAMME_NAME, PROGRAMME_SUMMARY, SETTINGS } from "./settings";
import { CALIBRATED, calibratedInstruments } from "./snapshot";
import { TEST_POINTS } from "./test-points/shelf";

const FOUNDED = -75;

export function insertPeople(tx: Tx, demoDate: string, passwordHash: string): void {
  const createdAt = instantOn(demoDate, FOUNDED, "08:00").toISOString();
  tx.insert(teams)
    .values({ ...TEAM, createdAt })
    .run();
  for (const { id, email, name, roles, residualRisk } of Object.values(PEOPLE)) {
    tx.insert(users).values({ id, email, name, passwordHash, createdAt }).run();
    tx.insert(memberships).values({ teamId: TEAM.id, userId: id, residualRisk }).run();
    tx.insert(memberRoles)
      .values(roles.map((role) => ({ teamId: TEAM.id, userId: id, role })))
      .run();
  }
}

export function insertProgramme(tx: Tx, demoDate: string): void {
  const createdAt = instantOn(demoDate, FOUNDED, "09:00").toISOString();
  const { registration, type } = AIRCRAFT;
  tx.insert(aircraft).values({ id: AIRCRAFT_ID, teamId: TEAM.id, registration, type, data: AIRCRAFT }).run();
  tx.insert(programmes)
    .values({
      id: PROGRAMME_ID,
      teamId: TEAM.id,
      aircraftId: AIRCRAFT_ID,
      name: PROGRAMME_NAME,
      summary: PROGRAMME_SUMMARY,
      hotDayBasis: "metric",
      settings: SETTINGS,
      createdAt,
    })
    .run();
  insertConfigurations(tx, demoDate);
  insertGauges(tx, demoDate);
  const programmeId = PROGRAMME_ID;
  tx.insert(limits)
    .values(LIMITS.map((limit, position) => ({ ...limit, programmeId, position })))
    .run();
  tx.insert(objectives)
    .values(OBJECTIVES.map((objective, index) => ({ id: seedId("objective", index + 1), programmeId, ...objective })))
    .run();
  tx.insert(hazards)
    .values(HAZARDS.map((data, index) => ({ id: seedId("hazard", index + 1), programmeId, code: data.code, data })))
    .run();
  tx.insert(testPoints)
    .values(
      TEST_POINTS.map((content, position) => ({
        id: content.id,
        programmeId,
        code: content.template?.code ?? "",
        revision: 1,
        title: content.title,
        content,
        isNewest: true,
        position,
        createdAt,
      })),
    )
    .run();
  tx.insert(stepDecisions).values(paperSteps(demoDate)).run();
}

function insertConfigurations(tx: Tx, demoDate: string): void {
  const { mechanic } = PEOPLE;
  for (const { gapsMeasured, signed, disturbed, ...configuration } of CONFIGURATIONS) {
    const signedAt = instantOn(demoDate, signed, "16:30").toISOString();
    tx.insert(configurations)
      .values({
        ...configuration,
        programmeId: PROGRAMME_ID,
        signedBy: mechanic.id,
        signedAt,
        gapsMeasuredOn: dayFrom(demoDate, gapsMeasured),
        disturbedOn: disturbed === null ? null : dayFrom(demoDate, disturbed),
        createdAt: instantOn(demoDate, gapsMeasured, "09:00").toISOString(),
      })
      .run();
    tx.insert(signatures)
      .values({
        id: seedId("signature", configuration.number === "C-13" ? 1 : 2),
        teamId: TEAM.id,
        subject: `configuration/${configuration.id}`,
        meaning: "signed configuration",
        digest: digestOf(configuration),
        signedBy: mechanic.id,
        name: mechanic.name,
        role: "mechanic",
        signedAt,
      })
      .run();
  }
}

function insertGauges(tx: Tx, demoDate: string): void {
  const programmeId = PROGRAMME_ID;
  tx.insert(parameters)
    .values(PARAMETERS.map((parameter, index) => ({ ...parameter, id: seedId("parameter", index + 1), programmeId, position: index })))
    .run();
  calibratedInstruments(demoDate).forEach(({ calibration, ...instrument }, position) => {
    tx.insert(instruments)
      .values({ ...instrument, programmeId, position })
      .run();
    if (calibration?.kind !== "points") return;
    tx.insert(calibrations)
      .values({
        ...calibration,
        instrumentId: instrument.id,
        createdAt: instantOn(demoDate, CALIBRATED, "15:00").toISOString(),
        createdBy: PEOPLE.mechanic.id,
      })
      .run();
  });
}
