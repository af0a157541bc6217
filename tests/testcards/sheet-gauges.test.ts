import { describe, expect, test } from "vitest";
import type { AbortLine, CardDocument, CardPoint, Instrument } from "@/lib/testcards/card";
import type { SheetPage } from "@/lib/testcards/sheet-types";
import { CARD_STATES } from "@/lib/testcards/words";
import { CLIMB, sheetCard } from "./support/sheet-card";
import { lay, lines, texts } from "./support/sheet-lines";
import { abortNumber } from "./support/sheet-programme";

/** The card with one gauge's calibration replaced. */
function withCalibration(
  card: CardDocument,
  id: string,
  change: (was: Instrument["calibration"]) => Instrument["calibration"],
): CardDocument {
  const instruments = card.programme.instruments.map((i) => (i.id === id ? { ...i, calibration: change(i.calibration) } : i));
  return { ...card, programme: { ...card.programme, instruments } };
}

describe("a gauge with nothing to say", () => {
  const bare = withCalibration(sheetCard([CLIMB]), "coolant-panel", () => null);

  // Nothing turns the card's true 109 °C, nor the abort's 105 °C, to this gauge: neither those nor the 105 and 102.5 of the lost table.
  test.each(CARD_STATES)("%s: prints not calibrated in place of its limit and of an abort that the rule set, never a number", (state) => {
    for (const page of lay(bare, "a5", state).slice(1)) {
      expect(lines(page, "limits")[1]).toBe("Coolant not calibrated");
      expect(lines(page, "abort")[1]).toBe("Coolant not calibrated");
      const coolant = [...lines(page, "limits"), ...lines(page, "abort")].filter((line) => line.includes("Coolant"));
      for (const line of coolant) expect(line).not.toMatch(/\d/);
    }
  });

  test("stands without a band in its cell's head and with the words among the cover's normal ranges", () => {
    const [cover, page] = lay(bare);
    const heads = texts(page as SheetPage, "grid").map((t) => t.text);
    expect(heads).toContain("COOL °C");
    for (const band of ["85–101", "87.5–97.5"]) expect(heads).not.toContain(band);
    expect(lines(cover as SheetPage, "cover").join(" ")).toContain("Coolant not calibrated");
  });

  test("keeps an abort that a person set on the gauge itself", () => {
    const own = abortNumber("coolant", "coolant-panel", 104.1, 102.5);
    const set: CardPoint = { ...CLIMB, aborts: { standing: false, lines: [{ ...own, setBy: "gauge" } as AbortLine], ifReached: false } };
    const page = lay({ ...bare, content: { ...bare.content, points: [set] } })[1] as SheetPage;
    expect(lines(page, "abort")).toContain("Coolant 102.5 °C");
  });

  test("turns no limit through a table in another unit, nor past the ends of its table", () => {
    const other = withCalibration(sheetCard([CLIMB]), "coolant-panel", (was) => was && { ...was, unit: "degF" });
    expect(lines(lay(other)[1] as SheetPage, "limits")[1]).toBe("Coolant not calibrated");
    // Proved to 100 on the gauge, 101.5 true: nothing is known of 109.
    const short = withCalibration(sheetCard([CLIMB]), "coolant-panel", (was) => was && { ...was, high: 100 });
    const printed = lines(lay(short)[1] as SheetPage, "limits").join(" ");
    expect(printed).toContain("Coolant outside calibrated range CHT 305 °F");
  });

  test("says not calibrated for a change that its slope would scale", () => {
    const rise: CardPoint = {
      ...CLIMB,
      limits: [
        {
          id: "rise",
          reading: "t10-coolant",
          label: "Rise",
          side: "max",
          value: 12,
          unit: "degC",
          forS: 0,
          statistic: "change from baseline",
          expandedUncertainty: null,
          source: "PL-01 rev 2",
        },
      ],
    };
    const card = { ...bare, content: { ...bare.content, points: [rise] } };
    expect(lines(lay(card)[1] as SheetPage, "limits")).toContain("Rise not calibrated");
  });

  test("breaks the pair of RPM and manifold pressure where one of them has no number", () => {
    const printed = lines(lay(withCalibration(sheetCard([CLIMB]), "map", () => null))[1] as SheetPage, "limits");
    expect(printed).toEqual(expect.arrayContaining(["RPM 2580 rpm", "MAP not calibrated"]));
    expect(printed.join(" ")).not.toContain("30.5");
  });
});
