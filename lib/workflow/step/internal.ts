import { and, desc, eq, max } from "drizzle-orm";
import type { Tx } from "@/db/open";
import { checkReports, stepDecisions } from "@/db/schema";
import type { CardPoint } from "@/lib/testcards/card";
import type { CheckReport, PointReport } from "@/lib/testcards/debrief-types";
import type { StepDecision } from "@/lib/testcards/words";
import type { Ctx } from "../context";
import { Refusal } from "../errors";
import { getSortieRow, listSortieCards, type SortieRow } from "../sortie/rows";

/** From strict to loose: a person may be stricter than what was computed, never looser. */
const LOOSENESS: StepDecision[] = ["hold", "smaller step", "clear to next step"];
export const isLooser = (a: StepDecision, than: StepDecision) => LOOSENESS.indexOf(a) > LOOSENESS.indexOf(than);

export type FlownPoint = { sortie: SortieRow; point: CardPoint; code: string; computed: PointReport; report: CheckReport };

/** A point of a debriefed sortie with what the newest check computed for it. */
export function getFlownPoint(
  tx: Tx,
  { actor }: Ctx,
  { sortieId, revisionId, pointId }: { sortieId: string; revisionId: string; pointId: string },
): FlownPoint {
  const sortie = getSortieRow(tx, actor, sortieId);
  const card = listSortieCards(tx, actor, sortie).find((flown) => flown.revisionId === revisionId);
  const point = card?.document.content.points.find(({ id }) => id === pointId);
  if (!point) throw new Refusal("not-found", "This sortie has no such point.");
  const newest = tx
    .select({ report: checkReports.report })
    .from(checkReports)
    .where(and(eq(checkReports.sortieId, sortieId), eq(checkReports.revisionId, revisionId)))
    .orderBy(desc(checkReports.version))
    .get();
  const computed = newest?.report.points.find((report) => report.point === pointId);
  if (!newest || !computed)
    throw new Refusal("conflict", "This sortie is not debriefed yet, so there is nothing to decide on. The pilot submits the debrief.");
  if (!point.template) throw new Refusal("conflict", "This point is not from the shelf, so no step of the build-up rests on it.");
  return { sortie, point, code: point.template.code, computed, report: newest.report };
}

/** The step of the build-up that a point flies: its level in the series, or its positions. */
export const stepName = ({ series, positions }: Pick<CardPoint, "series" | "positions">, code: string): string =>
  series ? `${code} at ${series.level.value} ${series.level.unit}` : [code, ...positions.map(({ position }) => position)].join(" ");

type Decided = { decision: StepDecision; because: string[]; reading: string | null };

/** One more row: earlier decisions on the same step stay, the newest counts. */
export function insertDecision(
  tx: Tx,
  { actor, now, newId }: Ctx,
  { sortie, point, code, computed, report }: FlownPoint,
  { decision, because, reading }: Decided,
) {
  const line =
    reading === null
      ? undefined
      : report.lines.find(
          (one) => one.reading === reading && one.point === point.id && one.asTrue !== null && one.comparison === "as flown, card",
        );
  if (reading !== null && !line)
    throw new Refusal("invalid", "This reading has no true value as flown, so the series cannot rest on it.", "reading");
  const last = tx
    .select({ position: max(stepDecisions.position) })
    .from(stepDecisions)
    .where(eq(stepDecisions.programmeId, sortie.programmeId))
    .get();
  const at = now.toISOString();
  const row = {
    id: newId(),
    programmeId: sortie.programmeId,
    testPointCode: code,
    step: stepName(point, code),
    series: point.series?.name ?? null,
    level: point.series?.level.value ?? null,
    measured: line?.asTrue?.value ?? null,
    expandedUncertainty: line?.asTrue?.expandedUncertainty ?? null,
    computed: computed.decision,
    decision,
    because,
    origin: "flown" as const,
    sortieId: sortie.id,
    proposedBy: actor.id,
    proposedAt: at,
    position: (last?.position ?? 0) + 1,
    createdAt: at,
  };
  tx.insert(stepDecisions).values(row).run();
  return row;
}
