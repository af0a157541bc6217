import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { B612_WIDTHS } from "@/lib/testcards/b612-widths";
import type { CardPoint, Step } from "@/lib/testcards/card";
import { layOutSheet, measuredSheet, sheetOverflow } from "@/lib/testcards/sheet";
import { textWidthMm } from "@/lib/testcards/sheet-layout/typesetting";
import type { SheetItem, SheetPage } from "@/lib/testcards/sheet-types";
import { CARD_STATES, type CardState } from "@/lib/testcards/words";
import { BLANK_POINT, CHECK, CLIMB, SHUT, sheetCard, sheetReading } from "./support/sheet-card";
import { cells, lay, lines, type TextItem, texts } from "./support/sheet-lines";
import { abortEvent, abortNumber } from "./support/sheet-programme";

function box(item: SheetItem): { left: number; right: number; top: number; bottom: number } {
  if (item.kind === "text") {
    const width = textWidthMm(item.text, item.weight, item.sizePt, B612_WIDTHS);
    const left = item.xMm - width * { start: 0, middle: 0.5, end: 1 }[item.anchor];
    // Capitals of B612 stand 0.75 em above the baseline: 0.75 × 25.4/72 mm a point.
    return { left, right: left + width, top: item.baselineMm - item.sizePt * 0.2646, bottom: item.baselineMm };
  }
  if (item.kind === "line")
    return { left: item.x1Mm, right: item.x2Mm, top: Math.min(item.y1Mm, item.y2Mm), bottom: Math.max(item.y1Mm, item.y2Mm) };
  if (item.kind === "circle") {
    const { xMm: x, yMm: y, radiusMm: r } = item;
    return { left: x - r, right: x + r, top: y - r, bottom: y + r };
  }
  if (item.kind === "code") return { left: item.xMm, right: item.xMm + item.sizeMm, top: item.yMm, bottom: item.yMm + item.sizeMm };
  return { left: item.xMm, right: item.xMm + item.widthMm, top: item.yMm, bottom: item.yMm + item.heightMm };
}

const PAPER = { a5: { width: 148, height: 210, cellW: 20, cellH: 10 }, "half-letter": { width: 140, height: 216, cellW: 18, cellH: 9 } };

