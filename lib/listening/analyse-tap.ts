import { AcousticsError } from '@/lib/acoustics/acoustics-error'
import { centsBetween, nearestNote, STANDARD_REFERENCE_HZ } from '@/lib/acoustics/note'
import { requireQuantity } from '@/lib/acoustics/require-quantity'
import { hearStrike } from './hear-strike'
import { strikeOnset } from './strike-onset'
import type { TapOptions, TapReport } from './tap-report'

const RATES = [44_100, 48_000]

/**
 * The pitch of the first tap in a clip: Hz, note, decay and warble, or why no pitch is named.
 * Onset → past the attack → spectrum → peaks (log parabola: J. O. Smith, Spectral Audio Signal Processing 5.7) → least squares of damped
 * sinusoids → the tap's own partial. Uses at most 1.2 s after the strike.
 * @param samples one channel, full scale ±1
 * @param sampleRateHz 44 100 or 48 000. Others are refused, not resampled: a browser's AudioContext gives these, and a resampler
 * would stand between the sound and its error figure
 * @throws AcousticsError another rate, a sample that is not a finite number, a target outside 20 to 2000 Hz
 */
export function analyseTap(samples: Float32Array, sampleRateHz: number, options: TapOptions = {}): TapReport {
  checkInput(samples, sampleRateHz, options)
  const onset = strikeOnset(samples)
  if (onset.kind === 'silent') return { outcome: 'refused', kind: 'silent', onsetS: null }
  if (onset.kind === 'steady') return { outcome: 'refused', kind: 'not-a-tap', onsetS: null }
  const heard = hearStrike({ samples, sampleRateHz, strikeAt: onset.at, quiet: onset.quiet, expect: options })
  const onsetS = onset.at / sampleRateHz
  if (typeof heard === 'string') return { outcome: 'refused', kind: heard, onsetS }
  return {
    outcome: 'heard',
    ...heard,
    note: nearestNote(heard.pitchHz, options.referenceHz ?? STANDARD_REFERENCE_HZ),
    centsFromTarget: options.expectHz === undefined ? null : centsBetween(options.expectHz, heard.pitchHz),
    onsetS,
  }
}

/** @throws AcousticsError */
export function checkInput(samples: Float32Array, sampleRateHz: number, options: TapOptions): void {
  checkRate(sampleRateHz)
  const bad = samples.findIndex((value) => !Number.isFinite(value))
  if (bad >= 0) throw new AcousticsError('samples', `Sample ${bad} is not a finite number.`)
  if (options.expectHz !== undefined) requireQuantity('expectHz', options.expectHz, { min: 20, max: 2000, unit: 'Hz' })
  if (options.expectWithinCents !== undefined) {
    requireQuantity('expectWithinCents', options.expectWithinCents, { min: 1, max: 2400, unit: 'cents' })
  }
}

/** @throws AcousticsError a rate other than 44 100 or 48 000 */
export function checkRate(sampleRateHz: number): void {
  if (!RATES.includes(sampleRateHz)) {
    throw new AcousticsError('sampleRateHz', `sampleRateHz is ${sampleRateHz}: allowed ${RATES.join(' or ')}.`)
  }
}
