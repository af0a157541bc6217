import { EmptyState } from "@/components/ui/empty-state";
import { PageHeader } from "@/components/ui/page-header";
import { requestCtx } from "@/lib/auth/request-ctx";
import { may, whoMay } from "@/lib/workflow/permissions";
import { getProgramme } from "@/lib/workflow/programme/queries";
import { orNotFound } from "../../../../or-not-found";
import { BinderPage } from "../../binder-page";
import { createCardAction } from "./actions";
import { NewCardForm } from "./new-card-form";

export const metadata = { title: "New card" };

export default async function NewCardPage({ params }: { params: Promise<{ programme: string }> }) {
  const { programme } = await params;
  const { db, actor, newId } = await requestCtx();
  orNotFound(() => getProgramme(db, actor, programme));
  return (
    <BinderPage>
      {may(actor, "write cards") ? (
        <>
          <PageHeader title="New card" lead="It starts as a draft, revision A. Test points are put on it from the shelf." />
          <NewCardForm action={createCardAction.bind(null, programme, newId())} />
        </>
      ) : (
        <EmptyState title="Writing a card is the engineer’s.">{whoMay("write cards")}</EmptyState>
      )}
    </BinderPage>
  );
}