describe("the climb of eleven rows", () => {
  const pages = lay(sheetCard([CLIMB]));

  test("has a cover without points, then five rows, then six with the head repeated and the outcome boxes", () => {
    expect(pages.map((p) => p.kind)).toEqual(["cover", "points", "points"]);
    expect(pages[0]?.regions).toEqual([]);
    const rows = pages.slice(1).map((page) => [...new Set(cells(page).map((c) => c.row))]);
    expect(rows).toEqual([
      [0, 1, 2, 3, 4],
      [5, 6, 7, 8, 9, 10],
    ]);
    for (const page of pages.slice(1))
      expect(texts(page, "grid").map((t) => t.text)).toEqual(expect.arrayContaining(["COOL °C", "87.5–97.5"]));
    expect(lines(pages[1] as SheetPage, "footer")[0]).toBe("rows 6 to 11 and the outcome boxes: page 3");
    expect(texts(pages[1] as SheetPage, "outcome")).toEqual([]);
    expect(texts(pages[2] as SheetPage, "outcome").map((t) => t.text)).toEqual(["FLOWN", "PART", "ABORTED", "SKIPPED"]);
  });

  // Hand calculation with the panel's table (80 → 79.0, 100 → 101.5, 120 → 122.5): card 109 is 100 + 20·(109 − 101.5)/21 = 107.14 on the
  // gauge, rounded down to 2.5: 105. CHT card 155 °C = 311 °F is 300 + 50·8/52 = 307.7, down to 5: 305. Oil P 33 up to 2.5: 35, 72 down: 70.
  test("prints its limits on the gauge, rounded to the cautious side", () => {
    for (const page of pages.slice(1)) {
      expect(lines(page, "limits")).toEqual([
        "LIMITS on the gauge",
        "Coolant 105 °C",
        "CHT 305 °F",
        "Oil T 115 °C",
        "TIT 880 °C",
        "IAT 60 °C",
        "Oil P 35–70 psi",
        "RPM 2580 MAP 29.0",
        "5 min 2730 / 30.5",
        "IAS 105 kt",
      ]);
    }
  });

  test("prints one abort list, one THEN line, revision and page number on every point page", () => {
    for (const page of pages.slice(1)) {
      expect(lines(page, "abort")).toEqual([
        "ABORT on the gauge, if any:",
        "Coolant 102.5 °C",
        "CHT 300 °F",
        "Oil T 110 °C",
        "TIT 860 °C",
        "IAT 55 °C",
        "Oil P below 37.5 psi",
        "COWL lever stuck",
        "smoke, smell",
        "vibration, fluid",
      ]);
      expect(lines(page, "then").join(" ")).toBe("THEN COWL OPEN (below 105 kt), 45 %, nose down, to strip, call, not above 105 kt");
      expect(lines(page, "header").join(" ")).toContain("CARD 07 REV C");
      expect(lines(page, "footer").at(-1)).toContain(`CARD 07 REV C PAGE ${page.number} of 3`);
      expect(lines(page, "footer").join(" ")).toContain("released A. Reviewer (reviewer) 2031-05-04 17:20Z");
    }
  });

  test("prints no true limit on a pilot's line", () => {
    const printed = pages.flatMap((page) => texts(page).map((t) => t.text)).join("\n");
    for (const trueValue of ["109", "155", "311", "118 ", "72 psi", "33"]) expect(printed).not.toContain(trueValue);
  });

  test("puts the control's position first and in bold, letters the steps and ends with the recovery", () => {
    const page = pages[1] as SheetPage;
    expect(texts(page, "entry")[0]).toMatchObject({ text: "COWL OPEN", weight: "bold", sizePt: 12 });
    expect(lines(page, "step")).toEqual([
      "a 2700/30.0 for 1 min, then 2550/28.5, 68 kt ±2",
      "b to 5 min past highest and above 9000 ft",
      "c level at 11 000 ft in any case",
    ]);
    expect(lines(page, "recovery")).toEqual(["RECOVER COWL OPEN (below 105 kt), level, 45 %, 80 kt"]);
  });

  test("reverses nothing but the word ABORT", () => {
    expect(pages.flatMap((page) => texts(page).filter((t) => t.reversed)).map((t) => t.text)).toEqual(["ABORT", "ABORT"]);
  });
});

describe("the cover", () => {
  const [cover] = lay(sheetCard([CLIMB]));

  // 381 + 92 + 72 + 6 + 64·0.72 = 597.08 kg; moment 722.0 + 352.6 + 16.8 + 102.8 = 1194.15 kg·m: CG 2.000 m.
  // Time: taxi 8, climb 30 and reset 2, return 10: 50 min.
  test("carries configuration, mass, CG, fuel, BINGO in a box, time, density altitude and basis", () => {
    const printed = lines(cover as SheetPage, "cover").join(" ");
    for (const figure of ["C-14", "597 kg", "2.000 m", "64 L", "26 L", "0 h 50", "4000 ft", "metric"]) expect(printed).toContain(figure);
    const bingo = texts(cover as SheetPage, "cover").find((t) => t.text === "BINGO") as TextItem;
    const boxes = (cover as SheetPage).items.filter((i) => i.kind === "rect" && i.strokeMm >= 0.9 && i.role === "cover");
    expect(
      boxes.some(
        (b) => box(b).left < bingo.xMm && box(b).right > bingo.xMm && box(b).top < bingo.baselineMm && box(b).bottom > bingo.baselineMm,
      ),
    ).toBe(true);
  });

  // Normal 75 to 98 °C true: 40 + 40·38.5/42.5 = 76.24, up to 77.5; 80 + 20·19/22.5 = 96.89, down to 95.
  test("carries go/no-go, the team's words, normal ranges on the gauge, the actions in full, the notice and the caution", () => {
    const printed = lines(cover as SheetPage, "cover").join(" ");
    expect(printed).toContain("any NO stops");
    expect(printed).toContain("knock it off everybody stops, go home");
    expect(printed).toContain("Coolant 77.5–95 °C");
    expect(printed).toContain("CHT 205–280 °F");
    expect(printed).toContain("1 COWL OPEN (below 105 kt; if faster, slow first)");
    expect(printed).toContain("Invented limits, for no real aircraft.");
    expect(printed).toContain("The pilot in command decides.");
  });

  test("leaves blanks where the draft has no figures yet", () => {
    const [page] = lay(sheetCard([], { fuelOnBoardL: null, bingoL: null, crew: [] }));
    expect(lines(page as SheetPage, "cover").join(" ")).not.toMatch(/NaN|null|undefined/);
  });
});

