import type { CardDocument, Quantity } from "@/lib/testcards/card";
import { emptyDebrief } from "@/lib/testcards/debrief-blank";
import type { Debrief, DebriefTimes, ReadingEntry } from "@/lib/testcards/debrief-types";
import type { SortieKind } from "@/lib/testcards/words";
import { POINT_IDS } from "./cards";

type Said = Partial<Omit<ReadingEntry, "reading">>;
type Flown = {
  point: string;
  ranForS: number;
  topAltitudeFt?: number;
  readings: Record<string, Said>;
  comment: string;
};
type Head = { times: Partial<DebriefTimes>; fuelL: [start: number, end: number]; oatC: number; windFromDeg: number; windKt: number };

const amount = (value: number, unit: Quantity["unit"]): Quantity => ({ value, unit });

function debriefOf(document: CardDocument, kind: SortieKind, head: Head, flown: Flown): Debrief {
  const blank = emptyDebrief(document, kind);
  const { identity } = document;
  return {
    ...blank,
    revisionsFlown: [{ card: identity.id, letter: identity.letter, note: "" }],
    times: { ...blank.times, ...head.times },
    fuel: { start: amount(head.fuelL[0], "L"), end: amount(head.fuelL[1], "L"), uplift: null },
    weather: {
      oat: amount(head.oatC, "degC"),
      qnh: amount(1013.25, "hPa"),
      windFromDeg: head.windFromDeg,
      windKt: head.windKt,
      turbulence: "light",
    },
    safety: { ...blank.safety, limitExceeded: false, callMade: false, rough: false },
    points: blank.points.map((point) =>
      point.point === flown.point
        ? {
            ...point,
            outcome: "flown",
            onCondition: true,
            ranForS: flown.ranForS,
            topAltitudeFt: flown.topAltitudeFt ?? null,
            readings: point.readings.map((entry) => ({ ...entry, ...flown.readings[entry.reading] })),
            comment: flown.comment,
          }
        : point,
    ),
  };
}

/** One row a minute, the first at 1 min. */
const minutes = (...values: number[]): ReadingEntry["rows"] =>
  values.map((value, index) => ({ atS: (index + 1) * 60, label: String(index + 1), value }));

/** Static ground run, COWL OPEN, OAT 21 °C: coolant steady for the last six readings, CHT for six, oil T for nine. */
export const groundRunDebrief = (document: CardDocument): Debrief =>
  debriefOf(
    document,
    "ground run",
    { times: { engineStart: "08:31", engineStop: "09:02" }, fuelL: [40, 31], oatC: 21, windFromDeg: 240, windKt: 8 },
    {
      point: POINT_IDS.T01,
      ranForS: 780,
      comment: "Steady from the eighth minute.",
      readings: {
        "t01-coolant": { rows: minutes(70, 77.5, 82.5, 85, 87.5, 90, 90, 92.5, 92.5, 92.5, 92.5, 92.5, 92.5) },
        "t01-cht": { rows: minutes(190, 215, 230, 240, 245, 250, 250, 255, 255, 255, 255, 255, 255) },
        "t01-oil-t": { rows: minutes(65, 70, 75, 80, 85, 85, 85, 85, 85, 85, 85, 85, 85) },
        "t01-oil-p": { lowest: 55, value: 55 },
        "t01-iat": { value: 41, atS: 720, oat: 21 },
        "t01-oat": { value: 21 },
        "t01-tit": { value: 790, atS: 720, oat: 21 },
        "t01-oil-t-before": { value: 60 },
        "t01-rpm-full": { value: 2700 },
        "t01-map-full": { value: 30 },
        "t01-rpm": { value: 2550 },
        "t01-map": { value: 28.5 },
        "t01-catch-tank": { value: 20 },
      },
    },
  );

/** Climb with COWL OPEN: every highest at 5900 ft and 7 °C, kept 5 min 20 s past it, to 10 100 ft. */
const PEAK_S = 395;
const atPeak = { atS: PEAK_S, altitudeFt: 5900, oat: 7 };
const withCoolant: Said = { sameMomentAs: "t10-coolant" };

export const climbDebrief = (document: CardDocument): Debrief =>
  debriefOf(
    document,
    "flight",
    {
      times: { offBlocks: "09:12", takeOff: "09:21", landing: "10:04", onBlocks: "10:10" },
      fuelL: [64, 41],
      oatC: 18,
      windFromDeg: 250,
      windKt: 9,
    },
    {
      point: POINT_IDS.T10,
      ranForS: PEAK_S + 320,
      topAltitudeFt: 10_100,
      comment: "Smooth above 3000 ft. Level at 10 100 ft, clear of cloud.",
      readings: {
        "t10-oat": { value: 7 },
        "t10-coolant": { value: 95, ...atPeak },
        "t10-cht": { value: 265, ...withCoolant },
        "t10-oil-t": { value: 105, ...withCoolant },
        "t10-iat": { value: 35, ...withCoolant },
        "t10-tit": { value: 850, ...withCoolant },
        "t10-oil-p": { lowest: 52.5, value: 57.5 },
        "t10-oil-t-before": { value: 90 },
        "t10-rpm-full": { value: 2700 },
        "t10-map-full": { value: 30 },
        "t10-rpm": { value: 2550 },
        "t10-map": { value: 28.5 },
      },
    },
  );
