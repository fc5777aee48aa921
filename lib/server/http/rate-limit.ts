import { RateLimiterPostgres, RateLimiterRes } from 'rate-limiter-flexible'
import { createHash } from 'node:crypto'
import { pool } from '@/db/client'
import { AppError } from '@/lib/errors'

export type Limit = { readonly name: string; readonly points: number; readonly seconds: number }

const limiters = new Map<string, RateLimiterPostgres>()

function limiter(limit: Limit): RateLimiterPostgres {
  let made = limiters.get(limit.name)
  if (!made) {
    made = new RateLimiterPostgres({
      storeClient: pool(),
      storeType: 'pool',
      tableName: 'rate_limit',
      tableCreated: true,
      keyPrefix: limit.name,
      points: limit.points,
      duration: limit.seconds,
      clearExpiredByTimeout: false,
    })
    limiters.set(limit.name, made)
  }
  return made
}

function hashKey(key: string): string {
  return createHash('sha256').update(key).digest('base64url').slice(0, 32)
}

/** Counts one try against a limit that every process shares. The key is hashed: it may be an address. */
export async function takeFromLimit(limit: Limit, key: string): Promise<void> {
  try {
    await limiter(limit).consume(hashKey(key))
  } catch (refusal) {
    if (!(refusal instanceof RateLimiterRes)) throw refusal
    const seconds = Math.max(1, Math.ceil(refusal.msBeforeNext / 1000))
    throw new AppError('rate-limited', `Too many tries. Please wait ${seconds} s and try again; nothing is lost.`, {
      details: { retryAfterSeconds: seconds },
    })
  }
}

/** Clears a key's count: a try that succeeded was no guess. */
export async function clearLimit(limit: Limit, key: string): Promise<void> {
  await limiter(limit).delete(hashKey(key))
}