describe("points that share a card", () => {
  test("with other abort numbers start a page of their own, so that a page has one number a parameter", () => {
    const pages = lay(sheetCard([{ ...CLIMB, grid: null, readings: [] }, SHUT]));
    const withPoints = pages.filter((p) => p.kind === "points");
    expect(withPoints.map((p) => [...new Set(p.regions.map((r) => r.point))])).toEqual([["t10"], ["t13"], ["t13"]]);
    const shut = lines(withPoints[1] as SheetPage, "abort");
    expect(shut).toContain("Repeater 104.5 °C");
    expect(shut.filter((line) => line.startsWith("Coolant"))).toEqual([]);
  });

  test("with the same aborts stand together on one page, each once and in order", () => {
    const short = (id: string): CardPoint => ({ ...BLANK_POINT, id, title: id, steps: [] });
    const pages = lay(sheetCard([short("p1"), short("p2"), short("p3")]));
    expect(pages[1]?.regions.map((r) => r.point)).toEqual(["p1", "p2", "p3"]);
  });

  test("on the ground and in the air never share a page, for each has its own THEN line", () => {
    const pages = lay(
      sheetCard([
        { ...BLANK_POINT, id: "up" },
        { ...BLANK_POINT, id: "down", place: "ground" },
      ]),
    );
    expect(pages.slice(1).map((p) => p.regions.map((r) => r.point))).toEqual([["up"], ["down"]]);
    expect(lines(pages[2] as SheetPage, "then").join(" ")).toContain("1000 rpm");
  });

  test("head the list IF REACHED where nothing can be done about what is reached", () => {
    const soak: CardPoint = {
      ...BLANK_POINT,
      aborts: { standing: false, lines: [abortNumber("skin", "logger-skin", 92, 92)], ifReached: true },
    };
    expect(lines(lay(sheetCard([soak]))[1] as SheetPage, "abort")).toEqual(["ABORT IF REACHED", "Skin 92 °C"]);
  });

  test("print moments of their own, such as idle and take-off, with their name and only where they occur", () => {
    const idle: CardPoint = { ...CLIMB, conditions: ["at power", "idle", "take-off"] };
    const printed = lines(lay(sheetCard([idle]))[1] as SheetPage, "limits");
    expect(printed).toContain("idle Oil P min 15 psi");
    // 55 true is 40 + 40·(55 − 36.5)/42.5 = 57.41 on the gauge, up to 57.5.
    expect(printed.join(" ")).toContain("take-off Coolant min 57.5 °C");
    expect(printed.join(" ")).not.toContain("5 min");
  });

  test("print their own limits beside the card's", () => {
    const page = lay(sheetCard([CHECK]))[1] as SheetPage;
    expect(lines(page, "limits")).toContain("Catch tank 150 mL");
    expect(texts(page, "cell").map((t) => t.text)).toEqual(["YES    NO", "1    2    3    4    5"]);
  });
});

describe("the card's state", () => {
  const words: Record<CardState, string | undefined> = {
    draft: "DRAFT",
    "in review": "DRAFT",
    released: undefined,
    superseded: "SUPERSEDED",
    withdrawn: "WITHDRAWN",
  };

  test.each(CARD_STATES)("%s: stands across every page unless released", (state) => {
    for (const page of lay(sheetCard([CLIMB]), "a5", state)) {
      expect(texts(page, "watermark")[0]?.text).toBe(words[state]);
      expect(lines(page, "header").join(" ")).toContain(words[state] ?? "RELEASED");
    }
  });
});

