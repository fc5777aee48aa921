import type { BandFit } from './fit-band'
import { fitBand } from './fit-band'
import { bandRound } from './find-partials'
import type { Spectrum } from './spectrum'

/** How far apart two partials may lie and still be one mode's pair, Hz. */
export const WIDEST_PAIR_HZ = 14
const FIRST_SPLITS_HZ = [0.7, 1.6, 3.2, 6.5]
/** How much a model with more parameters must gain (twice the log likelihood) before it is believed. */
const BELIEVED_GAIN = 20

type Guess = { decay: number; angle: number }

export type PitchFits = {
  one: BandFit
  glide: BandFit | null
  pair: BandFit | null
  /** The one that the sound bears out. */
  best: BandFit
}

/**
 * One damped sinusoid, one whose pitch glides, and a close pair, fitted to the band round the tap's pitch. A richer model is believed when
 * freedom·ln(residual ratio) exceeds what chance gives.
 * @param companion the strongest other partial within {@link WIDEST_PAIR_HZ}
 */
export function fitPitchModels(
  spectrum: Spectrum,
  rateHz: number,
  target: Guess,
  companion: Guess | null,
): PitchFits | null {
  const binHz = rateHz / spectrum.size
  const band = bandRound(target, spectrum.size, binHz, 20)
  const one = fitBand(spectrum, band, 'one', Float64Array.of(target.decay, target.angle))
  if (one === null) return null
  const d = one.parameters[0] ?? target.decay
  const w = one.parameters[1] ?? target.angle
  const gain = (fit: BandFit) => one.freedom * Math.log(one.residual / fit.residual)

  const room = one.freedom > 16
  const glide = room ? bestOf([0.2, -0.2].map((g) => fitBand(spectrum, band, 'glide', Float64Array.of(d, w, g)))) : null
  const pairs = !room
    ? []
    : [
        ...FIRST_SPLITS_HZ.map((hz) => {
          const split = (2 * Math.PI * hz) / rateHz
          const envelope = fitBand(spectrum, band, 'envelope', Float64Array.of(d, w, split))
          return envelope
        }),
        ...(companion === null
          ? []
          : [
              fitBand(
                spectrum,
                band,
                'two',
                Float64Array.of(target.decay, target.angle, companion.decay, companion.angle),
              ),
            ]),
      ]
  let pair = bestOf(pairs)
  if (pair?.kind === 'envelope') {
    const [decay = d, middle = w, split = 0] = pair.parameters
    const two = fitBand(spectrum, band, 'two', Float64Array.of(decay, middle + split / 2, decay, middle - split / 2))
    if (two !== null && gain(two) - gain(pair) > 8) pair = two
  }
  let best = one
  if (glide !== null && gain(glide) > BELIEVED_GAIN / 2) best = glide
  if (pair !== null && gain(pair) > Math.max(BELIEVED_GAIN, best === one ? 0 : gain(best) + BELIEVED_GAIN / 2))
    best = pair
  return { one, glide, pair, best }
}

function bestOf(fits: (BandFit | null)[]): BandFit | null {
  let best: BandFit | null = null
  for (const fit of fits) if (fit !== null && (best === null || fit.residual < best.residual)) best = fit
  return best
}
