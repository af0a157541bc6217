import { eq } from "drizzle-orm";
import { describe, expect, test } from "vitest";
import { cardRevisions, signatures } from "@/db/schema";
import { commentOnCard } from "@/lib/workflow/card/comment-on-card";
import { createCard } from "@/lib/workflow/card/create-card";
import { nextLetter, readSheetCode, toSheetCode } from "@/lib/workflow/card/policy";
import { getCardRevision, listComments } from "@/lib/workflow/card/queries";
import { releaseCard } from "@/lib/workflow/card/release-card";
import { returnCard } from "@/lib/workflow/card/return-card";
import { reviseCard } from "@/lib/workflow/card/revise-card";
import { saveDraft } from "@/lib/workflow/card/save-draft";
import { submitCard } from "@/lib/workflow/card/submit-card";
import { withdrawCard } from "@/lib/workflow/card/withdraw-card";
import { type Desk, newDesk, TODAY } from "../support/new-desk";
import { answersFor, cardInReview, draftCard, readyContent, release, releasedCard } from "../support/stories";
import { climb } from "../testcards/support/ready-card";

const stateOf = (desk: Desk, cardId: string) =>
  desk.db.select({ state: cardRevisions.state }).from(cardRevisions).where(eq(cardRevisions.cardId, cardId)).get()?.state;
const viewOf = (desk: Desk, cardId: string) => getCardRevision(desk.db, desk.as("reviewer").actor, cardId, { today: TODAY });

describe("saving a draft", () => {
  test("refuses a stale version, names the current one and overwrites nothing", () => {
    const desk = newDesk();
    const { cardId, version } = draftCard(desk);
    saveDraft(desk.as("engineer"), { cardId, version, content: readyContent({ remarks: "First." }) });
    const stale = () => saveDraft(desk.as("engineer"), { cardId, version, content: readyContent({ remarks: "Second." }) });
    expect(stale).toThrow(expect.objectContaining({ code: "stale", details: { currentVersion: version + 1 } }));
    expect(viewOf(desk, cardId).document.content.remarks).toBe("First.");
  });

  test("answers a save that changes nothing with the version that stands, and records nothing", () => {
    const desk = newDesk();
    const { cardId, version } = draftCard(desk);
    const before = desk.audit().length;
    expect(saveDraft(desk.as("engineer"), { cardId, version: 1, content: readyContent() }).version).toBe(version);
    expect(desk.audit()).toHaveLength(before);
  });

  test.each([
    ["an infinite mass", readyContent({ baggageKg: Number.POSITIVE_INFINITY }), "content.baggageKg"],
    ["no number", { ...readyContent(), fuelOnBoardL: Number.NaN }, "content.fuelOnBoardL"],
    ["10,000 characters", readyContent({ title: "x".repeat(10_000) }), "content.title"],
    ["a day that is none", readyContent({ plannedOn: "2031-02-30" }), "content.plannedOn"],
    ["a point twice", readyContent({ points: [climb(), climb()] }), "content.points.1.id"],
    [
      "an unknown unit",
      readyContent({ points: [climb({ heightFloor: { value: 1, unit: "furlong" as "ft", reference: "AGL" } })] }),
      "content.points.0.heightFloor.unit",
    ],
    ["a crew of 900 kg", readyContent({ crew: [{ role: "pilot", massKg: 900 }] }), "content.crew.0.massKg"],
  ])("refuses %s at its field and keeps the draft", (_, content, path) => {
    const desk = newDesk();
    const { cardId, version } = draftCard(desk);
    let paths: string[] = [];
    try {
      saveDraft(desk.as("engineer"), { cardId, version, content });
    } catch (error) {
      paths = (error as { issues: { path: PropertyKey[] }[] }).issues.map((issue) => issue.path.join("."));
    }
    expect(paths).toContain(path);
    expect(viewOf(desk, cardId).revision.version).toBe(version);
  });

  test("refuses a field that no card has", () => {
    const desk = newDesk();
    const { cardId, version } = draftCard(desk);
    const odd = { ...readyContent(), approved: true };
    expect(() => saveDraft(desk.as("engineer"), { cardId, version, content: odd })).toThrow(/approved/);
  });

  test("keeps script tags and emoji as the text they are", () => {
    const desk = newDesk();
    const { cardId, version } = draftCard(desk);
    const remarks = "<script>alert(1)</script> 🛩";
    saveDraft(desk.as("engineer"), { cardId, version, content: readyContent({ remarks }) });
    expect(viewOf(desk, cardId).document.content.remarks).toBe(remarks);
  });
});

