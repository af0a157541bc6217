import { and, eq, getTableColumns } from "drizzle-orm";
import { programmes, signatures, stepDecisions } from "@/db/schema";
import { digestOf } from "../digest";
import { Refusal } from "../errors";
import { requireNotClosed } from "../sortie/internal";
import { getSortieRow } from "../sortie/rows";
import { defineUseCase } from "../use-case";
import { CountersignStepInput } from "./schema";

/** The reviewer's name under a proposal; never under one's own. */
export const countersignStep = defineUseCase({
  name: "step.countersign",
  permission: "countersign a step",
  input: CountersignStepInput,
  run(tx, { actor, now, newId }, { stepId }) {
    const step = tx
      .select(getTableColumns(stepDecisions))
      .from(stepDecisions)
      .innerJoin(programmes, eq(programmes.id, stepDecisions.programmeId))
      .where(and(eq(stepDecisions.id, stepId), eq(programmes.teamId, actor.teamId)))
      .get();
    if (!step) throw new Refusal("not-found", "No such step in your team.");
    if (step.origin === "paper records") throw new Refusal("conflict", "This step was entered from paper records; it was signed there.");
    if (step.countersignedAt !== null)
      return { out: { id: stepId, decision: step.decision, countersignedAt: step.countersignedAt }, audit: "unchanged" };
    if (step.sortieId !== null) requireNotClosed(getSortieRow(tx, actor, step.sortieId), "its step decisions");
    if (step.proposedBy === actor.id) throw new Refusal("forbidden", "You proposed this step, so another reviewer countersigns it.");
    const countersignedAt = now.toISOString();
    const digest = digestOf(step);
    const subject = `step/${stepId}`;
    tx.update(stepDecisions).set({ countersignedBy: actor.id, countersignedAt }).where(eq(stepDecisions.id, stepId)).run();
    tx.insert(signatures)
      .values({
        id: newId(),
        teamId: actor.teamId,
        subject,
        meaning: "countersigned",
        digest,
        signedBy: actor.id,
        name: actor.name,
        role: "reviewer",
        signedAt: countersignedAt,
      })
      .run();
    return {
      out: { id: stepId, decision: step.decision, countersignedAt },
      audit: { subject, before: { countersigned: false }, after: { countersigned: true, digest } },
    };
  },
});
