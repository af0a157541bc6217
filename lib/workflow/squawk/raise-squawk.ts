import { Refusal } from "../errors";
import { getProgramme } from "../programme/queries";
import { getSortieRow } from "../sortie/rows";
import { defineUseCase } from "../use-case";
import { insertSquawk } from "./insert-squawk";
import { RaiseSquawkInput } from "./schema";

/** Anybody who works on the aircraft may raise one; a grounding one stops release and brief from now. */
export const raiseSquawk = defineUseCase({
  name: "squawk.raise",
  permission: "raise a squawk",
  input: RaiseSquawkInput,
  run(tx, ctx, { programmeId, sortieId, system, text, severity }) {
    getProgramme(tx, ctx.actor, programmeId);
    if (sortieId !== null && getSortieRow(tx, ctx.actor, sortieId).programmeId !== programmeId)
      throw new Refusal("not-found", "This programme has no such sortie.", "sortieId");
    const row = insertSquawk(tx, ctx, {
      programmeId,
      sortieId,
      system,
      text,
      severity,
      pointId: null,
      readingId: null,
      raisedFrom: "person",
    });
    return {
      out: { id: row.id, number: row.number, severity: row.severity, state: row.state },
      audit: { subject: `squawk/${row.id}`, after: row },
    };
  },
});
