import { existsSync, mkdtempSync, readFileSync, rmSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { buildIfStale } from "./build-app.mjs";
import { findOrInstallChromium, howToInstall } from "./chromium.mjs";
import { install } from "./install.mjs";
import { inRoot, root } from "./project.mjs";
import { runNode } from "./run-command.mjs";

process.chdir(root);
await install();

const reports = mkdtempSync(join(tmpdir(), "greenarc-test-"));
const unitReport = join(reports, "unit.json");
const browserReport = join(reports, "browser.json");
const program = (...parts) => inRoot("node_modules", ...parts);
const env = { ...process.env, NEXT_TELEMETRY_DISABLED: "1" };
let passed = 0;
let failed = 0;

/** A stage that has no tests to count is one test by itself when it fails. */
async function stage(title, run) {
  console.log(`\n── ${title}`);
  const code = await run();
  if (code !== 0) console.log(`${title}: failed`);
  return code === 0;
}

function count(good, bad, stageOk) {
  passed += good;
  failed += bad;
  if (!stageOk && bad === 0) failed += 1;
}

const lintOk = await stage("Lint and format", () => runNode([program("@biomejs", "biome", "bin", "biome"), "check", "."], { env }));
count(0, 0, lintOk);

const typesOk = await stage("Types", async () => {
  // Writes next-env.d.ts and the route types, which a fresh clone does not have.
  const generated = await runNode([program("next", "dist", "bin", "next"), "typegen"], { env, onOutput: () => undefined });
  return generated || runNode([program("typescript", "bin", "tsc"), "--noEmit"], { env });
});
count(0, 0, typesOk);

const unitOk = await stage("Unit, reference and use-case tests", () =>
  runNode([program("vitest", "vitest.mjs"), "run", "--reporter=default", "--reporter=json", `--outputFile.json=${unitReport}`], { env }),
);
const unit = readReport(unitReport);
const emptyFiles = (unit?.testResults ?? []).filter((file) => file.status === "failed" && file.assertionResults.length === 0).length;
count(unit?.numPassedTests ?? 0, (unit?.numFailedTests ?? 0) + emptyFiles, unitOk);

const buildOk = await stage("Build", () => buildIfStale().then(() => 0, complain));
count(0, 0, buildOk);

let browserOk = false;
if (buildOk) {
  browserOk = await stage("Browser tests", async () => {
    const chromium = await findOrInstallChromium();
    if (!chromium) return complain(howToInstall);
    const settings = { ...env, CHROMIUM_PATH: chromium, PLAYWRIGHT_JSON_OUTPUT_NAME: browserReport };
    return runNode([program("@playwright", "test", "cli.js"), "test", "--reporter=list,json"], { env: settings });
  });
  const stats = readReport(browserReport)?.stats ?? { expected: 0, unexpected: 0, flaky: 0 };
  count(stats.expected, stats.unexpected + stats.flaky, browserOk);
}

rmSync(reports, { recursive: true, force: true });
console.log(`\n${passed} passed, ${failed} failed`);
process.exitCode = lintOk && typesOk && unitOk && buildOk && browserOk ? 0 : 1;

function complain(reason) {
  console.error(reason instanceof Error ? reason.message : reason);
  return 1;
}

function readReport(file) {
  return existsSync(file) ? JSON.parse(readFileSync(file, "utf8")) : undefined;
}
