import { mkdtempSync, rmSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { afterEach, expect, test } from "vitest";
import { migrateDb } from "@/db/migrate";
import { type Db, openDb } from "@/db/open";
import { cardRevisions, signatures } from "@/db/schema";
import { createCard } from "@/lib/workflow/card/create-card";
import { getCardRevision, listCards } from "@/lib/workflow/card/queries";
import { releaseCard } from "@/lib/workflow/card/release-card";
import { saveDraft } from "@/lib/workflow/card/save-draft";
import type { Ctx } from "@/lib/workflow/context";
import { raiseSquawk } from "@/lib/workflow/squawk/raise-squawk";
import { newDesk, TODAY } from "../support/new-desk";
import { cardInReview, draftCard, readyContent } from "../support/stories";

/** Two connections to one file, as two server processes would hold them. */
const open: (() => void)[] = [];
afterEach(() => {
  for (const close of open.splice(0)) close();
});

function twoConnections() {
  const folder = mkdtempSync(join(tmpdir(), "greenarc-"));
  const file = join(folder, "desk.db");
  migrateDb(file);
  const [first, second] = [openDb(file), openDb(file)];
  open.push(() => {
    first.$client.close();
    second.$client.close();
    rmSync(folder, { recursive: true });
  });
  const desk = newDesk({ db: first });
  const from = (db: Db, ctx: Ctx): Ctx => ({ ...ctx, db });
  return { desk, first, second, from };
}

test("of two reviewers who release the same card, one signs and the other is told it is released", () => {
  const { desk, first, second, from } = twoConnections();
  const { cardId } = cardInReview(desk);
  const other = desk.addPerson("Second Reviewer", ["reviewer"]);
  const { digest } = getCardRevision(second, desk.ctxOf(other).actor, cardId, { today: TODAY });
  const proof = (userId: string) => ({ proof: { userId, digest, at: desk.clock.now } });
  const one = from(first, desk.as("reviewer", proof(desk.people.reviewer.id)));
  const two = from(second, desk.ctxOf(other, desk.teamId, proof(other.id)));
  expect(releaseCard(one, { cardId, digest }).letter).toBe("A");
  expect(() => releaseCard(two, { cardId, digest })).toThrow(/cannot be released now\. It is released and frozen/);
  expect(second.select().from(signatures).all()).toHaveLength(1);
});

test("of two saves made on the same version through two connections, the second is stale and overwrites nothing", () => {
  const { desk, first, second, from } = twoConnections();
  const { cardId, version } = draftCard(desk);
  saveDraft(from(first, desk.as("engineer")), { cardId, version, content: readyContent({ remarks: "First." }) });
  const late = () => saveDraft(from(second, desk.as("engineer")), { cardId, version, content: readyContent({ remarks: "Second." }) });
  expect(late).toThrow(expect.objectContaining({ code: "stale" }));
  expect(getCardRevision(second, desk.as("engineer").actor, cardId, { today: TODAY }).document.content.remarks).toBe("First.");
});

test("a write waits for the other connection's open transaction instead of failing half-way", () => {
  const { desk, first, second, from } = twoConnections();
  second.$client.pragma("busy_timeout = 50");
  first.$client.exec("begin immediate");
  const blocked = () => createCard(from(second, desk.as("engineer")), { programmeId: desk.programmeId, title: "Waits", kind: "taxi" });
  expect(blocked).toThrow(/locked/);
  first.$client.exec("commit");
  expect(blocked).not.toThrow();
  expect(listCards(first, desk.as("engineer").actor, desk.programmeId)).toHaveLength(1);
});

test("numbers of cards and squawks are never given twice, whichever connection asks", () => {
  const { desk, first, second, from } = twoConnections();
  const numbers = [first, second, first, second].map((db, index) => {
    const squawk = { programmeId: desk.programmeId, system: "Fuel", text: `weep ${index}`, severity: "monitor" };
    return [
      createCard(from(db, desk.as("engineer")), { programmeId: desk.programmeId, title: "Card", kind: "taxi" }).number,
      raiseSquawk(from(db, desk.as("mechanic")), squawk).number,
    ];
  });
  expect(numbers).toEqual([
    ["01", 1],
    ["02", 2],
    ["03", 3],
    ["04", 4],
  ]);
});

test("the schema itself refuses a second open or released revision of a card", () => {
  const { desk, first } = twoConnections();
  const { cardId } = draftCard(desk);
  const row = first.select().from(cardRevisions).get();
  if (!row) throw new Error("no revision");
  const second = () =>
    first
      .insert(cardRevisions)
      .values({ ...row, id: desk.newId(), letter: "B", cardId })
      .run();
  expect(second).toThrow(/UNIQUE/);
});

test("the same Idempotency-Key answers the first result, and with another body is refused", () => {
  const { desk } = twoConnections();
  const input = { programmeId: desk.programmeId, title: "Once", kind: "taxi" };
  const submission = { key: "key-00000001", bodyDigest: "a" };
  const answers = [1, 2].map(() => createCard(desk.as("engineer", { submission }), input));
  expect(answers[1]).toEqual(answers[0]);
  expect(listCards(desk.db, desk.as("engineer").actor, desk.programmeId)).toHaveLength(1);
  const other = () => createCard(desk.as("engineer", { submission: { ...submission, bodyDigest: "b" } }), { ...input, title: "Other" });
  expect(other).toThrow(expect.objectContaining({ code: "conflict" }));
});
