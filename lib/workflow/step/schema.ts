import { z } from "zod";
import { id, lineRequired, uuid } from "../fields";

const flownPoint = { sortieId: uuid, revisionId: uuid, pointId: id };

/** `reading` names the one that carries the series: its as-flown true value stands as the step's measured one. */
export const ProposeStepInput = z.strictObject({
  ...flownPoint,
  decision: z.enum(["clear to next step", "smaller step", "hold"], "Choose a decision."),
  reading: id.nullable().default(null),
  why: lineRequired(300, "Say in one line what the decision rests on."),
});
export const SayHoldInput = z.strictObject({ ...flownPoint, why: lineRequired(300, "Say why it is held.") });
export const CountersignStepInput = z.strictObject({ stepId: uuid });
