import { Table, TableCell, TableHead, TableRow } from '@/components/ui/table'
import { readingsOfHead } from '@/lib/client/bench/head-view'
import type { Bench, BenchDrum, BenchHead, BenchReading } from '@/lib/contracts/bench'
import { inOrderTaken } from '@/lib/tuning/readings'
import { clockWords, readingWords } from './bench-words'

/** Every reading of a head as it was logged, the newest first; a struck one stays and says so. */
export function ReadingLog({ bench, drum, head }: { bench: Bench; drum: BenchDrum; head: BenchHead }) {
  const readings = inOrderTaken(readingsOfHead(bench.readings, drum, head.side)).reverse()
  if (readings.length === 0) return null
  const struck = new Set(readings.map(({ strikes }) => strikes))
  return (
    <details className="mt-2">
      <summary className="min-h-control py-1 underline underline-offset-4">
        {head.side}: {readings.length === 1 ? '1 reading' : `${readings.length} readings`}
      </summary>
      <Table
        caption={`Readings of ${drum.name}, ${head.side}, newest first`}
        captionHidden
        className="max-h-72 overflow-y-auto"
        head={
          <>
            <TableHead numeric>Lug</TableHead>
            <TableHead numeric>Pass</TableHead>
            <TableHead numeric>Reading</TableHead>
            <TableHead>How</TableHead>
            <TableHead>Who, on which device</TableHead>
            <TableHead>When</TableHead>
          </>
        }
      >
        {readings.map(({ logged }) => (
          <TableRow key={logged.id} className={struck.has(logged.id) ? 'text-soft' : undefined}>
            <TableCell numeric>{logged.lug}</TableCell>
            <TableCell numeric>{logged.pass}</TableCell>
            <TableCell numeric>
              {struck.has(logged.id) ? (
                <>
                  <s>{readingWords(logged)}</s> corrected
                </>
              ) : (
                readingWords(logged)
              )}
            </TableCell>
            <TableCell>{howWords(logged)}</TableCell>
            <TableCell>
              {logged.byName}, <span className="figures">{logged.deviceId.slice(0, 4)}</span>
              {logged.via === 'link' ? ' by the link' : ' signed in'}
            </TableCell>
            <TableCell>{clockWords(logged.deviceAt, bench.show.zone)}</TableCell>
          </TableRow>
        ))}
      </Table>
    </details>
  )
}

function howWords(reading: BenchReading): string {
  if (reading.method === 'gauge') return reading.gauge === '' ? 'gauge' : `gauge: ${reading.gauge}`
  return [
    reading.method === 'tap-heard' ? 'tap, heard' : 'tap, typed',
    ...(reading.otherHead === 'open' ? ['other head open'] : []),
    ...(reading.onStand ? ['on its stand'] : []),
    ...(reading.temperatureC === null ? [] : [`${reading.temperatureC} °C`]),
  ].join(', ')
}