describe("review", () => {
  test("is refused while a must finding is open, by its code", () => {
    const desk = newDesk();
    const { cardId, version } = draftCard(desk, { points: [climb({ recovery: "" })] });
    expect(() => submitCard(desk.as("engineer"), { cardId, version, answers: answersFor(desk, cardId) })).toThrow(/recovery-missing/);
    expect(stateOf(desk, cardId)).toBe("draft");
  });

  test("is refused while a should finding has no answer, and takes one line for each", () => {
    const desk = newDesk();
    const { cardId, version } = draftCard(desk, { points: [climb({ recovery: "COWL OPEN, level, power as required" })] });
    expect(() => submitCard(desk.as("engineer"), { cardId, version, answers: {} })).toThrow(/vague-word/);
    submitCard(desk.as("engineer"), { cardId, version, answers: answersFor(desk, cardId) });
    expect(stateOf(desk, cardId)).toBe("in review");
  });

  test("takes comments of engineer, reviewer and pilot, and no edit", () => {
    const desk = newDesk();
    const { cardId } = cardInReview(desk);
    commentOnCard(desk.as("pilot"), { cardId, pointId: "climb", text: "68 kt is slow in gusts." });
    commentOnCard(desk.as("reviewer"), { cardId, text: "Agreed." });
    expect(listComments(desk.db, desk.as("observer").actor, cardId).map(({ text }) => text)).toEqual([
      "68 kt is slow in gusts.",
      "Agreed.",
    ]);
    const edit = () => saveDraft(desk.as("engineer"), { cardId, version: 3, content: readyContent({ remarks: "Sneaked in." }) });
    expect(edit).toThrow(expect.objectContaining({ code: "conflict" }));
    expect(() => commentOnCard(desk.as("pilot"), { cardId, pointId: "nowhere", text: "?" })).toThrow(
      expect.objectContaining({ code: "not-found" }),
    );
  });

  test("goes back to draft with the reviewer's words", () => {
    const desk = newDesk();
    const { cardId } = cardInReview(desk);
    expect(() => returnCard(desk.as("reviewer"), { cardId, text: "  " })).toThrow();
    returnCard(desk.as("reviewer"), { cardId, text: "Split the climb." });
    expect(stateOf(desk, cardId)).toBe("draft");
    expect(listComments(desk.db, desk.as("engineer").actor, cardId)).toMatchObject([{ text: "Split the climb.", isReturn: true }]);
  });
});

describe("release", () => {
  const nothingSigned = (desk: Desk) => expect(desk.db.select().from(signatures).all()).toEqual([]);

  test("is refused to the author, though a reviewer too", () => {
    const desk = newDesk();
    const both = desk.addPerson("Both Hats", ["engineer", "reviewer"]);
    const ctx = desk.ctxOf(both);
    const card = createCard(ctx, { programmeId: desk.programmeId, title: "Climb cooling", kind: "flight" });
    const { version } = saveDraft(ctx, { cardId: card.id, version: 1, content: readyContent() });
    submitCard(ctx, { cardId: card.id, version, answers: answersFor(desk, card.id) });
    const { digest, may } = getCardRevision(desk.db, ctx.actor, card.id, { today: TODAY });
    expect(may).toMatchObject({ release: false, return: false });
    const own = () => releaseCard({ ...ctx, proof: { userId: both.id, digest, at: ctx.now } }, { cardId: card.id, digest });
    expect(own).toThrow("You wrote this card, so another reviewer has to release it.");
    nothingSigned(desk);
    expect(release(desk, card.id).letter).toBe("A");
  });

  test("is refused to a later hand that wrote some of it", () => {
    const desk = newDesk();
    const both = desk.addPerson("Both Hats", ["engineer", "reviewer"]);
    const { cardId, version } = draftCard(desk);
    const saved = saveDraft(desk.ctxOf(both), { cardId, version, content: readyContent({ remarks: "Mine." }) });
    submitCard(desk.as("engineer"), { cardId, version: saved.version, answers: answersFor(desk, cardId) });
    const { digest } = viewOf(desk, cardId);
    const ctx = desk.ctxOf(both, desk.teamId, { proof: { userId: both.id, digest, at: desk.clock.now } });
    expect(() => releaseCard(ctx, { cardId, digest })).toThrow(expect.objectContaining({ code: "forbidden" }));
    nothingSigned(desk);
  });

  test.each([
    ["no password asked again", () => undefined],
    ["the proof of another digest", (desk: Desk) => ({ userId: desk.people.reviewer.id, digest: "0".repeat(64), at: desk.clock.now })],
    ["the proof of another person", (desk: Desk, digest: string) => ({ userId: desk.people.pilot.id, digest, at: desk.clock.now })],
    [
      "a proof an hour old",
      (desk: Desk, digest: string) => ({ userId: desk.people.reviewer.id, digest, at: new Date(desk.clock.now.getTime() - 3_600_000) }),
    ],
  ])("is refused with %s", (_, proofOf) => {
    const desk = newDesk();
    const { cardId } = cardInReview(desk);
    const { digest } = viewOf(desk, cardId);
    const proof = proofOf(desk, digest);
    const ctx = desk.as("reviewer", proof ? { proof } : {});
    expect(() => releaseCard(ctx, { cardId, digest })).toThrow(expect.objectContaining({ code: "invalid", field: "password" }));
    expect(stateOf(desk, cardId)).toBe("in review");
    nothingSigned(desk);
  });

  test("is refused when what was shown is no longer what would be signed", () => {
    const desk = newDesk();
    const { cardId } = cardInReview(desk);
    const digest = "1".repeat(64);
    const ctx = desk.as("reviewer", { proof: { userId: desk.people.reviewer.id, digest, at: desk.clock.now } });
    expect(() => releaseCard(ctx, { cardId, digest })).toThrow(expect.objectContaining({ code: "stale" }));
    nothingSigned(desk);
  });

  test("is refused by name when a must opened since the review", () => {
    const desk = newDesk();
    const { cardId } = cardInReview(desk);
    desk.db.$client.prepare("update calibrations set disturbed_on = '2031-05-04' where instrument_id = 'COOLANT-PANEL'").run();
    expect(() => release(desk, cardId)).toThrow(/Not released\. These are open: .*sensor-moved/);
    expect(stateOf(desk, cardId)).toBe("in review");
    nothingSigned(desk);
  });

  test("is refused to a reviewer whose mark lies below the risk that remains", () => {
    const desk = newDesk();
    const { cardId } = cardInReview(desk);
    const { digest } = viewOf(desk, cardId);
    desk.db.$client.prepare("update memberships set residual_risk = 'Low'").run(); // the hazard remains 2D: Medium, MIL-STD-882E table III
    const ctx = desk.as("reviewer", { proof: { userId: desk.people.reviewer.id, digest, at: desk.clock.now } });
    expect(() => releaseCard(ctx, { cardId, digest })).toThrow(/risk-above-signer/);
    nothingSigned(desk);
  });
});

