import type { RiskLevel, Role } from "@/lib/testcards/words";

declare const proven: unique symbol;

/** Who acts, in which team. Only `lib/auth` makes one, so holding it proves a sign-in. */
export type Actor = {
  readonly [proven]: true;
  readonly id: string;
  readonly name: string;
  readonly email: string;
  readonly teamId: string;
  readonly roles: readonly Role[];
  readonly residualRisk: RiskLevel;
  readonly sessionId: string;
};

/** The only maker of an Actor: call it with a row read in this request. */
export function toActor(row: Omit<Actor, typeof proven>): Actor {
  return row as Actor;
}

export function hasRole(actor: Pick<Actor, "roles">, roles: readonly Role[]): boolean {
  return actor.roles.some((role) => roles.includes(role));
}
