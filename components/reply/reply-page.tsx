'use client'

import { useState } from 'react'
import { asAskedAnswer } from '@/lib/advance/answer'
import { linesWithWaiting } from '@/lib/client/reply/reply-session'
import type { Reply, ReplyLine } from '@/lib/contracts/answer'
import { Button } from '../ui/button'
import { LiveRegion } from '../ui/live-region'
import { Notice } from '../ui/notice'
import { Progress } from '../ui/progress'
import { AllAsAsked } from './all-as-asked'
import type { AnswerFormProps } from './answer-form'
import { NameForm } from './name-form'
import { ReplyLineItem } from './reply-line-item'
import { useAnswererName, useReply } from './use-reply'

type Said = Parameters<AnswerFormProps['onAnswer']>[0]
/** What was pressed before the name was known, to be done with it. */
type Wanting = { lineId: string | null; act: (name: string) => void }

const isOpen = (line: ReplyLine) => line.state === 'unanswered' || line.state === 'changed since'

/** The reply page: who asks what, line by line, kept as it is answered. */
export function ReplyPage({ initial, token }: { initial: Reply; token: string }) {
  const { session, state } = useReply(initial, token)
  const [name, setName] = useAnswererName()
  const [openId, setOpenId] = useState<string | null>(() => initial.lines.find(isOpen)?.lineId ?? null)
  const [moved, setMoved] = useState(false)
  const [wanting, setWanting] = useState<Wanting | null>(null)
  const [renaming, setRenaming] = useState(false)
  const [allOpen, setAllOpen] = useState(false)

  const lines = linesWithWaiting(state.reply, state.waiting)
  const open = lines.filter(isOpen)
  const answered = lines.length - open.length
  // A line's number is its own only within the rig that asks for it.
  const specs = [...new Set(lines.map((line) => line.spec))]
  const settled = lines.every((line) => line.state === 'settled')
  const closing = state.waiting.some((event) => event.kind === 'close')

  function withName(lineId: string | null, act: (name: string) => void) {
    if (name === '') setWanting({ lineId, act })
    else act(name)
  }
  function answer(line: ReplyLine, said: Said) {
    withName(line.lineId, (byName) => {
      session.answer(line, { ...said, byName })
      const at = lines.findIndex((other) => other.lineId === line.lineId)
      const next = [...lines.slice(at + 1), ...lines.slice(0, at)].find(isOpen)
      setOpenId(next?.lineId ?? null)
      setMoved(true)
    })
  }
  function answerAll(chosen: readonly ReplyLine[]) {
    withName(null, (byName) => {
      for (const line of chosen) session.answer(line, { content: asAskedAnswer(line.count), remark: '', byName })
      const left = open.find((line) => !chosen.some((other) => other.lineId === line.lineId))
      setOpenId(left?.lineId ?? null)
      setMoved(true)
      setAllOpen(false)
    })
  }
  const nameForm = (
    <NameForm
      key={wanting?.lineId ?? 'all'}
      initial={name}
      focus
      keepLabel={wanting ? 'Keep my name and the answer' : 'Keep my name'}
      onName={(given) => {
        setName(given)
        wanting?.act(given)
        setWanting(null)
        setRenaming(false)
      }}
    />
  )

  return (
    <main id="main" className="thumb mx-auto grid max-w-xl gap-4 px-4 pt-4 pb-16">
      <ReplyHead reply={state.reply} token={token} />
      {state.ended && <Notice kind="error" word="Ended">{state.ended}</Notice>}
      {lines.length > 0 && <Progress label={`${answered} of ${lines.length} answered, kept as you go`} done={answered} total={lines.length} />}
      <Unsent count={state.waiting.length} keeps={state.keeps} />
      {state.refusals[''] && <Notice kind="error">{state.refusals['']}</Notice>}
      {lines.length === 0 && (
        <Notice word="Nothing to answer">This pack asks nothing of you. The PDF holds the plot, the channel list and the sheets.</Notice>
      )}
      {wanting && wanting.lineId === null && nameForm}
      {allOpen ? (
        <AllAsAsked lines={open} onAnswer={answerAll} onClose={() => setAllOpen(false)} />
      ) : (
        specs.map((spec) => (
          <section key={spec} aria-label={spec} className="grid gap-2">
            <h2 className={specs.length > 1 ? 'text-xl first-letter:uppercase' : 'sr-only'}>{spec}</h2>
            <ol className="grid gap-2">
              {lines
                .filter((line) => line.spec === spec)
                .map((line) =>
                  wanting?.lineId === line.lineId ? (
                    <li key={line.lineId}>{nameForm}</li>
                  ) : (
                    <ReplyLineItem
                      key={line.lineId}
                      line={line}
                      open={openId === line.lineId}
                      focus={moved}
                      refusal={state.refusals[line.lineId]}
                      onOpen={() => {
                        setOpenId(line.lineId)
                        setMoved(true)
                      }}
                      onAnswer={(said) => answer(line, said)}
                    />
                  ),
                )}
            </ol>
          </section>
        ))
      )}
      {open.length > 1 && !allOpen && (
        <Button kind="quiet" onClick={() => setAllOpen(true)}>
          All as asked except…
        </Button>
      )}
      {lines.length > 0 && !allOpen && (
        <section aria-label="When you are done" className="grid gap-2 border-t border-ink pt-4">
          {settled ? (
            <Notice kind="success" word="Settled">
              Every line is settled. Nothing more is asked of you.
            </Notice>
          ) : state.reply.closed || closing ? (
            <Notice kind="success" word="All from you">
              You said that this is all.
              {open.length > 0 && ` ${open.length === 1 ? '1 line has' : `${open.length} lines have`} no answer yet.`} Until a
              line is settled you can still change it.
            </Notice>
          ) : (
            <Button kind={open.length === 0 ? 'primary' : 'secondary'} onClick={() => withName(null, (byName) => session.close(byName))}>
              That&apos;s all from us
            </Button>
          )}
        </section>
      )}
      {name !== '' && (renaming ? nameForm : <AnsweringAs name={name} onChange={() => setRenaming(true)} />)}
      <LiveRegion>{`${answered} of ${lines.length} answered`}</LiveRegion>
    </main>
  )
}

