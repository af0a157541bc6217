import { sql } from "drizzle-orm";
import { check, index, integer, primaryKey, sqliteTable, text, uniqueIndex } from "drizzle-orm/sqlite-core";
import type { CheckReport, Debrief } from "../../lib/testcards/debrief-types";
import {
  DISPOSITIONS,
  SORTIE_KINDS,
  SORTIE_STATES,
  SQUAWK_DISPOSITIONS,
  SQUAWK_SEVERITIES,
  SQUAWK_STATES,
} from "../../lib/testcards/words";
import { cardRevisions } from "./card";
import { id, instant, isJson, oneOf, oneOfOrNull } from "./columns";
import { configurations, programmes } from "./programme";
import { users } from "./team";

export type SortieSettings = {
  baggageKg: number;
  fuelOnBoardL: number | null;
  forecastOatC: number | null;
  dayPlan: { daylight: string | null; dutyTime: string | null; runway: string | null };
};

export const sorties = sqliteTable(
  "sorties",
  {
    id: id(),
    programmeId: text("programme_id")
      .notNull()
      .references(() => programmes.id),
    number: integer("number").notNull(),
    kind: text("kind", { enum: SORTIE_KINDS }).notNull(),
    state: text("state", { enum: SORTIE_STATES }).notNull(),
    plannedOn: text("planned_on").notNull(),
    configurationId: text("configuration_id").references(() => configurations.id),
    settings: text("settings", { mode: "json" }).$type<SortieSettings>().notNull(),
    version: integer("version").notNull().default(1),
    plannedBy: text("planned_by")
      .notNull()
      .references(() => users.id),
    createdAt: instant("created_at").notNull(),
    briefedAt: instant("briefed_at"),
    briefedBy: text("briefed_by").references(() => users.id),
    goNoGo: text("go_no_go", { mode: "json" }).$type<{ line: string; go: boolean }[] | null>(), // as ticked at the brief
    answers: text("answers", { mode: "json" }).$type<Record<string, string>>().notNull().default({}), // to "should" findings, by finding key
    closedWhy: text("closed_why"),
    closedAt: instant("closed_at"),
    closedBy: text("closed_by").references(() => users.id),
  },
  (t) => [
    uniqueIndex("sorties_number").on(t.programmeId, t.number),
    index("sorties_planned").on(t.programmeId, t.plannedOn),
    oneOf("sorties_kind", t.kind, SORTIE_KINDS),
    oneOf("sorties_state", t.state, SORTIE_STATES),
  ],
);

export const sortieCrew = sqliteTable(
  "sortie_crew",
  {
    sortieId: text("sortie_id")
      .notNull()
      .references(() => sorties.id),
    position: integer("position").notNull(),
    userId: text("user_id").references(() => users.id),
    name: text("name").notNull(),
    role: text("role").notNull(), // "pilot", "observer"
    massKg: integer("mass_kg").notNull(),
  },
  (t) => [primaryKey({ columns: [t.sortieId, t.position] }), check("sortie_crew_mass", sql`${t.massKg} between 30 and 200`)],
);

/** The cards of a sortie in order, and whether the pilot accepts each, by digest. */
export const sortieCards = sqliteTable(
  "sortie_cards",
  {
    sortieId: text("sortie_id")
      .notNull()
      .references(() => sorties.id),
    position: integer("position").notNull(),
    revisionId: text("revision_id")
      .notNull()
      .references(() => cardRevisions.id),
    answer: text("answer", { enum: ["accepted", "declined"] }),
    answeredDigest: text("answered_digest"),
    answeredBy: text("answered_by").references(() => users.id),
    answeredAt: instant("answered_at"),
    declineWhy: text("decline_why"),
  },
  (t) => [
    primaryKey({ columns: [t.sortieId, t.position] }),
    uniqueIndex("sortie_cards_once").on(t.sortieId, t.revisionId),
    index("sortie_cards_revision").on(t.revisionId),
    check("sortie_cards_answer", sql`(${t.answer} is null) = (${t.answeredDigest} is null)`),
  ],
);

