import { join } from "node:path";

/** The folder the project stands in. */
export const root = join(import.meta.dirname, "..", "..");
export const inRoot = (...parts) => join(root, ...parts);

/** Ends with one clear line and exit 1. */
export function fail(line) {
  console.error(line);
  process.exit(1);
}
