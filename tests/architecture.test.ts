import { readdirSync, readFileSync, statSync } from "node:fs";
import { builtinModules } from "node:module";
import { dirname, join, posix } from "node:path";
import { describe, expect, test } from "vitest";

/**
 * Who may import whom. The first row whose pattern fits a file rules it; what a row does not list is refused.
 * Inside the project a name ends with / for a folder; outside it is a package's name.
 */
const rules: { files: RegExp; what: string; may: RegExp }[] = [
  { files: /^lib\/testcards\//, what: "the core", may: /^(lib\/testcards\/)/ },
  {
    files: /^db\/seed\//,
    what: "the demo data",
    may: /^(db\/|lib\/(testcards|auth|audit|workflow|env)|drizzle-orm|better-sqlite3|canonicalize|uuid|node:)/,
  },
  {
    files: /^db\//,
    what: "the database",
    may: /^(db\/(?!seed)|lib\/testcards\/(words|card|[\w-]+-types)$|lib\/env$|drizzle-orm|better-sqlite3$|server-only$|node:)/,
  },
  {
    files: /^lib\/workflow\//,
    what: "the workflow",
    may: /^(lib\/(workflow|testcards|audit|format)\/|lib\/auth\/roles$|db\/(schema|open$)|drizzle-orm|zod$|uuid$|canonicalize$|node:crypto$)/,
  },
  {
    files: /^lib\/audit\//,
    what: "the audit chain",
    may: /^(lib\/audit\/|lib\/auth\/roles$|lib\/testcards\/words$|db\/(schema|open$)|drizzle-orm|canonicalize$|node:crypto$)/,
  },
  {
    files: /^lib\/auth\/request-ctx\.ts$/,
    what: "the maker of the request's context",
    may: /^(lib\/auth\/|lib\/env$|lib\/testcards\/words$|lib\/workflow\/context$|db\/(client|schema|open)|next\/(headers|navigation)|next-auth|react$|drizzle-orm|uuid$|server-only$)/,
  },
  {
    files: /^lib\/auth\//,
    what: "sign-in and sessions",
    may: /^(lib\/auth\/|lib\/audit\/|lib\/env$|lib\/testcards\/words$|db\/(client|schema|open)|drizzle-orm|next-auth|@node-rs\/argon2$|rate-limiter-flexible$|uuid$|zod$|server-only$|node:)/,
  },
  {
    files: /^lib\/pdf\//,
    what: "the PDFs",
    may: /^(lib\/(pdf|testcards|format)\/|@react-pdf\/renderer$|qrcode$|react$|server-only$|node:)/,
  },
  { files: /^lib\/format\//, what: "the formats", may: /^lib\/(format|testcards)\// },
  {
    files: /^lib\/(mail|storage)\//,
    what: "mail and storage",
    may: /^(lib\/(mail|storage|testcards|format)\/|lib\/env$|nodemailer$|@aws-sdk\/client-s3$|server-only$|node:)/,
  },
  {
    files: /^lib\/offline\//,
    what: "what the phone keeps",
    may: /^(lib\/(offline|testcards)\/|lib\/workflow\/debrief\/schema$|idb-keyval$|uuid$)/,
  },
  { files: /^lib\/http\//, what: "errors as answers", may: /^(lib\/http\/|lib\/workflow\/errors$|lib\/auth\/errors$|zod$)/ },
  { files: /^lib\/health\//, what: "the health check", may: /^(lib\/(health\/|env$)|db\/(client|open)$|server-only$|node:)/ },
  { files: /^lib\/env\.ts$/, what: "the settings", may: /^(zod$|node:path$)/ },
  {
    files: /^components\/debrief\//,
    what: "the debrief on the phone",
    may: /^(components\/|lib\/(testcards|format|offline)\/|lib\/workflow\/[\w-]+\/(schema|policy)$|react|radix-ui$|lucide-react$|react-hook-form$|@hookform\/|zod$|uuid$)/,
  },
  {
    files: /^components\//,
    what: "the components",
    may: /^(components\/|lib\/(testcards|format)\/|lib\/workflow\/[\w-]+\/(schema|policy)$|react|next\/(link|navigation|image|dynamic)$|radix-ui$|lucide-react$|react-hook-form$|@hookform\/|@dnd-kit\/|zod$|uuid$)/,
  },
  {
    files: /^(app\/|proxy\.ts$)/,
    what: "pages, actions and routes",
    may: /^(app\/|components\/|lib\/|react|next|zod$|lucide-react$|radix-ui$|uuid$|server-only$|node:)/,
  },
];

const root = join(import.meta.dirname, "..");
const barrels = ["lib/testcards/index.ts", "db/schema/index.ts"];
const drawers = /^(utils?|helpers?|misc|common|shared|stuff|tools)$/;
const builtins = new Set(builtinModules);

type Source = { path: string; text: string; imports: { from: string; typeOnly: boolean }[] };

const sources: Source[] = ["app", "components", "db", "lib", "proxy.ts"]
  .flatMap(listCode)
  .map((path) => ({ path, text: readFileSync(join(root, path), "utf8") }))
  .map(({ path, text }) => ({ path, text, imports: readImports(path, text) }));
const known = new Set(sources.map((source) => source.path));
const everything = [...sources.map((source) => source.path), ...["tests", "scripts"].flatMap(listCode)];

function listCode(path: string): string[] {
  const full = join(root, path);
  if (!statSync(full, { throwIfNoEntry: false })) return [];
  if (statSync(full).isDirectory()) return readdirSync(full).flatMap((name) => listCode(`${path}/${name}`));
  return /\.(tsx?|mjs)$/.test(path) ? [path] : [];
}

/** Names inside the project as paths from its root without an extension, others as they stand. */
function readImports(path: string, text: string): Source["imports"] {
  const statements = text.matchAll(/(?:^|\n)\s*(import|export)\s+(type\s+)?(?:[^"';]*?\sfrom\s+)?"([^"]+)"|\bimport\(\s*"([^"]+)"\s*\)/g);
  return [...statements].map(([, , type, named, called]) => ({
    from: toProjectName(path, named ?? called ?? ""),
    typeOnly: Boolean(type),
  }));
}

function toProjectName(path: string, name: string): string {
  if (name.startsWith("@/")) return name.slice(2);
  if (name.startsWith(".")) return posix.join(dirname(path), name);
  return builtins.has(name) ? `node:${name}` : name;
}

function toFile(name: string): string | undefined {
  return [name, `${name}.ts`, `${name}.tsx`, `${name}/index.ts`].find((path) => known.has(path));
}

function offences(source: Source): string[] {
  const rule = rules.find(({ files }) => files.test(source.path));
  if (!rule) return [`${source.path} stands in a folder that no rule knows`];
  return source.imports
    .filter(({ from }) => !from.endsWith(".css") && !rule.may.test(from))
    .map(({ from }) => `${source.path} (${rule.what}) may not import ${from}`);
}

function findCycles(): string[] {
  const graph = new Map(
    sources.map(({ path, imports }) => [path, imports.filter(({ typeOnly }) => !typeOnly).flatMap(({ from }) => toFile(from) ?? [])]),
  );
  const done = new Set<string>();
  const cycles: string[] = [];
  const visit = (path: string, trail: string[]) => {
    if (trail.includes(path)) cycles.push([...trail.slice(trail.indexOf(path)), path].join(" → "));
    if (done.has(path) || trail.includes(path)) return;
    for (const next of graph.get(path) ?? []) visit(next, [...trail, path]);
    done.add(path);
  };
  for (const path of graph.keys()) visit(path, []);
  return cycles;
}

const withoutComments = (text: string) => text.replace(/\/\*[\s\S]*?\*\//g, "").replace(/(?<!:)\/\/.*$/gm, "");

function isBarrel({ path, text }: Source): boolean {
  if (barrels.includes(path)) return false;
  const statements = withoutComments(text)
    .replace(/export\s+(type\s+)?(\*|\{[^}]*\})\s*from\s*"[^"]+";?/g, "")
    .trim();
  return statements === "" && text.trim() !== "";
}

describe("the import rules", () => {
  test("read the tree: without files every rule would hold", () => {
    expect(sources.length).toBeGreaterThan(20);
    expect(sources.flatMap((source) => source.imports).length).toBeGreaterThan(50);
  });

  test.each(rules.map((rule) => [rule.what, rule] as const))("hold for %s", (_, rule) => {
    const ruled = sources.filter((source) => rules.find(({ files }) => files.test(source.path)) === rule);
    expect(ruled.flatMap(offences)).toEqual([]);
  });

  test("cover every file", () => {
    expect(sources.filter((source) => !rules.some(({ files }) => files.test(source.path))).map(({ path }) => path)).toEqual([]);
  });

  test.each([
    ["lib/testcards/x.ts", 'import { z } from "zod";'],
    ["lib/testcards/x.ts", 'import { db } from "@/db/open";'],
    ["lib/workflow/card/x.ts", 'import { headers } from "next/headers";'],
    ["lib/workflow/card/x.ts", 'import { requestCtx } from "@/lib/auth/request-ctx";'],
    ["lib/pdf/x.ts", 'import { cards } from "../../db/schema";'],
    ["components/card/x.tsx", 'import { listCards } from "@/lib/workflow/card/queries";'],
    ["app/(desk)/page.tsx", 'import { getDb } from "@/db/client";'],
    ["app/(desk)/page.tsx", 'import {\n  eq,\n} from "drizzle-orm";'],
    ["lib/offline/x.ts", 'const later = import("@/db/open");'],
    ["lib/http/x.ts", 'export { openDb } from "@/db/open";'],
  ])("notice in %s: %s", (path, text) => {
    expect(offences({ path, text, imports: readImports(path, text) })).toHaveLength(1);
  });

  test("leave no cycle", () => {
    expect(findCycles()).toEqual([]);
  });

  test("leave no barrel but the two that are meant", () => {
    expect(sources.filter(isBarrel).map(({ path }) => path)).toEqual([]);
    expect(isBarrel({ path: "lib/x.ts", text: '// all\nexport * from "./a";\nexport { b } from "./b";\n', imports: [] })).toBe(true);
  });
});

describe("the files", () => {
  test("stay within 400 lines", () => {
    const long = everything
      .map((path) => [path, readFileSync(join(root, path), "utf8").split("\n").length - 1] as const)
      .filter(([, lines]) => lines > 400);
    expect(long).toEqual([]);
  });

  test("are named for what they hold: no drawers", () => {
    const named = everything.filter((path) => path.split("/").some((part) => drawers.test(part.replace(/\..*$/, ""))));
    expect(named).toEqual([]);
  });

  test("are named in kebab-case", () => {
    const odd = everything.filter((path) => !/^[a-z0-9-]+(\.[a-z0-9-]+)*$/.test(path.split("/").at(-1) ?? ""));
    expect(odd).toEqual([]);
  });

  test("hold nothing of the demo's aircraft outside its data", () => {
    const demo = /\b(COWL|Quillon|Harrow ?Fen|harrowfen|HF-4L)\b/;
    const found = sources
      .filter(({ path, text }) => !path.startsWith("db/seed/") && demo.test(withoutComments(text)))
      .map(({ path }) => path);
    expect(found).toEqual([]);
  });
});
