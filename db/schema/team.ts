import { index, integer, primaryKey, sqliteTable, text, uniqueIndex } from "drizzle-orm/sqlite-core";
import { RISK_LEVELS, ROLES } from "../../lib/testcards/words";
import { id, instant, oneOf } from "./columns";

export const teams = sqliteTable("teams", {
  id: id(),
  name: text("name").notNull(),
  createdAt: instant("created_at").notNull(),
});

export const users = sqliteTable(
  "users",
  {
    id: id(),
    email: text("email").notNull(), // lower case
    name: text("name").notNull(),
    passwordHash: text("password_hash").notNull(),
    createdAt: instant("created_at").notNull(),
  },
  (t) => [uniqueIndex("users_email").on(t.email)],
);

/** One row a person and team: removal sets removedAt, so that old signatures keep their name. */
export const memberships = sqliteTable(
  "memberships",
  {
    teamId: text("team_id")
      .notNull()
      .references(() => teams.id),
    userId: text("user_id")
      .notNull()
      .references(() => users.id),
    residualRisk: text("residual_risk", { enum: RISK_LEVELS }).notNull().default("Medium"), // the highest a reviewer may accept
    removedAt: instant("removed_at"),
  },
  (t) => [
    primaryKey({ columns: [t.teamId, t.userId] }),
    index("memberships_user").on(t.userId),
    oneOf("memberships_risk", t.residualRisk, RISK_LEVELS),
  ],
);

export const memberRoles = sqliteTable(
  "member_roles",
  {
    teamId: text("team_id").notNull(),
    userId: text("user_id").notNull(),
    role: text("role", { enum: ROLES }).notNull(),
  },
  (t) => [primaryKey({ columns: [t.teamId, t.userId, t.role] }), oneOf("member_roles_role", t.role, ROLES)],
);

/** A sign-in. The cookie carries its id; a row that is ended or past its time signs the person out at the next request. */
export const sessions = sqliteTable(
  "sessions",
  {
    id: id(),
    userId: text("user_id")
      .notNull()
      .references(() => users.id),
    teamId: text("team_id")
      .notNull()
      .references(() => teams.id),
    createdAt: instant("created_at").notNull(),
    expiresAt: instant("expires_at").notNull(),
    endedAt: instant("ended_at"),
    userAgent: text("user_agent").notNull().default(""),
  },
  (t) => [index("sessions_user").on(t.userId, t.endedAt)],
);

/** Facts of one installation, such as the day the demo was seeded. */
export const settings = sqliteTable("settings", {
  key: text("key").primaryKey(),
  value: text("value").notNull(),
  version: integer("version").notNull().default(1),
});

/** Tries counted against their limits, for sign-in, asked-again passwords and public look-ups; `expire` in ms since 1970. */
export const rateLimits = sqliteTable("rate_limits", {
  key: text("key").primaryKey(),
  points: integer("points").notNull(),
  expire: integer("expire"),
});
