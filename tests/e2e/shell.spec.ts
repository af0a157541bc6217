import { expect, test } from "./fixtures";

test.use({ viewport: { width: 390, height: 844 } });

// The shell stands by itself here: nobody is signed in, the sortie is unknown, and the browser logs each answer it cannot use.
const unanswered = /Failed to load resource/;

/** Waits for the service worker to have kept the page and to answer for it. */
const kept = () => navigator.serviceWorker.ready.then((registration) => registration.active?.state);

test("the debrief page opens without a signal, with its policy and nothing against it", async ({ page, context, consoleWatch }) => {
  consoleWatch.allow(unanswered);
  await page.goto("/debrief/0192d3a0-0000-7000-8000-000000000000");
  const online = await page.evaluate(kept);
  expect(online).toMatch(/activat/);

  await context.setOffline(true);
  const answer = await page.reload();
  expect(answer?.fromServiceWorker()).toBe(true);
  const policy = answer?.headers()["content-security-policy"] ?? "";
  expect(policy).toContain("script-src 'self' 'sha256-");
  expect(policy).not.toMatch(/script-src[^;]*unsafe/);
  await expect(page.getByRole("main")).toBeVisible();
});

test("the debrief page opens when the server is gone, under another address too", async ({ page, server, consoleWatch }) => {
  consoleWatch.allow(unanswered);
  await page.goto("/debrief/first");
  await page.evaluate(kept);
  await server.stop();
  await page.goto("/debrief/second");
  await expect(page.getByRole("main")).toBeVisible();
  expect(new URL(page.url()).pathname).toBe("/debrief/second");
});

test("coming back online does not reload the page", async ({ page, context, consoleWatch }) => {
  consoleWatch.allow(unanswered);
  await page.goto("/debrief/first");
  await page.evaluate(kept);
  await page.evaluate(() => {
    document.documentElement.dataset.untouched = "yes";
  });
  await context.setOffline(true);
  await context.setOffline(false);
  await page.evaluate(() => fetch("/api/health").then((response) => response.json()));
  await expect(page.locator("html")).toHaveAttribute("data-untouched", "yes");
});

test("an inline script that the build did not write does not run on the debrief page", async ({ page, consoleWatch }) => {
  consoleWatch.allow(unanswered);
  consoleWatch.allow(/Content Security Policy/);
  await page.goto("/debrief/first");
  const ran = await page.evaluate(() => {
    const script = document.createElement("script");
    script.textContent = "window.planted = true";
    document.body.append(script);
    return "planted" in window;
  });
  expect(ran).toBe(false);
});

test("the service worker answers for the debrief alone", async ({ page, baseURL, consoleWatch }) => {
  consoleWatch.allow(unanswered);
  await page.goto("/debrief/first");
  await page.evaluate(kept);
  const scopes = await page.evaluate(() => navigator.serviceWorker.getRegistrations().then((all) => all.map((one) => one.scope)));
  expect(scopes).toEqual([`${baseURL}/debrief`]);
});

test("a page made for one request runs its scripts by that request's nonce", async ({ page }) => {
  const answer = await page.goto("/sign-in");
  const nonce = /'nonce-([^']+)' 'strict-dynamic'/.exec(answer?.headers()["content-security-policy"] ?? "")?.[1];
  expect(nonce).toBeTruthy();
  const html = (await answer?.text()) ?? "";
  const scripts = html.match(/<script\b[^>]*>/g) ?? [];
  expect(scripts.length).toBeGreaterThan(3);
  expect(scripts.filter((tag) => !tag.includes(`nonce="${nonce}"`))).toEqual([]);
});

test("an address that leads nowhere says so, and its page keeps to the policy", async ({ page, consoleWatch, signInAs }) => {
  consoleWatch.allow(/status of 404/);
  await signInAs("engineer");
  await page.goto("/nowhere/at/all");
  await expect(page.getByRole("heading", { level: 1 })).toBeVisible();
  await expect(page.locator('meta[name="robots"]').first()).toHaveAttribute("content", /noindex/);
});
