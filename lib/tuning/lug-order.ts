import { requireWhole } from '@/lib/acoustics/require-quantity'

export const MIN_LUGS = 4
export const MAX_LUGS = 12

/** Whole number of lugs on a head, 4 to 12. @throws AcousticsError naming `lugs` */
export function requireLugs(lugs: number): number {
  return requireWhole('lugs', lugs, { min: MIN_LUGS, max: MAX_LUGS, unit: 'lugs' })
}

/**
 * The order in which to turn the lugs of a head, 1-based: each next lug is opposite the last or, where that one is done,
 * the one beside the opposite; every lug once. Even counts cross over and step on (1, 5, 2, 6, …), odd counts always go
 * nearly half round (1, 3, 5, 2, 4). Common practice.
 * @throws AcousticsError lugs not a whole number 4 to 12
 */
export function lugOrder(lugs: number): number[] {
  requireLugs(lugs)
  const half = Math.floor(lugs / 2)
  if (lugs % 2 === 1) return Array.from({ length: lugs }, (_, turn) => ((turn * half) % lugs) + 1)
  return Array.from({ length: lugs }, (_, turn) => Math.floor(turn / 2) + (turn % 2 === 1 ? half : 0) + 1)
}
