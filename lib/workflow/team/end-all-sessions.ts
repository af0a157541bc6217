import { and, eq, isNull } from "drizzle-orm";
import { sessions } from "@/db/schema";
import { defineUseCase } from "../use-case";
import { EndAllSessionsInput } from "./schema";

/** Signs the person out everywhere, this device included. */
export const endAllSessions = defineUseCase({
  name: "session.end-all",
  permission: "read and print",
  input: EndAllSessionsInput,
  run(tx, { actor, now }) {
    const ended = tx
      .update(sessions)
      .set({ endedAt: now.toISOString() })
      .where(and(eq(sessions.userId, actor.id), isNull(sessions.endedAt)))
      .run().changes;
    return { out: { ended }, audit: ended === 0 ? "unchanged" : { subject: `user/${actor.id}`, after: { sessionsEnded: ended } } };
  },
});
