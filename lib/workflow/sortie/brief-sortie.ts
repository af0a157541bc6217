import { reviewSortie } from "@/lib/testcards/readiness";
import { getReadinessFacts } from "../card/context";
import { refuseFindings } from "../card/internal";
import { findingKey, openMusts, unanswered } from "../card/policy";
import { Refusal } from "../errors";
import { getProgramme } from "../programme/queries";
import { defineUseCase } from "../use-case";
import { requireOpen, requireThisPilot, updateSortie } from "./internal";
import { getSortieRow, listCrew, listSortieCards, type SortieCard, toSortiePlan } from "./rows";
import { BriefSortieInput } from "./schema";

/** Planned → briefed: every revision released and accepted, no open "must", every go/no-go line ticked. */
export const briefSortie = defineUseCase({
  name: "sortie.brief",
  permission: "brief and debrief",
  input: BriefSortieInput,
  run(tx, { actor, now, today }, { sortieId, goNoGo, answers }) {
    const sortie = getSortieRow(tx, actor, sortieId);
    requireOpen(sortie, "briefed");
    if (sortie.state === "briefed")
      return { out: { id: sortieId, state: "briefed" as const, version: sortie.version }, audit: "unchanged" };
    requireThisPilot(tx, actor, sortieId);
    const planned = listSortieCards(tx, actor, sortie);
    const findings = reviewSortie(
      toSortiePlan(sortie, listCrew(tx, sortieId), planned),
      getReadinessFacts(tx, actor, sortie.programmeId, { today }),
    );
    refuseFindings(openMusts(findings), "Not briefed. These are open");
    requireReleasedAndAccepted(planned);
    const kept = Object.fromEntries(findings.map(findingKey).flatMap((key) => (answers[key]?.trim() ? [[key, answers[key].trim()]] : [])));
    refuseFindings(unanswered(findings, kept), "Answer each of these in one line before the brief");
    requireGo(getProgramme(tx, actor, sortie.programmeId).settings.goNoGo, goNoGo);
    const briefedAt = now.toISOString();
    updateSortie(tx, sortie, { state: "briefed", briefedAt, briefedBy: actor.id, goNoGo, answers: kept });
    const cards = planned.map(({ revisionId, digest }) => ({ revisionId, digest }));
    return {
      out: { id: sortieId, state: "briefed" as const, version: sortie.version + 1 },
      audit: { subject: `sortie/${sortieId}`, before: { state: sortie.state }, after: { state: "briefed", goNoGo, answers: kept, cards } },
    };
  },
});

function requireReleasedAndAccepted(planned: SortieCard[]): void {
  for (const { number, letter, state, answer, answeredDigest, digest } of planned) {
    const name = `Card ${number} revision ${letter}`;
    if (state !== "released") throw new Refusal("conflict", `${name} is ${state}, not released: a reviewer releases it.`);
    if (answer !== "accepted" || answeredDigest !== digest)
      throw new Refusal("conflict", `${name} is not accepted yet: read it and accept it first.`);
  }
}

function requireGo(lines: string[], ticked: { line: string; go: boolean }[]): void {
  const open = lines.filter((line) => !ticked.some((tick) => tick.line === line && tick.go));
  if (open.length > 0) throw new Refusal("conflict", `Any NO stops. Not ticked: ${open.join("; ")}.`, "goNoGo", { open });
}
