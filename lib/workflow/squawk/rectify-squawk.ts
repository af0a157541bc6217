import { defineUseCase } from "../use-case";
import { changeSquawk, getSquawkFor } from "./internal";
import { RectifySquawkInput } from "./schema";

/** The mechanic's disposition: rectified, or no fault found, with the entry where the work is written up. */
export const rectifySquawk = defineUseCase({
  name: "squawk.rectify",
  permission: "rectify squawks",
  input: RectifySquawkInput,
  run(tx, { actor, now }, { disposition, why, entryReference, ...which }) {
    const row = getSquawkFor(tx, actor, which, "dispose");
    return changeSquawk(tx, row, {
      state: "dispositioned",
      disposition,
      dispositionWhy: why,
      dispositionLimit: null,
      entryReference,
      dispositionedBy: actor.id,
      dispositionedAt: now.toISOString(),
    });
  },
});
