import { createHash } from "node:crypto";
import { RateLimiterPostgres, RateLimiterRes } from "rate-limiter-flexible";
import { orm } from "#app/db/orm.server.ts";

const MINUTE = 60;

/** How many attempts are taken in how long (seconds), counted in the database for all web processes together. */
const LIMITS = {
  /** guesses at one account from one address */
  "account from address": { points: 10, duration: 15 * MINUTE },
  /** guesses at one account from anywhere; more, so that a stranger does not easily shut its owner out */
  account: { points: 50, duration: 60 * MINUTE },
  /** guesses from one address at any account; many people may share one */
  address: { points: 200, duration: 15 * MINUTE },
  /** guesses at the one-time codes of one account from anywhere; only who knows its password gets that far */
  codes: { points: 15, duration: 60 * MINUTE },
  /** links to set a password, mailed to one account */
  "links by mail": { points: 3, duration: 60 * MINUTE },
} as const;
type Limit = keyof typeof LIMITS;

/** Something that is counted: of which limit, and what of; the latter is kept as its SHA-256. */
export type Counted = readonly [limit: Limit, of: string];

/** Kept by its ORM, so that a process that connects anew counts over the new connection. */
const limiters = new WeakMap<object, Map<Limit, RateLimiterPostgres>>();

async function limiterOf(limit: Limit): Promise<RateLimiterPostgres> {
  const connected = await orm();
  const known = limiters.get(connected) ?? new Map<Limit, RateLimiterPostgres>();
  limiters.set(connected, known);
  const there = known.get(limit);
  if (there) return there;
  const made = new RateLimiterPostgres({
    storeClient: connected.em.getConnection().getKnex(),
    storeType: "knex",
    tableName: "rate_limit",
    tableCreated: true,
    keyPrefix: limit,
    ...LIMITS[limit],
  });
  known.set(limit, made);
  return made;
}

const keyOf = (of: string) => createHash("sha256").update(of.trim().toLowerCase()).digest("hex");

/**
 * Counts one attempt before it is made, so that many at once do not slip through together.
 * @returns false when one of the limits is used up
 */
export async function countAttempt(counted: readonly Counted[]): Promise<boolean> {
  for (const [limit, of] of counted)
    try {
      await (await limiterOf(limit)).consume(keyOf(of));
    } catch (refused) {
      if (refused instanceof RateLimiterRes) return false;
      throw refused;
    }
  return true;
}

/** Takes an attempt that succeeded out of the counts again. */
export async function forgiveAttempt(counted: readonly Counted[]): Promise<void> {
  for (const [limit, of] of counted) await (await limiterOf(limit)).reward(keyOf(of));
}
