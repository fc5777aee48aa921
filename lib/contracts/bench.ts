export const readingMethods = ['gauge', 'tap-typed', 'tap-heard'] as const
export type ReadingMethod = (typeof readingMethods)[number]
export const readingUnits = ['gauge', 'Hz', 'cents'] as const
export type ReadingUnit = (typeof readingUnits)[number]
