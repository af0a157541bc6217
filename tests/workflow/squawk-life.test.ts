import { eq } from "drizzle-orm";
import { describe, expect, test } from "vitest";
import { squawks } from "@/db/schema";
import { verifyChain } from "@/lib/audit/verify-chain";
import type { SquawkSeverity } from "@/lib/testcards/words";
import { submitDebrief } from "@/lib/workflow/debrief/submit-debrief";
import { listWaiting } from "@/lib/workflow/sortie/flight-line";
import { acceptSquawk } from "@/lib/workflow/squawk/accept-squawk";
import { assessSquawk } from "@/lib/workflow/squawk/assess-squawk";
import { closeSquawk } from "@/lib/workflow/squawk/close-squawk";
import { listSquawkHistory } from "@/lib/workflow/squawk/history";
import { getSquawk, squawkMay } from "@/lib/workflow/squawk/queries";
import { raiseSquawk } from "@/lib/workflow/squawk/raise-squawk";
import { rectifySquawk } from "@/lib/workflow/squawk/rectify-squawk";
import { verifySquawk } from "@/lib/workflow/squawk/verify-squawk";
import { type Desk, newDesk } from "../support/new-desk";
import { accept, brief, briefedSortie, cardInReview, debriefOf, plannedSortie, release } from "../support/stories";

function raised(severity: SquawkSeverity = "grounding", desk = newDesk()) {
  const { id } = raiseSquawk(desk.as("pilot"), { programmeId: desk.programmeId, system: "Cooling", text: "hose chafed", severity });
  return { desk, squawkId: id };
}
const rowOf = (desk: Desk, id: string) => desk.db.select().from(squawks).where(eq(squawks.id, id)).get();
const assess = ({ desk, squawkId }: { desk: Desk; squawkId: string }, severity: SquawkSeverity = "grounding", why = "") =>
  assessSquawk(desk.as("engineer"), { squawkId, severity, why });
const rectify = ({ desk, squawkId }: { desk: Desk; squawkId: string }) =>
  rectifySquawk(desk.as("mechanic"), { squawkId, disposition: "rectified", why: "hose replaced", entryReference: "log 2, page 14" });
const verify = ({ desk, squawkId }: { desk: Desk; squawkId: string }, entryReference = "L-204, entry 31") =>
  verifySquawk(desk.as("mechanic"), { squawkId, entryReference });

/** A reading past the engine's placard: 114 on the gauge is 101.5 + 14/20 · 21 = 116.2 °C true, placard 115 °C (hand calculation). */
function exceeded() {
  const desk = newDesk();
  const { sortieId } = briefedSortie(desk);
  const content = debriefOf(desk, sortieId, { climb: {} });
  const reading = content.points[0]?.readings.find(({ reading: id }) => id.includes("coolant"));
  if (reading) Object.assign(reading, { value: 114, atS: 600, altitudeFt: 5900, oat: 7 });
  submitDebrief(desk.as("pilot"), { id: desk.newId(), sortieId, content });
  const row = desk.db.select().from(squawks).where(eq(squawks.severity, "grounding")).get();
  if (!row) throw new Error("No grounding squawk was raised.");
  return { desk, squawkId: row.id };
}

/** The same code, the same row, not one event more. */
function expectRefused({ desk, squawkId }: { desk: Desk; squawkId: string }, act: () => unknown, error: Record<string, unknown>) {
  const [before, events] = [rowOf(desk, squawkId), desk.audit().length];
  expect(act).toThrow(expect.objectContaining(error));
  expect(rowOf(desk, squawkId)).toEqual(before);
  expect(desk.audit()).toHaveLength(events);
}

