import { SortieForm } from "@/components/sortie/sortie-form";
import { EmptyState } from "@/components/ui/empty-state";
import { PageHeader } from "@/components/ui/page-header";
import { requestCtx } from "@/lib/auth/request-ctx";
import { may, whoMay } from "@/lib/workflow/permissions";
import { BinderPage } from "../../binder-page";
import { sortieOffers } from "../sortie-offers";

export const metadata = { title: "Plan a sortie" };

export default async function NewSortiePage({ params }: { params: Promise<{ programme: string }> }) {
  const { programme } = await params;
  const { db, actor, today } = await requestCtx();
  if (!may(actor, "plan sorties"))
    return (
      <BinderPage>
        <EmptyState title="Planning a sortie is the engineer’s.">{whoMay("plan sorties")}</EmptyState>
      </BinderPage>
    );
  const offers = sortieOffers({ db, actor }, programme);
  return (
    <BinderPage>
      <PageHeader title="Plan a sortie" lead="Its findings show as soon as it is planned; the pilot then reads and accepts each card." />
      <SortieForm programmeId={programme} today={today} {...offers} />
    </BinderPage>
  );
}
