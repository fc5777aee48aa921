import { analyseStrike } from './analyse-strike'
import { checkSampleRate, checkSamples, checkTapOptions } from './check-sound'
import { strikeOnset } from './strike-onset'
import type { TapOptions, TapReport } from './tap-report'

/**
 * The pitch of the first tap in a clip: Hz, note, decay and warble, or why no pitch is named.
 * Onset → past the attack → spectrum → peaks (log parabola: J. O. Smith, Spectral Audio Signal Processing 5.7) → least squares of damped
 * sinusoids → the tap's own partial. Uses at most 1.2 s after the strike.
 * @param samples one channel, full scale ±1
 * @param sampleRateHz 44 100 or 48 000; others are refused, not resampled
 * @throws AcousticsError another rate, a sample that is not a finite number, an option out of its range
 */
export function analyseTap(samples: Float32Array, sampleRateHz: number, options: TapOptions = {}): TapReport {
  checkSampleRate(sampleRateHz)
  checkSamples(samples)
  checkTapOptions(options)
  const onset = strikeOnset(samples)
  if (onset.kind === 'silent') return { outcome: 'refused', kind: 'silent', onsetS: null }
  if (onset.kind === 'steady') return { outcome: 'refused', kind: 'not-a-tap', onsetS: null }
  const strike = { samples, sampleRateHz, strikeAt: onset.at, quiet: onset.quiet, onsetS: onset.at / sampleRateHz }
  return analyseStrike(strike, options)
}
