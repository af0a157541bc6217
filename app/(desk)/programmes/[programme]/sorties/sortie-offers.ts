import type { RequestCtx } from "@/lib/auth/request-ctx";
import { listCards } from "@/lib/workflow/card/queries";
import { listConfigurations } from "@/lib/workflow/programme/queries";
import { listPeople } from "@/lib/workflow/team/queries";

/** What a sortie can be planned with: each card at the revision in force, else its newest. */
export function sortieOffers({ db, actor }: Pick<RequestCtx, "db" | "actor">, programmeId: string) {
  const cards = listCards(db, actor, programmeId).map((card) => {
    const shown = card.inForce ?? card;
    return {
      id: card.id,
      name: `Card ${card.number} ${shown.title}`,
      kind: shown.kind,
      revisionId: shown.revisionId,
      letter: shown.letter,
      state: shown.state,
      loading: shown.loading,
    };
  });
  const configurations = listConfigurations(db, actor, programmeId).map(({ id, number, isCurrent, signedAt }) => ({
    id,
    number,
    isCurrent,
    signed: signedAt !== null,
  }));
  const pilots = listPeople(db, actor)
    .filter(({ roles }) => roles.includes("pilot"))
    .map(({ id, name }) => ({ id, name }));
  return { cards, configurations, pilots };
}
