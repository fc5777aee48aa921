import type { Note } from '@/lib/acoustics/note'
import { defaultTensionRange } from '@/lib/acoustics/tension-range'
import type { PitchedDrum, TradeDrum, TuningStage } from './drum-estimate'
import type { PlanDrum } from './note-plan-model'
import { playableRange } from './playable-range'

/**
 * A drum of a kit as the note plan takes it, with its range worked out once by the model of both heads (milliseconds); its note goes
 * along when it is locked.
 * @throws AcousticsError whatever the drum is refused for
 */
export function planDrumOf(
  id: string,
  name: string,
  drum: PitchedDrum & Pick<TradeDrum, 'role'> & { readonly note: Readonly<Note> | null; readonly noteLocked: boolean },
  stage: TuningStage = {},
): PlanDrum {
  const { role, diameterIn, batter, note, noteLocked } = drum
  return {
    ...{ id, name, role, diameterIn, range: playableRange(drum, stage) },
    tension: batter.range ?? defaultTensionRange(role),
    ...(noteLocked && note ? { lockedNote: note } : {}),
  }
}
