import { type BrowserContext, test as base, expect, type Page } from "@playwright/test";
import type { Role } from "../../lib/testcards/words";
import { demoPassword } from "../../scripts/lib/demo-settings.mjs";
import { startServer, type TestServer } from "./test-server";

export { expect } from "@playwright/test";

type ConsoleWatch = {
  watch: (context: BrowserContext) => void;
  /** Says beforehand that an error like this will be logged, such as the browser's own line for an answer of 409. */
  allow: (pattern: RegExp) => void;
};

type Fixtures = {
  /** The program on a port of its own with a freshly filled database; stopped after the test. */
  server: TestServer;
  /** Every error the browser logs fails the test, unless it was allowed. */
  consoleWatch: ConsoleWatch;
  /** Signs the test's own page in. */
  signInAs: (role: Role) => Promise<void>;
  /** One more person: a browser context of their own, signed in. */
  openAs: (role: Role, size?: { width: number; height: number }) => Promise<Page>;
};

export const test = base.extend<Fixtures>({
  // biome-ignore lint/correctness/noEmptyPattern: Playwright reads a fixture's needs from this pattern
  server: async ({}, use) => {
    const server = await startServer();
    await use(server);
    await server.stop();
  },
  baseURL: async ({ server }, use) => use(server.url),
  consoleWatch: [
    async ({ context }, use) => {
      const logged: string[] = [];
      const allowed: RegExp[] = [];
      const watch = (watched: BrowserContext) => {
        watched.on("console", (message) => {
          if (message.type() === "error") logged.push(`${message.text()} (${message.location().url})`);
        });
        watched.on("weberror", (error) => logged.push(String(error.error())));
      };
      watch(context);
      await use({ watch, allow: (pattern) => allowed.push(pattern) });
      expect(
        logged.filter((line) => !allowed.some((pattern) => pattern.test(line))),
        "errors in the browser's console",
      ).toEqual([]);
    },
    { auto: true },
  ],
  signInAs: async ({ context, server }, use) => use((role) => signIn(context, server.url, role)),
  openAs: async ({ browser, server, consoleWatch }, use) => {
    const contexts: BrowserContext[] = [];
    await use(async (role, size) => {
      const context = await browser.newContext({ baseURL: server.url, ...(size ? { viewport: size } : {}) });
      contexts.push(context);
      consoleWatch.watch(context);
      await signIn(context, server.url, role);
      return context.newPage();
    });
    await Promise.all(contexts.map((context) => context.close()));
  },
});

async function signIn(context: BrowserContext, url: string, role: Role): Promise<void> {
  const { csrfToken } = (await (await context.request.get(`${url}/api/auth/csrf`)).json()) as { csrfToken: string };
  const form = { csrfToken, email: `${role}@harrowfen.example`, password: demoPassword, json: "true", callbackUrl: url };
  const answer = await context.request.post(`${url}/api/auth/callback/credentials`, { form });
  expect(answer.status(), `sign-in as ${role}`).toBe(200);
  const session = (await (await context.request.get(`${url}/api/auth/session`)).json()) as { user?: unknown };
  expect(session.user, `session of ${role}`).toBeTruthy();
}