describe("what does not fit", () => {
  test("is nothing on the demo's climb, on either paper", () => {
    expect(sheetOverflow(sheetCard([CLIMB]), B612_WIDTHS)).toEqual([]);
    expect(sheetOverflow(sheetCard([CLIMB]), B612_WIDTHS, "half-letter")).toEqual([]);
  });

  test("is told with the pages from one laying out, the same as from two", () => {
    const card = sheetCard([CLIMB, SHUT], { remarks: "a long remark ".repeat(120) });
    const options = { paper: "a5", state: "draft", widths: B612_WIDTHS } as const;
    expect(measuredSheet(card, options)).toEqual({ pages: layOutSheet(card, options), overflow: sheetOverflow(card, B612_WIDTHS) });
    expect(measuredSheet(card, options)).toEqual(measuredSheet(card, options));
  });

  test("names a seventh cell in a row, and still draws every cell at its least width", () => {
    const seven: CardPoint = { ...CLIMB, readings: [...CLIMB.readings, sheetReading("x", "tit", "tit", "degC", "TIT", null)] };
    expect(sheetOverflow(sheetCard([seven]), B612_WIDTHS)).toEqual([
      expect.objectContaining({ point: "t10", message: expect.stringContaining("7 cells") }),
    ]);
    const drawn = lay(sheetCard([seven])).flatMap((page) => cells(page).filter((c) => c.reading !== null || page.kind === "points"));
    expect(drawn).toHaveLength(77);
    expect(Math.min(...drawn.map((c) => c.widthMm))).toBeGreaterThanOrEqual(20);
  });

  test("names steps that fill more than a page, and cuts none of them", () => {
    const text = Array.from({ length: 400 }, (_, i) => `word${i}`).join(" ");
    const long: CardPoint = {
      ...CLIMB,
      steps: [{ id: "a", text, kind: "action", durationS: null, rpm: null, manifoldPressureInHg: null }],
    };
    expect(sheetOverflow(sheetCard([long]), B612_WIDTHS)[0]).toMatchObject({ point: "t10", page: 2 });
    const printed = lay(sheetCard([long]))
      .flatMap((page) => lines(page, "step"))
      .join(" ");
    expect(printed).toBe(`a ${text}`);
  });

  test("names a letter that the typeface lacks", () => {
    const found = sheetOverflow(sheetCard([{ ...CLIMB, title: "Climb \u{1f525}" }]), B612_WIDTHS);
    expect(found).toEqual([expect.objectContaining({ point: "t10", message: expect.stringContaining("\u{1f525}") })]);
  });

  test("names a cover that holds too much", () => {
    const found = sheetOverflow(sheetCard([CLIMB], { remarks: "a long remark ".repeat(120) }), B612_WIDTHS);
    expect(found).toEqual([expect.objectContaining({ point: null, page: 1 })]);
  });
});

const word = fc.stringMatching(/^[A-Za-z0-9.,/±%°]{1,12}$/);
const phrase = (most: number): fc.Arbitrary<string> => fc.array(word, { minLength: 1, maxLength: most }).map((words) => words.join(" "));
const step = phrase(12).map(
  (text: string): Step => ({ id: text, text, kind: "action", durationS: null, rpm: null, manifoldPressureInHg: null }),
);
const point = fc.record({
  title: phrase(5),
  entryText: phrase(10),
  recovery: phrase(10),
  steps: fc.array(step, { minLength: 0, maxLength: 7 }),
  rows: fc.array(word, { minLength: 0, maxLength: 14 }),
  columns: fc.integer({ min: 1, max: 5 }),
  singles: fc.array(fc.constantFrom("number", "yes-no", "choice", "text"), { maxLength: 6 }),
  timeColumn: fc.boolean(),
  place: fc.constantFrom("air", "ground"),
  event: fc.option(phrase(4), { nil: null }),
});

const leastPt = new Map([
  ["limits", 10],
  ["abort", 10],
  ["step", 12],
  ["entry", 12],
  ["recovery", 12],
  ["then", 12],
]);

