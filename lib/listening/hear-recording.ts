import type { HeardTap } from './tap-listener'
import { TapListener } from './tap-listener'
import type { TapOptions } from './tap-report'

/**
 * Every tap of a recording, in order: what a {@link TapListener} hears in it.
 * @throws AcousticsError rate other than 44 100 or 48 000, a sample that is not a finite number, an option out of its range
 */
export function hearRecording(samples: Float32Array, sampleRateHz: number, options: TapOptions = {}): HeardTap[] {
  const listener = new TapListener(sampleRateHz, options)
  return [...listener.push(samples), ...listener.end()]
}
