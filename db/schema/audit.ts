import { integer, sqliteTable, text, uniqueIndex } from "drizzle-orm/sqlite-core";
import { instant } from "./columns";

/** Append-only, one chain a team; triggers abort update and delete. No foreign keys: it outlives what it speaks of. */
export const auditEvents = sqliteTable(
  "audit_events",
  {
    teamId: text("team_id").notNull(),
    sequence: integer("sequence").notNull(),
    at: instant("at").notNull(),
    actorId: text("actor_id"),
    actorName: text("actor_name").notNull(),
    action: text("action").notNull(), // "card.release"
    subject: text("subject").notNull(), // "card-revision/<id>"
    before: text("before", { mode: "json" }).$type<unknown>(),
    after: text("after", { mode: "json" }).$type<unknown>(),
    previousDigest: text("previous_digest").notNull(),
    digest: text("digest").notNull(),
  },
  (t) => [uniqueIndex("audit_events_sequence").on(t.teamId, t.sequence)],
);