describe("any card", () => {
  const anyCard = fc.array(point, { minLength: 1, maxLength: 5 }).map((drafts) =>
    sheetCard(
      drafts.map((d, n): CardPoint => {
        const grid = CLIMB.readings.slice(0, d.columns).map((r) => ({ ...r, id: `p${n}-${r.id}` }));
        const singles = d.singles.map((kind, i) =>
          sheetReading(`p${n}-s${i}`, "oat", "oat", "degC", "X", null, {
            label: `Single ${i}, ${kind}`,
            kind,
            onSheet: "single",
            choices: ["0", "1", "2", "3"],
          }),
        );
        return {
          ...BLANK_POINT,
          id: `p${n}`,
          title: d.title,
          entryText: d.entryText,
          recovery: d.recovery,
          steps: d.steps,
          place: d.place,
          grid: { head: "min", unit: null, by: "time", rows: d.rows, timeColumn: d.timeColumn },
          readings: [...grid, ...singles],
          aborts: { standing: true, lines: d.event === null ? [] : [abortEvent(d.event)], ifReached: false },
        };
      }),
    ),
  );

  test("prints every point once and in order, every word and every cell, inside the margins, at no less than the least sizes", () => {
    fc.assert(
      fc.property(anyCard, fc.constantFrom("a5" as const, "half-letter" as const), (card, paper) => {
        const pages = lay(card, paper);
        const { width, height, cellW, cellH } = PAPER[paper];
        const regions = pages.flatMap((p) => p.regions);
        expect(regions.filter((r) => r.part === 1).map((r) => r.point)).toEqual(card.content.points.map((p) => p.id));
        for (const r of regions) expect(r.part).toBeLessThanOrEqual(r.parts);
        for (const [i, page] of pages.entries()) {
          expect(page).toMatchObject({ number: i + 1, of: pages.length, widthMm: width, heightMm: height });
          // one comparison a page: a card has thousands of items
          const boxes = page.items.filter((it) => it.role !== "watermark").map(box);
          const inside = (at: ReturnType<typeof box>) =>
            at.left >= 8 - 1e-6 && at.right <= width - 8 + 1e-6 && at.top >= 15 - 1e-6 && at.bottom <= height - 8 + 1e-6;
          expect(boxes.filter((at) => !inside(at))).toEqual([]);
          expect(cells(page).filter((cell) => cell.widthMm < cellW - 1e-6 || cell.heightMm < cellH - 1e-6)).toEqual([]);
          expect(texts(page).filter((t) => t.sizePt < (leastPt.get(t.role) ?? 8))).toEqual([]);
          if (page.kind === "points")
            for (const role of ["limits", "abort", "then", "header", "footer"] as const)
              expect(texts(page, role).length).toBeGreaterThan(0);
        }
        for (const p of card.content.points) {
          const rows = p.grid?.rows.length ?? 0;
          for (const reading of p.readings) {
            const drawn = pages.flatMap(cells).filter((c) => c.reading === reading.id).length;
            expect(drawn).toBe(reading.onSheet === "grid" && rows > 0 ? rows : 1);
          }
        }
        const printed = pages
          .flatMap((page) => lines(page, "step"))
          .join("")
          .replaceAll(" ", "");
        for (const s of card.content.points.flatMap((p) => p.steps)) expect(printed).toContain(s.text.replaceAll(" ", ""));
      }),
      { numRuns: 60 },
    );
  });

  test("on any printed page draws no cell over another", () => {
    fc.assert(
      fc.property(anyCard, (card) => {
        for (const page of lay(card)) {
          const drawn = cells(page);
          for (const [i, a] of drawn.entries()) {
            for (const b of drawn.slice(i + 1)) {
              const across = Math.min(a.xMm + a.widthMm, b.xMm + b.widthMm) - Math.max(a.xMm, b.xMm);
              const down = Math.min(a.yMm + a.heightMm, b.yMm + b.heightMm) - Math.max(a.yMm, b.yMm);
              expect(across > 1e-6 && down > 1e-6).toBe(false);
            }
          }
        }
      }),
      { numRuns: 40 },
    );
  });
});
