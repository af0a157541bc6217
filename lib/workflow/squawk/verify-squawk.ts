import { Refusal } from "../errors";
import { defineUseCase } from "../use-case";
import { changeSquawk, getSquawkFor } from "./internal";
import { VerifySquawkInput } from "./schema";

/** From here on a grounding squawk no longer stops release and brief, so it needs the licensed person's entry. */
export const verifySquawk = defineUseCase({
  name: "squawk.verify",
  permission: "rectify squawks",
  input: VerifySquawkInput,
  run(tx, { actor, now }, { entryReference, ...which }) {
    const row = getSquawkFor(tx, actor, which, "verify");
    if (row.severity === "grounding" && entryReference.trim() === "")
      throw new Refusal("invalid", "Give the licensed person's entry: a grounding squawk is not verified without it.", "entryReference");
    return changeSquawk(tx, row, {
      state: "verified",
      verifiedReference: entryReference.trim() || null,
      verifiedBy: actor.id,
      verifiedAt: now.toISOString(),
    });
  },
});
