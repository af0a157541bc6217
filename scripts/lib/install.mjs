import { createHash } from "node:crypto";
import { accessSync, constants, existsSync, mkdirSync, mkdtempSync, readFileSync, rmdirSync, writeFileSync } from "node:fs";
import { tmpdir } from "node:os";
import { delimiter, join } from "node:path";
import { fail, inRoot, root } from "./project.mjs";
import { runCommand, runNode } from "./run-command.mjs";

const stampFile = inRoot("node_modules", ".greenarc-install");

/** What the installed packages depend on: the lock, and the Node that native code was compiled for. */
function wantedStamp() {
  return createHash("sha256")
    .update(readFileSync(inRoot("package-lock.json")))
    .update(process.versions.modules)
    .digest("hex");
}

/** Installs the packages when they are missing or older than the lock; otherwise does nothing. */
export async function install() {
  requireWritable(root);
  const wanted = wantedStamp();
  if (existsSync(stampFile) && readFileSync(stampFile, "utf8") === wanted) return;
  if (!(matchesLock() && (await nativeCodeLoads()))) await installPackages();
  writeFileSync(stampFile, wanted);
}

export function requireWritable(folder) {
  try {
    mkdirSync(folder, { recursive: true });
    rmdirSync(mkdtempSync(join(folder, ".write-check-"))); // asked by doing: as root, access() says yes on a read-only mount's neighbour
  } catch (error) {
    fail(`Greenarc has to write in ${folder}, and cannot (${error.code}). Make it writable for this user, or copy the project elsewhere.`);
  }
}

/** True when npm's own record of what it installed has every package of the lock at the lock's version. */
function matchesLock() {
  const record = inRoot("node_modules", ".package-lock.json");
  if (!existsSync(record)) return false;
  const wanted = JSON.parse(readFileSync(inRoot("package-lock.json"), "utf8")).packages;
  const present = JSON.parse(readFileSync(record, "utf8")).packages;
  return Object.entries(wanted).every(
    ([path, entry]) => path === "" || entry.optional || entry.devOptional || present[path]?.version === entry.version,
  );
}

async function nativeCodeLoads() {
  const check = `const Database = require("better-sqlite3"); new Database(":memory:").close(); require("@node-rs/argon2");`;
  return (await runNode(["-e", check], { stdio: "ignore" })) === 0;
}

async function installPackages() {
  console.log("Installing packages (a minute or two, longer where better-sqlite3 has to be compiled) …");
  const env = { ...process.env };
  for (const name of Object.keys(env)) if (/^(NODE_ENV|npm_config_(omit|only|production|include))$/i.test(name)) delete env[name];

  const log = [];
  const npm = process.env.npm_execpath && /\.c?js$/.test(process.env.npm_execpath) ? [process.execPath, process.env.npm_execpath] : ["npm"];
  const [command, ...before] = npm;
  const args = [...before, "ci", "--include=dev", "--no-audit", "--no-fund", "--loglevel=error"];
  const code = await runCommand(command, args, { env, onOutput: (chunk) => log.push(chunk) });
  if (code === 0 && (await nativeCodeLoads())) return;

  const missing = ["python3", "make", "g++"].filter((tool) => !onPath(tool));
  const text = Buffer.concat(log).toString("utf8");
  if (missing.length > 0 && /better-sqlite3|gyp/.test(text))
    fail(
      `No prebuilt better-sqlite3 is to be had here and compiling it needs ${missing.join(", ")}. On Debian: apt-get install -y python3 make g++`,
    );
  if (code === 127) fail("Greenarc needs npm, which comes with Node 20, and finds none on the PATH.");
  const logFile = join(tmpdir(), "greenarc-install.log");
  writeFileSync(logFile, text);
  fail(`npm ci failed: ${lastErrorLine(text)} (the whole of it: ${logFile})`);
}

function lastErrorLine(text) {
  const lines = text.split("\n").filter((line) => /npm error/.test(line) && !/complete log|A complete/.test(line));
  return (lines[0] ?? text.trim().split("\n").at(-1) ?? "no output").replace(/npm error\s*/g, "").trim();
}

function onPath(tool) {
  return (process.env.PATH ?? "").split(delimiter).some((folder) => {
    try {
      accessSync(join(folder, tool), constants.X_OK);
      return true;
    } catch {
      return false;
    }
  });
}
