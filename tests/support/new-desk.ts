import { asc, eq } from "drizzle-orm";
import type { Db } from "@/db/open";
import { auditEvents, memberRoles, memberships, sessions, teams, users } from "@/db/schema";
import { toActor } from "@/lib/auth/roles";
import { ROLES, type Role } from "@/lib/testcards/words";
import type { Ctx } from "@/lib/workflow/context";
import { migratedDb } from "./migrated-db";
import { insertBareProgramme, insertProgramme } from "./programme-rows";

export const TODAY = "2031-05-04";

/** Ids that rise, in the form of a UUIDv7. */
export function idMint(start = 0): () => string {
  let last = start;
  return () => {
    last += 1;
    return `01970000-0000-7000-8000-${last.toString(16).padStart(12, "0")}`;
  };
}

type Member = { id: string; name: string; roles: readonly Role[]; sessionId: string };

/** Two teams on a real database in memory: ours has one person a role and a programme; the other has an engineer and a bare one. */
export function newDesk({ db = migratedDb() }: { db?: Db } = {}) {
  const newId = idMint();
  const clock = { now: new Date(`${TODAY}T09:00:00.000Z`) };
  const [teamId, otherTeamId] = [newId(), newId()];
  const at = clock.now.toISOString();
  db.insert(teams)
    .values([
      { id: teamId, name: "Harrow Fen Aeroworks", createdAt: at },
      { id: otherTeamId, name: "Another Works", createdAt: at },
    ])
    .run();

  function addPerson(name: string, roles: readonly Role[], team = teamId): Member {
    const member = { id: newId(), name, roles, sessionId: newId() };
    const email = `${name.toLowerCase().replaceAll(" ", ".")}@harrowfen.example`;
    db.insert(users).values({ id: member.id, email, name, passwordHash: "-", createdAt: at }).run();
    db.insert(memberships).values({ teamId: team, userId: member.id }).run();
    for (const role of roles) db.insert(memberRoles).values({ teamId: team, userId: member.id, role }).run();
    db.insert(sessions)
      .values({ id: member.sessionId, userId: member.id, teamId: team, createdAt: at, expiresAt: "2031-05-18T09:00:00.000Z" })
      .run();
    return member;
  }

  function ctxOf(member: Member, team = teamId, over: Partial<Ctx> = {}): Ctx {
    const { id, name, roles, sessionId } = member;
    const actor = toActor({ id, name, email: `${id}@harrowfen.example`, teamId: team, roles, residualRisk: "Medium", sessionId });
    return { db, actor, now: clock.now, today: TODAY, newId, ...over };
  }

  const people = Object.fromEntries(ROLES.map((role) => [role, addPerson(`The ${role}`, [role])])) as Record<Role, Member>;
  const outsider = addPerson("An outsider", ROLES, otherTeamId);
  const { programmeId, configurationId } = insertProgramme(db, teamId, people.mechanic.id, newId);
  const otherProgrammeId = insertBareProgramme(db, otherTeamId, newId);

  return {
    db,
    clock,
    newId,
    teamId,
    people,
    programmeId,
    configurationId,
    otherProgrammeId,
    addPerson,
    ctxOf,
    as: (role: Role, over: Partial<Ctx> = {}) => ctxOf(people[role], teamId, over),
    outsider: (over: Partial<Ctx> = {}) => ctxOf(outsider, otherTeamId, over),
    audit: () => db.select().from(auditEvents).where(eq(auditEvents.teamId, teamId)).orderBy(asc(auditEvents.sequence)).all(),
  };
}
export type Desk = ReturnType<typeof newDesk>;
