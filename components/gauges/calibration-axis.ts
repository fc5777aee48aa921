import { GaugeError } from '@/lib/tuning/gauge-error'
import type { GaugeHead } from '@/lib/tuning/gauge-profile'
import { tapOfTensionHz, tensionOfTapNPerM } from '@/lib/tuning/gauge-tension'

export interface Tick {
  /** Where on the axis, 0 to 1. */
  readonly at: number
  readonly words: string
}

/** The stretch of film tension that is drawn, on a logarithmic axis, N/m. */
export interface TensionSpan {
  readonly fromNPerM: number
  readonly toNPerM: number
}

/** Where a tension lies on the axis, 0 to 1; beyond an end it goes on. */
export function tensionPlace({ fromNPerM, toNPerM }: TensionSpan, tensionNPerM: number): number {
  return Math.log(tensionNPerM / fromNPerM) / Math.log(toNPerM / fromNPerM)
}

const kilonewtonSteps = [0.1, 0.2, 0.3, 0.5, 0.7, 1, 1.5, 2, 3, 4, 5, 7, 10, 15]

/** Film tensions to mark, kN/m. */
export function tensionTicks(span: TensionSpan): Tick[] {
  return kilonewtonSteps
    .map((kilonewtons) => ({ at: tensionPlace(span, kilonewtons * 1000), words: String(kilonewtons) }))
    .filter(({ at }) => at >= 0 && at <= 1)
}

const evenSteps = [1, 2, 5, 10, 20, 25, 50, 100, 200]

/** Round numbers between two ends, at most so many. */
export function evenTicks(from: number, to: number, most: number): number[] {
  const step = evenSteps.find((size) => (to - from) / size <= most) ?? to - from
  const first = Math.ceil(from / step) * step
  return Array.from({ length: Math.floor((to - first) / step) + 1 }, (_, i) => first + i * step)
}

/** Taps of one head to mark along the same axis, Hz. */
export function tapTicks(span: TensionSpan, head: GaugeHead): Tick[] {
  try {
    const [from, to] = [tapOfTensionHz(head, span.fromNPerM, null), tapOfTensionHz(head, span.toNPerM, null)]
    return evenTicks(from, to, 6).map((tapHz) => ({
      at: tensionPlace(span, tensionOfTapNPerM(head, tapHz, null)),
      words: String(tapHz),
    }))
  } catch (error) {
    // A size half typed marks nothing.
    if (error instanceof GaugeError) return []
    throw error
  }
}
