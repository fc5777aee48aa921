'use client'

import { useState } from 'react'
import { settleAnswers } from '@/lib/client/answers'
import type { AdvanceLine, AdvanceSaid, AdvanceView } from '@/lib/contracts/advance'
import { LocalTime } from '../desk/local-time'
import { StateLine } from '../signature/state-line'
import type { StateName } from '../signature/state-words'
import { Button } from '../ui/button'
import { Field } from '../ui/field'
import { Notice } from '../ui/notice'
import { TextInput } from '../ui/text-input'
import { isAsAsked } from './is-as-asked'
import { TakeDownForm } from './take-down-form'
import { useAct } from './use-act'

const looks: Record<AdvanceLine['state'], { state: StateName; word: string }> = {
  'not sent': { state: 'none', word: 'not sent' },
  unanswered: { state: 'none', word: 'no answer yet' },
  answered: { state: 'waiting', word: 'answered' },
  settled: { state: 'settled', word: 'settled' },
  'changed since': { state: 'changed', word: 'changed since it was answered' },
}

export interface AdvanceLineItemProps {
  of: AdvanceView['of']
  line: AdvanceLine
  maySettle: boolean
  mayTakeDown: boolean
}

/** One line and its answer side by side, with what can be decided about it and all that was said before. */
export function AdvanceLineItem({ of, line, maySettle, mayTakeDown }: AdvanceLineItemProps) {
  const [open, setOpen] = useState<'take down' | 'ask again' | null>(null)
  const settle = useAct((decision: { decision: 'accept' | 'reopen'; remark: string }) =>
    settleAnswers(of, {
      decisions: [{ id: crypto.randomUUID(), lineId: line.lineId, answerEventId: line.said?.id ?? '', ...decision }],
    }),
  )
  // What can no longer be done about the line closes by itself when the page hears of it.
  const mayStill = open === 'take down' ? line.state !== 'settled' : line.state === 'answered' || line.state === 'settled'
  const shown = mayStill ? open : null
  const asked = line.state === 'unanswered' && line.decided
  const look = asked ? { state: 'changed' as const, word: 'asked again' } : looks[line.state]
  return (
    <StateLine
      as="li"
      state={look.state}
      title={
        <span>
          <span className="figures mr-1 font-normal text-soft">{line.number}</span>{' '}
          {line.words}
        </span>
      }
      detail={[...line.details, ...(line.insteadOf ? [`also welcome: ${line.insteadOf}`] : [])].join('; ')}
      word={look.word}
      actions={
        <div className="grid w-full gap-2 sm:w-80 xl:w-[26rem]">
          {line.said && <Said said={line.said} />}
          {line.decided && (
            <p className="text-sm text-soft">
              {line.state === 'settled' ? 'Settled' : 'Asked again'} by {line.decided.byName}, <LocalTime iso={line.decided.at} />
              {line.decided.remark !== '' && `: ${line.decided.remark}`}
            </p>
          )}
          <div className="flex flex-wrap gap-2">
            {maySettle && line.state === 'answered' && (
              <Button kind={isAsAsked(line) ? 'secondary' : 'primary'} busy={settle.busy && 'Settling'} onClick={() => settle.run({ decision: 'accept', remark: '' })}>
                Settle<span className="sr-only"> line {line.number}</span>
              </Button>
            )}
            {maySettle && (line.state === 'answered' || line.state === 'settled') && (
              <Button aria-expanded={shown === 'ask again'} onClick={() => setOpen(shown === 'ask again' ? null : 'ask again')}>
                Ask again<span className="sr-only"> about line {line.number}</span>
              </Button>
            )}
            {mayTakeDown && line.state !== 'settled' && (
              <Button
                kind={line.said ? 'quiet' : 'secondary'}
                aria-expanded={shown === 'take down'}
                onClick={() => setOpen(shown === 'take down' ? null : 'take down')}
              >
                Take an answer down<span className="sr-only"> for line {line.number}</span>
              </Button>
            )}
          </div>
        </div>
      }
    >
      {line.changes.length > 0 && (
        <ul className="list-inside list-['–_'] text-sm">
          {line.changes.map((change) => (
            <li key={change}>{change}</li>
          ))}
        </ul>
      )}
      {line.history.length > (line.said ? 1 : 0) && (
        <details className="mt-1 text-sm">
          <summary className="flex min-h-7 items-center underline underline-offset-4">
            {line.history.length === 1 ? '1 answer so far' : `${line.history.length} answers so far`}
          </summary>
          <ol className="grid gap-1 py-1">
            {line.history.map((said) => (
              <li key={said.id}>
                <Said said={said} />
              </li>
            ))}
          </ol>
        </details>
      )}
      {settle.trouble && <Notice kind="error">{settle.trouble}</Notice>}
      {shown === 'ask again' && (
        <AskAgain
          busy={settle.busy}
          onAsk={(remark) => {
            settle.run({ decision: 'reopen', remark })
            setOpen(null)
          }}
        />
      )}
      {shown === 'take down' && <TakeDownForm of={of} line={line} onDone={() => setOpen(null)} />}
    </StateLine>
  )
}

function Said({ said }: { said: AdvanceSaid }) {
  return (
    <div className="text-sm">
      <p className="text-[0.9375rem] font-bold">{said.words}</p>
      {said.remark !== '' && <p>{said.remark}</p>}
      <p className="text-soft">
        {said.byName}, {said.how}, <LocalTime iso={said.at} />
      </p>
    </div>
  )
}

function AskAgain({ busy, onAsk }: { busy: boolean; onAsk: (remark: string) => void }) {
  const [remark, setRemark] = useState('')
  return (
    <form
      className="mt-2 flex flex-wrap items-end gap-2"
      onSubmit={(event) => {
        event.preventDefault()
        onAsk(remark.trim())
      }}
    >
      <Field label="What to ask" hint="The recipient reads it beside the line." optional className="grow basis-64">
        {(control) => <TextInput {...control} maxLength={2000} value={remark} onChange={(event) => setRemark(event.target.value)} />}
      </Field>
      <Button type="submit" kind="primary" busy={busy && 'Asking again'}>
        Open the line again
      </Button>
    </form>
  )
}
