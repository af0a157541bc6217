import { createHash } from "node:crypto";
import { existsSync, readFileSync, writeFileSync } from "node:fs";
import { posix } from "node:path";
import { inRoot } from "./project.mjs";

const shell = "/debrief";

/**
 * After a build: gathers what the phone's static page is made of. Its inline scripts go, as hashes, to the proxy, which allows
 * them in the page's Content-Security-Policy; its files go into the service worker, which keeps them for work without a signal.
 */
export function writePhoneShell() {
  const html = readFileSync(inRoot(".next", "server", "app", `${shell}.html`), "utf8");
  writeFileSync(inRoot(".next", "phone-shell.json"), JSON.stringify({ scriptHashes: inlineScriptHashes(html) }));

  const source = readFileSync(inRoot("scripts", "worker", "debrief-worker.js"), "utf8");
  const assets = shellAssets(html);
  const policy = readFileSync(inRoot("lib", "http", "content-security.ts"), "utf8");
  const id = createHash("sha256")
    .update([html, source, policy, ...assets].join("\0"))
    .digest("hex")
    .slice(0, 16);
  const build = JSON.stringify({ id, shell, assets });
  writeFileSync(inRoot("public", "sw.js"), `const BUILD = ${build};\n${source}`);
}

function inlineScriptHashes(html) {
  const hashes = new Set();
  for (const [, attributes, body] of html.matchAll(/<script\b([^>]*)>([\s\S]*?)<\/script>/g)) {
    if (/\ssrc=/.test(attributes)) continue;
    hashes.add(`sha256-${createHash("sha256").update(body).digest("base64")}`);
  }
  return [...hashes];
}

/** Every script, style sheet and font the page names, and the fonts its style sheets name. */
function shellAssets(html) {
  const found = new Set(["/debrief.webmanifest"]);
  for (const [path] of html.matchAll(/\/_next\/static\/[\w./~-]+\.(?:js|css|woff2)/g)) found.add(path);
  for (const [path] of html.matchAll(/(?<=href=")\/icon[\w./?=-]+/g)) found.add(path);
  for (const path of clientChunks()) found.add(path);
  for (const path of [...found].filter((name) => name.endsWith(".css"))) {
    const css = readFileSync(inRoot(path.replace("/_next/", ".next/")), "utf8");
    for (const [, url] of css.matchAll(/url\(["']?([^"')]+\.woff2)["']?\)/g)) found.add(posix.resolve(posix.dirname(path), url));
  }
  return [...found].sort();
}

/** The scripts of the page's client components, those that are fetched later included. */
function clientChunks() {
  const manifest = inRoot(".next", "server", "app", "(phone)", "debrief", "page_client-reference-manifest.js");
  if (!existsSync(manifest)) return [];
  const text = readFileSync(manifest, "utf8");
  return [...text.matchAll(/(?:\/_next\/)?static\/chunks\/[\w./~-]+\.(?:js|css)/g)].map(([path]) =>
    path.startsWith("/") ? path : `/_next/${path}`,
  );
}
