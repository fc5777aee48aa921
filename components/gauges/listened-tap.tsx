'use client'

import { useRef, useState } from 'react'
import { TapEar } from '@/components/listening/tap-ear'
import { TapsHeard } from '@/components/listening/taps-heard'
import { Button } from '@/components/ui/button'
import { LiveRegion } from '@/components/ui/live-region'
import type { TapReading } from '@/lib/listening/tap-report'
import type { TapsTogether } from '@/lib/listening/taps-together'
import { tapsAgree, tapsTogether } from '@/lib/listening/taps-together'

/** So many of the last taps make the pitch: a head that was moved since is soon out of it. */
const LAST_TAPS = 5

export interface ListenedTapProps {
  /** As it would be typed; null: the taps are not of one pitch, and what they filled in goes. */
  onMedian: (hz: number | null) => void
}

/** Hears taps of one head for a pair; each moves the median, which is handed on. */
export function ListenedTap({ onMedian }: ListenedTapProps) {
  // What is heard comes to the ear's listener as it was when listening began.
  const taps = useRef<readonly TapReading[]>([])
  const [together, setTogether] = useState<TapsTogether | null>(null)
  const agree = together !== null && tapsAgree(together)
  const hold = (heard: readonly TapReading[]) => {
    taps.current = heard.slice(-LAST_TAPS)
    const now = tapsTogether(taps.current)
    setTogether(now)
    if (now) onMedian(tapsAgree(now) ? Number(now.medianHz.toFixed(1)) : null)
  }
  return (
    <div className="flex flex-col gap-2">
      <TapEar
        what="the tap of this pair"
        action="Listen for the tap"
        kind="secondary"
        onHeard={(reading) => hold([...taps.current, reading])}
      />
      {together && (
        <div className="flex flex-wrap items-center gap-x-2">
          {agree ? (
            <p>
              <span className="text-sm">Tap filled in:</span> <TapsHeard {...together} />
            </p>
          ) : (
            <p className="border-l-4 border-brass bg-paper px-3 py-2">
              {apartWords} They lie from <span className="figures">{together.lowestHz.toFixed(1)}</span> to{' '}
              <span className="figures">{together.highestHz.toFixed(1)}</span> Hz.
            </p>
          )}
          <Button kind="quiet" className="-ml-4 sm:ml-0" onClick={() => hold([])}>
            Forget these taps
          </Button>
        </div>
      )}
      <LiveRegion>
        {together && (agree ? `Filled in: ${together.medianHz.toFixed(1)} hertz, from ${together.count}.` : apartWords)}
      </LiveRegion>
    </div>
  )
}

const apartWords =
  'Not sure, nothing is filled in: these taps are not of one pitch. Forget them and tap again, beside the lug where the gauge was read.'
