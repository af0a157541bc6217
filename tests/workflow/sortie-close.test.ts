import { eq } from "drizzle-orm";
import { describe, expect, test } from "vitest";
import { sorties } from "@/db/schema";
import { submitDebrief } from "@/lib/workflow/debrief/submit-debrief";
import { cancelSortie } from "@/lib/workflow/sortie/cancel-sortie";
import { changeSortie } from "@/lib/workflow/sortie/change-sortie";
import { closeSortie } from "@/lib/workflow/sortie/close-sortie";
import { disposePoint } from "@/lib/workflow/sortie/dispose-point";
import { listWaiting } from "@/lib/workflow/sortie/flight-line";
import { getSortie, getSortieResults } from "@/lib/workflow/sortie/queries";
import { assessSquawk } from "@/lib/workflow/squawk/assess-squawk";
import { raiseSquawk } from "@/lib/workflow/squawk/raise-squawk";
import { countersignStep } from "@/lib/workflow/step/countersign-step";
import { proposeStep } from "@/lib/workflow/step/propose-step";
import { sayHold } from "@/lib/workflow/step/say-hold";
import { type Desk, newDesk, TODAY } from "../support/new-desk";
import { accept, brief, briefedSortie, debriefOf, plannedSortie } from "../support/stories";

const rowOf = (desk: Desk, id: string) => desk.db.select().from(sorties).where(eq(sorties.id, id)).get();
const versionOf = (desk: Desk, id: string) => rowOf(desk, id)?.version ?? 0;
const waits = (desk: Desk, role: "engineer" | "pilot") => listWaiting(desk.db, desk.as(role).actor).map(({ what }) => what);

function expectRefused(desk: Desk, act: () => unknown, error: Record<string, unknown>) {
  const before = desk.db.$client.serialize();
  expect(act).toThrow(expect.objectContaining(error));
  expect(desk.db.$client.serialize().equals(before)).toBe(true);
}

function debriefed() {
  const desk = newDesk();
  const { sortieId, revisionId } = briefedSortie(desk);
  submitDebrief(desk.as("pilot"), { id: desk.newId(), sortieId, content: debriefOf(desk, sortieId, { climb: {} }) });
  return { desk, sortieId, point: { sortieId, revisionId, pointId: "climb" } };
}

function closed() {
  const story = debriefed();
  const { desk, sortieId, point } = story;
  disposePoint(desk.as("engineer"), { ...point, disposition: "accept" });
  proposeStep(desk.as("engineer"), { ...point, decision: "hold", why: "no readings" });
  closeSortie(desk.as("engineer"), { sortieId, why: "reduced" });
  return story;
}