describe("a squawk from raised to closed", () => {
  test("keeps who did what, when and why, with one event for each step in an unbroken chain", () => {
    const one = raised();
    const { desk, squawkId } = one;
    expect(assess(one)).toMatchObject({ state: "assessed", severity: "grounding" });
    expect(rectify(one)).toMatchObject({ state: "dispositioned", disposition: "rectified" });
    expect(verify(one)).toMatchObject({ state: "verified" });
    expect(closeSquawk(desk.as("engineer"), { squawkId })).toMatchObject({ state: "closed" });
    expect(getSquawk(desk.db, desk.as("observer").actor, squawkId)).toMatchObject({
      state: "closed",
      assessedByName: "The engineer",
      dispositionedByName: "The mechanic",
      dispositionWhy: "hose replaced",
      entryReference: "log 2, page 14",
      verifiedByName: "The mechanic",
      verifiedReference: "L-204, entry 31",
      closedByName: "The engineer",
      closedAt: desk.clock.now.toISOString(),
    });
    const history = listSquawkHistory(desk.db, desk.as("observer").actor, squawkId);
    expect(history.map(({ action }) => action)).toEqual([
      "squawk.raise",
      "squawk.assess",
      "squawk.rectify",
      "squawk.verify",
      "squawk.close",
    ]);
    expect(history[2]).toMatchObject({ actorName: "The mechanic", before: { state: "assessed" }, after: { state: "dispositioned" } });
    expect(verifyChain(desk.db, desk.teamId)).toEqual({ events: desk.audit().length, firstBroken: null });
  });

  test("stops release and brief until it is verified, and no longer", () => {
    const desk = newDesk();
    const planned = plannedSortie(desk);
    accept(desk, planned);
    const { cardId } = cardInReview(desk);
    const one = raised("grounding", desk);
    const stops = () => {
      expect(() => brief(desk, planned.sortieId)).toThrow(/grounding-squawk-open/);
      expect(() => release(desk, cardId)).toThrow(/grounding-squawk-open/);
    };
    stops();
    assess(one);
    stops();
    rectify(one);
    stops();
    verify(one);
    expect(release(desk, cardId).revisionId).toBeTruthy();
    expect(brief(desk, planned.sortieId).state).toBe("briefed");
  });

  test("waits on the flight line of whoever is next, and a grounding one in sight of both", () => {
    const one = raised("monitor");
    const { desk, squawkId } = one;
    const acts = (role: "engineer" | "mechanic" | "pilot") =>
      listWaiting(desk.db, desk.as(role).actor).flatMap((item) => (item.what === "open squawk" ? [item.act] : []));
    expect([acts("engineer"), acts("mechanic"), acts("pilot")]).toEqual([["assess"], [], []]);
    assess(one, "grounding", "next to the exhaust");
    expect([acts("engineer"), acts("mechanic")]).toEqual([[null], ["rectify"]]);
    rectify(one);
    expect([acts("engineer"), acts("mechanic")]).toEqual([[null], ["verify"]]);
    verify(one);
    expect([acts("engineer"), acts("mechanic")]).toEqual([["close"], []]);
    closeSquawk(desk.as("engineer"), { squawkId });
    expect([acts("engineer"), acts("mechanic")]).toEqual([[], []]);
  });

  test("can be assessed and disposed of anew until the next step is taken, and the former word stays in its history", () => {
    const one = raised("monitor");
    const { desk, squawkId } = one;
    assess(one, "monitor");
    assess(one, "before next test", "it rubs under power");
    acceptSquawk(desk.as("engineer"), { squawkId, disposition: "deferred with limit", why: "sleeve holds", limit: "5 h" });
    expect(rowOf(desk, squawkId)).toMatchObject({ disposition: "deferred with limit", dispositionLimit: "5 h", entryReference: null });
    rectify(one);
    expect(rowOf(desk, squawkId)).toMatchObject({ disposition: "rectified", dispositionLimit: null, entryReference: "log 2, page 14" });
    const history = listSquawkHistory(desk.db, desk.as("engineer").actor, squawkId);
    expect(history.map(({ after }) => after.disposition)).toEqual([undefined, undefined, undefined, "deferred with limit", "rectified"]);
  });

  test("that does not ground is verified without a licensed person's entry, and accepted as is with a reason", () => {
    const one = raised("monitor");
    assess(one, "monitor");
    acceptSquawk(one.desk.as("engineer"), { squawkId: one.squawkId, disposition: "accepted as is", why: "cosmetic" });
    expect(verify(one, "")).toMatchObject({ state: "verified", disposition: "accepted as is" });
    expect(rowOf(one.desk, one.squawkId)?.verifiedReference).toBeNull();
  });
});

