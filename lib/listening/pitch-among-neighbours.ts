import type { DampedPartial } from './damped-partial'
import { addPartial, peakHeight } from './damped-partial'
import { fitOne, HIGHEST_HZ } from './find-partials'
import type { Band, BandFit } from './fit-band'
import { BandFitter } from './fit-band'
import { findHiddenPartial } from './hidden-partial'
import { isPair, WIDEST_PAIR_HZ } from './pair-of-partials'
import { parametersOf } from './partial-shape'
import type { PitchFits } from './pitch-models'
import { fitPitchModels, pitchBand } from './pitch-models'
import type { Spectrum } from './spectrum'

/** Partials as near as this to the pitch are fitted together with it, Hz; those beyond are taken out first. */
const NEIGHBOUR_HZ = 130
/** The joint band reaches this far past its outermost partial, Hz. */
const MARGIN_HZ = 20
/** How much more than a fit of many partials a glide may leave and still be believed. */
const GLIDE_LEAVES = 1.5
const MOST_ROUNDS = 4

export type PitchAmongNeighbours = {
  /** The pitch's model; parameters past its own are neighbours. Residual and energy are those of the pitch's own band. */
  fit: BandFit
  /** Where it was fitted. */
  band: Band
  /** What was taken out first. */
  aside: readonly DampedPartial[]
}

/**
 * The pitch fitted together with the partials about it, so that neither leans on the other's skirts: the note that a fingertip
 * leaves is some 15 Hz wide and close by. The far ones are taken out first. Then in turn the pitch's model is chosen with the
 * neighbours taken out, all are fitted at once, and what still stands out joins the neighbours.
 * @param found partials of the spectrum, highest first, `chosen` among them
 * @returns null when not even one damped sinusoid holds
 */
export function fitPitchAmongNeighbours(
  spectrum: Spectrum,
  rateHz: number,
  found: readonly DampedPartial[],
  chosen: DampedPartial,
): PitchAmongNeighbours | null {
  const awayHz = (partial: DampedPartial) => (Math.abs(partial.angle - chosen.angle) * rateHz) / (2 * Math.PI)
  const all = relaxed(spectrum, rateHz, found)
  const near = all.filter((partial) => awayHz(partial) <= NEIGHBOUR_HZ).sort((a, b) => awayHz(a) - awayHz(b))
  const far = all.filter((partial) => awayHz(partial) > NEIGHBOUR_HZ)
  const cleared = withoutPartials(spectrum, rateHz, far)
  const [first = chosen, ...others] = near
  // What lies in the pair's own place is left to the pitch's models: fitted one by one, a pair comes apart wrongly. A note that
  // is there too stands out later.
  const inPlace = others
    .filter((one) => awayHz(one) <= WIDEST_PAIR_HZ)
    .sort((a, b) => peakHeight(b, spectrum.count) - peakHeight(a, spectrum.count))
  let beside: readonly DampedPartial[] = others.filter((one) => !inPlace.includes(one))
  for (let round = 0; ; round++) {
    const fits = fitPitchModels(withoutPartials(cleared, rateHz, beside), rateHz, first, inPlace[0] ?? null)
    if (fits === null) return null
    const joint = jointly(cleared, rateHz, fits, beside)
    if (joint === null) return { fit: fits.best, band: pitchBand(spectrum, rateHz, first), aside: [...far, ...beside] }
    const more = round < MOST_ROUNDS ? findHiddenPartial(cleared, joint.band, rateHz, joint.fit) : null
    if (more === null) {
      const { residual, energy } = fits.best
      const alone = glideAlone(spectrum, rateHz, all, first, residual)
      return alone ?? { fit: { ...joint.fit, residual, energy }, band: joint.band, aside: far }
    }
    beside = neighboursOf(more)
  }
}

/**
 * The fits with nothing taken out of the pitch's own place, when a glide then leaves hardly more than the partials into which
 * it otherwise comes apart.
 */
