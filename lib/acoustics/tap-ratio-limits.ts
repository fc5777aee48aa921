/** Any drum's batter tap over its note lies within these (from memory); outside them one of the two was another partial. */
export const TAP_RATIO_LIMITS = { min: 1.2, max: 2.5 } as const
