import { Button } from '@/components/ui/button'
import { Table, TableCell, TableHead, TableRow } from '@/components/ui/table'
import type { Entry, EntryInput } from '@/lib/contracts/kit'
import { entryDifferences } from './entry-particulars'
import type { KitReader } from './kit-reader'

export interface ClashNoticeProps {
  theirs: Entry
  mine: EntryInput
  reader: KitReader
  busy: boolean
  onKeepMine: () => void
  onTakeTheirs: () => void
}

/** Someone changed the same entry first: both values, and the choice. What was typed stays in the form. */
export function ClashNotice({ theirs, mine, reader, busy, onKeepMine, onTakeTheirs }: ClashNoticeProps) {
  const rows = entryDifferences(theirs, mine, reader)
  return (
    <div role="alert" className="border-l-4 border-plum bg-paper px-3 py-3">
      <p>
        <strong className="mr-2 text-plum">Not saved</strong>
        {theirs.removed
          ? `Someone took ${theirs.name} out of the kit meanwhile. What you typed is kept above.`
          : `Someone changed ${theirs.name} meanwhile. What you typed is kept above.`}
      </p>
      {rows.length > 0 && (
        <Table
          className="mt-2"
          caption="What differs"
          captionHidden
          head={
            <>
              <TableHead>Differs</TableHead>
              <TableHead>Theirs, as it is now</TableHead>
              <TableHead>Yours</TableHead>
            </>
          }
        >
          {rows.map((row) => (
            <TableRow key={row.label}>
              <TableCell className="text-soft">{row.label}</TableCell>
              <TableCell>{row.theirs}</TableCell>
              <TableCell className="font-bold">{row.mine}</TableCell>
            </TableRow>
          ))}
        </Table>
      )}
      <div className="mt-3 flex flex-wrap gap-2">
        <Button onClick={onKeepMine} busy={busy && 'Saving'}>
          {theirs.removed ? 'Put it back with what I typed' : 'Save mine over theirs'}
        </Button>
        <Button kind="quiet" onClick={onTakeTheirs}>
          {theirs.removed ? 'Leave it out' : 'Take theirs'}
        </Button>
      </div>
    </div>
  )
}
