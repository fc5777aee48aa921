import type { HeadTuning } from '@/lib/acoustics/drum-tuning'
import type { Estimated } from '@/lib/acoustics/estimated'
import type { DrumEntry, HeadSide } from '@/lib/contracts/kit'
import { hertz, kilonewtons } from '@/lib/acoustics/figure-words'
import type { DrumEstimate } from '@/lib/tuning/drum-estimate'
import type { HeadGauge } from '@/lib/tuning/gauge-of-head'
import { outsideWords, startingBounds, startingWords } from '@/lib/tuning/gauge-words'
import { cautionWords } from './plan-words'
import { useHeadGauge } from './tours-gauge'

export interface HeadFiguresProps {
  side: HeadSide
  drum: DrumEntry
  estimate: DrumEstimate
}

/** What one head of a drum is brought to: tap, film tension, pull on each rod, key torque, and its gauge foretold and noted. */
export function HeadFigures({ side, drum, estimate }: HeadFiguresProps) {
  const { tuning } = estimate
  const figures = tuning && tuning[side]
  const gauge = useHeadGauge(drum, side, estimate)
  return (
    <div className="min-w-0">
      <h4 className="text-sm font-bold">{side === 'batter' ? 'Batter' : 'Resonant'}</h4>
      {!tuning ? (
        <p className="text-sm font-bold text-spike-text">No drum film can sound this note at this size.</p>
      ) : !figures ? (
        <p className="text-sm text-soft">Ported: a head with a hole has no figure here.</p>
      ) : (
        <Figures figures={figures} gauge={gauge} noted={drum.spec[side]?.gauge ?? null} />
      )}
    </div>
  )
}

interface FiguresProps {
  figures: HeadTuning
  gauge: HeadGauge | null
  noted: number | null
}

function Figures({ figures, gauge, noted }: FiguresProps) {
  const { tapHz, tensionNPerM, rodPullN, torqueNm, cautions } = figures
  const foretold = gauge?.kind === 'foretold' ? gauge : null
  const outside = foretold?.start.outside ?? null
  return (
    <>
      <dl className="grid grid-cols-[auto_1fr] gap-x-3">
        <Row term="tap" figure={tapHz} unit="Hz" words={hertz} bounds={whole} />
        <Row term="film" figure={tensionNPerM} unit="kN/m" words={kilonewtons} bounds={kilonewtons} />
        <Row term="each rod" figure={rodPullN} unit="N" words={whole} bounds={whole} />
        <Row term="key torque" figure={torqueNm} unit="N·m" words={hundredths} bounds={hundredths} />
        {foretold && (
          <Written
            term="gauge"
            words={startingWords(foretold.start, foretold.scale)}
            bounds={startingBounds(foretold.start, foretold.scale)}
          />
        )}
        {(noted !== null || !foretold) && (
          <Written term={foretold ? 'gauge, noted' : 'gauge'} words={noted === null ? 'not noted' : String(noted)} />
        )}
      </dl>
      {cautions.map((caution) => (
        <p key={caution} className="mt-1 border-l-4 border-spike pl-2 text-sm text-spike-text">
          {cautionWords[caution]}
        </p>
      ))}
      {outside && <p className="mt-1 border-l-4 border-brass pl-2 text-sm text-brass">{outsideWords[outside]}</p>}
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
    <Written
      term={term}
      words={`${words(figure.value)} ${unit}`}
      bounds={`${bounds(figure.low)}–${bounds(figure.high)}`}
    />
  )
}

function Written({ term, words, bounds = null }: { term: string; words: string; bounds?: string | null }) {
  return (
    <>
      <dt className="text-sm text-soft">{term}</dt>
      <dd className="figures text-right text-[0.9375rem]">
        <span className="font-bold">{words}</span>
        {bounds && <span className="ml-2 text-sm text-soft">{bounds}</span>}
      </dd>
    </>
  )
}
