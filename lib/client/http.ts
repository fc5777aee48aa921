import type { z } from 'zod'
import type { ErrorCode } from '@/lib/errors'
import { AppError, errorCodes } from '@/lib/errors'

/** What the browser reads from a refusal; a lost connection is `unavailable`, so that callers can keep and try again. */
async function refusal(response: Response): Promise<AppError> {
  const body = (await response.json().catch(() => undefined)) as
    | { error?: { code?: string; message?: string; details?: Record<string, unknown> } }
    | undefined
  const code = errorCodes.find((known) => known === body?.error?.code) ?? ('internal' satisfies ErrorCode)
  return new AppError(code, body?.error?.message ?? `The server answered ${response.status}. What you typed is kept here.`, {
    details: body?.error?.details ?? {},
  })
}

/** One call to our own API: JSON in, JSON out by its contract, AppError on refusal. */
export async function callApi<Schema extends z.ZodType>(
  path: string,
  options: { response: Schema; method?: 'GET' | 'POST' | 'PUT' | 'PATCH' | 'DELETE'; body?: unknown; signal?: AbortSignal },
): Promise<z.output<Schema>> {
  let response: Response
  try {
    response = await fetch(path, {
      method: options.method ?? 'GET',
      ...(options.body === undefined
        ? {}
        : { body: JSON.stringify(options.body), headers: { 'Content-Type': 'application/json' } }),
      ...(options.signal ? { signal: options.signal } : {}),
    })
  } catch (cause) {
    if (options.signal?.aborted) throw cause
    throw new AppError('unavailable', 'No connection. What you typed is kept here; it is not saved yet.', { cause })
  }
  if (!response.ok) throw await refusal(response)
  return options.response.parse(await response.json())
}
