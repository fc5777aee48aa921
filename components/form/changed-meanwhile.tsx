import { Button } from '@/components/ui/button'
import { Table, TableCell, TableHead, TableRow } from '@/components/ui/table'

export interface ChangedMeanwhileProps<Fields> {
  mine: Fields
  theirs: Fields
  names: Partial<Record<keyof Fields & string, string>>
  say?: ((field: keyof Fields & string, value: unknown) => string | undefined) | undefined
  onSaveMine: () => void
  onTakeTheirs: () => void
}

function plainWords(value: unknown): string {
  if (value === null || value === undefined || value === '') return 'nothing'
  if (typeof value === 'boolean') return value ? 'yes' : 'no'
  if (Array.isArray(value)) return value.map(plainWords).join(', ') || 'nothing'
  if (typeof value === 'object') return Object.values(value).map(plainWords).join(', ')
  return String(value)
}

/** Somebody else was quicker: both values of every field that differs, and the two ways on. */
export function ChangedMeanwhile<Fields extends object>(props: ChangedMeanwhileProps<Fields>) {
  const { mine, theirs, names, say, onSaveMine, onTakeTheirs } = props
  const fields = (Object.keys(names) as (keyof Fields & string)[]).filter(
    (field) => JSON.stringify(mine[field]) !== JSON.stringify(theirs[field]),
  )
  const words = (field: keyof Fields & string, value: unknown) => say?.(field, value) ?? plainWords(value)
  return (
    <div role="alert" className="border-l-[5px] border-double border-plum bg-sheet px-3 py-2">
      <p>
        <strong className="mr-2 text-plum">Not saved</strong>
        This was changed by somebody else meanwhile. What you typed is kept.
      </p>
      {fields.length === 0 ? (
        <p className="mt-1">What they saved is the same as yours.</p>
      ) : (
        <Table
          caption="Where yours and theirs differ"
          captionHidden
          className="mt-2"
          head={
            <>
              <TableHead>Field</TableHead>
              <TableHead>Yours</TableHead>
              <TableHead>Theirs</TableHead>
            </>
          }
        >
          {fields.map((field) => (
            <TableRow key={field}>
              <TableCell>{names[field]}</TableCell>
              <TableCell className="font-bold">{words(field, mine[field])}</TableCell>
              <TableCell>{words(field, theirs[field])}</TableCell>
            </TableRow>
          ))}
        </Table>
      )}
      <div className="mt-2 flex flex-wrap gap-2">
        <Button onClick={onSaveMine}>Save mine over theirs</Button>
        <Button onClick={onTakeTheirs}>Take theirs</Button>
      </div>
    </div>
  )
}
