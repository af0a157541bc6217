import { and, eq, inArray } from "drizzle-orm";
import type { Tx } from "@/db/open";
import { cardRevisions, cards, configurations, memberships, sortieCards, sortieCrew, sorties } from "@/db/schema";
import type { Actor } from "@/lib/auth/roles";
import type { SortieState } from "@/lib/testcards/words";
import { Refusal } from "../errors";
import type { SortieRow } from "./rows";

const dayMs = 86_400_000;

/** A sortie of last season is a slip of the hand; one of last week may still have to be entered. */
export function requireNearDay(plannedOn: string, today: string): void {
  const days = (Date.parse(plannedOn) - Date.parse(today)) / dayMs;
  if (days < -366 || days > 731)
    throw new Refusal("invalid", "This day is more than a year back or two years ahead: check the year.", "plannedOn");
}

export function requireOpen(sortie: Pick<SortieRow, "state" | "number">, act: string): void {
  const closed: SortieState[] = ["flown", "debriefed", "closed"];
  if (closed.includes(sortie.state))
    throw new Refusal("conflict", `Sortie ${sortie.number} is ${sortie.state}: it can no longer be ${act}.`, undefined, {
      state: sortie.state,
    });
}

/** What was decided on a closed sortie stands. */
export function requireNotClosed({ state, number }: Pick<SortieRow, "state" | "number">, act: string): void {
  if (state === "closed")
    throw new Refusal("conflict", `Sortie ${number} is closed: ${act} can no longer be changed.`, undefined, { state });
}

export function requireSortieVersion(sortie: Pick<SortieRow, "version">, seen: number): void {
  if (sortie.version !== seen)
    throw new Refusal(
      "stale",
      "This sortie was changed meanwhile. Nothing was overwritten. Load it again to see what changed.",
      undefined,
      { currentVersion: sortie.version },
    );
}

type Crew = { userId: string | null; name: string; role: string; massKg: number }[];

export function requireMembers(tx: Tx, actor: Actor, crew: Crew): void {
  const ids = crew.flatMap(({ userId }) => (userId === null ? [] : [userId]));
  if (ids.length === 0) return;
  const known = tx
    .select({ id: memberships.userId })
    .from(memberships)
    .where(and(eq(memberships.teamId, actor.teamId), inArray(memberships.userId, ids)))
    .all();
  if (known.length !== new Set(ids).size)
    throw new Refusal("not-found", "No such person in your team. Choose from the list, or write a name only.", "crew");
}

export function setCrew(tx: Tx, sortieId: string, crew: Crew): void {
  tx.delete(sortieCrew).where(eq(sortieCrew.sortieId, sortieId)).run();
  tx.insert(sortieCrew)
    .values(crew.map((person, position) => ({ sortieId, position, ...person })))
    .run();
}

/** The programme's own cards, each once, none out of force, and no point id twice: a debrief could not tell two such points apart. */
export function requireCards(tx: Tx, programmeId: string, revisionIds: string[]): void {
  const rows = tx
    .select({
      id: cardRevisions.id,
      cardId: cards.id,
      number: cards.number,
      letter: cardRevisions.letter,
      state: cardRevisions.state,
      content: cardRevisions.content,
    })
    .from(cardRevisions)
    .innerJoin(cards, eq(cards.id, cardRevisions.cardId))
    .where(and(eq(cards.programmeId, programmeId), inArray(cardRevisions.id, revisionIds)))
    .all();
  if (rows.length !== revisionIds.length)
    throw new Refusal("not-found", "This programme has no such card. Choose from its cards.", "revisionIds");
  const ended = rows.find(({ state }) => state === "superseded" || state === "withdrawn");
  if (ended)
    throw new Refusal(
      "conflict",
      `Card ${ended.number} revision ${ended.letter} is ${ended.state}: choose the revision in force.`,
      "revisionIds",
    );
  if (new Set(rows.map(({ cardId }) => cardId)).size !== rows.length)
    throw new Refusal("conflict", "Two revisions of one card stand here: choose one of them.", "revisionIds");
  const points = rows.flatMap(({ content }) => content.points.map(({ id }) => id));
  if (new Set(points).size !== points.length)
    throw new Refusal("conflict", "Two of these cards carry the same point. Take it off one of them.", "revisionIds");
}

/** Sets the order; an answer stays with its revision where that one stays. */
export function setCards(tx: Tx, sortieId: string, revisionIds: string[]): void {
  const before = tx.select().from(sortieCards).where(eq(sortieCards.sortieId, sortieId)).all();
  tx.delete(sortieCards).where(eq(sortieCards.sortieId, sortieId)).run();
  tx.insert(sortieCards)
    .values(
      revisionIds.map((revisionId, position) => ({
        ...before.find((row) => row.revisionId === revisionId),
        sortieId,
        revisionId,
        position,
      })),
    )
    .run();
}

export function requireConfiguration(tx: Tx, programmeId: string, id: string): void {
  const row = tx
    .select({ id: configurations.id })
    .from(configurations)
    .where(and(eq(configurations.id, id), eq(configurations.programmeId, programmeId)))
    .get();
  if (!row) throw new Refusal("not-found", "This programme has no such configuration.", "configurationId");
}

export function currentConfiguration(tx: Tx, programmeId: string): string | null {
  const row = tx
    .select({ id: configurations.id })
    .from(configurations)
    .where(and(eq(configurations.programmeId, programmeId), eq(configurations.isCurrent, true)))
    .get();
  return row?.id ?? null;
}

/** Where the crew names a pilot of the team, it is that pilot who answers and briefs. */
export function requireThisPilot(tx: Tx, actor: Actor, sortieId: string): void {
  const pilot = tx
    .select({ userId: sortieCrew.userId, name: sortieCrew.name })
    .from(sortieCrew)
    .where(and(eq(sortieCrew.sortieId, sortieId), eq(sortieCrew.role, "pilot")))
    .get();
  if (pilot?.userId && pilot.userId !== actor.id)
    throw new Refusal("forbidden", `Only the pilot of this sortie, ${pilot.name}, may do this.`);
}

/** One update guarded by the version read in this transaction. A change after the brief means briefing again. */
export function updateSortie(tx: Tx, sortie: SortieRow, change: Partial<typeof sorties.$inferInsert>): void {
  tx.update(sorties)
    .set({ ...change, version: sortie.version + 1 })
    .where(and(eq(sorties.id, sortie.id), eq(sorties.version, sortie.version)))
    .run();
}

export const UNBRIEFED = { state: "planned", briefedAt: null, briefedBy: null, goNoGo: null } as const;
