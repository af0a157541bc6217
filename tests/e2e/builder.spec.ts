import type { Page } from "@playwright/test";
import { expect, test } from "./fixtures";
import { apiOf, cardNumbered, programmeOf } from "./support/api";
import { builderOf } from "./support/builder";

const TAXI = "Taxi cooling, downwind";

/** A new taxi card, open in the builder; answers its address. */
async function newCard(page: Page, url: string, title: string): Promise<string> {
  const api = apiOf(page, url);
  const programme = await programmeOf(api);
  const { body } = await api.post(`/programmes/${programme}/cards`, { title, kind: "taxi" });
  const address = `/programmes/${programme}/cards/${body.id}`;
  await page.goto(address);
  return address;
}

async function putOn(page: Page, title: string): Promise<void> {
  await page.getByRole("button", { name: `Put ${title} on the card`, exact: true }).click();
  await builderOf(page).saved();
}

test("two people on one card: the later save is told, overwrites nothing, and either card can be kept", async ({
  openAs,
  server,
  consoleWatch,
}) => {
  consoleWatch.allow(/status of 412/);
  const first = await openAs("engineer");
  const address = await newCard(first, server.url, "Shared taxi card");
  const second = await openAs("engineer");
  await second.goto(address);
  await expect(builderOf(second).status).toHaveText("Saved, version 1");

  await putOn(first, TAXI);
  await builderOf(second)
    .tab(/^Cover/)
    .click();
  await second.getByRole("textbox", { name: "Title", exact: true }).fill("My own title");
  await expect(builderOf(second).status).toHaveText("Not saved: changed by someone else");
  const told = second.getByRole("alert").filter({ hasText: "This card was saved from elsewhere meanwhile, as version 2." });
  await expect(told).toBeVisible();
  await expect(second.getByRole("textbox", { name: "Title", exact: true })).toHaveValue("My own title");
  const { body } = await apiOf(first, server.url).get(`/cards/${address.split("/").at(-1)}`);
  expect(body.content).toMatchObject({ title: "Shared taxi card", points: [{ title: TAXI }] });

  await told.getByRole("button", { name: "Load their card" }).click();
  await expect(builderOf(second).point(1, TAXI)).toBeVisible();
  await expect(second.getByRole("textbox", { name: "Title", exact: true })).toHaveValue("Shared taxi card");
  await second.getByRole("button", { name: /^Undo/ }).click();
  await expect(second.getByRole("textbox", { name: "Title", exact: true })).toHaveValue("My own title");
  await builderOf(second).saved();

  await builderOf(first)
    .tab(/^Cover/)
    .click();
  await first.getByRole("textbox", { name: "Title", exact: true }).fill("Third title");
  await first.getByRole("button", { name: "Keep mine" }).click();
  await builderOf(first).saved();
  const after = await apiOf(first, server.url).get(`/cards/${address.split("/").at(-1)}`);
  expect(after.body.content).toMatchObject({ title: "Third title", points: [{ title: TAXI }] });
});

test("a save says how it stands: not saved, saving, no connection, saved once there is one again", async ({
  page,
  context,
  signInAs,
  server,
  consoleWatch,
}) => {
  consoleWatch.allow(/ERR_INTERNET_DISCONNECTED/);
  await signInAs("engineer");
  const address = await newCard(page, server.url, "Lost connection");
  const { status, tab, saved } = builderOf(page);
  await tab(/^Cover/).click();
  await context.setOffline(true);
  await page.getByRole("textbox", { name: "Title", exact: true }).fill("Typed without a connection");
  await expect(status).toHaveText("Not saved yet");
  await expect(status).toHaveText("Not saved: no connection. Trying again.");
  await page.getByRole("textbox", { name: "Title", exact: true }).fill("Typed without a connection, and on");
  await context.setOffline(false);
  await saved();
  const { body } = await apiOf(page, server.url).get(`/cards/${address.split("/").at(-1)}`);
  expect(body.content).toMatchObject({ title: "Typed without a connection, and on" });
  await page.reload();
  await expect(page.getByRole("heading", { level: 1 })).toContainText("Typed without a connection, and on");
});

test("a second press starts no second card and sends no card twice", async ({ page, signInAs, server }) => {
  await signInAs("engineer");
  const api = apiOf(page, server.url);
  const programme = await programmeOf(api);
  await page.goto(`/programmes/${programme}/cards/new`);
  await page.getByLabel("Title").fill("Pressed twice");
  await page.getByLabel("Kind").selectOption("taxi");
  await page.getByRole("button", { name: "Start the card" }).dblclick();
  await expect(page.getByRole("heading", { level: 1, name: /Pressed twice/ })).toBeVisible();
  const cards = (await api.get(`/programmes/${programme}/cards`)).body.items as { title: string; id: string }[];
  expect(cards.filter(({ title }) => title === "Pressed twice")).toHaveLength(1);

  await putOn(page, TAXI);
  await builderOf(page)
    .tab(/^Before release/)
    .click();
  await page.getByRole("button", { name: "Send for review" }).dblclick();
  await expect(page.getByText("in review, rev A")).toBeVisible();
  const [card] = cards.filter(({ title }) => title === "Pressed twice");
  expect((await api.get(`/cards/${card?.id}`)).body).toMatchObject({ state: "in review", letter: "A" });
});

