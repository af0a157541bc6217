import { Refusal } from "../errors";
import { defineUseCase } from "../use-case";
import { openCard, refuseFindings, requireState, requireVersion, reviewNow, updateRevision } from "./internal";
import { findingKey, openMusts, unanswered } from "./policy";
import { SubmitCardInput } from "./schema";

/** Draft → in review: no open "must", every "should" answered in one line. */
export const submitCard = defineUseCase({
  name: "card.submit",
  permission: "write cards",
  input: SubmitCardInput,
  run(tx, ctx, { cardId, version, answers }) {
    const open = openCard(tx, ctx.actor, cardId);
    const { revision } = open;
    requireState(revision, "draft", "sent for review");
    requireVersion(revision, version);
    if (revision.content.points.length === 0)
      throw new Refusal("conflict", "This card has no test point. Put at least one on it before it goes to review.", "points");
    const findings = reviewNow(tx, ctx, open);
    refuseFindings(openMusts(findings), "Mend these before it goes to review");
    const kept = Object.fromEntries(
      findings.flatMap((finding) => {
        const key = findingKey(finding);
        const answer = answers[key]?.trim() || revision.answers[key];
        return answer ? [[key, answer]] : [];
      }),
    );
    refuseFindings(unanswered(findings, kept), "Answer each of these in one line before it goes to review");
    const at = ctx.now.toISOString();
    updateRevision(tx, revision, { state: "in review", answers: kept, submittedAt: at, submittedBy: ctx.actor.id, updatedAt: at });
    return {
      out: { version: revision.version + 1, state: "in review" as const },
      audit: {
        subject: `card-revision/${revision.id}`,
        before: { state: "draft" },
        after: { state: "in review", digest: open.digest, answers: kept },
      },
    };
  },
});
