import { z } from "zod";
import type { AbortLine, CardPoint, EntryCondition, PointLimit, Reading, Step } from "@/lib/testcards/card";
import { COMPLETION_RULES, LIMIT_CONDITIONS, LIMIT_STATISTICS, READING_KINDS, SAMPLINGS, SIDES } from "@/lib/testcards/words";
import { figure, id, line, number, paragraph, quantity, unit } from "../fields";

const seconds = number(0, 86_400);
const conditions = z.array(z.enum(LIMIT_CONDITIONS)).max(LIMIT_CONDITIONS.length);
const codes = z.array(line(20)).max(20);
const band = z.strictObject({ low: figure.nullable(), high: figure.nullable(), unit });
const side = z.enum(SIDES);

const abortLine: z.ZodType<AbortLine> = z.discriminatedUnion("kind", [
  z.strictObject({
    kind: z.literal("number"),
    id,
    parameter: line(40),
    side,
    instrument: id,
    appliesWhen: z.enum(LIMIT_CONDITIONS),
    trueValue: figure,
    onGauge: figure,
    setBy: z.enum(["rule", "true", "gauge"]),
    perMinute: z.boolean(),
    windowS: seconds.nullable(),
    calledBy: z.enum(["pilot", "observer"]),
  }),
  z.strictObject({ kind: z.literal("event"), id, text: line(60) }),
]);

const entryCondition: z.ZodType<EntryCondition> = z.strictObject({
  id,
  parameter: line(40),
  instrument: id.nullable(),
  relation: z.enum(["about", "at least", "at most"]),
  value: figure,
  tolerance: number(0, 1e6).nullable(),
  unit,
});

const step: z.ZodType<Step> = z.strictObject({
  id,
  text: line(160),
  kind: z.enum(["action", "power", "cool-down", "engine stop"]),
  durationS: seconds.nullable(),
  rpm: number(0, 20_000).nullable(),
  manifoldPressureInHg: number(0, 100).nullable(),
});

const reading: z.ZodType<Reading> = z.strictObject({
  id,
  parameter: line(40).nullable(),
  label: line(60),
  cellHead: line(16),
  kind: z.enum(READING_KINDS),
  instrument: id.nullable(),
  unit: unit.nullable(),
  recordedBy: z.enum(["pilot", "recorder", "observer"]),
  onSheet: z.enum(["grid", "single", "none"]),
  sampling: z.enum(SAMPLINGS),
  conditions,
  expected: band.nullable(),
  expectedOrigin: line(120).nullable(),
  expectedRatePerMin: quantity.nullable(),
  choices: z.array(line(40)).max(20),
  low: figure.nullable(),
  high: figure.nullable(),
});

const pointLimit: z.ZodType<PointLimit> = z.strictObject({
  id,
  reading: id,
  label: line(60),
  side,
  value: figure,
  unit,
  forS: seconds,
  statistic: z.enum(LIMIT_STATISTICS),
  expandedUncertainty: number(0, 1e6).nullable(),
  source: line(120),
});

const grid = z.strictObject({
  head: line(20),
  unit: unit.nullable(),
  by: z.enum(["time", "height", "free"]),
  rows: z.array(line(20)).max(60),
  timeColumn: z.boolean(),
});

export const cardPoint: z.ZodType<CardPoint> = z.strictObject({
  id,
  template: z.strictObject({ id, code: line(20), revision: number(1, 1e6) }).nullable(),
  title: line(60),
  purpose: paragraph(600),
  place: z.enum(["ground", "air"]),
  engine: z.enum(["running", "stopped"]),
  positions: z.array(z.strictObject({ control: line(30), position: line(30) })).max(10),
  entryText: line(240),
  entry: z.array(entryCondition).max(20),
  steps: z.array(step).max(30),
  grid: grid.nullable(),
  readings: z.array(reading).max(60),
  cardTable: z.boolean(),
  conditions,
  limits: z.array(pointLimit).max(30),
  aborts: z.strictObject({ standing: z.boolean(), lines: z.array(abortLine).max(30), ifReached: z.boolean() }),
  recovery: line(300),
  completion: z.strictObject({ rule: z.enum(COMPLETION_RULES), runS: seconds.nullable(), pastPeakS: seconds.nullable() }),
  durationMin: number(0, 600),
  fuelFlowLPerH: number(0, 1000),
  objectives: codes,
  hazards: codes,
  parents: codes,
  series: z.strictObject({ name: line(60), level: quantity, base: z.boolean() }).nullable(),
  changes: z.array(z.enum(["power", "position", "speed", "height"])).max(4),
  order: line(10),
  heightFloor: z.strictObject({ value: number(0, 60_000), unit, reference: z.enum(["AGL", "PA"]) }).nullable(),
  needsHeightFloor: z.boolean(),
  minimumCrewOnly: z.boolean(),
  smoothAir: z.boolean(),
  wingFlap: z.boolean(),
  firstFlight: z.boolean(),
  soak: z.boolean(),
});
