"use client";

import { useSyncExternalStore } from "react";

const never = () => () => undefined;

/** The debrief of the sortie whose id stands in the address. */
export function DebriefApp() {
  const path = useSyncExternalStore(
    never,
    () => window.location.pathname,
    () => null,
  );
  const sortieId = path?.split("/")[2];
  return (
    <main className="p-4">
      <h1>Debrief</h1>
      {path !== null && !sortieId && <p>Open a debrief from its sortie, or scan the code on the sheet.</p>}
    </main>
  );
}
