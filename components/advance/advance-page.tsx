'use client'

import { settleAnswers } from '@/lib/client/answers'
import type { AdvanceView } from '@/lib/contracts/advance'
import { LocalTime } from '../desk/local-time'
import { ShowBar } from '../signature/show-bar'
import { StandingBadge } from '../signature/standing-badge'
import { Button } from '../ui/button'
import { EmptyState } from '../ui/empty-state'
import { Notice } from '../ui/notice'
import { AdvanceLineItem } from './advance-line-item'
import { isAsAsked } from './is-as-asked'
import { Recipients } from './recipients'
import { SendPanel } from './send-panel'
import { useAct } from './use-act'

export interface AdvancePageProps {
  view: AdvanceView
  maySend: boolean
  maySettle: boolean
  mayTakeDown: boolean
  mayWithdraw: boolean
}

/** The advance of one show or hire: lines and answers side by side, recipients and their standing, and the sending. */
export function AdvancePage({ view, maySend, maySettle, mayTakeDown, mayWithdraw }: AdvancePageProps) {
  return (
    <main id="main" className="mx-auto max-w-7xl px-4 pt-6 pb-16 sm:px-6">
      <header className="flex flex-wrap items-end justify-between gap-x-8 gap-y-2">
        <div>
          <h1 className="text-4xl">
            Advance <span className="text-soft">{view.title}</span>
          </h1>
          <p className="mt-1">{view.due ? `Answers due ${view.due}` : 'No date is set for the answers'}</p>
        </div>
        <div className="grid min-w-48 gap-1">
          <StandingBadge standing={view.standing} />
          <ShowBar counts={view.counts} />
          <p className="text-sm text-soft">{countWords(view)}</p>
        </div>
      </header>
      {view.unsentChange && (
        <Notice kind="info" word="Changed since" className="mt-4">
          Revision {view.unsentChange.number} of {view.unsentChange.rigName} asks for something else than what was sent. Send it, and only the lines
          that changed are asked again.
        </Notice>
      )}
      {view.closed.map((entry) => (
        <Notice key={entry.at} kind="success" word="All from them" className="mt-4">
          {entry.byName} said that this is all, <LocalTime iso={entry.at} />.
        </Notice>
      ))}
      <div className="mt-6 grid gap-x-10 gap-y-8 lg:grid-cols-[minmax(0,1fr)_24rem]">
        <section aria-labelledby="lines">
          <div className="flex flex-wrap items-center justify-between gap-2">
            <h2 id="lines" className="text-2xl">
              Lines and answers
            </h2>
            {maySettle && <SettleAsAsked view={view} />}
          </div>
          {view.lines.length === 0 ? (
            <div className="mt-3">
              <EmptyState title="Nothing is asked here yet">
                Once a revision is issued, each thing of its kit that is to come from here becomes a line. What a hire covers
                is asked of its supplier.
              </EmptyState>
            </div>
          ) : (
            <ol className="mt-3 grid gap-2">
              {view.lines.map((line) => (
                <AdvanceLineItem key={`${line.lineId} ${line.hash}`} of={view.of} line={line} maySettle={maySettle} mayTakeDown={mayTakeDown} />
              ))}
            </ol>
          )}
        </section>
        <div className="grid content-start gap-8">
          {maySend && (
            <section aria-labelledby="send">
              <h2 id="send" className="mb-3 text-2xl">
                Send
              </h2>
              <SendPanel view={view} />
            </section>
          )}
          <section aria-labelledby="recipients">
            <h2 id="recipients" className="mb-3 text-2xl">
              Recipients
            </h2>
            {view.recipients.length === 0 ? (
              <p className="text-soft">Nobody with a duty is in the directory for this place yet.</p>
            ) : (
              <Recipients tourId={view.tourId} recipients={view.recipients} maySend={maySend} mayWithdraw={mayWithdraw} />
            )}
          </section>
        </div>
      </div>
    </main>
  )
}

function countWords({ counts, lines }: AdvanceView): string {
  if (!counts) return lines.length === 1 ? '1 line, not sent' : `${lines.length} lines, not sent`
  return `${counts.settled} settled, ${counts.waiting} waiting, ${counts.changed} changed`
}

/** What came out as asked needs no thought: one press settles all of it. */
function SettleAsAsked({ view }: { view: AdvanceView }) {
  const lines = view.lines.filter(isAsAsked)
  const settle = useAct(() =>
    settleAnswers(view.of, {
      decisions: lines.map((line) => ({
        id: crypto.randomUUID(),
        lineId: line.lineId,
        answerEventId: line.said?.id ?? '',
        decision: 'accept',
        remark: '',
      })),
    }),
  )
  return (
    <>
      {lines.length > 1 && (
        <Button kind="primary" busy={settle.busy && 'Settling'} onClick={() => settle.run(undefined)}>
          Settle {lines.length} lines as asked
        </Button>
      )}
      {settle.trouble && <Notice kind="error">{settle.trouble}</Notice>}
    </>
  )
}
