import type { Page } from "@playwright/test";
import { demoPassword } from "../../scripts/lib/demo-settings.mjs";
import { expect, test } from "./fixtures";
import { type Api, apiOf, cardNumbered, programmeOf, sortiesOf } from "./support/api";
import { builderOf } from "./support/builder";
import { PHONE, phoneOf } from "./support/phone";
import { addOtherTeam, STRANGER } from "./support/strangers";

const SCRIPT = '<img src=x onerror="window.planted=1"><script>window.planted=1</script>';
const EMOJI = "Taxi 🛩️ with 5 kt";
const TEN_THOUSAND = "x".repeat(10_000);

async function draft(api: Api): Promise<{ id: string; version: number; content: Record<string, unknown> }> {
  const programme = await programmeOf(api);
  const { body } = await api.post(`/programmes/${programme}/cards`, { title: "Bad input", kind: "taxi" });
  const card = (await api.get(`/cards/${body.id}`)).body;
  return { id: String(card.id), version: Number(card.version), content: card.content as Record<string, unknown> };
}

const planted = (page: Page) => page.evaluate(() => "planted" in window);

test("sign-in says neither who exists nor what was wrong, keeps the address, and asks for what is missing", async ({
  page,
  consoleWatch,
}) => {
  consoleWatch.allow(/status of 401/);
  await page.goto("/sign-in");
  const password = page.getByLabel("Password");
  const send = page.getByRole("button", { name: "Sign in", exact: true });
  await send.click();
  await expect(page.getByText("Enter your e-mail address, such as name@example.org.")).toBeVisible();
  await expect(page.getByText("Enter your password.")).toBeVisible();
  const refusals: string[] = [];
  for (const email of ["engineer@harrowfen.example", "nobody@harrowfen.example"]) {
    await page.getByLabel("E-mail").fill(email);
    await password.fill("not the password");
    await send.click();
    const refusal = page.getByRole("alert").filter({ hasText: /./ });
    await expect(send).toBeEnabled();
    await expect(refusal).toBeVisible();
    refusals.push((await refusal.textContent()) ?? "");
    await expect(page.getByLabel("E-mail")).toHaveValue(email);
  }
  expect(refusals[0]).toBe(refusals[1]);
});

test("a new card without a title is refused beside the field; emoji and script tags are text", async ({ page, signInAs, server }) => {
  await signInAs("engineer");
  const programme = await programmeOf(apiOf(page, server.url));
  await page.goto(`/programmes/${programme}/cards/new`);
  await page.getByLabel("Kind").selectOption("taxi");
  await page.getByLabel("Title").fill("   ");
  await page.getByRole("button", { name: "Start the card" }).click();
  await expect(page.getByText("Give the card a title.")).toBeVisible();
  await expect(page.getByLabel("Title")).toHaveAttribute("aria-invalid", "true");
  await expect(page.getByLabel("Kind")).toHaveValue("taxi");
  const title = `${EMOJI} ${SCRIPT}`.slice(0, 80);
  await page.getByLabel("Title").fill(title);
  await page.getByRole("button", { name: "Start the card" }).click();
  await expect(page.getByRole("heading", { level: 1 })).toContainText(title);
  await page.goto(`/programmes/${programme}/cards`);
  await expect(page.getByRole("rowheader", { name: title })).toBeVisible();
  expect(await planted(page)).toBe(false);
});

test("what the builder cannot save is said, kept on the screen, and saved as soon as it can be", async ({
  page,
  signInAs,
  server,
  consoleWatch,
}) => {
  consoleWatch.allow(/status of 422/);
  await signInAs("engineer");
  const { id } = await draft(apiOf(page, server.url));
  await page.goto(`/programmes/${await programmeOf(apiOf(page, server.url))}/cards/${id}`);
  const { tab, status, saved } = builderOf(page);
  await tab(/^Cover/).click();
  await page.getByLabel("Fuel on board, L").fill("NaN");
  await page.getByLabel("Fuel on board, L").blur();
  await expect(page.getByText("Enter a number, such as 102.5.")).toBeVisible();
  await page.getByLabel("Fuel on board, L").fill("9999");
  await expect(page.getByText("Enter 90 or less.")).toBeVisible(); // the tanks of the demo aircraft hold 90 L
  await expect(page.getByLabel("Fuel on board, L")).toHaveValue("9999");
  // A page older than the server may send what the server refuses: the request is bent on its way, the answer is the server's own.
  await page.route("**/api/v1/cards/*", (route) => {
    const body = route.request().method() === "PATCH" ? route.request().postDataJSON() : null;
    return body ? route.continue({ postData: JSON.stringify({ content: { ...body.content, fuelOnBoardL: 9999 } }) }) : route.continue();
  });
  await page.getByLabel("Fuel on board, L").fill("41");
  await expect(status).toHaveText("Not saved: something cannot be used");
  await expect(page.getByRole("alert").filter({ hasText: "fuelOnBoardL: This is at most 2000." })).toBeVisible();
  await page.unroute("**/api/v1/cards/*");
  await page.getByLabel("Fuel on board, L").fill("40");
  await saved();
  await page.getByLabel("Remarks, printed on the cover").fill(SCRIPT);
  await saved();
  await page.reload();
  await tab(/^Cover/).click();
  await expect(page.getByLabel("Remarks, printed on the cover")).toHaveValue(SCRIPT);
  expect(await planted(page)).toBe(false);
});

