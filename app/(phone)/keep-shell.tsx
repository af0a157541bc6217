"use client";

import { useEffect } from "react";

/** Asks the browser to keep this page for work without a signal. Without a service worker the page works as long as there is one. */
export function KeepShell() {
  useEffect(() => {
    if (process.env.NODE_ENV !== "production" || !("serviceWorker" in navigator)) return;
    navigator.serviceWorker.register("/sw.js", { scope: "/debrief", updateViaCache: "none" }).catch(() => undefined);
  }, []);
  return null;
}
