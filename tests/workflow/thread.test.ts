import { eq } from "drizzle-orm";
import { describe, expect, test } from "vitest";
import { cardRevisions, signatures, sorties, squawks } from "@/db/schema";
import { verifyChain } from "@/lib/audit/verify-chain";
import { findSheet, getCardRevision, listCards } from "@/lib/workflow/card/queries";
import { reviseCard } from "@/lib/workflow/card/revise-card";
import { saveDraft } from "@/lib/workflow/card/save-draft";
import { submitCard } from "@/lib/workflow/card/submit-card";
import { withdrawCard } from "@/lib/workflow/card/withdraw-card";
import { submitDebrief } from "@/lib/workflow/debrief/submit-debrief";
import { sha256 } from "@/lib/workflow/digest";
import { getSortieResults } from "@/lib/workflow/sortie/queries";
import { newDesk, TODAY } from "../support/new-desk";
import {
  accept,
  answersFor,
  brief,
  briefedSortie,
  debriefOf,
  plannedSortie,
  readyContent,
  release,
  releasedCard,
} from "../support/stories";

describe("a card from draft to the ground", () => {
  test("releases what was shown, frozen under its SHA-256, signed by the reviewer", () => {
    const desk = newDesk();
    const { cardId, revisionId, digest, code } = releasedCard(desk);
    const row = desk.db.select().from(cardRevisions).where(eq(cardRevisions.id, revisionId)).get();
    expect(row?.state).toBe("released");
    expect(sha256(row?.document ?? "")).toBe(digest); // any SHA-256 of the stored text: what a stranger can check
    expect(desk.db.select().from(signatures).get()).toMatchObject({ meaning: "released", digest, name: "The reviewer", role: "reviewer" });
    const view = getCardRevision(desk.db, desk.as("observer").actor, cardId, { today: TODAY });
    expect(view.stamp).toMatchObject({
      name: "The reviewer",
      shortDigest: `${digest.slice(0, 4)}-${digest.slice(4, 8)}`.toUpperCase(),
      code,
    });
    expect(view.document.content.title).toBe("Climb cooling");
    expect(findSheet(desk.db, code)).toEqual({ standing: "in force" });
    expect(findSheet(desk.db, code.toLowerCase().replace("-", " "))).toEqual({ standing: "in force" });
    expect(findSheet(desk.db, "00000-00000")).toEqual({ standing: "unknown" });
  });

  test("supersedes the revision before it in the same act, and that one's print is no longer in force", () => {
    const desk = newDesk();
    const first = releasedCard(desk);
    expect(reviseCard(desk.as("engineer"), { cardId: first.cardId })).toMatchObject({ letter: "B", version: 1 });
    expect(findSheet(desk.db, first.code)).toEqual({ standing: "in force" });
    const saved = saveDraft(desk.as("engineer"), { cardId: first.cardId, version: 1, content: readyContent({ remarks: "Second." }) });
    submitCard(desk.as("engineer"), { cardId: first.cardId, version: saved.version, answers: answersFor(desk, first.cardId) });
    const second = release(desk, first.cardId);
    expect(findSheet(desk.db, first.code)).toEqual({ standing: "not in force: do not fly with it" });
    expect(findSheet(desk.db, second.code)).toEqual({ standing: "in force" });
    const [card] = listCards(desk.db, desk.as("observer").actor, desk.programmeId);
    expect(card).toMatchObject({ letter: "B", state: "released", revisionCount: 2 });
    const old = getCardRevision(desk.db, desk.as("observer").actor, first.cardId, { today: TODAY, letter: "A" });
    expect(old.revision).toMatchObject({ state: "superseded", endedWhy: "superseded by revision B" });
    expect(old.digest).toBe(first.digest);
  });

  test("drops a briefed sortie to planned when its card is withdrawn", () => {
    const desk = newDesk();
    const { cardId, sortieId, code } = briefedSortie(desk);
    withdrawCard(desk.as("reviewer"), { cardId, letter: "A", why: "coolant gauge replaced" });
    expect(findSheet(desk.db, code)).toEqual({ standing: "not in force: do not fly with it" });
    expect(desk.db.select().from(sorties).where(eq(sorties.id, sortieId)).get()).toMatchObject({ state: "planned", briefedAt: null });
    expect(desk.audit().at(-1)).toMatchObject({ action: "sortie.drop-to-planned", subject: `sortie/${sortieId}` });
    expect(() => brief(desk, sortieId)).toThrow("Card 01 revision A is withdrawn, not released: a reviewer releases it.");
  });
});

