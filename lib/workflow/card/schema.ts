import { z } from "zod";
import type { CardContent } from "@/lib/testcards/card";
import { SORTIE_KINDS } from "@/lib/testcards/words";
import { day, digest, id, letter, line, lineRequired, number, paragraph, paragraphRequired, uuid, version } from "../fields";
import { cardPoint } from "./point-schema";

/** What a draft saves. It may be unfinished, so empty words pass here and readiness finds them; impossible figures do not pass. */
const content = z
  .strictObject({
    title: line(80),
    kind: z.enum(SORTIE_KINDS, "Choose the kind of sortie."),
    crew: z.array(z.strictObject({ role: line(40), massKg: number(30, 200) })).max(4, "At most four people."),
    baggageKg: number(0, 500),
    fuelOnBoardL: number(0, 2000).nullable(),
    bingoL: number(0, 2000).nullable(),
    plannedOn: day.nullable(),
    firstFlightOfChange: z.boolean(),
    remarks: paragraph(2000),
    points: z.array(cardPoint).max(40, "At most 40 points on a card."),
  })
  .superRefine(({ points }, context) => {
    const repeated = points.findIndex((point, index) => points.findIndex((other) => other.id === point.id) !== index);
    if (repeated >= 0)
      context.addIssue({ code: "custom", path: ["points", repeated, "id"], message: "Two points of this card share an id." });
  });
export const CardContentInput: z.ZodType<CardContent> = content;

export const CreateCardInput = z.strictObject({
  programmeId: uuid,
  title: lineRequired(80, "Give the card a title."),
  kind: z.enum(SORTIE_KINDS, "Choose the kind of sortie."),
});
export const SaveDraftInput = z.strictObject({ cardId: uuid, version, content: CardContentInput });
export const SubmitCardInput = z.strictObject({
  cardId: uuid,
  version,
  /** By finding key: one line for each "should". */
  answers: z.record(z.string().max(300), line(300)).refine((answers) => Object.keys(answers).length <= 500, "Too many answers."),
});
export const ReturnCardInput = z.strictObject({
  cardId: uuid,
  text: paragraphRequired(2000, "Say what to change: the author reads this."),
});
export const CommentOnCardInput = z.strictObject({
  cardId: uuid,
  pointId: id.nullable().default(null),
  text: paragraphRequired(2000, "Write the comment."),
});
/** `digest` is of the document that was shown; the proof of the password names the same one. */
export const ReleaseCardInput = z.strictObject({ cardId: uuid, digest });
export const WithdrawCardInput = z.strictObject({
  cardId: uuid,
  letter,
  why: lineRequired(300, "Say why it is withdrawn: everybody who holds a print reads this."),
});
export const ReviseCardInput = z.strictObject({ cardId: uuid });
export const PAPERS = ["a5", "half-letter"] as const;
export const RecordPrintInput = z.strictObject({ cardId: uuid, letter, paper: z.enum(PAPERS, "Choose a paper.") });