test("the same request sent twice with one key makes one card, and another body under that key is refused", async ({
  page,
  signInAs,
  server,
}) => {
  await signInAs("engineer");
  const api = apiOf(page, server.url);
  const path = `/programmes/${await programmeOf(api)}/cards`;
  const sent = { title: "Sent twice", kind: "taxi" };
  const [one, two] = await Promise.all([api.post(path, sent, { key: "twice-0001" }), api.post(path, sent, { key: "twice-0001" })]);
  expect([one.status, two.status]).toEqual([201, 201]);
  expect(one.body.id).toBe(two.body.id);
  expect((await api.post(path, { ...sent, title: "Other" }, { key: "twice-0001" })).status).toBe(409);
});

test("what differs from the shelf is shown and can be taken back", async ({ page, signInAs, server }) => {
  await signInAs("engineer");
  await newCard(page, server.url, "Different from the shelf");
  await putOn(page, TAXI);
  const { section, saved } = builderOf(page);
  const editor = page.getByTestId("point-editor");
  await expect(editor.getByText("Differs from the shelf")).toBeHidden();
  await editor.getByLabel("Duration, min").fill("25");
  await section("Abort").click();
  await editor.getByLabel("Add a number").selectOption({ label: "CHT above (CHT-PANEL)" });
  await expect(editor.getByText("Differs from the shelf")).toBeVisible();
  await editor.getByRole("button", { name: "Duration: take back as on the shelf" }).click();
  await expect(editor.getByLabel("Duration, min")).toHaveValue("20");
  await editor.getByRole("button", { name: "Abort: take back as on the shelf" }).click();
  await expect(editor.getByText("Differs from the shelf")).toBeHidden();
  await saved();
});

test("a limit or an abort is given true or on the gauge, and the other is computed", async ({ page, signInAs, server }) => {
  await signInAs("engineer");
  await newCard(page, server.url, "Both ways");
  await putOn(page, TAXI);
  const { section, saved } = builderOf(page);
  await section("Limits").click();
  await page.getByRole("button", { name: "Add a limit of this point" }).click();
  const limit = page.getByRole("group", { name: "Coolant, highest" });
  await limit.getByLabel("True").fill("105");
  await expect(limit.getByLabel("On the gauge")).toHaveValue("103.33"); // 100 + 3.5 × 20 ÷ 21
  await limit.getByLabel("On the gauge").fill("90");
  await expect(limit.getByLabel("True")).toHaveValue("90.25"); // 79 + 10 × 22.5 ÷ 20
  await limit.getByLabel("On the gauge").fill("ninety");
  await limit.getByLabel("On the gauge").blur();
  await expect(limit.getByText("Enter a number, such as 102.5.")).toBeVisible();
  await expect(limit.getByLabel("On the gauge")).toHaveValue("ninety");
  await expect(limit.getByLabel("True")).toHaveValue("90.25");

  await section("Abort").click();
  await page.getByLabel("Add a number").selectOption({ label: "CHT above (CHT-PANEL)" });
  const abort = page.getByRole("group", { name: "CHT at or above" });
  await abort.getByLabel("On the gauge").fill("295");
  await expect(abort.getByLabel(/^True/)).toHaveValue("147.67"); // 199 + 95 × 1.04 = 297.8 °F
  await abort.getByLabel(/^True/).fill("150");
  await expect(abort.getByLabel("On the gauge")).toHaveValue("299.04"); // 302 °F true: 200 + 103 ÷ 1.04
  await saved();
});

test("the shelf is found by words, place, risk and reading, and says so when nothing fits", async ({ page, signInAs, server }) => {
  await signInAs("engineer");
  await newCard(page, server.url, "Searching");
  const shelf = page.getByRole("region", { name: "Test points on the shelf" });
  await expect(shelf.getByText("On the shelf, 26")).toBeVisible();
  await shelf.getByLabel("Find a test point").fill("soak shut");
  await expect(shelf.getByText(/^\d of 26 on the shelf$/)).toBeVisible();
  await expect(builderOf(page).shelfItem("Heat soak, COWL SHUT")).toBeVisible();
  await expect(builderOf(page).shelfItem(TAXI)).toBeHidden();
  await shelf.getByLabel("Find a test point").fill("");
  await shelf.getByText("Air", { exact: true }).click();
  await shelf.getByLabel("Parameter read").selectOption({ label: "Ground speed" });
  await expect(shelf.getByText("1 of 26 on the shelf")).toBeVisible();
  await shelf.getByText("Ground", { exact: true }).click();
  await expect(shelf.getByText("No test point fits.")).toBeVisible();
  await shelf.getByRole("button", { name: "Show all 26" }).click();
  await expect(shelf.getByText("On the shelf, 26")).toBeVisible();
});

test("a draft left by an earlier hand shows its findings at once, each leading to its place", async ({ page, signInAs, server }) => {
  await signInAs("engineer");
  const card = await cardNumbered(apiOf(page, server.url), "11");
  await page.goto(card.address);
  const { finding } = builderOf(page);
  await finding("abort-past-limit").getByRole("button").click();
  await expect(page.getByRole("group", { name: "Coolant at or above" }).getByLabel("On the gauge")).toBeFocused();
  await page.getByRole("button", { name: /^Use .* on the gauge$/ }).click();
  await builderOf(page)
    .tab(/^Before release/)
    .click();
  await expect(finding("abort-past-limit")).toBeHidden();
  await page.getByRole("button", { name: "Send for review" }).click();
  await expect(page.getByRole("alert").filter({ hasText: /^Mend / })).toBeVisible();
});
