import type { DampedPartial } from './damped-partial'
import type { FoundPartial } from './find-partials'
import { WIDEST_PAIR_HZ } from './pair-of-partials'

/** Two pitches this near in height cannot be told apart by strength, dB. */
const EQUAL_DB = 1.5
/** Near a target the lowest counts that stands at least so high beside the highest, dB. */
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
 * `unclear`: without a target another pitch is as strong, or with one none lies near it; `too-noisy`: there is no partial at all.
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
    const rival = others.find((other) => isApart(other, first))
    return rival !== undefined && overDb(first, rival) < EQUAL_DB ? 'unclear' : first
  }
  const prominent = near.filter((partial) => overDb(partial, first) >= PROMINENT_DB)
  const lowest = prominent.reduce((low, partial) => (partial.angle < low.angle ? partial : low), first)
  // Its pair may hold a stronger one: `near` is sorted by height.
  return near.find((partial) => !isApart(partial, lowest)) ?? lowest
}
