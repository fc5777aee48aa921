export const rateBases = ['day', 'show', 'week'] as const
export type RateBasis = (typeof rateBases)[number]
