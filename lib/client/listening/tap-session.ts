import type { HeardTap } from '@/lib/listening/tap-listener'
import { TapListener } from '@/lib/listening/tap-listener'
import type { TapOptions } from '@/lib/listening/tap-report'

/** What a worker that listens is told. Frames may also come straight from the microphone through `port`. */
export type TapOrder =
  | { kind: 'start'; sampleRateHz: number; options: TapOptions; port?: MessagePort }
  | { kind: 'frames'; frames: Float32Array }
  | { kind: 'end' }

/** What it says. `level` is the loudest sample of the last twelfth of a second or so, 0 to 1. */
export type TapNews =
  { kind: 'tap'; heard: HeardTap } | { kind: 'level'; peak: number } | { kind: 'fault'; message: string }

const LEVELS_A_SECOND = 12

/** One stream from start to end: orders in, news out. The worker's whole work, without the worker. */
export class TapSession {
  private listener: TapListener | null = null
  private everySamples = Infinity
  private samples = 0
  private peak = 0

  /** A broken stream (a rate or a sample that is refused) ends with a fault; orders after the end are ignored. */
  take(order: TapOrder): TapNews[] {
    try {
      switch (order.kind) {
        case 'start':
          this.listener = new TapListener(order.sampleRateHz, order.options)
          this.everySamples = order.sampleRateHz / LEVELS_A_SECOND
          return []
        case 'frames':
          return this.listener === null
            ? []
            : [...tapsOf(this.listener.push(order.frames)), ...this.levelOf(order.frames)]
        case 'end': {
          const last = this.listener?.end() ?? []
          this.listener = null
          return tapsOf(last)
        }
      }
    } catch (error) {
      this.listener = null
      return [{ kind: 'fault', message: error instanceof Error ? error.message : String(error) }]
    }
  }

  private levelOf(frames: Float32Array): TapNews[] {
    for (const value of frames) this.peak = Math.max(this.peak, Math.abs(value))
    this.samples += frames.length
    if (this.samples < this.everySamples) return []
    const news: TapNews[] = [{ kind: 'level', peak: Math.min(1, this.peak) }]
    this.samples = 0
    this.peak = 0
    return news
  }
}

function tapsOf(heard: HeardTap[]): TapNews[] {
  return heard.map((tap) => ({ kind: 'tap', heard: tap }))
}
