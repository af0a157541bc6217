import { statfs } from "node:fs/promises";
import { dirname } from "node:path";
import type { Db } from "@/db/open";

/** Below this the database may soon refuse to write. */
const lowDiskBytes = 256 * 1024 * 1024;

export type Health = {
  status: "ok" | "failing";
  process: "ok";
  database: "ok" | "failing";
  disk: "ok" | "low" | "failing";
  schemaVersion: number | null;
};

/** What a monitor wants to know, and nothing that a stranger could use. */
export async function checkHealth(openDatabase: () => Db, databaseFile: string): Promise<Health> {
  const schemaVersion = readSchemaVersion(openDatabase);
  const disk = await readDisk(dirname(databaseFile));
  const database = schemaVersion === null ? "failing" : "ok";
  return { status: database === "ok" && disk === "ok" ? "ok" : "failing", process: "ok", database, disk, schemaVersion };
}

/** How many migrations the database has had; null when it cannot be read. */
function readSchemaVersion(openDatabase: () => Db): number | null {
  try {
    return openDatabase().$client.prepare<[], { n: number }>("SELECT count(*) AS n FROM __drizzle_migrations").get()?.n ?? null;
  } catch {
    return null;
  }
}

async function readDisk(folder: string): Promise<Health["disk"]> {
  try {
    const { bavail, bsize } = await statfs(folder);
    return bavail * bsize < lowDiskBytes ? "low" : "ok";
  } catch {
    return "failing";
  }
}
