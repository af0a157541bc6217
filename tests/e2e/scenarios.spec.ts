/**
 * Three worked scenarios of the team, typed into the phone as the pilot would and read off the results page. Figures: by hand from
 * the invented gauge tables and the hot-day rule of the programme; the sums stand beside each check.
 */
import type { Page } from "@playwright/test";
import { expect, test } from "./fixtures";
import { type Api, apiOf, cardNumbered, programmeOf, sortiesOf } from "./support/api";
import { PHONE, phoneOf } from "./support/phone";
import { resultLine, words } from "./support/results";

const GROUND_RUN = "Static ground cooling run";
const TAXI = "Taxi cooling, downwind";
const CLIMB = "Climb cooling";

async function planned(api: Api, cardNumber: string, settings: { fuelOnBoardL: number; forecastOatC: number }): Promise<string> {
  const programme = await programmeOf(api);
  const { kind, inForce } = await cardNumbered(api, cardNumber);
  const { body, status } = await api.post(`/programmes/${programme}/sorties`, {
    kind,
    plannedOn: new Date().toISOString().slice(0, 10),
    crew: [{ userId: null, name: "A. Pilot", role: "pilot", massKg: 92 }],
    revisionIds: [inForce?.revisionId],
    settings: { baggageKg: 0, ...settings },
  });
  expect(status).toBe(201);
  return String(body.id);
}

async function results(page: Page): Promise<void> {
  await page.setViewportSize({ width: 1440, height: 1000 });
  await page.getByRole("link", { name: "Results" }).click();
  await expect(page.getByRole("heading", { level: 1, name: /^Results of sortie/ })).toBeVisible();
}

const decision = (page: Page) => page.getByRole("region", { name: "What follows" });

