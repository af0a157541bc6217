import { HttpRefusal } from "./http-refusal";

const MOST = 200;

/** `?limit` (1 to 200) and `?after` (the last id seen) of a list; `nextAfter` is null on the last page. */
export function toPage<T extends { id: string }>(request: Request, items: readonly T[]): { items: T[]; nextAfter: string | null } {
  const query = new URL(request.url).searchParams;
  const limit = Number(query.get("limit") ?? MOST);
  if (!Number.isInteger(limit) || limit < 1 || limit > MOST)
    throw new HttpRefusal(400, "Malformed", `limit is a whole number from 1 to ${MOST}.`);
  const after = query.get("after");
  const start = after === null ? 0 : items.findIndex((item) => item.id === after) + 1;
  if (after !== null && start === 0) throw new HttpRefusal(400, "Malformed", "after is the id of an item of this list.");
  const page = items.slice(start, start + limit);
  return { items: page, nextAfter: start + limit < items.length ? (page.at(-1)?.id ?? null) : null };
}
