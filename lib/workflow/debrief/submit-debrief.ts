import { and, asc, eq, ne } from "drizzle-orm";
import type { Tx } from "@/db/open";
import { debriefs, sorties, squawks } from "@/db/schema";
import type { AuditEntry } from "@/lib/audit/append-audit";
import type { Debrief, FieldError } from "@/lib/testcards/debrief-types";
import { validateDebrief } from "@/lib/testcards/validate-debrief";
import { digestOf } from "../digest";
import { Refusal } from "../errors";
import { getSortieRow, listSortieCards, type SortieCard, type SortieRow } from "../sortie/rows";
import { insertSquawk, type NewSquawk } from "../squawk/insert-squawk";
import { defineUseCase } from "../use-case";
import { runCheck, type StoredCheck } from "./run-check";
import { SubmitDebriefInput } from "./schema";

type Submitted = { id: string; sortieId: string; version: number; submittedAt: string; squawks: number[] };

/**
 * The pilot's debrief, once: raw readings lock, every card is judged, squawks are raised and the sortie is debriefed, all in one
 * transaction. What happened may always be entered, briefed or not, so only impossible entries are refused.
 */
export const submitDebrief = defineUseCase({
  name: "debrief.submit",
  permission: "brief and debrief",
  input: SubmitDebriefInput,
  run(tx, ctx, { id, sortieId, content }): { out: Submitted; audit: AuditEntry[] | "unchanged" } {
    const sortie = getSortieRow(tx, ctx.actor, sortieId);
    const contentDigest = digestOf(content);
    const sent = tx.select().from(debriefs).where(eq(debriefs.id, id)).get();
    if (sent) return { out: replay(tx, sent, sortieId, contentDigest), audit: "unchanged" };
    if (tx.select({ id: debriefs.id }).from(debriefs).where(eq(debriefs.sortieId, sortieId)).get())
      throw new Refusal(
        "conflict",
        "This sortie was debriefed from another phone or page. Its readings are locked; an engineer can add an amendment beside them.",
      );
    if (sortie.state === "closed") throw new Refusal("conflict", "This sortie is closed, so nothing can be added to it.");
    const flown = listSortieCards(tx, ctx.actor, sortie);
    refuseErrors(sortie, flown, content);

    const submittedAt = ctx.now.toISOString();
    tx.insert(debriefs).values({ id, sortieId, content, contentDigest, submittedBy: ctx.actor.id, submittedAt }).run();
    const checks = runCheck(tx, ctx, { sortie, flown, debrief: content, why: "debrief submitted" });
    const raised = toSquawks(sortie, content, checks).map((squawk) => insertSquawk(tx, ctx, squawk));
    tx.update(sorties)
      .set({ state: "debriefed", version: sortie.version + 1 })
      .where(eq(sorties.id, sortieId))
      .run();
    const before = { state: sortie.state, briefed: sortie.briefedAt !== null };
    return {
      out: { id, sortieId, version: 1, submittedAt, squawks: raised.map(({ number }) => number) },
      audit: [
        { subject: `sortie/${sortieId}`, before, after: { state: "debriefed", debrief: id, content: contentDigest } },
        ...raised.map((row) => ({ action: "squawk.raise", subject: `squawk/${row.id}`, after: row })),
      ],
    };
  },
});

function replay(tx: Tx, sent: typeof debriefs.$inferSelect, sortieId: string, contentDigest: string): Submitted {
  if (sent.sortieId !== sortieId || sent.contentDigest !== contentDigest)
    throw new Refusal(
      "conflict",
      "This debrief was sent before with other content. The first one stands and is locked; show both to the engineer.",
    );
  const raised = tx
    .select({ number: squawks.number })
    .from(squawks)
    .where(and(eq(squawks.sortieId, sortieId), ne(squawks.raisedFrom, "person")))
    .orderBy(asc(squawks.number))
    .all();
  return { id: sent.id, sortieId, version: 1, submittedAt: sent.submittedAt, squawks: raised.map(({ number }) => number) };
}

function refuseErrors(sortie: SortieRow, flown: SortieCard[], content: Debrief): void {
  const errors = [
    ...strangers(sortie, flown, content),
    ...flown.flatMap(({ document }) => validateDebrief(document, content, { complete: true })),
  ];
  const unlike = errors.filter(
    (error, index) => errors.findIndex((other) => other.key === error.key && other.message === error.message) === index,
  );
  const first = unlike[0];
  if (!first) return;
  throw new Refusal(
    "invalid",
    unlike.length === 1 ? first.message : `${unlike.length} entries cannot be right. ${first.message}`,
    first.key,
    {
      errors: unlike.map(({ key, message }) => ({ path: key, message })),
    },
  );
}

/** Entries for another kind of sortie, or for points and readings that none of its cards has. */
function strangers(sortie: SortieRow, flown: SortieCard[], content: Debrief): FieldError[] {
  if (content.kind !== sortie.kind) return [{ key: "kind", message: `This sortie is a ${sortie.kind}, so its debrief is one too.` }];
  const points = new Map(
    flown.flatMap(({ document }) =>
      document.content.points.map((point) => [point.id, new Set(point.readings.map((reading) => reading.id))]),
    ),
  );
  const seen = new Set<string>();
  return content.points.flatMap((said): FieldError[] => {
    const readings = points.get(said.point);
    if (!readings) return [{ key: said.point, message: "No card of this sortie has this point. Load the sortie again." }];
    if (seen.has(said.point)) return [{ key: said.point, message: "This point is entered twice." }];
    seen.add(said.point);
    const ids = said.readings.map((entry) => entry.reading);
    return ids.flatMap((reading, index) => {
      if (!readings.has(reading))
        return [{ key: `${said.point}.${reading}`, message: "This point does not ask for this reading. Load the sortie again." }];
      return ids.indexOf(reading) === index ? [] : [{ key: `${said.point}.${reading}`, message: "This reading is entered twice." }];
    });
  });
}

/** One for each reading past a limit, with the severity the check gives; then those the pilot wrote, for a person to assess. */
function toSquawks(sortie: SortieRow, content: Debrief, checks: StoredCheck[]): NewSquawk[] {
  const { programmeId, id: sortieId } = sortie;
  const exceeded = checks
    .flatMap(({ report }) => report.squawks)
    .map(
      ({ point, reading, severity, text }): NewSquawk => ({
        programmeId,
        sortieId,
        system: "Limits",
        text,
        severity,
        pointId: point,
        readingId: reading,
        raisedFrom: "exceedance",
      }),
    );
  const written = content.squawks
    .filter(({ text }) => text.trim() !== "")
    .map(
      ({ system, text, flyAgain }): NewSquawk => ({
        programmeId,
        sortieId,
        system: system.trim() || "Not named",
        text,
        severity: flyAgain === true ? "monitor" : "before next test",
        pointId: null,
        readingId: null,
        raisedFrom: "debrief",
      }),
    );
  return [...exceeded, ...written];
}
