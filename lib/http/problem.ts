import { ZodError } from "zod";
import { ForeignOrigin, SignInNeeded, TooManyTries, WrongPassword } from "@/lib/auth/errors";
import { Refusal, type RefusalCode } from "@/lib/workflow/errors";
import { HttpRefusal } from "./http-refusal";

const STATUS: Record<RefusalCode, number> = { forbidden: 403, "not-found": 404, conflict: 409, stale: 412, invalid: 422, "too-many": 429 };
const TITLE: Record<RefusalCode, string> = {
  forbidden: "Your role may not do this",
  "not-found": "Not found",
  conflict: "Not possible as things stand",
  stale: "Changed by someone else meanwhile",
  invalid: "Input refused",
  "too-many": "Too many tries",
};

export type Problem = {
  type: string;
  title: string;
  status: number;
  detail: string;
  errors?: { path: string; message: string }[];
} & Record<string, unknown>;

/** RFC 9457 body of an expected no; undefined for a bug, which the caller logs and answers 500. */
export function toProblem(error: unknown): Problem | undefined {
  if (error instanceof ZodError) {
    const errors = error.issues.flatMap(toFieldErrors);
    return {
      type: "about:blank",
      title: "Input refused",
      status: 422,
      detail: "Some of the input cannot be used. Each error says what to change.",
      errors,
    };
  }
  if (error instanceof Refusal) {
    const errors = error.field ? [{ path: error.field, message: error.message }] : undefined;
    return {
      type: "about:blank",
      title: TITLE[error.code],
      status: STATUS[error.code],
      detail: error.message,
      ...(errors ? { errors } : {}),
      ...error.details,
    };
  }
  if (error instanceof HttpRefusal) return { type: "about:blank", title: error.title, status: error.status, detail: error.message };
  if (error instanceof SignInNeeded) return { type: "about:blank", title: "Not signed in", status: 401, detail: error.message };
  if (error instanceof ForeignOrigin) return { type: "about:blank", title: "Not from our own pages", status: 403, detail: error.message };
  if (error instanceof TooManyTries)
    return { type: "about:blank", title: TITLE["too-many"], status: 429, detail: error.message, retryAfterS: error.retryAfterS };
  if (error instanceof WrongPassword) {
    const errors = [{ path: error.field, message: error.message }];
    return { type: "about:blank", title: "Not signed", status: 422, detail: error.message, errors };
  }
  return undefined;
}

/** An unknown field is refused by its name. */
function toFieldErrors(issue: ZodError["issues"][number]): { path: string; message: string }[] {
  if (issue.code !== "unrecognized_keys") return [{ path: issue.path.join("."), message: issue.message }];
  return issue.keys.map((key) => ({ path: [...issue.path, key].join("."), message: "This field is not known here: take it out." }));
}

export function problemResponse(problem: Problem): Response {
  return Response.json(problem, {
    status: problem.status,
    headers: {
      "Content-Type": "application/problem+json",
      "Cache-Control": "no-store",
      ...(typeof problem.retryAfterS === "number" ? { "Retry-After": String(problem.retryAfterS) } : {}),
    },
  });
}