describe("after release", () => {
  test("nothing of the revision changes, not even past the use cases", () => {
    const desk = newDesk();
    const { cardId, revisionId } = releasedCard(desk);
    const run = (sql: string) => () => desk.db.$client.prepare(sql).run(revisionId);
    expect(run("update card_revisions set content = '{}' where id = ?")).toThrow("a released revision is frozen");
    expect(run("update card_revisions set digest = 'x' where id = ?")).toThrow("a released revision is frozen");
    expect(run("update card_revisions set state = 'draft' where id = ?")).toThrow("only be superseded or withdrawn");
    expect(run("delete from card_revisions where id = ?")).toThrow("a released revision is frozen");
    const edit = () => saveDraft(desk.as("engineer"), { cardId, version: 4, content: readyContent({ remarks: "After." }) });
    expect(edit).toThrow(/released and frozen; an engineer makes the next revision/);
  });

  test("a withdrawn revision stays withdrawn, and the next letter follows from it", () => {
    const desk = newDesk();
    const { cardId } = releasedCard(desk);
    withdrawCard(desk.as("reviewer"), { cardId, letter: "A", why: "gauge replaced" });
    expect(() => withdrawCard(desk.as("reviewer"), { cardId, letter: "A", why: "again" })).toThrow(
      expect.objectContaining({ code: "conflict" }),
    );
    expect(reviseCard(desk.as("engineer"), { cardId }).letter).toBe("B");
    expect(() => reviseCard(desk.as("engineer"), { cardId })).toThrow(/Revision B is still draft/);
  });
});

describe("letters and codes", () => {
  // The lettering of drawings: after Z comes AA; hand counted.
  test.each([
    ["A", "B"],
    ["Y", "Z"],
    ["Z", "AA"],
    ["AZ", "BA"],
    ["BC", "BD"],
  ])("after %s comes %s", (letter, next) => {
    expect(nextLetter(letter)).toBe(next);
  });

  // Crockford's base 32 by hand: byte 0 is "0", 31 is "Z", 32 is "0" again, 17 is "H".
  test("spells ten bytes in two groups of five", () => {
    expect(toSheetCode(new Uint8Array([0, 31, 32, 17, 1, 10, 9, 2, 3, 4]))).toBe("0Z0H1-A9234");
  });

  test.each([
    ["0z0h1 a9234", "0Z0H1-A9234"],
    ["OZOHI-A9234", "0Z0H1-A9234"],
    ["0Z0H1", null],
    ["0Z0H1-A923U", null],
    ["x".repeat(10_000), null],
  ])("reads %j as typed", (typed, code) => {
    expect(readSheetCode(typed)).toBe(code);
  });
});
