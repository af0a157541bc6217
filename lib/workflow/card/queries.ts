import { and, asc, desc, eq, sql } from "drizzle-orm";
import type { Db, Tx } from "@/db/open";
import { cardRevisions, cards, prints, reviewComments, signatures, users } from "@/db/schema";
import type { Actor } from "@/lib/auth/roles";
import { B612_WIDTHS } from "@/lib/testcards/b612-widths";
import type { CardContent, CardDocument, ProgrammeSnapshot } from "@/lib/testcards/card";
import { reviewCard } from "@/lib/testcards/readiness";
import type { CardContext, Finding } from "@/lib/testcards/readiness-types";
import type { SheetStamp } from "@/lib/testcards/sheet-types";
import type { SheetStanding } from "@/lib/testcards/words";
import { digestOf } from "../digest";
import { getProgramme } from "../programme/queries";
import { getReadinessFacts } from "./context";
import * as policy from "./policy";
import { type CardRow, getCard, getDocument, type RevisionRow } from "./rows";

type Reader = Db | Tx;

/** A programme's cards by number, each with its newest revision and the letter in force. */
export function listCards(db: Reader, actor: Actor, programmeId: string) {
  getProgramme(db, actor, programmeId);
  const rows = db
    .select({
      id: cards.id,
      number: cards.number,
      revisionId: cardRevisions.id,
      letter: cardRevisions.letter,
      state: cardRevisions.state,
      title: sql<string>`json_extract(${cardRevisions.content}, '$.title')`,
      kind: sql<string>`json_extract(${cardRevisions.content}, '$.kind')`,
      points: sql<number>`json_array_length(${cardRevisions.content}, '$.points')`,
      plannedOn: sql<string | null>`json_extract(${cardRevisions.content}, '$.plannedOn')`,
      loading:
        sql<string>`json_object('crew', json_extract(${cardRevisions.content}, '$.crew'), 'fuelOnBoardL', json_extract(${cardRevisions.content}, '$.fuelOnBoardL'), 'baggageKg', json_extract(${cardRevisions.content}, '$.baggageKg'))`.mapWith(
          (text: string) => JSON.parse(text) as Pick<CardContent, "crew" | "fuelOnBoardL" | "baggageKg">,
        ),
      authorName: users.name,
      updatedAt: cardRevisions.updatedAt,
      releasedAt: cardRevisions.releasedAt,
      digest: cardRevisions.digest,
    })
    .from(cards)
    .innerJoin(cardRevisions, eq(cardRevisions.cardId, cards.id))
    .innerJoin(users, eq(users.id, cardRevisions.authorId))
    .where(eq(cards.programmeId, programmeId))
    .orderBy(asc(cards.number), desc(sql`length(${cardRevisions.letter})`), desc(cardRevisions.letter))
    .all();
  const newest = rows.filter((row, index) => rows.findIndex((other) => other.id === row.id) === index);
  return newest.map((card) => {
    const revisions = rows.filter((row) => row.id === card.id);
    return { ...card, inForce: revisions.find((row) => row.state === "released") ?? null, revisionCount: revisions.length };
  });
}
export type CardListItem = ReturnType<typeof listCards>[number];

/** Comments of every revision of a card, oldest first. */
export function listComments(db: Reader, actor: Actor, cardId: string) {
  getCard(db, actor, cardId);
  return db
    .select({
      id: reviewComments.id,
      letter: cardRevisions.letter,
      pointId: reviewComments.pointId,
      text: reviewComments.text,
      isReturn: reviewComments.isReturn,
      authorId: reviewComments.authorId,
      authorName: users.name,
      createdAt: reviewComments.createdAt,
    })
    .from(reviewComments)
    .innerJoin(cardRevisions, eq(cardRevisions.id, reviewComments.revisionId))
    .innerJoin(users, eq(users.id, reviewComments.authorId))
    .where(eq(cardRevisions.cardId, cardId))
    .orderBy(asc(reviewComments.createdAt), asc(reviewComments.id))
    .all();
}
export type CardComment = ReturnType<typeof listComments>[number];

/** Printed copies of a card, by digest, so that old ones can be found and destroyed. */
export function listPrints(db: Reader, actor: Actor, cardId: string) {
  getCard(db, actor, cardId);
  return db
    .select({
      id: prints.id,
      letter: cardRevisions.letter,
      paper: prints.paper,
      state: prints.state,
      digest: prints.digest,
      by: users.name,
      printedAt: prints.printedAt,
    })
    .from(prints)
    .innerJoin(cardRevisions, eq(cardRevisions.id, prints.revisionId))
    .innerJoin(users, eq(users.id, prints.printedBy))
    .where(eq(cardRevisions.cardId, cardId))
    .orderBy(desc(prints.printedAt), desc(prints.id))
    .all();
}

