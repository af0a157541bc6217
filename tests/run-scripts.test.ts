import { spawn } from "node:child_process";
import { mkdtempSync, rmSync, writeFileSync } from "node:fs";
import { createServer, type Server } from "node:net";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { afterAll, beforeAll, describe, expect, test } from "vitest";

let folder: string;
let busy: Server;
let busyPort = 0;

beforeAll(async () => {
  folder = mkdtempSync(join(tmpdir(), "greenarc-scripts-"));
  writeFileSync(
    join(folder, "old-node.cjs"),
    'Object.defineProperty(process, "versions", { value: { ...process.versions, node: "18.20.4" } });',
  );
  busy = createServer();
  await new Promise<void>((done) => busy.listen(0, "127.0.0.1", done));
  const address = busy.address();
  busyPort = typeof address === "object" && address ? address.port : 0;
});
afterAll(() => {
  busy.close();
  rmSync(folder, { recursive: true, force: true });
});

type Ended = { code: number | null; said: string };

function run(args: string[], settings: Record<string, string | undefined>): Promise<Ended> {
  const cleared = {
    NEXTAUTH_SECRET: undefined,
    NEXTAUTH_URL: undefined,
    GREENARC_DEMO: undefined,
    DEMO_PASSWORD: undefined,
    NODE_ENV: undefined,
  };
  const env = {
    ...process.env,
    ...cleared,
    DATABASE_FILE: join(folder, "data", "greenarc.db"),
    ...settings,
  } as unknown as NodeJS.ProcessEnv;
  return new Promise((done) => {
    const child = spawn(process.execPath, args, { cwd: process.cwd(), env, stdio: ["ignore", "pipe", "pipe"] });
    let said = "";
    child.stdout.on("data", (chunk) => {
      said += chunk;
    });
    child.stderr.on("data", (chunk) => {
      said += chunk;
    });
    child.on("close", (code) => done({ code, said: said.trim() }));
  });
}

describe("each of these ends with one clear line and exit 1", () => {
  test.each(["demo", "dev", "start", "test", "build", "setup"])("%s under an old Node", async (script) => {
    const { code, said } = await run(["--require", join(folder, "old-node.cjs"), `scripts/${script}.mjs`], {});
    expect(said).toBe("Greenarc needs Node 20 (20.19 or later); this is Node 18.20.4. Install it, for example with: nvm install 20");
    expect(code).toBe(1);
  });

  test.each(["demo", "dev"])("%s on a port that is taken", async (script) => {
    const { code, said } = await run([`scripts/${script}.mjs`], { PORT: String(busyPort) });
    expect(said).toMatch(new RegExp(`^Port ${busyPort} on 127.0.0.1 is in use\\. .*PORT=`));
    expect(said.split("\n")).toHaveLength(1);
    expect(code).toBe(1);
  });

  test.each(["0", "65536", "30x0", "-1"])("a demo on port %s", async (PORT) => {
    expect(await run(["scripts/demo.mjs"], { PORT })).toEqual({ code: 1, said: `PORT is ${PORT}; it must be a number from 1 to 65535.` });
  });
});

describe("a production start", () => {
  const check = (settings: Record<string, string | undefined>) => run(["--import", "tsx", "scripts/check-start.ts"], settings);
  const sound = { NEXTAUTH_SECRET: "x".repeat(32), NEXTAUTH_URL: "https://greenarc.example" };

  test("goes ahead with a secret, an address and an empty database", async () => {
    expect(await check(sound)).toEqual({ code: 0, said: "" });
  });

  test.each([
    ["no secret", { NEXTAUTH_SECRET: undefined }, "NEXTAUTH_SECRET"],
    ["an empty secret", { NEXTAUTH_SECRET: "" }, "NEXTAUTH_SECRET"],
    ["a secret of 31 characters", { NEXTAUTH_SECRET: "x".repeat(31) }, "NEXTAUTH_SECRET"],
    ["no address", { NEXTAUTH_URL: undefined }, "NEXTAUTH_URL"],
    ["an address that is none", { NEXTAUTH_URL: "greenarc" }, "NEXTAUTH_URL"],
    ["shown demo sign-ins", { GREENARC_DEMO: "1" }, "GREENARC_DEMO"],
    ["a day that does not exist", { DEMO_DATE: "2026-02-30" }, "DEMO_DATE"],
  ])("refuses %s and names the setting", async (_, settings, name) => {
    const { code, said } = await check({ ...sound, ...settings });
    expect(said).toMatch(new RegExp(`^${name}: `));
    expect(code).toBe(1);
  });

  test("refuses a database whose demo accounts still open with the demo password", async () => {
    const program = join(folder, "add.mts");
    const at = (path: string) => JSON.stringify(join(process.cwd(), path));
    writeFileSync(
      program,
      `import { migrateDb } from ${at("db/migrate.ts")};
import { openDb } from ${at("db/open.ts")};
import { users } from ${at("db/schema/index.ts")};
import { hashPassword } from ${at("lib/auth/password.ts")};
const file = process.env.DATABASE_FILE!;
migrateDb(file);
const add = (email: string, passwordHash: string) => openDb(file).insert(users).values({ id: email, email, name: "x", passwordHash, createdAt: "2026-01-01T00:00:00.000Z" }).run();
add("engineer@harrowfen.example", await hashPassword("cowl-open-68"));
add("pilot@harrowfen.example", await hashPassword("changed since then"));`,
    );
    const DATABASE_FILE = join(folder, "demo.db");
    expect(await run(["--import", "tsx", program], { DATABASE_FILE })).toEqual({ code: 0, said: "" });
    const { code, said } = await check({ ...sound, DATABASE_FILE });
    expect(said).toMatch(/^DATABASE_FILE: .*demo accounts.*\(engineer@harrowfen\.example\)/);
    expect(code).toBe(1);
  }, 60_000); // two processes, one after the other, and two slow hashes
});
