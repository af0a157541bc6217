import { mkdtempSync, rmSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { openDb } from "../db/open";
import { cards, programmes } from "../db/schema";
import { startServer } from "../tests/e2e/test-server";
import { prepareDemoData } from "./lib/demo-data.mjs";
import { demoPassword } from "./lib/demo-settings.mjs";

const warmUp = 5;
const rounds = 60;

/** Cookies of a signed-in engineer, as a browser would send them back. */
async function signIn(url: string): Promise<string> {
  const first = await fetch(`${url}/api/auth/csrf`);
  const { csrfToken } = (await first.json()) as { csrfToken: string };
  const cookie = first.headers.getSetCookie().map((line) => line.split(";")[0] ?? "");
  const body = new URLSearchParams({ csrfToken, email: "engineer@harrowfen.example", password: demoPassword, json: "true" });
  const signed = await fetch(`${url}/api/auth/callback/credentials`, {
    method: "POST",
    body,
    headers: { cookie: cookie.join("; ") },
    redirect: "manual",
  });
  return [...cookie, ...signed.headers.getSetCookie().map((line) => line.split(";")[0] ?? "")].join("; ");
}

async function measure(url: string, path: string, cookie: string): Promise<number[]> {
  const timesMs: number[] = [];
  for (let round = 0; round < warmUp + rounds; round++) {
    const from = performance.now();
    const answer = await fetch(url + path, { headers: { cookie }, redirect: "manual" });
    await answer.arrayBuffer();
    if (answer.status !== 200) throw new Error(`${path} answered ${answer.status}`);
    if (round >= warmUp) timesMs.push(performance.now() - from);
  }
  return timesMs.toSorted((a, b) => a - b);
}

function pathsOf(databaseFile: string): string[] {
  const db = openDb(databaseFile);
  const programme = db.select({ id: programmes.id }).from(programmes).get()?.id;
  const card = db.select({ id: cards.id }).from(cards).get()?.id;
  db.$client.close();
  const base = `/programmes/${programme}`;
  const tabs = ["", "/limits", "/test-points", "/cards", "/sorties", "/squawks"].map((tab) => base + tab);
  return ["/api/health", "/debrief", "/", ...tabs, `${base}/cards/${card}`];
}

const folder = mkdtempSync(join(tmpdir(), "greenarc-bench-"));
process.env.DEMO_PASSWORD = demoPassword;
process.env.E2E_TEMPLATE = join(folder, "template.db");
await prepareDemoData(process.env.E2E_TEMPLATE);
const server = await startServer();
try {
  const cookie = await signIn(server.url);
  console.log(`One caller, ${rounds} requests each after ${warmUp} to warm up; milliseconds.`);
  for (const path of pathsOf(server.databaseFile)) {
    const timesMs = await measure(server.url, path, cookie);
    const at = (share: number) => (timesMs[Math.floor(share * (timesMs.length - 1))] ?? Number.NaN).toFixed(1);
    console.log(`${at(0.5).padStart(8)} median ${at(0.95).padStart(8)} 95th  ${path.replace(/[0-9a-f-]{36}/g, "…")}`);
  }
} finally {
  await server.stop();
  rmSync(folder, { recursive: true, force: true });
}
