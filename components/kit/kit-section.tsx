import type { ReactNode } from 'react'
import type { Entry, EntryKind } from '@/lib/contracts/kit'
import { DrumRow } from './drum-row'
import type { KitReader } from './kit-reader'
import { PieceRow } from './piece-row'

export interface KitSectionProps {
  kind: EntryKind
  entries: readonly Entry[]
  reader: KitReader
  /** The button that adds one; null for readers. */
  add: ReactNode
  /** The open form, in place of the entry that it is for, or at the end for a new one. */
  editing: { id: string; form: ReactNode } | null
  /** What stands beneath one entry, or at the end when that entry is not in the kit: typed text that is not saved. */
  beneath: { id: string; notice: ReactNode } | null
  actionsOf: (entry: Entry, index: number) => ReactNode
}

const titles: Record<EntryKind, string> = {
  drum: 'Drums',
  cymbal: 'Cymbals',
  hardware: 'Hardware',
  microphone: 'Microphones',
}
const nothing: Record<EntryKind, string> = {
  drum: 'No drums yet. Add the first: the rest of the kit is named, placed and tuned by them.',
  cymbal: 'No cymbals yet. Add each size that is asked for.',
  hardware: 'No hardware yet. Add stands, the throne and the pedal, with how many of each.',
  microphone: 'No microphones yet. Add each kind, with how many.',
}

/** One kind of entry of the kit, in its order. */
export function KitSection({ kind, entries, reader, add, editing, beneath, actionsOf }: KitSectionProps) {
  const pieces = entries.reduce((sum, { count }) => sum + count, 0)
  const isNew = editing !== null && entries.every(({ id }) => id !== editing.id)
  const beneathNew = beneath !== null && entries.every(({ id }) => id !== beneath.id)
  return (
    <section aria-labelledby={`kit-${kind}`} className="mt-8">
      <div className="flex flex-wrap items-end justify-between gap-x-4 gap-y-2 border-b-2 border-ink pb-2">
        <h2 id={`kit-${kind}`} className="text-2xl">
          {titles[kind]} <span className="figures text-base font-normal text-soft">{pieces}</span>
        </h2>
        {add}
      </div>
      {entries.length === 0 && !isNew && <p className="py-3 text-soft">{nothing[kind]}</p>}
      <ul>
        {entries.map((entry, index) => (
          <li key={entry.id} className="border-b border-line">
            {editing?.id === entry.id ? (
              <div className="py-3">{editing.form}</div>
            ) : entry.kind === 'drum' ? (
              <DrumRow drum={entry} reader={reader} actions={actionsOf(entry, index)} />
            ) : (
              <PieceRow entry={entry} reader={reader} actions={actionsOf(entry, index)} />
            )}
            {beneath?.id === entry.id && <div className="pb-3">{beneath.notice}</div>}
          </li>
        ))}
      </ul>
      {beneathNew && <div className="pt-3">{beneath.notice}</div>}
      {isNew && (
        <div key={editing.id} className="pt-3">
          {editing.form}
        </div>
      )}
    </section>
  )
}
