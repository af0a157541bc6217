import type { ReactNode } from "react";
import { classNames } from "@/components/ui/class-names";

/** A page of the binder: the sheet that lies under its tab. */
export function BinderPage({ children, wide = false }: { children: ReactNode; wide?: boolean }) {
  return (
    <main className={classNames("mx-auto w-full grow desk:px-6 desk:py-6", wide ? "max-w-[90rem]" : "max-w-6xl")}>
      <div className="border-rule bg-sheet px-4 py-6 desk:border desk:px-10 desk:py-8">{children}</div>
    </main>
  );
}
