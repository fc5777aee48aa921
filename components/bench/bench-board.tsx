import type { ReactNode } from 'react'
import { classes } from '@/components/ui/classes'
import { headStandingWords, headView, standingSignOff } from '@/lib/client/bench/head-view'
import type { Bench, BenchDrum, BenchHead } from '@/lib/contracts/bench'
import { outWords } from '@/lib/tuning/head-state-words'
import { clockWords, gaugeWords, headCautionWords, hzWords } from './bench-words'
import { HeadTrace } from './head-trace'
import { ReadingLog } from './reading-log'

/** Every drum of the night as the drum tech watches it, side by side: the shape of each head, which lugs are out, what was read. */
export function BenchBoard({ bench }: { bench: Bench }) {
  return (
    <div className="mt-6 grid items-start gap-x-8 gap-y-8 md:grid-cols-2 xl:grid-cols-3">
      {bench.drums.map((drum) => (
        <DrumBoard key={drum.entryId} bench={bench} drum={drum} />
      ))}
    </div>
  )
}

function DrumBoard({ bench, drum }: { bench: Bench; drum: BenchDrum }) {
  const signOff = standingSignOff(bench, drum.entryId)
  const id = `drum-${drum.entryId}`
  return (
    <section
      aria-labelledby={id}
      className={classes(
        'min-w-0 border-t border-l-4 border-t-ink pt-2 pl-3',
        signOff ? 'border-l-reed' : 'border-l-line',
      )}
    >
      <div className="flex flex-wrap items-baseline justify-between gap-x-4">
        <h2 id={id} className="text-xl">
          {drum.name}
        </h2>
        <p className={classes('text-sm', signOff ? 'font-bold text-reed' : 'text-soft')}>
          {signOff
            ? `Signed off by ${signOff.byName}${signOff.at ? `, ${clockWords(signOff.at, bench.show.zone)}` : ''}`
            : 'not signed off'}
        </p>
      </div>
      <p className="text-sm text-soft">{drum.sizeWords}</p>
      {signOff?.remark && <p className="text-sm">“{signOff.remark}”</p>}
      {drum.instead && (
        <p className="text-sm text-brass">
          Came instead of {drum.instead.askedWords}
          {drum.instead.words && `: ${drum.instead.words}`}
        </p>
      )}
      {drum.missing && <p className="font-bold text-spike-text">Settled: this drum does not come.</p>}
      <div className="mt-2 grid grid-cols-2 gap-x-4">
        {drum.heads.map((head) => (
          <HeadBoard key={head.side} bench={bench} drum={drum} head={head} />
        ))}
      </div>
      {drum.heads.map((head) => (
        <ReadingLog key={head.side} bench={bench} drum={drum} head={head} />
      ))}
    </section>
  )
}

function HeadBoard({ bench, drum, head }: { bench: Bench; drum: BenchDrum; head: BenchHead }) {
  const view = headView(bench.readings, drum, head)
  const { state } = view
  const out = view.judged ? outWords(state) : null
  const off = state.meanFromTarget
  return (
    <div className="min-w-0">
      <HeadTrace {...{ drum, head, view }} small centre={<span className="name text-sm">{head.side}</span>} />
      <p
        className={classes('font-bold', out ? 'text-spike-text' : state.even && view.judged ? 'text-reed' : 'text-ink')}
      >
        {headStandingWords(view, drum.lugCount)}
      </p>
      {out && <p className="text-sm text-spike-text">{out}.</p>}
      <dl className="mt-1 grid grid-cols-[max-content_1fr] gap-x-2 text-sm">
        <Fact name="aim">
          {head.tap ? (
            <>
              <strong>{hzWords(head.tap.hz)} Hz</strong> tap
            </>
          ) : (
            'none'
          )}
        </Fact>
        {head.tap && (
          <Fact name="between">
            {hzWords(head.tap.lowHz)}–{hzWords(head.tap.highHz)}
          </Fact>
        )}
        {head.note && (
          <Fact name="note">
            {head.note.name} {hzWords(head.note.hz)} Hz
          </Fact>
        )}
        {head.gauge !== null && (
          <Fact name="gauge">
            <span className="whitespace-nowrap">{gaugeWords(head.gauge)}</span>
          </Fact>
        )}
        {state.mean !== null && (
          <Fact name="mean">
            {view.basis === 'gauge' ? `${state.mean.toFixed(1)} on the gauge` : `${hzWords(state.mean)} Hz`}
            {off !== null && `, ${Math.abs(Math.round(off))} cents ${off < 0 ? 'under' : 'over'}`}
          </Fact>
        )}
        {state.spread !== null && (
          <Fact name="spread">
            {view.basis === 'gauge' ? `${state.spread.toFixed(1)} on the gauge` : `${Math.round(state.spread)} cents`}
          </Fact>
        )}
      </dl>
      {headCautionWords(head).map((words) => (
        <p key={words} className="mt-1 border-l-4 border-brass pl-2 text-sm">
          <strong className="text-brass">Caution.</strong> {words}
        </p>
      ))}
    </div>
  )
}

function Fact({ name, children }: { name: string; children: ReactNode }) {
  return (
    <>
      <dt className="text-soft">{name}</dt>
      <dd className="figures">{children}</dd>
    </>
  )
}
