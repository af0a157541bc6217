import { mkdirSync } from "node:fs";
import { dirname } from "node:path";
import Database from "better-sqlite3";
import { type BetterSQLite3Database, drizzle } from "drizzle-orm/better-sqlite3";
import * as schema from "./schema";

export type Db = BetterSQLite3Database<typeof schema> & { $client: Database.Database };
/** Inside a transaction, or the database itself. */
export type Tx = Pick<Db, "select" | "selectDistinct" | "insert" | "update" | "delete" | "query" | "run" | "all" | "get">;

/** Opens a database file (or ":memory:") the one way every part of Greenarc does. */
export function openDb(file: string): Db {
  if (file !== ":memory:") mkdirSync(dirname(file), { recursive: true });
  const client = new Database(file);
  client.pragma("journal_mode = WAL");
  client.pragma("foreign_keys = ON");
  client.pragma("busy_timeout = 5000");
  client.pragma("synchronous = NORMAL");
  return drizzle(client, { schema });
}