export type RevisionSummary = Omit<RevisionRow, "content" | "document" | "findings">;
const summaryOf = ({ content: _content, document: _document, findings: _findings, ...rest }: RevisionRow): RevisionSummary => rest;

export type CardView = {
  card: CardRow;
  revision: RevisionSummary;
  revisions: RevisionSummary[]; // the newest first
  programme: ProgrammeSnapshot; // frozen where the revision is
  document: CardDocument;
  digest: string; // of the document shown: what a release or an acceptance is bound to
  context: CardContext;
  findings: Finding[]; // frozen at release; computed now before it
  comments: CardComment[];
  stamp: SheetStamp | null;
  may: Record<"edit" | "submit" | "comment" | "return" | "release" | "withdraw" | "revise" | "print", boolean>;
};

/** One revision (the newest unless a letter is named) with all that its screens need. */
export function getCardRevision(db: Reader, actor: Actor, cardId: string, { today, letter }: { today: string; letter?: string }): CardView {
  const { card, revision, revisions, document } = getDocument(db, actor, cardId, letter);
  const newest = revisions[0] ?? revision;
  const digest = revision.digest ?? digestOf(document);
  const context: CardContext = {
    ...getReadinessFacts(db, actor, card.programmeId, { today, writers: policy.writersOf(revision) }),
    digest,
    releasedDigest: revision.digest,
    widths: B612_WIDTHS,
  };
  return {
    card,
    revision: summaryOf(revision),
    revisions: revisions.map(summaryOf),
    programme: document.programme,
    document,
    digest,
    context,
    findings: revision.findings ?? reviewCard(document, context),
    comments: listComments(db, actor, cardId),
    stamp: getStamp(db, revision),
    may: {
      edit: policy.mayEditCard(actor, revision),
      submit: policy.maySubmitCard(actor, revision),
      comment: policy.mayCommentCard(actor, revision),
      return: policy.mayReturnCard(actor, revision),
      release: policy.mayReleaseCard(actor, revision),
      withdraw: policy.mayWithdrawCard(actor, revision),
      revise: policy.mayReviseCard(actor, newest),
      print: policy.mayPrintCard(actor),
    },
  };
}

/** The words of the release stamp, from the signature; null before release. */
export function getStamp(db: Reader, revision: Pick<RevisionRow, "id" | "digest" | "code">): SheetStamp | null {
  if (revision.digest === null || revision.code === null) return null;
  const signed = db
    .select({ name: signatures.name, role: signatures.role, at: signatures.signedAt })
    .from(signatures)
    .where(and(eq(signatures.subject, `card-revision/${revision.id}`), eq(signatures.meaning, "released")))
    .get();
  return signed ? { ...signed, shortDigest: policy.shortDigest(revision.digest), code: revision.code } : null;
}

/** What a kneeboard sheet is drawn from. */
export function getSheetSource(db: Reader, actor: Actor, cardId: string, letter: string) {
  const { card, revision, document } = getDocument(db, actor, cardId, letter);
  return {
    card,
    revisionId: revision.id,
    updatedAt: revision.updatedAt,
    state: revision.state,
    digest: revision.digest ?? digestOf(document),
    document,
    stamp: getStamp(db, revision),
  };
}

/** The canonical text as signed; only a frozen revision has one. */
export function getCanonicalDocument(db: Reader, actor: Actor, cardId: string, letter: string): { text: string; digest: string } | null {
  const { revision } = getDocument(db, actor, cardId, letter);
  return policy.isFrozen(revision.state) && revision.document && revision.digest
    ? { text: revision.document, digest: revision.digest }
    : null;
}

/** For whoever scans a sheet: whether that print may be flown with, and nothing else of the team's. */
export function findSheet(db: Reader, typedCode: string): { standing: SheetStanding } {
  const code = policy.readSheetCode(typedCode);
  if (code === null) return { standing: "unknown" };
  const row = db.select({ state: cardRevisions.state }).from(cardRevisions).where(eq(cardRevisions.code, code)).get();
  if (!row) return { standing: "unknown" };
  return { standing: row.state === "released" ? "in force" : "not in force: do not fly with it" };
}
