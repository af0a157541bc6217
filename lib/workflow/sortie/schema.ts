import { z } from "zod";
import { DISPOSITIONS, SORTIE_KINDS } from "@/lib/testcards/words";
import { day, digest, id, line, lineRequired, number, uuid, version } from "../fields";

const person = z.strictObject({
  userId: uuid.nullable().default(null),
  name: lineRequired(80, "Name the person."),
  role: z.enum(["pilot", "observer"], "Choose pilot or observer."),
  massKg: number(30, 200).int("Write whole kilograms."),
});
const crew = z
  .array(person)
  .min(1, "Name the pilot.")
  .max(4, "At most four people.")
  .refine((people) => people.filter(({ role }) => role === "pilot").length === 1, "Name exactly one pilot.");
const revisionIds = z
  .array(uuid)
  .min(1, "Choose at least one card.")
  .max(10, "At most ten cards.")
  .refine((ids) => new Set(ids).size === ids.length, "A card stands here twice.");
const settings = z.strictObject({
  baggageKg: number(0, 500).default(0),
  fuelOnBoardL: number(0, 2000).nullable().default(null),
  forecastOatC: number(-60, 60).nullable().default(null),
  dayPlan: z
    .strictObject({ daylight: line(120).nullable(), dutyTime: line(120).nullable(), runway: line(120).nullable() })
    .default({ daylight: null, dutyTime: null, runway: null }),
});

export const PlanSortieInput = z.strictObject({
  programmeId: uuid,
  kind: z.enum(SORTIE_KINDS, "Choose the kind of sortie."),
  plannedOn: day,
  configurationId: uuid.nullable().default(null),
  crew,
  revisionIds,
  settings: settings.default({
    baggageKg: 0,
    fuelOnBoardL: null,
    forecastOatC: null,
    dayPlan: { daylight: null, dutyTime: null, runway: null },
  }),
});
/** Only what is sent changes. */
export const ChangeSortieInput = z.strictObject({
  sortieId: uuid,
  version,
  kind: z.enum(SORTIE_KINDS, "Choose the kind of sortie.").optional(),
  plannedOn: day.optional(),
  configurationId: uuid.nullable().optional(),
  crew: crew.optional(),
  revisionIds: revisionIds.optional(),
  settings: settings.optional(),
});
export const EnterLoadingInput = z.strictObject({ sortieId: uuid, version, settings });
export const AnswerCardInput = z
  .strictObject({
    sortieId: uuid,
    revisionId: uuid,
    /** Of the card that was shown. */
    digest,
    answer: z.enum(["accepted", "declined"], "Accept or decline."),
    why: line(300).default(""),
  })
  .refine(({ answer, why }) => answer === "accepted" || why.trim() !== "", {
    path: ["why"],
    message: "Say why it is declined: the engineer reads this.",
  });
export const BriefSortieInput = z.strictObject({
  sortieId: uuid,
  goNoGo: z.array(z.strictObject({ line: line(200), go: z.boolean() })).max(40),
  /** By finding key: one line for each "should". */
  answers: z.record(z.string().max(300), line(300)).default({}),
});
export const DisposePointInput = z
  .strictObject({
    sortieId: uuid,
    revisionId: uuid,
    pointId: id,
    disposition: z.enum(DISPOSITIONS, "Choose accept, repeat or void."),
    why: line(300).default(""),
  })
  .refine(({ disposition, why }) => disposition === "accept" || why.trim() !== "", {
    path: ["why"],
    message: "Say why: the data stays, with this line beside it.",
  });
export const CloseSortieInput = z.strictObject({ sortieId: uuid, why: line(300).default("") });
export const CancelSortieInput = z.strictObject({
  sortieId: uuid,
  version,
  why: lineRequired(300, "Say in one line why it is cancelled."),
});
