import type { DampedPartial } from './damped-partial'
import type { FoundPartial } from './find-partials'
import { WIDEST_PAIR_HZ } from './pair-of-partials'

/** Two pitches this near in height cannot be told apart by strength, dB. */
const EQUAL_DB = 1.5
/** No head's tap lies higher, Hz. */
const HIGHEST_TAP_HZ = 750
/** How far from the target is still near it, cents, unless told. */
const NEAR_TARGET_CENTS = 500

/**
 * The partial that is the tap's pitch: the strongest, or the strongest near the target when one is expected.
 * `unclear`: another pitch is as strong, or none lies near the target; `too-noisy`: there is no partial at all.
 */
export function chooseTapPartial(
  found: readonly FoundPartial[],
  rateHz: number,
  { expectHz, expectWithinCents = NEAR_TARGET_CENTS }: { expectHz?: number; expectWithinCents?: number },
): FoundPartial | 'unclear' | 'too-noisy' {
  const hz = (partial: DampedPartial) => (partial.angle * rateHz) / (2 * Math.PI)
  const isNear = (partial: DampedPartial) =>
    expectHz === undefined || Math.abs(1200 * Math.log2(hz(partial) / expectHz)) <= expectWithinCents
  const near = found.filter((partial) => hz(partial) < HIGHEST_TAP_HZ && isNear(partial))
  const [first, ...others] = near
  if (first === undefined) return found.length === 0 ? 'too-noisy' : 'unclear'
  const rival = others.find((other) => Math.abs(hz(other) - hz(first)) > WIDEST_PAIR_HZ)
  return rival !== undefined && 20 * Math.log10(first.height / rival.height) < EQUAL_DB ? 'unclear' : first
}
