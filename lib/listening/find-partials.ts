import type { DampedPartial } from './damped-partial'
import { addPartial, peakHeight } from './damped-partial'
import type { Band } from './fit-band'
import { BandFitter } from './fit-band'
import type { Spectrum } from './spectrum'
import { peakOffset } from './spectrum'

/** What is looked through, Hz: from under a large kick's note to above any tom's tap. */
export const LOWEST_HZ = 30
export const HIGHEST_HZ = 1000
export const MOST_PARTIALS = 7
/** Peaks this far under the highest are left alone. */
const FAINTEST = 0.01
/** A peak must stand this many times over the spectrum's middle height. */
const OVER_FLOOR = 4
/** The middle height is taken over every fourth bin: enough to know it. */
const MIDDLE_STRIDE = 4

export type FoundPartial = DampedPartial & { height: number }

export type Found = {
  /** Highest in the spectrum first. */
  partials: FoundPartial[]
  /** The spectrum with all of them taken out. */
  rest: Spectrum
}

/**
 * Partials of a spectrum one by one: the highest peak, placed between bins by the log parabola, fitted as a damped sinusoid
 * and taken out, then the next highest in what is left; a last round fits each again with all the others taken out
 * (the relaxation of Li and Stoica, 1996, with decay).
 */
export function findPartials(spectrum: Spectrum, rateHz: number): Found {
  const binHz = rateHz / spectrum.size
  const search: Band = { first: Math.ceil(LOWEST_HZ / binHz), last: Math.floor(HIGHEST_HZ / binHz) }
  const reach = Math.ceil((HIGHEST_HZ + 100) / binHz)
  const rest: Spectrum = { ...spectrum, re: Float64Array.from(spectrum.re), im: Float64Array.from(spectrum.im) }
  const partials: FoundPartial[] = []
  let highest = 0
  while (partials.length < MOST_PARTIALS) {
    const peak = highestBin(rest, search)
    highest = Math.max(highest, peak.height)
    if (peak.height < FAINTEST * highest || peak.height < OVER_FLOOR * middleHeight(rest, search)) break
    const fit = fitOne(rest, guess(rest, peak.bin, binHz), binHz)
    if (fit === null) break
    addPartial(rest, fit, -1, reach)
    partials.push({ ...fit, height: peakHeight(fit, spectrum.count) })
  }
  if (partials.length > 1) {
    for (const [i, partial] of partials.entries()) {
      addPartial(rest, partial, 1, reach)
      const again = fitOne(rest, partial, binHz) ?? partial
      addPartial(rest, again, -1, reach)
      partials[i] = { ...again, height: peakHeight(again, spectrum.count) }
    }
  }
  return { partials: partials.sort((a, b) => b.height - a.height), rest }
}

/** Bins round a partial that hold what is to be known of it: four of its half-widths, 12 to 60 Hz either way. */
export function bandRound(
  { decay, angle }: { decay: number; angle: number },
  size: number,
  binHz: number,
  leastHz = 12,
): Band {
  const middle = (angle * size) / (2 * Math.PI)
  const halfWidthHz = (decay * size * binHz) / (2 * Math.PI)
  const half = Math.min(60, Math.max(leastHz, 4 * halfWidthHz)) / binHz
  return { first: Math.max(1, Math.round(middle - half)), last: Math.min(size / 2 - 1, Math.round(middle + half)) }
}

/** One damped sinusoid from a first guess; null when the fit does not hold. */
export function fitOne(
  spectrum: Spectrum,
  start: { decay: number; angle: number },
  binHz: number,
): DampedPartial | null {
  const band = bandRound(start, spectrum.size, binHz)
  const fit = new BandFitter(spectrum, band).fit('one', Float64Array.of(start.decay, start.angle))
  const amplitude = fit?.amplitudes[0]
  if (fit === null || amplitude === undefined) return null
  return { decay: fit.parameters[0] ?? start.decay, angle: fit.parameters[1] ?? start.angle, amplitude }
}

function height(spectrum: Spectrum, bin: number): number {
  return Math.sqrt((spectrum.re[bin] ?? 0) ** 2 + (spectrum.im[bin] ?? 0) ** 2)
}

function highestBin(spectrum: Spectrum, { first, last }: Band): { bin: number; height: number } {
  let best = { bin: first, height: 0 }
  for (let bin = first; bin <= last; bin++) {
    const here = height(spectrum, bin)
    if (here > best.height) best = { bin, height: here }
  }
  return best
}

function middleHeight(spectrum: Spectrum, { first, last }: Band): number {
  const heights = new Float64Array(Math.floor((last - first) / MIDDLE_STRIDE) + 1)
  for (let i = 0; i < heights.length; i++) heights[i] = height(spectrum, first + i * MIDDLE_STRIDE)
  heights.sort()
  return heights[heights.length >> 1] ?? 0
}

/** Angle by the log parabola; decay from how far the peak reaches down to 1/√2, which is decay/2π either way. */
function guess(spectrum: Spectrum, bin: number, binHz: number): { decay: number; angle: number } {
  const db = (at: number) => 20 * Math.log10(height(spectrum, at) + 1e-30)
  const angle = (2 * Math.PI * (bin + peakOffset(db(bin - 1), db(bin), db(bin + 1)))) / spectrum.size
  const edge = height(spectrum, bin) / Math.SQRT2
  let left = bin
  while (left > 1 && height(spectrum, left) > edge) left--
  let right = bin
  while (right < spectrum.size / 2 && height(spectrum, right) > edge) right++
  const widthHz = Math.max(0.2, ((right - left) * binHz) / 2 - (0.3 * spectrum.size * binHz) / spectrum.count)
  return { decay: (2 * Math.PI * widthHz) / (spectrum.size * binHz), angle }
}
