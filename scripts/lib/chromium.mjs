import { accessSync, constants, existsSync } from "node:fs";
import { delimiter, join } from "node:path";
import { runCommand } from "./run-command.mjs";

const names = ["chromium", "chromium-browser", "google-chrome", "google-chrome-stable"];

/** The installed Chromium to test with: the one named by CHROMIUM_PATH, one on the PATH, or Playwright's own. */
export async function findChromium() {
  if (process.env.CHROMIUM_PATH) return existsSync(process.env.CHROMIUM_PATH) ? process.env.CHROMIUM_PATH : undefined;
  const folders = [...(process.env.PATH ?? "").split(delimiter), "/usr/bin", "/usr/local/bin", "/snap/bin"];
  const applications = [
    "/Applications/Chromium.app/Contents/MacOS/Chromium",
    "/Applications/Google Chrome.app/Contents/MacOS/Google Chrome",
  ];
  const candidates = [...folders.flatMap((folder) => names.map((name) => join(folder, name))), ...applications];
  const installed = candidates.find(isExecutable);
  if (installed) return installed;
  const { chromium } = await import("@playwright/test");
  const own = chromium.executablePath();
  return existsSync(own) ? own : undefined;
}

/** The same, after installing it where that is possible: on Debian as root. */
export async function findOrInstallChromium() {
  const found = await findChromium();
  if (found || process.env.CHROMIUM_PATH) return found;
  if (!(existsSync("/etc/debian_version") && process.getuid?.() === 0)) return undefined;
  console.log("Installing Chromium for the browser tests …");
  const options = { env: { ...process.env, DEBIAN_FRONTEND: "noninteractive" }, onOutput: () => undefined };
  await runCommand("apt-get", ["update", "-q"], options);
  await runCommand("apt-get", ["install", "-y", "-q", "--no-install-recommends", "chromium"], options);
  return findChromium();
}

export const howToInstall =
  "The browser tests need Chromium and find none. Debian: apt-get install -y chromium; or name one: CHROMIUM_PATH=/path/to/chromium";

function isExecutable(file) {
  try {
    accessSync(file, constants.X_OK);
    return true;
  } catch {
    return false;
  }
}
