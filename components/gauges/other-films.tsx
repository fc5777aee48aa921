import { Table, TableCell, TableHead, TableRow } from '@/components/ui/table'
import { headWords } from '@/lib/advance/kit-words'
import type { GaugeCalibration } from '@/lib/tuning/gauge-calibration'
import { sameReadingOnFilms } from '@/lib/tuning/gauge-prediction'
import type { GaugeHead } from '@/lib/tuning/gauge-profile'
import { readingWords } from '@/lib/tuning/gauge-words'

const usualFilms = [[10], [12], [7, 7]]

/** One reading on heads of other film: the same pull, yet a heavier head sounds lower. */
export function OtherFilms({
  calibration,
  head,
  reading,
}: {
  calibration: GaugeCalibration
  head: GaugeHead
  reading: number
}) {
  const others = usualFilms
    .filter((plyMils) => plyMils.join() !== head.plyMils.join() || head.coatingGPerM2 > 0)
    .map((plyMils) => ({ plyMils, coatingGPerM2: 0 }))
  const rows = sameReadingOnFilms(calibration, head, [head, ...others], reading)
  return (
    <div className="mt-6 max-w-xl">
      <h3 className="text-lg">
        <span className="figures">{readingWords(reading, calibration.scale)}</span> on other film
      </h3>
      <p className="mb-2 text-soft">
        A gauge feels how hard the film is pulled, not how it sounds. At one reading the heavier head is the lower one:
        two plies sound under one.
      </p>
      <Table
        caption="The same reading on other film, same drum"
        captionHidden
        head={
          <>
            <TableHead>Film</TableHead>
            <TableHead numeric>Tap, Hz</TableHead>
            <TableHead numeric>Against this head</TableHead>
          </>
        }
      >
        {rows.map(({ film, tapHz, lowHz, highHz, cents }, index) => (
          <TableRow key={index}>
            <TableCell>
              {headWords({ plyMils: film.plyMils, film: 'other', damping: 'none' })}
              {film.coatingGPerM2 > 0 && `, coating ${film.coatingGPerM2} g/m²`}
              {index === 0 && <span className="text-soft">, this head</span>}
            </TableCell>
            <TableCell numeric>
              <strong>{tapHz.toFixed(1)}</strong>{' '}
              <span className="block text-sm whitespace-nowrap text-soft sm:inline">
                {Math.round(lowHz)}–{Math.round(highHz)}
              </span>
            </TableCell>
            <TableCell numeric>{index === 0 ? '' : centsWords(cents)}</TableCell>
          </TableRow>
        ))}
      </Table>
    </div>
  )
}

function centsWords(cents: number): string {
  const whole = Math.round(Math.abs(cents))
  if (whole === 0) return 'the same'
  return `${whole} cents ${cents < 0 ? 'lower' : 'higher'}`
}
