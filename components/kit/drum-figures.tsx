import { MOST_WARBLE_HZ } from '@/lib/acoustics/drum-tuning'
import type { DrumTuning } from '@/lib/acoustics/drum-tuning'
import { hertz } from '@/lib/acoustics/figure-words'

/** What belongs to the drum and not to one head: tap over note, the upper partner, how long it may sound, the false warble. */
export function DrumFigures({ tuning }: { tuning: DrumTuning }) {
  const { tapRatio, tapRatioMeasured, upperPartnerHz, sustain, falseWarbleHz, model } = tuning
  return (
    <div className="mt-1 text-sm">
      <dl className="grid grid-cols-[auto_1fr] gap-x-3">
        <dt className="text-soft">tap over note</dt>
        <dd className="figures">
          <span className="font-bold">{tapRatio.value.toFixed(2)}</span>{' '}
          <span className="text-soft">
            {tapRatio.low.toFixed(2)}–{tapRatio.high.toFixed(2)}
          </span>{' '}
          {tapRatioMeasured && <span className="font-text">measured</span>}
        </dd>
        {upperPartnerHz && (
          <>
            <dt className="text-soft">upper partner</dt>
            <dd className="figures">
              <span className="font-bold">{hertz(upperPartnerHz.value)} Hz</span>{' '}
              <span className="text-soft">
                {Math.round(upperPartnerHz.low)}–{Math.round(upperPartnerHz.high)}
              </span>
            </dd>
          </>
        )}
        {sustain !== null && (
          <>
            <dt className="text-soft">sustain share</dt>
            <dd>
              <span className="figures font-bold">{sustain.toFixed(2)}</span>{' '}
              <span className="text-soft">1 when the heads match, not seconds</span>
            </dd>
          </>
        )}
        {falseWarbleHz !== null && (
          <>
            <dt className="text-soft">other head open</dt>
            <dd>
              <span className="figures font-bold">{falseWarbleHz.toFixed(1)} Hz</span>{' '}
              <span className="text-soft">
                {falseWarbleHz > MOST_WARBLE_HZ ? 'apart, two pitches: damp it to tap' : 'false warble: damp it to tap'}
              </span>
            </dd>
          </>
        )}
      </dl>
      {model === 'one-head' && (
        <p className="mt-1 text-soft">
          {tapRatioMeasured
            ? 'One head, by the tap ratio measured on this drum.'
            : 'One head in the open air: a port or an open shell is not in the model. Measure tap over note once, it is worth more.'}
        </p>
      )}
    </div>
  )
}
