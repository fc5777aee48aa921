import type { ReactNode } from 'react'
import { classes } from './classes'

export type NoticeKind = 'info' | 'wait' | 'error' | 'success'

const kinds: Record<NoticeKind, { edge: string; text: string; word: string }> = {
  info: { edge: 'border-ink', text: 'text-ink', word: 'Note' },
  wait: { edge: 'border-brass', text: 'text-brass', word: 'Waiting' },
  error: { edge: 'border-spike', text: 'text-spike-text', word: 'Not done' },
  success: { edge: 'border-reed', text: 'text-reed', word: 'Done' },
}

export interface NoticeProps {
  kind?: NoticeKind
  /** The word before the text; each kind has its own. */
  word?: ReactNode
  children: ReactNode
  /** What can be done about it: a button or a link. */
  action?: ReactNode
  className?: string
}

/** Something to know. An error says what happened, what is kept and what to do. */
export function Notice({ kind = 'info', word, children, action, className }: NoticeProps) {
  const { edge, text, word: own } = kinds[kind]
  return (
    <div
      role={kind === 'error' ? 'alert' : 'status'}
      className={classes('flex flex-wrap items-center gap-x-4 gap-y-2 border-l-4 bg-sheet px-3 py-2', edge, className)}
    >
      <div className="min-w-0 grow basis-60">
        <strong className={classes('mr-2', text)}>{word ?? own}</strong>
        {children}
      </div>
      {action}
    </div>
  )
}
