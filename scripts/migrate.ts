import { migrateDb } from "../db/migrate";
import { env } from "../lib/env";

const { DATABASE_FILE } = env();
const applied = migrateDb(DATABASE_FILE);
console.log(applied === 0 ? `${DATABASE_FILE} is up to date.` : `${DATABASE_FILE}: ${applied} migration(s) applied.`);
