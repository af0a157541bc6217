export type RefusalCode = "forbidden" | "not-found" | "conflict" | "stale" | "invalid" | "too-many";

/** An expected no, worded for the reader. Throwing it rolls the transaction back; anything else thrown is a bug. */
export class Refusal extends Error {
  override readonly name = "Refusal";
  constructor(
    readonly code: RefusalCode,
    message: string,
    readonly field?: string,
    /** Facts for the caller: the current version with "stale", the findings with a refused release. */
    readonly details?: Record<string, unknown>,
  ) {
    super(message);
  }
}
