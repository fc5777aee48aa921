import type { ErrorCode } from '@/lib/errors'
import { AppError, errorCodes } from '@/lib/errors'

/**
 * One call from a page for a phone in poor signal. The answer has passed its contract on the way out of our own server; reading
 * it again by the same contract would send the whole checker along. No connection is `unavailable`; so is a refusal that is not
 * ours, such as a gateway's.
 */
export async function plainCall<Answer>(path: string, body?: unknown): Promise<Answer> {
  let response: Response
  try {
    response = await fetch(
      path,
      body === undefined ? {} : { method: 'POST', body: JSON.stringify(body), headers: { 'Content-Type': 'application/json' } },
    )
    if (response.ok) return (await response.json()) as Answer
  } catch (cause) {
    throw new AppError('unavailable', 'No connection.', { cause })
  }
  const told = (await response.json().catch(() => undefined)) as
    | { error?: { code?: string; message?: string; details?: Record<string, unknown> } }
    | undefined
  const code = errorCodes.find((known) => known === told?.error?.code) ?? ('unavailable' satisfies ErrorCode)
  throw new AppError(code, told?.error?.message ?? `The server answered ${response.status}.`, { details: told?.error?.details ?? {} })
}
