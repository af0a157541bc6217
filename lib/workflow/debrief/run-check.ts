import { and, desc, eq, inArray } from "drizzle-orm";
import type { Tx } from "@/db/open";
import { checkReports, squawks } from "@/db/schema";
import { checkDebrief } from "@/lib/testcards/check-debrief";
import type { CheckReport, Debrief } from "@/lib/testcards/debrief-types";
import type { Ctx } from "../context";
import { listDispositions } from "../sortie/dispositions";
import type { SortieCard, SortieRow } from "../sortie/rows";

export type StoredCheck = { revisionId: string; version: number; report: CheckReport };

/** Judges every card of a sortie on its document and keeps the reports as the next version; earlier ones stay. */
export function runCheck(
  tx: Tx,
  ctx: Ctx,
  { sortie, flown, debrief, why }: { sortie: SortieRow; flown: SortieCard[]; debrief: Debrief; why: string },
): StoredCheck[] {
  const version = (lastVersion(tx, sortie.id) ?? 0) + 1;
  const dispositions = listDispositions(tx, sortie.id);
  const groundingOpen = hasOpenGrounding(tx, sortie.programmeId);
  return flown.map((card) => {
    const report = checkDebrief(card.document, debrief, {
      flownOn: sortie.plannedOn,
      configurationId: sortie.configurationId,
      stationPressureAltitudeFt: null,
      calibrations: null,
      amendments: [],
      dispositions: dispositions
        .filter((row) => row.revisionId === card.revisionId)
        .map(({ pointId, disposition }) => ({ point: pointId, disposition })),
      groundingOpen,
    });
    tx.insert(checkReports)
      .values({
        id: ctx.newId(),
        sortieId: sortie.id,
        revisionId: card.revisionId,
        version,
        coreVersion: report.coreVersion,
        why,
        report,
        createdAt: ctx.now.toISOString(),
      })
      .run();
    return { revisionId: card.revisionId, version, report };
  });
}

export function lastVersion(tx: Tx, sortieId: string): number | undefined {
  return tx
    .select({ version: checkReports.version })
    .from(checkReports)
    .where(eq(checkReports.sortieId, sortieId))
    .orderBy(desc(checkReports.version))
    .get()?.version;
}

function hasOpenGrounding(tx: Tx, programmeId: string): boolean {
  const open = and(
    eq(squawks.programmeId, programmeId),
    eq(squawks.severity, "grounding"),
    inArray(squawks.state, ["open", "assessed", "dispositioned"]),
  );
  return tx.select({ id: squawks.id }).from(squawks).where(open).get() !== undefined;
}
