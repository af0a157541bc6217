import { and, asc, eq, getTableColumns } from "drizzle-orm";
import { alias } from "drizzle-orm/sqlite-core";
import type { Db, Tx } from "@/db/open";
import { cardRevisions, cards, configurations, programmes, sortieCards, sortieCrew, sorties, users } from "@/db/schema";
import type { Actor } from "@/lib/auth/roles";
import type { CardDocument, ProgrammeSnapshot } from "@/lib/testcards/card";
import type { SortiePlan } from "@/lib/testcards/readiness-types";
import { documentOf } from "../card/rows";
import { digestOf } from "../digest";
import { Refusal } from "../errors";
import { getProgrammeSnapshot } from "../programme/snapshot";

type Reader = Db | Tx;
const author = alias(users, "author");
const answerer = alias(users, "answerer");
const briefer = alias(users, "briefer");
const planner = alias(users, "planner");
const closer = alias(users, "closer");

export function getSortieRow(db: Reader, actor: Actor, sortieId: string) {
  const row = db
    .select({
      ...getTableColumns(sorties),
      configurationNumber: configurations.number,
      plannedByName: planner.name,
      briefedByName: briefer.name,
      closedByName: closer.name,
    })
    .from(sorties)
    .innerJoin(programmes, eq(programmes.id, sorties.programmeId))
    .innerJoin(planner, eq(planner.id, sorties.plannedBy))
    .leftJoin(briefer, eq(briefer.id, sorties.briefedBy))
    .leftJoin(closer, eq(closer.id, sorties.closedBy))
    .leftJoin(configurations, eq(configurations.id, sorties.configurationId))
    .where(and(eq(sorties.id, sortieId), eq(programmes.teamId, actor.teamId)))
    .get();
  if (!row) throw new Refusal("not-found", "No such sortie in your team.");
  return row;
}
export type SortieRow = ReturnType<typeof getSortieRow>;

export function listCrew(db: Reader, sortieId: string) {
  return db
    .select({
      position: sortieCrew.position,
      userId: sortieCrew.userId,
      name: sortieCrew.name,
      role: sortieCrew.role,
      massKg: sortieCrew.massKg,
    })
    .from(sortieCrew)
    .where(eq(sortieCrew.sortieId, sortieId))
    .orderBy(asc(sortieCrew.position))
    .all();
}

export type SortieCard = {
  position: number;
  cardId: string;
  number: string;
  revisionId: string;
  letter: string;
  state: (typeof cardRevisions.$inferSelect)["state"];
  digest: string; // of the document as it stands: what an acceptance is bound to
  releasedDigest: string | null;
  document: CardDocument;
  answer: "accepted" | "declined" | null;
  answeredDigest: string | null;
  answeredAt: string | null;
  answeredByName: string | null;
  declineWhy: string | null;
};

/** The cards of a sortie in order, each with the document that would be flown. Call with a row that getSortieRow gave. */
export function listSortieCards(db: Reader, actor: Actor, sortie: Pick<SortieRow, "id" | "programmeId">): SortieCard[] {
  let snapshot: ProgrammeSnapshot | undefined;
  const programme = () => {
    snapshot ??= getProgrammeSnapshot(db, actor, sortie.programmeId);
    return snapshot;
  };
  return db
    .select({
      link: getTableColumns(sortieCards),
      revision: getTableColumns(cardRevisions),
      cardNumber: cards.number,
      authorName: author.name,
      answeredByName: answerer.name,
    })
    .from(sortieCards)
    .innerJoin(cardRevisions, eq(cardRevisions.id, sortieCards.revisionId))
    .innerJoin(cards, eq(cards.id, cardRevisions.cardId))
    .innerJoin(author, eq(author.id, cardRevisions.authorId))
    .leftJoin(answerer, eq(answerer.id, sortieCards.answeredBy))
    .where(eq(sortieCards.sortieId, sortie.id))
    .orderBy(asc(sortieCards.position))
    .all()
    .map(({ link, revision, cardNumber, authorName, answeredByName }) => {
      const document = documentOf({ id: revision.cardId, number: cardNumber }, { ...revision, authorName }, programme);
      return {
        position: link.position,
        cardId: revision.cardId,
        number: cardNumber,
        revisionId: revision.id,
        letter: revision.letter,
        state: revision.state,
        digest: revision.digest ?? digestOf(document),
        releasedDigest: revision.digest,
        document,
        answer: link.answer,
        answeredDigest: link.answeredDigest,
        answeredAt: link.answeredAt,
        answeredByName,
        declineWhy: link.declineWhy,
      };
    });
}

export function toSortiePlan(sortie: SortieRow, crew: ReturnType<typeof listCrew>, planned: SortieCard[]): SortiePlan {
  return {
    id: sortie.id,
    kind: sortie.kind,
    plannedOn: sortie.plannedOn,
    cards: planned.map(({ document, state, digest, releasedDigest, answer, answeredDigest, answeredAt }) => ({
      document,
      state,
      digest,
      releasedDigest,
      acceptance:
        answer && answeredDigest && answeredAt ? { digest: answeredDigest, at: answeredAt, accepted: answer === "accepted" } : null,
    })),
    crew: crew.map(({ name, role, massKg }) => ({ name, role, massKg })),
    baggageKg: sortie.settings.baggageKg,
    fuelOnBoardL: sortie.settings.fuelOnBoardL,
    configuration:
      sortie.configurationId && sortie.configurationNumber ? { id: sortie.configurationId, number: sortie.configurationNumber } : null,
    forecastOatC: sortie.settings.forecastOatC,
    dayPlan: sortie.settings.dayPlan,
  };
}
