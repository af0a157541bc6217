import type { Actor } from "@/lib/auth/roles";
import type { Finding } from "@/lib/testcards/readiness-types";
import type { CardState } from "@/lib/testcards/words";
import { may } from "../permissions";

type Person = Pick<Actor, "id" | "roles">;
export type RevisionFacts = { state: CardState; authorId: string; editedBy: readonly string[] };

/** Frozen: from release on nothing of it changes again but its state. */
export function isFrozen(state: CardState): boolean {
  return state === "released" || state === "superseded" || state === "withdrawn";
}

export const writersOf = ({ authorId, editedBy }: Pick<RevisionFacts, "authorId" | "editedBy">): string[] => [authorId, ...editedBy];

/** Whoever wrote any of it, the author or a later hand, is not the one to release it. */
export function wroteIt(person: Pick<Person, "id">, revision: RevisionFacts): boolean {
  return writersOf(revision).includes(person.id);
}

export const mayEditCard = (actor: Person, revision: RevisionFacts) => may(actor, "write cards") && revision.state === "draft";
export const maySubmitCard = mayEditCard;
export const mayCommentCard = (actor: Person, revision: RevisionFacts) => may(actor, "comment in review") && revision.state === "in review";
export const mayReturnCard = (actor: Person, revision: RevisionFacts) =>
  may(actor, "release cards") && revision.state === "in review" && !wroteIt(actor, revision);
export const mayReleaseCard = (actor: Person, revision: RevisionFacts) =>
  may(actor, "release cards") && revision.state === "in review" && !wroteIt(actor, revision);
/** The author too: taking one's own card out of force can only be stricter. */
export const mayWithdrawCard = (actor: Person, revision: RevisionFacts) => may(actor, "release cards") && revision.state === "released";

/** A new letter starts from the newest revision, once that one is no longer open. */
export const mayReviseCard = (actor: Person, newest: RevisionFacts) => may(actor, "write cards") && isFrozen(newest.state);
export const mayPrintCard = (actor: Person) => may(actor, "read and print");

/** One name for one finding at one place: the key of the answer a "should" finding wants. */
export function findingKey({ code, where }: Finding): string {
  const { at, ...rest } = where;
  return [code, at, ...Object.entries(rest).flatMap(([name, value]) => (value === undefined ? [] : [`${name}=${value}`]))].join("/");
}

export const openMusts = (findings: readonly Finding[]): Finding[] => findings.filter((finding) => finding.severity === "must");

export function unanswered(findings: readonly Finding[], answers: Readonly<Record<string, string>>): Finding[] {
  return findings.filter((finding) => finding.severity === "should" && !answers[findingKey(finding)]?.trim());
}

/** The first eight hex digits in two groups, as printed: "9F3C-21B0". */
export function shortDigest(digest: string): string {
  return `${digest.slice(0, 4)}-${digest.slice(4, 8)}`.toUpperCase();
}

/** A to Z, then AA to AZ and on. */
export function nextLetter(letter: string): string {
  const last = letter.at(-1) ?? "@";
  if (last !== "Z") return letter.slice(0, -1) + String.fromCharCode(last.charCodeAt(0) + 1);
  return `${letter.length > 1 ? nextLetter(letter.slice(0, -1)) : "A"}A`;
}

/** Crockford's base 32: no I, L, O or U, so that a code read aloud or typed from paper is not another's. */
const codeDigits = "0123456789ABCDEFGHJKMNPQRSTVWXYZ";

/** Ten digits of 5 bits from 10 random bytes: 2⁵⁰ codes, printed as "K7QF2-M9XTD". */
export function toSheetCode(randomBytes: Uint8Array): string {
  const text = Array.from(randomBytes.slice(0, 10), (byte) => codeDigits[byte % 32]).join("");
  return `${text.slice(0, 5)}-${text.slice(5)}`;
}

/** As a person types it: lower case, spaces, O for 0, I or L for 1; null when it cannot be a code. */
export function readSheetCode(typed: string): string | null {
  if (typed.length > 40) return null;
  const text = typed.toUpperCase().replace(/[\s-]/g, "").replaceAll("O", "0").replace(/[IL]/g, "1");
  if (text.length !== 10 || [...text].some((digit) => !codeDigits.includes(digit))) return null;
  return `${text.slice(0, 5)}-${text.slice(5)}`;
}