function AnsweringAs({ name, onChange }: { name: string; onChange: () => void }) {
  return (
    <p className="flex flex-wrap items-center gap-x-2 text-sm text-soft">
      You answer as <strong className="text-ink">{name}</strong>
      <Button kind="quiet" onClick={onChange}>
        Change the name
      </Button>
    </p>
  )
}

function ReplyHead({ reply, token }: { reply: Reply; token: string }) {
  return (
    <header>
      <p className="name text-base">
        {reply.party} asks {reply.recipient}
      </p>
      <h1 className="mt-1 text-3xl">{reply.title}</h1>
      <p className="mt-2 text-soft first-letter:uppercase">
        {reply.spec}.{reply.due && ` Please answer by ${reply.due}, your time.`}
      </p>
      {reply.shows.length > 1 && (
        <details className="mt-1">
          <summary className="flex min-h-control items-center underline underline-offset-4">The {reply.shows.length} shows</summary>
          <ul className="grid gap-1 pb-2">
            {reply.shows.map((show) => (
              <li key={`${show.date} ${show.title}`}>
                <span className="figures">{show.date}</span> {show.title}
              </li>
            ))}
          </ul>
        </details>
      )}
      {reply.pdfs.map((pdf) => (
        <p key={pdf.packId}>
          <a
            href={`/api/r/${token}/pdf?pack=${pdf.packId}`}
            download
            className="inline-flex min-h-control items-center underline underline-offset-4"
          >
            {reply.pdfs.length > 1 ? `Download the pack, ${pdf.spec}` : 'Download the pack'}
            {pdf.pages !== null && ` (PDF, ${pdf.pages} pages)`}
          </a>
        </p>
      ))}
    </header>
  )
}

function Unsent({ count, keeps }: { count: number; keeps: boolean }) {
  if (count === 0) return null
  const what = count === 1 ? '1 answer' : `${count} answers`
  return (
    <Notice kind="wait" word="Not sent yet">
      {keeps
        ? `${what} kept on this phone. They go out by themselves as soon as there is a connection.`
        : `${what} held on this page only, because this phone keeps nothing. Leave the page open until they are sent.`}
    </Notice>
  )
}
