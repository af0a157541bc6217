import { toProblem } from "./problem";

/** What a form action answers: words for the whole form, words by field, and what was typed, to fill the form again. */
export type FormState = { message: string | null; fieldErrors: Record<string, string>; values: Record<string, string>; done?: string };

export const EMPTY_FORM: FormState = { message: null, fieldErrors: {}, values: {} };

/** Turns an expected no into a form's messages; a bug is thrown on. Fields named in `secret` are never echoed. */
export function toFormState(error: unknown, form: FormData, secret: string[] = ["password"]): FormState {
  const problem = toProblem(error);
  if (!problem) throw error;
  const values = Object.fromEntries(
    [...form].filter((entry): entry is [string, string] => typeof entry[1] === "string" && !secret.includes(entry[0])),
  );
  const fieldErrors = Object.fromEntries((problem.errors ?? []).map(({ path, message }) => [path, message]));
  return { message: problem.detail, fieldErrors, values };
}
