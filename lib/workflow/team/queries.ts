import { and, asc, desc, eq, gt, isNull } from "drizzle-orm";
import type { Db, Tx } from "@/db/open";
import { memberRoles, memberships, sessions, teams, users } from "@/db/schema";
import type { Actor } from "@/lib/auth/roles";
import { ROLES, type Role } from "@/lib/testcards/words";
import { Refusal } from "../errors";

type Reader = Db | Tx;

export function getTeam(db: Reader, actor: Actor): { id: string; name: string } {
  const team = db.select({ id: teams.id, name: teams.name }).from(teams).where(eq(teams.id, actor.teamId)).get();
  if (!team) throw new Refusal("not-found", "No such team.");
  return team;
}

/** Everybody of the team with their roles in the order of the table of who may what; those who left are marked. */
export function listPeople(db: Reader, actor: Actor) {
  const people = db
    .select({
      id: users.id,
      name: users.name,
      email: users.email,
      residualRisk: memberships.residualRisk,
      removedAt: memberships.removedAt,
    })
    .from(memberships)
    .innerJoin(users, eq(users.id, memberships.userId))
    .where(eq(memberships.teamId, actor.teamId))
    .orderBy(asc(users.name), asc(users.id))
    .all();
  const held = db
    .select({ userId: memberRoles.userId, role: memberRoles.role })
    .from(memberRoles)
    .where(eq(memberRoles.teamId, actor.teamId))
    .all();
  return people.map((person) => ({
    ...person,
    roles: ROLES.filter((role): role is Role => held.some((row) => row.userId === person.id && row.role === role)),
  }));
}
export type Person = ReturnType<typeof listPeople>[number];

/** One's own sign-ins that still count, the newest first. */
export function listSessions(db: Reader, actor: Actor, now: Date) {
  return db
    .select({ id: sessions.id, createdAt: sessions.createdAt, expiresAt: sessions.expiresAt, userAgent: sessions.userAgent })
    .from(sessions)
    .where(and(eq(sessions.userId, actor.id), isNull(sessions.endedAt), gt(sessions.expiresAt, now.toISOString())))
    .orderBy(desc(sessions.createdAt), desc(sessions.id))
    .all()
    .map((session) => ({ ...session, isThisOne: session.id === actor.sessionId }));
}
