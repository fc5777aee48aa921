import { env } from '@/lib/env'

/**
 * The caller's address as the nearest trusted proxy saw it. Without a proxy the app server
 * writes the header, unless the caller did. Entries further left can be invented by the caller and are not used.
 */
export function clientAddress(headers: Headers): string {
  const seen = (headers.get('x-forwarded-for') ?? '').split(',').map((entry) => entry.trim()).filter(Boolean)
  return seen.at(-Math.max(1, env().TRUSTED_PROXIES)) ?? seen[0] ?? 'unknown'
}
