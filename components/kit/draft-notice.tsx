import { Button } from '@/components/ui/button'
import { Notice } from '@/components/ui/notice'

export interface DraftNoticeProps {
  name: string
  onGoOn: () => void
  onDrop: () => void
}

/** A form was left with something typed in it: it is kept, and this is the way back to it. */
export function DraftNotice({ name, onGoOn, onDrop }: DraftNoticeProps) {
  return (
    <Notice
      kind="wait"
      word="Not saved"
      action={
        <span className="flex flex-wrap gap-2">
          <Button onClick={onGoOn}>Go on with {name}</Button>
          <Button kind="quiet" onClick={onDrop}>
            Let it go
          </Button>
        </span>
      }
    >
      What you typed for {name} is kept here.
    </Notice>
  )
}
