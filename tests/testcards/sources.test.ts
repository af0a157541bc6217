import { readdirSync, readFileSync } from "node:fs";
import { join } from "node:path";
import { describe, expect, test } from "vitest";

const folder = join(import.meta.dirname, "../../lib/testcards");
const listed = [...readFileSync(join(folder, "SOURCES.md"), "utf8").matchAll(/^\| ([A-Z][A-Z0-9.-]+) \|/gm)].map((match) => match[1]);
const files = readdirSync(folder, { recursive: true, encoding: "utf8" }).filter((name) => name.endsWith(".ts"));
const cited = new Map(
  files.flatMap((name) => {
    const docs = readFileSync(join(folder, name), "utf8").match(/\/\*\*[\s\S]*?\*\//g) ?? [];
    return docs.flatMap((doc) => [...doc.matchAll(/\[([A-Z][A-Z0-9.-]+)\]/g)].map((match) => [match[1], name] as const));
  }),
);

describe("SOURCES.md", () => {
  test.each([...cited])("lists %s, cited in %s", (key) => {
    expect(listed).toContain(key);
  });

  test("lists each key once, in order, and none that nobody cites", () => {
    expect(listed).toEqual([...new Set(listed)].sort());
    expect(listed.filter((key) => !cited.has(key))).toEqual([]);
  });
});
