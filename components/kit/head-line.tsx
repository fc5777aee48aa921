import { headWords } from '@/lib/advance/kit-words'
import type { Head } from '@/lib/contracts/kit'
import type { DrumEstimate } from '@/lib/tuning/drum-estimate'
import { hertz } from '@/lib/acoustics/figure-words'

export interface HeadLineProps {
  side: 'batter' | 'resonant'
  head: Head | null
  /** The drum's; null without a note. */
  estimate: DrumEstimate | null
}

/** One head of a drum in a list: what it is, its tap pitch with its interval, and the gauge as noted. */
export function HeadLine({ side, head, estimate }: HeadLineProps) {
  return (
    <div className="grid grid-cols-[4.5rem_minmax(0,1fr)] items-baseline gap-x-3 sm:grid-cols-[4.5rem_minmax(0,1fr)_11rem_4.5rem]">
      <dt className="text-sm text-soft">{side}</dt>
      <dd>{head ? headWords(head) : 'no head'}</dd>
      {head && (
        <>
          <dd className="max-sm:col-start-2">
            <TapWords side={side} estimate={estimate} />
          </dd>
          <dd className="max-sm:col-start-2 sm:text-right">
            <span className="text-sm text-soft">gauge </span>
            <span className="figures">{head.gauge ?? '–'}</span>
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
      <span className="figures text-sm text-soft">
        {' '}
        {Math.round(low)}–{Math.round(high)}
      </span>
    </span>
  )
}
