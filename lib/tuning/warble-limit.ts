/**
 * The warble that is let pass unless a drum says otherwise, beats a second: slower than this, a tom has died away before
 * the ear has counted a beat (from memory: the drum tech sets it per drum).
 */
export const WARBLE_LIMIT_HZ = 1

/** What may be set. Faster than 12 a second the ear hears two pitches and no beat. */
export const warbleLimits = { min: 0.1, max: 12, unit: 'beats a second' } as const
