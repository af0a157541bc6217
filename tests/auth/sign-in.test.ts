import { eq } from "drizzle-orm";
import { describe, expect, test } from "vitest";
import { memberRoles, memberships, sessions, users } from "@/db/schema";
import { TooManyTries, WrongPassword } from "@/lib/auth/errors";
import { hashPassword, matchesPassword } from "@/lib/auth/password";
import { countTry } from "@/lib/auth/rate-limit";
import { closeSession, findActor } from "@/lib/auth/session";
import { signIn } from "@/lib/auth/sign-in";
import { verifyPassword } from "@/lib/auth/verify-password";
import { endAllSessions } from "@/lib/workflow/team/end-all-sessions";
import { endSession } from "@/lib/workflow/team/end-session";
import { listSessions } from "@/lib/workflow/team/queries";
import { newDesk } from "../support/new-desk";

const PASSWORD = "a long enough password";
const hash = await hashPassword(PASSWORD);

function deskWithPassword() {
  const desk = newDesk();
  desk.db.update(users).set({ passwordHash: hash, email: "pilot@harrowfen.example" }).where(eq(users.id, desk.people.pilot.id)).run();
  const attempt = (over: Partial<Parameters<typeof signIn>[1]> = {}) =>
    signIn(desk.db, {
      email: "pilot@harrowfen.example",
      password: PASSWORD,
      address: "192.0.2.1",
      userAgent: "test",
      now: desk.clock.now,
      newId: desk.newId,
      ...over,
    });
  return { desk, attempt };
}

describe("a password", () => {
  // RFC 9106 names the variant first in the encoded hash; 19 MiB and two passes after OWASP's password storage sheet.
  test("is kept as Argon2id with a salt of its own", async () => {
    expect(hash).toMatch(/^\$argon2id\$v=19\$m=19456,t=2,p=1\$/);
    expect(await hashPassword(PASSWORD)).not.toBe(hash);
  });

  test.each([
    ["right", PASSWORD, true],
    ["wrong", "a long enough passwore", false],
    ["empty", "", false],
    ["of 10,000 characters", PASSWORD.padEnd(10_000, "x"), false],
  ])("that is %s answers %j", async (_, typed, answer) => {
    expect(await matchesPassword(hash, typed)).toBe(answer);
  });

  test("of an e-mail that nobody has matches nothing, and takes a hash's time all the same", async () => {
    await matchesPassword(null, "warm up");
    const timed = async (known: string | null) => {
      const from = performance.now();
      expect(await matchesPassword(known, "guess")).toBe(false);
      return performance.now() - from;
    };
    const known = await timed(hash);
    const unknown = await timed(null);
    expect(unknown).toBeGreaterThan(known / 5); // without a comparison it would be a hundredth
  });
});

describe("signing in", () => {
  test("opens a session row that stands for the person, team and roles", async () => {
    const { desk, attempt } = deskWithPassword();
    const signed = await attempt({ email: " Pilot@HarrowFen.example " });
    expect(findActor(desk.db, signed?.sessionId ?? "", desk.clock.now)).toMatchObject({
      id: desk.people.pilot.id,
      teamId: desk.teamId,
      roles: ["pilot"],
    });
  });

  test("gives one and the same answer for an unknown e-mail, a wrong password and a removed person", async () => {
    const { desk, attempt } = deskWithPassword();
    expect(await attempt({ email: "nobody@harrowfen.example" })).toBeUndefined();
    expect(await attempt({ password: "wrong password" })).toBeUndefined();
    desk.db.update(memberships).set({ removedAt: desk.clock.now.toISOString() }).where(eq(memberships.userId, desk.people.pilot.id)).run();
    expect(await attempt()).toBeUndefined();
  });

  test("is stopped after ten tries on one e-mail, known or not, even with the right password then", async () => {
    const { attempt } = deskWithPassword();
    for (const email of ["pilot@harrowfen.example", "nobody@harrowfen.example"]) {
      for (let i = 0; i < 10; i += 1) expect(await attempt({ email, password: "guess", address: `192.0.2.${i}` })).toBeUndefined();
      await expect(attempt({ email, address: "198.51.100.1" })).rejects.toThrow(TooManyTries);
    }
  });

  test("is stopped after sixty tries from one address, whatever the e-mails", async () => {
    const { desk, attempt } = deskWithPassword();
    for (let i = 0; i < 60; i += 1) await countTry(desk.db, "sign-in by address", "203.0.113.9");
    await expect(attempt({ address: "203.0.113.9" })).rejects.toThrow(/^Too many tries\. Wait \d+ (s|min), then try again\.$/);
    expect(await attempt({ address: "203.0.113.10" })).toBeDefined();
  });

  test("that succeeds does not count against its address", async () => {
    const { desk, attempt } = deskWithPassword();
    for (let i = 0; i < 59; i += 1) await countTry(desk.db, "sign-in by address", "203.0.113.9");
    for (let i = 0; i < 3; i += 1) expect(await attempt({ address: "203.0.113.9" })).toBeDefined();
  });

  test("forgets the wrong tries once the right password came", async () => {
    const { attempt } = deskWithPassword();
    for (let round = 0; round < 3; round += 1) {
      for (let i = 0; i < 9; i += 1) await attempt({ password: "guess", address: `192.0.2.${i}` });
      expect(await attempt()).toBeDefined();
    }
  });
});