test("a review comment with script tags is shown as text and never run", async ({ openAs, server }) => {
  const reviewer = await openAs("reviewer");
  const { address } = await cardNumbered(apiOf(reviewer, server.url), "09");
  await reviewer.goto(address);
  await reviewer.getByRole("button", { name: "Comment", exact: true }).click();
  await expect(reviewer.getByText("Write the comment first.")).toBeVisible();
  await reviewer.getByLabel("Comment on the card").fill(SCRIPT);
  await reviewer.getByRole("button", { name: "Comment", exact: true }).click();
  await expect(reviewer.getByRole("listitem").getByText(SCRIPT)).toBeVisible();
  expect(await planted(reviewer)).toBe(false);
});

test("planning a sortie refuses what cannot be, beside the field, and keeps the rest", async ({ page, signInAs, server }) => {
  await signInAs("engineer");
  await page.goto(`/programmes/${await programmeOf(apiOf(page, server.url))}/sorties/new`);
  await page.getByLabel("Fuel on board, L").fill("forty");
  await page.getByLabel("Forecast outside air, °C").fill("300");
  await page.getByLabel("Mass, kg").fill("1000");
  await page.getByLabel("Runway and its state").fill("grass, wet");
  await page.getByRole("button", { name: "Plan the sortie" }).click();
  await expect(page.getByText("Choose at least one card.")).toBeVisible();
  await expect(page.getByText("Write a number.")).toBeVisible();
  await expect(page.getByText("This is at most 60.")).toBeVisible();
  await expect(page.getByText("This is at most 200.")).toBeVisible();
  await expect(page.getByLabel("Fuel on board, L")).toHaveValue("forty");
  await expect(page.getByLabel("Runway and its state")).toHaveValue("grass, wet");
  expect(await sortiesOf(apiOf(page, server.url))).toHaveLength(3);
});

test("the phone refuses what no gauge shows, keeps it as typed, and a stopwatch or a clock says how it is written", async ({
  openAs,
  server,
}) => {
  const page = await openAs("pilot", PHONE);
  const phone = phoneOf(page);
  const taxi = (await sortiesOf(apiOf(page, server.url))).find(({ state }) => state === "planned");
  await page.goto(`/debrief/${taxi?.id}`);
  await phone.fill({ "Off blocks, UTC": "25:70", "Fuel at start": "1e9", QNH: "29.92" });
  await expect(page.getByText("Write the time as hh:mm, UTC.")).toBeVisible();
  await expect(page.getByText(/^QNH: possible are 940 to 1050/)).toBeVisible();
  await page.getByRole("button", { name: "Read in hPa; change the unit" }).click();
  await page.getByRole("button", { name: "inHg", exact: true }).click();
  await expect(page.getByText(/^QNH: possible/)).toBeHidden();
  await phone.fill({ "Fuel at start": "400" });
  await expect(page.getByText(/^Fuel at start: the tanks hold 0 to/)).toBeVisible();
  await page.getByRole("button", { name: "Screen 3, Taxi cooling, downwind" }).click();
  await phone.answer("Outcome", "Flown");
  await phone.readings({ "Coolant, highest": "NaN" });
  await expect(phone.reading("Coolant, highest").getByRole("alert")).toBeVisible();
  await phone.readings({ "Coolant, highest": "-5" });
  await expect(phone.reading("Coolant, highest").getByRole("alert")).toContainText("possible are 0 to 130");
  await page.getByRole("textbox", { name: "Comment", exact: true }).fill(`${EMOJI} ${SCRIPT}`);
  await page.getByRole("button", { name: "Screen 5, Look over" }).click();
  await page.getByRole("button", { name: "Send the debrief" }).click();
  await expect(page.getByText("Mend what stands above first. Everything you typed is kept.")).toBeVisible();
  await page.reload();
  await page.getByRole("button", { name: "Screen 3, Taxi cooling, downwind" }).click();
  await expect(phone.reading("Coolant, highest").getByLabel("Coolant, highest")).toHaveValue("-5");
  await expect(page.getByRole("textbox", { name: "Comment", exact: true })).toHaveValue(`${EMOJI} ${SCRIPT}`);
  expect(await planted(page)).toBe(false);
});

