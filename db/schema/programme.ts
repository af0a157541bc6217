import { sql } from "drizzle-orm";
import { check, index, integer, real, sqliteTable, text, uniqueIndex } from "drizzle-orm/sqlite-core";
import type { AbortLine, Aircraft, Band, CardPoint, Control, Hazard, Quantity } from "../../lib/testcards/card";
import { HOT_DAY_BASES, HOT_DAY_RULES, LIMIT_CONDITIONS, LIMIT_LAYERS, LIMIT_STATISTICS, SIDES } from "../../lib/testcards/words";
import { id, instant, isJson, oneOf, oneOfOrNull } from "./columns";
import { teams, users } from "./team";

/** The facts of a programme that a card freezes and that have no table of their own. */
export type ProgrammeSettings = {
  notice: string | null;
  airfield: { name: string; elevationFt: number };
  controls: Control[];
  coolDown: { durationS: number; text: string } | null;
  callWords: { word: string; meaning: string }[];
  goNoGo: string[];
  thenLine: { air: string; ground: string };
  thenActions: { air: string[]; ground: string[] };
  standingAborts: AbortLine[];
  reactionMin: number;
  fuelPlan: { taxiL: number; returnL: number; reserveL: number; taxiMin?: number; returnMin?: number; resetMin?: number };
  daMaximumFt: number | null;
};

export const aircraft = sqliteTable(
  "aircraft",
  {
    id: id(),
    teamId: text("team_id")
      .notNull()
      .references(() => teams.id),
    registration: text("registration").notNull(),
    type: text("type").notNull(),
    data: text("data", { mode: "json" }).$type<Aircraft>().notNull(),
  },
  (t) => [uniqueIndex("aircraft_registration").on(t.teamId, t.registration), isJson("aircraft_data", t.data)],
);

export const programmes = sqliteTable(
  "programmes",
  {
    id: id(),
    teamId: text("team_id")
      .notNull()
      .references(() => teams.id),
    aircraftId: text("aircraft_id")
      .notNull()
      .references(() => aircraft.id),
    name: text("name").notNull(),
    summary: text("summary").notNull().default(""),
    hotDayBasis: text("hot_day_basis", { enum: HOT_DAY_BASES }),
    settings: text("settings", { mode: "json" }).$type<ProgrammeSettings>().notNull(),
    createdAt: instant("created_at").notNull(),
  },
  (t) => [
    index("programmes_team").on(t.teamId),
    oneOfOrNull("programmes_basis", t.hotDayBasis, HOT_DAY_BASES),
    isJson("programmes_settings", t.settings),
  ],
);

/** What is fitted. A change is a new row; one is current; signed by a mechanic. */
export const configurations = sqliteTable(
  "configurations",
  {
    id: id(),
    programmeId: text("programme_id")
      .notNull()
      .references(() => programmes.id),
    number: text("number").notNull(),
    fitted: text("fitted").notNull(),
    details: text("details", { mode: "json" }).$type<{ label: string; value: string }[]>().notNull(),
    massKg: real("mass_kg").notNull(),
    armM: real("arm_m").notNull(),
    isCurrent: integer("is_current", { mode: "boolean" }).notNull().default(false),
    signedBy: text("signed_by").references(() => users.id),
    signedAt: instant("signed_at"),
    gapsMeasuredOn: text("gaps_measured_on"),
    disturbedOn: text("disturbed_on"),
    createdAt: instant("created_at").notNull(),
  },
  (t) => [
    uniqueIndex("configurations_number").on(t.programmeId, t.number),
    uniqueIndex("configurations_one_current").on(t.programmeId).where(sql`${t.isCurrent} = 1`),
    check("configurations_signed", sql`(${t.signedBy} is null) = (${t.signedAt} is null)`),
  ],
);

