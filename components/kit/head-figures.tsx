import type { Head } from '@/lib/contracts/kit'
import type { SideEstimate } from '@/lib/tuning/drum-estimate'
import { SHELL_TENSION_HIGH, SHELL_TENSION_LOW } from '@/lib/acoustics/head-estimate'
import { hertz, kilonewtons } from './figure-words'
import { cautionWords } from './plan-words'

export interface HeadFiguresProps {
  side: 'batter' | 'resonant'
  head: Head
  figures: SideEstimate
  ported: boolean
}

/** What one head needs for its note: tap, film tension, pull on each rod, and the gauge as noted. */
export function HeadFigures({ side, head, figures, ported }: HeadFiguresProps) {
  const { estimate } = figures
  return (
    <div className="min-w-0">
      <h4 className="text-sm font-bold">
        {side === 'batter' ? 'Batter' : 'Resonant'}{' '}
        <span className="figures font-normal">{hertz(figures.noteHz)} Hz</span>
      </h4>
      {ported ? (
        <p className="text-sm text-soft">Ported: a head with a hole has no figure here.</p>
      ) : !estimate ? (
        <p className="text-sm font-bold text-spike-text">No drum film can sound this note at this size.</p>
      ) : (
        <dl className="grid grid-cols-[auto_1fr] gap-x-3">
          <Row
            term="tap"
            value={`${hertz(estimate.tapHz)} Hz`}
            bounds={`${Math.round(estimate.interval.tapLowHz)}–${Math.round(estimate.interval.tapHighHz)}`}
          />
          <Row
            term="film"
            value={`${kilonewtons(estimate.tensionNPerM)} kN/m`}
            bounds={`${kilonewtons(estimate.interval.tensionLowNPerM)}–${kilonewtons(estimate.interval.tensionHighNPerM)}`}
          />
          <Row
            term="each rod"
            value={`${Math.round(estimate.rodPullN)} N`}
            bounds={`${Math.round(estimate.rodPullN * SHELL_TENSION_LOW)}–${Math.round(estimate.rodPullN * SHELL_TENSION_HIGH)}`}
          />
          <Row term="gauge" value={head.gauge === null ? 'not noted' : String(head.gauge)} bounds={null} />
        </dl>
      )}
      {!ported &&
        estimate?.cautions.map((caution) => (
          <p key={caution} className="mt-1 border-l-4 border-spike pl-2 text-sm text-spike-text">
            {cautionWords[caution]}
          </p>
        ))}
    </div>
  )
}

function Row({ term, value, bounds }: { term: string; value: string; bounds: string | null }) {
  return (
    <>
      <dt className="text-sm text-soft">{term}</dt>
      <dd className="figures text-right text-[0.9375rem]">
        <span className="font-bold">{value}</span>
        {bounds && <span className="ml-2 text-sm text-soft">{bounds}</span>}
      </dd>
    </>
  )
}
