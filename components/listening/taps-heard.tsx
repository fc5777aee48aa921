import type { TapsTogether } from '@/lib/listening/taps-together'

/** "251.5 Hz ± 0.2, median of 3, from 251.3 to 251.8": several taps as one reading. */
export function TapsHeard({ count, medianHz, halfHz, lowestHz, highestHz }: TapsTogether) {
  const wide = halfHz >= 1
  return (
    <span className="text-sm text-soft">
      <span className="figures text-base font-bold text-ink">{medianHz.toFixed(1)} Hz</span>{' '}
      <span className="figures">± {wide ? Math.ceil(halfHz) : Math.max(halfHz, 0.1).toFixed(1)}</span>,{' '}
      {count === 1 ? (
        'one only'
      ) : (
        <>
          median of {count}, from <span className="figures">{lowestHz.toFixed(1)}</span> to{' '}
          <span className="figures">{highestHz.toFixed(1)}</span>
        </>
      )}
    </span>
  )
}
