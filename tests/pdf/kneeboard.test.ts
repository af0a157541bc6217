import { readFileSync } from "node:fs";
import { join } from "node:path";
import { getDocument, OPS } from "pdfjs-dist/legacy/build/pdf.mjs";
import { afterAll, beforeAll, describe, expect, test } from "vitest";
import { type KneeboardModel, kneeboardCacheKey } from "@/lib/pdf/kneeboard/model";
import { renderKneeboard } from "@/lib/pdf/kneeboard/render";
import { renderKneeboardOffThread, stopRendering } from "@/lib/pdf/render-worker/render-off-thread";
import { B612_WIDTHS } from "@/lib/testcards/b612-widths";
import { layOutSheet } from "@/lib/testcards/sheet";
import { textWidthMm } from "@/lib/testcards/sheet-layout/typesetting";
import type { SheetStamp } from "@/lib/testcards/sheet-types";
import type { CardState } from "@/lib/testcards/words";
import { CLIMB, STAMP, sheetCard } from "../testcards/support/sheet-card";

function model(state: CardState, stamp: SheetStamp | null = STAMP): KneeboardModel {
  return {
    pages: layOutSheet(sheetCard([CLIMB]), { paper: "a5", state, widths: B612_WIDTHS, stamp }),
    title: "Card 07 rev C, Climb cooling",
    subject: `Quillon R2 Q-R2-01, ${state}`,
    codeUrl: stamp === null ? null : `http://127.0.0.1:3000/c/${stamp.code}`,
    recordedAt: "2031-05-04T17:20:00.000Z",
  };
}

type Piece = { str: string; transform: number[]; width: number };

async function readBack(pdf: Uint8Array) {
  const task = getDocument({
    data: pdf.slice(),
    useSystemFonts: false,
    standardFontDataUrl: `${join(process.cwd(), "node_modules/pdfjs-dist/standard_fonts")}/`,
  });
  const document = await task.promise;
  const pages = await Promise.all(
    Array.from({ length: document.numPages }, async (_, i) => {
      const page = await document.getPage(i + 1);
      const pieces = (await page.getTextContent()).items.filter((item) => "str" in item) as Piece[];
      const operators = await page.getOperatorList();
      return {
        view: page.view as [number, number, number, number],
        pieces,
        operators,
        text: pieces
          .map((p) => p.str)
          .join(" ")
          .replace(/\s+/g, " "),
      };
    }),
  );
  const metadata = (await document.getMetadata()).info as Record<string, unknown>;
  return { pages, metadata };
}

