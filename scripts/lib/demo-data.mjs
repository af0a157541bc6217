import { existsSync, renameSync, rmSync } from "node:fs";
import { fail } from "./project.mjs";
import { runNode } from "./run-command.mjs";

const files = (database) => [database, `${database}-wal`, `${database}-shm`];
const remove = (database) => {
  for (const file of files(database)) rmSync(file, { force: true });
};

/**
 * Migrates the demo database, or makes it when there is none. A new one is filled under another name and put in place whole,
 * so that a run that was broken off leaves nothing half-filled.
 */
export async function prepareDemoData(database, { fresh = false } = {}) {
  if (fresh) remove(database);
  if (existsSync(database)) return runScript("migrate", database);
  const filling = `${database}.filling`;
  remove(filling);
  console.log("Filling the demo programme …");
  await runScript("migrate", filling);
  await runScript("seed", filling);
  await runNode([
    "-e",
    `const db = new (require("better-sqlite3"))(process.argv[1]); db.pragma("wal_checkpoint(TRUNCATE)"); db.close();`,
    filling,
  ]);
  renameSync(filling, database);
  remove(filling);
}

async function runScript(name, database) {
  const log = [];
  const env = { ...process.env, DATABASE_FILE: database };
  const code = await runNode(["--import", "tsx", `scripts/${name}.ts`], { env, onOutput: (chunk) => log.push(chunk) });
  if (code !== 0) {
    process.stderr.write(Buffer.concat(log));
    fail(`The database ${database} could not be ${name === "seed" ? "filled" : "migrated"}; the reason stands above.`);
  }
}
