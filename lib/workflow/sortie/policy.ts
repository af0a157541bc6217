import type { Actor } from "@/lib/auth/roles";
import type { SortieState } from "@/lib/testcards/words";
import { may } from "../permissions";

type Person = Pick<Actor, "roles">;
export type SortieFacts = { state: SortieState };

const before = (state: SortieState) => state === "planned" || state === "briefed";

/** A change after the brief drops the sortie back to planned. */
export const mayChangeSortie = (actor: Person, { state }: SortieFacts) => may(actor, "plan sorties") && before(state);
export const mayAnswerCard = (actor: Person, { state }: SortieFacts) => may(actor, "accept cards") && before(state);
export const mayBriefSortie = (actor: Person, { state }: SortieFacts) => may(actor, "brief and debrief") && state === "planned";
/** What happened may always be entered: an unbriefed sortie too. */
export const maySubmitDebrief = (actor: Person, { state }: SortieFacts) =>
  may(actor, "brief and debrief") && state !== "debriefed" && state !== "closed";
export const mayDisposePoint = (actor: Person, { state }: SortieFacts) => may(actor, "amend readings") && state === "debriefed";
export const mayProposeStep = (actor: Person, { state }: SortieFacts) => may(actor, "propose a step") && state === "debriefed";
export const mayCloseSortie = (actor: Person, { state }: SortieFacts) => may(actor, "plan sorties") && state === "debriefed";
export const mayCancelSortie = mayChangeSortie;