export const parameters = sqliteTable(
  "parameters",
  {
    id: id(),
    programmeId: text("programme_id")
      .notNull()
      .references(() => programmes.id),
    code: text("code").notNull(),
    name: text("name").notNull(),
    shortName: text("short_name").notNull(),
    unit: text("unit").notNull(),
    group: text("group_name"),
    hotDayRule: text("hot_day_rule", { enum: HOT_DAY_RULES }).notNull(),
    normal: text("normal", { mode: "json" }).$type<Band | null>(),
    safety: integer("safety", { mode: "boolean" }).notNull().default(false),
    stabilises: integer("stabilises", { mode: "boolean" }).notNull().default(false),
    standardRatePerMin: text("standard_rate_per_min", { mode: "json" }).$type<Quantity | null>(),
    position: integer("position").notNull(),
  },
  (t) => [uniqueIndex("parameters_code").on(t.programmeId, t.code), oneOf("parameters_hot_day_rule", t.hotDayRule, HOT_DAY_RULES)],
);

export const instruments = sqliteTable(
  "instruments",
  {
    id: id(),
    programmeId: text("programme_id")
      .notNull()
      .references(() => programmes.id),
    parameter: text("parameter").notNull(), // its code
    name: text("name").notNull(),
    gaugeName: text("gauge_name").notNull(),
    unit: text("unit").notNull(),
    shownOn: text("shown_on", { enum: ["panel", "repeater", "recorder", "hand held"] }).notNull(),
    visibleTo: text("visible_to", { mode: "json" }).$type<("pilot" | "observer")[]>().notNull(),
    low: real("low").notNull(),
    high: real("high").notNull(),
    markSpacing: real("mark_spacing").notNull(),
    readable: real("readable").notNull(),
    position: integer("position").notNull(),
  },
  (t) => [
    uniqueIndex("instruments_name").on(t.programmeId, t.name),
    check("instruments_range", sql`${t.low} < ${t.high}`),
    check("instruments_readable", sql`${t.readable} > 0 and ${t.markSpacing} > 0`),
    oneOf("instruments_shown_on", t.shownOn, ["panel", "repeater", "recorder", "hand held"]),
  ],
);

/** Never edited: a new one replaces it and the earlier ones stay. */
export const calibrations = sqliteTable(
  "calibrations",
  {
    id: id(),
    instrumentId: text("instrument_id")
      .notNull()
      .references(() => instruments.id),
    kind: text("kind", { enum: ["linear", "points"] }).notNull(),
    gain: real("gain"),
    offset: real("offset"),
    points: text("points", { mode: "json" }).$type<{ read: number; actual: number }[] | null>(),
    low: real("low").notNull(),
    high: real("high").notNull(),
    expandedUncertainty: real("expanded_uncertainty"),
    unit: text("unit").notNull(),
    method: text("method").notNull(),
    reference: text("reference").notNull(),
    calibratedOn: text("calibrated_on").notNull(),
    validUntil: text("valid_until").notNull(),
    disturbedOn: text("disturbed_on"),
    createdAt: instant("created_at").notNull(),
    createdBy: text("created_by").references(() => users.id),
    supersededAt: instant("superseded_at"),
  },
  (t) => [
    uniqueIndex("calibrations_one_in_use").on(t.instrumentId).where(sql`${t.supersededAt} is null`),
    check("calibrations_range", sql`${t.low} < ${t.high}`),
    check(
      "calibrations_shape",
      sql`(${t.kind} = 'linear' and ${t.gain} is not null and ${t.offset} is not null) or (${t.kind} = 'points' and ${t.points} is not null)`,
    ),
  ],
);

export const limits = sqliteTable(
  "limits",
  {
    id: id(),
    programmeId: text("programme_id")
      .notNull()
      .references(() => programmes.id),
    parameter: text("parameter").notNull(),
    side: text("side", { enum: SIDES }).notNull(),
    layer: text("layer", { enum: LIMIT_LAYERS }).notNull(),
    value: real("value").notNull(),
    unit: text("unit").notNull(),
    appliesWhen: text("applies_when", { enum: LIMIT_CONDITIONS }).notNull(),
    forS: real("for_s").notNull().default(0),
    statistic: text("statistic", { enum: LIMIT_STATISTICS }).notNull().default("instant"),
    source: text("source").notNull(),
    authority: text("authority", { enum: ["engine", "aircraft", "programme"] }).notNull(),
    position: integer("position").notNull(),
  },
  (t) => [
    uniqueIndex("limits_one_a_layer").on(t.programmeId, t.parameter, t.side, t.layer, t.appliesWhen, t.statistic),
    oneOf("limits_side", t.side, SIDES),
    oneOf("limits_layer", t.layer, LIMIT_LAYERS),
    oneOf("limits_applies_when", t.appliesWhen, LIMIT_CONDITIONS),
    oneOf("limits_statistic", t.statistic, LIMIT_STATISTICS),
    check("limits_for", sql`${t.forS} >= 0`),
  ],
);

