import { existsSync } from "node:fs";
import { verify } from "@node-rs/argon2";
import { migrateDb } from "../db/migrate";
import { openDb } from "../db/open";
import { users } from "../db/schema";
import { readEnv } from "../lib/env";
import { demoEmails, demoPassword } from "./lib/demo-settings.mjs";

/** What keeps a production start from going ahead: one line each, naming the setting that is wanted. */
async function findProblems(): Promise<string[]> {
  const { env, problems } = readEnv(process.env);
  if (!env) return problems;
  const found: string[] = [];
  if (!env.NEXTAUTH_SECRET) found.push("NEXTAUTH_SECRET: not set. It signs the sessions; make one with: openssl rand -base64 48");
  if (!env.NEXTAUTH_URL) found.push("NEXTAUTH_URL: not set. It is the address people open, such as https://greenarc.example");
  if (env.GREENARC_DEMO)
    found.push("GREENARC_DEMO: is 1, which shows the demo sign-ins to everybody. Take it out; for a demo run: npm run demo");
  if (env.DEMO_DATE)
    found.push("DEMO_DATE: is set, which fixes the day that calibrations and releases are judged on. Take it out; it is for tests.");
  if (found.length > 0) return found;

  try {
    migrateDb(env.DATABASE_FILE);
  } catch (error) {
    return [`DATABASE_FILE: ${env.DATABASE_FILE} cannot be used. ${error instanceof Error ? error.message : String(error)}`];
  }
  const open = await demoAccountsIn(env.DATABASE_FILE, [demoPassword, ...(env.DEMO_PASSWORD ? [env.DEMO_PASSWORD] : [])]);
  if (open.length > 0)
    found.push(
      `DATABASE_FILE: ${env.DATABASE_FILE} holds demo accounts that still open with the demo password (${open.join(", ")}). Point it at a database of your own.`,
    );
  return found;
}

async function demoAccountsIn(file: string, passwords: string[]): Promise<string[]> {
  if (!existsSync(file)) return [];
  const db = openDb(file);
  const accounts = db.select({ email: users.email, hash: users.passwordHash }).from(users).all();
  db.$client.close();
  const open: string[] = [];
  for (const { email, hash } of accounts.filter((account) => demoEmails.includes(account.email)))
    for (const password of passwords) if (!open.includes(email) && (await verify(hash, password))) open.push(email);
  return open;
}

const problems = await findProblems();
for (const line of problems) console.error(line);
if (problems.length > 0) {
  console.error("Greenarc does not start until this is mended.");
  process.exit(1);
}
