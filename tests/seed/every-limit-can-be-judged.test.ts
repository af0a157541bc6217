/**
 * A printed limit whose reading cannot speak for it would never be answered, however carefully the form is filled in.
 * So every field that the phone asks of a test point is filled here, with a figure inside its limits, and then nothing that is
 * required may lack a reading. What the phone does not ask stays empty: that is the point.
 */
import { describe, expect, test } from "vitest";
import { demoSnapshot } from "@/db/seed/snapshot";
import { TEST_POINTS } from "@/db/seed/test-points/shelf";
import { readingFor } from "@/lib/testcards/calibration";
import { type CardDocument, type CardPoint, instrumentOf, type Reading } from "@/lib/testcards/card";
import { checkDebrief } from "@/lib/testcards/check-debrief";
import { limitsOn } from "@/lib/testcards/check-limits";
import { debriefModel } from "@/lib/testcards/debrief";
import { emptyDebrief } from "@/lib/testcards/debrief-blank";
import type { CheckContext, CheckLine, Debrief, DebriefField, ReadingEntry } from "@/lib/testcards/debrief-types";
import { convert, sameDimension, type Unit } from "@/lib/testcards/units";
import { validateDebrief } from "@/lib/testcards/validate-debrief";
import { cardOfOne } from "../support/card-of-one";

const DAY = "2031-05-09";
const programme = demoSnapshot(DAY);

/** The middle of what the reading may be: expected, inside its limits, on the gauge. */
function figureFor(card: CardDocument, point: CardPoint, reading: Reading): number {
  const instrument = instrumentOf(card, reading.instrument);
  const calibration = instrument?.calibration;
  const unit = instrument?.unit ?? reading.unit ?? "1";
  const onGauge = (value: number | null, from: Unit) => {
    if (value === null || !sameDimension(from, unit)) return [];
    const turned = convert(value, from, unit);
    return [calibration ? readingFor(turned, calibration).reading : turned];
  };
  const levels = limitsOn(card, point, reading).filter(({ statistic }) => statistic === "instant" || statistic === "sustained");
  const bounds = (side: "max" | "min") => levels.filter((limit) => limit.side === side).flatMap(({ value, unit: u }) => onGauge(value, u));
  const { expected } = reading;
  const low = [calibration?.low ?? reading.low ?? 0, ...bounds("min"), ...(expected ? onGauge(expected.low, expected.unit) : [])];
  const high = [calibration?.high ?? reading.high ?? 1, ...bounds("max"), ...(expected ? onGauge(expected.high, expected.unit) : [])];
  const middle = (Math.max(...low) + Math.min(...high)) / 2;
  return reading.kind === "count" ? Math.max(1, Math.floor(middle)) : middle;
}

function entryFor(card: CardDocument, point: CardPoint, reading: Reading, entry: ReadingEntry, fields: DebriefField[]): ReadingEntry {
  const own = new Set(fields.filter((field) => field.reading === reading.id).map(({ key }) => key.split(".").at(-1)));
  const rows = fields.find((field) => field.reading === reading.id && field.part === "rows")?.rows ?? [];
  if (reading.kind !== "number" && reading.kind !== "count") return { ...entry, answer: reading.choices[0] ?? "yes" };
  const value = figureFor(card, point, reading);
  return {
    ...entry,
    value: own.has("value") ? value : null,
    lowest: own.has("lowest") ? value : null,
    rows: rows.map((row) => ({ ...row, value })),
    atS: own.has("atS") ? 600 : null,
    altitudeFt: own.has("altitudeFt") ? 5000 : null,
    oat: own.has("oat") ? 15 : null,
  };
}

/** 9000 s is longer than any run that a point asks for; 11 000 ft is above the critical altitude. */
function filledIn(card: CardDocument): Debrief {
  const fields = debriefModel(card);
  const blank = emptyDebrief(card, card.content.kind);
  return {
    ...blank,
    weather: { ...blank.weather, oat: { value: 15, unit: "degC" }, qnh: { value: 1013.25, unit: "hPa" } },
    points: blank.points.map((said) => {
      const point = card.content.points.find(({ id }) => id === said.point);
      if (!point) throw new Error(said.point);
      const readings = point.readings.flatMap((reading) => {
        const entry = said.readings.find((one) => one.reading === reading.id);
        return entry ? [entryFor(card, point, reading, entry, fields)] : [];
      });
      return { ...said, outcome: "flown" as const, onCondition: true, ranForS: 9000, topAltitudeFt: 11_000, readings };
    }),
  };
}

const context: CheckContext = {
  flownOn: DAY,
  configurationId: programme.configuration?.id ?? null,
  stationPressureAltitudeFt: null,
  calibrations: null,
  amendments: [],
  dispositions: [],
  groundingOpen: false,
};

const PLACES = TEST_POINTS.map((point) => [point.template?.code ?? "", point] as const);
const said = ({ reading, comparison, limit, why }: CheckLine) =>
  `${reading}, ${comparison} ${limit?.side} ${limit?.value} ${limit?.unit}: ${why}`;

describe("filled in completely", () => {
  test.each(PLACES)("%s leaves no required limit without a reading", (_, point) => {
    const card = cardOfOne(programme, point, DAY);
    const { lines } = checkDebrief(card, filledIn(card), context);
    const unread = lines.filter((line) => line.required && line.reasons.includes("no reading"));
    expect(unread.map(said)).toEqual([]);
  });

  test.each(PLACES)("%s is refused nothing that it asks for", (_, point) => {
    const card = cardOfOne(programme, point, DAY);
    const ranged = validateDebrief(card, filledIn(card)).filter(({ key }) => key.startsWith(`${point.id}.`));
    expect(ranged).toEqual([]);
  });
});

/** The same figure wherever this reading is typed. */
const reads = (entry: ReadingEntry, value: number): ReadingEntry => ({
  ...entry,
  value,
  lowest: value,
  rows: entry.rows.map((row) => ({ ...row, value })),
});

describe("a figure past a limit of the point's own", () => {
  const own = TEST_POINTS.flatMap((point) =>
    point.limits.filter(({ statistic }) => statistic === "instant" || statistic === "sustained").map((limit) => ({ point, limit })),
  );

  // Past by 1 or by 1 %, whichever is more: a value beyond its limit is exceeded, whatever U is.
  test.each(own.map(({ point, limit }) => [point.template?.code ?? "", limit.label, point, limit] as const))(
    "%s, %s, is found exceeded",
    (_code, _label, point, limit) => {
      const card = cardOfOne(programme, point, DAY);
      const reading = point.readings.find(({ id }) => id === limit.reading);
      const calibration = instrumentOf(card, reading?.instrument ?? null)?.calibration;
      const past = limit.value + (limit.side === "max" ? 1 : -1) * Math.max(1, limit.value / 100);
      const value = calibration ? readingFor(past, calibration).reading : past;
      const debrief = filledIn(card);
      const points = debrief.points.map((one) => ({
        ...one,
        readings: one.readings.map((entry) => (entry.reading === limit.reading ? reads(entry, value) : entry)),
      }));
      const line = checkDebrief(card, { ...debrief, points }, context).lines.find((one) => one.limit?.id === limit.id);
      expect(line).toMatchObject({ verdict: "exceeded", required: true });
    },
  );
});
