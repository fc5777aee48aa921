import { useRef, useState } from 'react'
import type { FormEvent, ReactNode } from 'react'
import { Button } from '@/components/ui/button'
import { Field } from '@/components/ui/field'
import { LiveRegion } from '@/components/ui/live-region'
import { NumberInput } from '@/components/ui/number-input'
import { RadioGroup } from '@/components/ui/radio-group'
import type { BenchSession } from '@/lib/client/bench/bench-session'
import { headView } from '@/lib/client/bench/head-view'
import type { HeadView } from '@/lib/client/bench/head-view'
import type { BenchDrum, BenchHead, BenchReading } from '@/lib/contracts/bench'
import { parseReading } from '@/lib/tuning/reading-limits'
import type { ReadingUnit } from '@/lib/tuning/readings'
import { readingWords } from './bench-words'
import { LugButtons } from './lug-buttons'
import { ReadingCircumstances, usualCircumstances } from './reading-circumstances'

export interface LogFormProps {
  drum: BenchDrum
  head: BenchHead
  view: HeadView
  readBy: ReadingUnit
  session: BenchSession
  name: string
  lug: number
  choose: (lug: number | null) => void
  passFrom: number
  nextPass: () => void
  /** What is seen between the next reading and the lugs: the head itself. */
  children: ReactNode
}

const unitWords: Record<ReadingUnit, string> = { Hz: 'Hz', cents: 'cents', gauge: 'gauge' }

/** Types one reading after another round the head, in the lug order; a lug read before in this pass is corrected. */
export function LogForm(props: LogFormProps) {
  const { drum, head, view, readBy, session, name, lug, choose, passFrom, nextPass, children } = props
  const [typed, setTyped] = useState('')
  const [fault, setFault] = useState<string | null>(null)
  const [side, setSide] = useState<'over' | 'under'>('under')
  const [circumstances, setCircumstances] = useState(usualCircumstances)
  const [last, setLast] = useState<BenchReading | null>(null)
  const [correcting, setCorrecting] = useState<BenchReading | null>(null)
  const input = useRef<HTMLInputElement>(null)
  const at = correcting?.lug ?? lug
  // A phone's number pad has no minus: under or over is chosen beside it. A typed sign is taken as it stands.
  const bySide = readBy === 'cents' && !/^\s*[-+−]/.test(typed)

  function pick(next: number) {
    // Only a lug that is picked is corrected: one that another phone reads meanwhile simply has two readings.
    setCorrecting(view.inPass.get(next) ?? null)
    choose(next)
    setFault(null)
    input.current?.focus()
  }

  function log(event: FormEvent) {
    event.preventDefault()
    const parsed = parseReading(typed, readBy)
    if (parsed.fault !== null) {
      setFault(parsed.fault)
      input.current?.focus()
      return
    }
    const value = bySide && side === 'under' ? -parsed.value : parsed.value
    const reading = session.log({
      ...{ entryId: drum.entryId, side: head.side, lug: at, value, unit: readBy },
      method: readBy === 'gauge' ? 'gauge' : 'tap-typed',
      targetHz: readBy === 'gauge' ? null : (head.tap?.hz ?? null),
      ...circumstances,
      pass: correcting?.pass ?? view.pass,
      strikes: correcting?.id ?? null,
      byName: name,
    })
    const after = headView(session.state().bench.readings, drum, head, { basis: view.basis, passFrom })
    setLast(reading)
    setCorrecting(null)
    setTyped('')
    setFault(null)
    choose(after.nextLug)
    input.current?.focus()
  }

  const following = view.order.find((next) => next !== at && !view.inPass.has(next))
  return (
    <section aria-labelledby="log" className="space-y-3 border-y border-ink pt-2 pb-3">
      <div className="flex flex-wrap items-center justify-between gap-2">
        <h2 id="log" className="text-2xl">
          {correcting ? `Correct lug ${at}` : `Lug ${at}`}
        </h2>
        <p className="figures text-soft">
          pass {correcting?.pass ?? view.pass}, {view.inPass.size} of {drum.lugCount} read
        </p>
      </div>
      <form onSubmit={log} noValidate className="space-y-3">
        {readBy === 'cents' && (
          <RadioGroup
            legend="From the tap pitch"
            name="side"
            value={side}
            onChange={(event) => setSide(event.target.value === 'over' ? 'over' : 'under')}
            options={[
              { value: 'under', label: 'low' },
              { value: 'over', label: 'high' },
            ]}
          />
        )}
        <Field
          id="reading"
          label={
            correcting ? `Lug ${at} reads ${readingWords(correcting)}; type what it should be` : `What lug ${at} reads`
          }
          error={fault ?? undefined}
        >
          {(control) => (
            <NumberInput
              {...control}
              ref={input}
              unit={bySide ? `cents ${side === 'under' ? 'low' : 'high'}` : unitWords[readBy]}
              value={typed}
              enterKeyHint="next"
              maxLength={12}
              onChange={(event) => setTyped(event.target.value)}
              className="text-4xl [&>input]:h-16 [&>input]:text-4xl [&>input]:font-bold"
            />
          )}
        </Field>
        <Button type="submit" kind="primary" className="min-h-16 w-full text-lg">
          {correcting
            ? `Correct lug ${at}`
            : following === undefined
              ? `Keep lug ${at}, end of pass ${view.pass}`
              : `Keep lug ${at}, go to lug ${following}`}
        </Button>
      </form>
      <LiveRegion visible className="flex min-h-12 flex-wrap items-center justify-between gap-x-3">
        {last && (
          <>
            <span>
              Lug {last.lug}, pass {last.pass}: <strong className="figures">{readingWords(last)}</strong> kept.
            </span>
            {correcting?.id !== last.id && (
              <Button
                kind="quiet"
                onClick={() => {
                  setCorrecting(last)
                  choose(last.lug)
                  input.current?.focus()
                }}
              >
                Correct it
              </Button>
            )}
          </>
        )}
      </LiveRegion>
      {children}
      <LugButtons {...{ view, lug: at, pick }} />
      <div className="flex flex-wrap gap-2">
        {correcting && (
          <Button
            onClick={() => {
              setCorrecting(null)
              choose(null)
            }}
          >
            Leave it as it is
          </Button>
        )}
        {view.inPass.size > 0 && <Button onClick={nextPass}>Begin pass {view.pass + 1}</Button>}
      </div>
      <ReadingCircumstances value={circumstances} change={setCircumstances} />
    </section>
  )
}
