import { centsBetween, nearestNote, STANDARD_REFERENCE_HZ } from '@/lib/acoustics/note'
import { hearStrike } from './hear-strike'
import type { TapOptions, TapReport } from './tap-report'

export type StrikeInSound = {
  samples: Float32Array
  sampleRateHz: number
  /** Index of the strike in `samples`. */
  strikeAt: number
  /** Mean square of a sample while nothing sounds. */
  quiet: number
  /** When the strike was, s, in the time of whoever asks. */
  onsetS: number
}

/** The report of one strike whose place is known. */
export function analyseStrike(strike: StrikeInSound, options: TapOptions): TapReport {
  const { onsetS } = strike
  const heard = hearStrike({ ...strike, expect: options })
  if (typeof heard === 'string') return { outcome: 'refused', kind: heard, onsetS }
  return {
    outcome: 'heard',
    ...heard,
    note: nearestNote(heard.pitchHz, options.referenceHz ?? STANDARD_REFERENCE_HZ),
    centsFromTarget: options.expectHz === undefined ? null : centsBetween(options.expectHz, heard.pitchHz),
    onsetS,
  }
}
