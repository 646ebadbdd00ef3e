import { isIPv6 } from 'node:net';
import type pg from 'pg';
import { RateLimiterPostgres, RateLimiterRes } from 'rate-limiter-flexible';
import { TooMany } from '../errors.ts';

/** So many tries in so many seconds, counted by the asker's address, account, or a field such as an e-mail address. */
export interface Limit {
  readonly name: string;
  readonly by: 'address' | 'account' | 'email';
  readonly tries: number;
  readonly seconds: number;
}

export interface RateLimiter {
  /** @throws TooMany once the tries are used up */
  count(limit: Limit, key: string): Promise<void>;
}

/** The one limiter of every process: it counts in the database. */
export function openRateLimiter(pool: pg.Pool): RateLimiter {
  const limiters = new Map<string, RateLimiterPostgres>();
  function limiterFor(limit: Limit): RateLimiterPostgres {
    const key = `${limit.name}:${limit.by}`;
    const known = limiters.get(key);
    if (known) return known;
    const made = new RateLimiterPostgres({
      storeClient: pool,
      tableName: 'rate_limits',
      tableCreated: true,
      keyPrefix: key,
      points: limit.tries,
      duration: limit.seconds,
    });
    limiters.set(key, made);
    return made;
  }
  return {
    async count(limit, key) {
      try {
        await limiterFor(limit).consume(key);
      } catch (refusal) {
        if (refusal instanceof RateLimiterRes) throw new TooMany(refusal.msBeforeNext / 1000);
        throw refusal;
      }
    },
  };
}

/** An address as limits count it: IPv4 whole, IPv6 by its /64, which is what one household gets (RFC 6177). */
export function addressKey(address: string): string {
  const mapped = /^::ffff:(\d+\.\d+\.\d+\.\d+)$/i.exec(address);
  if (mapped?.[1]) return mapped[1];
  if (!isIPv6(address)) return address;
  return `${expandIPv6(address).slice(0, 4).join(':')}::/64`;
}

function expandIPv6(address: string): string[] {
  const [head = '', tail] = (address.split('%')[0] ?? '').split('::');
  const front = head === '' ? [] : head.split(':');
  const back = tail === undefined || tail === '' ? [] : tail.split(':');
  const gap = tail === undefined ? [] : Array<string>(8 - front.length - back.length).fill('0');
  return [...front, ...gap, ...back].map((group) => group.padStart(4, '0').toLowerCase());
}
