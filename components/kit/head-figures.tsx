import type { DrumTuning, HeadTuning } from '@/lib/acoustics/drum-tuning'
import type { Estimated } from '@/lib/acoustics/estimated'
import type { Head } from '@/lib/contracts/kit'
import { hertz, kilonewtons } from '@/lib/acoustics/figure-words'
import { cautionWords } from './plan-words'

export interface HeadFiguresProps {
  side: 'batter' | 'resonant'
  head: Head
  /** The drum's; null when it cannot sound its note. */
  tuning: DrumTuning | null
}

/** What one head of a drum is brought to: tap, film tension, pull on each rod, key torque, and the gauge as noted. */
export function HeadFigures({ side, head, tuning }: HeadFiguresProps) {
  const figures = tuning && tuning[side]
  return (
    <div className="min-w-0">
      <h4 className="text-sm font-bold">{side === 'batter' ? 'Batter' : 'Resonant'}</h4>
      {!tuning ? (
        <p className="text-sm font-bold text-spike-text">No drum film can sound this note at this size.</p>
      ) : !figures ? (
        <p className="text-sm text-soft">Ported: a head with a hole has no figure here.</p>
      ) : (
        <Figures figures={figures} gauge={head.gauge} />
      )}
    </div>
  )
}

function Figures({ figures, gauge }: { figures: HeadTuning; gauge: number | null }) {
  const { tapHz, tensionNPerM, rodPullN, torqueNm, cautions } = figures
  return (
    <>
      <dl className="grid grid-cols-[auto_1fr] gap-x-3">
        <Row term="tap" figure={tapHz} unit="Hz" words={hertz} bounds={whole} />
        <Row term="film" figure={tensionNPerM} unit="kN/m" words={kilonewtons} bounds={kilonewtons} />
        <Row term="each rod" figure={rodPullN} unit="N" words={whole} bounds={whole} />
        <Row term="key torque" figure={torqueNm} unit="N·m" words={hundredths} bounds={hundredths} />
        <dt className="text-sm text-soft">gauge</dt>
        <dd className="figures text-right text-[0.9375rem] font-bold">{gauge ?? 'not noted'}</dd>
      </dl>
      {cautions.map((caution) => (
        <p key={caution} className="mt-1 border-l-4 border-spike pl-2 text-sm text-spike-text">
          {cautionWords[caution]}
        </p>
      ))}
    </>
  )
}

const whole = (value: number) => String(Math.round(value))
const hundredths = (value: number) => value.toFixed(2)

interface RowProps {
  term: string
  figure: Estimated
  unit: string
  words: (value: number) => string
  bounds: (value: number) => string
}

function Row({ term, figure, unit, words, bounds }: RowProps) {
  return (
    <>
      <dt className="text-sm text-soft">{term}</dt>
      <dd className="figures text-right text-[0.9375rem]">
        <span className="font-bold">{`${words(figure.value)} ${unit}`}</span>
        <span className="ml-2 text-sm text-soft">{`${bounds(figure.low)}–${bounds(figure.high)}`}</span>
      </dd>
    </>
  )
}
