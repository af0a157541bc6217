import { defineUseCase } from "../use-case";
import { changeSquawk, getSquawkFor } from "./internal";
import { CloseSquawkInput } from "./schema";

/** The engineer has read what was done. */
export const closeSquawk = defineUseCase({
  name: "squawk.close",
  permission: "assess squawks",
  input: CloseSquawkInput,
  run(tx, { actor, now }, which) {
    const row = getSquawkFor(tx, actor, which, "close");
    return changeSquawk(tx, row, { state: "closed", closedBy: actor.id, closedAt: now.toISOString() });
  },
});
