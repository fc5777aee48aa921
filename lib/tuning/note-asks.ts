import type { PlanDrum } from './note-plan-model'
import type { TemplateSteps } from './note-template'

/** How far a tom should lie under the reference tom, semitones, negative above it: the template's figure and the whole one. */
export type AskedOffset = { exact: number; whole: number }

/**
 * What a template asks of each tom, by drum id, counted from the reference tom at `referencePitch`; nothing under a free template.
 * Offsets are brought to whole semitones once, from the reference, so that what rounding leaves never adds up along the toms.
 * @param toms from the smallest to the largest
 */
export function askedOffsets(
  toms: readonly PlanDrum[],
  steps: TemplateSteps,
  reference: PlanDrum,
  referencePitch: number,
): Map<string, AskedOffset> {
  const exact = exactOffsets(toms, steps, reference, referencePitch)
  return new Map(exact?.map((offset, i) => [toms[i]?.id ?? '', { exact: offset, whole: wholeSemitones(offset) }]))
}

function exactOffsets(
  toms: readonly PlanDrum[],
  steps: TemplateSteps,
  reference: PlanDrum,
  referencePitch: number,
): number[] | null {
  switch (steps.kind) {
    case 'free':
      return null
    case 'per-inch':
      return toms.map(({ diameterIn }) => (diameterIn - reference.diameterIn) * steps.semitonesPerInch)
    case 'per-pair': {
      const fromSmallest = toms.map(() => 0)
      for (let i = 1; i < toms.length; i++) {
        fromSmallest[i] = (fromSmallest[i - 1] ?? 0) + (steps.semitones[i - 1] ?? steps.semitones.at(-1) ?? 0)
      }
      const atReference = fromSmallest[toms.indexOf(reference)] ?? 0
      return fromSmallest.map((offset) => offset - atReference)
    }
    case 'equal-feel': {
      const tensionNPerM = tensionAtPitch(reference, referencePitch)
      return toms.map((tom) => pitchAtTension(reference, tensionNPerM) - pitchAtTension(tom, tensionNPerM))
    }
  }
}

/** A half goes to the smaller interval: 2.5 is 2, up as down. */
function wholeSemitones(semitones: number): number {
  const size = Math.ceil(Math.abs(semitones) - 0.5 - 1e-9)
  return size <= 0 ? 0 : Math.sign(semitones) * size
}

type RangedDrum = Pick<PlanDrum, 'range' | 'tension'>

function knots({ range: { low, middleLow, middleHigh, high }, tension: { slackNPerM, chokedNPerM } }: RangedDrum) {
  const [slack, choked] = [Math.log(slackNPerM), Math.log(chokedNPerM)]
  const at = (fraction: number) => slack + (choked - slack) * fraction
  return { pitches: [low, middleLow, middleHigh, high], logTensions: [at(0), at(1 / 3), at(2 / 3), at(1)] }
}

/** Pitch on the A4 = 69 count of a drum's batter at a film tension in N/m: straight in log tension between the pitches of its range, and on past its edges. */
export function pitchAtTension(drum: RangedDrum, tensionNPerM: number): number {
  const { pitches, logTensions } = knots(drum)
  return interpolate(logTensions, pitches, Math.log(tensionNPerM))
}

/** Film tension in N/m at a pitch: the inverse of `pitchAtTension`. */
export function tensionAtPitch(drum: RangedDrum, pitch: number): number {
  const { pitches, logTensions } = knots(drum)
  return Math.exp(interpolate(pitches, logTensions, pitch))
}

function interpolate(xs: readonly number[], ys: readonly number[], x: number): number {
  let i = 1
  while (i < xs.length - 1 && x > (xs[i] ?? 0)) i++
  const [x0 = 0, x1 = 0, y0 = 0, y1 = 0] = [xs[i - 1], xs[i], ys[i - 1], ys[i]]
  return y0 + ((y1 - y0) * (x - x0)) / (x1 - x0)
}
