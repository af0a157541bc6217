import { z } from "zod";
import { UNITS, type Unit } from "@/lib/testcards/units";

/** Building blocks of every schema: text has a length, numbers are finite, days are days. Words say what to do. */

/** One line of text; control characters and line breaks are refused, emoji and any script are text. */
export const line = (most: number) =>
  z
    .string()
    .max(most, `Shorten this to ${most} characters.`)
    .refine((text) => !hasControls(text), "Take out the line breaks and control characters.");

export const lineRequired = (most: number, message = "Fill this in.") => line(most).trim().min(1, message);

/** Several lines; only tabs and line breaks are allowed as control characters. */
export const paragraph = (most: number) =>
  z
    .string()
    .max(most, `Shorten this to ${most} characters.`)
    .refine((text) => !hasControls(text.replace(/[\n\r\t]/g, "")), "Take out the control characters.");

export const paragraphRequired = (most: number, message = "Fill this in.") => paragraph(most).trim().min(1, message);

function hasControls(text: string): boolean {
  return [...text].some((character) => character < " " || character === "\u007f");
}

export const number = (low: number, high: number) =>
  z.number("Write a number.").min(low, `This is at least ${low}.`).max(high, `This is at most ${high}.`);

/** Any figure a gauge, a limit or a sum of the trade can have; far past it lies a slip of the hand. */
export const figure = number(-1e6, 1e6);
export const positive = figure.refine((value) => value > 0, "This is above 0.");

export const unit = z.enum(UNITS as [Unit, ...Unit[]], "Choose a unit of the list.");
export const quantity = z.strictObject({ value: figure, unit });

/** A real calendar day: 2026-02-30 is refused. */
export const day = z
  .string()
  .refine(
    (text) => /^\d{4}-\d{2}-\d{2}$/.test(text) && !Number.isNaN(Date.parse(text)) && new Date(text).toISOString().startsWith(text),
    "Write the day as YYYY-MM-DD.",
  );

export const id = z
  .string()
  .min(1, "This id is missing.")
  .max(64, "This is not an id.")
  .regex(/^[A-Za-z0-9._:-]+$/, "This is not an id.");
export const uuid = z.uuid("This is not an id.");
export const digest = z.string().regex(/^[0-9a-f]{64}$/, "This is not a digest.");
export const version = z.number("Send the version you saw.").int("Send the version you saw.").min(1).max(1e9);
export const letter = z.string().regex(/^[A-Z]{1,2}$/, "A revision is one or two capital letters.");
