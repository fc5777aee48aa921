import { drumModel } from '@/lib/acoustics/drum-model'
import { nearestNote, noteFrequencyHz, STANDARD_REFERENCE_HZ } from '@/lib/acoustics/note'
import type { Note } from '@/lib/acoustics/note'
import { defaultTensionRange, requireTensionRange } from '@/lib/acoustics/tension-range'
import { modelDrumOf } from './drum-estimate'
import type { PitchedDrum, TradeDrum, TuningStage } from './drum-estimate'

/** Pitches on the A4 = 69 count, with fractions: slack and choked edge, and the middle third between `middleLow` and `middleHigh`. */
export type PlayableRange = { low: number; middleLow: number; middleHigh: number; high: number }

/** A drum's notes and the film tension of its batter head in N/m, the resonant head following by the relation. Pitches as in `PlayableRange`. */
export type DrumPitch = {
  pitchAt: (batterNPerM: number) => number
  /** @throws AcousticsError note outside 10 to 5000 Hz */
  batterNPerM: (note: Readonly<Note>) => number
}

/**
 * Both ways between a drum's note and its batter tension, by the coupled model: work it out once a drum, ask it often (tens of
 * microseconds a call).
 * @throws AcousticsError whatever the drum or the reference is refused for
 */
export function drumPitch(drum: PitchedDrum, stage: TuningStage = {}): DrumPitch {
  const referenceHz = stage.referenceHz ?? STANDARD_REFERENCE_HZ
  const model = drumModel(modelDrumOf(drum, stage))
  return {
    pitchAt: (batterNPerM) => {
      const { semitone, cents } = nearestNote(model.noteHz(batterNPerM), referenceHz)
      return semitone + cents / 100
    },
    batterNPerM: (note) => model.batterNPerM(noteFrequencyHz(note, referenceHz)),
  }
}

/**
 * The notes a drum can sound with its batter head inside the head's own range, or the role's default (from memory): even in cents of
 * the head, the middle third the safe aim (common practice), as in `rangePosition`. The resonant head follows by the relation and
 * may leave its own range before: each head's own cautions say so.
 * @throws AcousticsError whatever the drum is refused for, or its range upside down
 */
export function playableRange(drum: PitchedDrum & Pick<TradeDrum, 'role'>, stage: TuningStage = {}): PlayableRange {
  const { slackNPerM, chokedNPerM } = requireTensionRange(drum.batter.range ?? defaultTensionRange(drum.role))
  const { pitchAt } = drumPitch(drum, stage)
  const at = (fraction: number) => pitchAt(slackNPerM * (chokedNPerM / slackNPerM) ** fraction)
  return { low: at(0), middleLow: at(1 / 3), middleHigh: at(2 / 3), high: at(1) }
}
