import { asc, desc, eq, sql } from "drizzle-orm";
import type { Db, Tx } from "@/db/open";
import { cardRevisions, cards, checkReports, debriefs, sortieCards, sortieCrew, sorties, stepDecisions, users } from "@/db/schema";
import type { Actor } from "@/lib/auth/roles";
import { reviewSortie } from "@/lib/testcards/readiness";
import type { Finding, SortieContext, SortiePlan } from "@/lib/testcards/readiness-types";
import { getReadinessFacts } from "../card/context";
import { Refusal } from "../errors";
import { getProgramme } from "../programme/queries";
import { listSortieSquawks } from "../squawk/queries";
import { openForClosing } from "./closing";
import { listDispositions } from "./dispositions";
import * as policy from "./policy";
import { getSortieRow, listCrew, listSortieCards, type SortieCard, type SortieRow, toSortiePlan } from "./rows";

type Reader = Db | Tx;

/** A programme's sorties, the newest first, with their cards and pilot in one line each. */
export function listSorties(db: Reader, actor: Actor, programmeId: string) {
  getProgramme(db, actor, programmeId);
  return db
    .select({
      id: sorties.id,
      number: sorties.number,
      kind: sorties.kind,
      state: sorties.state,
      plannedOn: sorties.plannedOn,
      cards: sql<string>`(select group_concat(${cards.number} || ' ' || ${cardRevisions.letter}, ', ' order by ${sortieCards.position}) from ${sortieCards}
        join ${cardRevisions} on ${cardRevisions.id} = ${sortieCards.revisionId} join ${cards} on ${cards.id} = ${cardRevisions.cardId}
        where ${sortieCards.sortieId} = ${sorties.id})`,
      unanswered: sql<number>`(select count(*) from ${sortieCards} where ${sortieCards.sortieId} = ${sorties.id} and ${sortieCards.answer} is null)`,
      pilot: sql<
        string | null
      >`(select ${sortieCrew.name} from ${sortieCrew} where ${sortieCrew.sortieId} = ${sorties.id} and ${sortieCrew.role} = 'pilot' limit 1)`,
      submittedAt: debriefs.submittedAt,
    })
    .from(sorties)
    .leftJoin(debriefs, eq(debriefs.sortieId, sorties.id))
    .where(eq(sorties.programmeId, programmeId))
    .orderBy(desc(sorties.plannedOn), desc(sorties.number))
    .all();
}
export type SortieListItem = ReturnType<typeof listSorties>[number];

export type SortieView = {
  sortie: SortieRow;
  crew: ReturnType<typeof listCrew>;
  cards: SortieCard[];
  plan: SortiePlan;
  context: SortieContext;
  findings: Finding[];
  debrief: DebriefRow | null;
  may: Record<"change" | "answer" | "brief" | "debrief" | "cancel", boolean>;
};

export function getSortie(db: Reader, actor: Actor, sortieId: string, { today }: { today: string }): SortieView {
  const sortie = getSortieRow(db, actor, sortieId);
  const crew = listCrew(db, sortieId);
  const flown = listSortieCards(db, actor, sortie);
  const plan = toSortiePlan(sortie, crew, flown);
  const context = getReadinessFacts(db, actor, sortie.programmeId, { today });
  return {
    sortie,
    crew,
    cards: flown,
    plan,
    context,
    findings: reviewSortie(plan, context),
    debrief: findDebrief(db, sortieId) ?? null,
    may: {
      change: policy.mayChangeSortie(actor, sortie),
      answer: policy.mayAnswerCard(actor, sortie),
      brief: policy.mayBriefSortie(actor, sortie),
      debrief: policy.maySubmitDebrief(actor, sortie),
      cancel: policy.mayCancelSortie(actor, sortie),
    },
  };
}

function findDebrief(db: Reader, sortieId: string) {
  return db
    .select({
      id: debriefs.id,
      content: debriefs.content,
      contentDigest: debriefs.contentDigest,
      submittedAt: debriefs.submittedAt,
      submittedByName: users.name,
      reviewedAt: debriefs.reviewedAt,
    })
    .from(debriefs)
    .innerJoin(users, eq(users.id, debriefs.submittedBy))
    .where(eq(debriefs.sortieId, sortieId))
    .get();
}
export type DebriefRow = NonNullable<ReturnType<typeof findDebrief>>;

/** Raw debrief, what the core made of it, and what followed. `version` asks for an earlier check. */
export function getSortieResults(db: Reader, actor: Actor, sortieId: string, { version }: { version?: number } = {}) {
  const sortie = getSortieRow(db, actor, sortieId);
  const debrief = findDebrief(db, sortieId);
  if (!debrief) throw new Refusal("not-found", "This sortie has no debrief yet.");
  const reports = db.select().from(checkReports).where(eq(checkReports.sortieId, sortieId)).orderBy(asc(checkReports.version)).all();
  const versions = [...new Set(reports.map((report) => report.version))];
  const shown = version ?? versions.at(-1);
  if (shown === undefined || !versions.includes(shown)) throw new Refusal("not-found", "This sortie has no check of that version.");
  const flown = listSortieCards(db, actor, sortie);
  const checks = flown.flatMap((card) => {
    const row = reports.find((report) => report.version === shown && report.revisionId === card.revisionId);
    return row ? [{ card, report: row.report, coreVersion: row.coreVersion, why: row.why, createdAt: row.createdAt }] : [];
  });
  return {
    sortie,
    crew: listCrew(db, sortieId),
    debrief,
    version: shown,
    versions,
    checks,
    squawks: listSortieSquawks(db, sortieId),
    dispositions: listDispositions(db, sortieId),
    decisions: listSortieDecisions(db, sortieId),
    /** What happened may always be entered; that it was flown without a brief stays visible. */
    flownUnbriefed: sortie.briefedAt === null,
    /** What keeps it from being closed, while it is debriefed. */
    open: sortie.state === "debriefed" ? openForClosing(db, actor, sortie) : [],
    may: {
      dispose: policy.mayDisposePoint(actor, sortie),
      proposeStep: policy.mayProposeStep(actor, sortie),
      close: policy.mayCloseSortie(actor, sortie),
    },
  };
}
export type SortieResults = ReturnType<typeof getSortieResults>;

function listSortieDecisions(db: Reader, sortieId: string) {
  return db
    .select()
    .from(stepDecisions)
    .where(eq(stepDecisions.sortieId, sortieId))
    .orderBy(asc(stepDecisions.position), asc(stepDecisions.id))
    .all();
}
