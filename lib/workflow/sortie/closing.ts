import { and, asc, eq } from "drizzle-orm";
import type { Db, Tx } from "@/db/open";
import { debriefs, squawks, stepDecisions } from "@/db/schema";
import type { Actor } from "@/lib/auth/roles";
import type { CardPoint } from "@/lib/testcards/card";
import { stepName } from "../step/internal";
import { listDispositions } from "./dispositions";
import { listSortieCards, type SortieRow } from "./rows";

type Reader = Db | Tx;
type Flown = { card: string; revisionId: string; point: CardPoint; outcome: string | null };

/** What still keeps a debriefed sortie from being closed, each in one sentence. Call with a row that getSortieRow gave. */
export function openForClosing(db: Reader, actor: Actor, sortie: Pick<SortieRow, "id" | "programmeId">): string[] {
  const flown = listFlown(db, actor, sortie);
  return [...undisposed(db, sortie.id, flown), ...undecided(db, sortie.id, flown), ...unassessed(db, sortie.id)];
}

function listFlown(db: Reader, actor: Actor, sortie: Pick<SortieRow, "id" | "programmeId">): Flown[] {
  const debrief = db.select({ content: debriefs.content }).from(debriefs).where(eq(debriefs.sortieId, sortie.id)).get();
  return listSortieCards(db, actor, sortie).flatMap(({ number, revisionId, document }) =>
    document.content.points.map((point) => ({
      card: number,
      revisionId,
      point,
      outcome: debrief?.content.points.find((said) => said.point === point.id)?.outcome ?? null,
    })),
  );
}

const named = ({ card, point }: Flown) => `Card ${card}, ${point.title}`;

function undisposed(db: Reader, sortieId: string, flown: Flown[]): string[] {
  const disposed = new Set(listDispositions(db, sortieId).map(({ revisionId, pointId }) => `${revisionId} ${pointId}`));
  return flown
    .filter(({ revisionId, point }) => !disposed.has(`${revisionId} ${point.id}`))
    .map((one) => `${named(one)}: accept, repeat or void is not decided.`);
}

/** The newest decision on each step that was flown: a hold stands at once, anything else when it is countersigned. */
function undecided(db: Reader, sortieId: string, flown: Flown[]): string[] {
  const decisions = db
    .select({ step: stepDecisions.step, decision: stepDecisions.decision, countersignedAt: stepDecisions.countersignedAt })
    .from(stepDecisions)
    .where(eq(stepDecisions.sortieId, sortieId))
    .orderBy(asc(stepDecisions.position))
    .all();
  return flown.flatMap((one) => {
    const { point, outcome } = one;
    if (!point.template || outcome === null || outcome === "skipped") return [];
    const step = stepName(point, point.template.code);
    const newest = decisions.filter((decision) => decision.step === step).at(-1);
    if (!newest) return [`${named(one)}: no step decision yet.`];
    if (newest.decision === "hold" || newest.countersignedAt !== null) return [];
    return [`${named(one)}: “${newest.decision}” waits for a reviewer's countersignature.`];
  });
}

function unassessed(db: Reader, sortieId: string): string[] {
  return db
    .select({ number: squawks.number })
    .from(squawks)
    .where(and(eq(squawks.sortieId, sortieId), eq(squawks.state, "open")))
    .orderBy(asc(squawks.number))
    .all()
    .map(({ number }) => `Squawk ${number} is not assessed.`);
}
