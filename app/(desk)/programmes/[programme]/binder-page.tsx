import type { ReactNode } from "react";

/** A page of the binder: the sheet that lies under its tab. */
export function BinderPage({ children }: { children: ReactNode }) {
  return (
    <main className="mx-auto w-full max-w-6xl grow desk:px-6 desk:py-6">
      <div className="border-rule bg-sheet px-4 py-6 desk:border desk:px-10 desk:py-8">{children}</div>
    </main>
  );
}
