import { z } from "zod";
import { COMMENT_LENGTH } from "@/lib/testcards/debrief";
import type { AbortCall, Debrief, PointDebrief, ReadingEntry } from "@/lib/testcards/debrief-types";
import { CALL_WORDS, OUTCOMES, SORTIE_KINDS } from "@/lib/testcards/words";
import { figure, id, line, number, paragraph, quantity, unit, uuid } from "../fields";

/**
 * The debrief as typed. Whether a value can be on its gauge, and whether times follow one another, is the core's to say
 * (`validateDebrief`): it knows the card. Here stand shape, lengths and finite numbers.
 */
const clock = z
  .string()
  .regex(/^([01]\d|2[0-3]):[0-5]\d$/, "Write the time as hh:mm, UTC.")
  .nullable();
const seconds = number(0, 86_400).nullable();
const said = paragraph(COMMENT_LENGTH);

const readingEntry: z.ZodType<ReadingEntry> = z.strictObject({
  reading: id,
  value: figure.nullable(),
  lowest: figure.nullable(),
  atS: seconds,
  altitudeFt: number(-2000, 65_000).nullable(),
  oat: figure.nullable(),
  sameMomentAs: id.nullable(),
  rows: z.array(z.strictObject({ atS: seconds, label: line(40), value: figure })).max(500, "At most 500 rows."),
  answer: paragraph(COMMENT_LENGTH).nullable(),
  unit: unit.nullable(),
  asRead: z.boolean(),
});

const pointDebrief: z.ZodType<PointDebrief> = z.strictObject({
  point: id,
  outcome: z.enum(OUTCOMES, "Say how the point ended.").nullable(),
  positions: z.array(z.strictObject({ control: line(30), position: line(30) })).max(10),
  onCondition: z.boolean().nullable(),
  ranForS: seconds,
  topAltitudeFt: number(-2000, 65_000).nullable(),
  readings: z.array(readingEntry).max(60),
  comment: said,
});

const call: z.ZodType<AbortCall> = z.strictObject({
  point: id,
  word: z.enum(CALL_WORDS, "Choose the word that was called.").nullable(),
  trigger: said,
  onGauge: figure.nullable(),
  durationS: seconds,
  action: said,
  recovered: z.boolean().nullable(),
});

export const DebriefInput: z.ZodType<Debrief> = z.strictObject({
  kind: z.enum(SORTIE_KINDS),
  revisionsFlown: z.array(z.strictObject({ card: id, letter: line(10), note: said })).max(20),
  times: z.strictObject({
    offBlocks: clock,
    takeOff: clock,
    landing: clock,
    onBlocks: clock,
    engineStart: clock,
    engineStop: clock,
    start: clock,
    end: clock,
  }),
  fuel: z.strictObject({ start: quantity.nullable(), end: quantity.nullable(), uplift: quantity.nullable() }),
  weather: z.strictObject({
    oat: quantity.nullable(),
    qnh: quantity.nullable(),
    windFromDeg: number(0, 360).nullable(),
    windKt: number(0, 200).nullable(),
    turbulence: z.enum(["none", "light", "moderate", "severe"]).nullable(),
  }),
  safety: z.strictObject({
    limitExceeded: z.boolean().nullable(),
    callMade: z.boolean().nullable(),
    rough: z.boolean().nullable(),
    calls: z.array(call).max(20),
    note: said,
  }),
  points: z.array(pointDebrief).max(80),
  squawks: z.array(z.strictObject({ id, system: line(60), text: said, flyAgain: z.boolean().nullable() })).max(20),
  comment: said,
});

/** The phone mints `id` when the form is opened, so that the same debrief sent twice is one. */
export const SubmitDebriefInput = z.strictObject({ id: uuid, sortieId: uuid, content: DebriefInput });
