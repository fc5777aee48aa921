import { headWords } from '@/lib/advance/kit-words'
import type { DrumEntry, HeadSide } from '@/lib/contracts/kit'
import type { DrumEstimate } from '@/lib/tuning/drum-estimate'
import { hertz } from '@/lib/acoustics/figure-words'
import type { HeadGauge } from '@/lib/tuning/gauge-of-head'
import { startingBounds, startingWords } from '@/lib/tuning/gauge-words'
import { useHeadGauge } from './tours-gauge'

export interface HeadLineProps {
  side: HeadSide
  drum: DrumEntry
  /** The drum's; null without a note. */
  estimate: DrumEstimate | null
}

/** One head of a drum in a list: what it is, its tap pitch and its gauge reading, either with its bounds. */
export function HeadLine({ side, drum, estimate }: HeadLineProps) {
  const head = drum.spec[side]
  const gauge = useHeadGauge(drum, side, estimate)
  return (
    <div className="grid grid-cols-[4.5rem_minmax(0,1fr)] items-baseline gap-x-3 sm:grid-cols-[4.5rem_11.5rem_minmax(0,1fr)]">
      <dt className="text-sm text-soft">{side}</dt>
      <dd className="sm:col-span-2">{head ? headWords(head) : 'no head'}</dd>
      {head && (
        <>
          <dd className="col-start-2">
            <TapWords side={side} estimate={estimate} />
          </dd>
          <dd className="max-sm:col-start-2">
            <span className="text-sm text-soft">gauge </span>
            <GaugeWords gauge={gauge} noted={head.gauge} />
          </dd>
        </>
      )}
    </div>
  )
}

/** The tap pitch with the bounds of the estimate, or why there is none. */
function TapWords({ side, estimate }: Pick<HeadLineProps, 'side' | 'estimate'>) {
  if (!estimate) return null
  if (!estimate.tuning) return <span className="text-sm font-bold text-spike-text">cannot sound this note</span>
  const figures = estimate.tuning[side]
  if (!figures) return <span className="text-sm text-soft">ported, no figure</span>
  const { value, low, high } = figures.tapHz
  return (
    <span>
      <span className="text-sm text-soft">tap </span>
      <span className="figures font-bold">{hertz(value)} Hz</span>
      <span className="figures text-sm whitespace-nowrap text-soft">
        {' '}
        {Math.round(low)}–{Math.round(high)}
      </span>
    </span>
  )
}

/** The reading foretold, and the one that was noted where there is one. */
function GaugeWords({ gauge, noted }: { gauge: HeadGauge | null; noted: number | null }) {
  if (gauge?.kind !== 'foretold') {
    return noted === null ? (
      <span>not noted</span>
    ) : (
      <span className="text-sm text-soft">
        noted <span className="figures text-base text-ink">{noted}</span>
      </span>
    )
  }
  const { start, scale } = gauge
  const bounds = startingBounds(start, scale)
  return (
    <>
      <span className="figures font-bold">{startingWords(start, scale)}</span>
      {bounds && <span className="figures text-sm whitespace-nowrap text-soft"> {bounds}</span>}
      {noted !== null && (
        <span className="text-sm text-soft">
          , noted <span className="figures">{noted}</span>
        </span>
      )}
    </>
  )
}
