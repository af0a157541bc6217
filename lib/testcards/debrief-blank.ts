import type { CardDocument, CardPoint, Reading } from "./card";
import type { Debrief, PointDebrief, ReadingEntry } from "./debrief-types";
import type { SortieKind } from "./words";

/** A debrief with nothing said yet: positions are pre-set to the card's, every answer is open. */
export function emptyDebrief(cards: CardDocument | readonly CardDocument[], kind: SortieKind): Debrief {
  const documents = "content" in cards ? [cards] : cards;
  return {
    kind,
    revisionsFlown: [],
    times: {
      offBlocks: null,
      takeOff: null,
      landing: null,
      onBlocks: null,
      engineStart: null,
      engineStop: null,
      start: null,
      end: null,
    },
    fuel: { start: null, end: null, uplift: null },
    weather: { oat: null, qnh: null, windFromDeg: null, windKt: null, turbulence: null },
    safety: { limitExceeded: null, callMade: null, rough: null, calls: [], note: "" },
    points: documents.flatMap((card) => card.content.points.map(emptyPoint)),
    squawks: [],
    comment: "",
  };
}

function emptyPoint(point: CardPoint): PointDebrief {
  return {
    point: point.id,
    outcome: null,
    positions: point.positions.map((position) => ({ ...position })),
    onCondition: null,
    ranForS: null,
    topAltitudeFt: null,
    readings: point.readings.map(emptyEntry),
    comment: "",
  };
}

/** Rows stay empty: a row that was not read does not exist. */
export function emptyEntry(reading: Pick<Reading, "id">): ReadingEntry {
  return {
    reading: reading.id,
    value: null,
    lowest: null,
    atS: null,
    altitudeFt: null,
    oat: null,
    sameMomentAs: null,
    rows: [],
    answer: null,
    unit: null,
    asRead: false,
  };
}
