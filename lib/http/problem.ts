import { ZodError } from "zod";
import { Refusal, type RefusalCode } from "@/lib/workflow/errors";

const STATUS: Record<RefusalCode, number> = { forbidden: 403, "not-found": 404, conflict: 409, stale: 412, invalid: 422, "too-many": 429 };
const TITLE: Record<RefusalCode, string> = {
  forbidden: "Your role may not do this",
  "not-found": "Not found",
  conflict: "Not possible as things stand",
  stale: "Changed by someone else meanwhile",
  invalid: "Input refused",
  "too-many": "Too many tries",
};

export type Problem = { type: string; title: string; status: number; detail: string; errors?: { path: string; message: string }[] } & Record<string, unknown>;

/** RFC 9457 body of an expected no; undefined for a bug, which the caller logs and answers 500. */
export function toProblem(error: unknown): Problem | undefined {
  if (error instanceof ZodError) {
    const errors = error.issues.map((issue) => ({ path: issue.path.join("."), message: issue.message }));
    return { type: "about:blank", title: "Input refused", status: 422, detail: "Some of the input cannot be used. Each error says what to change.", errors };
  }
  if (error instanceof Refusal) {
    const errors = error.field ? [{ path: error.field, message: error.message }] : undefined;
    return { type: "about:blank", title: TITLE[error.code], status: STATUS[error.code], detail: error.message, ...(errors ? { errors } : {}), ...error.details };
  }
  return undefined;
}

export function problemResponse(problem: Problem): Response {
  return Response.json(problem, { status: problem.status, headers: { "Content-Type": "application/problem+json", "Cache-Control": "no-store" } });
}
