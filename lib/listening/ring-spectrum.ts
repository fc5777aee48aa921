import { lowRate } from './low-rate'
import type { Spectrum } from './spectrum'
import { spectrumOf } from './spectrum'

const SMALLEST = 1024

/** Spectrum of the low-rate sound from `from` (included) to `to` (not), over the least power of two that holds it. */
export function ringSpectrum(samples: Float32Array, from: number, to: number): Spectrum {
  const low = lowRate(samples, from, to)
  let size = SMALLEST
  while (size < low.length) size *= 2
  return spectrumOf(low, size)
}
