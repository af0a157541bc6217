import AxeBuilder from "@axe-core/playwright";
import type { BrowserContext, Page } from "@playwright/test";
import { LIGHT_COOKIE } from "../../components/light";
import { demoPassword } from "../../scripts/lib/demo-settings.mjs";
import { expect, test } from "./fixtures";
import { apiOf, cardNumbered, programmeOf, sortiesOf } from "./support/api";
import { builderOf } from "./support/builder";
import { PHONE, phoneOf } from "./support/phone";

const DESK = { width: 1440, height: 900 };
const LIGHTS = ["day", "ramp"] as const;
/** What the light can change; everything else is the same in both and is looked at once. */
const BY_LIGHT = ["color-contrast", "link-in-text-block"];

/** Nothing serious or critical on the page as it stands, in both lights and at both widths (the phone's own screens in both lights too); `part` looks at one part of it again. */
async function expectClean(page: Page, where: string, widths = [DESK, PHONE], part = "body"): Promise<void> {
  const found: string[] = [];
  for (const size of widths) {
    await page.setViewportSize(size);
    for (const light of LIGHTS) {
      if (light === "ramp" && size === PHONE && widths.length > 1) continue; // its colours were seen at the desk's width
      await page.emulateMedia({ colorScheme: light === "ramp" ? "dark" : "light" });
      await page.evaluate((now) => {
        document.documentElement.dataset.light = now;
      }, light);
      const axe = new AxeBuilder({ page }).include(part);
      const { violations } = await (light === "day" ? axe : axe.withRules(BY_LIGHT)).analyze();
      for (const { id, impact, nodes } of violations)
        if (impact === "serious" || impact === "critical")
          for (const { target, failureSummary } of nodes.slice(0, 4))
            found.push(`${where}, ${size.width} px, ${light}: ${id} at ${target.join(" ")}. ${failureSummary?.split("\n")[1]?.trim()}`);
    }
  }
  expect(found).toEqual([]);
}

async function everyHeading(page: Page, address: string): Promise<void> {
  await page.goto(address);
  await expect(page.getByRole("heading", { level: 1 })).toBeVisible();
}

test("nothing serious on the pages that need no sign-in", async ({ page, openAs, server, consoleWatch }) => {
  consoleWatch.allow(/status of 404/);
  await everyHeading(page, "/sign-in");
  await expectClean(page, "sign-in");
  const api = apiOf(await openAs("pilot"), server.url);
  const { stamp } = (await api.get(`/cards/${(await cardNumbered(api, "05")).id}`)).body as { stamp?: { code: string } };
  expect(stamp?.code).toMatch(/^[0-9A-Z]{5}-[0-9A-Z]{5}$/);
  for (const code of [stamp?.code ?? "", "AAAAA-AAAAA"]) {
    await everyHeading(page, `/c/${code}`);
    await expectClean(page, `scan of ${code}`);
  }
  await everyHeading(page, "/debrief");
  await expectClean(page, "debrief without a sortie", [PHONE]);
});

test("nothing serious on the programme's pages", async ({ page, signInAs, server, consoleWatch }) => {
  test.setTimeout(300_000);
  consoleWatch.allow(/status of 404/);
  await signInAs("engineer");
  const api = apiOf(page, server.url);
  const programme = `/programmes/${await programmeOf(api)}`;
  const squawk = await api.post(`${programme}/squawks`, { system: "cooling", text: "Weeping hose.", severity: "monitor" });
  const planned = (await sortiesOf(api)).find(({ state }) => state === "planned");
  const places = ["/", "/team", "/account", "/nowhere", programme];
  const parts = [
    "limits",
    "test-points",
    "test-points/T10",
    "cards",
    "cards/new",
    "sorties",
    "sorties/new",
    "squawks",
    "ladder",
    `squawks/${squawk.body.id}`,
  ];
  for (const address of [...places, ...parts.map((part) => `${programme}/${part}`), `${planned?.address}/change`]) {
    await everyHeading(page, address);
    await expectClean(page, address);
  }
});

test("nothing serious on a card being built, in review, released, and on its sortie and results", async ({ openAs, server }) => {
  test.setTimeout(300_000);
  const engineer = await openAs("engineer");
  const api = apiOf(engineer, server.url);
  const builder = builderOf(engineer);
  await everyHeading(engineer, (await cardNumbered(api, "11")).address);
  await expectClean(engineer, "builder, findings");
  await engineer.setViewportSize(DESK);
  await builder.tab(/^Cover/).click();
  await expectClean(engineer, "builder, cover");
  await engineer.setViewportSize(DESK);
  await builder.point(2, "Best-angle short climb").click();
  for (const section of ["Entry", "Steps", "Readings", "Limits", "Abort", "Recovery", "Completion"]) {
    await builder.section(section).click();
    await expectClean(engineer, `builder, ${section}`, [DESK], '[data-testid="point-editor"]');
  }
  const reviewer = await openAs("reviewer");
  await everyHeading(reviewer, (await cardNumbered(api, "09")).address);
  await expectClean(reviewer, "card in review");
  await reviewer.setViewportSize(DESK);
  await reviewer.getByRole("button", { name: "Return with a comment" }).click();
  await expect(reviewer.getByRole("dialog")).toBeVisible();
  await expectClean(reviewer, "return dialog");
  await everyHeading(reviewer, (await cardNumbered(api, "07")).address);
  await expectClean(reviewer, "released card");
  const sorties = await sortiesOf(api);
  const pilot = await openAs("pilot");
  for (const { address, state } of sorties) {
    await everyHeading(pilot, address);
    await expectClean(pilot, `sortie, ${state}`);
    if (state !== "debriefed") continue;
    await everyHeading(pilot, `${address}/results`);
    await expectClean(pilot, "results");
  }
});

