import { mkdtempSync, rmSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { afterEach, beforeEach, expect, test } from "vitest";
import { migrateDb } from "@/db/migrate";
import { openDb } from "@/db/open";
import { checkHealth } from "@/lib/health/check-health";

let folder: string;
let file: string;

beforeEach(() => {
  folder = mkdtempSync(join(tmpdir(), "greenarc-health-"));
  file = join(folder, "greenarc.db");
});
afterEach(() => rmSync(folder, { recursive: true, force: true }));

test("a migrated database on a disk with room is healthy and tells its schema version", async () => {
  const applied = migrateDb(file);
  const db = openDb(file);
  expect(await checkHealth(() => db, file)).toEqual({ status: "ok", process: "ok", database: "ok", disk: "ok", schemaVersion: applied });
  db.$client.close();
});

test("a database that was never migrated is reported, not thrown", async () => {
  const db = openDb(file);
  expect(await checkHealth(() => db, file)).toMatchObject({ status: "failing", database: "failing", schemaVersion: null });
  db.$client.close();
});

test("a folder that is gone is reported, and so is a database that cannot be opened", async () => {
  const lost = () => {
    throw new Error("unable to open database file");
  };
  const health = await checkHealth(lost, join(folder, "gone", "greenarc.db"));
  expect(health).toMatchObject({ status: "failing", database: "failing", disk: "failing" });
});
