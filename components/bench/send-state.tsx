import { Button } from '@/components/ui/button'
import { LiveRegion } from '@/components/ui/live-region'
import { Notice } from '@/components/ui/notice'
import type { BenchState } from '@/lib/client/bench/bench-session'
import type { QueuedItem } from '@/lib/client/bench/bench-queue'
import type { BenchDrum } from '@/lib/contracts/bench'
import { readingWords } from './bench-words'

export interface SendStateProps {
  state: BenchState
  retry: () => void
  letGo: (sequence: number) => void
  drums: readonly BenchDrum[]
}

function counted(count: number): string {
  return count === 1 ? '1 entry waits' : `${count} entries wait`
}

function waitingWords(state: BenchState): string {
  const readings = state.bench.readings.filter(({ serverAt }) => serverAt === null).length
  if (readings === state.waiting) return readings === 1 ? '1 reading waits' : `${readings} readings wait`
  return counted(state.waiting)
}

/** What waits and for what; a cause other than lost signal is told in the server's own words. */
function waitWord(state: BenchState): string {
  const signal = state.problem === 'No signal.'
  if (state.waiting === 0) return state.problem ?? 'No signal.'
  return signal ? `${waitingWords(state)} for signal.` : `${waitingWords(state)}. ${state.problem ?? ''}`
}

/** Whether what was logged has arrived; what has not, why, and what happens to it. */
export function SendState({ state, retry, letGo, drums }: SendStateProps) {
  const { connection, waiting, problem, kept, refused } = state
  const lostSight = connection === 'waiting'
  return (
    <div className="space-y-2">
      <LiveRegion visible className="space-y-2">
        {lostSight && (
          <Notice kind="wait" word={waitWord(state)} action={<Button onClick={retry}>Try now</Button>}>
            {waiting > 0
              ? 'Kept on this device and sent by itself, once. Go on tuning.'
              : 'What others log is not seen for now. Go on tuning: what you log is kept here and sent later.'}
          </Notice>
        )}
        {connection === 'closed' && (
          <Notice kind="error" word="This bench is closed.">
            {problem}{' '}
            {waiting > 0 &&
              `${waitingWords(state)} on this device; open a new link to this show here and they are sent.`}
          </Notice>
        )}
        {!kept && waiting > 0 && (
          <Notice kind="error" word="Keep this page open.">
            This device does not let pages keep anything, so what waits is lost when the page closes.
          </Notice>
        )}
      </LiveRegion>
      {refused.map((item) => (
        <Notice
          key={item.sequence}
          kind="error"
          word="Not taken:"
          action={<Button onClick={() => letGo(item.sequence)}>Let it go</Button>}
        >
          {refusedWords(item, drums)}: {item.refused}. It is kept here until you let it go; log it again the right way.
        </Notice>
      ))}
    </div>
  )
}

function refusedWords(item: QueuedItem, drums: readonly BenchDrum[]): string {
  const named = (entryId: string) =>
    drums.find((drum) => drum.entryId === entryId)?.name ?? 'a drum that is not on the sheet'
  if (item.kind === 'sign-off') return `sign-off of ${named(item.signOff.entryId)}`
  const { entryId, side, lug } = item.reading
  return `${named(entryId)}, ${side}, lug ${lug}, ${readingWords(item.reading)}`
}
