import type { ErrorCode } from '@/lib/errors'
import { AppError } from '@/lib/errors'
import { log } from '@/lib/server/log'

const statuses: Record<ErrorCode, number> = {
  'signed-out': 401,
  forbidden: 403,
  'not-found': 404,
  stale: 409,
  conflict: 409,
  gone: 410,
  'too-large': 413,
  invalid: 422,
  'rate-limited': 429,
  unavailable: 503,
  internal: 500,
}

/** One shape for every refusal. What we did not foresee is logged whole and told as a sentence without particulars. */
export function errorResponse(error: unknown): Response {
  const known = error instanceof AppError ? error : undefined
  if (!known || known.code === 'internal') log.error({ error }, 'request failed')
  const refused =
    known ?? new AppError('internal', 'Something failed on our side. What you sent was not saved; please try again.')
  const headers = new Headers({ 'Cache-Control': 'no-store' })
  const retryAfter = refused.details?.['retryAfterSeconds']
  if (typeof retryAfter === 'number') headers.set('Retry-After', String(retryAfter))
  return Response.json(
    { error: { code: refused.code, message: refused.message, details: refused.details ?? {} } },
    { status: statuses[refused.code], headers },
  )
}
