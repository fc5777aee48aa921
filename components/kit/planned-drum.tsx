import type { DrumEntry } from '@/lib/contracts/kit'
import { noteText } from '@/lib/contracts/kit-form'
import { drumEstimate } from '@/lib/tuning/drum-estimate'
import type { TuningStage } from '@/lib/tuning/drum-estimate'
import { headRelationWords } from '@/lib/tuning/interval-name'
import { DrumFigures } from './drum-figures'
import { hertz } from '@/lib/acoustics/figure-words'
import { HeadFigures } from './head-figures'
import type { KitReader } from './kit-reader'
import type { Standing } from './notes/standing'
import { WhyTheseNumbers } from './why-these-numbers'

export interface PlannedDrumProps {
  /** As the plan has it. */
  drum: DrumEntry
  /** What the kit has, when the plan has another. */
  was: string | null
  /** How its note stands, the gravest first. */
  standings: readonly Standing[]
  reader: KitReader
  stage: TuningStage
}

/** One drum of the plan: its note, what both heads need for it, and what to watch. */
export function PlannedDrum({ drum, was, standings, reader, stage }: PlannedDrumProps) {
  const { spec } = drum
  const estimate = drumEstimate(spec, { ...stage, referenceHz: reader.referenceHz })
  const against = standings.filter(({ tone }) => tone !== 'good')
  const serious = against.some(({ tone }) => tone === 'wrong')
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
          {spec.noteLocked && <p className="text-sm text-soft">locked</p>}
          {estimate?.tuning && <DrumFigures tuning={estimate.tuning} />}
          {against.length > 0 && (
            <ul
              className={`mt-1 border-l-4 pl-2 text-sm ${serious ? 'border-spike text-spike-text' : 'border-brass text-brass'}`}
            >
              {against.map(({ words }) => (
                <li key={words}>{words}</li>
              ))}
            </ul>
          )}
        </div>
        {estimate && <HeadFigures side="batter" drum={drum} estimate={estimate} />}
        {estimate && spec.resonant && (
          <div>
            <HeadFigures side="resonant" drum={drum} estimate={estimate} />
            {!spec.ported && <p className="text-sm text-soft">{headRelationWords(spec.headRelationCents)}</p>}
          </div>
        )}
      </div>
      {estimate?.tuning && <WhyTheseNumbers name={drum.name} input={estimate.input} />}
    </li>
  )
}
