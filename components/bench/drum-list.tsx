import { classes } from '@/components/ui/classes'
import { EmptyState } from '@/components/ui/empty-state'
import { Field } from '@/components/ui/field'
import { TextInput } from '@/components/ui/text-input'
import { dateWords } from '@/lib/advance/when-words'
import { headStandingWords, headView, standingSignOff } from '@/lib/client/bench/head-view'
import type { Bench, BenchDrum, BenchHead } from '@/lib/contracts/bench'
import { clockWords, gaugeWords, hzWords, sheetWords } from './bench-words'
import { BenchCautions } from './bench-cautions'
import { SharedKitNotice } from './shared-kit-notice'

export interface DrumListProps {
  bench: Bench
  name: string
  /** Null where the person is known. */
  keepName: ((name: string) => void) | null
}

/** The night's drums with how far each head is. */
export function DrumList({ bench, name, keepName }: DrumListProps) {
  const signed = bench.drums.filter(({ entryId }) => standingSignOff(bench, entryId)).length
  return (
    <main id="main" className="space-y-5 pt-2">
      <header>
        <p className="text-soft">{bench.party}</p>
        <h1 className="text-4xl">
          {bench.show.title}, {bench.show.town}
        </h1>
        <p className="mt-1 text-soft">
          {dateWords(bench.show.date)}. {sheetWords(bench)}.
        </p>
      </header>
      <SharedKitNotice owner={bench.show.mustNotRetune} />
      {bench.sheet === null ? (
        <EmptyState title="No tuning sheet yet">
          The drum tech has issued no revision for this show. Once that is done the drums stand here by themselves.
        </EmptyState>
      ) : bench.drums.length === 0 ? (
        <EmptyState title="No drums on this sheet">
          The kit of this revision holds no drum. Ask the drum tech.
        </EmptyState>
      ) : (
        <section aria-labelledby="drums">
          <h2 id="drums" className="text-2xl">
            {signed === bench.drums.length
              ? 'All drums signed off'
              : `${signed} of ${bench.drums.length} drums signed off`}
          </h2>
          <ul className="mt-2 border-t border-ink">
            {bench.drums.map((drum) => (
              <DrumRow key={drum.entryId} bench={bench} drum={drum} />
            ))}
          </ul>
        </section>
      )}
      {keepName && (
        <Field label="Your name" hint="It stands beside what you log, and is remembered on this phone." optional>
          {(control) => (
            <TextInput
              {...control}
              value={name}
              autoComplete="name"
              maxLength={120}
              onChange={(event) => keepName(event.target.value)}
            />
          )}
        </Field>
      )}
      <BenchCautions />
    </main>
  )
}

function DrumRow({ bench, drum }: { bench: Bench; drum: BenchDrum }) {
  const signOff = standingSignOff(bench, drum.entryId)
  return (
    <li className={classes('border-b border-b-line border-l-4 py-3 pl-3', signOff ? 'border-l-reed' : 'border-l-line')}>
      <h3 className="text-2xl">{drum.name}</h3>
      <p className="text-soft">{drum.sizeWords}</p>
      {drum.instead && (
        <p className="text-brass">
          Came instead of {drum.instead.askedWords}
          {drum.instead.words && `: ${drum.instead.words}`}
        </p>
      )}
      {drum.missing && (
        <p className="font-bold text-spike-text">
          Settled: this drum does not come. Ask the drum tech before you tune another.
        </p>
      )}
      <ul className="mt-2 grid grid-cols-2 gap-2">
        {drum.heads.map((head) => (
          <li key={head.side} className={drum.heads.length === 1 ? 'col-span-2' : undefined}>
            <HeadLink bench={bench} drum={drum} head={head} />
          </li>
        ))}
      </ul>
      {signOff && (
        <p className="mt-2 font-bold text-reed">
          Signed off by {signOff.byName}
          {signOff.at ? `, ${clockWords(signOff.at, bench.show.zone)}` : ', waits for signal'}
        </p>
      )}
    </li>
  )
}

function HeadLink({ bench, drum, head }: { bench: Bench; drum: BenchDrum; head: BenchHead }) {
  const view = headView(bench.readings, drum, head)
  const read = drum.lugCount - view.state.missing.length
  return (
    <a
      href={`#${drum.entryId}/${head.side}`}
      className="flex min-h-20 flex-col justify-between gap-1 border border-ink bg-sheet p-2.5 leading-tight hover:bg-wash"
    >
      <strong>{head.side}</strong>
      {head.tap ? (
        <span>
          tap <span className="figures font-bold whitespace-nowrap">{hzWords(head.tap.hz)} Hz</span>
        </span>
      ) : (
        head.gauge && (
          <span>
            gauge <span className="figures">{gaugeWords(head.gauge)}</span>
          </span>
        )
      )}
      <span aria-hidden className="flex gap-0.5">
        {view.order.map((lug, index) => (
          <span key={lug} className={classes('h-1.5 grow border border-ink', index < read && 'bg-ink')} />
        ))}
      </span>
      <span
        className={
          view.state.out.length > 0 && view.judged
            ? 'font-bold text-spike-text'
            : view.state.even
              ? 'font-bold text-reed'
              : 'text-soft'
        }
      >
        {headStandingWords(view, drum.lugCount)}
      </span>
    </a>
  )
}