function glideAlone(
  spectrum: Spectrum,
  rateHz: number,
  all: readonly DampedPartial[],
  pitch: DampedPartial,
  residual: number,
): PitchAmongNeighbours | null {
  const apart = (2 * Math.PI * WIDEST_PAIR_HZ) / rateHz
  const others = all.filter(({ angle }) => Math.abs(angle - pitch.angle) > apart)
  const fits = fitPitchModels(withoutPartials(spectrum, rateHz, others), rateHz, pitch, null)
  return fits?.best.kind === 'glide' && fits.best.residual < GLIDE_LEAVES * residual
    ? { fit: fits.best, band: pitchBand(spectrum, rateHz, pitch), aside: others }
    : null
}

/** The best model with the neighbours; plain where a pair does not stay one beside them. */
function jointly(
  spectrum: Spectrum,
  rateHz: number,
  { one, best }: PitchFits,
  beside: readonly DampedPartial[],
): { band: Band; fit: BandFit } | null {
  const joint = fitJointly(spectrum, rateHz, best, beside)
  return joint !== null && isPair(joint.fit, one, rateHz) ? joint : fitJointly(spectrum, rateHz, one, beside)
}

/** The pitch's model and plain neighbours, all at once, over a band that holds them. */
function fitJointly(
  spectrum: Spectrum,
  rateHz: number,
  pitch: BandFit,
  beside: readonly DampedPartial[],
): { band: Band; fit: BandFit } | null {
  const own = parametersOf[pitch.kind]
  const binOf = (angle: number) => (angle * spectrum.size) / (2 * Math.PI)
  const bins = [pitch.parameters[1] ?? 0, ...beside.map(({ angle }) => angle)].map(binOf)
  const margin = (MARGIN_HZ * spectrum.size) / rateHz
  const band = {
    first: Math.max(1, Math.floor(Math.min(...bins) - margin)),
    last: Math.min(spectrum.size / 2 - 1, Math.ceil(Math.max(...bins) + margin)),
  }
  const start = Float64Array.from([
    ...pitch.parameters.slice(0, own),
    ...beside.flatMap(({ decay, angle }) => [decay, angle]),
  ])
  const fit = new BandFitter(spectrum, band).fit(pitch.kind, start)
  return fit === null ? null : { band, fit }
}

export function neighboursOf({ kind, parameters, amplitudes }: BandFit): DampedPartial[] {
  const own = parametersOf[kind]
  const count = (parameters.length - own) / 2
  return Array.from({ length: count }, (_, i) => ({
    decay: parameters[own + 2 * i] ?? 0,
    angle: parameters[own + 2 * i + 1] ?? 0,
    amplitude: amplitudes[amplitudes.length - count + i] ?? { re: 0, im: 0 },
  }))
}

/** Each partial fitted in turn with the others taken out, strongest first, twice over. */
function relaxed(spectrum: Spectrum, rateHz: number, found: readonly DampedPartial[]): DampedPartial[] {
  const binHz = rateHz / spectrum.size
  const reach = reachOf(spectrum, rateHz)
  const rest = copyOf(spectrum)
  const first = found.flatMap((partial) => {
    const fit = fitOne(rest, partial, binHz)
    if (fit === null) return []
    addPartial(rest, fit, -1, reach)
    return [fit]
  })
  return first.map((partial) => {
    addPartial(rest, partial, 1, reach)
    const again = fitOne(rest, partial, binHz) ?? partial
    addPartial(rest, again, -1, reach)
    return again
  })
}

export function withoutPartials(spectrum: Spectrum, rateHz: number, partials: readonly DampedPartial[]): Spectrum {
  const rest = copyOf(spectrum)
  for (const partial of partials) addPartial(rest, partial, -1, reachOf(spectrum, rateHz))
  return rest
}

function copyOf(spectrum: Spectrum): Spectrum {
  return { ...spectrum, re: Float64Array.from(spectrum.re), im: Float64Array.from(spectrum.im) }
}

function reachOf({ size }: Spectrum, rateHz: number): number {
  return Math.ceil(((HIGHEST_HZ + 100) * size) / rateHz)
}
