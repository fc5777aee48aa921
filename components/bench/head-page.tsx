import { useState } from 'react'
import { classes } from '@/components/ui/classes'
import { RadioGroup } from '@/components/ui/radio-group'
import type { BenchSession } from '@/lib/client/bench/bench-session'
import { GAUGE_TOLERANCE, basisOfHead, headStandingWords, headView, readingsOfHead } from '@/lib/client/bench/head-view'
import type { HeadView } from '@/lib/client/bench/head-view'
import type { Bench, BenchDrum, BenchHead } from '@/lib/contracts/bench'
import { outWords } from '@/lib/tuning/head-state-words'
import type { ReadingUnit } from '@/lib/tuning/readings'
import { BenchCautions } from './bench-cautions'
import { headCautionWords, lugOneWords } from './bench-words'
import { HeadTarget } from './head-target'
import { HeadTrace } from './head-trace'
import { LogForm } from './log-form'
import { SharedKitNotice } from './shared-kit-notice'
import { SignOffForm } from './sign-off-form'
import { useKept } from './use-bench'

export interface HeadPageProps {
  bench: Bench
  drum: BenchDrum
  head: BenchHead
  session: BenchSession
  name: string
  /** Null where the person is known. */
  keepName: ((name: string) => void) | null
}

/** One head: what to tune to, where the lugs are, what was read, and the next reading. */
export function HeadPage({ bench, drum, head, session, name, keepName }: HeadPageProps) {
  const usual = basisOfHead(readingsOfHead(bench.readings, drum, head.side)) === 'gauge' ? 'gauge' : 'Hz'
  const [keptBy, keepBy] = useKept(`hoopwright bench by ${drum.entryId} ${head.side}`, usual)
  const readBy: ReadingUnit = keptBy === 'gauge' ? 'gauge' : keptBy === 'cents' && head.tap ? 'cents' : 'Hz'
  const [passFrom, setPassFrom] = useState(1)
  const [chosenLug, setChosenLug] = useState<number | null>(null)
  const view = headView(bench.readings, drum, head, { basis: readBy === 'gauge' ? 'gauge' : 'tap', passFrom })
  const lug = chosenLug ?? view.nextLug
  return (
    <main id="main" className="space-y-4 pt-2">
      <header>
        <h1 className="text-4xl">
          {drum.name}, {head.side}
        </h1>
        <p className="text-soft">
          {drum.sizeWords}. {head.words}.{drum.muffling && ` Muffling: ${drum.muffling}.`}
        </p>
      </header>
      <SharedKitNotice owner={bench.show.mustNotRetune} />
      <Sides drum={drum} open={head.side} />
      <RadioGroup
        legend="Read by"
        legendHidden
        name="read-by"
        value={readBy}
        onChange={(event) => {
          keepBy(event.target.value)
          setChosenLug(null)
        }}
        options={[
          { value: 'Hz', label: 'tap, Hz' },
          ...(head.tap ? [{ value: 'cents', label: 'tap, cents' }] : []),
          { value: 'gauge', label: 'gauge' },
        ]}
      />
      <HeadTarget drum={drum} head={head} readBy={readBy} />
      {headCautionWords(head).map((words) => (
        <p key={words} className="border-l-4 border-brass bg-sheet px-3 py-2">
          <strong className="text-brass">Caution.</strong> {words}
        </p>
      ))}
      <LogForm
        key={readBy}
        {...{ drum, head, view, readBy, session, name, lug, passFrom }}
        choose={setChosenLug}
        nextPass={() => {
          setPassFrom(view.pass + 1)
          setChosenLug(null)
        }}
      >
        <HeadTrace
          drum={drum}
          head={head}
          view={view}
          nowLug={lug}
          centre={<Centre view={view} lugCount={drum.lugCount} />}
        />
        <HeadWords view={view} drum={drum} />
      </LogForm>
      <p className="text-soft">{lugOneWords[head.side]}</p>
      <SignOffForm {...{ bench, drum, session, name, keepName }} />
      <BenchCautions />
    </main>
  )
}

function Sides({ drum, open }: { drum: BenchDrum; open: BenchHead['side'] }) {
  if (drum.heads.length < 2) return null
  return (
    <nav aria-label="Heads of this drum" className="grid grid-cols-2">
      {drum.heads.map(({ side }) => (
        <a
          key={side}
          href={`#${drum.entryId}/${side}`}
          aria-current={side === open ? 'page' : undefined}
          className={classes(
            'flex min-h-12 items-center justify-center border border-ink font-bold first:border-r-0',
            side === open ? 'bg-ink text-paper' : 'hover:bg-wash',
          )}
        >
          {side}
        </a>
      ))}
    </nav>
  )
}

function Centre({ view, lugCount }: { view: HeadView; lugCount: number }) {
  return (
    <p className="name text-xl">
      {headStandingWords(view, lugCount)}
      <span className="figures block text-sm font-normal text-soft">pass {view.pass}</span>
    </p>
  )
}

function HeadWords({ view, drum }: { view: HeadView; drum: BenchDrum }) {
  if (!view.judged) {
    return (
      <p className="border-l-4 border-ink bg-sheet px-3 py-2">
        Snare beds make this side uneven on purpose: the readings are kept, and nothing here calls them out.
      </p>
    )
  }
  const out = outWords(view.state)
  const { missing } = view.state
  if (out === null && missing.length > 0) return null
  const { basis } = view
  return (
    <p
      role="status"
      className={classes(
        'border-l-4 bg-sheet px-3 py-2 text-lg font-bold',
        out ? 'border-spike text-spike-text' : 'border-reed text-reed',
      )}
    >
      {out ?? 'Every lug is even'}
      <span className="block text-base font-normal text-soft">
        {view.state.against === 'target' ? 'Against the tap pitch above' : 'Against their own mean'}, within{' '}
        {basis === 'gauge' ? `${GAUGE_TOLERANCE} on the gauge` : `${drum.toleranceCents} cents`}.
        {out !== null && missing.length > 0 && ` ${missing.length} still to read.`}
      </span>
    </p>
  )
}
