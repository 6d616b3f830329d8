import { RateLimiterPostgres, RateLimiterRes } from "rate-limiter-flexible";
import { orm } from "#app/db/orm.server.ts";
import { environment } from "#app/server/environment.server.ts";
import { ApiRefused } from "./refused.server.ts";

const MINUTE = 60;

/** Kept by its ORM, so that a process that connects anew counts over the new connection. */
const limiters = new WeakMap<object, RateLimiterPostgres>();

async function limiter(): Promise<RateLimiterPostgres> {
  const connected = await orm();
  const known = limiters.get(connected);
  if (known) return known;
  const made = new RateLimiterPostgres({
    storeClient: connected.em.getConnection().getKnex(),
    storeType: "knex",
    tableName: "api_rate",
    tableCreated: true,
    clearExpiredByTimeout: false,
    keyPrefix: "api",
    points: environment.API_REQUESTS_PER_MINUTE,
    duration: MINUTE,
  });
  limiters.set(connected, made);
  return made;
}

/**
 * Counts a request of a caller, in the database, so that all web processes count together.
 * @returns the headers that say how many are left
 * @throws ApiRefused 429 once the minute's are used up
 */
export async function rateOf(caller: string): Promise<Record<string, string>> {
  const counts = await limiter();
  const said = ({ remainingPoints, msBeforeNext }: RateLimiterRes) => ({
    "RateLimit-Limit": String(counts.points),
    "RateLimit-Remaining": String(Math.max(0, remainingPoints)),
    "RateLimit-Reset": String(Math.ceil(msBeforeNext / 1000)),
  });
  try {
    return said(await counts.consume(caller));
  } catch (error) {
    if (!(error instanceof RateLimiterRes)) throw error;
    const headers = said(error);
    throw new ApiRefused(
      429,
      `More than ${counts.points} requests came within a minute. Wait ${headers["RateLimit-Reset"]} seconds.`,
      undefined,
      { ...headers, "Retry-After": headers["RateLimit-Reset"] },
    );
  }
}
