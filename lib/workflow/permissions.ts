import { hasRole } from "@/lib/auth/roles";
import type { Role } from "@/lib/testcards/words";
import { Refusal } from "./errors";

/** Who may what: the table of the team's rules, once. Use cases and screens both ask it. */
export const MAY = {
  "manage people": ["admin"],
  "edit programme": ["engineer"],
  "keep instruments": ["engineer", "mechanic"],
  "write cards": ["engineer"],
  "comment in review": ["engineer", "reviewer", "pilot"],
  "release cards": ["reviewer"],
  "plan sorties": ["engineer"],
  "accept cards": ["pilot"],
  "brief and debrief": ["pilot"],
  "sign configuration": ["mechanic"],
  "rectify squawks": ["mechanic"],
  "assess squawks": ["engineer"],
  "amend readings": ["engineer"],
  "propose a step": ["engineer"],
  "countersign a step": ["reviewer"],
  "say hold": ["engineer", "reviewer", "pilot", "mechanic"],
  "raise a squawk": ["engineer", "reviewer", "pilot", "mechanic"],
  "upload recordings": ["engineer", "pilot", "mechanic"],
  "read and print": ["admin", "engineer", "reviewer", "pilot", "mechanic", "observer"],
} as const satisfies Record<string, readonly Role[]>;

export type Permission = keyof typeof MAY;

export function may(actor: { roles: readonly Role[] }, permission: Permission): boolean {
  return hasRole(actor, MAY[permission]);
}

const either = new Intl.ListFormat("en", { type: "disjunction" });

/** "Only an engineer or a mechanic may keep instruments." */
export function whoMay(permission: Permission): string {
  const roles = MAY[permission].map((role) => `${/^[aeo]/.test(role) ? "an" : "a"} ${role}`);
  return `Only ${either.format(roles)} may ${permission}.`;
}

export function requirePermission(actor: { roles: readonly Role[] }, permission: Permission): void {
  if (!may(actor, permission)) throw new Refusal("forbidden", whoMay(permission));
}