test("S1: a static ground run that stays inside, with 5.6 °C in hand on the hot day", async ({ openAs, server }) => {
  const engineer = await openAs("engineer");
  const sortie = await planned(apiOf(engineer, server.url), "01", { fuelOnBoardL: 40, forecastOatC: 21 });
  const page = await openAs("pilot", PHONE);
  const phone = phoneOf(page);
  await page.goto(`/debrief/${sortie}`);
  await phone.answer("Is this what stood on the sheet on your knee?", "Yes, rev A");
  await phone.fill({ "Engine start, UTC": "0831", "Engine stop, UTC": "0902", "Fuel at start": "40", "Fuel at end": "31" });
  await phone.fill({ "Outside air": "21", QNH: "1013.25", "Wind from": "240", Wind: "8" });
  await phone.answer("Turbulence", "light");
  await phone.next("Next: safety");
  await phone.safeAndSound();
  await phone.next("Next point");
  await phone.answer("Outcome", "Flown");
  await phone.answer("COWL as flown", "OPEN");
  await phone.answer("Flown on condition, inside the entry tolerances?", "Yes");
  await phone.rows("Coolant", [70, 77.5, 82.5, 85, 87.5, 90, 90, 92.5, 92.5, 92.5, 92.5, 92.5, 92.5]);
  await phone.rows("CHT", [190, 215, 230, 240, 245, 250, 250, 255, 255, 255, 255, 255, 255]);
  await phone.rows("Oil T", [65, 70, 75, 80, 85, 85, 85, 85, 85, 85, 85, 85, 85]);
  await phone.range("Oil P", "55", "55");
  await phone.readings({ "IAT, highest": "41", OAT: "21", "Oil T before full power": "60" });
  await phone.moment("IAT, highest", "12:00", "21");
  await phone.othersReadings();
  await phone.readings({ "TIT, highest": "790", "RPM at full power, highest": "2700", "MAP at full power, highest": "30" });
  await phone.moment("TIT, highest", "12:00", "21");
  await phone.readings({ "RPM after that, highest": "2550", "MAP after that, highest": "28.5", "Catch tank, gained": "20" });
  await phone.next("Next: squawks");
  await phone.next("Look over");
  await phone.send();
  await results(page);

  // 350 ft at QNH 1013.25: pressure altitude 350 ft exactly, so the hot day there is 38 − 1.98 × 0.35 = 37.307 and 16.307 is added
  const coolant = await resultLine(page, GROUND_RUN, /^Coolant.*max placard/);
  expect(coolant).toMatchObject({ gauge: "92.5 °C", asTrue: "93.1 °C ±3.0" }); // 79 + 12.5 × 1.125 = 93.0625
  expect(coolant.hotDay).toMatch(/^109\.4 °C ±3\.2 .*37\.31 °C/);
  expect(coolant.card).toMatch(/^within/i);
  expect(coolant.placard).toMatch(/^within/i);
  expect(coolant.hotDayPlacard).toMatch(/^within 5\.6 °C in hand .*above normal$/i); // 115 − 109.4
  const cht = await resultLine(page, GROUND_RUN, /^CHT.*max placard/);
  expect(cht.gauge).toBe("255 °F");
  expect(cht.asTrue).toMatch(/^124\.6 °C/); // 199 + 55 × 1.04 = 256.2 °F
  expect(cht.hotDay).toMatch(/^140\.9 °C ±3\.5/);
  expect(cht.hotDayPlacard).toMatch(/^within 24\.1 °C in hand .*above normal$/i);
  const oil = await resultLine(page, GROUND_RUN, /^Oil T(?! before).*max placard/);
  expect(oil.hotDay).toMatch(/^101\.3 °C ±4\.1/); // 85 + 16.31
  expect(oil.hotDayPlacard).toMatch(/^within/i);
  const tit = await resultLine(page, GROUND_RUN, /^TIT.*max placard/);
  expect(tit.hotDay).toMatch(/^806\.3 °C/); // 790 + 16.31
  expect(tit.hotDayPlacard).toMatch(/^within/i);
  const iat = await resultLine(page, GROUND_RUN, /^IAT.*max placard/);
  expect(iat.hotDay).toMatch(/^58\.4 °C ±2\.4/); // by ratio: 314.15 × 310.457 / 294.15 − 273.15
  expect(iat.hotDayPlacard).toMatch(/^within .* above normal$/i);
  await expect(page.getByText("Completion rule: stabilised, met")).toBeVisible();
  await expect(page.getByText("missed", { exact: true })).toHaveCount(0);
  expect(await words(decision(page))).toContain("No squawk was raised.");
  expect(await words(decision(page))).toContain("Card 01: clear to next step.");
});

test("S2: an abort missed on a hot day; a gauge left uncorrected would have called it within", async ({ openAs, server }) => {
  const page = await openAs("pilot", PHONE);
  const phone = phoneOf(page);
  const taxi = (await sortiesOf(apiOf(page, server.url))).find(({ kind, state }) => kind === "taxi" && state === "planned");
  await page.goto(`/debrief/${taxi?.id}`);
  await phone.answer("Is this what stood on the sheet on your knee?", "Yes, rev A");
  await phone.fill({ "Off blocks, UTC": "1310", "On blocks, UTC": "1331", "Fuel at start": "40", "Fuel at end": "36" });
  await phone.fill({ "Outside air": "33", QNH: "1013.25", "Wind from": "250", Wind: "7" });
  await phone.answer("Turbulence", "none");
  await phone.next("Next: safety");
  await phone.safeAndSound();
  await phone.next("Next point");
  await phone.answer("Outcome", "Flown");
  await phone.answer("COWL as flown", "OPEN");
  await phone.answer("Flown on condition, inside the entry tolerances?", "Yes");
  await phone.fill({ "Held for, mm:ss": "15:00" });
  await phone.readings({ "Coolant, highest": "107.5" });
  await phone.reading("Coolant, highest").getByRole("button", { name: "Yes, 107.5 as read" }).click();
  await phone.moment("Coolant, highest", "14:20", "33");
  await phone.readings({ OAT: "33" });
  await phone.next("Next: squawks");
  await phone.next("Look over");
  await phone.send();
  await results(page);

  const coolant = await resultLine(page, TAXI, /^Coolant.*max placard/);
  expect(coolant).toMatchObject({ gauge: "107.5 °C", asTrue: "109.4 °C ±3.0" }); // 101.5 + 7.5 × 1.05 = 109.375
  expect(coolant.card).toMatch(/^exceeded 0\.4 °C past .*by less than U$/i);
  expect(coolant.placard).toMatch(/^within 5\.6 °C in hand/i);
  expect(coolant.hotDay).toMatch(/^113\.7 °C ±3\.2 .*37\.31 °C/); // 109.375 + 37.307 − 33
  expect(coolant.hotDayPlacard).toMatch(/^marginal 1\.3 °C in hand/i);
  await expect(page.getByText("Completion rule: whole run, met")).toBeVisible();
  const discipline = page.getByRole("listitem").filter({ hasText: "abort at" }).filter({ hasText: "missed" });
  expect(await words(discipline)).toMatch(/highest 107\.5 °C, abort at 102\.5 °C missed$/);
  expect(await words(decision(page))).toContain("Card 05: hold.");
  await expect(decision(page).getByText("grounding")).toHaveCount(0);
});

