import { LiveRegion } from '@/components/ui/live-region'

export interface WaitingForConnectionProps {
  busy: boolean
  /** How often it was sent in vain. */
  tries: number
  /** What is kept ("What you typed"). */
  what: string
}

/** Says that there is no connection, what is kept, and that it is sent again by itself. */
export function WaitingForConnection({ busy, tries, what }: WaitingForConnectionProps) {
  const waiting = busy && tries > 0
  return (
    <LiveRegion visible className={waiting ? 'border-l-4 border-brass bg-paper px-3 py-2' : ''}>
      {waiting && (
        <>
          <strong className="mr-2 text-brass">No connection</strong>
          {what} is kept here and sent again by itself, tried {tries === 1 ? 'once' : `${tries} times`} so far. Keep
          this page open.
        </>
      )}
    </LiveRegion>
  )
}