export const objectives = sqliteTable(
  "objectives",
  {
    id: id(),
    programmeId: text("programme_id")
      .notNull()
      .references(() => programmes.id),
    code: text("code").notNull(),
    question: text("question").notNull(),
    success: text("success").notNull(),
    priority: text("priority", { enum: ["must", "should", "nice"] }).notNull(),
    requirement: text("requirement").notNull().default(""),
  },
  (t) => [uniqueIndex("objectives_code").on(t.programmeId, t.code)],
);

export const hazards = sqliteTable(
  "hazards",
  {
    id: id(),
    programmeId: text("programme_id")
      .notNull()
      .references(() => programmes.id),
    code: text("code").notNull(),
    data: text("data", { mode: "json" }).$type<Hazard>().notNull(),
  },
  (t) => [uniqueIndex("hazards_code").on(t.programmeId, t.code), isJson("hazards_data", t.data)],
);

/** The shelf. An edit makes a new revision; the newest is the one offered. */
export const testPoints = sqliteTable(
  "test_points",
  {
    id: id(),
    programmeId: text("programme_id")
      .notNull()
      .references(() => programmes.id),
    code: text("code").notNull(),
    revision: integer("revision").notNull(),
    title: text("title").notNull(),
    content: text("content", { mode: "json" }).$type<CardPoint>().notNull(),
    isNewest: integer("is_newest", { mode: "boolean" }).notNull(),
    position: integer("position").notNull(),
    createdAt: instant("created_at").notNull(),
  },
  (t) => [
    uniqueIndex("test_points_revision").on(t.programmeId, t.code, t.revision),
    uniqueIndex("test_points_one_newest").on(t.programmeId, t.code).where(sql`${t.isNewest} = 1`),
    isJson("test_points_content", t.content),
  ],
);

/** What the team decided after a step of the build-up; earlier steps may come "from paper records". */
export const stepDecisions = sqliteTable(
  "step_decisions",
  {
    id: id(),
    programmeId: text("programme_id")
      .notNull()
      .references(() => programmes.id),
    testPointCode: text("test_point_code").notNull(),
    step: text("step").notNull(), // "T13 at 55 %", "T09 OPEN"
    series: text("series"),
    level: real("level"),
    measured: real("measured"),
    expandedUncertainty: real("expanded_uncertainty"), // U of the measured value, in its unit
    predicted: text("predicted", { mode: "json" }).$type<{ value: number; low: number; high: number } | null>(),
    computed: text("computed", { enum: ["clear to next step", "smaller step", "hold"] }).notNull(),
    decision: text("decision", { enum: ["clear to next step", "smaller step", "hold"] }).notNull(),
    because: text("because", { mode: "json" }).$type<string[]>().notNull(),
    origin: text("origin", { enum: ["flown", "paper records"] }).notNull(),
    sortieId: text("sortie_id"),
    proposedBy: text("proposed_by").references(() => users.id),
    proposedAt: instant("proposed_at"),
    countersignedBy: text("countersigned_by").references(() => users.id),
    countersignedAt: instant("countersigned_at"),
    position: integer("position").notNull(),
    createdAt: instant("created_at").notNull(),
  },
  (t) => [
    index("step_decisions_programme").on(t.programmeId, t.position),
    oneOf("step_decisions_decision", t.decision, ["clear to next step", "smaller step", "hold"]),
  ],
);
