import type { BadgeTone } from "@/components/ui/badge";
import type { CardPoint, Hazard } from "@/lib/testcards/card";
import { riskLevel } from "@/lib/testcards/risk";
import { RISK_LEVELS, type RiskLevel } from "@/lib/testcards/words";

export const RISK_TONE: Record<RiskLevel, BadgeTone> = {
  High: "red",
  Serious: "yellow",
  Medium: "blue",
  Low: "green",
  Eliminated: "plain",
};

/** The gravest of what is left after mitigations; null where no hazard is named. */
export function highestRisk(point: CardPoint, hazards: Hazard[]): RiskLevel | null {
  const levels = hazards
    .filter(({ code }) => point.hazards.includes(code))
    .map(({ after }) => riskLevel(after.severity, after.probability));
  return RISK_LEVELS.findLast((level) => levels.includes(level)) ?? null;
}
