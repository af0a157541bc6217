import { describe, expect, test } from "vitest";
import { appendAudit, CHAIN_START, eventDigest } from "@/lib/audit/append-audit";
import { verifyChain } from "@/lib/audit/verify-chain";
import { newDesk } from "../support/new-desk";

describe("the audit chain", () => {
  // SHA-256 of the RFC 8785 text of this event (fields in order, no spaces), by coreutils: printf '%s' '{"action":"card.create","actorId":"a", … ,"teamId":"t"}' | sha256sum
  test("digests canonical JSON with SHA-256", () => {
    const event = {
      teamId: "t",
      sequence: 1,
      at: "2031-05-04T09:00:00.000Z",
      actorId: "a",
      actorName: "A",
      action: "card.create",
      subject: "card/1",
      before: null,
      after: { b: 1, a: 2 },
      previousDigest: CHAIN_START,
    };
    expect(eventDigest(event)).toBe("bf27f7d67bc42ba33ce23930da0499a59ab0ec74ccaf9f798932c8ab496d3a30");
  });

  function written() {
    const desk = newDesk();
    for (const number of [1, 2, 3])
      appendAudit(desk.db, desk.as("engineer"), "test.write", { subject: `thing/${number}`, after: { number } });
    return desk;
  }

  test("links each event to the one before it and verifies from the start", () => {
    const desk = written();
    const [first, second] = desk.audit();
    expect(first).toMatchObject({ sequence: 1, previousDigest: CHAIN_START });
    expect(second).toMatchObject({ sequence: 2, previousDigest: first?.digest });
    expect(verifyChain(desk.db, desk.teamId)).toEqual({ events: 3, firstBroken: null });
  });

  test("can be neither changed nor shortened", () => {
    const { db } = written();
    expect(() => db.$client.prepare("update audit_events set action = 'x' where sequence = 2").run()).toThrow(
      "the audit chain is append-only",
    );
    expect(() => db.$client.prepare("delete from audit_events where sequence = 2").run()).toThrow("the audit chain is append-only");
  });

  test.each([
    ["an altered event", "update audit_events set after = '{\"number\":9}' where sequence = 2", 2],
    ["a removed event", "delete from audit_events where sequence = 2", 3],
  ])("shows %s to whoever got past the triggers", (_, sql, firstBroken) => {
    const desk = written();
    desk.db.$client.exec("drop trigger audit_events_no_update; drop trigger audit_events_no_delete");
    desk.db.$client.exec(sql);
    expect(verifyChain(desk.db, desk.teamId).firstBroken).toBe(firstBroken);
  });

  test("keeps one chain a team", () => {
    const desk = written();
    appendAudit(desk.db, desk.outsider(), "test.write", { subject: "thing/1" });
    expect(verifyChain(desk.db, desk.outsider().actor.teamId)).toEqual({ events: 1, firstBroken: null });
  });
});
