import { SortieForm } from "@/components/sortie/sortie-form";
import { EmptyState } from "@/components/ui/empty-state";
import { PageHeader } from "@/components/ui/page-header";
import { requestCtx } from "@/lib/auth/request-ctx";
import { listCards } from "@/lib/workflow/card/queries";
import { may, whoMay } from "@/lib/workflow/permissions";
import { listConfigurations } from "@/lib/workflow/programme/queries";
import { listPeople } from "@/lib/workflow/team/queries";
import { BinderPage } from "../../binder-page";

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
  const cards = listCards(db, actor, programme).map(({ id, number, title, kind, inForce, revisionId, letter, state }) => ({
    id,
    name: `Card ${number} ${title}`,
    kind,
    revisionId: inForce?.revisionId ?? revisionId,
    letter: inForce?.letter ?? letter,
    state: inForce ? ("released" as const) : state,
  }));
  const configurations = listConfigurations(db, actor, programme).map(({ id, number, isCurrent, signedAt }) => ({
    id,
    number,
    isCurrent,
    signed: signedAt !== null,
  }));
  const pilots = listPeople(db, actor)
    .filter(({ roles }) => roles.includes("pilot"))
    .map(({ id, name }) => ({ id, name }));
  return (
    <BinderPage>
      <PageHeader title="Plan a sortie" lead="Its findings show as soon as it is planned; the pilot then reads and accepts each card." />
      <SortieForm programmeId={programme} today={today} cards={cards} configurations={configurations} pilots={pilots} />
    </BinderPage>
  );
}
