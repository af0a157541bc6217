import type { NextAuthOptions } from "next-auth";
import Credentials from "next-auth/providers/credentials";
import { v7 as uuidv7 } from "uuid";
import { getDb } from "@/db/client";
import { env } from "@/lib/env";
import { TooManyTries } from "./errors";
import { closeSession, SESSION_DAYS } from "./session";
import { signIn } from "./sign-in";

type Headers = Record<string, string | undefined>;

/** The nearest hop's word for the caller; earlier entries are whatever the caller wrote. */
export function addressOf(headers: Headers): string {
  return headers["x-forwarded-for"]?.split(",").at(-1)?.trim() || "unknown";
}

/** What the sign-in page shows for the `error` that next-auth hands back. */
export const SIGN_IN_TOO_MANY = "TooManyTries";

export function authOptions(): NextAuthOptions {
  return {
    secret: env().NEXTAUTH_SECRET,
    session: { strategy: "jwt", maxAge: SESSION_DAYS * 86_400 },
    pages: { signIn: "/sign-in", error: "/sign-in" },
    providers: [
      Credentials({
        name: "E-mail and password",
        credentials: { email: { label: "E-mail", type: "email" }, password: { label: "Password", type: "password" } },
        async authorize(typed, request) {
          const headers = (request?.headers ?? {}) as Headers;
          try {
            const signed = await signIn(getDb(), {
              email: typed?.email ?? "",
              password: typed?.password ?? "",
              address: addressOf(headers),
              userAgent: headers["user-agent"] ?? "",
              now: new Date(),
              newId: uuidv7,
            });
            return signed ? { id: signed.userId, name: signed.name, email: signed.email, sessionId: signed.sessionId } : null;
          } catch (error) {
            if (error instanceof TooManyTries) throw new Error(`${SIGN_IN_TOO_MANY}:${error.retryAfterS}`);
            throw error;
          }
        },
      }),
    ],
    callbacks: {
      jwt({ token, user }) {
        return user ? { sub: user.id, sid: (user as { sessionId?: string }).sessionId } : token;
      },
      session({ session }) {
        return session; // only whether somebody is signed in: roles are read from the row at every request
      },
    },
    events: {
      signOut({ token }) {
        if (typeof token?.sid === "string") closeSession(getDb(), token.sid, new Date());
      },
    },
  };
}
