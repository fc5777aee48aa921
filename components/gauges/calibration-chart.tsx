import type { ReactNode } from 'react'
import { classes } from '@/components/ui/classes'
import type { GaugeCalibration } from '@/lib/tuning/gauge-calibration'
import type { GaugeCurve } from '@/lib/tuning/gauge-curve'
import type { GaugeHead } from '@/lib/tuning/gauge-profile'
import type { TensionSpan, Tick } from './calibration-axis'
import { evenTicks, tapTicks, tensionPlace, tensionTicks } from './calibration-axis'

export interface CalibrationChartProps {
  calibration: GaugeCalibration
  /** What was read, in the order of `calibration.pairs`. */
  readings: readonly number[]
  /** Whose taps the axis shows; null: film tension. */
  head: { words: string; head: GaugeHead } | null
  /** What was asked below, drawn as a cross of two lines. */
  asked: { tensionNPerM: number; reading: number } | null
}

/** Beyond the calibrated range a little is shown, shaded, so that its ends can be seen. */
const beyond = 1.18
const unit = 1000

const round = (value: number) => Math.round(value * 10) / 10
const percent = (share: number) => `${round(share * 100)}%`

/** Pairs, the curve through them, its interval, and the range it holds for. */
export function CalibrationChart({ calibration, readings, head, asked }: CalibrationChartProps) {
  const { range, low, middle, high, pairs, scale, name } = calibration
  const span: TensionSpan = {
    fromNPerM: Math.min(range.lowNPerM, ...pairs.map(({ tensionNPerM }) => tensionNPerM)) / beyond,
    toNPerM: Math.max(range.highNPerM, ...pairs.map(({ tensionNPerM }) => tensionNPerM)) * beyond,
  }
  const bottom = Math.max(scale.min, Math.min(...low.readings, ...readings) - (scale.max - scale.min) / 30)
  const top = Math.min(scale.max, Math.max(...high.readings, ...readings) + (scale.max - scale.min) / 30)
  const across = (tensionNPerM: number) => tensionPlace(span, tensionNPerM)
  const up = (reading: number) => (reading - bottom) / (top - bottom)
  const points = ({ lnTensions, readings: heights }: GaugeCurve) =>
    lnTensions.map(
      (lnTension, i) =>
        `${round(across(Math.exp(lnTension)) * unit)},${round((1 - up(heights[i] ?? Number.NaN)) * unit)}`,
    )
  const xTicks: Tick[] = head ? tapTicks(span, head.head) : tensionTicks(span)
  const [begin, end] = [across(range.lowNPerM), across(range.highNPerM)]
  const label = `${name}: ${pairs.length} pairs, ${Math.round(range.lowNPerM)} to ${Math.round(range.highNPerM)} N/m, reading ${Math.round(middle.readings[0] ?? 0)} to ${Math.round(middle.readings.at(-1) ?? 0)}`

  return (
    <figure>
      <div role="img" aria-label={label} className="grid grid-cols-[2.5rem_minmax(0,1fr)] grid-rows-[20rem_auto]">
        <div className="relative" aria-hidden>
          {evenTicks(bottom, top, 8).map((reading) => (
            <span
              key={reading}
              className="figures absolute right-2 translate-y-1/2 text-[0.8125rem] text-soft"
              style={{ bottom: percent(up(reading)) }}
            >
              {reading}
            </span>
          ))}
        </div>
        <div className="relative overflow-hidden border border-line bg-sheet">
          {evenTicks(bottom, top, 8).map((reading) => (
            <span key={reading} className="absolute inset-x-0 h-px bg-line" style={{ bottom: percent(up(reading)) }} />
          ))}
          {xTicks.map(({ at, words }) => (
            <span key={words} className="absolute inset-y-0 w-px bg-line" style={{ left: percent(at) }} />
          ))}
          <span className="absolute inset-y-0 left-0 border-r border-soft bg-wash" style={{ width: percent(begin) }} />
          <span
            className="absolute inset-y-0 right-0 border-l border-soft bg-wash"
            style={{ width: percent(1 - end) }}
          />
          <svg
            viewBox={`0 0 ${unit} ${unit}`}
            preserveAspectRatio="none"
            className="absolute inset-0 size-full"
            aria-hidden
          >
            <polygon points={[...points(low), ...points(high).reverse()].join(' ')} className="fill-reed/20" />
            {[low, high].map((bound, i) => (
              <polyline
                key={i}
                points={points(bound).join(' ')}
                className="fill-none stroke-reed"
                strokeWidth={1}
                strokeDasharray="4 3"
                vectorEffect="non-scaling-stroke"
              />
            ))}
            <polyline
              points={points(middle).join(' ')}
              className="fill-none stroke-ink"
              strokeWidth={2}
              vectorEffect="non-scaling-stroke"
            />
          </svg>
          {pairs.map((pair, i) => (
            <Mark
              key={i}
              doubtful={pair.doubtful}
              left={percent(across(pair.tensionNPerM))}
              bottom={percent(up(readings[i] ?? Number.NaN))}
            />
          ))}
          {asked && (
            <>
              <span
                className="absolute inset-y-0 w-0.5 -translate-x-1/2 bg-spike"
                style={{ left: percent(across(asked.tensionNPerM)) }}
              />
              <span
                className="absolute inset-x-0 h-0.5 translate-y-1/2 bg-spike"
                style={{ bottom: percent(up(asked.reading)) }}
              />
            </>
          )}
        </div>
        <span />
        <div className="relative h-6" aria-hidden>
          {xTicks.map(({ at, words }) => (
            <span
              key={words}
              className="figures absolute top-1 -translate-x-1/2 text-[0.8125rem] text-soft"
              style={{ left: percent(at) }}
            >
              {words}
            </span>
          ))}
        </div>
      </div>
      <p className="ml-10 text-sm text-soft">{head ? `Tap in Hz of ${head.words}` : 'Film tension, kN/m'}</p>
      <Legend doubtful={pairs.some(({ doubtful }) => doubtful)} asked={asked !== null} />
    </figure>
  )
}

