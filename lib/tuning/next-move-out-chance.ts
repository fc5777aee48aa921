/** Probability that a Gaussian of this middle and variance lies outside ± tolerance; absolute error below 4e-7. */
export function outChance(off: number, variance: number, tolerance: number): number {
  const deviation = Math.sqrt(variance)
  return normalTail((tolerance - off) / deviation) + normalTail((tolerance + off) / deviation)
}

const NEGLIGIBLE_TAIL = 6
const STEPS_A_DEVIATION = 512
/** A plan asks some ten thousand times, so the tail is read between tabled points. */
const TAIL = Float64Array.from({ length: NEGLIGIBLE_TAIL * STEPS_A_DEVIATION + 2 }, (_, i) =>
  upperTail(i / STEPS_A_DEVIATION),
)

function normalTail(z: number): number {
  if (z < 0) return 1 - normalTail(-z)
  if (!(z < NEGLIGIBLE_TAIL)) return 0
  const at = z * STEPS_A_DEVIATION
  const below = Math.floor(at)
  return TAIL[below]! + (at - below) * (TAIL[below + 1]! - TAIL[below]!)
}

/** Upper tail of the standard normal from 0 up, absolute error below 8e-8 (Abramowitz & Stegun 26.2.17, published). */
function upperTail(z: number): number {
  const t = 1 / (1 + 0.2316419 * z)
  const series = t * (0.31938153 + t * (-0.356563782 + t * (1.781477937 + t * (-1.821255978 + t * 1.330274429))))
  return 0.3989422804 * Math.exp(-0.5 * z * z) * series
}
