import { AcousticsError } from '@/lib/acoustics/acoustics-error'
import type { HeadSide } from '@/lib/acoustics/tension-range'
import { MAX_LUGS, MIN_LUGS, requireLugs } from './lug-order'

const TURN = 2 * Math.PI
/** Lugs nearer to each other than this (about 2°) cannot be two lugs of one shell. */
const MIN_GAP_RAD = 0.035

/**
 * One lug as seen facing its head. `lug` counts clockwise from the badge. `seenRad` is clockwise from the badge as seen,
 * 0 to 2π; `shellRad` is the angle stored on the shell, the same for both heads of a through lug.
 * `x` to the right, `y` downwards, on a circle of radius 1 with the badge at the top.
 */
export type FacedLug = { lug: number; seenRad: number; shellRad: number; x: number; y: number }

/**
 * Angles of evenly spaced lugs as they are stored on a shell: radians from the badge, clockwise as seen facing the batter
 * head. The badge sits midway between two lugs (common practice).
 * @throws AcousticsError lugs not a whole number 4 to 12
 */
export function evenLugAngles(lugs: number): number[] {
  requireLugs(lugs)
  return Array.from({ length: lugs }, (_, i) => ((i + 0.5) * TURN) / lugs)
}

/**
 * The lugs as seen facing one head, lug 1 first. Lug 1 is the first lug clockwise from the badge seen facing that head,
 * so the resonant head mirrors the batter's count. A lug exactly at the badge is lug 1 on both.
 * @param shellAnglesRad angles stored on the shell (see `evenLugAngles`), any order, any whole turns
 * @throws AcousticsError fewer than 4 or more than 12, an angle that is no finite number, two lugs in one place
 */
export function lugsFacing(side: HeadSide, shellAnglesRad: readonly number[]): FacedLug[] {
  if (shellAnglesRad.length < MIN_LUGS || shellAnglesRad.length > MAX_LUGS) {
    throw new AcousticsError(
      'shellAnglesRad',
      `${shellAnglesRad.length} lug angles: allowed ${MIN_LUGS} to ${MAX_LUGS}.`,
    )
  }
  const seen = shellAnglesRad
    .map((angle) => {
      if (!Number.isFinite(angle)) throw new AcousticsError('shellAnglesRad', 'A lug angle is not a finite number.')
      const shellRad = withinTurn(angle)
      return { shellRad, seenRad: side === 'batter' ? shellRad : withinTurn(-shellRad) }
    })
    .sort((a, b) => a.seenRad - b.seenRad)

  return seen.map(({ seenRad, shellRad }, i) => {
    const next = seen[(i + 1) % seen.length]?.seenRad ?? seenRad
    if (withinTurn(next - seenRad) < MIN_GAP_RAD) {
      throw new AcousticsError('shellAnglesRad', 'Two lugs stand in the same place on the shell.')
    }
    return { lug: i + 1, seenRad, shellRad, x: Math.sin(seenRad), y: -Math.cos(seenRad) }
  })
}

/** Into [0, 2π), with a hair under a whole turn counted as none. */
function withinTurn(angleRad: number): number {
  const wrapped = angleRad >= 0 && angleRad < TURN ? angleRad : ((angleRad % TURN) + TURN) % TURN
  return TURN - wrapped < 1e-9 ? 0 : wrapped
}
