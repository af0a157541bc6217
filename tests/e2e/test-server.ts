import { type ChildProcess, spawn } from "node:child_process";
import { copyFileSync, mkdtempSync, rmSync } from "node:fs";
import { createServer } from "node:net";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { inRoot, root } from "../../scripts/lib/project.mjs";

export type TestServer = { url: string; databaseFile: string; stop: () => Promise<void> };

const program = `const { serve } = await import(${JSON.stringify(inRoot("scripts", "lib", "serve.mjs"))}); console.log("ready " + await serve(Number(process.env.PORT)));`;

/** The built program on a free port, with a database of its own: a copy of the filled one. */
export async function startServer(): Promise<TestServer> {
  const folder = mkdtempSync(join(tmpdir(), "greenarc-e2e-server-"));
  const databaseFile = join(folder, "greenarc.db");
  copyFileSync(process.env.E2E_TEMPLATE ?? "", databaseFile);
  const port = await freePort();
  const url = `http://127.0.0.1:${port}`;
  const child = spawn(process.execPath, ["--input-type=module", "-e", program], {
    cwd: root,
    stdio: ["ignore", "pipe", "pipe"],
    env: {
      ...process.env,
      PORT: String(port),
      DATABASE_FILE: databaseFile,
      FILES_DIR: join(folder, "files"),
      NEXTAUTH_URL: url,
      NEXTAUTH_SECRET: "only-for-the-browser-tests-of-this-machine",
      GREENARC_DEMO: "1",
    },
  });
  await ready(child);
  const stop = async () => {
    await ended(child);
    rmSync(folder, { recursive: true, force: true });
  };
  return { url, databaseFile, stop };
}

function freePort(): Promise<number> {
  return new Promise((done) => {
    const probe = createServer();
    probe.listen(0, "127.0.0.1", () => {
      const address = probe.address();
      probe.close(() => done(typeof address === "object" && address ? address.port : 0));
    });
  });
}

function ready(child: ChildProcess): Promise<void> {
  return new Promise((done, fail) => {
    let log = "";
    const listen = (chunk: Buffer) => {
      log += chunk;
      if (log.includes("ready http")) done();
    };
    child.stdout?.on("data", listen);
    child.stderr?.on("data", listen);
    child.once("exit", (code) => fail(new Error(`The server ended with ${code}:\n${log}`)));
  });
}

function ended(child: ChildProcess): Promise<void> {
  if (child.exitCode !== null || child.signalCode !== null) return Promise.resolve();
  return new Promise((done) => {
    child.removeAllListeners("exit");
    child.once("exit", () => done());
    child.kill("SIGTERM");
  });
}
