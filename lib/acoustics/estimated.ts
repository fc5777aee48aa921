/** A figure with where the true one may lie, all in one unit. The bounds come from the model's scatter, not from the arithmetic. */
export type Estimated = { value: number; low: number; high: number }

/**
 * A figure with a scatter in shares (0.02 for ±2 %), several independent ones taken together as the root of their squares, and
 * laid out evenly in cents: value·e^±s.
 */
export function estimated(value: number, ...shares: readonly number[]): Estimated {
  const factor = Math.exp(Math.hypot(...shares))
  return { value, low: value / factor, high: value * factor }
}