describe("a sortie from plan to results", () => {
  test("is planned, accepted by digest, briefed, debriefed and judged, with every step in one unbroken chain", () => {
    const desk = newDesk();
    const planned = plannedSortie(desk);
    expect(accept(desk, planned)).toMatchObject({ answer: "accepted", digest: planned.digest });
    expect(brief(desk, planned.sortieId).state).toBe("briefed");
    // Coolant panel: 80 → 79 and 100 → 101.5, so 95 on the gauge is 79 + 15/20 · 22.5 = 95.875 °C true (hand calculation).
    const content = debriefOf(desk, planned.sortieId, { climb: { readings: { "coolant-read": { value: 95 } } } });
    const reading = content.points[0]?.readings.find(({ reading: id }) => id.includes("coolant"));
    if (reading) Object.assign(reading, { value: 95, atS: 600, altitudeFt: 5900, oat: 7 });
    if (content.points[0]) Object.assign(content.points[0], { outcome: "flown", onCondition: true });
    const sent = submitDebrief(desk.as("pilot"), { id: desk.newId(), sortieId: planned.sortieId, content });
    expect(sent.version).toBe(1);
    const results = getSortieResults(desk.db, desk.as("observer").actor, planned.sortieId);
    expect(results.sortie.state).toBe("debriefed");
    expect(results.flownUnbriefed).toBe(false);
    const coolant = results.checks[0]?.report.lines.find((line) => line.parameter === "coolant" && line.comparison === "as flown, placard");
    expect(coolant?.onGauge?.value).toBe(95);
    expect(coolant?.asTrue?.value).toBeCloseTo(95.875, 9);
    expect(verifyChain(desk.db, desk.teamId)).toEqual({ events: desk.audit().length, firstBroken: null });
    expect(desk.audit().map(({ action }) => action)).toEqual([
      "card.create",
      "card.save-draft",
      "card.submit",
      "card.release",
      "sortie.plan",
      "sortie.answer-card",
      "sortie.brief",
      "debrief.submit",
    ]);
  });

  test("raises a grounding squawk when a reading lies past the engine's placard", () => {
    const desk = newDesk();
    const { sortieId } = briefedSortie(desk);
    const content = debriefOf(desk, sortieId, { climb: {} });
    const reading = content.points[0]?.readings.find(({ reading: id }) => id.includes("coolant"));
    // 114 on the gauge: 101.5 + 14/20 · 21 = 116.2 °C true, past the placard of 115 °C (hand calculation).
    if (reading) Object.assign(reading, { value: 114, atS: 600, altitudeFt: 5900, oat: 7 });
    const sent = submitDebrief(desk.as("pilot"), { id: desk.newId(), sortieId, content });
    expect(sent.squawks.length).toBeGreaterThan(0);
    const raised = desk.db.select().from(squawks).where(eq(squawks.sortieId, sortieId)).all();
    expect(
      raised.some(({ severity, raisedFrom, state }) => severity === "grounding" && raisedFrom === "exceedance" && state === "open"),
    ).toBe(true);
    expect(desk.audit().filter(({ action }) => action === "squawk.raise")).toHaveLength(raised.length);
  });

  test("takes what happened without a brief, and says so", () => {
    const desk = newDesk();
    const { sortieId } = plannedSortie(desk);
    submitDebrief(desk.as("pilot"), { id: desk.newId(), sortieId, content: debriefOf(desk, sortieId, { climb: {} }) });
    const results = getSortieResults(desk.db, desk.as("engineer").actor, sortieId);
    expect(results.sortie.state).toBe("debriefed");
    expect(results.flownUnbriefed).toBe(true);
  });
});
