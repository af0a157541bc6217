// Makes every table of the generated migrations STRICT: SQLite then refuses text in a number column, and drizzle cannot say it.
import { readdirSync, readFileSync, writeFileSync } from "node:fs";
import { join } from "node:path";
import { toStrict } from "./lib/strict-sql.mjs";

const folder = process.argv[2] ?? join(import.meta.dirname, "..", "db", "migrations");
for (const name of readdirSync(folder).filter((entry) => entry.endsWith(".sql"))) {
  const file = join(folder, name);
  const before = readFileSync(file, "utf8");
  const after = toStrict(before);
  if (after !== before) writeFileSync(file, after);
}
