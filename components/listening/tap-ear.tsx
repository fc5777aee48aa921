'use client'

import { useEffect, useRef, useState } from 'react'
import { Button } from '@/components/ui/button'
import { LiveRegion } from '@/components/ui/live-region'
import { Notice } from '@/components/ui/notice'
import type { NoteLocale } from '@/lib/acoustics/note-name'
import type { ListeningTrouble } from '@/lib/client/listening/listening-trouble'
import { listeningTroubleWords } from '@/lib/client/listening/listening-trouble'
import { noteRefusalWords, tapRefusalWords } from '@/lib/listening/listening-words'
import { tapReadingWords } from '@/lib/listening/tap-reading-words'
import type { TapReading, TapReport } from '@/lib/listening/tap-report'
import { HeardPitch } from './heard-pitch'
import { LevelBar } from './level-bar'

export interface TapEarProps {
  /** What is listened for: "the tap near lug 3". */
  what?: string
  /** A tap beside a lug, or a stroke at the centre for the drum's note. */
  ask?: 'tap' | 'note'
  /** The words of its button. */
  action?: string
  /** `secondary` inside a form that has its own first button. */
  kind?: 'primary' | 'secondary'
  /** The pitch looked for, Hz: partials far from it are left out. */
  expectHz?: number
  expectWithinCents?: number
  referenceHz?: number
  locale?: NoteLocale
  onHeard?: (reading: TapReading) => void
}

type Standing = { at: 'rest' } | { at: 'opening' } | { at: 'listening' } | { at: 'trouble'; trouble: ListeningTrouble }

/** Listens for taps by the microphone: last pitch biggest, or in words why none is named. Loads its ear when it is pressed. */
export function TapEar(props: TapEarProps) {
  const { what, ask = 'tap', action = 'Listen for a tap', kind = 'primary', locale = 'en', onHeard } = props
  const { expectHz, expectWithinCents, referenceHz } = props
  const [standing, setStanding] = useState<Standing>({ at: 'rest' })
  const [level, setLevel] = useState(0)
  const [last, setLast] = useState<TapReport | null>(null)
  const stop = useRef<AbortController | null>(null)
  useEffect(() => () => stop.current?.abort(), [])

  const listen = async () => {
    const ending = new AbortController()
    stop.current = ending
    setStanding({ at: 'opening' })
    const { listenForTaps } = await import('@/lib/client/listening/listen-for-taps')
    const end = await listenForTaps({
      options: {
        ...(expectHz === undefined ? {} : { expectHz }),
        ...(expectWithinCents === undefined ? {} : { expectWithinCents }),
        ...(referenceHz === undefined ? {} : { referenceHz }),
      },
      signal: ending.signal,
      onListening: () => setStanding({ at: 'listening' }),
      onLevel: setLevel,
      onRefusal: setLast,
      onTap: (reading) => {
        setLast(reading)
        onHeard?.(reading)
      },
    })
    if (stop.current !== ending) return
    stop.current = null
    setLevel(0)
    setStanding(end.ended === 'trouble' ? { at: 'trouble', trouble: end.trouble } : { at: 'rest' })
  }

  const listening = standing.at === 'listening'
  return (
    <section aria-label={what === undefined ? 'Listening' : `Listening for ${what}`} className="thumb space-y-3">
      <div className="flex flex-wrap items-center gap-3">
        {listening ? (
          <Button onClick={() => stop.current?.abort()}>Stop listening</Button>
        ) : (
          <Button
            kind={kind}
            busy={standing.at === 'opening' && 'Opening the microphone'}
            onClick={() => void listen()}
          >
            {action}
          </Button>
        )}
        {listening && <LevelBar peak={level} />}
      </div>
      {standing.at === 'trouble' && <Notice kind="error">{listeningTroubleWords(standing.trouble)}</Notice>}
      {listening && last === null && (
        <p className="text-soft">Listening. One {ask === 'tap' ? 'tap' : 'stroke at the centre'}, then let it ring.</p>
      )}
      {last?.outcome === 'heard' && <HeardPitch reading={last} locale={locale} />}
      {last?.outcome === 'refused' && (
        <p className="border-l-4 border-brass bg-sheet px-3 py-2">{refusalWords[ask](last.kind)}</p>
      )}
      <LiveRegion>{last === null ? '' : said(last, ask, locale)}</LiveRegion>
    </section>
  )
}

const refusalWords = { tap: tapRefusalWords, note: noteRefusalWords }

function said(report: TapReport, ask: 'tap' | 'note', locale: NoteLocale): string {
  return report.outcome === 'heard' ? tapReadingWords(report, locale) : refusalWords[ask](report.kind)
}
