import { eq } from "drizzle-orm";
import { encode } from "next-auth/jwt";
import { beforeEach, describe, expect, test, vi } from "vitest";
import { sessions } from "@/db/schema";
import { ForeignOrigin, SignInNeeded } from "@/lib/auth/errors";
import { addressOf } from "@/lib/auth/options";
import { checkOrigin } from "@/lib/auth/origin";
import { type Desk, newDesk } from "../support/new-desk";

const SECRET = "a secret of at least thirty-two characters";
vi.stubEnv("NEXTAUTH_SECRET", SECRET);
vi.stubEnv("NEXTAUTH_URL", "http://127.0.0.1:3000");

const held = vi.hoisted(() => ({ jar: {} as Record<string, string>, sent: {} as Record<string, string>, db: undefined as unknown }));
vi.mock("@/db/client", () => ({ getDb: () => held.db }));
vi.mock("next/headers", () => ({
  cookies: async () => ({ getAll: () => Object.entries(held.jar).map(([name, value]) => ({ name, value })) }),
  headers: async () => new Headers(held.sent),
}));
vi.mock("next/navigation", () => ({
  redirect: (to: string) => {
    throw new Error(`redirect ${to}`);
  },
}));
const { requestCtx } = await import("@/lib/auth/request-ctx");

const request = (method = "GET", headers: Record<string, string> = {}) =>
  new Request("http://127.0.0.1:3000/api/v1/me", { method, headers });
let desk: Desk;
async function signedInAs(sid: string, secret = SECRET) {
  held.jar = { "next-auth.session-token": await encode({ token: { sub: "x", sid }, secret }) };
}
beforeEach(() => {
  desk = newDesk();
  held.db = desk.db;
  held.jar = {};
  held.sent = {};
  // The row lasts past the day this test is run on; request-ctx reads the real clock.
  desk.db.update(sessions).set({ expiresAt: "2999-01-01T00:00:00.000Z" }).run();
});

describe("the request's context", () => {
  test("is the person of the session row", async () => {
    await signedInAs(desk.people.mechanic.sessionId);
    expect((await requestCtx(request())).actor).toMatchObject({ name: "The mechanic", roles: ["mechanic"] });
  });

  test.each([
    ["without a cookie", async () => undefined],
    [
      "with a cookie signed by another secret",
      async () => signedInAs(desk.people.pilot.sessionId, "another secret of at least thirty-two"),
    ],
    ["with a session of nobody", async () => signedInAs(desk.newId())],
    [
      "with an ended session",
      async () => {
        desk.db.update(sessions).set({ endedAt: "2031-05-04T10:00:00.000Z" }).where(eq(sessions.id, desk.people.pilot.sessionId)).run();
        await signedInAs(desk.people.pilot.sessionId);
      },
    ],
  ])("is refused to a route %s, and sends a page to the sign-in", async (_, arrange) => {
    await arrange();
    await expect(requestCtx(request())).rejects.toThrow(SignInNeeded);
    held.sent = { "x-path": "/programmes/1?tab=cards" };
    await expect(requestCtx()).rejects.toThrow(`redirect /sign-in?next=${encodeURIComponent("/programmes/1?tab=cards")}`);
    held.sent = { "x-path": "//elsewhere.example" };
    await expect(requestCtx()).rejects.toThrow(/^redirect \/sign-in$/);
  });

  test("is refused to a change that comes from elsewhere", async () => {
    await signedInAs(desk.people.pilot.sessionId);
    await expect(requestCtx(request("POST", { origin: "https://elsewhere.example" }))).rejects.toThrow(ForeignOrigin);
    await expect(requestCtx(request("POST"))).rejects.toThrow(ForeignOrigin);
    expect((await requestCtx(request("POST", { origin: "http://127.0.0.1:3000" }))).actor.name).toBe("The pilot");
  });
});

describe("the origin of a change", () => {
  test.each([
    ["GET", "https://elsewhere.example", true],
    ["POST", "https://greenarc.example", true],
    ["POST", "http://localhost:3100", true],
    ["PATCH", "https://greenarc.example.elsewhere.example", false],
    ["DELETE", "null", false],
    ["PUT", "not an address", false],
  ])("of a %s from %s", (method, origin, fits) => {
    const headers = new Map([
      ["origin", origin],
      ["host", "localhost:3100"],
    ]);
    const asked = { method, headers: { get: (name: string) => headers.get(name) ?? null } } as unknown as Request;
    const check = () => checkOrigin(asked, "https://greenarc.example/");
    if (fits) expect(check).not.toThrow();
    else expect(check).toThrow(ForeignOrigin);
  });

  test("the caller's address is the nearest hop's word, not the caller's own", () => {
    expect(addressOf({ "x-forwarded-for": "10.0.0.1, 192.0.2.7" })).toBe("192.0.2.7");
    expect(addressOf({})).toBe("unknown");
  });
});
