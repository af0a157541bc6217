import { notFound } from "next/navigation";
import { Refusal } from "@/lib/workflow/errors";

/** Answers the page for "not found" where a query says that there is no such thing in this team. */
export function orNotFound<Out>(read: () => Out): Out {
  try {
    return read();
  } catch (error) {
    if (error instanceof Refusal && error.code === "not-found") notFound();
    throw error;
  }
}
