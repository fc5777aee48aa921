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

/** Counts one try against a limit that every process shares. The key is hashed: it may be an address. */
export async function takeFromLimit(limit: Limit, key: string): Promise<void> {
  const hashed = createHash('sha256').update(key).digest('base64url').slice(0, 32)
  try {
    await limiter(limit).consume(hashed)
  } catch (refusal) {
    if (!(refusal instanceof RateLimiterRes)) throw refusal
    const seconds = Math.max(1, Math.ceil(refusal.msBeforeNext / 1000))
    throw new AppError('rate-limited', `Too many tries. Please wait ${seconds} s and try again; nothing is lost.`, {
      details: { retryAfterSeconds: seconds },
    })
  }
}
