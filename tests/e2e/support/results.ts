import type { Locator, Page } from "@playwright/test";

/** U+202F stands between value and unit on every screen; expectations are easier to read with a plain space. */
export const plain = (text: string): string => text.replaceAll("\u202f", " ").replace(/\s+/g, " ").trim();

export type ResultLine = {
  gauge: string;
  asTrue: string;
  card: string;
  placard: string;
  hotDay: string;
  hotDayPlacard: string;
};

/** One row of the results table as words; `applies` tells rows of the same reading apart. */
export async function resultLine(page: Page, point: string, reading: RegExp): Promise<ResultLine> {
  const table = page.getByRole("table", { name: `Results of ${point}` });
  const row = table.getByRole("row").filter({ has: page.getByRole("rowheader", { name: reading }) });
  const cells = (await row.getByRole("cell").allInnerTexts()).map(plain);
  const [gauge = "", asTrue = "", card = "", placard = "", hotDay = "", hotDayPlacard = ""] = cells;
  return { gauge, asTrue, card, placard, hotDay, hotDayPlacard };
}

export const words = async (locator: Locator): Promise<string> => plain(await locator.innerText());
