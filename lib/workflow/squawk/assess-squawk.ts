import { Refusal } from "../errors";
import { defineUseCase } from "../use-case";
import { changeSquawk, getSquawkFor } from "./internal";
import { isFixedGrounding } from "./policy";
import { AssessSquawkInput } from "./schema";

/** The engineer confirms the severity, or changes it with a reason. */
export const assessSquawk = defineUseCase({
  name: "squawk.assess",
  permission: "assess squawks",
  input: AssessSquawkInput,
  run(tx, { actor, now }, { severity, why, ...which }) {
    const row = getSquawkFor(tx, actor, which, "assess");
    if (severity !== row.severity && isFixedGrounding(row))
      throw new Refusal(
        "conflict",
        "A reading lay past a placard, so this squawk stays grounding until the maker's inspection is done and entered.",
        "severity",
      );
    if (severity !== row.severity && why.trim() === "") throw new Refusal("invalid", `Say why it is no longer ${row.severity}.`, "why");
    return changeSquawk(tx, row, {
      state: "assessed",
      severity,
      assessedBy: actor.id,
      assessedAt: now.toISOString(),
      assessedWhy: why.trim() || null,
    });
  },
});
