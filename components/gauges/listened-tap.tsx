'use client'

import { useRef, useState } from 'react'
import { TapEar } from '@/components/listening/tap-ear'
import { TapsHeard } from '@/components/listening/taps-heard'
import { Button } from '@/components/ui/button'
import type { TapReading } from '@/lib/listening/tap-report'
import type { TapsTogether } from '@/lib/listening/taps-together'
import { tapsTogether } from '@/lib/listening/taps-together'

/** So many of the last taps make the pitch: a head that was moved since is soon out of it. */
const LAST_TAPS = 5

/** Hears taps of one head for a pair; each moves the median, which is handed on as it would be typed. */
export function ListenedTap({ onMedian }: { onMedian: (hz: number) => void }) {
  // What is heard comes to the ear's listener as it was when listening began.
  const taps = useRef<readonly TapReading[]>([])
  const [together, setTogether] = useState<TapsTogether | null>(null)
  const hold = (heard: readonly TapReading[]) => {
    taps.current = heard.slice(-LAST_TAPS)
    const now = tapsTogether(taps.current)
    setTogether(now)
    if (now) onMedian(Number(now.medianHz.toFixed(1)))
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
        <p className="flex flex-wrap items-center gap-x-2">
          <span className="text-sm">Tap filled in:</span>
          <TapsHeard {...together} />
          <Button kind="quiet" onClick={() => hold([])}>
            Forget these taps
          </Button>
        </p>
      )}
    </div>
  )
}
