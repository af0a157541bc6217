import { execFileSync, spawn } from "node:child_process";
import { mkdirSync, mkdtempSync, readFileSync, rmSync, writeFileSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import Database from "better-sqlite3";
import { afterEach, beforeEach, describe, expect, test } from "vitest";
import { migrateDb } from "@/db/migrate";

let folder: string;
let file: string;

beforeEach(() => {
  folder = mkdtempSync(join(tmpdir(), "greenarc-migrate-"));
  file = join(folder, "test.db");
});
afterEach(() => rmSync(folder, { recursive: true, force: true }));

/** A folder of migrations as drizzle-kit lays it out. */
function writeMigrations(...statements: string[]): string {
  const migrations = join(folder, "migrations");
  mkdirSync(join(migrations, "meta"), { recursive: true });
  const entries = statements.map((sql, idx) => {
    const tag = `000${idx}_step`;
    writeFileSync(join(migrations, `${tag}.sql`), sql);
    return { idx, version: "6", when: 1_700_000_000_000 + idx, tag, breakpoints: true };
  });
  writeFileSync(join(migrations, "meta", "_journal.json"), JSON.stringify({ version: "7", dialect: "sqlite", entries }));
  return migrations;
}

const people = `CREATE TABLE people (id text PRIMARY KEY NOT NULL, name text NOT NULL) STRICT;
--> statement-breakpoint
CREATE TABLE notes (id text PRIMARY KEY NOT NULL, person text NOT NULL REFERENCES people(id) ON DELETE CASCADE) STRICT;`;

// The statements drizzle-kit 0.31 writes for a changed column: new table, copy, drop, rename.
const rebuildPeople = `PRAGMA foreign_keys=OFF;
--> statement-breakpoint
CREATE TABLE __new_people (id text PRIMARY KEY NOT NULL, name text) STRICT;
--> statement-breakpoint
INSERT INTO __new_people SELECT id, name FROM people;
--> statement-breakpoint
DROP TABLE people;
--> statement-breakpoint
ALTER TABLE __new_people RENAME TO people;
--> statement-breakpoint
PRAGMA foreign_keys=ON;`;

function fill(rows: number): void {
  const db = new Database(file);
  for (let i = 0; i < rows; i++) {
    db.prepare("INSERT INTO people VALUES (?, 'x')").run(`p${i}`);
    db.prepare("INSERT INTO notes VALUES (?, ?)").run(`n${i}`, `p${i}`);
  }
  db.close();
}

function count(table: string): number {
  const db = new Database(file, { readonly: true });
  const row = db.prepare<[], { n: number }>(`SELECT count(*) AS n FROM ${table}`).get();
  db.close();
  return row?.n ?? -1;
}

describe("migrateDb", () => {
  test("keeps every child row when a migration rebuilds the parent table", () => {
    migrateDb(file, writeMigrations(people));
    fill(200);
    expect(migrateDb(file, writeMigrations(people, rebuildPeople))).toBe(1);
    expect([count("people"), count("notes")]).toEqual([200, 200]);
  });

  // The counter-proof, on SQLite itself: the same rebuild inside a transaction with foreign keys on takes the children with it.
  test("guards against a real loss: the bare rebuild deletes the children", () => {
    migrateDb(file, writeMigrations(people));
    fill(200);
    const db = new Database(file);
    db.pragma("foreign_keys = ON");
    db.transaction(() => db.exec(rebuildPeople.replaceAll("--> statement-breakpoint", "")))();
    db.close();
    expect(count("notes")).toBe(0);
  });

  test("refuses a migration that would leave orphans and changes nothing", () => {
    migrateDb(file, writeMigrations(people));
    fill(3);
    expect(() => migrateDb(file, writeMigrations(people, "DELETE FROM people WHERE id = 'p1';"))).toThrow(
      /without their parent \(notes → people\)/,
    );
    expect([count("people"), count("notes"), count("__drizzle_migrations")]).toEqual([3, 3, 1]);
  });

  test("applies nothing the second time", () => {
    const migrations = writeMigrations(people);
    expect([migrateDb(file, migrations), migrateDb(file, migrations)]).toEqual([1, 0]);
  });

  test("leaves a database made by a newer version alone and says so", () => {
    migrateDb(file, writeMigrations(people, rebuildPeople));
    expect(() => migrateDb(file, writeMigrations(people))).toThrow(/made by a newer Greenarc/);
  });

  test("lets two processes start at once: each migration is applied once", async () => {
    const migrations = writeMigrations(people, rebuildPeople);
    const source = `import { migrateDb } from ${JSON.stringify(join(process.cwd(), "db/migrate.ts"))}; console.log(migrateDb(${JSON.stringify(file)}, ${JSON.stringify(migrations)}));`;
    const script = join(folder, "race.mts");
    writeFileSync(script, source);
    const run = () =>
      new Promise<string>((done, fail) => {
        const child = spawn(process.execPath, ["--import", "tsx", script], { cwd: process.cwd(), stdio: ["ignore", "pipe", "inherit"] });
        let out = "";
        child.stdout.on("data", (chunk) => {
          out += chunk;
        });
        child.on("close", (code) => (code === 0 ? done(out.trim()) : fail(new Error(`exit ${code}`))));
      });
    const answers = await Promise.all([run(), run(), run()]);
    expect(answers.toSorted()).toEqual(["0", "0", "2"]);
    expect(count("__drizzle_migrations")).toBe(2);
  });
});

describe("the shipped schema", () => {
  test("makes every table STRICT and leaves foreign keys satisfied", () => {
    migrateDb(file);
    const db = new Database(file);
    const tables = db
      .prepare<[], { name: string; strict: number }>("SELECT name, strict FROM pragma_table_list WHERE schema = 'main' AND type = 'table'")
      .all();
    const own = tables.filter((table) => !table.name.startsWith("sqlite_") && table.name !== "__drizzle_migrations");
    expect(own.length).toBeGreaterThan(5);
    expect(own.filter((table) => table.strict !== 1)).toEqual([]);
    expect(db.pragma("foreign_key_check")).toEqual([]);
    db.close();
  });
});

describe("scripts/strict-tables", () => {
  test("closes each CREATE TABLE with STRICT, and running it again changes nothing", () => {
    const migrations = writeMigrations(
      'CREATE TABLE `a` (\n\t`id` text PRIMARY KEY NOT NULL,\n\tCONSTRAINT "c" CHECK("a"."id" in (\'x\', \'y;z\'))\n);\n--> statement-breakpoint\nCREATE UNIQUE INDEX `u` ON `a` (`id`);\n',
    );
    const patch = () => {
      execFileSync(process.execPath, ["scripts/strict-tables.mjs", migrations]);
      return readFileSync(join(migrations, "0000_step.sql"), "utf8");
    };
    const once = patch();
    expect(once).toContain("'y;z'))\n) STRICT;\n--> statement-breakpoint\nCREATE UNIQUE INDEX `u` ON `a` (`id`);");
    expect(patch()).toBe(once);
    migrateDb(file, migrations);
    const db = new Database(file);
    expect(db.prepare("SELECT strict FROM pragma_table_list WHERE name = 'a'").pluck().get()).toBe(1);
    db.close();
  });
});
