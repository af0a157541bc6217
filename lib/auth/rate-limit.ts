import { RateLimiterRes, RateLimiterSQLite } from "rate-limiter-flexible";
import type { Db } from "@/db/open";
import { TooManyTries } from "./errors";

/** Tries and the span they are counted over. Our own choice: a person mistypes a few times, a program thousands of times. */
const LIMITS = {
  "sign-in by e-mail": { points: 10, durationS: 15 * 60 },
  "sign-in by address": { points: 60, durationS: 15 * 60 },
  "password asked again": { points: 8, durationS: 15 * 60 },
  "sheet look-up": { points: 120, durationS: 60 },
} as const;
export type Counted = keyof typeof LIMITS;

const limiters = new WeakMap<Db, Map<Counted, RateLimiterSQLite>>();

/** Counts stand in the database, so that a restart or a second process does not forget them. */
function limiterOf(db: Db, counted: Counted): RateLimiterSQLite {
  const known = limiters.get(db) ?? new Map<Counted, RateLimiterSQLite>();
  limiters.set(db, known);
  const found = known.get(counted);
  if (found) return found;
  const { points, durationS } = LIMITS[counted];
  const made = new RateLimiterSQLite({
    storeClient: db.$client,
    storeType: "better-sqlite3",
    tableName: "rate_limits",
    tableCreated: true,
    keyPrefix: counted,
    points,
    duration: durationS,
  });
  known.set(counted, made);
  return made;
}

/** Counts one try; throws TooManyTries past the limit. */
export async function countTry(db: Db, counted: Counted, key: string): Promise<void> {
  try {
    await limiterOf(db, counted).consume(key.slice(0, 200));
  } catch (refused) {
    if (refused instanceof RateLimiterRes) throw new TooManyTries(Math.max(1, Math.ceil(refused.msBeforeNext / 1000)));
    throw refused;
  }
}

export async function forgetTries(db: Db, counted: Counted, key: string): Promise<void> {
  await limiterOf(db, counted).delete(key.slice(0, 200));
}

/** A try that was no guess is given back: many people behind one address sign in rightly. */
export async function giveBackTry(db: Db, counted: Counted, key: string): Promise<void> {
  await limiterOf(db, counted).reward(key.slice(0, 200), 1);
}
