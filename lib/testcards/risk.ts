import { checkOneOf } from "./check-range";
import { type HazardSeverity, PROBABILITIES, type Probability, type RiskLevel } from "./words";

type Row = readonly [RiskLevel, RiskLevel, RiskLevel, RiskLevel];

/** [MIL-STD-882E] Table III: rows by probability, columns by severity 1 catastrophic to 4 negligible. */
const MATRIX: Record<Probability, Row> = {
  A: ["High", "High", "Serious", "Medium"],
  B: ["High", "High", "Serious", "Medium"],
  C: ["High", "Serious", "Medium", "Low"],
  D: ["Serious", "Medium", "Medium", "Low"],
  E: ["Medium", "Medium", "Medium", "Low"],
  F: ["Eliminated", "Eliminated", "Eliminated", "Eliminated"],
};

const SEVERITY_COLUMNS = [1, 2, 3, 4] as const;

/**
 * Risk level of a hazard.
 *
 * Source    [MIL-STD-882E] Table III. Row F is a state, the hazard removed by design: no training, warning or procedure earns it.
 * Inputs    severity 1 catastrophic, 2 critical, 3 marginal, 4 negligible; probability A frequent to E improbable, F eliminated.
 * Domain    the 24 cells.
 * Throws    RangeError for any other severity or letter.
 * Accuracy  the table itself.
 */
export function riskLevel(severity: HazardSeverity, probability: Probability): RiskLevel {
  checkOneOf("severity", severity, SEVERITY_COLUMNS);
  checkOneOf("probability", probability, PROBABILITIES);
  return MATRIX[probability][SEVERITY_COLUMNS.indexOf(severity)] as RiskLevel;
}
