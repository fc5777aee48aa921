import { PET_STRESS_AT_5_PERCENT_PA } from './film'
import { requireQuantity } from './require-quantity'
import type { DrumRole, HeadSide, RangePosition } from './tension-range'

/** Why a head wants a second look. `film-stress`: the film itself is pulled harder than this kind of head should be. */
export type HeadCaution = 'slack' | 'choked' | 'film-stress'

/** Share of the 5 % strain stress that is still ordinary: a third, but two thirds for the 3 mil snare side (from memory). */
const STRESS_SHARE = 1 / 3
const SNARE_SIDE_STRESS_SHARE = 2 / 3

/** What to watch on a head at a place in its playable range and a film stress in Pa. @throws AcousticsError a stress that is no number, or under 0 */
export function headCautions(
  head: { role: DrumRole; side: HeadSide },
  { zone }: Pick<RangePosition, 'zone'>,
  filmStressPa: number,
): HeadCaution[] {
  const share = head.role === 'snare' && head.side === 'resonant' ? SNARE_SIDE_STRESS_SHARE : STRESS_SHARE
  requireQuantity('filmStressPa', filmStressPa, { min: 0, max: 1e11, unit: 'Pa' })
  return [
    ...(zone === 'slack' || zone === 'choked' ? [zone] : []),
    ...(filmStressPa > share * PET_STRESS_AT_5_PERCENT_PA ? ['film-stress' as const] : []),
  ]
}
