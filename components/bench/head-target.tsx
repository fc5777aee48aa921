import type { BenchDrum, BenchHead } from '@/lib/contracts/bench'
import type { ReadingUnit } from '@/lib/tuning/readings'
import { hzWords } from './bench-words'

/** What every lug is brought to, the largest figure on the page, and how it is read. */
export function HeadTarget({ drum, head, readBy }: { drum: BenchDrum; head: BenchHead; readBy: ReadingUnit }) {
  return (
    <section aria-label="Target">
      {readBy === 'gauge' ? <GaugeTarget gauge={head.gauge} /> : <TapTarget head={head} />}
      {head.note && (
        <p className="mt-1">
          The drum’s note <strong>{head.note.name}</strong>
          {head.note.cents !== 0 && ` ${head.note.cents > 0 ? '+' : ''}${head.note.cents} cents`},{' '}
          <span className="figures">{hzWords(head.note.hz)} Hz</span>
          {drum.relationWords && <span className="text-soft">; {drum.relationWords}</span>}
        </p>
      )}
      <p className="mt-1">
        Even: every lug within{' '}
        {readBy === 'gauge' ? (
          '1 on the gauge'
        ) : (
          <>
            {drum.toleranceCents} cents
            {head.tap && <span className="text-soft"> (±{toleranceHz(head.tap.hz, drum.toleranceCents)} Hz)</span>}
          </>
        )}
        {drum.role === 'snare' && head.side === 'resonant' ? '.' : `, warble under ${drum.warbleLimitHz} a second.`}
      </p>
      <p className="mt-2 text-soft">
        {readBy === 'gauge'
          ? 'Gauge readings are relative to that gauge: they even the head, they do not name the note. Set it beside each lug, an inch from the hoop.'
          : 'Drum off its stand, the other head damped, a fingertip on the centre. Tap about an inch from the rod (common practice).'}
      </p>
    </section>
  )
}

function toleranceHz(tapHz: number, cents: number): string {
  return (tapHz * (2 ** (cents / 1200) - 1)).toFixed(1)
}

function TapTarget({ head }: { head: BenchHead }) {
  if (!head.tap) return <p className="text-lg">{head.without}</p>
  return (
    <>
      <p className="text-soft">Every lug to a tap of</p>
      <p className="figures text-6xl leading-none font-bold">
        {hzWords(head.tap.hz)}
        <span className="text-3xl"> Hz</span>
      </p>
      <p className="mt-1 text-soft">
        <span className="figures">
          {hzWords(head.tap.lowHz)} to {hzWords(head.tap.highHz)} Hz
        </span>{' '}
        is where it may truly lie: an estimate of this drum. Even first, then the note by ear.
      </p>
    </>
  )
}

function GaugeTarget({ gauge }: { gauge: BenchHead['gauge'] }) {
  if (gauge === null)
    return <p className="text-lg">No gauge reading was noted for this head: bring every lug to one reading.</p>
  const foretold = gauge.kind === 'foretold'
  return (
    <>
      <p className="text-soft">{foretold ? `${gauge.gauge} should read` : 'The drum tech’s own gauge read'}</p>
      <p className="figures text-6xl leading-none font-bold">
        {gauge.reading}
        <span className="text-3xl"> on the gauge</span>
      </p>
      {foretold && (
        <p className="mt-1 text-soft">
          {gauge.bounds === null ? (
            gauge.outside
          ) : (
            <>
              <span className="figures">{gauge.bounds}</span> is where it may truly lie. Another gauge, or another hand,
              reads otherwise.
            </>
          )}
        </p>
      )}
    </>
  )
}
