import { and, asc, eq, gt, inArray, isNull, ne, notExists, sql } from "drizzle-orm";
import { alias } from "drizzle-orm/sqlite-core";
import type { Db, Tx } from "@/db/open";
import {
  cardRevisions,
  cards,
  configurations,
  programmes,
  reviewComments,
  sortieCards,
  sorties,
  squawks,
  stepDecisions,
} from "@/db/schema";
import type { Actor } from "@/lib/auth/roles";
import { hasRole } from "@/lib/auth/roles";
import type { SortieKind, SquawkSeverity, StepDecision } from "@/lib/testcards/words";
import { wroteIt } from "../card/policy";
import { may } from "../permissions";
import { NEXT, type SquawkAct } from "../squawk/policy";
import { openForClosing } from "./closing";

type Reader = Db | Tx;

type InProgramme = { programmeId: string; programmeName: string };
type CardWaiting = InProgramme & { cardId: string; number: string; letter: string; title: string; at: string };
type SortieWaiting = InProgramme & { sortieId: string; number: number; kind: SortieKind; plannedOn: string };

/** One thing that waits for this person; the screen finds the words and the address. */
export type WaitingItem =
  | ({ what: "review card" } & CardWaiting)
  | ({ what: "returned card" } & CardWaiting)
  | ({ what: "draft card" } & CardWaiting)
  | ({ what: "answer cards" } & SortieWaiting & { unanswered: number })
  | ({ what: "brief sortie" } & SortieWaiting)
  | ({ what: "debrief sortie" } & SortieWaiting)
  | ({ what: "review results" } & SortieWaiting)
  | ({ what: "close sortie" } & SortieWaiting)
  | ({ what: "countersign step" } & InProgramme & { stepId: string; step: string; decision: StepDecision; sortieId: string })
  | ({ what: "sign configuration" } & InProgramme & { configurationId: string; number: string })
  | ({ what: "open squawk" } & InProgramme & {
        squawkId: string;
        number: number;
        text: string;
        severity: SquawkSeverity;
        /** What this person does next; null on a grounding one that waits for somebody else. */
        act: SquawkAct | null;
        by: string;
      });

/** What waits for me, by the roles I hold; the whole of my team's programmes. */
export function listWaiting(db: Reader, actor: Actor): WaitingItem[] {
  return [
    ...(hasRole(actor, ["engineer", "reviewer"]) ? waitingCards(db, actor) : []),
    ...(hasRole(actor, ["pilot", "engineer"]) ? waitingSorties(db, actor) : []),
    ...(may(actor, "countersign a step") ? proposedSteps(db, actor) : []),
    ...(hasRole(actor, ["mechanic"]) ? unsignedConfigurations(db, actor) : []),
    ...(hasRole(actor, ["mechanic", "engineer"]) ? openSquawks(db, actor) : []),
  ];
}

function waitingCards(db: Reader, actor: Actor): WaitingItem[] {
  const rows = db
    .select({
      programmeId: programmes.id,
      programmeName: programmes.name,
      cardId: cards.id,
      number: cards.number,
      letter: cardRevisions.letter,
      state: cardRevisions.state,
      title: sql<string>`json_extract(${cardRevisions.content}, '$.title')`,
      at: cardRevisions.updatedAt,
      authorId: cardRevisions.authorId,
      editedBy: cardRevisions.editedBy,
      returned: sql<number>`exists (select 1 from ${reviewComments} where ${reviewComments.revisionId} = ${cardRevisions.id} and ${reviewComments.isReturn} = 1)`,
    })
    .from(cardRevisions)
    .innerJoin(cards, eq(cards.id, cardRevisions.cardId))
    .innerJoin(programmes, eq(programmes.id, cards.programmeId))
    .where(and(eq(programmes.teamId, actor.teamId), inArray(cardRevisions.state, ["draft", "in review"])))
    .orderBy(asc(cardRevisions.updatedAt), asc(cardRevisions.id))
    .all();
  return rows.flatMap(({ state, authorId, editedBy, returned, ...card }): WaitingItem[] => {
    const mine = wroteIt(actor, { state, authorId, editedBy });
    if (state === "in review") return hasRole(actor, ["reviewer"]) && !mine ? [{ what: "review card", ...card }] : [];
    if (!mine) return [];
    return [{ what: returned ? "returned card" : "draft card", ...card }];
  });
}

