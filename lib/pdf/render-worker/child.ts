/** A process of its own that draws PDFs: started by render-off-thread.ts through tsx, told its work and asked for bytes by message. */
import { renderKneeboard } from "@/lib/pdf/kneeboard/render";
import type { RenderAnswer, RenderOrder } from "./messages";

const answer = (message: RenderAnswer) => process.send?.(message);

process.on("message", (order: RenderOrder) => {
  renderKneeboard(order.model)
    .then((pdf) => answer({ id: order.id, pdf }))
    .catch((error: unknown) => answer({ id: order.id, error: error instanceof Error ? error.message : String(error) }));
});
// Without its parent nobody waits for an answer.
process.on("disconnect", () => process.exit(0));
