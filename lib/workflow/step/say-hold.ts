import { defineUseCase } from "../use-case";
import { getFlownPoint, insertDecision } from "./internal";
import { SayHoldInput } from "./schema";

/** Anybody who works on the aircraft may hold the build-up, also after the sortie was closed; it needs nobody's countersignature. */
export const sayHold = defineUseCase({
  name: "step.hold",
  permission: "say hold",
  input: SayHoldInput,
  run(tx, ctx, { why, ...where }) {
    const row = insertDecision(tx, ctx, getFlownPoint(tx, ctx, where), { decision: "hold", reading: null, because: [why] });
    return { out: { id: row.id, decision: row.decision }, audit: { subject: `step/${row.id}`, after: row } };
  },
});
