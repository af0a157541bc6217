import { Refusal } from "../errors";
import { requireNotClosed } from "../sortie/internal";
import { defineUseCase } from "../use-case";
import { getFlownPoint, insertDecision, isLooser } from "./internal";
import { ProposeStepInput } from "./schema";

/** The engineer's proposal on a flown point: as computed or stricter. It stands when a reviewer countersigns; "hold" stands at once. */
export const proposeStep = defineUseCase({
  name: "step.propose",
  permission: "propose a step",
  input: ProposeStepInput,
  run(tx, ctx, { decision, reading, why, ...where }) {
    const flown = getFlownPoint(tx, ctx, where);
    requireNotClosed(flown.sortie, "its step decisions");
    const { computed } = flown;
    if (isLooser(decision, computed.decision))
      throw new Refusal(
        "conflict",
        `The check computed "${computed.decision}": stricter is possible, looser is not. ${computed.because.join(" ")}`,
        "decision",
        {
          computed: computed.decision,
          because: computed.because,
        },
      );
    const row = insertDecision(tx, ctx, flown, { decision, reading, because: [...computed.because, why] });
    return {
      out: { id: row.id, decision, computed: row.computed, stands: decision === "hold" },
      audit: { subject: `step/${row.id}`, after: row },
    };
  },
});
