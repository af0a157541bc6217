import type { ReactNode } from "react";
import { requestCtx } from "@/lib/auth/request-ctx";
import { getProgramme } from "@/lib/workflow/programme/queries";
import { BinderTabs } from "../../chrome/binder-tabs";
import { orNotFound } from "../../or-not-found";

export default async function ProgrammeLayout({ children, params }: { children: ReactNode; params: Promise<{ programme: string }> }) {
  const [{ db, actor }, { programme: id }] = await Promise.all([requestCtx(), params]);
  const { settings } = orNotFound(() => getProgramme(db, actor, id));
  return (
    <>
      <div className="desk:relative">
        <BinderTabs programmeId={id} />
        {settings.notice ? (
          <aside
            aria-label="Notice"
            className="border-rule border-b px-4 py-2 text-ink-soft text-sm desk:absolute desk:end-6 desk:bottom-2.5 desk:border-0 desk:p-0"
          >
            {settings.notice}
          </aside>
        ) : null}
      </div>
      {children}
    </>
  );
}
