'use client'

import { useMemo, useState } from 'react'
import { OpenedForm } from '@/components/form/opened-form'
import { EmptyState } from '@/components/ui/empty-state'
import { Notice } from '@/components/ui/notice'
import { RadioGroup } from '@/components/ui/radio-group'
import { useGauge } from '@/lib/client/gauges'
import type { GaugeWithPairs, KnownHead } from '@/lib/contracts/gauge'
import { FEWEST_PAIRS } from '@/lib/tuning/gauge-calibration'
import type { GaugeCalibration } from '@/lib/tuning/gauge-calibration'
import { GaugeError } from '@/lib/tuning/gauge-error'
import { tryCalibration } from '@/lib/tuning/gauge-of-head'
import { startingGauge } from '@/lib/tuning/gauge-prediction'
import { parseReading } from '@/lib/tuning/reading-limits'
import { CalibrationChart } from './calibration-chart'
import { GaugeHeading } from './gauge-heading'
import type { HeadChoice } from './head-choice'
import { chosenHead } from './head-choice'
import { HeadQuestion } from './head-question'
import { pairCountWords } from './pair-count-words'
import type { PairFormProps, PairStart } from './pair-form'
import { PairForm } from './pair-form'
import type { ListedPair } from './pair-table'
import { PairTable } from './pair-table'

export interface GaugePageProps {
  partyId: string
  initial: GaugeWithPairs
  heads: readonly KnownHead[]
  mayEdit: boolean
}

/** One gauge: its calibration drawn, what it should read on any head, and the pairs it stands on. */
export function GaugePage({ partyId, initial, heads, mayEdit }: GaugePageProps) {
  const { data } = useGauge(partyId, initial)
  const { gauge, pairs } = data
  const standing = useMemo(() => pairs.filter(({ struck }) => !struck), [pairs])
  const { calibration, refusal } = useMemo(
    () => tryCalibration({ name: gauge.name, scale: gauge.scale, pairs: standing }),
    [gauge.name, gauge.scale, standing],
  )
  const edits = mayEdit && !gauge.removed
  const listed = pairs
    .map((row): ListedPair => {
      const index = standing.indexOf(row)
      return {
        row,
        fitted: calibration?.pairs[index] ?? null,
        atFault: refusal?.reason === 'contradict' && refusal.pairs.includes(index),
      }
    })
    .reverse()
  return (
    <>
      <GaugeHeading partyId={partyId} gauge={gauge} mayEdit={mayEdit} />
      {calibration ? (
        <Calibrated calibration={calibration} readings={standing.map(({ reading }) => reading)} heads={heads} />
      ) : (
        <div className="mt-6">
          {refusal.reason === 'too-few' ? (
            <EmptyState
              title={standing.length === 0 ? 'Not calibrated yet' : `${pairCountWords(standing.length)} so far`}
            >
              Read three heads, or three tunings of one head: note what the gauge reads near a lug and the pitch of a
              tap there. From {FEWEST_PAIRS} pairs on the curve is drawn here; five to ten on several heads make it
              sure. Until then its readings are only relative: the same number on the same head, nothing more.
            </EmptyState>
          ) : (
            <Notice kind="error" word="No curve">
              {refusal.message}
            </Notice>
          )}
        </div>
      )}
      <section aria-labelledby="pairs" className="mt-10">
        <h2 id="pairs" className="text-2xl">
          Pairs <span className="figures text-lg text-soft">{standing.length}</span>
        </h2>
        {edits && <AddPairs partyId={partyId} gauge={gauge} heads={heads} first={pairs.length === 0} />}
        {pairs.length > 0 && <PairTable partyId={partyId} pairs={listed} mayEdit={edits} />}
      </section>
    </>
  )
}

