import { describe, expect, test } from "vitest";
import type { CardPoint } from "@/lib/testcards/card";
import type { SheetPage } from "@/lib/testcards/sheet-types";
import { CLIMB, sheetCard, sheetReading } from "./support/sheet-card";
import { cells, lay, lines, texts } from "./support/sheet-lines";

describe("a single reading taken before full power is set", () => {
  const oil = sheetReading("t10-oil-before", "oil-t", "oil-t", "degC", "OIL", [70, 105, "degC"], {
    label: "Oil T before full power",
    sampling: "lowest",
    onSheet: "single",
    conditions: ["full power"],
  });
  const climb = (rows: string[]): CardPoint => ({
    ...CLIMB,
    grid: { head: "min", unit: null, by: "time", rows, timeColumn: true },
    readings: [...CLIMB.readings, oil],
  });
  const topOf = (page: SheetPage | undefined, reading: string) => page?.items.find((i) => i.kind === "cell" && i.reading === reading);

  test("stands above the grid, where it is read", () => {
    const [, page] = lay(sheetCard([climb(["2", "4"])]));
    const [single, first] = [topOf(page, "t10-oil-before"), topOf(page, "t10-oat")];
    if (single?.kind !== "cell" || first?.kind !== "cell") throw new Error("no cells");
    expect(single.yMm + single.heightMm).toBeLessThan(first.yMm);
  });

  test("stands after it where it would cost the first page one of its five rows, and the foot names it and the rows by their labels", () => {
    const pages = lay(sheetCard([climb(["0", "2", "4", "6", "8", "10", "12"])]));
    expect(cells(pages[1] as SheetPage)).toHaveLength(30); // five rows of six
    expect(topOf(pages[2], "t10-oil-before")).toBeDefined();
    expect(lines(pages[1] as SheetPage, "footer")[0]).toBe("rows 10 to 12, Oil T before full power and the outcome boxes: page 3");
  });
});

test("half letter's least cell holds a band of two decimals unbroken", () => {
  const heads = texts(lay(sheetCard([CLIMB]), "half-letter")[1] as SheetPage, "grid").map((t) => t.text);
  expect(heads).toContain("87.5–97.5");
});
