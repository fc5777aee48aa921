import type { Entry } from '@/lib/contracts/kit'
import { drumRoleWords } from '@/lib/contracts/kit'
import { drumFormOf, drumFormSchema, pieceFormOf, pieceFormSchema } from '@/lib/contracts/kit-form'
import type { DrumForm, PieceForm } from '@/lib/contracts/kit-form'
import { DrumFields } from './drum-fields'
import { EntryForm } from './entry-form'
import type { EntryDraft, EntryTarget } from './entry-target'
import type { KitReader } from './kit-reader'
import { PieceFields } from './piece-fields'
import { UsualName } from './usual-name'

export interface EntryEditorProps {
  rigId: string
  target: EntryTarget
  typed: EntryDraft['typed'] | null
  reader: KitReader
  onSaved: (entry: Entry) => void
  onLeave: () => void
  onAbandon: (draft: EntryDraft) => void
}

/** The form that fits the entry's kind. */
export function EntryEditor({ target, typed, reader, onAbandon, ...rest }: EntryEditorProps) {
  const { start } = target
  const shared = { ...rest, target, reader, title: titleOf(target) }
  if (start.kind === 'drum') {
    return (
      <EntryForm<DrumForm>
        {...shared}
        schema={drumFormSchema(reader)}
        formOf={(entry) => drumFormOf(entry.kind === 'drum' ? entry : start, reader.locale)}
        typed={typed?.kind === 'drum' ? typed : null}
        onAbandon={(form) => onAbandon({ target, typed: form })}
      >
        {target.do === 'add' && <UsualName />}
        <DrumFields reader={reader} />
      </EntryForm>
    )
  }
  return (
    <EntryForm<PieceForm>
      {...shared}
      schema={pieceFormSchema()}
      formOf={(entry) => pieceFormOf(entry.kind === 'drum' ? start : entry)}
      typed={typed?.kind === 'drum' ? null : typed}
      onAbandon={(form) => onAbandon({ target, typed: form })}
    >
      <PieceFields kind={start.kind} />
    </EntryForm>
  )
}

const newTitles = { cymbal: 'A new cymbal', hardware: 'New hardware', microphone: 'A new microphone' }

function titleOf({ do: doing, start }: EntryTarget): string {
  if (doing === 'change') return start.name
  return start.kind === 'drum' ? `A new ${drumRoleWords[start.spec.role]}` : newTitles[start.kind]
}
