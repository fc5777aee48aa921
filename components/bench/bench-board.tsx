import type { ReactNode } from 'react'
import { classes } from '@/components/ui/classes'
import { headStandingWords, headView, standingSignOff } from '@/lib/client/bench/head-view'
import type { Bench, BenchDrum, BenchHead } from '@/lib/contracts/bench'
import { outWords } from '@/lib/tuning/head-state-words'
import { clockWords, headCautionWords, hzWords } from './bench-words'
import { HeadTrace } from './head-trace'
import { ReadingLog } from './reading-log'

/** Every drum of the night as the drum tech watches it: the shape of each head, which lugs are out, what was read. */
export function BenchBoard({ bench }: { bench: Bench }) {
  return (
    <div className="mt-6 space-y-8">
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
      className={classes('border-l-4 border-t border-t-ink pt-3 pl-4', signOff ? 'border-l-reed' : 'border-l-line')}
    >
      <div className="flex flex-wrap items-baseline gap-x-5 gap-y-1">
        <h2 id={id} className="text-2xl">
          {drum.name}
        </h2>
        <p className="text-soft">{drum.sizeWords}</p>
        <p className={classes('ml-auto', signOff ? 'font-bold text-reed' : 'text-soft')}>
          {signOff
            ? `Signed off by ${signOff.byName}${signOff.at ? `, ${clockWords(signOff.at, bench.show.zone)}` : ''}`
            : 'not signed off'}
        </p>
      </div>
      {signOff?.remark && <p className="text-right">“{signOff.remark}”</p>}
      {drum.instead && (
        <p className="text-brass">
          Came instead of {drum.instead.askedWords}
          {drum.instead.words && `: ${drum.instead.words}`}
        </p>
      )}
      {drum.missing && <p className="font-bold text-spike-text">Settled: this drum does not come.</p>}
      <div className="mt-3 grid gap-x-8 gap-y-6 lg:grid-cols-2">
        {drum.heads.map((head) => (
          <HeadBoard key={head.side} bench={bench} drum={drum} head={head} />
        ))}
      </div>
    </section>
  )
}

function HeadBoard({ bench, drum, head }: { bench: Bench; drum: BenchDrum; head: BenchHead }) {
  const view = headView(bench.readings, drum, head)
  const { state } = view
  const out = view.judged ? outWords(state) : null
  const off = state.meanFromTarget
  return (
    <div className="flex flex-wrap gap-x-5 gap-y-3">
      <HeadTrace
        {...{ drum, head, view }}
        centre={<span className="name text-sm">{head.side}</span>}
        className="mx-0 w-64 max-w-full shrink-0"
      />
      <div className="min-w-0 grow basis-64">
        <p
          className={classes(
            'text-lg font-bold',
            out ? 'text-spike-text' : state.even && view.judged ? 'text-reed' : 'text-ink',
          )}
        >
          {headStandingWords(view, drum.lugCount)}
        </p>
        {out && <p className="text-spike-text">{out}.</p>}
        <dl className="mt-2 grid grid-cols-[max-content_1fr] gap-x-4 gap-y-0.5">
          <Fact name="tap to aim at">
            {head.tap
              ? `${hzWords(head.tap.hz)} Hz (${hzWords(head.tap.lowHz)} to ${hzWords(head.tap.highHz)}, an estimate)`
              : 'none'}
          </Fact>
          {head.note && (
            <Fact name="note">
              {head.note.name}, {hzWords(head.note.hz)} Hz
            </Fact>
          )}
          {head.gauge !== null && <Fact name="gauge noted">{head.gauge}, relative to that gauge</Fact>}
          {state.mean !== null && (
            <Fact name="mean">
              {view.basis === 'gauge' ? `${state.mean.toFixed(1)} on the gauge` : `${hzWords(state.mean)} Hz`}
              {off !== null && `, ${Math.abs(Math.round(off))} cents ${off < 0 ? 'under' : 'over'} the aim`}
            </Fact>
          )}
          {state.spread !== null && (
            <Fact name="spread">
              {view.basis === 'gauge' ? `${state.spread.toFixed(1)} on the gauge` : `${Math.round(state.spread)} cents`}
            </Fact>
          )}
        </dl>
        {headCautionWords(head).map((words) => (
          <p key={words} className="mt-2 border-l-4 border-brass pl-2 text-sm">
            <strong className="text-brass">Caution.</strong> {words}
          </p>
        ))}
        <ReadingLog bench={bench} drum={drum} head={head} />
      </div>
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
