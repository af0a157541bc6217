import type { Actor } from "@/lib/auth/roles";
import type { SquawkSeverity, SquawkState } from "@/lib/testcards/words";
import { may, type Permission } from "../permissions";

type Person = Pick<Actor, "roles">;
export type SquawkFacts = { state: SquawkState; severity: SquawkSeverity; raisedFrom: "debrief" | "exceedance" | "person" };

/** From which states each act may be done: what was said can be said anew until the next step is taken. */
export const FROM = {
  assess: ["open", "assessed"],
  dispose: ["assessed", "dispositioned"],
  verify: ["dispositioned"],
  close: ["verified"],
} as const satisfies Record<string, readonly SquawkState[]>;

const at = (act: keyof typeof FROM, state: SquawkState) => (FROM[act] as readonly SquawkState[]).includes(state);

/** A reading past a placard grounds until the maker's inspection is done: no assessment lowers it. */
export const isFixedGrounding = ({ severity, raisedFrom }: Pick<SquawkFacts, "severity" | "raisedFrom">) =>
  severity === "grounding" && raisedFrom === "exceedance";

export const mayAssess = (actor: Person, { state }: Pick<SquawkFacts, "state">) => may(actor, "assess squawks") && at("assess", state);
export const mayRectify = (actor: Person, { state }: Pick<SquawkFacts, "state">) => may(actor, "rectify squawks") && at("dispose", state);
/** Deferred or accepted as is: never on a grounding one. */
export const mayAccept = (actor: Person, { state, severity }: Pick<SquawkFacts, "state" | "severity">) =>
  may(actor, "assess squawks") && at("dispose", state) && severity !== "grounding";
export const mayVerify = (actor: Person, { state }: Pick<SquawkFacts, "state">) => may(actor, "rectify squawks") && at("verify", state);
export const mayClose = (actor: Person, { state }: Pick<SquawkFacts, "state">) => may(actor, "assess squawks") && at("close", state);

export type SquawkAct = "assess" | "rectify" | "verify" | "close";
/** What comes next, and whose it is. */
export const NEXT: Record<SquawkState, { act: SquawkAct; permission: Permission; by: string } | null> = {
  open: { act: "assess", permission: "assess squawks", by: "An engineer assesses it." },
  assessed: { act: "rectify", permission: "rectify squawks", by: "A mechanic rectifies it or finds no fault." },
  dispositioned: { act: "verify", permission: "rectify squawks", by: "A mechanic verifies it." },
  verified: { act: "close", permission: "assess squawks", by: "An engineer closes it." },
  closed: null,
};
