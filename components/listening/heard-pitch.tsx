import type { NoteLocale } from '@/lib/acoustics/note-name'
import { tapDoubt, tapHertz, tapHertzError, tapNote, tapRemarks } from '@/lib/listening/tap-reading-words'
import type { TapReading } from '@/lib/listening/tap-report'

/** A heard tap: hertz biggest, then what else it tells. It is read out elsewhere, so it is not said twice. */
export function HeardPitch({ reading, locale }: { reading: TapReading; locale: NoteLocale }) {
  const { centsFromTarget, t60S } = reading
  const doubt = tapDoubt(reading)
  return (
    <div className="border-l-4 border-reed bg-sheet px-3 py-2">
      <p className="flex flex-wrap items-baseline gap-x-3 figures">
        <span>
          <strong className="text-5xl leading-none font-bold">{tapHertz(reading)}</strong> Hz
        </span>
        <span className="text-soft">{tapHertzError(reading)}</span>
        <span>{tapNote(reading, locale)}</span>
      </p>
      <p className="figures pt-1 text-sm text-soft">
        {centsFromTarget !== null && (
          <>
            {Math.abs(Math.round(centsFromTarget))} cents {centsFromTarget < 0 ? 'under' : 'over'} the target ·{' '}
          </>
        )}
        rings {t60S.toFixed(t60S < 1 ? 2 : 1)} s (60 dB)
      </p>
      {tapRemarks(reading).map((remark) => (
        <p key={remark}>{remark}</p>
      ))}
      {doubt !== null && <p className="text-brass">{doubt}</p>}
    </div>
  )
}
