import { Button } from '@/components/ui/button'
import { Checkbox } from '@/components/ui/checkbox'
import type { DrumEntry } from '@/lib/contracts/kit'
import { noteText } from '@/lib/contracts/kit-form'
import { drumEstimate } from '@/lib/tuning/drum-estimate'
import type { TuningStage } from '@/lib/tuning/drum-estimate'
import { headRelationWords } from '@/lib/tuning/interval-name'
import type { PlannedDrum as Judgement } from '@/lib/tuning/note-plan'
import { hertz } from './figure-words'
import { HeadFigures } from './head-figures'
import type { KitReader } from './kit-reader'
import { warningWords } from './plan-words'
import { WhyTheseNumbers } from './why-these-numbers'

export interface PlannedDrumProps {
  /** As the plan has it. */
  drum: DrumEntry
  /** The note that the kit has, when the plan has another. */
  was: string | null
  judgement: Judgement | undefined
  reader: KitReader
  stage: TuningStage
  nameOf: (id: string) => string
  /** Null for readers. */
  edit: { move: (semitones: number) => void; lock: (locked: boolean) => void } | null
}

/** One drum of the plan: its note, what both heads need for it, and what to watch. */
export function PlannedDrum({ drum, was, judgement, reader, stage, nameOf, edit }: PlannedDrumProps) {
  const { spec } = drum
  const estimate = drumEstimate(spec, { ...stage, referenceHz: reader.referenceHz })
  const warnings = judgement?.warnings.map((warning) =>
    warningWords(warning, judgement.rangePosition.fraction > 0.5, nameOf),
  )
  const serious = judgement?.warnings.some(({ kind }) => kind !== 'off-middle')
  return (
    <li className="border-b border-line py-3">
      <div className="grid items-start gap-x-6 gap-y-2 lg:grid-cols-[minmax(14rem,1fr)_minmax(15rem,1fr)_minmax(15rem,1fr)]">
        <div>
          <h3 className="text-xl">{drum.name}</h3>
          {spec.note && estimate ? (
            <p className="flex flex-wrap items-baseline gap-x-3">
              <span className="figures text-3xl leading-tight font-bold">{hertz(estimate.noteHz)} Hz</span>
              <span className="figures text-lg">{noteText(spec.note, reader.locale)}</span>
              {was && <span className="text-sm text-plum">in the kit: {was}</span>}
            </p>
          ) : (
            <p className="text-soft">No note yet. Plan the notes above, or type one in the kit.</p>
          )}
          {warnings && warnings.length > 0 && (
            <ul
              className={`mt-1 border-l-4 pl-2 text-sm ${serious ? 'border-spike text-spike-text' : 'border-brass text-brass'}`}
            >
              {warnings.map((words) => (
                <li key={words}>{words}</li>
              ))}
            </ul>
          )}
          {edit && spec.note && (
            <div className="mt-2 flex flex-wrap items-center gap-2">
              <Button onClick={() => edit.move(-1)}>
                Semitone down<span className="sr-only">, {drum.name}</span>
              </Button>
              <Button onClick={() => edit.move(1)}>
                Semitone up<span className="sr-only">, {drum.name}</span>
              </Button>
              <Checkbox
                checked={spec.noteLocked}
                onChange={(event) => edit.lock(event.target.checked)}
                label={
                  <>
                    Lock<span className="sr-only"> the note of {drum.name}</span>
                  </>
                }
              />
            </div>
          )}
        </div>
        {estimate && <HeadFigures side="batter" head={spec.batter} figures={estimate.batter} ported={false} />}
        {estimate?.resonant && spec.resonant && (
          <div>
            <HeadFigures side="resonant" head={spec.resonant} figures={estimate.resonant} ported={spec.ported} />
            <p className="text-sm text-soft">{headRelationWords(spec.headRelationCents)}</p>
          </div>
        )}
      </div>
      {estimate && <WhyTheseNumbers name={drum.name} estimate={estimate} ported={spec.ported} />}
    </li>
  )
}