test("the interface names an unknown field, a wrong type, a figure that is none and a text that is too long", async ({
  page,
  signInAs,
  server,
}) => {
  await signInAs("engineer");
  const api = apiOf(page, server.url);
  const cards = `/programmes/${await programmeOf(api)}/cards`;
  const unknown = await api.post(cards, { title: "T", kind: "taxi", colour: "red" });
  expect(unknown).toMatchObject({ status: 422, body: { errors: [{ path: "colour", message: expect.stringContaining("not known") }] } });
  expect((await api.post(cards, { title: TEN_THOUSAND, kind: "taxi" })).body.errors).toEqual([
    { path: "title", message: "Shorten this to 80 characters." },
  ]);
  expect((await api.post(cards, { title: "T", kind: "zeppelin" })).body.errors?.[0]?.path).toBe("kind");
  expect((await api.post(cards, {})).body.errors?.map(({ path }) => path).sort()).toEqual(["kind", "title"]);
  const plainText = await api.send("POST", cards, undefined, { text: "title=T", headers: { "Content-Type": "text/plain" } });
  expect(plainText.status).toBe(415);
  expect((await api.send("POST", cards, undefined, { text: '{"title": "T", "kind": NaN}' })).status).toBe(400);
  expect((await api.send("POST", cards, undefined, { text: "[1]" })).status).toBe(400);
  expect((await api.send("POST", cards, undefined, { text: JSON.stringify({ title: "x".repeat(1_100_000) }) })).status).toBe(413);

  const { id, version, content } = await draft(api);
  const save = (change: Record<string, unknown>) => api.patch(`/cards/${id}`, { content: { ...content, ...change } }, { ifMatch: version });
  expect((await save({ fuelOnBoardL: "40" })).body.errors).toEqual([{ path: "content.fuelOnBoardL", message: "Write a number." }]);
  expect((await save({ baggageKg: -1 })).body.errors?.[0]?.path).toBe("content.baggageKg");
  expect((await save({ plannedOn: "2026-02-30" })).body.errors).toEqual([
    { path: "content.plannedOn", message: "Write the day as YYYY-MM-DD." },
  ]);
  expect((await save({ remarks: TEN_THOUSAND })).status).toBe(422);
  expect((await api.get(`/cards/${id}`)).body.version).toBe(version);
});

test("a stale version is refused and changes nothing, and a change without one is asked for it", async ({ page, signInAs, server }) => {
  await signInAs("engineer");
  const api = apiOf(page, server.url);
  const { id, version, content } = await draft(api);
  expect((await api.patch(`/cards/${id}`, { content: { ...content, title: "First" } }, { ifMatch: version })).status).toBe(200);
  const stale = await api.patch(`/cards/${id}`, { content: { ...content, title: "Second" } }, { ifMatch: version });
  expect(stale).toMatchObject({ status: 412, body: { currentVersion: version + 1 } });
  expect((await api.patch(`/cards/${id}`, { content })).status).toBe(428);
  expect((await api.get(`/cards/${id}`)).body.content).toMatchObject({ title: "First" });
});

test("without a session, from a foreign page or from another team nothing is answered and nothing is changed", async ({
  page,
  openAs,
  server,
  consoleWatch,
}) => {
  consoleWatch.allow(/status of 404/);
  const engineer = await openAs("engineer");
  const own = apiOf(engineer, server.url);
  const programme = await programmeOf(own);
  const card = await cardNumbered(own, "11");
  const [sortie] = await sortiesOf(own);
  const addresses = [`/programmes/${programme}`, `/cards/${card.id}`, `/cards/${card.id}/readiness`, `/sorties/${sortie?.id}`];

  const nobody = apiOf(page, server.url);
  for (const address of addresses) expect((await nobody.get(address)).status, address).toBe(401);
  expect((await nobody.post(`/programmes/${programme}/cards`, { title: "T", kind: "taxi" })).status).toBe(401);
  await page.goto(card.address);
  await expect(page).toHaveURL(/\/sign-in\?/);

  const foreign = await own.post(
    `/programmes/${programme}/cards`,
    { title: "Foreign", kind: "taxi" },
    { headers: { Origin: "https://elsewhere.example" } },
  );
  expect(foreign).toMatchObject({ status: 403, body: { title: "Not from our own pages" } });

  addOtherTeam(server.databaseFile);
  await page.getByLabel("E-mail").fill(STRANGER);
  await page.getByLabel("Password").fill(demoPassword);
  await page.getByRole("button", { name: "Sign in", exact: true }).click();
  await expect(page).not.toHaveURL(/\/sign-in/);
  const stranger = apiOf(page, server.url);
  expect((await stranger.get("/programmes")).body.items).toEqual([]);
  for (const address of addresses) expect((await stranger.get(address)).status, address).toBe(404);
  const { version, content } = (await own.get(`/cards/${card.id}`)).body;
  const theirs = await stranger.patch(`/cards/${card.id}`, { content }, { ifMatch: Number(version) });
  expect(theirs.status).toBe(404);
  expect((await stranger.post(`/programmes/${programme}/cards`, { title: "T", kind: "taxi" })).status).toBe(404);
  expect((await stranger.post(`/sorties/${sortie?.id}/brief`, { goNoGo: [] })).status).toBe(404);
  for (const address of [`/programmes/${programme}`, card.address, sortie?.address ?? ""]) {
    await page.goto(address);
    await expect(page.getByRole("heading", { level: 1 }), address).toContainText(/not|nothing|no /i);
  }
  expect((await own.get(`/programmes/${programme}/cards`)).body.items).toHaveLength(5);
});
