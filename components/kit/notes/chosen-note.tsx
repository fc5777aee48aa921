import { Button } from '@/components/ui/button'
import { Checkbox } from '@/components/ui/checkbox'
import { noteName } from '@/lib/acoustics/note-name'
import type { Note } from '@/lib/acoustics/note'
import type { DrumEntry } from '@/lib/contracts/kit'
import { noteText, noteValue } from '@/lib/contracts/kit-form'
import type { MoveCost } from '@/lib/tuning/note-plan-model'
import type { KitReader } from '../kit-reader'
import { costWords } from './cost-words'
import { TypedNote } from './typed-note'
import { spokenNote } from './spoken-note'
import { movedBy } from './note-draft'
import type { Standing } from './standing'

export interface ChosenNoteProps {
  drum: DrumEntry
  standings: readonly Standing[]
  /** Why its steps to the neighbours are as they are, a sentence each. */
  reasons: readonly string[]
  /** The whole plan's cost in words. */
  planCost: string
  /** The choice that costs the plan least, when it is another. */
  best: Pick<MoveCost, 'note' | 'cost'> | null
  reader: KitReader
  onSet: (note: Note | null) => void
  onLock: (locked: boolean) => void
}

/** The note that was last taken up: typed, moved by a step, locked, and what it costs. */
export function ChosenNote({ drum, standings, reasons, planCost, best, reader, onSet, onLock }: ChosenNoteProps) {
  const { note, noteLocked } = drum.spec
  const nameAt = (semitone: number) => noteName(semitone, reader.locale)
  const [down, up] = note ? [movedBy(note, -1), movedBy(note, 1)] : [null, null]
  return (
    <section aria-label={`The note of ${drum.name}`} className="border-l-4 border-spike bg-sheet px-3 py-3">
      <div className="flex flex-wrap items-end gap-x-3 gap-y-2">
        <div className="max-sm:basis-full">
          <h2 className="text-xl">{drum.name}</h2>
          <p className="figures text-sm">{note ? spokenNote(note, reader) : 'no note yet'}</p>
        </div>
        <TypedNote
          key={drum.id}
          value={note ? noteText(note, reader.locale) : ''}
          onCommit={(text) => {
            const read = noteValue(text, reader)
            if ('problem' in read) return read.problem
            if (read.value && (read.value.semitone < 12 || read.value.semitone > 96))
              return `from ${nameAt(12)} to ${nameAt(96)}`
            onSet(read.value)
            return null
          }}
        />
        {down && up && (
          <div className="flex flex-wrap gap-2">
            <Button onClick={() => onSet(down)}>Down to {noteText(down, reader.locale)}</Button>
            <Button onClick={() => onSet(up)}>Up to {noteText(up, reader.locale)}</Button>
          </div>
        )}
        <Checkbox
          checked={noteLocked}
          disabled={!note}
          onChange={(event) => onLock(event.target.checked)}
          label={
            <>
              Lock<span className="sr-only"> the note of {drum.name}</span>
            </>
          }
        />
      </div>
      {standings.length > 0 && (
        <p className="mt-2 text-sm">
          {drum.name}: {standings.map(({ words }) => words).join('; ')}.
        </p>
      )}
      {reasons.map((sentence) => (
        <p key={sentence} className="text-sm">
          {sentence}
        </p>
      ))}
      {note && (
        <p className="text-sm text-soft">
          The plan so costs {planCost}.{' '}
          {best ? (
            <>
              It would cost least, {costWords(best.cost)}, with {drum.name} at {noteText(best.note, reader.locale)}.
            </>
          ) : (
            'No other note of this drum costs less.'
          )}{' '}
          An interval one semitone off costs 1.
        </p>
      )}
    </section>
  )
}