describe("closing a debriefed sortie", () => {
  test("is refused by name for every point, step and squawk that is open, then closes with one event", () => {
    const { desk, sortieId, point } = debriefed();
    const squawk = raiseSquawk(desk.as("pilot"), {
      programmeId: desk.programmeId,
      sortieId,
      system: "Cowl",
      text: "lever stiff",
      severity: "monitor",
    });
    const close = () => closeSortie(desk.as("engineer"), { sortieId, why: "reduced" });
    const open = [
      "Card 01, Climb cooling: accept, repeat or void is not decided.",
      "Card 01, Climb cooling: no step decision yet.",
      `Squawk ${squawk.number} is not assessed.`,
    ];
    expectRefused(desk, close, { code: "conflict", details: { open } });
    expect(getSortieResults(desk.db, desk.as("engineer").actor, sortieId)).toMatchObject({ open, may: { close: true } });
    expect(waits(desk, "engineer")).toContain("review results");

    disposePoint(desk.as("engineer"), { ...point, disposition: "accept" });
    expectRefused(desk, close, { details: { open: open.slice(1) } });
    sayHold(desk.as("pilot"), { ...point, why: "vibration" });
    expectRefused(desk, close, { details: { open: open.slice(2) } });
    assessSquawk(desk.as("engineer"), { squawkId: squawk.id, severity: "monitor" });
    expect(waits(desk, "engineer")).toContain("close sortie");

    const events = desk.audit().length;
    expect(close()).toMatchObject({ state: "closed" });
    expect(close()).toMatchObject({ state: "closed" }); // a double click
    expect(desk.audit().slice(events)).toMatchObject([
      { action: "sortie.close", before: { state: "debriefed" }, after: { closedWhy: "reduced" } },
    ]);
    expect(getSortie(desk.db, desk.as("observer").actor, sortieId, { today: TODAY }).sortie).toMatchObject({
      state: "closed",
      closedByName: "The engineer",
      closedAt: desk.clock.now.toISOString(),
    });
    expect(waits(desk, "engineer")).not.toContain("close sortie");
    expect(waits(desk, "engineer")).not.toContain("review results");
  });

  test("waits for the countersignature of a step that is no hold", () => {
    const { desk, sortieId, point } = debriefed();
    disposePoint(desk.as("engineer"), { ...point, disposition: "accept" });
    const { id } = proposeStep(desk.as("engineer"), { ...point, decision: "hold", why: "no readings" });
    // Without a reading the check never computes a looser step, so the stored word is set as a check with readings would have left it.
    desk.db.$client.prepare("update step_decisions set decision = 'smaller step', computed = 'smaller step' where id = ?").run(id);
    const close = () => closeSortie(desk.as("engineer"), { sortieId });
    expectRefused(desk, close, {
      details: { open: ["Card 01, Climb cooling: “smaller step” waits for a reviewer's countersignature."] },
    });
    expect(listWaiting(desk.db, desk.as("reviewer").actor)).toMatchObject([
      { what: "countersign step", stepId: id, decision: "smaller step" },
    ]);
    countersignStep(desk.as("reviewer"), { stepId: id });
    expect(listWaiting(desk.db, desk.as("reviewer").actor)).toEqual([]);
    expect(close()).toMatchObject({ state: "closed" });
  });

  test("is refused before the debrief, saying what is done instead", () => {
    const desk = newDesk();
    const { sortieId } = briefedSortie(desk);
    expectRefused(desk, () => closeSortie(desk.as("engineer"), { sortieId }), {
      code: "conflict",
      message: "Sortie 1 is briefed: it is closed after its debrief, or cancelled before it is flown.",
    });
  });

  test.each(["admin", "reviewer", "pilot", "mechanic", "observer"] as const)("is not the %s's", (role) => {
    const { desk, sortieId } = debriefed();
    expectRefused(desk, () => closeSortie(desk.as(role), { sortieId }), { code: "forbidden" });
    expectRefused(desk, () => cancelSortie(desk.as(role), { sortieId, version: 1, why: "x" }), { code: "forbidden" });
  });

  test("ends every change to it, in words; a hold is heard all the same", () => {
    const { desk, sortieId, point } = closed();
    const acts: (() => unknown)[] = [
      () => disposePoint(desk.as("engineer"), { ...point, disposition: "void", why: "later" }),
      () => proposeStep(desk.as("engineer"), { ...point, decision: "hold", why: "later" }),
      () => changeSortie(desk.as("engineer"), { sortieId, version: versionOf(desk, sortieId), plannedOn: "2031-05-06" }),
      () => cancelSortie(desk.as("engineer"), { sortieId, version: versionOf(desk, sortieId), why: "later" }),
    ];
    for (const act of acts)
      expectRefused(desk, act, { code: "conflict", message: expect.stringMatching(/^Sortie 1 is closed: .*no longer be/) });
    expect(getSortieResults(desk.db, desk.as("engineer").actor, sortieId).may).toEqual({
      dispose: false,
      proposeStep: false,
      close: false,
    });
    expect(sayHold(desk.as("mechanic"), { ...point, why: "filter full of metal" }).decision).toBe("hold");
    expect(rowOf(desk, sortieId)?.state).toBe("closed");
  });
});

describe("cancelling a sortie that was not flown", () => {
  test.each(["planned", "briefed"] as const)("from %s closes it with the reason and every point skipped", (from) => {
    const desk = newDesk();
    const planned = plannedSortie(desk);
    const { sortieId } = planned;
    if (from === "briefed") {
      accept(desk, planned);
      brief(desk, sortieId);
    }
    cancelSortie(desk.as("engineer"), { sortieId, version: versionOf(desk, sortieId), why: "crosswind 14 kt all day" });
    expect(rowOf(desk, sortieId)).toMatchObject({ state: "closed", closedWhy: "crosswind 14 kt all day" });
    expect(desk.audit().at(-1)).toMatchObject({
      action: "sortie.cancel",
      before: { state: from },
      after: { state: "closed", points: [{ point: "climb", outcome: "skipped" }] },
    });
    expect([waits(desk, "engineer"), waits(desk, "pilot")]).toEqual([[], []]);
    const content = debriefOf(desk, sortieId, { climb: {} });
    expectRefused(desk, () => submitDebrief(desk.as("pilot"), { id: desk.newId(), sortieId, content }), { code: "conflict" });
    expectRefused(desk, () => accept(desk, planned), { code: "conflict", message: "Sortie 1 is closed: it can no longer be answered." });
  });

  test("wants a reason and the version that was seen", () => {
    const desk = newDesk();
    const { sortieId } = plannedSortie(desk);
    const cancel = (over: Record<string, unknown>) => () =>
      cancelSortie(desk.as("engineer"), { sortieId, version: versionOf(desk, sortieId), why: "weather", ...over });
    expectRefused(desk, cancel({ why: "  " }), { name: "ZodError" });
    expectRefused(desk, cancel({ version: 99 }), { code: "stale" });
  });

  test("is refused once it was flown", () => {
    const { desk, sortieId } = debriefed();
    expectRefused(desk, () => cancelSortie(desk.as("engineer"), { sortieId, version: versionOf(desk, sortieId), why: "x" }), {
      code: "conflict",
      message: "Sortie 1 is debriefed: it can no longer be cancelled.",
    });
  });
});
