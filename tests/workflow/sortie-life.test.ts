import { eq } from "drizzle-orm";
import { describe, expect, test } from "vitest";
import { cardRevisions, debriefs, pointDispositions, sorties, squawks } from "@/db/schema";
import { reviseCard } from "@/lib/workflow/card/revise-card";
import { saveDraft } from "@/lib/workflow/card/save-draft";
import { submitCard } from "@/lib/workflow/card/submit-card";
import { submitDebrief } from "@/lib/workflow/debrief/submit-debrief";
import { answerCard } from "@/lib/workflow/sortie/answer-card";
import { briefSortie } from "@/lib/workflow/sortie/brief-sortie";
import { changeSortie } from "@/lib/workflow/sortie/change-sortie";
import { disposePoint } from "@/lib/workflow/sortie/dispose-point";
import { listWaiting } from "@/lib/workflow/sortie/flight-line";
import { planSortie } from "@/lib/workflow/sortie/plan-sortie";
import { getSortie, getSortieResults } from "@/lib/workflow/sortie/queries";
import { raiseSquawk } from "@/lib/workflow/squawk/raise-squawk";
import { countersignStep } from "@/lib/workflow/step/countersign-step";
import { proposeStep } from "@/lib/workflow/step/propose-step";
import { type Desk, newDesk, TODAY } from "../support/new-desk";
import {
  accept,
  answersFor,
  brief,
  briefedSortie,
  cardInReview,
  debriefOf,
  plannedSortie,
  readyContent,
  release,
  releasedCard,
  sortieInput,
} from "../support/stories";

const sortieOf = (desk: Desk, id: string) => desk.db.select().from(sorties).where(eq(sorties.id, id)).get();
const GO = [{ line: "wind 15 kt, gust spread 8, crosswind 8 or less", go: true }];

describe("planning", () => {
  test("takes cards that are not released yet, but neither accepts nor briefs them", () => {
    const desk = newDesk();
    const { cardId } = cardInReview(desk);
    const revision = desk.db.select({ id: cardRevisions.id }).from(cardRevisions).where(eq(cardRevisions.cardId, cardId)).get();
    const sortie = planSortie(desk.as("engineer"), sortieInput(desk, [revision?.id ?? ""]));
    const view = getSortie(desk.db, desk.as("pilot").actor, sortie.id, { today: TODAY });
    expect(view.cards[0]).toMatchObject({ state: "in review", answer: null });
    expect(() => brief(desk, sortie.id)).toThrow("Card 01 revision A is in review, not released: a reviewer releases it.");
    const answer = () =>
      answerCard(desk.as("pilot"), { sortieId: sortie.id, revisionId: revision?.id, digest: view.cards[0]?.digest, answer: "accepted" });
    expect(answer).toThrow(/only a released revision can be accepted\. A reviewer releases it\./);
  });

  test.each([
    ["a card that is none", (desk: Desk) => ({ revisionIds: [desk.newId()] }), "not-found"],
    ["no such person", (desk: Desk) => ({ crew: [{ userId: desk.newId(), name: "X", role: "pilot", massKg: 80 }] }), "not-found"],
    ["a day of another century", () => ({ plannedOn: "1931-05-05" }), "invalid"],
    ["a configuration of nobody", (desk: Desk) => ({ configurationId: desk.newId() }), "not-found"],
  ])("refuses %s and writes nothing", (_, over, code) => {
    const desk = newDesk();
    const { revisionId } = releasedCard(desk);
    const events = desk.audit().length;
    expect(() => planSortie(desk.as("engineer"), { ...sortieInput(desk, [revisionId]), ...over(desk) })).toThrow(
      expect.objectContaining({ code }),
    );
    expect(desk.db.select().from(sorties).all()).toEqual([]);
    expect(desk.audit()).toHaveLength(events);
  });

  test("refuses a revision out of force, by card and letter", () => {
    const desk = newDesk();
    const first = releasedCard(desk);
    reviseCard(desk.as("engineer"), { cardId: first.cardId });
    const { version } = saveDraft(desk.as("engineer"), { cardId: first.cardId, version: 1, content: readyContent({ remarks: "B" }) });
    submitCard(desk.as("engineer"), { cardId: first.cardId, version, answers: answersFor(desk, first.cardId) });
    release(desk, first.cardId);
    expect(() => planSortie(desk.as("engineer"), sortieInput(desk, [first.revisionId]))).toThrow(
      "Card 01 revision A is superseded: choose the revision in force.",
    );
  });
});