function waitingSorties(db: Reader, actor: Actor): WaitingItem[] {
  const rows = db
    .select({
      programmeId: programmes.id,
      programmeName: programmes.name,
      sortieId: sorties.id,
      number: sorties.number,
      kind: sorties.kind,
      plannedOn: sorties.plannedOn,
      state: sorties.state,
      unanswered: sql<number>`(select count(*) from ${sortieCards} where ${sortieCards.sortieId} = ${sorties.id} and ${sortieCards.answer} is null)`,
    })
    .from(sorties)
    .innerJoin(programmes, eq(programmes.id, sorties.programmeId))
    .where(and(eq(programmes.teamId, actor.teamId), inArray(sorties.state, ["planned", "briefed", "flown", "debriefed"])))
    .orderBy(asc(sorties.plannedOn), asc(sorties.number))
    .all();
  const pilot = hasRole(actor, ["pilot"]);
  const engineer = hasRole(actor, ["engineer"]);
  return rows.flatMap(({ state, unanswered, ...sortie }): WaitingItem[] => {
    if (state === "debriefed") {
      if (!engineer) return [];
      const decided = openForClosing(db, actor, { id: sortie.sortieId, programmeId: sortie.programmeId }).length === 0;
      return [{ what: decided ? "close sortie" : "review results", ...sortie }];
    }
    if (!pilot) return [];
    if (state !== "planned") return [{ what: "debrief sortie", ...sortie }];
    return unanswered > 0 ? [{ what: "answer cards", unanswered, ...sortie }] : [{ what: "brief sortie", ...sortie }];
  });
}

/** Proposals of others that nothing newer replaced; a hold needs nobody. */
function proposedSteps(db: Reader, actor: Actor): WaitingItem[] {
  const newer = alias(stepDecisions, "newer");
  const replaced = db
    .select({ id: newer.id })
    .from(newer)
    .where(and(eq(newer.sortieId, stepDecisions.sortieId), eq(newer.step, stepDecisions.step), gt(newer.position, stepDecisions.position)));
  return db
    .select({
      programmeId: programmes.id,
      programmeName: programmes.name,
      stepId: stepDecisions.id,
      step: stepDecisions.step,
      decision: stepDecisions.decision,
      sortieId: sorties.id,
    })
    .from(stepDecisions)
    .innerJoin(sorties, eq(sorties.id, stepDecisions.sortieId))
    .innerJoin(programmes, eq(programmes.id, stepDecisions.programmeId))
    .where(
      and(
        eq(programmes.teamId, actor.teamId),
        eq(sorties.state, "debriefed"),
        eq(stepDecisions.origin, "flown"),
        isNull(stepDecisions.countersignedAt),
        ne(stepDecisions.decision, "hold"),
        ne(stepDecisions.proposedBy, actor.id),
        notExists(replaced),
      ),
    )
    .orderBy(asc(stepDecisions.position))
    .all()
    .map((row) => ({ what: "countersign step", ...row }));
}

function unsignedConfigurations(db: Reader, actor: Actor): WaitingItem[] {
  return db
    .select({
      programmeId: programmes.id,
      programmeName: programmes.name,
      configurationId: configurations.id,
      number: configurations.number,
    })
    .from(configurations)
    .innerJoin(programmes, eq(programmes.id, configurations.programmeId))
    .where(and(eq(programmes.teamId, actor.teamId), eq(configurations.isCurrent, true), isNull(configurations.signedAt)))
    .orderBy(asc(configurations.number))
    .all()
    .map((row) => ({ what: "sign configuration", ...row }));
}

/** What this person does next on each squawk; a grounding one is shown until it is verified, whoever is next. */
function openSquawks(db: Reader, actor: Actor): WaitingItem[] {
  return db
    .select({
      programmeId: programmes.id,
      programmeName: programmes.name,
      squawkId: squawks.id,
      number: squawks.number,
      text: squawks.text,
      severity: squawks.severity,
      state: squawks.state,
    })
    .from(squawks)
    .innerJoin(programmes, eq(programmes.id, squawks.programmeId))
    .where(and(eq(programmes.teamId, actor.teamId), ne(squawks.state, "closed")))
    .orderBy(asc(squawks.number))
    .all()
    .flatMap(({ state, ...squawk }): WaitingItem[] => {
      const next = NEXT[state];
      const mine = next !== null && may(actor, next.permission);
      if (!next || (!mine && (squawk.severity !== "grounding" || state === "verified"))) return [];
      return [{ what: "open squawk", ...squawk, act: mine ? next.act : null, by: next.by }];
    });
}
