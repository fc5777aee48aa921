import { headWords } from '@/lib/advance/kit-words'
import type { Head } from '@/lib/contracts/kit'
import type { SideEstimate } from '@/lib/tuning/drum-estimate'
import { hertz } from './figure-words'

export interface HeadLineProps {
  side: 'batter' | 'resonant'
  head: Head | null
  /** Null without a note. */
  figures: SideEstimate | null
  /** A hole in this head: the figures of a whole one do not hold for it. */
  ported: boolean
}

/** One head of a drum in a list: what it is, its tap pitch with its interval, and the gauge as noted. */
export function HeadLine({ side, head, figures, ported }: HeadLineProps) {
  return (
    <div className="grid grid-cols-[4.5rem_minmax(0,1fr)] items-baseline gap-x-3 sm:grid-cols-[4.5rem_minmax(0,1fr)_11rem_4.5rem]">
      <dt className="text-sm text-soft">{side}</dt>
      <dd>{head ? headWords(head) : 'no head'}</dd>
      {head && (
        <>
          <dd className="max-sm:col-start-2">
            <TapWords figures={figures} ported={ported} />
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
export function TapWords({ figures, ported }: { figures: SideEstimate | null; ported: boolean }) {
  if (ported) return <span className="text-sm text-soft">ported, no figure</span>
  if (!figures) return null
  if (!figures.estimate) return <span className="text-sm font-bold text-spike-text">cannot sound this note</span>
  const { tapHz, interval } = figures.estimate
  return (
    <span>
      <span className="text-sm text-soft">tap </span>
      <span className="figures font-bold">{hertz(tapHz)} Hz</span>
      <span className="figures text-sm text-soft">
        {' '}
        {Math.round(interval.tapLowHz)}–{Math.round(interval.tapHighHz)}
      </span>
    </span>
  )
}
