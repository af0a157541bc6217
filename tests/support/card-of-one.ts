import { assembleCard, type CardContent, type CardDocument, type CardPoint, type ProgrammeSnapshot } from "@/lib/testcards/card";

const TAXI = ["T05", "T07"];

function kindFor(point: CardPoint): CardContent["kind"] {
  if (point.engine === "stopped") return "inspection";
  if (point.place === "air") return "flight";
  return TAXI.includes(point.template?.code ?? "") ? "taxi" : "ground run";
}

/** One test point of the demo, alone on a card that nothing else troubles. */
export const cardOfOne = (programme: ProgrammeSnapshot, point: CardPoint, day: string): CardDocument =>
  assembleCard(
    programme,
    { id: "card", number: "01", letter: "A", author: { id: "author", name: "A. Engineer" } },
    {
      title: point.title,
      kind: kindFor(point),
      crew: [{ role: "pilot", massKg: 92 }],
      baggageKg: 6,
      fuelOnBoardL: 64,
      bingoL: 26,
      plannedOn: day,
      firstFlightOfChange: point.firstFlight,
      remarks: "",
      points: [point],
    },
  );
