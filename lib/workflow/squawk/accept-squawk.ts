import { Refusal } from "../errors";
import { defineUseCase } from "../use-case";
import { changeSquawk, getSquawkFor } from "./internal";
import { AcceptSquawkInput } from "./schema";

/** The engineer's disposition: deferred with limit, or accepted as is, with an engineering reason; never on a grounding squawk. */
export const acceptSquawk = defineUseCase({
  name: "squawk.accept",
  permission: "assess squawks",
  input: AcceptSquawkInput,
  run(tx, { actor, now }, { disposition, why, limit, ...which }) {
    const row = getSquawkFor(tx, actor, which, "dispose");
    if (row.severity === "grounding")
      throw new Refusal(
        "conflict",
        `A grounding squawk is never ${disposition}: a mechanic rectifies it, or finds no fault.`,
        "disposition",
      );
    return changeSquawk(tx, row, {
      state: "dispositioned",
      disposition,
      dispositionWhy: why,
      dispositionLimit: disposition === "deferred with limit" ? limit.trim() : null,
      entryReference: null,
      dispositionedBy: actor.id,
      dispositionedAt: now.toISOString(),
    });
  },
});
