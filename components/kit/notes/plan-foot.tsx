import { Button } from '@/components/ui/button'
import { Notice } from '@/components/ui/notice'
import type { AppError } from '@/lib/errors'
import { WaitingForConnection } from '../waiting-for-connection'
import type { DraftHistory } from './draft-history'
import { drumsWord } from './drums-word'

export interface PlanFootProps {
  /** How many drums differ from the kit. */
  toSet: number
  history: DraftHistory
  /** What is looked at instead of the plan. */
  trying: string | null
  setting: { busy: boolean; tries: number; error: Error | AppError | null }
  onSet: () => void
  onUndo: () => void
  onRedo: () => void
  onKeepTried: () => void
  onLeaveTried: () => void
}

/** What can be done with the plan as a whole, always in reach at the foot of the page. */
export function PlanFoot(props: PlanFootProps) {
  const { toSet, history, trying, setting, onSet, onUndo, onRedo, onKeepTried, onLeaveTried } = props
  const { busy, tries, error } = setting
  const back = history.undo.at(-1)
  const forth = history.redo.at(-1)
  return (
    <div className="sticky bottom-0 z-30 mt-6 flex flex-col gap-2 border-t-2 border-ink bg-paper py-2 sm:py-3">
      <WaitingForConnection busy={busy} tries={tries} what="The plan" />
      {error && !busy && toSet > 0 && (
        <Notice kind="error">
          {error.message} Your plan is kept here; the notes in the kit now stand beside it as rings.
        </Notice>
      )}
      {trying ? (
        <div className="flex flex-wrap items-center gap-x-4 gap-y-2">
          <span className="border-l-4 border-spike pl-2">
            Looking at <strong>{trying}</strong>; the rings are your plan.
          </span>
          <Button kind="primary" onClick={onKeepTried}>
            Keep {trying}
          </Button>
          <Button kind="quiet" onClick={onLeaveTried}>
            Back to my plan
          </Button>
        </div>
      ) : (
        <div className="flex flex-wrap items-center gap-x-3 gap-y-2">
          <Button
            kind="primary"
            disabled={toSet === 0}
            busy={busy && 'Setting the notes'}
            onClick={onSet}
            className="max-sm:basis-full"
          >
            {toSet === 0 ? 'Set notes' : `Set notes for ${drumsWord(toSet)}`}
          </Button>
          <Button disabled={busy || !back} aria-keyshortcuts="Control+Z" onClick={onUndo} className="max-sm:grow">
            {back ? `Undo: ${back.says}` : 'Undo'}
          </Button>
          <Button disabled={busy || !forth} aria-keyshortcuts="Control+Shift+Z" onClick={onRedo}>
            {forth ? `Redo: ${forth.says}` : 'Redo'}
          </Button>
        </div>
      )}
    </div>
  )
}