function AddPairs(props: {
  partyId: string
  gauge: GaugeWithPairs['gauge']
  heads: readonly KnownHead[]
  first: boolean
}) {
  const { first, ...form } = props
  return (
    <div className="mt-3">
      <OpenedForm action={first ? 'Add the first pair' : 'Add a pair'} kind={first ? 'primary' : 'secondary'}>
        {(close) => <PairRounds {...form} onClose={close} />}
      </OpenedForm>
    </div>
  )
}

/** The form stays open from pair to pair and keeps the head: the next tuning of it needs two numbers only. */
function PairRounds(form: Pick<PairFormProps, 'partyId' | 'gauge' | 'heads' | 'onClose'>) {
  const [round, setRound] = useState<{ number: number; start: PairStart | null; added: number | null }>({
    ...{ number: 1, start: null, added: null },
  })
  return (
    <>
      <PairForm
        key={round.number}
        {...form}
        start={round.start}
        onSaved={(added, start) => setRound({ number: round.number + 1, start, added })}
      />
      <p role="status" className="sr-only">
        {round.added !== null && `The pair at ${round.added} is added.`}
      </p>
    </>
  )
}

function Calibrated(props: {
  calibration: GaugeCalibration
  readings: readonly number[]
  heads: readonly KnownHead[]
}) {
  const { calibration, readings, heads } = props
  const first = heads.find(({ tapHz }) => tapHz !== null)
  const [choice, setChoice] = useState<HeadChoice>({
    ...{ known: first?.words ?? '', diameterIn: '12', depthIn: '8', plyMils: '10' },
  })
  const [tap, setTap] = useState(first?.tapHz?.toFixed(1) ?? '')
  const [axis, setAxis] = useState<'tension' | 'tap'>('tension')
  const head = chosenHead(choice, heads)
  const answer = answerOf(calibration, head?.head ?? null, tap)
  return (
    <>
      <section aria-labelledby="calibration" className="mt-6">
        <div className="flex flex-wrap items-end justify-between gap-x-6 gap-y-2">
          <h2 id="calibration" className="text-2xl">
            Calibration
          </h2>
          <RadioGroup
            legend="Across the drawing"
            legendHidden
            name="axis"
            value={axis}
            onChange={(event) => setAxis(event.target.value === 'tap' ? 'tap' : 'tension')}
            options={[
              { value: 'tension', label: 'Film tension' },
              { value: 'tap', label: 'Tap of the head below', disabled: head === null },
            ]}
          />
        </div>
        <div className="mt-3">
          <CalibrationChart
            calibration={calibration}
            readings={readings}
            head={axis === 'tap' ? head : null}
            asked={answer?.start ?? null}
          />
        </div>
        <p className="mt-2 ml-10 max-w-prose text-sm text-soft">
          Holds from <span className="figures">{(calibration.range.lowNPerM / 1000).toFixed(2)}</span> to{' '}
          <span className="figures">{(calibration.range.highNPerM / 1000).toFixed(2)}</span> kN/m. One hand’s repeats on
          this gauge scatter by about <span className="figures">±{calibration.noise.toFixed(1)}</span>. Pairs of one
          head may all lie to one side: heads differ, and the interval counts that in.
        </p>
      </section>
      <HeadQuestion
        calibration={calibration}
        heads={heads}
        choice={choice}
        onChoice={(next) => {
          setChoice(next)
          const wanted = next.known === choice.known ? null : chosenHead(next, heads)?.tapHz
          if (wanted) setTap(wanted.toFixed(1))
        }}
        tap={tap}
        onTap={setTap}
        head={head}
        answer={answer}
      />
    </>
  )
}

function answerOf(calibration: GaugeCalibration, head: Parameters<typeof startingGauge>[1] | null, tap: string) {
  if (!head || tap.trim() === '') return null
  const typed = parseReading(tap, 'Hz')
  if (typed.value === null) return { start: null, fault: typed.fault }
  try {
    return { start: startingGauge(calibration, head, typed.value), fault: null }
  } catch (error) {
    if (error instanceof GaugeError) return { start: null, fault: error.message }
    throw error
  }
}
