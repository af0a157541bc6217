// The phone's service worker. The build puts `const BUILD = { id, shell, assets }` in front of it.
// It keeps the debrief page and its files, nothing else: what people enter is kept by the page itself, and the interface is never cached.
// It never reloads a page: a half-written debrief stays as it is, and a new build is used the next time the page is opened.

const prefix = "greenarc-shell-";
const cacheName = prefix + BUILD.id;

self.addEventListener("install", (event) => event.waitUntil(keepShell().then(() => self.skipWaiting())));
self.addEventListener("activate", (event) => event.waitUntil(dropOldShells().then(() => self.clients.claim())));

async function keepShell() {
  const cache = await caches.open(cacheName);
  await Promise.all(
    [BUILD.shell, ...BUILD.assets].map(async (path) => {
      const response = await fetch(path, { cache: "reload" });
      if (!response.ok || response.redirected) throw new Error(`${path} answered ${response.status}`);
      await cache.put(path, response);
    }),
  );
}

/** One earlier build stays, for a page of it that is still open. */
async function dropOldShells() {
  const names = (await caches.keys()).filter((name) => name.startsWith(prefix) && name !== cacheName);
  await Promise.all(names.slice(0, -1).map((name) => caches.delete(name)));
}

self.addEventListener("fetch", (event) => {
  const { request } = event;
  const url = new URL(request.url);
  if (request.method !== "GET" || url.origin !== self.location.origin) return;
  const isShell = url.pathname === BUILD.shell || url.pathname.startsWith(`${BUILD.shell}/`);
  if (request.mode === "navigate" && isShell) event.respondWith(fromCache(BUILD.shell, request));
  else if (url.pathname.startsWith("/_next/static/") || BUILD.assets.includes(url.pathname + url.search))
    event.respondWith(fromCache(request, request));
});

/** The kept answer carries the headers it was sent with, its Content-Security-Policy among them. */
async function fromCache(key, request) {
  const own = await caches.open(cacheName);
  return (await own.match(key)) ?? (await caches.match(key)) ?? fetch(request);
}
