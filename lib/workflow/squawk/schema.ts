import { z } from "zod";
import { SQUAWK_SEVERITIES } from "@/lib/testcards/words";
import { lineRequired, uuid } from "../fields";

export const RaiseSquawkInput = z.strictObject({
  programmeId: uuid,
  sortieId: uuid.nullable().default(null),
  system: lineRequired(60, "Name the system, such as cooling or fuel."),
  text: lineRequired(500, "Say in one line what was seen."),
  severity: z.enum(SQUAWK_SEVERITIES, "Choose grounding, before next test or monitor."),
});
