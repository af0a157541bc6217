import type { stepDecisions } from "@/db/schema";
import { PROGRAMME_ID } from "./aircraft";
import { dayFrom } from "./days";
import { seedId } from "./ids";
import { PEOPLE } from "./people";
import { COWL_SHUT_SERIES } from "./test-points/cowl-positions";

type Row = typeof stepDecisions.$inferInsert;
type PaperStep = {
  code: string;
  step: string;
  because: string;
  series?: { level: number; measured: number; predicted: { value: number; low: number; high: number } };
};

/** U of the logger's coolant channel, °C: every value of the series was read there. */
const LOGGER_U = 1.5;

/**
 * What was flown and decided on paper before this programme was kept here, in the order it was flown.
 * Predictions of the COWL SHUT series: the base points' printed bands; at 60 % the straight line through the first three,
 * hand calculation: 95.067, s 0.0408, t 12.706, h 0.947, with U 1.5 ±1.774.
 */
const PAPER: PaperStep[] = [
  { code: "T18", step: "T18", because: "tight, oil P up in 4 s, gaps 12 / 45 / 110 mm" },
  { code: "T24", step: "T24 baseline", because: "77 / 78 / 76 / 77 psi held at 80 psi" },
  { code: "T01", step: "T01 at C-14, first run", because: "stabilised, inside the card limits" },
  { code: "T02", step: "T02 a and b", because: "peak within, skin and line within" },
  { code: "T03", step: "T03 a and b", because: "into wind within; crosswind answered: COWL OPEN before stop" },
  { code: "T04", step: "T04", because: "started at the first try" },
  { code: "T05", step: "T05, 12 °C day", because: "inside the card limits as flown; to be flown again on a warmer day" },
  { code: "T06", step: "T06", because: "2700/30.0, drops 80 and 90 rpm" },
  { code: "T23", step: "T23 on the ground", because: "highest 7 mm/s at 2100 rpm" },
  { code: "T26", step: "T26 a", because: "fuel P 2.9 bar at the lowest" },
  { code: "T07", step: "T07", because: "airspeed indicator alive at 22 kt, straight" },
  { code: "T08", step: "T08", because: "inside the card limits" },
  { code: "T25", step: "T25 after the first flight", because: "nothing found" },
  { code: "T09", step: "T09 OPEN", because: "stabilised at four powers" },
  { code: "T14", step: "T14 OPEN and TRAIL", because: "valve regulates, swing 2.5 °C" },
  { code: "T09", step: "T09 TRAIL", because: "stabilised at four powers" },
  { code: "T17", step: "T17", because: "speed correction +3.0 kt at 86 kt, spread 0.3 kt" },
  { code: "T22", step: "T22", because: "metered against filled 1.9 %" },
  { code: "T11", step: "T11 at 85 kt", because: "inside the card limits" },
  { code: "T11", step: "T11 at 75 kt", because: "inside the card limits" },
  { code: "T11", step: "T11 at 68 kt", because: "inside the card limits" },
  {
    code: "T13",
    step: "T13 at 45 %",
    because: "base point, inside its printed band",
    series: { level: 45, measured: 85, predicted: { value: 85, low: 80, high: 90 } },
  },
  {
    code: "T13",
    step: "T13 at 50 %",
    because: "base point, inside its printed band",
    series: { level: 50, measured: 88.4, predicted: { value: 88, low: 83, high: 93 } },
  },
  {
    code: "T13",
    step: "T13 at 55 %",
    because: "base point, inside its printed band",
    series: { level: 55, measured: 91.7, predicted: { value: 91, low: 86, high: 96 } },
  },
  {
    code: "T13",
    step: "T13 at 60 %",
    because: "95.3 °C true, predicted 93.3 to 96.8",
    series: { level: 60, measured: 95.3, predicted: { value: 95.067, low: 93.293, high: 96.841 } },
  },
];

/** The first day of the paper records, counted from the demo date; one step a day. */
const FIRST = -50;

export function paperSteps(demoDate: string): Row[] {
  return PAPER.map(({ code, step, because, series }, index) => {
    const day = dayFrom(demoDate, FIRST + index);
    return {
      id: seedId("step decision", index + 1),
      programmeId: PROGRAMME_ID,
      testPointCode: code,
      step,
      series: series ? COWL_SHUT_SERIES : null,
      level: series?.level ?? null,
      measured: series?.measured ?? null,
      expandedUncertainty: series ? LOGGER_U : null,
      predicted: series?.predicted ?? null,
      computed: "clear to next step",
      decision: "clear to next step",
      because: [because],
      origin: "paper records",
      sortieId: null,
      proposedBy: PEOPLE.engineer.id,
      proposedAt: `${day}T16:00:00.000Z`,
      countersignedBy: PEOPLE.reviewer.id,
      countersignedAt: `${day}T17:00:00.000Z`,
      position: index + 1,
      createdAt: `${day}T16:00:00.000Z`,
    };
  });
}
