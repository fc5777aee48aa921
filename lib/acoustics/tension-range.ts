import { AcousticsError } from './acoustics-error'
import { requireTensionNPerM } from './require-quantity'

export const DRUM_ROLES = ['kick', 'snare', 'tom', 'floor-tom'] as const
export type DrumRole = (typeof DRUM_ROLES)[number]

export const HEAD_SIDES = ['batter', 'resonant'] as const
export type HeadSide = (typeof HEAD_SIDES)[number]

/** Film tensions between which a head is playable, N/m: under it the film is slack, over it the head chokes. */
export type TensionRange = { slackNPerM: number; chokedNPerM: number }

export const RANGE_ZONES = ['slack', 'low', 'middle', 'high', 'choked'] as const
export type RangeZone = (typeof RANGE_ZONES)[number]

/** `fraction` is 0 at the slack edge and 1 at the choked edge, even in cents; it goes on past both. */
export type RangePosition = { fraction: number; zone: RangeZone }

/**
 * Defaults, all from memory and meant to be replaced per head by what the party learns. They were set so that the
 * common notes of common sizes (12 in tom about 110 to 165 Hz, 16 in floor tom about 70 to 105 Hz, 22 in kick about
 * 40 to 60 Hz, 14 in snare about 165 to 230 Hz) fall inside, most of them near the middle.
 */
const BATTER: Record<DrumRole, TensionRange> = {
  kick: { slackNPerM: 400, chokedNPerM: 3000 },
  snare: { slackNPerM: 2000, chokedNPerM: 8500 },
  tom: { slackNPerM: 700, chokedNPerM: 4500 },
  'floor-tom': { slackNPerM: 550, chokedNPerM: 4000 },
}

/** A snare side is 3 mil film: at the top of this range it carries about a third of 98 MPa, which is ordinary playing for it. */
const SNARE_SIDE: TensionRange = { slackNPerM: 900, chokedNPerM: 3000 }

/** Default playable range of a head. From memory: show it as such, let the user replace it. */
export function defaultTensionRange(role: DrumRole, side: HeadSide = 'batter'): TensionRange {
  return role === 'snare' && side === 'resonant' ? SNARE_SIDE : BATTER[role]
}

/** Refuses edges that are no tensions, or upside down. @throws AcousticsError naming `range` or the edge */
export function requireTensionRange({ slackNPerM, chokedNPerM }: TensionRange): TensionRange {
  requireTensionNPerM(slackNPerM, 'slackNPerM')
  requireTensionNPerM(chokedNPerM, 'chokedNPerM')
  if (slackNPerM >= chokedNPerM) {
    throw new AcousticsError(
      'range',
      `The slack edge (${slackNPerM} N/m) must lie below the choked edge (${chokedNPerM} N/m).`,
    )
  }
  return { slackNPerM, chokedNPerM }
}

/**
 * Where a film tension lies in its playable range. Counted in cents (pitch goes as √T, so by the logarithm of T);
 * the middle third is the safe aim (common practice).
 * @throws AcousticsError tension or range refused, or the range upside down
 */
export function rangePosition(tensionNPerM: number, range: TensionRange): RangePosition {
  requireTensionNPerM(tensionNPerM)
  const { slackNPerM, chokedNPerM } = requireTensionRange(range)
  const fraction = Math.log(tensionNPerM / slackNPerM) / Math.log(chokedNPerM / slackNPerM)
  return { fraction, zone: zoneOf(fraction) }
}

function zoneOf(fraction: number): RangeZone {
  if (fraction < 0) return 'slack'
  if (fraction < 1 / 3) return 'low'
  if (fraction <= 2 / 3) return 'middle'
  return fraction <= 1 ? 'high' : 'choked'
}

/** Tension in N/m at the middle of a range, counted in cents: the geometric mean of its edges. @throws AcousticsError the range refused */
export function middleTensionNPerM(range: TensionRange): number {
  const { slackNPerM, chokedNPerM } = requireTensionRange(range)
  return Math.sqrt(slackNPerM * chokedNPerM)
}