function Mark({ doubtful, left, bottom }: { doubtful: boolean; left: string; bottom: string }) {
  return (
    <span
      data-part={doubtful ? 'doubtful pair' : 'pair'}
      className={classes(
        'absolute -translate-x-1/2 translate-y-1/2',
        doubtful
          ? 'figures text-lg leading-none font-bold text-spike-text'
          : 'size-2.5 rounded-full border-2 border-ink bg-sheet',
      )}
      style={{ left, bottom }}
    >
      {doubtful && '×'}
    </span>
  )
}

/** What each mark means, in words. */
function Legend({ doubtful, asked }: { doubtful: boolean; asked: boolean }) {
  const swatch = 'inline-block shrink-0'
  return (
    <ul className="mt-2 ml-10 flex flex-wrap gap-x-5 gap-y-1 text-sm">
      <Item words="pair">
        <span className={classes(swatch, 'size-2.5 rounded-full border-2 border-ink bg-sheet')} />
      </Item>
      {doubtful && (
        <Item words="doubtful pair, left out">
          <span className={classes(swatch, 'figures font-bold text-spike-text')}>×</span>
        </Item>
      )}
      <Item words="the curve">
        <span className={classes(swatch, 'h-0.5 w-5 bg-ink')} />
      </Item>
      <Item words="nine readings in ten, on another head">
        <span className={classes(swatch, 'h-3 w-5 border-y border-dashed border-reed bg-reed/20')} />
      </Item>
      <Item words="not calibrated">
        <span className={classes(swatch, 'h-3 w-5 border border-soft bg-wash')} />
      </Item>
      {asked && (
        <Item words="asked below">
          <span className={classes(swatch, 'h-0.5 w-5 bg-spike')} />
        </Item>
      )}
    </ul>
  )
}

function Item({ words, children }: { words: string; children: ReactNode }) {
  return (
    <li className="flex items-center gap-2">
      <span aria-hidden className="flex items-center">
        {children}
      </span>
      {words}
    </li>
  )
}
