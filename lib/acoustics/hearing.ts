import { requireQuantity } from './require-quantity'

/** Recommended exposure limit: 85 dBA over 8 hours, half the time for every 3 dB more. NIOSH publication 98-126. */
const LIMIT_DBA = 85
const LIMIT_MINUTES = 480
const EXCHANGE_DB = 3

const LEVELS = { min: 40, max: 140, unit: 'dBA' }

/**
 * Minutes a day in which a level uses up the whole recommended dose: 480/2^((L − 85)/3). A caution, never a medical claim.
 * @throws AcousticsError level outside 40 to 140 dBA
 * Source: NIOSH 98-126.
 */
export function hearingMinutes(levelDba: number): number {
  requireQuantity('levelDba', levelDba, LEVELS)
  return LIMIT_MINUTES / 2 ** ((levelDba - LIMIT_DBA) / EXCHANGE_DB)
}

/** Time spent at one level. */
export type Exposure = { levelDba: number; minutes: number }

/**
 * Share of the recommended daily dose, 1 for the whole of it: Σ minutes / `hearingMinutes(level)`.
 * @throws AcousticsError a level outside 40 to 140 dBA, minutes outside 0 to 1440
 * Source: NIOSH 98-126.
 */
export function hearingDose(exposures: readonly Exposure[]): number {
  return exposures.reduce(
    (dose, { levelDba, minutes }) =>
      dose + requireQuantity('minutes', minutes, { min: 0, max: 1440, unit: 'min' }) / hearingMinutes(levelDba),
    0,
  )
}
