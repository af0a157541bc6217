/** A small generator with a seed (mulberry32), so that a failing case comes back. */
export function seeded(seed: number) {
  let state = seed;
  const next = () => {
    state = (state + 0x6d2b79f5) | 0;
    let t = Math.imul(state ^ (state >>> 15), 1 | state);
    t = (t + Math.imul(t ^ (t >>> 7), 61 | t)) ^ t;
    return ((t ^ (t >>> 14)) >>> 0) / 4_294_967_296;
  };
  const pick = <T>(list: readonly T[]): T => list[Math.floor(next() * list.length)] as T;
  return { next, pick };
}
export type Chance = ReturnType<typeof seeded>;

const NUMBERS = [0, -1, 1e6, -1e6, 0.1, 1e-9, 5, 100];
const WORDS = [
  "",
  "x",
  "nowhere",
  "degC",
  "kt",
  "psi",
  "%",
  "min",
  "always",
  "stabilised",
  "whole run",
  "series",
  "choice",
  "gauge",
  "🛩",
  "W".repeat(60),
];

function odd(value: unknown, { next, pick }: Chance): unknown {
  if (value === null)
    return next() < 0.5 ? pick(NUMBERS) : pick<unknown>([...WORDS, { value: 5, unit: "degC" }, { low: null, high: null, unit: "psi" }]);
  if (typeof value === "number") return next() < 0.2 ? null : pick(NUMBERS);
  if (typeof value === "string") return next() < 0.15 ? null : pick(WORDS);
  if (typeof value === "boolean") return !value;
  return Array.isArray(value) ? [] : null;
}

/** Puts an odd value somewhere deep inside; whether a schema still takes it is for the caller to ask. */
export function spoil(root: object, chance: Chance): void {
  let node = root as Record<string, unknown>;
  for (;;) {
    const keys = Object.keys(node);
    if (keys.length === 0) return;
    const key = chance.pick(keys);
    const child = node[key];
    const goesOn = typeof child === "object" && child !== null && Object.keys(child).length > 0 && chance.next() < 0.97;
    if (!goesOn) {
      node[key] = odd(child, chance);
      return;
    }
    node = child as Record<string, unknown>;
  }
}
