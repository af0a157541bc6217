import { expect, type Page } from "@playwright/test";

export const PHONE = { width: 390, height: 844 };

/** The debrief as a thumb works it: by the words on the screen. */
export function phoneOf(page: Page) {
  const answer = (question: string | RegExp, choice: string) =>
    page.getByRole("group", { name: question }).getByRole("button", { name: choice, exact: true }).click();
  const fill = async (entries: Record<string, string>) => {
    for (const [label, text] of Object.entries(entries)) await page.getByLabel(label, { exact: true }).fill(text);
  };
  const reading = (label: string) => page.getByRole("group", { name: label, exact: true });
  return {
    answer,
    fill,
    reading,
    async readings(entries: Record<string, string>) {
      for (const [label, text] of Object.entries(entries)) await reading(label).getByLabel(label, { exact: true }).fill(text);
    },
    /** The lowest and the highest of one reading. */
    async range(label: string, lowest: string, highest: string) {
      await reading(label).getByLabel("Lowest", { exact: true }).fill(lowest);
      await reading(label).getByLabel("Highest", { exact: true }).fill(highest);
    },
    /** Row by row, as the pencil wrote them. */
    async rows(label: string, values: number[], first = 1) {
      await reading(label).getByText("Rows as written").click();
      for (const [index, value] of values.entries())
        await reading(label)
          .getByLabel(String(index + first), { exact: true })
          .fill(String(value));
    },
    /** When it was first there, in which air, and how high where that is asked. */
    async moment(label: string, when: string, air: string, height?: string) {
      await reading(label).getByLabel("When it was first there, mm:ss into the point").fill(when);
      if (height !== undefined) await reading(label).getByLabel("Pressure altitude then").fill(height);
      await reading(label).getByLabel("Outside air then").fill(air);
    },
    sameMoment: (label: string) =>
      reading(label)
        .getByRole("checkbox", { name: /^Same moment as/ })
        .check(),
    othersReadings: () => page.getByText(/^From the recorder and the observer/).click(),
    next: (name: string) => page.getByRole("button", { name, exact: true }).click(),
    kept: () => expect(page.getByTestId("keeping")).toHaveText("Saved on this phone"),
    async safeAndSound() {
      await answer("Was any limit exceeded?", "No");
      await answer("Was abort or knock it off called?", "No");
      await answer(/^Any roughness/, "No");
    },
    async send() {
      await page.getByRole("button", { name: "Send the debrief" }).click();
      await expect(page.getByRole("heading", { name: "Sent", level: 1 })).toBeVisible();
    },
  };
}
