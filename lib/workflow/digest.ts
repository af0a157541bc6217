import { createHash } from "node:crypto";
import canonicalize from "canonicalize";

/** RFC 8785: one text for one value, whatever the order its fields came in. */
export function canonicalJson(value: unknown): string {
  const text = canonicalize(value);
  if (text === undefined) throw new Error("A value without a JSON form has no canonical text.");
  return text;
}

/** SHA-256, lower-case hex. */
export function sha256(text: string): string {
  return createHash("sha256").update(text, "utf8").digest("hex");
}

export function digestOf(value: unknown): string {
  return sha256(canonicalJson(value));
}
