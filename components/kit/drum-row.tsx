import type { ReactNode } from 'react'
import { Hoop } from '@/components/signature/hoop'
import { drumSizeWords } from '@/lib/advance/kit-words'
import type { DrumEntry } from '@/lib/contracts/kit'
import { supplyWords } from '@/lib/contracts/kit'
import { noteText } from '@/lib/contracts/kit-form'
import { drumEstimate } from '@/lib/tuning/drum-estimate'
import { headRelationWords } from '@/lib/tuning/interval-name'
import { insteadWords } from './entry-particulars'
import { hertz } from '@/lib/acoustics/figure-words'
import { HeadLine } from './head-line'
import type { KitReader } from './kit-reader'

const pxPerInch = 4.6

/** A drum in the list of the kit: drawn to scale, described, with its note and what each head needs. */
export function DrumRow({ drum, reader, actions }: { drum: DrumEntry; reader: KitReader; actions: ReactNode }) {
  const { spec } = drum
  const estimate = drumEstimate(spec, reader)
  const asides = [
    spec.shell,
    spec.muffling && `muffling: ${spec.muffling}`,
    spec.insteadOf && `may come instead: ${insteadWords(spec.insteadOf)}`,
    drum.remark,
  ].filter(Boolean)
  return (
    <div className="grid grid-cols-[7.5rem_minmax(0,1fr)] items-center gap-x-4 gap-y-3 py-3 xl:grid-cols-[7.5rem_15rem_8.5rem_minmax(0,1fr)_auto]">
      <div className="flex justify-center">
        <Hoop
          {...{ role: spec.role, diameterIn: spec.diameterIn, depthIn: spec.depthIn, lugs: spec.lugs, name: drum.name }}
          {...{ view: 'above', pxPerInch, note: spec.note && noteText(spec.note, reader.locale) }}
        />
      </div>
      <div className="min-w-0">
        <h3 className="text-xl">{drum.name}</h3>
        <p className="text-sm">{drumSizeWords(spec, reader.units)}</p>
        <p className="text-sm text-soft">
          {spec.lugs} lugs a head, {supplyWords[drum.supply]}
        </p>
        {asides.length > 0 && <p className="text-sm text-soft">{asides.join('; ')}</p>}
      </div>
      <div className="max-xl:row-start-2 max-xl:pl-2">
        {spec.note && estimate ? (
          <>
            <p className="figures text-2xl leading-tight font-bold whitespace-nowrap">{hertz(estimate.noteHz)} Hz</p>
            <p className="figures">
              {noteText(spec.note, reader.locale)}
              {spec.noteLocked && <span className="font-text text-sm text-soft"> locked</span>}
            </p>
          </>
        ) : (
          <p className="text-soft">No note yet</p>
        )}
      </div>
      <div className="max-xl:col-span-2 max-xl:row-start-3">
        <dl className="flex flex-col gap-1">
          <HeadLine side="batter" drum={drum} estimate={estimate} />
          <HeadLine side="resonant" drum={drum} estimate={estimate} />
        </dl>
        {spec.resonant && !spec.ported && (
          <p className="mt-0.5 text-sm text-soft">{headRelationWords(spec.headRelationCents)}</p>
        )}
      </div>
      <div className="max-xl:row-start-2 max-xl:justify-self-end">{actions}</div>
    </div>
  )
}
