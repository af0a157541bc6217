import { createHash } from "node:crypto";
import { existsSync, readdirSync, readFileSync, statSync, writeFileSync } from "node:fs";
import { join } from "node:path";
import { writePhoneShell } from "./phone-shell.mjs";
import { inRoot } from "./project.mjs";
import { runNode } from "./run-command.mjs";

const stampFile = inRoot(".next", "greenarc-build");

/** Everything a build reads. */
const sources = ["app", "components", "lib", "db", "fonts", "public", "scripts/worker", "scripts/lib/phone-shell.mjs"];
const sourceFiles = ["proxy.ts", "next.config.ts", "postcss.config.mjs", "tsconfig.json", "package-lock.json"];

/** True when there is no build, or the sources changed since. */
export function buildIsStale() {
  return !existsSync(stampFile) || readFileSync(stampFile, "utf8") !== sourceStamp();
}

export async function buildIfStale() {
  if (buildIsStale()) await buildApp();
}

export async function buildApp() {
  const stamp = sourceStamp();
  const env = { ...process.env, NODE_ENV: "production", NEXT_TELEMETRY_DISABLED: "1" };
  const code = await runNode([inRoot("node_modules", "next", "dist", "bin", "next"), "build"], { env });
  if (code !== 0) throw new Error("The build failed; the reason stands above.");
  writePhoneShell();
  writeFileSync(stampFile, stamp);
}

function sourceStamp() {
  const hash = createHash("sha256").update(process.versions.node);
  const add = (path) => {
    const full = inRoot(path);
    if (!existsSync(full) || path === "public/sw.js") return;
    if (statSync(full).isDirectory()) for (const name of readdirSync(full).sort()) add(join(path, name));
    else hash.update(path).update("\0").update(readFileSync(full)).update("\0");
  };
  for (const path of [...sources, ...sourceFiles]) add(path);
  return hash.digest("hex");
}