describe("refused, and no trace left", () => {
  test("a step out of order, saying whose turn it is", () => {
    const one = raised();
    const { desk, squawkId } = one;
    expectRefused(one, () => rectify(one), { code: "conflict", message: "Squawk 1 is open. Next: An engineer assesses it." });
    expectRefused(one, () => verify(one), { code: "conflict" });
    expectRefused(one, () => closeSquawk(desk.as("engineer"), { squawkId }), { code: "conflict" });
    assess(one);
    expectRefused(one, () => verify(one), { code: "conflict" });
    rectify(one);
    expectRefused(one, () => assess(one), { code: "conflict", message: "Squawk 1 is dispositioned. Next: A mechanic verifies it." });
    verify(one);
    expectRefused(one, () => rectify(one), { code: "conflict" });
    closeSquawk(desk.as("engineer"), { squawkId });
    expectRefused(one, () => closeSquawk(desk.as("engineer"), { squawkId }), {
      code: "conflict",
      message: "Squawk 1 is closed. It stands as it is.",
    });
  });

  test("a change of severity without a reason; with one it holds", () => {
    const one = raised("grounding");
    expectRefused(one, () => assess(one, "monitor"), { code: "invalid", field: "why" });
    expect(assess(one, "monitor", "chafe mark of the old hose")).toMatchObject({ severity: "monitor" });
  });

  test("to lower what a reading past a placard grounded, with any reason", () => {
    const one = exceeded();
    for (const severity of ["before next test", "monitor"] as const)
      expectRefused(one, () => assess(one, severity, "looked fine"), { code: "conflict", field: "severity" });
    expect(assess(one)).toMatchObject({ state: "assessed", severity: "grounding" });
  });

  test("to defer or accept a grounding squawk", () => {
    const one = raised();
    assess(one);
    for (const disposition of ["deferred with limit", "accepted as is"])
      expectRefused(one, () => acceptSquawk(one.desk.as("engineer"), { squawkId: one.squawkId, disposition, why: "known", limit: "2 h" }), {
        code: "conflict",
        field: "disposition",
      });
  });

  test("to verify a grounding squawk without the licensed person's entry", () => {
    const one = raised();
    assess(one);
    rectify(one);
    expectRefused(one, () => verify(one, "  "), { code: "invalid", field: "entryReference" });
  });

  test.each([
    ["rectified without an entry", rectifySquawk, "mechanic", { disposition: "rectified", why: "replaced", entryReference: " " }],
    ["no fault found without a word", rectifySquawk, "mechanic", { disposition: "no fault found", why: "", entryReference: "log 2" }],
    ["accepted without a reason", acceptSquawk, "engineer", { disposition: "accepted as is", why: "" }],
    ["deferred without a limit", acceptSquawk, "engineer", { disposition: "deferred with limit", why: "holds", limit: " " }],
    ["deferred by the mechanic's form", rectifySquawk, "mechanic", { disposition: "deferred with limit", why: "x", entryReference: "x" }],
  ] as const)("%s", (_, act, role, input) => {
    const one = raised("monitor");
    assess(one, "monitor");
    expectRefused(one, () => act(one.desk.as(role), { squawkId: one.squawkId, ...input }), { name: "ZodError" });
  });

  test("a press on a page that shows an older state", () => {
    const one = raised();
    assess(one);
    const late = () => assessSquawk(one.desk.as("engineer"), { squawkId: one.squawkId, from: "open", severity: "grounding" });
    expectRefused(one, late, { code: "stale" });
  });

  test("by one whose role may not, whatever the state", () => {
    const one = raised();
    const { desk, squawkId } = one;
    expectRefused(one, () => assessSquawk(desk.as("mechanic"), { squawkId, severity: "grounding" }), {
      code: "forbidden",
      message: "Only an engineer may assess squawks.",
    });
    assess(one);
    expectRefused(one, () => rectifySquawk(desk.as("engineer"), { squawkId }), {
      code: "forbidden",
      message: "Only a mechanic may rectify squawks.",
    });
  });
});

test.each([
  ["open", "monitor", { engineer: ["assess"], mechanic: [] }],
  ["assessed", "monitor", { engineer: ["assess", "accept"], mechanic: ["rectify"] }],
  ["assessed", "grounding", { engineer: ["assess"], mechanic: ["rectify"] }],
  ["dispositioned", "monitor", { engineer: ["accept"], mechanic: ["rectify", "verify"] }],
  ["verified", "grounding", { engineer: ["close"], mechanic: [] }],
  ["closed", "monitor", { engineer: [], mechanic: [] }],
] as const)("the screen offers on one that is %s and %s only what would be done", (state, severity, offered) => {
  const desk = newDesk();
  for (const role of ["engineer", "mechanic", "pilot", "reviewer", "observer", "admin"] as const) {
    const may = squawkMay(desk.as(role).actor, { state, severity, raisedFrom: "person" });
    const expected = role === "engineer" || role === "mechanic" ? offered[role] : [];
    expect([role, Object.entries(may).flatMap(([act, yes]) => (yes ? [act] : []))]).toEqual([role, expected]);
  }
});
