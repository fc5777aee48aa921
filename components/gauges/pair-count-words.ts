import { FEWEST_PAIRS } from '@/lib/tuning/gauge-calibration'

/** How far a gauge is from a calibration: "12 pairs", "1 of 3 pairs". */
export function pairCountWords(pairs: number): string {
  return pairs < FEWEST_PAIRS ? `${pairs} of ${FEWEST_PAIRS} pairs` : `${pairs} pairs`
}
