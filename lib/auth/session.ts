import { and, eq, gt, isNull } from "drizzle-orm";
import type { Db } from "@/db/open";
import { memberRoles, memberships, sessions, users } from "@/db/schema";
import { ROLES } from "@/lib/testcards/words";
import { type Actor, toActor } from "./roles";

/** A sign-in lasts 14 days: long enough for a phone between two flying weekends. */
export const SESSION_DAYS = 14;
const dayMs = 86_400_000;

export function openSession(db: Db, at: { id: string; userId: string; teamId: string; now: Date; userAgent: string }): void {
  db.insert(sessions)
    .values({
      id: at.id,
      userId: at.userId,
      teamId: at.teamId,
      createdAt: at.now.toISOString(),
      expiresAt: new Date(at.now.getTime() + SESSION_DAYS * dayMs).toISOString(),
      userAgent: at.userAgent.slice(0, 200),
    })
    .run();
}

/** Who a session row stands for right now: nobody once it is ended, past its time, or the person was removed. */
export function findActor(db: Db, sessionId: string, now: Date): Actor | undefined {
  const row = db
    .select({ id: users.id, name: users.name, email: users.email, teamId: sessions.teamId, residualRisk: memberships.residualRisk })
    .from(sessions)
    .innerJoin(users, eq(users.id, sessions.userId))
    .innerJoin(memberships, and(eq(memberships.userId, sessions.userId), eq(memberships.teamId, sessions.teamId)))
    .where(
      and(eq(sessions.id, sessionId), isNull(sessions.endedAt), gt(sessions.expiresAt, now.toISOString()), isNull(memberships.removedAt)),
    )
    .get();
  if (!row) return undefined;
  const held = db
    .select({ role: memberRoles.role })
    .from(memberRoles)
    .where(and(eq(memberRoles.teamId, row.teamId), eq(memberRoles.userId, row.id)))
    .all()
    .map(({ role }) => role);
  return toActor({ ...row, roles: ROLES.filter((role) => held.includes(role)), sessionId });
}

/** Signing out: only its own row, and only once. */
export function closeSession(db: Db, sessionId: string, now: Date): void {
  db.update(sessions)
    .set({ endedAt: now.toISOString() })
    .where(and(eq(sessions.id, sessionId), isNull(sessions.endedAt)))
    .run();
}
