import type { ReactNode } from 'react'
import { classes } from '@/components/ui/classes'
import { stateLooks } from './state-words'
import type { StateName } from './state-words'

export interface StateLineProps {
  state: StateName
  /** The state in the words of this line ("instead: 16 across, 16 deep"); each state has its own otherwise. */
  word?: ReactNode
  title: ReactNode
  /** Quiet text under the title. */
  detail?: ReactNode
  /** What can be done with the line. */
  actions?: ReactNode
  /** More beneath it, such as an open form. */
  children?: ReactNode
  as?: 'li' | 'div'
  id?: string
  className?: string
}

/** One thing with its state on its left edge and, always, in a word. */
export function StateLine(props: StateLineProps) {
  const { state, word, title, detail, actions, children, as: Tag = 'div', id, className } = props
  const look = stateLooks[state]
  return (
    <Tag id={id} data-state={state} className={classes('bg-sheet px-3 py-2', look.edge, className)}>
      <div className="flex flex-wrap items-center gap-x-4 gap-y-1 lg:items-start">
        <div className="min-w-0 grow basis-52">
          <div className="font-bold">{title}</div>
          {detail && <div className="text-sm text-soft">{detail}</div>}
          <div className={classes('font-bold', look.text)}>{word ?? look.word}</div>
        </div>
        {actions && <div className="flex flex-wrap gap-2">{actions}</div>}
      </div>
      {children}
    </Tag>
  )
}
