'use client'

import { LocalTime } from '@/components/desk/local-time'
import { Button } from '@/components/ui/button'
import { Notice } from '@/components/ui/notice'
import { Table, TableCell, TableHead, TableRow } from '@/components/ui/table'
import { showToast } from '@/components/ui/toast'
import { headWords, inchWords } from '@/lib/advance/kit-words'
import { useStrikeGaugePair } from '@/lib/client/gauges'
import type { GaugePairRow } from '@/lib/contracts/gauge'
import type { CalibratedPair } from '@/lib/tuning/gauge-calibration'
import { tensionOfTapNPerM } from '@/lib/tuning/gauge-tension'

/** A pair as it stands in the table, with what the calibration makes of it; null while there is none. */
export interface ListedPair {
  readonly row: GaugePairRow
  readonly fitted: CalibratedPair | null
  /** Named by the calibration as one that contradicts another. */
  readonly atFault: boolean
}

export interface PairTableProps {
  partyId: string
  pairs: readonly ListedPair[]
  mayEdit: boolean
}

/** Every pair, newest first, each with how far it lies off the curve. */
export function PairTable({ partyId, pairs, mayEdit }: PairTableProps) {
  const mark = useStrikeGaugePair(partyId)
  const restore = (row: GaugePairRow) => mark.mutate({ pairId: row.id, struck: false })
  const strike = (row: GaugePairRow) =>
    mark.mutate(
      { pairId: row.id, struck: true },
      {
        onSuccess: () =>
          showToast(`The pair at ${row.reading} is struck.`, {
            label: 'Let it count again',
            run: () => restore(row),
          }),
      },
    )
  return (
    <>
      {mark.error && (
        <Notice kind="error" className="mt-3">
          {mark.error.message}
        </Notice>
      )}
      <Table
        caption="Pairs, newest first"
        captionHidden
        className="relative mt-3"
        head={
          <>
            <TableHead numeric>Reading</TableHead>
            <TableHead numeric>Tap, Hz</TableHead>
            <TableHead>Head</TableHead>
            <TableHead numeric className="max-sm:hidden">
              Film, kN/m
            </TableHead>
            <TableHead numeric>Off the curve</TableHead>
            {mayEdit && <TableHead>Change</TableHead>}
            <TableHead>By</TableHead>
          </>
        }
      >
        {pairs.map(({ row, fitted, atFault }) => (
          <TableRow key={row.id} className={row.struck ? 'text-soft' : ''}>
            <TableCell numeric className="font-bold">
              {row.struck ? <s>{row.reading}</s> : row.reading}
            </TableCell>
            <TableCell numeric>{row.tapHz}</TableCell>
            <TableCell className="min-w-28 sm:min-w-52">
              {inchWords(row.diameterIn)}×{inchWords(row.depthIn)} in,{' '}
              {headWords({ plyMils: row.plyMils, film: row.film, damping: 'none' })}
              {row.remark && <span className="block text-sm text-soft">{row.remark}</span>}
            </TableCell>
            <TableCell numeric className="max-sm:hidden">
              {(tensionOfTapNPerM(row, row.tapHz, row.temperatureC) / 1000).toFixed(2)}
            </TableCell>
            <TableCell numeric>
              {row.struck ? <span className="font-text">struck</span> : fitted && offWords(fitted.off)}
              {fitted?.doubtful && <Fault words="doubtful, left out" />}
              {atFault && <Fault words="contradicts" />}
            </TableCell>
            {mayEdit && (
              <TableCell>
                <Button
                  kind="quiet"
                  className="-ml-4"
                  busy={mark.isPending && mark.variables.pairId === row.id ? 'Saving' : null}
                  onClick={() => (row.struck ? restore(row) : strike(row))}
                >
                  {row.struck ? 'Count again' : 'Strike'}
                  <span className="sr-only">
                    : {row.reading} at {row.tapHz} Hz
                  </span>
                </Button>
              </TableCell>
            )}
            <TableCell className="min-w-40 text-sm">
              {row.byName}
              <span className="block text-soft">
                <LocalTime iso={row.at} />
              </span>
            </TableCell>
          </TableRow>
        ))}
      </Table>
    </>
  )
}

function Fault({ words }: { words: string }) {
  return <span className="block border-r-4 border-spike pr-1 font-text text-sm font-bold text-spike-text">{words}</span>
}

function offWords(off: number): string {
  const shown = Math.abs(off).toFixed(1)
  if (shown === '0.0') return 'on it'
  return `${off < 0 ? '−' : '+'}${shown}`
}
