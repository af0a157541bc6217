import { z } from "zod";
import { SQUAWK_DISPOSITIONS, SQUAWK_SEVERITIES, SQUAWK_STATES } from "@/lib/testcards/words";
import { line, lineRequired, uuid } from "../fields";

export const RaiseSquawkInput = z.strictObject({
  programmeId: uuid,
  sortieId: uuid.nullable().default(null),
  system: lineRequired(60, "Name the system, such as cooling or fuel."),
  text: lineRequired(500, "Say in one line what was seen."),
  severity: z.enum(SQUAWK_SEVERITIES, "Choose grounding, before next test or monitor."),
});

/** `from` is the state the person saw: acted on meanwhile, nothing is changed. */
const which = { squawkId: uuid, from: z.enum(SQUAWK_STATES, "Send the state you saw.").optional() };

export const AssessSquawkInput = z.strictObject({
  ...which,
  severity: z.enum(SQUAWK_SEVERITIES, "Choose grounding, before next test or monitor."),
  why: line(300).default(""),
});
export const RectifySquawkInput = z.strictObject({
  ...which,
  disposition: z.enum(["rectified", "no fault found"], "Choose rectified or no fault found."),
  why: lineRequired(300, "Say in one line what was done or looked at."),
  entryReference: lineRequired(120, "Give the entry where the work is written up, such as log 2, page 14."),
});
export const AcceptSquawkInput = z
  .strictObject({
    ...which,
    disposition: z.enum(["deferred with limit", "accepted as is"], "Choose deferred with limit or accepted as is."),
    why: lineRequired(300, "Give the engineering reason in one line."),
    limit: line(200).default(""),
  })
  .refine(({ disposition, limit }) => disposition === "accepted as is" || limit.trim() !== "", {
    path: ["limit"],
    message: "Say the limit: until when, or within what, it is flown.",
  });
export const VerifySquawkInput = z.strictObject({ ...which, entryReference: line(120).default("") });
export const CloseSquawkInput = z.strictObject(which);

/** What the address of a transition reads first: where to, and by which disposition. The use case reads the rest. */
export const TransitionInput = z
  .looseObject({
    to: z.enum(["assessed", "dispositioned", "verified", "closed"], "Say where to: assessed, dispositioned, verified or closed."),
    disposition: z.enum(SQUAWK_DISPOSITIONS, "Choose one of the four dispositions.").optional(),
  })
  .refine(({ to, disposition }) => (to === "dispositioned") === (disposition !== undefined), {
    path: ["disposition"],
    message: "A disposition goes with “dispositioned”, and only with it.",
  });
