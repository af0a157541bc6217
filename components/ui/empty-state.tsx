import type { ReactNode } from "react";

/** What belongs here, and the first step. */
export function EmptyState({ title, children, action }: { title: string; children?: ReactNode; action?: ReactNode }) {
  return (
    <div className="flex flex-col items-start gap-2 border-rule border-y py-6">
      <p className="font-bold">{title}</p>
      {children ? <div className="max-w-prose text-ink-soft">{children}</div> : null}
      {action ? <div className="mt-2">{action}</div> : null}
    </div>
  );
}
