import { cookies, headers } from "next/headers";
import { redirect } from "next/navigation";
import { getToken } from "next-auth/jwt";
import { v7 as uuidv7 } from "uuid";
import { getDb } from "@/db/client";
import type { Db } from "@/db/open";
import { env } from "@/lib/env";
import { SignInNeeded } from "./errors";
import { checkOrigin } from "./origin";
import type { Actor } from "./roles";
import { findActor } from "./session";

/** Has the shape of the use cases' context; lib/auth does not know them. */
export type RequestCtx = { db: Db; actor: Actor; now: Date; today: string; newId: () => string };

/**
 * Who asks, read from the session row in this request. A page or a server action calls it bare and is sent to the sign-in page;
 * a route handler hands its request and gets SignInNeeded (401) or ForeignOrigin (403) thrown. Next checks a server action's origin itself.
 */
export async function requestCtx(request?: Request): Promise<RequestCtx> {
  if (request) checkOrigin(request, env().NEXTAUTH_URL);
  const ctx = await findCtx();
  if (ctx) return ctx;
  if (request) throw new SignInNeeded();
  redirect(await signInAddress());
}

/** For pages that anybody may open: undefined when nobody is signed in. */
export async function findCtx(): Promise<RequestCtx | undefined> {
  const jar = await cookies();
  const req = { cookies: Object.fromEntries(jar.getAll().map(({ name, value }) => [name, value])), headers: {} };
  const token = await getToken({ req: req as unknown as Parameters<typeof getToken>[0]["req"], secret: env().NEXTAUTH_SECRET });
  if (typeof token?.sid !== "string") return undefined;
  const db = getDb();
  const now = new Date();
  const actor = findActor(db, token.sid, now);
  return actor && { db, actor, now, today: toToday(now), newId: uuidv7 };
}

/** The day the rules go by: the UTC day, or the fixed one of a test. */
export function toToday(now: Date): string {
  return env().DEMO_DATE ?? now.toISOString().slice(0, 10);
}

async function signInAddress(): Promise<string> {
  const path = (await headers()).get("x-path") ?? "/";
  return path === "/" || !path.startsWith("/") || path.startsWith("//") ? "/sign-in" : `/sign-in?next=${encodeURIComponent(path)}`;
}