/** One a sortie. Raw readings lock at submit: triggers refuse any later change. */
export const debriefs = sqliteTable(
  "debriefs",
  {
    id: id(), // minted by the phone: the same debrief sent twice is one
    sortieId: text("sortie_id")
      .notNull()
      .references(() => sorties.id),
    content: text("content", { mode: "json" }).$type<Debrief>().notNull(),
    contentDigest: text("content_digest").notNull(),
    submittedBy: text("submitted_by")
      .notNull()
      .references(() => users.id),
    submittedAt: instant("submitted_at").notNull(),
    reviewedAt: instant("reviewed_at"),
    reviewedBy: text("reviewed_by").references(() => users.id),
  },
  (t) => [uniqueIndex("debriefs_one_a_sortie").on(t.sortieId), isJson("debriefs_content", t.content)],
);

/** What the core made of a debrief. A new version beside the old one, never over it. */
export const checkReports = sqliteTable(
  "check_reports",
  {
    id: id(),
    sortieId: text("sortie_id")
      .notNull()
      .references(() => sorties.id),
    revisionId: text("revision_id")
      .notNull()
      .references(() => cardRevisions.id),
    version: integer("version").notNull(),
    coreVersion: text("core_version").notNull(),
    why: text("why").notNull(), // "debrief submitted", "calibration … renewed"
    report: text("report", { mode: "json" }).$type<CheckReport>().notNull(),
    createdAt: instant("created_at").notNull(),
  },
  (t) => [uniqueIndex("check_reports_version").on(t.sortieId, t.revisionId, t.version), isJson("check_reports_report", t.report)],
);

/** What the engineer says a flown point is worth; the newest row counts, earlier ones stay. */
export const pointDispositions = sqliteTable(
  "point_dispositions",
  {
    id: id(),
    sortieId: text("sortie_id")
      .notNull()
      .references(() => sorties.id),
    revisionId: text("revision_id")
      .notNull()
      .references(() => cardRevisions.id),
    pointId: text("point_id").notNull(),
    disposition: text("disposition", { enum: DISPOSITIONS }).notNull(),
    why: text("why").notNull().default(""),
    decidedBy: text("decided_by")
      .notNull()
      .references(() => users.id),
    decidedAt: instant("decided_at").notNull(),
    supersededAt: instant("superseded_at"),
  },
  (t) => [
    uniqueIndex("point_dispositions_one_in_force").on(t.sortieId, t.revisionId, t.pointId).where(sql`${t.supersededAt} is null`),
    oneOf("point_dispositions_disposition", t.disposition, DISPOSITIONS),
    check("point_dispositions_why", sql`${t.disposition} = 'accept' or length(trim(${t.why})) > 0`),
  ],
);

export const squawks = sqliteTable(
  "squawks",
  {
    id: id(),
    programmeId: text("programme_id")
      .notNull()
      .references(() => programmes.id),
    number: integer("number").notNull(),
    system: text("system").notNull(),
    text: text("text").notNull(),
    severity: text("severity", { enum: SQUAWK_SEVERITIES }).notNull(),
    state: text("state", { enum: SQUAWK_STATES }).notNull(),
    disposition: text("disposition", { enum: SQUAWK_DISPOSITIONS }),
    sortieId: text("sortie_id").references(() => sorties.id),
    pointId: text("point_id"),
    readingId: text("reading_id"),
    raisedFrom: text("raised_from", { enum: ["debrief", "exceedance", "person"] }).notNull(),
    raisedBy: text("raised_by").references(() => users.id),
    raisedAt: instant("raised_at").notNull(),
    closedAt: instant("closed_at"),
    assessedBy: text("assessed_by").references(() => users.id),
    assessedAt: instant("assessed_at"),
    assessedWhy: text("assessed_why"),
    dispositionWhy: text("disposition_why"),
    dispositionLimit: text("disposition_limit"), // of "deferred with limit"
    entryReference: text("entry_reference"), // where the work is written up
    dispositionedBy: text("dispositioned_by").references(() => users.id),
    dispositionedAt: instant("dispositioned_at"),
    verifiedReference: text("verified_reference"), // on a grounding one the licensed person's entry
    verifiedBy: text("verified_by").references(() => users.id),
    verifiedAt: instant("verified_at"),
    closedBy: text("closed_by").references(() => users.id),
  },
  (t) => [
    uniqueIndex("squawks_number").on(t.programmeId, t.number),
    index("squawks_open").on(t.programmeId, t.state, t.severity),
    oneOf("squawks_severity", t.severity, SQUAWK_SEVERITIES),
    oneOf("squawks_state", t.state, SQUAWK_STATES),
    oneOfOrNull("squawks_disposition", t.disposition, SQUAWK_DISPOSITIONS),
  ],
);
