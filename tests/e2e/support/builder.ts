import { expect, type Locator, type Page } from "@playwright/test";

/** The card builder as the engineer works it. */
export function builderOf(page: Page) {
  const shelfItem = (title: string) => page.getByRole("button", { name: `${title}: drag to the card`, exact: true });
  const said = page.getByTestId("builder-said");
  const spoken = page.getByRole("status").filter({ hasText: /place|picked up|put down/ });

  async function middleOf(locator: Locator): Promise<{ x: number; y: number }> {
    const box = await locator.boundingBox();
    if (!box) throw new Error("This is not on the screen.");
    return { x: box.x + box.width / 2, y: box.y + box.height / 2 };
  }

  return {
    shelfItem,
    said,
    spoken,
    status: page.getByTestId("save-status"),
    /** By mouse, from the shelf to a spot of the sheet; `target` is where it is let go. */
    async drag(title: string, target: Locator) {
      const from = await middleOf(shelfItem(title));
      const to = await middleOf(target);
      await page.mouse.move(from.x, from.y);
      await page.mouse.down();
      await page.mouse.move(from.x + 12, from.y + 6, { steps: 3 });
      await page.mouse.move(to.x, to.y, { steps: 8 });
      await expect(page.getByText(`Put “${title}” here`)).toBeVisible();
      await page.mouse.up();
    },
    /** Where it begins on the sheet; a long point goes on over the page. */
    point: (number: number, title: string) =>
      page.getByRole("button", { name: new RegExp(`^Point ${number}, ${title}(, part 1 of \\d)?: edit$`) }),
    mover: (number: number, title: string) => page.getByRole("button", { name: `Point ${number}, ${title}: move`, exact: true }),
    section: (title: string) => page.getByTestId("point-editor").getByRole("button", { name: new RegExp(`^${title}(?!:)`) }),
    tab: (name: RegExp) => page.getByRole("tab", { name }),
    finding: (code: string) => page.locator(`[data-finding="${code}"]`),
    async saved() {
      await expect(page.getByTestId("save-status")).toHaveText(/^Saved, version \d+$/);
    },
  };
}
