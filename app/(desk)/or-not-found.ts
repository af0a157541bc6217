import { notFound } from "next/navigation";
import { Refusal } from "@/lib/workflow/errors";

/** Reads for a page: what is absent, or another team's, becomes the page's "not found". */
export function orNotFound<T>(read: () => T): T {
  try {
    return read();
  } catch (error) {
    if (error instanceof Refusal && error.code === "not-found") notFound();
    throw error;
  }
}
