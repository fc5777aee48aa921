import { AcousticsError } from '@/lib/acoustics/acoustics-error'
import { requireQuantity } from '@/lib/acoustics/require-quantity'
import type { ReadingBasis } from './head-state'
import { requireLugs } from './lug-order'

/** Poisson's ratio of biaxially oriented PET film (published: DuPont Teijin Films H-37232-3). */
export const PET_POISSON_RATIO = 0.38

/** The hoop parameter κ: bounds, and where to start before any move has been logged (from memory; see `lugResponse`). */
export const HOOP_LIMITS = { min: 2e-4, max: 1 } as const
export const USUAL_HOOP = 0.02

/**
 * Film stiffness over rod stiffness, both per metre of edge: (E·h/a)/(N·c/2πa). 10 mil PET of 4.9 GPa on a 12 in drum with six
 * 12-24 rods (0.0242 in² of steel, 60 mm long) gives 0.025 (derived). It hardly matters, so it is not learned.
 */
const FILM_OVER_RODS = 0.025

/** EI/GJ of a solid round ring, 1 + ν of steel (derived): the hoop's resistance to twist. */
const HOOP_TWIST_RATIO = 1.3

/** Harmonics beyond this many turns of the lug count add less than a thousandth. */
const ALIAS_TURNS = 24

/** Patterns that move the readings less than this share of an even turn are left alone unless the caller says otherwise. */
const USUAL_FLOOR = 0.05

/**
 * Stiffness of a film's edge against a radial displacement d·cos kθ of that edge, greased (no shear there), plane stress:
 * edge tension = (E·h/a)·S_k·d·cos kθ, with S_0 = 1/(1−ν), S_1 = 0 (a side shift stretches nothing) and
 * S_k = (k²−1)/(2k−1+ν) for k ≥ 2. Derived from the Airy stress function (A·r^k + B·r^{k+2})·cos kθ.
 * @throws AcousticsError k not a whole number 0 to 400, Poisson's ratio outside 0 to 0.5
 */
export function edgeStiffness(k: number, poissonRatio = PET_POISSON_RATIO): number {
  if (!Number.isInteger(k) || k < 0 || k > 400) throw new AcousticsError('k', `k is ${k}: a whole number 0 to 400.`)
  requireQuantity('poissonRatio', poissonRatio, { min: 0, max: 0.5, unit: '' })
  return stiffnessOf(k, poissonRatio)
}

function stiffnessOf(k: number, poissonRatio: number): number {
  if (k === 0) return 1 / (1 - poissonRatio)
  return (k * k - 1) / (2 * k - 1 + poissonRatio)
}

/** What key turns do to the readings of one head with evenly spaced lugs. All figures are shares of what the same turn at every lug does. */
export type LugResponse = {
  readonly lugs: number
  readonly basis: ReadingBasis
  readonly hoop: number
  /** By pattern m = 0 … ⌊N/2⌋ round the head (m highs and m lows): 1 at m = 0, 0 at m = 1. */
  readonly patterns: readonly number[]
  /** By places clockwise from the lug that is turned, 0 … N−1. They add up to 1. */
  readonly shares: readonly number[]
}

/**
 * The response of readings to key turns, a circulant matrix R: reading change at lug i = gain·Σ_j shares[i−j]·turns[j].
 *
 * Rods of stiffness c at N places pull a ring (bending EI, twist GJ) over a film with a greased edge. Harmonic k of the ring
 * resists with κ·k²(k²−1)²/(k²+EI/GJ) (out-of-plane bending of a ring), the film with φ·S_k, both over the rods' own
 * N·c/2πa; κ = 2π·EI/(a³·N·c) is the hoop parameter. Rods cannot tell k from k ± N, so a pattern m of turns sets off every
 * k ≡ m (mod N): with G_m = Σ 1/(κB_k + φS_k), λ_m ∝ Σ seen_k·S_k/(κB_k + φS_k)/(1 + G_m). Far from aliasing this is
 * S_k/(1 + κB_k + φS_k): stiff hoops hide high patterns. m = 1 only tilts the hoop: λ_1 = 0.
 *
 * `basis` says what the readings see: a gauge the film's tension at each lug (seen_k = 1); taps the (1,1) pair, so the mean and,
 * at half weight, k = ±2 (split (ε/2)·f11, so ± ε/4 of pitch where an even change of ε gives ε/2), else nothing.
 *
 * The usual κ is from memory: 2.3 mm steel, 40 mm high, 12 in, six rods gives 0.014 (derived) for the web alone,
 * and down to a twentieth of that where its open section may twist freely. Left out:
 * friction on the edge (it leaks into m = 1 and slows everything), bent hoops, uneven lugs, how
 * much steeper in k that twist is (the learned κ stands for it), what lies between the edge and the gauge's foot.
 * @throws AcousticsError lugs not a whole number 4 to 12, hoop outside its limits
 */
export function lugResponse({
  lugs,
  basis,
  hoop = USUAL_HOOP,
}: {
  lugs: number
  basis: ReadingBasis
  /** Hoop parameter κ, no unit, 0.0002 (soft) to 1 (stiff); learned by `learnHoop`. */
  hoop?: number
}): LugResponse {
  requireLugs(lugs)
  requireQuantity('hoop', hoop, { ...HOOP_LIMITS, unit: '' })
  const raw = Array.from({ length: Math.floor(lugs / 2) + 1 }, (_, m) => patternGain(m, lugs, basis, hoop))
  const even = raw[0] ?? Number.NaN
  const patterns = raw.map((gain) => gain / even)
  return { lugs, basis, hoop, patterns, shares: kernel(lugs, patterns) }
}

