import { sql } from "drizzle-orm";
import { check, index, integer, primaryKey, sqliteTable, text, uniqueIndex } from "drizzle-orm/sqlite-core";
import type { CardContent } from "../../lib/testcards/card";
import type { Finding } from "../../lib/testcards/readiness-types";
import { CARD_STATES } from "../../lib/testcards/words";
import { id, instant, isJson, oneOf } from "./columns";
import { programmes } from "./programme";
import { users } from "./team";

export const cards = sqliteTable(
  "cards",
  {
    id: id(),
    programmeId: text("programme_id")
      .notNull()
      .references(() => programmes.id),
    number: text("number").notNull(), // "07"
    createdAt: instant("created_at").notNull(),
    createdBy: text("created_by")
      .notNull()
      .references(() => users.id),
  },
  (t) => [uniqueIndex("cards_number").on(t.programmeId, t.number)],
);

/** A draft is `content`; from release on `document` is the whole card as canonical JSON, and `digest` its SHA-256. */
export const cardRevisions = sqliteTable(
  "card_revisions",
  {
    id: id(),
    cardId: text("card_id")
      .notNull()
      .references(() => cards.id),
    letter: text("letter").notNull(),
    state: text("state", { enum: CARD_STATES }).notNull(),
    content: text("content", { mode: "json" }).$type<CardContent>().notNull(),
    version: integer("version").notNull().default(1), // every save sends the one it saw
    authorId: text("author_id")
      .notNull()
      .references(() => users.id),
    editedBy: text("edited_by", { mode: "json" }).$type<string[]>().notNull().default([]), // later hands: none of them may release it
    createdAt: instant("created_at").notNull(),
    updatedAt: instant("updated_at").notNull(),
    submittedAt: instant("submitted_at"),
    submittedBy: text("submitted_by").references(() => users.id),
    answers: text("answers", { mode: "json" }).$type<Record<string, string>>().notNull(), // to "should" findings, by finding key
    findings: text("findings", { mode: "json" }).$type<Finding[] | null>(), // frozen at release
    document: text("document"),
    digest: text("digest"),
    code: text("code"), // the short code on the sheet's foot
    releasedAt: instant("released_at"),
    releasedBy: text("released_by").references(() => users.id),
    endedAt: instant("ended_at"), // superseded or withdrawn
    endedBy: text("ended_by").references(() => users.id),
    endedWhy: text("ended_why"),
  },
  (t) => [
    uniqueIndex("card_revisions_letter").on(t.cardId, t.letter),
    uniqueIndex("card_revisions_one_open").on(t.cardId).where(sql`${t.state} in ('draft', 'in review')`),
    uniqueIndex("card_revisions_one_released").on(t.cardId).where(sql`${t.state} = 'released'`),
    uniqueIndex("card_revisions_digest").on(t.digest),
    uniqueIndex("card_revisions_code").on(t.code),
    oneOf("card_revisions_state", t.state, CARD_STATES),
    isJson("card_revisions_content", t.content),
    check(
      "card_revisions_frozen",
      sql`${t.state} not in ('released', 'superseded', 'withdrawn') or (${t.document} is not null and ${t.digest} is not null and ${t.code} is not null)`,
    ),
    check("card_revisions_not_own", sql`${t.releasedBy} is null or ${t.releasedBy} <> ${t.authorId}`),
  ],
);

export const reviewComments = sqliteTable(
  "review_comments",
  {
    id: id(),
    revisionId: text("revision_id")
      .notNull()
      .references(() => cardRevisions.id),
    pointId: text("point_id"),
    authorId: text("author_id")
      .notNull()
      .references(() => users.id),
    text: text("text").notNull(),
    isReturn: integer("is_return", { mode: "boolean" }).notNull().default(false), // sent with "return to draft"
    createdAt: instant("created_at").notNull(),
  },
  (t) => [index("review_comments_revision").on(t.revisionId, t.createdAt)],
);

/** Password asked again; bound to a digest, never to a record that can change. */
export const signatures = sqliteTable(
  "signatures",
  {
    id: id(),
    teamId: text("team_id").notNull(),
    subject: text("subject").notNull(), // "card-revision/<id>", "sortie-card/<sortie>/<revision>"
    meaning: text("meaning", { enum: ["released", "accepted", "declined", "signed configuration", "countersigned"] }).notNull(),
    digest: text("digest").notNull(),
    signedBy: text("signed_by")
      .notNull()
      .references(() => users.id),
    name: text("name").notNull(),
    role: text("role").notNull(),
    signedAt: instant("signed_at").notNull(),
  },
  (t) => [index("signatures_subject").on(t.subject)],
);

export const prints = sqliteTable(
  "prints",
  {
    id: id(),
    revisionId: text("revision_id")
      .notNull()
      .references(() => cardRevisions.id),
    paper: text("paper").notNull(),
    state: text("state", { enum: CARD_STATES }).notNull(),
    digest: text("digest").notNull(),
    printedBy: text("printed_by")
      .notNull()
      .references(() => users.id),
    printedAt: instant("printed_at").notNull(),
  },
  (t) => [index("prints_revision").on(t.revisionId, t.printedAt)],
);

/** Idempotency-Key → the first answer. */
export const submissions = sqliteTable(
  "submissions",
  {
    userId: text("user_id").notNull(),
    key: text("key").notNull(),
    bodyDigest: text("body_digest").notNull(),
    answer: text("answer").notNull(),
    createdAt: instant("created_at").notNull(),
  },
  (t) => [primaryKey({ columns: [t.userId, t.key] })],
);