test("nothing serious on any screen of the debrief", async ({ openAs, server }) => {
  const page = await openAs("pilot", PHONE);
  const phone = phoneOf(page);
  const taxi = (await sortiesOf(apiOf(page, server.url))).find(({ state }) => state === "planned");
  await page.goto(`/debrief/${taxi?.id}`);
  await phone.fill({ "Off blocks, UTC": "99", "Fuel at start": "40" });
  await expectClean(page, "debrief, flight", [PHONE]);
  await phone.next("Next: safety");
  await phone.answer("Was abort or knock it off called?", "Yes");
  await expectClean(page, "debrief, safety", [PHONE]);
  await phone.next("Next point");
  await phone.answer("Outcome", "Flown");
  await phone.readings({ "Coolant, highest": "107.5" });
  await phone.othersReadings();
  await expectClean(page, "debrief, point", [PHONE]);
  await phone.next("Next: squawks");
  await page.getByRole("button", { name: "Write down a squawk" }).click();
  await expectClean(page, "debrief, squawks", [PHONE]);
  await phone.next("Look over");
  await expectClean(page, "debrief, look over", [PHONE]);
});

test("the light a person chose stays with them on the desk and on the phone", async ({ page, context, signInAs, server }) => {
  await signInAs("pilot");
  const cookieOf = async (one: BrowserContext) => (await one.cookies()).find(({ name }) => name === LIGHT_COOKIE)?.value;
  await page.goto("/");
  await page.getByRole("button", { name: /A\. Pilot/ }).click();
  await page.getByRole("menuitemradio", { name: "Ramp light" }).click();
  await expect(page.locator("html")).toHaveAttribute("data-light", "ramp");
  expect(await cookieOf(context)).toBe("ramp");
  const [sortie] = await sortiesOf(apiOf(page, server.url));
  await page.goto(`/debrief/${sortie?.id}`);
  await expect(page.locator("html")).toHaveAttribute("data-light", "ramp");
});

test("from sign-in to a card sent for review without a mouse", async ({ page }) => {
  const press = async (...keys: string[]) => {
    for (const key of keys) await page.keyboard.press(key);
  };
  /** Tab until the focus stands on the control of that name, as a person would. */
  const tabTo = async (role: "button" | "link" | "textbox" | "combobox", name: RegExp, most = 120) => {
    const target = page.getByRole(role, { name }).first();
    await expect(target).toBeVisible();
    for (let press = 0; press < most; press++) {
      if (await target.evaluate((element) => element === document.activeElement)) return;
      await page.keyboard.press("Tab");
    }
    throw new Error(`The Tab key does not lead to ${name}.`);
  };
  await page.goto("/sign-in");
  await tabTo("textbox", /^E-mail/);
  await page.keyboard.type("engineer@harrowfen.example");
  await press("Tab");
  await page.keyboard.type(demoPassword);
  await press("Enter");
  await expect(page.getByRole("heading", { level: 1, name: "Flight line" })).toBeVisible();
  await tabTo("link", /^Open the programme/);
  await press("Enter");
  await expect(page).toHaveURL(/\/programmes\/[^/]+$/);
  await tabTo("link", /^Cards$/);
  await press("Enter");
  await tabTo("link", /New card/);
  await press("Enter");
  await tabTo("textbox", /^Title/);
  await page.keyboard.type("By keyboard alone");
  await press("Tab");
  await page.keyboard.type("taxi");
  await tabTo("button", /^Start the card/);
  await press("Enter");
  await expect(page.getByRole("heading", { level: 1, name: /By keyboard alone/ })).toBeVisible();
  await tabTo("button", /^Taxi cooling, downwind: drag to the card/);
  await press("Space");
  await expect(page.getByRole("status").filter({ hasText: "Taxi cooling, downwind" }).first()).toBeAttached();
  await press("ArrowDown", "Space");
  await expect(builderOf(page).point(1, "Taxi cooling, downwind")).toBeVisible();
  await builderOf(page).saved();
  await tabTo("button", /^Point 1, .*: edit/);
  await press("Enter");
  await expect(page.getByTestId("point-editor")).toBeVisible();
  const findings = page.getByRole("tab", { name: /^Before release/ });
  for (let press = 0; press < 60 && !(await findings.evaluate((one) => one === document.activeElement)); press++)
    await page.keyboard.press("Tab");
  await press("Enter");
  await tabTo("button", /^Send for review/);
  await press("Enter");
  await expect(page.getByText("in review, rev A")).toBeVisible();
});