test("S4: a climb where the hot-day basis decides, shown on both", async ({ openAs, server }) => {
  const engineer = await openAs("engineer");
  const sortie = await planned(apiOf(engineer, server.url), "07", { fuelOnBoardL: 64, forecastOatC: 18 });
  const page = await openAs("pilot", PHONE);
  const phone = phoneOf(page);
  await page.goto(`/debrief/${sortie}`);
  await phone.answer("Is this what stood on the sheet on your knee?", "Yes, rev C");
  await phone.fill({ "Off blocks, UTC": "0912", "Take-off, UTC": "0921", "Landing, UTC": "1004", "On blocks, UTC": "1010" });
  await phone.fill({ "Fuel at start": "64", "Fuel at end": "41", "Outside air": "18", QNH: "1013.25", "Wind from": "250", Wind: "9" });
  await phone.answer("Turbulence", "light");
  await phone.next("Next: safety");
  await phone.safeAndSound();
  await phone.next("Next point");
  await phone.answer("Outcome", "Flown");
  await phone.answer("COWL as flown", "OPEN");
  await phone.answer("Flown on condition, inside the entry tolerances?", "Yes");
  await phone.fill({ "Held for, mm:ss": "11:55", "Highest pressure altitude": "10100" }); // 5:20 past the peak at 6:35
  await phone.readings({ OAT: "7", "Coolant, highest": "95" });
  await phone.moment("Coolant, highest", "6:35", "7", "5900");
  await phone.readings({ "CHT, highest": "265", "Oil T, highest": "105", "IAT, highest": "35", "Oil T before full power": "90" });
  await phone.othersReadings();
  await phone.range("Oil P", "52.5", "57.5");
  await phone.readings({ "TIT, highest": "850", "RPM at full power, highest": "2700", "MAP at full power, highest": "30" });
  await phone.readings({ "RPM after that, highest": "2550", "MAP after that, highest": "28.5" });
  for (const label of ["CHT, highest", "Oil T, highest", "IAT, highest", "TIT, highest"]) await phone.sameMoment(label);
  await phone.next("Next: squawks");
  await phone.next("Look over");
  await phone.send();
  await results(page);

  const coolant = await resultLine(page, CLIMB, /^Coolant.*max placard/);
  expect(coolant).toMatchObject({ gauge: "95 °C", asTrue: "95.9 °C ±3.0" }); // 79 + 15 × 1.125 = 95.875
  expect(coolant.card).toMatch(/^within/i);
  expect(coolant.hotDay).toMatch(/^115\.2 °C ±3\.2 .*26\.32 °C/); // 38 − 1.98 × 5.9 = 26.318, less 7, added
  expect(coolant.hotDayPlacard).toMatch(/^exceeded 0\.2 °C past .*by less than U us basis: 114\.9 °C ±3\.2, marginal$/i); // 100.0 − 3.6 × 5.9 °F, add 18.98
  const cht = await resultLine(page, CLIMB, /^CHT.*max placard/);
  expect(cht.asTrue).toMatch(/^130\.3 °C/); // 199 + 65 × 1.04 = 266.6 °F
  expect(cht.hotDay).toMatch(/^149\.7 °C ±3\.5/);
  expect(cht.hotDayPlacard).toMatch(/^within .*above normal$/i);
  const oil = await resultLine(page, CLIMB, /^Oil T, highest.*max placard/);
  expect(oil.hotDay).toMatch(/^124\.3 °C ±4\.1/);
  expect(oil.hotDayPlacard).toMatch(/^marginal/i);
  const tit = await resultLine(page, CLIMB, /^TIT.*max placard/);
  expect(tit.hotDay).toMatch(/^869\.3 °C/);
  expect(tit.hotDayPlacard).toMatch(/^within .*above normal$/i);
  const iat = await resultLine(page, CLIMB, /^IAT.*max placard/);
  expect(iat.hotDay).toMatch(/^56\.2 °C ±2\.4/);
  expect(iat.hotDayPlacard).toMatch(/^within .*above normal$/i);
  await expect(page.getByText("Completion rule: 5 min past peak, met")).toBeVisible();
  expect(await words(decision(page))).toContain("Card 07: hold.");
  await expect(page.getByText("missed", { exact: true })).toHaveCount(0);
});