describe("the kneeboard PDF, read back by a PDF library", () => {
  let pdf: Uint8Array;
  let read: Awaited<ReturnType<typeof readBack>>;
  beforeAll(async () => {
    pdf = await renderKneeboard(model("released"));
    read = await readBack(pdf);
  });

  // ISO 216: A5 is 148 × 210 mm; a point is 25.4/72 mm.
  test("is A5 within half a millimetre, a cover and two point pages", () => {
    expect(read.pages).toHaveLength(3);
    for (const { view } of read.pages) {
      expect(Math.abs((view[2] * 25.4) / 72 - 148)).toBeLessThan(0.5);
      expect(Math.abs((view[3] * 25.4) / 72 - 210)).toBeLessThan(0.5);
    }
  });

  test("embeds its two faces and uses no other", () => {
    const source = Buffer.from(pdf).toString("latin1");
    const names = [...source.matchAll(/\/FontName \/[A-Z]{6}\+(\S+)/g)].map((m) => m[1]);
    expect(new Set(names)).toEqual(new Set(["B612-Regular", "B612-Bold"]));
    expect(source.match(/\/FontFile[23]? /g)).toHaveLength(names.length);
    expect(source).not.toMatch(/\/BaseFont \/(Helvetica|Times|Courier)/);
  });

  test("carries every limit, every abort line, THEN, revision, page number and release on every point page", () => {
    const limits = ["105 °C", "305 °F", "115 °C", "880 °C", "60 °C", "35–70 psi", "RPM 2580 MAP 29.0", "2730 / 30.5", "105 kt"];
    const aborts = [
      "102.5 °C",
      "300 °F",
      "110 °C",
      "860 °C",
      "55 °C",
      "below 37.5 psi",
      "COWL lever stuck",
      "smoke, smell",
      "vibration, fluid",
    ];
    for (const [i, { text }] of read.pages.entries()) {
      if (i === 0) continue;
      for (const line of [...limits, ...aborts]) expect(text).toContain(line);
      for (const frame of [
        "THEN",
        "CARD 07 REV C",
        `PAGE ${i + 1} of 3`,
        "RELEASED",
        "released A. Reviewer (reviewer) 2031-05-04 17:20Z",
        "9F3C-21B0",
        "7KQ2M9",
      ]) {
        expect(text).toContain(frame);
      }
    }
  });

  test("shows no true limit on a pilot's line", () => {
    for (const { text } of read.pages) for (const trueValue of ["109", "155", "311"]) expect(text).not.toContain(trueValue);
  });

  test("stays inside the clip's 15 mm and the other edges' 8 mm", () => {
    const mm = (points: number) => (points * 25.4) / 72;
    for (const { pieces, view } of read.pages) {
      for (const { str, transform, width } of pieces.filter((p) => p.str.trim() !== "")) {
        const [, , , sizePt = 0, x = 0, y = 0] = transform;
        expect(mm(x), str).toBeGreaterThanOrEqual(8 - 0.05);
        expect(mm(x + width), str).toBeLessThanOrEqual(140 + 0.05);
        expect(mm(view[3] - y - 0.75 * sizePt), str).toBeGreaterThanOrEqual(15 - 0.05);
        expect(mm(y), str).toBeGreaterThanOrEqual(8 - 0.05);
      }
    }
  });

  // The PDF library measures with the embedded font, we with the generated table. It joins neighbours on a line: those are left out.
  test("is as wide in print as the core measured", () => {
    const laidOut = new Map(
      model("released").pages.flatMap((p) => p.items.flatMap((i) => (i.kind === "text" ? [[i.text, i] as const] : []))),
    );
    const compared = read.pages
      .flatMap((p) => p.pieces)
      .flatMap(({ str, width, transform }) => {
        const item = laidOut.get(str);
        if (!item || Math.abs((transform[3] ?? 0) - item.sizePt) > 0.01) return [];
        return [{ str, offMm: Math.abs((width * 25.4) / 72 - textWidthMm(str, item.weight, item.sizePt, B612_WIDTHS)) }];
      });
    expect(compared.length).toBeGreaterThan(50);
    for (const { str, offMm } of compared) expect(offMm, str).toBeLessThan(0.05);
  });

  test("is black on white: no grey, no colour", () => {
    const painted = read.pages.flatMap(({ operators }) =>
      operators.fnArray.flatMap((fn, i) =>
        fn === OPS.setFillRGBColor || fn === OPS.setStrokeRGBColor ? [JSON.stringify(operators.argsArray[i])] : [],
      ),
    );
    expect(painted.length).toBeGreaterThan(0);
    for (const colour of new Set(painted)) expect(colour).toMatch(/#000000|#ffffff|\[0,0,0\]|\[255,255,255\]|\{"0":0,"1":0,"2":0\}/);
  });

  test("names itself and takes its date from the record", () => {
    expect(read.metadata).toMatchObject({ Title: "Card 07 rev C, Climb cooling", Subject: "Quillon R2 Q-R2-01, released" });
    expect(String(read.metadata.CreationDate)).toContain("20310504");
  });

  test("is the same twice over, for no clock is read", async () => {
    expect(Buffer.from(await renderKneeboard(model("released"))).equals(Buffer.from(pdf))).toBe(true);
  });
});

describe("a sheet that is not in force", () => {
  test.each([
    ["draft", "DRAFT"],
    ["superseded", "SUPERSEDED"],
    ["withdrawn", "WITHDRAWN"],
  ] as const)("%s: says so in outline across every page", async (state, word) => {
    const { pages } = await readBack(await renderKneeboard(model(state, state === "draft" ? null : STAMP)));
    for (const { pieces, operators } of pages) {
      expect(pieces.some((p) => p.str === word && Math.hypot(p.transform[2] ?? 0, p.transform[3] ?? 0) > 60)).toBe(true);
      // PDF 32000-1 table 106: text rendering mode 1 strokes the outline without filling it.
      expect(operators.argsArray.filter((_, i) => operators.fnArray[i] === OPS.setTextRenderingMode)).toContainEqual([1]);
    }
  });

  test("has no code while it is a draft and says so", async () => {
    const { pages } = await readBack(await renderKneeboard(model("draft", null)));
    for (const { text } of pages) expect(text).toContain("no code: draft");
  });
});

describe("drawing off the request thread", () => {
  afterAll(stopRendering);

  test("gives the same bytes as drawing in place, for several sheets asked for at once", async () => {
    const here = Buffer.from(await renderKneeboard(model("released")));
    const there = await Promise.all([model("released"), model("withdrawn"), model("released")].map(renderKneeboardOffThread));
    expect(there.map((pdf) => Buffer.from(pdf).equals(here))).toEqual([true, false, true]);
  });

  test("answers a sheet that cannot be drawn with a clear error, and goes on", async () => {
    const broken = { ...model("released"), codeUrl: "x".repeat(8000) };
    await expect(renderKneeboardOffThread(broken)).rejects.toThrow(/^The sheet was not drawn: /);
    expect((await renderKneeboardOffThread(model("released"))).length).toBeGreaterThan(10_000);
  });
});

describe("the cache key", () => {
  test("differs by digest, state and paper, so that a withdrawn sheet is never answered as released", () => {
    const key = kneeboardCacheKey({ digest: "abc", state: "released", paper: "a5" });
    expect(kneeboardCacheKey({ digest: "abc", state: "withdrawn", paper: "a5" })).not.toBe(key);
    expect(kneeboardCacheKey({ digest: "abd", state: "released", paper: "a5" })).not.toBe(key);
    expect(kneeboardCacheKey({ digest: "abc", state: "released", paper: "half-letter" })).not.toBe(key);
    expect(kneeboardCacheKey({ digest: "abc", state: "in review", paper: "a5" })).toMatch(/^[\w.-]+$/);
  });
});

test("the licence of the typeface stands beside it", () => {
  expect(readFileSync(join(process.cwd(), "fonts/OFL.txt"), "utf8")).toContain("SIL OPEN FONT LICENSE Version 1.1");
});