describe("acceptance and brief", () => {
  test("binds the pilot's answer to the digest that was shown", () => {
    const desk = newDesk();
    const planned = plannedSortie(desk);
    const stale = () => answerCard(desk.as("pilot"), { ...planned, cardId: undefined, letter: undefined, code: undefined });
    expect(stale).toThrow();
    const other = () =>
      answerCard(desk.as("pilot"), {
        sortieId: planned.sortieId,
        revisionId: planned.revisionId,
        digest: "2".repeat(64),
        answer: "accepted",
      });
    expect(other).toThrow(expect.objectContaining({ code: "stale" }));
    expect(accept(desk, planned).answer).toBe("accepted");
    const before = desk.audit().length;
    expect(accept(desk, planned).answer).toBe("accepted"); // a double click
    expect(desk.audit()).toHaveLength(before);
  });

  test("is the named pilot's own, and a decline wants its reason", () => {
    const desk = newDesk();
    const planned = plannedSortie(desk);
    const { sortieId, revisionId, digest } = planned;
    const another = desk.ctxOf(desk.addPerson("Another Pilot", ["pilot"]));
    expect(() => answerCard(another, { sortieId, revisionId, digest, answer: "accepted" })).toThrow(
      "Only the pilot of this sortie, The pilot, may do this.",
    );
    expect(() => answerCard(desk.as("pilot"), { sortieId, revisionId, digest, answer: "declined" })).toThrow(/Say why it is declined/);
    expect(answerCard(desk.as("pilot"), { sortieId, revisionId, digest, answer: "declined", why: "too long" }).answer).toBe("declined");
    expect(() => briefSortie(desk.as("pilot"), { sortieId, goNoGo: GO })).toThrow(/Not briefed\. These are open: .*acceptance-missing/);
  });

  test("refuses the brief while a go/no-go line is not ticked, and while a must is open, by name", () => {
    const desk = newDesk();
    const planned = plannedSortie(desk);
    expect(() => brief(desk, planned.sortieId)).toThrow(/Not briefed\. These are open: .*acceptance-missing/);
    accept(desk, planned);
    const unticked = () => briefSortie(desk.as("pilot"), { sortieId: planned.sortieId, goNoGo: [{ line: GO[0]?.line, go: false }] });
    expect(unticked).toThrow(/Any NO stops/);
    raiseSquawk(desk.as("mechanic"), { programmeId: desk.programmeId, system: "Cooling", text: "hose chafed", severity: "grounding" });
    expect(() => brief(desk, planned.sortieId)).toThrow(/Not briefed\. These are open: .*grounding-squawk-open/);
    expect(sortieOf(desk, planned.sortieId)).toMatchObject({ state: "planned", briefedAt: null });
  });

  test("a change after the brief drops the sortie to planned, and keeps the answer to a card that stays", () => {
    const desk = newDesk();
    const { sortieId, revisionId } = briefedSortie(desk);
    const { version } = sortieOf(desk, sortieId) ?? { version: 0 };
    expect(() => changeSortie(desk.as("engineer"), { sortieId, version: version - 1, plannedOn: "2031-05-06" })).toThrow(
      expect.objectContaining({ code: "stale" }),
    );
    changeSortie(desk.as("engineer"), { sortieId, version, plannedOn: "2031-05-06", revisionIds: [revisionId] });
    const view = getSortie(desk.db, desk.as("pilot").actor, sortieId, { today: TODAY });
    expect(view.sortie).toMatchObject({ state: "planned", plannedOn: "2031-05-06", goNoGo: null });
    expect(view.cards[0]?.answer).toBe("accepted");
  });
});

describe("the debrief", () => {
  test("sent twice is one, and with other content a conflict", () => {
    const desk = newDesk();
    const { sortieId } = briefedSortie(desk);
    const content = debriefOf(desk, sortieId, { climb: {} });
    const id = desk.newId();
    const first = submitDebrief(desk.as("pilot"), { id, sortieId, content });
    const events = desk.audit().length;
    expect(submitDebrief(desk.as("pilot"), { id, sortieId, content })).toEqual(first);
    expect(desk.audit()).toHaveLength(events);
    expect(() => submitDebrief(desk.as("pilot"), { id, sortieId, content: { ...content, comment: "Later." } })).toThrow(
      expect.objectContaining({ code: "conflict" }),
    );
    expect(() => submitDebrief(desk.as("pilot"), { id: desk.newId(), sortieId, content })).toThrow(/debriefed from another phone/);
    expect(desk.db.select().from(debriefs).all()).toHaveLength(1);
  });

  test("locks the raw readings, even past the use cases", () => {
    const desk = newDesk();
    const { sortieId } = briefedSortie(desk);
    submitDebrief(desk.as("pilot"), { id: desk.newId(), sortieId, content: debriefOf(desk, sortieId, { climb: {} }) });
    expect(() => desk.db.$client.prepare("update debriefs set content = '{}'").run()).toThrow("raw readings are locked at submit");
    expect(() => desk.db.$client.prepare("delete from debriefs").run()).toThrow("raw readings are locked at submit");
    expect(() => desk.db.$client.prepare("update check_reports set report = '{}'").run()).toThrow("a check report stays");
  });

  test("refuses what cannot be, at its field, and leaves the sortie as it was", () => {
    const desk = newDesk();
    const { sortieId } = briefedSortie(desk);
    const content = debriefOf(desk, sortieId, { climb: {} });
    const point = content.points[0];
    const reading = point?.readings.find(({ reading: id }) => id.includes("coolant"));
    if (reading) reading.value = 860; // far past what the coolant gauge can show
    const send = () => submitDebrief(desk.as("pilot"), { id: desk.newId(), sortieId, content });
    expect(send).toThrow(expect.objectContaining({ code: "invalid", field: `climb.${reading?.reading}.value` }));
    expect(sortieOf(desk, sortieId)?.state).toBe("briefed");
    expect(desk.db.select().from(debriefs).all()).toEqual([]);
  });

  test.each([
    ["a point of no card", { point: "nowhere" }],
    ["a reading of no point", { readings: "stranger" }],
    ["the same point twice", { twice: true }],
    ["another kind of sortie", { kind: "taxi" }],
    ["no outcome", { outcome: null }],
  ])("refuses %s", (_, spoil) => {
    const desk = newDesk();
    const { sortieId } = briefedSortie(desk);
    const content = debriefOf(desk, sortieId, { climb: {} });
    const [point] = content.points;
    if (!point) throw new Error("no point");
    if ("point" in spoil) point.point = "nowhere";
    if ("readings" in spoil && point.readings[0]) point.readings[0].reading = "stranger";
    if ("twice" in spoil) content.points.push(structuredClone(point));
    if ("kind" in spoil) content.kind = "taxi";
    if ("outcome" in spoil) point.outcome = null;
    expect(() => submitDebrief(desk.as("pilot"), { id: desk.newId(), sortieId, content })).toThrow(
      expect.objectContaining({ code: "invalid" }),
    );
    expect(sortieOf(desk, sortieId)?.state).toBe("briefed");
  });

  test("turns the pilot's squawks into open ones, for a person to assess", () => {
    const desk = newDesk();
    const { sortieId } = briefedSortie(desk);
    const content = debriefOf(
      desk,
      sortieId,
      { climb: {} },
      { squawks: [{ id: "s1", system: "Cowl", text: "lever stiff", flyAgain: false }] },
    );
    submitDebrief(desk.as("pilot"), { id: desk.newId(), sortieId, content });
    const [row] = desk.db.select().from(squawks).where(eq(squawks.raisedFrom, "debrief")).all();
    expect(row).toMatchObject({ system: "Cowl", text: "lever stiff", severity: "before next test", state: "open", number: 1 });
  });
});