describe("a session row", () => {
  test("stands for nobody once ended, past its time, or when the person was removed", async () => {
    const { desk, attempt } = deskWithPassword();
    const { now } = desk.clock;
    const [one, two] = [await attempt(), await attempt()];
    closeSession(desk.db, one?.sessionId ?? "", now);
    expect(findActor(desk.db, one?.sessionId ?? "", now)).toBeUndefined();
    expect(findActor(desk.db, two?.sessionId ?? "", now)).toBeDefined();
    expect(findActor(desk.db, two?.sessionId ?? "", new Date(now.getTime() + 14 * 86_400_000))).toBeUndefined();
    desk.db.update(memberships).set({ removedAt: now.toISOString() }).where(eq(memberships.userId, desk.people.pilot.id)).run();
    expect(findActor(desk.db, two?.sessionId ?? "", now)).toBeUndefined();
  });

  test("gives the roles held now, not those at sign-in", () => {
    const { desk } = deskWithPassword();
    const { pilot } = desk.people;
    desk.db.insert(memberRoles).values({ teamId: desk.teamId, userId: pilot.id, role: "engineer" }).run();
    expect(findActor(desk.db, pilot.sessionId, desk.clock.now)?.roles).toEqual(["engineer", "pilot"]);
  });

  test("can be ended one by one and everywhere, but never another person's", async () => {
    const { desk, attempt } = deskWithPassword();
    const phone = await attempt();
    const ctx = desk.as("pilot");
    expect(listSessions(desk.db, ctx.actor, ctx.now)).toHaveLength(2);
    expect(() => endSession(ctx, { sessionId: desk.people.engineer.sessionId })).toThrow(expect.objectContaining({ code: "not-found" }));
    endSession(ctx, { sessionId: phone?.sessionId });
    expect(listSessions(desk.db, ctx.actor, ctx.now).map(({ isThisOne }) => isThisOne)).toEqual([true]);
    await attempt();
    expect(endAllSessions(ctx, {})).toEqual({ ended: 2 });
    expect(
      desk.db
        .select()
        .from(sessions)
        .where(eq(sessions.userId, desk.people.pilot.id))
        .all()
        .every(({ endedAt }) => endedAt !== null),
    ).toBe(true);
    expect(desk.db.select().from(sessions).where(eq(sessions.userId, desk.people.engineer.id)).get()?.endedAt).toBeNull();
  });
});

describe("the password asked again", () => {
  test("proves who signs and exactly what", async () => {
    const { desk } = deskWithPassword();
    const digest = "d".repeat(64);
    expect(await verifyPassword(desk.as("pilot"), PASSWORD, digest)).toEqual({ userId: desk.people.pilot.id, digest, at: desk.clock.now });
    await expect(verifyPassword(desk.as("pilot"), "wrong", digest)).rejects.toThrow(WrongPassword);
  });

  test("is stopped after eight wrong ones", async () => {
    const { desk } = deskWithPassword();
    for (let i = 0; i < 8; i += 1) await expect(verifyPassword(desk.as("pilot"), "guess", "d")).rejects.toThrow(WrongPassword);
    await expect(verifyPassword(desk.as("pilot"), PASSWORD, "d")).rejects.toThrow(TooManyTries);
  });
});
