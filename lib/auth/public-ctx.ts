import { asc, eq, isNull } from "drizzle-orm";
import { getDb } from "@/db/client";
import type { Db } from "@/db/open";
import { memberRoles, memberships, users } from "@/db/schema";
import { env } from "@/lib/env";
import { ROLES, type Role } from "@/lib/testcards/words";

/** For the pages anybody may open. It proves nothing: every query about a team wants an Actor beside it. */
export function publicDb(): Db {
  return getDb();
}

export type DemoSignIn = { email: string; roles: Role[] };

/** The sign-ins a demo shows; none anywhere else. */
export function demoSignIns(): { people: DemoSignIn[]; password: string } | null {
  const { GREENARC_DEMO, DEMO_PASSWORD } = env();
  if (!GREENARC_DEMO || !DEMO_PASSWORD) return null;
  const rows = getDb()
    .select({ email: users.email, role: memberRoles.role })
    .from(memberships)
    .innerJoin(users, eq(users.id, memberships.userId))
    .innerJoin(memberRoles, eq(memberRoles.userId, users.id))
    .where(isNull(memberships.removedAt))
    .orderBy(asc(users.email))
    .all();
  const emails = [...new Set(rows.map((row) => row.email))];
  const people = emails.map((email) => ({
    email,
    roles: ROLES.filter((role) => rows.some((row) => row.email === email && row.role === role)),
  }));
  return { people, password: DEMO_PASSWORD };
}
