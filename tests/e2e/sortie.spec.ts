import { expect, test } from "./fixtures";
import { apiOf, programmeOf } from "./support/api";

// The demo's card 07 is planned with pilot 92 kg, observer 72 kg, baggage 6 kg and 64 L: 597.1 kg, CG 2.000 m (hand calculation in card-plan.test.ts).
test("a sortie takes crew, baggage and fuel from the card that was ticked, and shows their mass and CG", async ({
  page,
  signInAs,
  server,
}) => {
  await signInAs("engineer");
  await page.goto(`/programmes/${await programmeOf(apiOf(page, server.url))}/sorties/new`);
  await page.getByLabel(/^Card 07/).check();
  await expect(page.getByLabel("Fuel on board, L")).toHaveValue("64");
  await expect(page.getByLabel("Baggage, kg")).toHaveValue("6");
  await expect(page.getByLabel("Mass, kg").first()).toHaveValue("92");
  await expect(page.getByLabel("Mass, kg").last()).toHaveValue("72");
  await page.getByRole("button", { name: "Plan the sortie" }).click();
  await expect(page.getByText(/597\.1.kg, 2\.000.m, inside/)).toBeVisible();
});
