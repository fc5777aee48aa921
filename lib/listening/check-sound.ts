import { AcousticsError } from '@/lib/acoustics/acoustics-error'
import { MAX_REFERENCE_HZ, MIN_REFERENCE_HZ } from '@/lib/acoustics/note'
import { requireQuantity } from '@/lib/acoustics/require-quantity'
import type { TapOptions } from './tap-report'

/** A browser's AudioContext gives these; a resampler would stand between the sound and its error figure. */
export const SAMPLE_RATES_HZ = [44_100, 48_000] as const

/** @throws AcousticsError a rate other than 44 100 or 48 000 Hz */
export function checkSampleRate(sampleRateHz: number): void {
  if (!SAMPLE_RATES_HZ.some((rate) => rate === sampleRateHz)) {
    throw new AcousticsError(
      'sampleRateHz',
      `sampleRateHz is ${sampleRateHz}: allowed ${SAMPLE_RATES_HZ.join(' or ')}.`,
    )
  }
}

/** @throws AcousticsError a sample that is not a finite number */
export function checkSamples(samples: Float32Array): void {
  const bad = samples.findIndex((value) => !Number.isFinite(value))
  if (bad >= 0) throw new AcousticsError('samples', `Sample ${bad} is not a finite number.`)
}

/** @throws AcousticsError a target outside 20 to 2000 Hz, a window outside 1 to 2400 cents, a reference outside 415 to 466 Hz */
export function checkTapOptions({ expectHz, expectWithinCents, referenceHz }: TapOptions): void {
  if (expectHz !== undefined) requireQuantity('expectHz', expectHz, { min: 20, max: 2000, unit: 'Hz' })
  if (expectWithinCents !== undefined) {
    requireQuantity('expectWithinCents', expectWithinCents, { min: 1, max: 2400, unit: 'cents' })
  }
  if (referenceHz !== undefined) {
    requireQuantity('referenceHz', referenceHz, { min: MIN_REFERENCE_HZ, max: MAX_REFERENCE_HZ, unit: 'Hz' })
  }
}
