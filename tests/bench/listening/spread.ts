/** Value below which `share` of the values lie, between neighbours in proportion. */
export function quantile(values: readonly number[], share: number): number {
  const sorted = [...values].sort((a, b) => a - b)
  const place = share * (sorted.length - 1)
  const low = sorted[Math.floor(place)] ?? Number.NaN
  const high = sorted[Math.ceil(place)] ?? low
  return low === high ? low : low + (high - low) * (place - Math.floor(place))
}

/** What half and 95 % of a normal distribution's sizes lie under, in standard deviations. */
const HALF = 0.6745
const NINETEEN_IN_TWENTY = 1.96

/**
 * Sizes of errors, each over its own bound, as standard deviations over the bound: 1 is an estimator that meets it. By the median,
 * and by the 95th percentile, each against where a normal distribution has it.
 */
export function overBound(errorsOverBound: readonly number[]): { median: number; p95: number } {
  return {
    median: quantile(errorsOverBound, 0.5) / HALF,
    p95: quantile(errorsOverBound, 0.95) / NINETEEN_IN_TWENTY,
  }
}
