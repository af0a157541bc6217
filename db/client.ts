import "server-only";
import { env } from "@/lib/env";
import { type Db, openDb } from "./open";

const held = globalThis as { greenarcDb?: Db };

/** The web process's one connection, opened at first use so that a build never touches a file. */
export function getDb(): Db {
  held.greenarcDb ??= openDb(env().DATABASE_FILE);
  return held.greenarcDb;
}
