import { Table, TableCell, TableHead, TableRow } from '@/components/ui/table'

export interface AskedLine {
  number: number
  lineId: string
  words: string
  details: readonly string[]
  insteadOf: string | null
  /** Who brings it, in words. */
  by: string
}

/** Numbered lines as they are asked. */
export function AskedLines({ caption, lines }: { caption: string; lines: readonly AskedLine[] }) {
  return (
    <Table
      caption={caption}
      captionHidden
      head={
        <>
          <TableHead numeric>No.</TableHead>
          <TableHead>Asked for</TableHead>
          <TableHead>Fine too</TableHead>
          <TableHead>Brought by</TableHead>
        </>
      }
    >
      {lines.map((line) => (
        <TableRow key={line.lineId}>
          <TableCell numeric className="font-bold">
            {line.number}
          </TableCell>
          <TableCell>
            <span className="font-bold">{line.words}</span>
            {line.details.map((detail) => (
              <span key={detail} className="block text-sm text-soft">
                {detail}
              </span>
            ))}
          </TableCell>
          <TableCell>{line.insteadOf ?? 'only by asking'}</TableCell>
          <TableCell>{line.by}</TableCell>
        </TableRow>
      ))}
    </Table>
  )
}
