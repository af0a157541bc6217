import { describe, expect, test } from "vitest";
import { commentOnCard } from "@/lib/workflow/card/comment-on-card";
import { createCard } from "@/lib/workflow/card/create-card";
import { getCanonicalDocument, getCardRevision, getSheetSource, listCards, listComments, listPrints } from "@/lib/workflow/card/queries";
import { recordPrint } from "@/lib/workflow/card/record-print";
import { releaseCard } from "@/lib/workflow/card/release-card";
import { returnCard } from "@/lib/workflow/card/return-card";
import { reviseCard } from "@/lib/workflow/card/revise-card";
import { saveDraft } from "@/lib/workflow/card/save-draft";
import { submitCard } from "@/lib/workflow/card/submit-card";
import { withdrawCard } from "@/lib/workflow/card/withdraw-card";
import { signConfiguration } from "@/lib/workflow/configuration/sign-configuration";
import type { Ctx } from "@/lib/workflow/context";
import { submitDebrief } from "@/lib/workflow/debrief/submit-debrief";
import * as programme from "@/lib/workflow/programme/queries";
import { getProgrammeSnapshot } from "@/lib/workflow/programme/snapshot";
import { answerCard } from "@/lib/workflow/sortie/answer-card";
import { briefSortie } from "@/lib/workflow/sortie/brief-sortie";
import { cancelSortie } from "@/lib/workflow/sortie/cancel-sortie";
import { changeSortie } from "@/lib/workflow/sortie/change-sortie";
import { closeSortie } from "@/lib/workflow/sortie/close-sortie";
import { disposePoint } from "@/lib/workflow/sortie/dispose-point";
import { enterLoading } from "@/lib/workflow/sortie/enter-loading";
import { listWaiting } from "@/lib/workflow/sortie/flight-line";
import { planSortie } from "@/lib/workflow/sortie/plan-sortie";
import { getSortie, getSortieResults, listSorties } from "@/lib/workflow/sortie/queries";
import { acceptSquawk } from "@/lib/workflow/squawk/accept-squawk";
import { assessSquawk } from "@/lib/workflow/squawk/assess-squawk";
import { closeSquawk } from "@/lib/workflow/squawk/close-squawk";
import { listSquawkHistory } from "@/lib/workflow/squawk/history";
import { getSquawk, listSquawks } from "@/lib/workflow/squawk/queries";
import { raiseSquawk } from "@/lib/workflow/squawk/raise-squawk";
import { rectifySquawk } from "@/lib/workflow/squawk/rectify-squawk";
import { verifySquawk } from "@/lib/workflow/squawk/verify-squawk";
import { countersignStep } from "@/lib/workflow/step/countersign-step";
import { proposeStep } from "@/lib/workflow/step/propose-step";
import { sayHold } from "@/lib/workflow/step/say-hold";
import { endSession } from "@/lib/workflow/team/end-session";
import { listPeople } from "@/lib/workflow/team/queries";
import { newDesk, TODAY } from "../support/new-desk";
import { briefedSortie, debriefOf, readyContent, sortieInput } from "../support/stories";

/** One flown sortie of ours; the outsider holds every role, but in another team. */
const desk = newDesk();
const ours = briefedSortie(desk);
const content = debriefOf(desk, ours.sortieId, { climb: {} });
submitDebrief(desk.as("pilot"), { id: desk.newId(), sortieId: ours.sortieId, content });
const squawk = raiseSquawk(desk.as("mechanic"), {
  programmeId: desk.programmeId,
  system: "Fuel",
  text: "weep at a union",
  severity: "monitor",
});
const step = sayHold(desk.as("pilot"), { sortieId: ours.sortieId, revisionId: ours.revisionId, pointId: "climb", why: "vibration" });

const { cardId, revisionId, digest, sortieId } = ours;
const point = { sortieId, revisionId, pointId: "climb" };
const settings = sortieInput(desk, [revisionId]).settings;
const NO_DIGEST = "0".repeat(64);

