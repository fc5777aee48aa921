import { ROOM_TEMPERATURE_C } from '@/lib/acoustics/air'
import { nearestNote, STANDARD_REFERENCE_HZ } from '@/lib/acoustics/note'
import { openAirModeHz } from '@/lib/acoustics/open-air-head'
import { METRE_PER_INCH } from '@/lib/acoustics/require-quantity'
import { defaultTensionRange } from '@/lib/acoustics/tension-range'
import { filmOf } from './drum-estimate'
import type { TradeDrum, TuningStage } from './drum-estimate'

/** Pitches on the A4 = 69 count, with fractions: slack and choked edge, and the middle third between `middleLow` and `middleHigh`. */
export type PlayableRange = { low: number; middleLow: number; middleHigh: number; high: number }

/**
 * The notes a drum can sound on its batter head, in the open air, by its role's default range (from memory): even in cents, the
 * middle third the safe aim (common practice), as in `rangePosition`.
 * @throws AcousticsError whatever the head refuses
 */
export function playableRange(
  drum: Pick<TradeDrum, 'role' | 'diameterIn' | 'batter'>,
  stage: TuningStage = {},
): PlayableRange {
  const { slackNPerM, chokedNPerM } = defaultTensionRange(drum.role)
  const head = {
    ...filmOf(drum.batter),
    ...{ diameterM: drum.diameterIn * METRE_PER_INCH, temperatureC: stage.temperatureC ?? ROOM_TEMPERATURE_C },
  }
  const pitchAt = (fraction: number) => {
    const tensionNPerM = slackNPerM * (chokedNPerM / slackNPerM) ** fraction
    const { semitone, cents } = nearestNote(
      openAirModeHz(0, tensionNPerM, head),
      stage.referenceHz ?? STANDARD_REFERENCE_HZ,
    )
    return semitone + cents / 100
  }
  return { low: pitchAt(0), middleLow: pitchAt(1 / 3), middleHigh: pitchAt(2 / 3), high: pitchAt(1) }
}
