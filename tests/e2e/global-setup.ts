import { existsSync, mkdtempSync, rmSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { buildIsStale } from "../../scripts/lib/build-app.mjs";
import { findChromium, howToInstall } from "../../scripts/lib/chromium.mjs";
import { prepareDemoData } from "../../scripts/lib/demo-data.mjs";
import { demoPassword } from "../../scripts/lib/demo-settings.mjs";
import { inRoot } from "../../scripts/lib/project.mjs";

/** Fills one database; every test works on a copy of it. */
export default async function globalSetup(): Promise<() => void> {
  if (!existsSync(inRoot(".next", "phone-shell.json")))
    throw new Error("Nothing is built: run npm run build first, or npm test, which does.");
  if (buildIsStale()) console.warn("The build is older than the sources; npm run build makes it new.");
  process.env.CHROMIUM_PATH ||= await findChromium();
  if (!process.env.CHROMIUM_PATH) throw new Error(howToInstall);

  const folder = mkdtempSync(join(tmpdir(), "greenarc-e2e-"));
  process.env.E2E_TEMPLATE = join(folder, "template.db");
  process.env.DEMO_PASSWORD = demoPassword;
  await prepareDemoData(process.env.E2E_TEMPLATE);
  return () => rmSync(folder, { recursive: true, force: true });
}
