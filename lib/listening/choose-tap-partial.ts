import type { DampedPartial } from './damped-partial'
import type { FoundPartial } from './find-partials'
import { WIDEST_PAIR_HZ } from './pair-of-partials'

/** Two pitches this near in height cannot be told apart by strength, dB. */
const EQUAL_DB = 1.5
/** One that lies lower competes from further down: close to a lug the next shape of the head often rings louder than the tap's own. */
const LOWER_DB = 7
/** Near a target the lowest counts that stands at least so high beside the highest and sets off so loud beside the loudest, dB: what a
 * room rings on with stands high and sets off soft. */
const PROMINENT_DB = -12
/** No head's tap lies higher, Hz. */
const HIGHEST_TAP_HZ = 750
/** How far from the target is still near it, cents, unless told. */
const NEAR_TARGET_CENTS = 500

export type ExpectedPitch = { expectHz?: number; expectWithinCents?: number }

/** Whether a pitch may be the one that is expected; any may when none is. */
export function isNearTarget(hz: number, { expectHz, expectWithinCents = NEAR_TARGET_CENTS }: ExpectedPitch): boolean {
  return expectHz === undefined || Math.abs(1200 * Math.log2(hz / expectHz)) <= expectWithinCents
}

/**
 * The partial that is the tap's pitch. With a target the lowest prominent one near it: close to a lug the next shape, half an octave
 * up, can ring louder than the tap's own. Without one the strongest.
 * `unclear`: without a target another pitch competes, or with one none lies near it; `too-noisy`: there is no partial at all.
 */
export function chooseTapPartial(
  found: readonly FoundPartial[],
  rateHz: number,
  expect: ExpectedPitch,
): FoundPartial | 'unclear' | 'too-noisy' {
  const hz = (partial: DampedPartial) => (partial.angle * rateHz) / (2 * Math.PI)
  const near = found.filter((partial) => hz(partial) < HIGHEST_TAP_HZ && isNearTarget(hz(partial), expect))
  const [first, ...others] = near
  if (first === undefined) return found.length === 0 ? 'too-noisy' : 'unclear'
  const isApart = (a: DampedPartial, b: DampedPartial) => Math.abs(hz(a) - hz(b)) > WIDEST_PAIR_HZ
  const overDb = (a: FoundPartial, b: FoundPartial) => 20 * Math.log10(a.height / b.height)
  if (expect.expectHz === undefined) {
    const competes = (other: FoundPartial) =>
      isApart(other, first) && overDb(first, other) < (other.angle < first.angle ? LOWER_DB : EQUAL_DB)
    return others.some(competes) ? 'unclear' : first
  }
  const loudest = Math.max(...near.map(loudness))
  const isProminent = (partial: FoundPartial) =>
    overDb(partial, first) >= PROMINENT_DB && 20 * Math.log10(loudness(partial) / loudest) >= PROMINENT_DB
  const prominent = near.filter(isProminent)
  const lowest = prominent.reduce((low, partial) => (partial.angle < low.angle ? partial : low), prominent[0] ?? first)
  // Its pair may hold a stronger one: `near` is sorted by height.
  return near.find((partial) => !isApart(partial, lowest)) ?? lowest
}

/** Amplitude at the first sample. */
function loudness({ amplitude }: DampedPartial): number {
  return Math.hypot(amplitude.re, amplitude.im)
}
