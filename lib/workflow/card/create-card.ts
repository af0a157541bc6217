import { eq, sql } from "drizzle-orm";
import { cardRevisions, cards } from "@/db/schema";
import type { CardContent } from "@/lib/testcards/card";
import { getProgramme } from "../programme/queries";
import { defineUseCase } from "../use-case";
import { CreateCardInput } from "./schema";

/** A new card: the next free number of the programme, revision A, an empty draft. */
export const createCard = defineUseCase({
  name: "card.create",
  permission: "write cards",
  input: CreateCardInput,
  run(tx, { actor, now, newId }, { programmeId, title, kind }) {
    getProgramme(tx, actor, programmeId);
    const highest = tx
      .select({ number: sql<number | null>`max(cast(${cards.number} as integer))` })
      .from(cards)
      .where(eq(cards.programmeId, programmeId))
      .get();
    const number = String((highest?.number ?? 0) + 1).padStart(2, "0");
    const at = now.toISOString();
    const card = { id: newId(), programmeId, number, createdAt: at, createdBy: actor.id };
    const content: CardContent = {
      title,
      kind,
      crew: [],
      baggageKg: 0,
      fuelOnBoardL: null,
      bingoL: null,
      plannedOn: null,
      firstFlightOfChange: false,
      remarks: "",
      points: [],
    };
    tx.insert(cards).values(card).run();
    tx.insert(cardRevisions)
      .values({
        id: newId(),
        cardId: card.id,
        letter: "A",
        state: "draft",
        content,
        authorId: actor.id,
        createdAt: at,
        updatedAt: at,
        answers: {},
      })
      .run();
    return { out: { id: card.id, number, letter: "A", version: 1 }, audit: { subject: `card/${card.id}`, after: { number, title, kind } } };
  },
});
