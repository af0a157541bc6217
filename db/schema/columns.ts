import { sql } from "drizzle-orm";
import type { SQLiteColumn } from "drizzle-orm/sqlite-core";
import { check, text } from "drizzle-orm/sqlite-core";

/** UUIDv7, minted by the caller. */
export const id = () => text("id").primaryKey();
/** UTC instant, ISO 8601. */
export const instant = (name: string) => text(name);

/** A text column that holds exactly one of a closed list of words. */
export function oneOf(name: string, column: SQLiteColumn, words: readonly string[]) {
  const list = words.map((word) => `'${word.replaceAll("'", "''")}'`).join(", ");
  return check(name, sql`${column} in (${sql.raw(list)})`);
}

export function isJson(name: string, column: SQLiteColumn) {
  return check(name, sql`json_valid(${column})`);
}

/** The same word list inside an optional column. */
export function oneOfOrNull(name: string, column: SQLiteColumn, words: readonly string[]) {
  const list = words.map((word) => `'${word.replaceAll("'", "''")}'`).join(", ");
  return check(name, sql`${column} is null or ${column} in (${sql.raw(list)})`);
}
