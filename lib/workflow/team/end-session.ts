import { and, eq, isNull } from "drizzle-orm";
import { sessions } from "@/db/schema";
import { Refusal } from "../errors";
import { defineUseCase } from "../use-case";
import { EndSessionInput } from "./schema";

/** Signs out one of one's own sign-ins, here or on another device. */
export const endSession = defineUseCase({
  name: "session.end",
  permission: "read and print",
  input: EndSessionInput,
  run(tx, { actor, now }, { sessionId }) {
    const ended = tx
      .update(sessions)
      .set({ endedAt: now.toISOString() })
      .where(and(eq(sessions.id, sessionId), eq(sessions.userId, actor.id), isNull(sessions.endedAt)))
      .run();
    if (ended.changes === 0) throw new Refusal("not-found", "You have no such sign-in, or it is ended already.");
    return {
      out: { sessionId, wasThisOne: sessionId === actor.sessionId },
      audit: { subject: `session/${sessionId}`, after: { ended: true } },
    };
  },
});