const acts: [string, (ctx: Ctx, input: unknown) => unknown, Record<string, unknown>][] = [
  ["card.create", createCard, { programmeId: desk.programmeId, title: "Theirs", kind: "flight" }],
  ["card.save-draft", saveDraft, { cardId, version: 1, content: readyContent() }],
  ["card.submit", submitCard, { cardId, version: 1, answers: {} }],
  ["card.return", returnCard, { cardId, text: "no" }],
  ["card.comment", commentOnCard, { cardId, text: "no" }],
  ["card.release", releaseCard, { cardId, digest }],
  ["card.withdraw", withdrawCard, { cardId, letter: "A", why: "no" }],
  ["card.revise", reviseCard, { cardId }],
  ["card.print", recordPrint, { cardId, letter: "A", paper: "a5" }],
  ["configuration.sign", signConfiguration, { configurationId: desk.configurationId, digest: NO_DIGEST }],
  ["sortie.plan", planSortie, sortieInput(desk, [revisionId])],
  ["sortie.change", changeSortie, { sortieId, version: 1, plannedOn: "2031-05-06" }],
  ["sortie.enter-loading", enterLoading, { sortieId, version: 1, settings }],
  ["sortie.answer-card", answerCard, { sortieId, revisionId, digest, answer: "accepted" }],
  ["sortie.brief", briefSortie, { sortieId, goNoGo: [] }],
  ["sortie.close", closeSortie, { sortieId }],
  ["sortie.cancel", cancelSortie, { sortieId, version: 1, why: "no" }],
  ["debrief.submit", submitDebrief, { id: desk.newId(), sortieId, content }],
  ["point.dispose", disposePoint, { ...point, disposition: "accept" }],
  ["step.propose", proposeStep, { ...point, decision: "hold", why: "no" }],
  ["step.hold", sayHold, { ...point, why: "no" }],
  ["step.countersign", countersignStep, { stepId: step.id }],
  ["squawk.raise", raiseSquawk, { programmeId: desk.programmeId, system: "Fuel", text: "no", severity: "monitor" }],
  ["squawk.assess", assessSquawk, { squawkId: squawk.id, severity: "monitor" }],
  ["squawk.rectify", rectifySquawk, { squawkId: squawk.id, disposition: "rectified", why: "no", entryReference: "no" }],
  ["squawk.accept", acceptSquawk, { squawkId: squawk.id, disposition: "accepted as is", why: "no" }],
  ["squawk.verify", verifySquawk, { squawkId: squawk.id, entryReference: "no" }],
  ["squawk.close", closeSquawk, { squawkId: squawk.id }],
  ["session.end", endSession, { sessionId: desk.people.pilot.sessionId }],
];

describe("what belongs to another team does not exist", () => {
  test.each(acts)("for %s, and nothing is written", (_, act, input) => {
    const before = desk.db.$client.serialize();
    expect(() => act(desk.outsider(), input)).toThrow(expect.objectContaining({ code: "not-found" }));
    expect(desk.db.$client.serialize().equals(before)).toBe(true);
  });

  const { db } = desk;
  const { actor } = desk.outsider();
  const reads: [string, () => unknown][] = [
    ["getProgramme", () => programme.getProgramme(db, actor, desk.programmeId)],
    ["getProgrammeSnapshot", () => getProgrammeSnapshot(db, actor, desk.programmeId)],
    ["listTestPoints", () => programme.listTestPoints(db, actor, desk.programmeId)],
    ["listParameters", () => programme.listParameters(db, actor, desk.programmeId)],
    ["listInstruments", () => programme.listInstruments(db, actor, desk.programmeId)],
    ["listCalibrations", () => programme.listCalibrations(db, actor, desk.programmeId)],
    ["listLimits", () => programme.listLimits(db, actor, desk.programmeId)],
    ["listObjectives", () => programme.listObjectives(db, actor, desk.programmeId)],
    ["listHazards", () => programme.listHazards(db, actor, desk.programmeId)],
    ["listConfigurations", () => programme.listConfigurations(db, actor, desk.programmeId)],
    ["listStepDecisions", () => programme.listStepDecisions(db, actor, desk.programmeId)],
    ["listCards", () => listCards(db, actor, desk.programmeId)],
    ["getCardRevision", () => getCardRevision(db, actor, cardId, { today: TODAY })],
    ["getSheetSource", () => getSheetSource(db, actor, cardId, "A")],
    ["getCanonicalDocument", () => getCanonicalDocument(db, actor, cardId, "A")],
    ["listComments", () => listComments(db, actor, cardId)],
    ["listPrints", () => listPrints(db, actor, cardId)],
    ["listSorties", () => listSorties(db, actor, desk.programmeId)],
    ["getSortie", () => getSortie(db, actor, sortieId, { today: TODAY })],
    ["getSortieResults", () => getSortieResults(db, actor, sortieId)],
    ["listSquawks", () => listSquawks(db, actor, desk.programmeId)],
    ["listSquawkHistory", () => listSquawkHistory(db, actor, squawk.id)],
    ["getSquawk", () => getSquawk(db, actor, squawk.id)],
  ];
  test.each(reads)("for %s", (_, read) => {
    expect(read).toThrow(expect.objectContaining({ code: "not-found" }));
  });

  test("for the lists of one's own team", () => {
    expect(programme.listProgrammes(db, actor).map(({ id }) => id)).toEqual([desk.otherProgrammeId]);
    expect(listPeople(db, actor).map(({ name }) => name)).toEqual(["An outsider"]);
    expect(listWaiting(db, actor)).toEqual([]);
  });
});
