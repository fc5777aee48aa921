import type { Bench, BenchReading, BenchSignOff, ReadingInput, SignOffInput } from '@/lib/contracts/bench'
import { listenLive } from '@/lib/client/live-events'
import { plainCall } from '@/lib/client/plain-call'

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
    read: () => plainCall<Bench>(base),
    addReadings: async (readings) =>
      (await plainCall<{ readings: BenchReading[] }>(`${base}/readings`, { readings })).readings,
    signOff: (signOff) => plainCall<BenchSignOff>(`${base}/sign-offs`, signOff),
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
