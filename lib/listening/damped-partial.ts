import type { Complex } from './partial-shape'
import type { Spectrum } from './spectrum'
import { turnTable } from './turn-table'

/** A damped sinusoid Re(A·e^{(−decay + i·angle)·n}), n in samples. */
export type DampedPartial = { decay: number; angle: number; amplitude: Complex }

/** Adds `sign` times the partial's spectrum to bins 0 to `last`, in place. */
export function addPartial(
  spectrum: Spectrum,
  { decay, angle, amplitude }: DampedPartial,
  sign: 1 | -1,
  last: number,
): void {
  const { re, im, size, count } = spectrum
  const { cos, sin } = turnTable(size)
  for (const side of [1, -1] as const) {
    const zr = Math.exp(-decay) * Math.cos(angle)
    const zi = side * Math.exp(-decay) * Math.sin(angle)
    const all = Math.exp(-decay * count)
    const ar = all * Math.cos(angle * count)
    const ai = side * all * Math.sin(angle * count)
    const gr = (sign * amplitude.re) / 2
    const gi = (sign * side * amplitude.im) / 2
    for (let k = 0; k <= last; k++) {
      const whole = (k * count) % size
      const wr = cos[k] ?? 0
      const wi = sin[k] ?? 0
      const vr = cos[whole] ?? 0
      const vi = sin[whole] ?? 0
      const dr = 1 - (zr * wr - zi * wi)
      const di = -(zr * wi + zi * wr)
      const nr = 1 - (ar * vr - ai * vi)
      const ni = -(ar * vi + ai * vr)
      const over = 1 / (dr * dr + di * di)
      const sr = (nr * dr + ni * di) * over
      const si = (ni * dr - nr * di) * over
      re[k] = (re[k] ?? 0) + gr * sr - gi * si
      im[k] = (im[k] ?? 0) + gr * si + gi * sr
    }
  }
}

/** How high the partial stands in the spectrum of `count` samples. */
export function peakHeight({ decay, amplitude }: DampedPartial, count: number): number {
  return (Math.hypot(amplitude.re, amplitude.im) * (1 - Math.exp(-decay * count))) / (2 * decay)
}
