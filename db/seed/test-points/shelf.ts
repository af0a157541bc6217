import type { CardPoint } from "@/lib/testcards/card";
import { CLIMBS } from "./climbs";
import { COWL_POSITIONS } from "./cowl-positions";
import { DATA_BASE } from "./data-base";
import { DESCENTS } from "./descents";
import { FIRST_FLIGHTS } from "./first-flights";
import { GROUND_CHECKS } from "./ground-checks";
import { GROUND_RUNS } from "./ground-runs";
import { INSPECTIONS } from "./inspections";

const ALL = [...GROUND_RUNS, ...GROUND_CHECKS, ...FIRST_FLIGHTS, ...CLIMBS, ...COWL_POSITIONS, ...DESCENTS, ...DATA_BASE, ...INSPECTIONS];

/** The shelf, by code. */
export const TEST_POINTS: CardPoint[] = ALL.toSorted((a, b) => (a.template?.code ?? "").localeCompare(b.template?.code ?? ""));

export function testPointNamed(code: string): CardPoint {
  const found = TEST_POINTS.find((point) => point.template?.code === code);
  if (!found) throw new Error(`The demo has no test point ${code}.`);
  return found;
}
