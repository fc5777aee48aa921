import type { Route } from 'next'
import Link from 'next/link'
import { Table, TableCell, TableHead, TableRow } from '@/components/ui/table'
import type { RevisionSummary } from '@/lib/contracts/revision'
import { instantWords } from '@/lib/advance/when-words'

/** The revisions of a rig, newest first. */
export function RevisionTable({ tourId, revisions }: { tourId: string; revisions: readonly RevisionSummary[] }) {
  return (
    <Table
      caption="Revisions, newest first"
      captionHidden
      head={
        <>
          <TableHead>Revision</TableHead>
          <TableHead>Note</TableHead>
          <TableHead numeric>Lines</TableHead>
          <TableHead>Issued by</TableHead>
          <TableHead>Issued</TableHead>
        </>
      }
    >
      {revisions.map((revision) => (
        <TableRow key={revision.id}>
          <TableCell>
            <Link
              className="inline-flex min-h-7 items-center font-bold whitespace-nowrap underline underline-offset-4"
              href={`/tours/${tourId}/revisions/${revision.id}` as Route}
            >
              Revision {revision.number}
            </Link>
          </TableCell>
          <TableCell className="max-w-prose whitespace-pre-line">{revision.note}</TableCell>
          <TableCell numeric>{revision.lines}</TableCell>
          <TableCell>{revision.issuedBy.name}</TableCell>
          <TableCell className="figures text-sm">{instantWords(revision.issuedAt, null)}</TableCell>
        </TableRow>
      ))}
    </Table>
  )
}
