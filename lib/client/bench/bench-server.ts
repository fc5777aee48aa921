import type { Bench, BenchReading, BenchSignOff, ReadingInput, SignOffInput } from '@/lib/contracts/bench'
import type { ErrorCode } from '@/lib/errors'
import { AppError, errorCodes } from '@/lib/errors'
import { listenLive } from '@/lib/client/live-events'

/** The bench's way to the server. */
export interface BenchServer {
  read(): Promise<Bench>
  addReadings(readings: readonly ReadingInput[]): Promise<BenchReading[]>
  signOff(signOff: SignOffInput): Promise<BenchSignOff>
  /** Calls `changed` when something changed, `refused` when the server no longer lets this page listen. Returns the way to stop. */
  listen(changed: () => void, refused: () => void): () => void
}

/** Where a bench is: behind its link, or at the desk of whoever is signed in. */
export type BenchPlace =
  { readonly kind: 'link'; readonly token: string } | { readonly kind: 'desk'; readonly showId: string }

export function benchServer(place: BenchPlace): BenchServer {
  const base = place.kind === 'link' ? `/api/b/${place.token}` : `/api/shows/${place.showId}/bench`
  return {
    read: () => call<Bench>(base),
    addReadings: async (readings) =>
      (await call<{ readings: BenchReading[] }>(`${base}/readings`, { readings })).readings,
    signOff: (signOff) => call<BenchSignOff>(`${base}/sign-offs`, signOff),
    listen(changed, refused) {
      if (place.kind === 'link') return listenLive(`${base}/live`, changed, refused)
      const own = [`bench:${place.showId}`, `advance:${place.showId}`, 'resync']
      return listenLive(
        '/api/live',
        (topics) => {
          if (topics.some((topic) => own.includes(topic))) changed()
        },
        refused,
      )
    },
  }
}

/**
 * One call. The answer has passed its contract on the way out of our own server; reading it again by the same contract would
 * send the whole checker to a phone in poor signal.
 */
async function call<Answer>(path: string, body?: unknown): Promise<Answer> {
  let response: Response
  try {
    response = await fetch(
      path,
      body === undefined
        ? {}
        : { method: 'POST', body: JSON.stringify(body), headers: { 'Content-Type': 'application/json' } },
    )
    if (response.ok) return (await response.json()) as Answer
  } catch (cause) {
    throw new AppError('unavailable', 'No signal.', { cause })
  }
  const told = (await response.json().catch(() => undefined)) as
    { error?: { code?: string; message?: string; details?: Record<string, unknown> } } | undefined
  const code = errorCodes.find((known) => known === told?.error?.code) ?? ('unavailable' satisfies ErrorCode)
  throw new AppError(code, told?.error?.message ?? `The server answered ${response.status}.`, {
    details: told?.error?.details ?? {},
  })
}
