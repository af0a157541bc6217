import { and, asc, eq, inArray, isNull } from "drizzle-orm";
import type { Db, Tx } from "@/db/open";
import { cardRevisions, debriefs, memberRoles, memberships, sortieCards, sorties, squawks, users } from "@/db/schema";
import type { Actor } from "@/lib/auth/roles";
import type { BuildUpState, SortieContext } from "@/lib/testcards/readiness-types";
import { listConfigurations, listStepDecisions, listTestPoints, type StepDecisionRow } from "../programme/queries";

type Reader = Db | Tx;

/** The facts that readiness needs and no card holds, as they stand today; one gathering for cards and sorties. */
export function getReadinessFacts(
  db: Reader,
  actor: Actor,
  programmeId: string,
  { today, writers = [] }: { today: string; writers?: string[] },
): SortieContext {
  const points = listTestPoints(db, actor, programmeId);
  const decisions = listStepDecisions(db, actor, programmeId);
  const current = listConfigurations(db, actor, programmeId).find((configuration) => configuration.isCurrent);
  const flown = flownTemplates(db, programmeId);
  return {
    today,
    currentConfiguration: current ? { id: current.id, number: current.number, signed: current.signedAt !== null } : null,
    releaser: findReleaser(db, actor, writers),
    buildUp: points.map((point) => buildUpState(point.code, decisions, flown.has(point.code))),
    seriesResults: seriesResults(decisions),
    groundingSquawks: openGrounding(db, programmeId),
    objectivesCovered: [...new Set(points.flatMap((point) => point.content.objectives))].sort(),
  };
}

/**
 * Who is about to release, where that is known: this reviewer, or the only one there is who wrote none of it. Where every reviewer
 * wrote some of it the answer is one of them, so that readiness says a second person is needed.
 */
function findReleaser(db: Reader, actor: Actor, writers: string[]): SortieContext["releaser"] {
  const reviewers = db
    .select({ id: users.id, name: users.name, residualRisk: memberships.residualRisk })
    .from(memberRoles)
    .innerJoin(memberships, and(eq(memberships.userId, memberRoles.userId), eq(memberships.teamId, memberRoles.teamId)))
    .innerJoin(users, eq(users.id, memberRoles.userId))
    .where(and(eq(memberRoles.teamId, actor.teamId), eq(memberRoles.role, "reviewer"), isNull(memberships.removedAt)))
    .orderBy(asc(users.id))
    .all();
  const free = reviewers.filter((reviewer) => !writers.includes(reviewer.id));
  if (free.length === 0) return reviewers.find((reviewer) => reviewer.id === writers[0]) ?? reviewers[0] ?? null;
  return free.find((reviewer) => reviewer.id === actor.id) ?? (free.length === 1 ? (free[0] ?? null) : null);
}

/** "clear" and "smaller step" stand once a reviewer countersigned; "hold" needs nobody. */
function stands(decision: StepDecisionRow): boolean {
  return decision.decision === "hold" || decision.countersignedAt !== null || decision.origin === "paper records";
}

function buildUpState(code: string, decisions: StepDecisionRow[], wasFlown: boolean): BuildUpState {
  const last = decisions.filter((decision) => decision.testPointCode === code).at(-1);
  if (!last) return { code, state: wasFlown ? "not reviewed" : "not flown", from: wasFlown ? "flown" : null };
  return { code, state: stands(last) ? last.decision : "not reviewed", from: last.origin };
}

function seriesResults(decisions: StepDecisionRow[]): SortieContext["seriesResults"] {
  const bySeries = new Map<string, StepDecisionRow[]>();
  for (const decision of decisions) {
    if (decision.series === null || decision.level === null || decision.measured === null) continue;
    bySeries.set(decision.series, [...(bySeries.get(decision.series) ?? []), decision]);
  }
  return [...bySeries].map(([series, rows]) => {
    const last = rows.at(-1);
    const inBand =
      !last?.predicted || (last.measured !== null && last.measured >= last.predicted.low && last.measured <= last.predicted.high);
    return {
      series,
      results: rows.flatMap(({ level, measured }) => (level === null || measured === null ? [] : [{ level, value: measured }])),
      expandedUncertainty: last?.expandedUncertainty ?? null,
      lastInBand: inBand,
    };
  });
}

function flownTemplates(db: Reader, programmeId: string): Set<string> {
  const rows = db
    .select({ content: cardRevisions.content, debrief: debriefs.content })
    .from(debriefs)
    .innerJoin(sorties, eq(sorties.id, debriefs.sortieId))
    .innerJoin(sortieCards, eq(sortieCards.sortieId, sorties.id))
    .innerJoin(cardRevisions, eq(cardRevisions.id, sortieCards.revisionId))
    .where(eq(sorties.programmeId, programmeId))
    .all();
  const codes = rows.flatMap(({ content, debrief }) => {
    const flown = new Set(
      debrief.points.filter((point) => point.outcome !== null && point.outcome !== "skipped").map((point) => point.point),
    );
    return content.points.flatMap((point) => (point.template && flown.has(point.id) ? [point.template.code] : []));
  });
  return new Set(codes);
}

function openGrounding(db: Reader, programmeId: string): SortieContext["groundingSquawks"] {
  return db
    .select({ id: squawks.id, number: squawks.number, text: squawks.text })
    .from(squawks)
    .where(
      and(
        eq(squawks.programmeId, programmeId),
        eq(squawks.severity, "grounding"),
        inArray(squawks.state, ["open", "assessed", "dispositioned"]),
      ),
    )
    .orderBy(asc(squawks.number))
    .all()
    .map((squawk) => ({ ...squawk, number: String(squawk.number) }));
}