describe("after the debrief", () => {
  function flown() {
    const desk = newDesk();
    const { sortieId, revisionId } = briefedSortie(desk);
    submitDebrief(desk.as("pilot"), { id: desk.newId(), sortieId, content: debriefOf(desk, sortieId, { climb: {} }) });
    return { desk, point: { sortieId, revisionId, pointId: "climb" } };
  }

  test("a disposition makes a new check beside the old one, and a second disposition keeps the first", () => {
    const { desk, point } = flown();
    expect(() => disposePoint(desk.as("engineer"), { ...point, disposition: "void" })).toThrow(/Say why/);
    expect(disposePoint(desk.as("engineer"), { ...point, disposition: "accept" }).version).toBe(2);
    expect(disposePoint(desk.as("engineer"), { ...point, disposition: "repeat", why: "too few readings" }).version).toBe(3);
    const results = getSortieResults(desk.db, desk.as("observer").actor, point.sortieId);
    expect(results.versions).toEqual([1, 2, 3]);
    expect(results.dispositions).toMatchObject([{ pointId: "climb", disposition: "repeat", why: "too few readings" }]);
    expect(desk.db.select().from(pointDispositions).all()).toHaveLength(2);
    expect(results.checks[0]?.report.points[0]?.decision).toBe("hold"); // a repeat holds the step
    expect(getSortieResults(desk.db, desk.as("observer").actor, point.sortieId, { version: 1 }).version).toBe(1);
  });

  test("a step looser than computed is refused; hold stands at once, and one's own proposal is not countersigned", () => {
    const { desk, point } = flown();
    // No reading was taken, so required comparisons have no verdict: hold.
    const loose = () => proposeStep(desk.as("engineer"), { ...point, decision: "clear to next step", why: "looked fine" });
    expect(loose).toThrow(/The check computed "hold"/);
    const held = proposeStep(desk.as("engineer"), { ...point, decision: "hold", why: "no readings" });
    expect(held).toMatchObject({ decision: "hold", stands: true });
    const both = desk.ctxOf(desk.addPerson("Both Hats", ["engineer", "reviewer"]));
    const own = proposeStep(both, { ...point, decision: "hold", why: "no readings" });
    expect(() => countersignStep(both, { stepId: own.id })).toThrow(/another reviewer countersigns/);
    expect(countersignStep(desk.as("reviewer"), { stepId: own.id }).decision).toBe("hold");
    const { context } = getSortie(desk.db, desk.as("engineer").actor, point.sortieId, { today: TODAY });
    expect(context.buildUp.find(({ code }) => code === "T10")).toEqual({ code: "T10", state: "hold", from: "flown" });
  });

  test("the flight line shows each person what waits for them", () => {
    const { desk } = flown();
    const what = (role: "engineer" | "reviewer" | "pilot" | "observer") =>
      listWaiting(desk.db, desk.as(role).actor).map((item) => item.what);
    expect(what("engineer")).toEqual(["review results"]);
    expect(what("pilot")).toEqual([]);
    cardInReview(desk);
    expect(what("reviewer")).toEqual(["review card"]);
    expect(what("observer")).toEqual([]);
  });
});
