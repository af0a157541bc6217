import { HttpRefusal } from "@/lib/http/http-refusal";
import { respond } from "@/lib/http/respond";

/** Any address of the interface that does not exist, so that a script always reads problem+json. */
function answer() {
  return respond(() => {
    throw new HttpRefusal(404, "Not found", "The interface has no such address.");
  });
}

export { answer as DELETE, answer as GET, answer as PATCH, answer as POST, answer as PUT };
