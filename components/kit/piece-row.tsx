import type { ReactNode } from 'react'
import { cymbalSizeWords, cymbalTypeWord, typeWords } from '@/lib/advance/kit-words'
import type { Entry, EntryInput } from '@/lib/contracts/kit'
import { supplyWords } from '@/lib/contracts/kit'
import type { KitReader } from './kit-reader'

/** A cymbal, a piece of hardware or a microphone in the list of the kit. */
export function PieceRow({ entry, reader, actions }: { entry: Entry; reader: KitReader; actions: ReactNode }) {
  const words = pieceWords(entry, reader)
  return (
    <div className="grid grid-cols-[minmax(0,1fr)_auto] items-center gap-x-4 py-1.5 lg:grid-cols-[3rem_minmax(10rem,1fr)_minmax(12rem,1.4fr)_8rem_minmax(0,1fr)_auto]">
      <p className="figures max-lg:hidden">
        {entry.count}
        <span aria-hidden> ×</span>
      </p>
      <h3 className="text-lg">
        {entry.count > 1 && <span className="figures text-base font-normal lg:hidden">{entry.count} × </span>}
        {entry.name}
      </h3>
      <p className="max-lg:col-start-1 max-lg:text-sm max-lg:text-soft">
        {words}
        <span className="lg:hidden">
          {words && ', '}
          {supplyWords[entry.supply]}
        </span>
      </p>
      <p className="max-lg:hidden">{supplyWords[entry.supply]}</p>
      {entry.remark ? (
        <p className="min-w-0 text-sm text-soft max-lg:col-start-1">{entry.remark}</p>
      ) : (
        <span className="max-lg:hidden" />
      )}
      <div className="max-lg:col-start-2 max-lg:row-span-2 max-lg:row-start-1">{actions}</div>
    </div>
  )
}

function pieceWords(entry: EntryInput, reader: KitReader): string {
  switch (entry.kind) {
    case 'drum':
      return ''
    case 'cymbal':
      return `${cymbalTypeWord(entry.spec.type)}, ${cymbalSizeWords(entry.spec.diameterIn, reader.units)}`
    case 'hardware':
      return entry.spec.type === 'other' ? '' : typeWords(entry.spec.type)
    case 'microphone': {
      const { type, stand, phantom } = entry.spec
      const held = stand === 'none' ? 'no stand' : stand === 'clip' ? 'on a clip' : `${typeWords(stand)} stand`
      return [typeWords(type), held, phantom ? 'phantom power' : null].filter(Boolean).join(', ')
    }
  }
}
