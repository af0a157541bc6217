import { mkdirSync } from "node:fs";
import { dirname, join } from "node:path";
import Database from "better-sqlite3";
import { readMigrationFiles } from "drizzle-orm/migrator";

const shippedMigrations = join(import.meta.dirname, "migrations");

/** How long a second process waits for the one that is migrating. */
const lockWaitMs = 60_000;

type Broken = { table: string; rowid: number | null; parent: string };

/** Brings a database file up to the schema of this program and answers how many migrations it applied. */
export function migrateDb(file: string, migrationsFolder: string = shippedMigrations): number {
  mkdirSync(dirname(file), { recursive: true });
  const client = new Database(file, { timeout: lockWaitMs });
  try {
    client.pragma("journal_mode = WAL");
    return migrateClient(client, migrationsFolder);
  } finally {
    client.close();
  }
}

/**
 * The same on an open connection; foreign keys are on afterwards.
 *
 * Trap: a table rebuild drops the old table, and with foreign keys on that deletes every row that cascades from it. The pragma that the
 * generated SQL carries does nothing inside a transaction, so it is set here, before the transaction opens. The check afterwards stands
 * inside the transaction, so that a migration that would leave an orphan leaves nothing.
 *
 * The exclusive transaction is the lock: of two processes that start at once, the second waits, then finds nothing left to do.
 * The table of applied migrations is drizzle's own, so that its tools still read it.
 */
export function migrateClient(client: Database.Database, migrationsFolder: string = shippedMigrations): number {
  client.pragma("foreign_keys = OFF");
  try {
    return client.transaction(() => applyMissing(client, migrationsFolder)).exclusive();
  } finally {
    client.pragma("foreign_keys = ON");
  }
}

function applyMissing(db: Database.Database, migrationsFolder: string): number {
  db.exec("CREATE TABLE IF NOT EXISTS __drizzle_migrations (id SERIAL PRIMARY KEY, hash text NOT NULL, created_at numeric)");
  const known = readMigrationFiles({ migrationsFolder });
  const applied = new Map(
    db
      .prepare<[], { hash: string; at: number }>("SELECT hash, created_at AS at FROM __drizzle_migrations")
      .all()
      .map((row) => [Number(row.at), row.hash]),
  );
  for (const at of applied.keys()) {
    if (!known.some((migration) => migration.folderMillis === at))
      throw new Error("This database was made by a newer Greenarc. Start that version, or restore a backup made by this one.");
  }

  const missing = known.filter((migration) => !applied.has(migration.folderMillis));
  const record = db.prepare("INSERT INTO __drizzle_migrations (hash, created_at) VALUES (?, ?)");
  for (const migration of missing) {
    for (const statement of migration.sql) db.exec(statement);
    record.run(migration.hash, migration.folderMillis);
  }
  if (missing.length > 0) refuseOrphans(db.pragma("foreign_key_check") as Broken[]);
  return missing.length;
}

function refuseOrphans(broken: Broken[]): void {
  const first = broken[0];
  if (first)
    throw new Error(
      `A migration would leave ${broken.length} row(s) without their parent (${first.table} → ${first.parent}); nothing was changed.`,
    );
}
