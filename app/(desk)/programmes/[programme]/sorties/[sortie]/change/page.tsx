import { SortieForm } from "@/components/sortie/sortie-form";
import { EmptyState } from "@/components/ui/empty-state";
import { PageHeader } from "@/components/ui/page-header";
import { requestCtx } from "@/lib/auth/request-ctx";
import { whoMay } from "@/lib/workflow/permissions";
import { getSortie } from "@/lib/workflow/sortie/queries";
import { orNotFound } from "../../../../../or-not-found";
import { BinderPage } from "../../../binder-page";
import { sortieOffers } from "../../sortie-offers";

export const metadata = { title: "Change the sortie" };

export default async function ChangeSortiePage({ params }: { params: Promise<{ programme: string; sortie: string }> }) {
  const { programme, sortie: id } = await params;
  const { db, actor, today } = await requestCtx();
  const { sortie, crew, cards, may } = orNotFound(() => getSortie(db, actor, id, { today }));
  if (!may.change)
    return (
      <BinderPage>
        <EmptyState title="This sortie cannot be changed here.">
          {sortie.state === "planned" || sortie.state === "briefed"
            ? whoMay("plan sorties")
            : `It is ${sortie.state}: what was flown stands.`}
        </EmptyState>
      </BinderPage>
    );
  const offers = sortieOffers({ db, actor }, programme);
  const chosen = cards.map(({ revisionId }) => revisionId);
  const missing = cards
    .filter(({ revisionId }) => !offers.cards.some((offer) => offer.revisionId === revisionId))
    .map(({ cardId, number, revisionId, letter, state, document: { content } }) => ({
      id: cardId,
      name: `Card ${number} ${content.title}`,
      kind: content.kind,
      revisionId,
      letter,
      state,
      loading: content,
    }));
  return (
    <BinderPage>
      <PageHeader
        title={`Change sortie ${sortie.number}`}
        lead={
          sortie.state === "briefed"
            ? "It is briefed: a change drops it to planned, and it is briefed again."
            : "Findings and mass follow at once."
        }
      />
      <SortieForm
        programmeId={programme}
        today={today}
        {...offers}
        cards={[...missing, ...offers.cards]}
        planned={{
          id,
          version: sortie.version,
          values: {
            programmeId: programme,
            kind: sortie.kind,
            plannedOn: sortie.plannedOn,
            configurationId: sortie.configurationId,
            crew: crew.map(({ userId, name, role, massKg }) => ({
              userId,
              name,
              role: role === "pilot" ? ("pilot" as const) : ("observer" as const),
              massKg,
            })),
            revisionIds: chosen,
            settings: sortie.settings,
          },
        }}
      />
    </BinderPage>
  );
}
