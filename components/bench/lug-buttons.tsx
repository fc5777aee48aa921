import { classes } from '@/components/ui/classes'
import type { HeadView } from '@/lib/client/bench/head-view'
import { hzWords } from './bench-words'

/** The lugs in the order in which they are gone round, each with its latest reading; press one to read it out of turn. */
export function LugButtons({ view, lug, pick }: { view: HeadView; lug: number; pick: (lug: number) => void }) {
  return (
    <div role="group" aria-label="Lugs in their order" className="grid grid-cols-4 gap-2 sm:grid-cols-6">
      {view.order.map((number) => {
        const state = view.state.lugs[number - 1]
        const value = state?.value ?? null
        const out = view.judged && state?.out === true
        const now = number === lug
        return (
          <button
            key={number}
            type="button"
            aria-pressed={now}
            onClick={() => pick(number)}
            className={classes(
              'min-h-14 border py-1 leading-tight whitespace-nowrap',
              now ? 'border-3 border-spike' : 'border-ink',
              view.inPass.has(number) ? 'bg-wash' : 'bg-transparent',
            )}
          >
            <span className="block font-bold">
              lug {number}
              {out && (
                <span className="text-spike-text">
                  {' '}
                  {(state.fromTarget ?? state.fromMean ?? 0) < 0 ? 'low' : 'high'}
                </span>
              )}
            </span>
            <span className="figures block text-[0.8125rem] text-soft">
              {value === null
                ? 'not read'
                : view.basis === 'tap'
                  ? `${hzWords(value)} Hz`
                  : String(Math.round(value * 10) / 10)}
            </span>
          </button>
        )
      })}
    </div>
  )
}