function patternGain(m: number, lugs: number, basis: ReadingBasis, hoop: number): number {
  if (m === 1) return 0
  let give = 0
  let seen = 0
  for (let turn = -ALIAS_TURNS; turn <= ALIAS_TURNS; turn++) {
    const k = Math.abs(m + turn * lugs)
    const stiffness = stiffnessOf(k, PET_POISSON_RATIO)
    const resists = hoop * ringBending(k) + FILM_OVER_RODS * stiffness
    give += 1 / resists
    seen += (seenWeight(k, basis) * stiffness) / resists
  }
  return seen / (1 + give)
}

function ringBending(k: number): number {
  return (k * k * (k * k - 1) ** 2) / (k * k + HOOP_TWIST_RATIO)
}

function seenWeight(k: number, basis: ReadingBasis): number {
  if (basis === 'gauge' || k === 0) return 1
  return k === 2 ? 1 / 2 : 0
}

/** First column of the circulant matrix with the eigenvalues given for m = 0 … ⌊N/2⌋ (and N−m alike). */
function kernel(lugs: number, byPattern: readonly number[]): number[] {
  return Array.from({ length: lugs }, (_, places) => {
    const parts = byPattern.map((gain, m) => {
      const twice = m === 0 || 2 * m === lugs ? 1 : 2
      return twice * gain * Math.cos((2 * Math.PI * m * places) / lugs)
    })
    return parts.reduce((sum, part) => sum + part, 0) / lugs
  })
}

function convolve(shares: readonly number[], values: readonly number[]): number[] {
  const lugs = shares.length
  return values.map((_, i) => values.reduce((sum, value, j) => sum + value * (shares[(i - j + lugs) % lugs] ?? 0), 0))
}

/**
 * Change of every reading by whole key turns at the lugs (1 = one turn tighter), lug 1 first. `gain`: reading units by which the
 * whole head rises when every lug is turned once; it holds for small changes about the present tension.
 * @throws AcousticsError turns not one finite number a lug, gain not above 0
 */
export function readingChanges(response: LugResponse, turns: readonly number[], gain: number): number[] {
  requireGain(gain)
  return convolve(response.shares, requireOneALug('turns', turns, response.lugs)).map((share) => share * gain)
}

/**
 * Readings to expect after the turns, lug 1 first; null stays null where a lug was not read.
 * @throws AcousticsError as `readingChanges`, and readings not one a lug
 */
export function predictReadings(
  response: LugResponse,
  { readings, turns, gain }: { readings: readonly (number | null)[]; turns: readonly number[]; gain: number },
): (number | null)[] {
  const known = readings.map((reading) => reading ?? 0)
  requireOneALug('readings', known, response.lugs)
  const changes = readingChanges(response, turns, gain)
  return readings.map((reading, i) => (reading === null ? null : reading + (changes[i] ?? 0)))
}

export type TurnsForChange = {
  /** Whole key turns, lug 1 first; the least (by sum of squares) that does what can be done. */
  turns: number[]
  /** Change of the readings that these turns make. */
  reached: number[]
  /** Wanted less reached: what no turns can change, or not without great ones. */
  leftover: number[]
  /** Patterns m left alone: always 1; with taps all but 0 and 2; any whose response lies under the floor. */
  leftAlone: number[]
}

/**
 * Key turns for a wanted change of the readings: solved pattern by pattern (the Fourier transform of the circulant matrix), with
 * m = 1 left at zero since turning it only tilts the hoop, and patterns under `floor` left at zero since tiny reading errors
 * would ask for great turns.
 * @throws AcousticsError change not one finite number a lug, gain not above 0, floor outside 0.001 to 1
 */
export function turnsFor(
  response: LugResponse,
  { change, gain, floor = USUAL_FLOOR }: { change: readonly number[]; gain: number; floor?: number },
): TurnsForChange {
  const { lugs, patterns, shares } = response
  requireGain(gain)
  requireOneALug('change', change, lugs)
  requireQuantity('floor', floor, { min: 1e-3, max: 1, unit: '' })
  const inverse = patterns.map((share) => (share >= floor ? 1 / share : 0))
  const turns = convolve(kernel(lugs, inverse), change).map((turn) => turn / gain)
  const reached = convolve(shares, turns).map((share) => share * gain)
  return {
    turns,
    reached,
    leftover: change.map((wanted, i) => wanted - (reached[i] ?? 0)),
    leftAlone: inverse.flatMap((factor, m) => (factor === 0 ? [m] : [])),
  }
}

/** Lugs further than this from their even place (about 2°) are not evenly spaced. */
const EVEN_WITHIN_RAD = 0.035

/**
 * How many lugs stand evenly round the head, from their angles, rising. The response is a circulant matrix only for evenly
 * spaced lugs: others are refused.
 * @throws AcousticsError naming `seenRad`
 */
export function requireEvenLugs(seenRad: readonly number[]): number {
  const lugs = requireLugs(seenRad.length)
  const offsets = seenRad.map((angle, i) => angle - (2 * Math.PI * i) / lugs)
  if (!offsets.every(Number.isFinite) || Math.max(...offsets) - Math.min(...offsets) > 2 * EVEN_WITHIN_RAD) {
    throw new AcousticsError(
      'seenRad',
      'The lugs are not evenly spaced: what a turn does to each cannot be worked out.',
    )
  }
  return lugs
}

function requireGain(gain: number): void {
  requireQuantity('gain', gain, { min: 1e-6, max: 1e6, unit: '' })
}

function requireOneALug(field: string, values: readonly number[], lugs: number): readonly number[] {
  if (values.length !== lugs || !values.every(Number.isFinite)) {
    throw new AcousticsError(field, `${field}: one finite number for each of the ${lugs} lugs is needed.`)
  }
  return values
}