test("a placard exceedance raises a squawk that grounds the aircraft and stops the next brief", async ({ openAs, server }) => {
  const page = await openAs("pilot", PHONE);
  const phone = phoneOf(page);
  const taxi = (await sortiesOf(apiOf(page, server.url))).find(({ kind, state }) => kind === "taxi" && state === "planned");
  await page.goto(`/debrief/${taxi?.id}`);
  await phone.answer("Is this what stood on the sheet on your knee?", "Yes, rev A");
  await phone.next("Next: safety");
  await phone.answer("Was any limit exceeded?", "Yes");
  await phone.answer("Was abort or knock it off called?", "Yes");
  await phone.answer("Word used", "abort");
  await page.getByLabel("What for").selectOption({ label: "Coolant out" });
  await page.getByLabel(/^On the gauge/).fill("117.5");
  await page.getByLabel("For how long, mm:ss").fill("0:40");
  await page.getByLabel("What was done", { exact: true }).fill("COWL OPEN, into wind, 1500 rpm, then stopped.");
  await phone.answer("Recovered?", "Yes");
  await phone.answer(/^Any roughness/, "No");
  await phone.next("Next point");
  await phone.answer("Outcome", "Aborted");
  await phone.answer("COWL as flown", "OPEN");
  await phone.readings({ "Coolant, highest": "117.5" }); // 101.5 + 17.5 × 1.05 = 119.875 true: 4.9 past 115
  await phone.moment("Coolant, highest", "9:10", "31");
  await phone.next("Next: squawks");
  await phone.next("Look over");
  await phone.send();
  await results(page);
  const coolant = await resultLine(page, TAXI, /^Coolant.*max placard/);
  expect(coolant.placard).toMatch(/^exceeded 4\.9 °C past .*clearly/i);
  await expect(decision(page).getByText("grounding", { exact: true })).toBeVisible();
  expect(await words(decision(page))).toContain("Card 05: hold.");

  const engineer = await openAs("engineer");
  const next = await planned(apiOf(engineer, server.url), "01", { fuelOnBoardL: 40, forecastOatC: 21 });
  const { body } = await apiOf(engineer, server.url).get(`/sorties/${next}`);
  expect(JSON.stringify(body.findings)).toContain("grounding");
});
