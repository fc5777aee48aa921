/** Shown from this far under full scale, dB. */
const LOWEST_DB = -60
/** Over this a tap may be clipped. */
const LOUD_DB = -1.5

/** How loud the microphone hears, by length and by a word. */
export function LevelBar({ peak }: { peak: number }) {
  const db = Math.max(LOWEST_DB, 20 * Math.log10(peak + 1e-9))
  const loud = db > LOUD_DB
  return (
    <div
      role="meter"
      aria-label="Microphone level"
      aria-valuemin={LOWEST_DB}
      aria-valuemax={0}
      aria-valuenow={Math.round(db)}
      aria-valuetext={`−${Math.abs(Math.round(db))} dB of full scale${loud ? ', too loud' : ''}`}
      className="flex min-w-40 grow items-center gap-2"
    >
      <span className="h-3 grow border border-line bg-wash">
        <span
          className={loud ? 'block h-full bg-spike' : 'block h-full bg-ink'}
          style={{ width: `${(1 - db / LOWEST_DB) * 100}%` }}
        />
      </span>
      <span className="figures w-20 text-sm text-soft">{loud ? 'too loud' : `−${Math.abs(Math.round(db))} dB`}</span>
    </div>
  )
}
