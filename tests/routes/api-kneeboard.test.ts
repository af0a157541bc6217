import { mkdtempSync, readdirSync, rmSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { getDocument } from "pdfjs-dist/legacy/build/pdf.mjs";
import { afterAll, expect, test, vi } from "vitest";
import { stopRendering } from "@/lib/pdf/render-worker/render-off-thread";
import { withdrawCard } from "@/lib/workflow/card/withdraw-card";
import { newDesk } from "../support/new-desk";
import { cardInReview, release } from "../support/stories";

const folder = mkdtempSync(join(tmpdir(), "greenarc-sheets-"));
vi.stubEnv("FILES_DIR", folder);
vi.stubEnv("NEXTAUTH_URL", "http://127.0.0.1:3000");
const held = vi.hoisted(() => ({ ctx: undefined as unknown }));
vi.mock("@/lib/auth/request-ctx", () => ({ requestCtx: async () => held.ctx }));
const { GET } = await import("@/app/api/v1/cards/[card]/revisions/[letter]/kneeboard.pdf/route");

afterAll(() => {
  stopRendering();
  rmSync(folder, { recursive: true });
});

async function textOf(response: Response): Promise<string> {
  const pdf = await getDocument({ data: new Uint8Array(await response.arrayBuffer()), useSystemFonts: false, verbosity: 0 }).promise;
  const pages = Array.from({ length: pdf.numPages }, async (_, index) => {
    const content = await (await pdf.getPage(index + 1)).getTextContent();
    return content.items.map((item) => ("str" in item ? item.str : "")).join(" ");
  });
  return (await Promise.all(pages)).join(" ").replaceAll(/\s+/g, " ");
}

// The text is read back by pdf.js, a library that took no part in the drawing.
test("a sheet is drawn as the revision stands, and a withdrawn one never comes back as released", { timeout: 90_000 }, async () => {
  const desk = newDesk();
  held.ctx = desk.as("observer");
  const { cardId } = cardInReview(desk);
  const sheet = async (query = "") =>
    GET(new Request(`http://127.0.0.1:3000/api/v1/x${query}`), { params: Promise.resolve({ card: cardId, letter: "A" }) });

  const inReview = await sheet();
  expect([inReview.status, inReview.headers.get("content-type"), inReview.headers.get("cache-control")]).toEqual([
    200,
    "application/pdf",
    "no-store",
  ]);
  expect(await textOf(inReview)).toMatch(/DRAFT/);

  const { digest } = release(desk, cardId);
  const released = await textOf(await sheet());
  expect(released).not.toMatch(/DRAFT|WITHDRAWN/);
  expect(released).toContain(`${digest.slice(0, 4)}-${digest.slice(4, 8)}`.toUpperCase());
  expect(await textOf(await sheet())).toBe(released);

  withdrawCard(desk.as("reviewer"), { cardId, letter: "A", why: "gauge replaced" });
  expect(await textOf(await sheet())).toMatch(/WITHDRAWN/);
  expect(readdirSync(join(folder, "sheets")).filter((name) => name.endsWith(".pdf"))).toHaveLength(3); // one a state, none half-written
  expect(readdirSync(join(folder, "sheets")).filter((name) => name.endsWith(".part"))).toEqual([]);

  const odd = await sheet("?paper=a0");
  expect([odd.status, odd.headers.get("content-type")]).toEqual([400, "application/problem+json"]);
});
