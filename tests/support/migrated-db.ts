import { join } from "node:path";
import Database from "better-sqlite3";
import { drizzle } from "drizzle-orm/better-sqlite3";
import { readMigrationFiles } from "drizzle-orm/migrator";
import type { Db } from "@/db/open";
import * as schema from "@/db/schema";

let template: Buffer | undefined;

/** A real database in memory, with every migration applied: migrated once a worker, copied for each test. */
export function migratedDb(): Db {
  template ??= migrate();
  const client = new Database(template);
  client.pragma("foreign_keys = ON");
  return drizzle(client, { schema });
}

function migrate(): Buffer {
  const client = new Database(":memory:");
  for (const { sql } of readMigrationFiles({ migrationsFolder: join(import.meta.dirname, "../../db/migrations") }))
    for (const statement of sql) client.exec(statement);
  return client.serialize();
}
