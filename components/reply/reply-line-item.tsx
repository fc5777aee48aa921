'use client'

import { useEffect, useRef } from 'react'
import type { AnswerContent } from '@/lib/advance/answer'
import type { ReplyLine } from '@/lib/contracts/answer'
import { StateLine } from '../signature/state-line'
import { Button } from '../ui/button'
import { FieldError } from '../ui/field'
import { AnswerForm } from './answer-form'
import { lineLook } from './line-look'

export interface ReplyLineItemProps {
  line: ReplyLine & { unsent: boolean }
  open: boolean
  /** Takes the focus when it opens after the line before was answered. */
  focus: boolean
  refusal: string | undefined
  onOpen: () => void
  onAnswer: (said: { content: AnswerContent; remark: string }) => void
}

/** One line of the reply page: closed with its state on the left edge, open with its buttons, or locked once it is settled. */
export function ReplyLineItem({ line, open, focus, refusal, onOpen, onAnswer }: ReplyLineItemProps) {
  const { state, word } = lineLook(line)
  const heading = useRef<HTMLHeadingElement>(null)
  const settled = line.state === 'settled'
  useEffect(() => {
    if (open && focus) heading.current?.focus()
  }, [open, focus])
  const openLabel = line.state === 'answered' ? 'Change' : 'Answer'
  return (
    <StateLine
      as="li"
      state={state}
      id={`line-${line.lineId}`}
      className={open && !settled ? 'outline-2 -outline-offset-2 outline-ink' : undefined}
      title={
        <h3 ref={heading} tabIndex={-1} className="font-text text-base leading-snug font-bold">
          <span className="figures mr-1 font-normal text-soft">{line.number}</span>{' '}
          {line.words}
        </h3>
      }
      detail={open || settled ? line.details.join('; ') : undefined}
      word={
        <>
          {word}
          {line.unsent && <span className="block text-brass">kept on this phone, not sent yet</span>}
        </>
      }
      actions={
        !open && !settled ? (
          <Button onClick={onOpen} aria-label={`${openLabel} line ${line.number}, ${line.words}`}>
            {openLabel}
          </Button>
        ) : undefined
      }
    >
      <LineNotes line={line} />
      {refusal && (
        <div role="alert" className="mt-2">
          <FieldError id={`refusal-${line.lineId}`}>{refusal}</FieldError>
        </div>
      )}
      {open && !settled && (
        <div className="mt-3">
          {line.insteadOf && <p className="mb-2 text-sm text-soft">Also welcome without asking: {line.insteadOf}.</p>}
          {/* A changed line begins afresh: the old answer is shown above, not assumed. */}
          <AnswerForm key={line.hash} line={line} before={line.state === 'answered' ? line.answer : null} onAnswer={onAnswer} />
        </div>
      )}
    </StateLine>
  )
}

/** What a reader must know before answering again, and what goes with the answer. */
function LineNotes({ line }: { line: ReplyLine }) {
  const before = line.state === 'changed since' && line.answer ? lineLook({ ...line, state: 'answered' }).word : null
  return (
    <>
      {line.changes.length > 0 && (
        <ul className="mt-1 list-inside list-['–_'] text-sm">
          {line.changes.map((change) => (
            <li key={change}>{change}</li>
          ))}
        </ul>
      )}
      {before && <p className="mt-1 text-sm text-soft">Answered before: {before}</p>}
      {line.askedAgain && (
        <p className="mt-1 text-sm">
          {line.askedAgain.remark === '' ? 'They ask about this again.' : `They ask: ${line.askedAgain.remark}`}
        </p>
      )}
      {line.answer && line.answer.remark !== '' && <p className="mt-1 text-sm">{line.answer.remark}</p>}
      {line.answer && <p className="text-sm text-soft">{line.answer.byName}</p>}
    </>
  )
}
