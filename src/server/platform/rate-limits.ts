/** Rate limits, counted in PostgreSQL so that every process sees the same count. */
import type pg from 'pg';
import { RateLimiterPostgres, RateLimiterRes } from 'rate-limiter-flexible';
import { Problem } from './problems';

const MINUTE = 60;

/** Points per duration (seconds). Sign-in counts failures alone, so that nobody is locked out by signing in often. */
const LIMITS = {
  'sign-in-address': { points: 60, duration: 15 * MINUTE },
  'sign-in-account': { points: 5, duration: 15 * MINUTE },
  'send-link': { points: 20, duration: 60 * MINUTE },
  'send-link-account': { points: 5, duration: 60 * MINUTE },
  'link-guess': { points: 60, duration: 15 * MINUTE },
  import: { points: 60, duration: 60 * MINUTE },
  run: { points: 60, duration: 60 * MINUTE },
} as const;
export type LimitName = keyof typeof LIMITS;

export interface RateLimits {
  /** Refuses where the limit is already used up, without counting. */
  check(name: LimitName, key: string): Promise<void>;
  /** Counts one, and refuses where that is one too many. */
  count(name: LimitName, key: string): Promise<void>;
  reset(name: LimitName, key: string): Promise<void>;
}

export function createRateLimits(pool: pg.Pool): RateLimits {
  const limiters = new Map<LimitName, RateLimiterPostgres>();
  const limiter = (name: LimitName): RateLimiterPostgres => {
    const known = limiters.get(name);
    if (known) return known;
    const made = new RateLimiterPostgres({
      storeClient: pool,
      tableName: 'rate_limits',
      tableCreated: true,
      clearExpiredByTimeout: false,
      keyPrefix: name,
      ...LIMITS[name],
    });
    limiters.set(name, made);
    return made;
  };
  return {
    async check(name, key) {
      const state = await limiter(name).get(key);
      if (state && state.consumedPoints >= LIMITS[name].points) throw tooMany(state.msBeforeNext);
    },
    async count(name, key) {
      try {
        await limiter(name).consume(key);
      } catch (refusal) {
        if (refusal instanceof RateLimiterRes) throw tooMany(refusal.msBeforeNext);
        throw refusal;
      }
    },
    async reset(name, key) {
      await limiter(name).delete(key);
    },
  };
}

function tooMany(milliseconds: number): Problem {
  const minutes = Math.max(1, Math.ceil(milliseconds / 60_000));
  return new Problem(
    'too-many-requests',
    `Too many tries. Please wait ${minutes === 1 ? 'a minute' : `${minutes} minutes`} and try again`,
    { retryAfterSeconds: Math.ceil(milliseconds / 1000) },
  );
}
