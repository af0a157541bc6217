import type { RiskLevel, Role } from "@/lib/testcards/words";
import { seedId } from "./ids";

export const TEAM = { id: seedId("team", 1), name: "Harrow Fen Aeroworks" };

export type DemoPerson = { id: string; email: string; name: string; roles: Role[]; residualRisk: RiskLevel };

const person = (number: number, role: Role, name: string): DemoPerson => ({
  id: seedId("person", number),
  email: `${role}@harrowfen.example`,
  name,
  roles: [role],
  residualRisk: "Medium",
});

/** One account a role; roles for names, since nobody real stands behind them. */
export const PEOPLE = {
  engineer: person(1, "engineer", "A. Engineer"),
  reviewer: person(2, "reviewer", "A. Reviewer"),
  pilot: person(3, "pilot", "A. Pilot"),
  mechanic: person(4, "mechanic", "A. Mechanic"),
  admin: person(5, "admin", "A. Administrator"),
  observer: person(6, "observer", "A. Observer"),
} as const satisfies Partial<Record<Role, DemoPerson>>;
