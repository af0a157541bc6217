import { and, desc, eq, getTableColumns, sql } from "drizzle-orm";
import { alias } from "drizzle-orm/sqlite-core";
import type { Db, Tx } from "@/db/open";
import { cardRevisions, cards, programmes, users } from "@/db/schema";
import type { Actor } from "@/lib/auth/roles";
import { assembleCard, type CardDocument, type ProgrammeSnapshot } from "@/lib/testcards/card";
import { Refusal } from "../errors";
import { getProgrammeSnapshot } from "../programme/snapshot";
import { isFrozen } from "./policy";

type Reader = Db | Tx;
const author = alias(users, "author");
const releaser = alias(users, "releaser");
const ender = alias(users, "ender");

export function getCard(db: Reader, actor: Actor, cardId: string) {
  const row = db
    .select({ id: cards.id, number: cards.number, programmeId: cards.programmeId, createdAt: cards.createdAt })
    .from(cards)
    .innerJoin(programmes, eq(programmes.id, cards.programmeId))
    .where(and(eq(cards.id, cardId), eq(programmes.teamId, actor.teamId)))
    .get();
  if (!row) throw new Refusal("not-found", "No such card in your team.");
  return row;
}
export type CardRow = ReturnType<typeof getCard>;

/** Every revision of one card, the newest first. */
export function listRevisions(db: Reader, actor: Actor, cardId: string) {
  getCard(db, actor, cardId);
  return db
    .select({ ...getTableColumns(cardRevisions), authorName: author.name, releasedByName: releaser.name, endedByName: ender.name })
    .from(cardRevisions)
    .innerJoin(author, eq(author.id, cardRevisions.authorId))
    .leftJoin(releaser, eq(releaser.id, cardRevisions.releasedBy))
    .leftJoin(ender, eq(ender.id, cardRevisions.endedBy))
    .where(eq(cardRevisions.cardId, cardId))
    .orderBy(desc(sql`length(${cardRevisions.letter})`), desc(cardRevisions.letter))
    .all();
}
export type RevisionRow = ReturnType<typeof listRevisions>[number];

/** The named revision, or the newest. */
export function getRevisionRow(db: Reader, actor: Actor, cardId: string, letter?: string): RevisionRow {
  return pickRevision(listRevisions(db, actor, cardId), letter);
}

function pickRevision(revisions: RevisionRow[], letter: string | undefined): RevisionRow {
  const row = revisions.find((revision) => letter === undefined || revision.letter === letter);
  if (!row) throw new Refusal("not-found", "This card has no such revision.");
  return row;
}

type Documented = Pick<RevisionRow, "state" | "document" | "content" | "letter" | "authorId" | "authorName">;

/** Frozen: the document as signed. Else: put together from the programme as it stands. */
export function documentOf(card: Pick<CardRow, "id" | "number">, revision: Documented, programme: () => ProgrammeSnapshot): CardDocument {
  if (isFrozen(revision.state) && revision.document) return JSON.parse(revision.document) as CardDocument;
  const identity = {
    id: card.id,
    number: card.number,
    letter: revision.letter,
    author: { id: revision.authorId, name: revision.authorName },
  };
  return assembleCard(programme(), identity, revision.content);
}

export function getDocument(db: Reader, actor: Actor, cardId: string, letter?: string) {
  const card = getCard(db, actor, cardId);
  const revisions = listRevisions(db, actor, cardId);
  const revision = pickRevision(revisions, letter);
  const document = documentOf(card, revision, () => getProgrammeSnapshot(db, actor, card.programmeId));
  return { card, revision, revisions, document };
}
