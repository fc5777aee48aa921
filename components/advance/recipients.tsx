'use client'

import type { Route } from 'next'
import Link from 'next/link'
import { useEffect, useState } from 'react'
import { stopDispatch } from '@/lib/client/dispatch'
import type { AdvanceRecipient, AdvanceSending } from '@/lib/contracts/advance'
import { LocalTime } from '../desk/local-time'
import { StandingBadge } from '../signature/standing-badge'
import { Button } from '../ui/button'
import { Notice } from '../ui/notice'
import { LinkTools } from './link-tools'
import { useAct } from './use-act'

const fateWords: Record<AdvanceSending['fate'], string> = {
  waiting: 'waits to go out',
  stopped: 'stopped, never sent',
  out: 'sent',
  delivered: 'delivered',
  'not delivered': 'not delivered',
}

export interface RecipientsProps {
  tourId: string
  recipients: readonly AdvanceRecipient[]
  maySend: boolean
  mayWithdraw: boolean
}

/** Everybody of this show or hire: standing, what was sent when and what became of it, and the link each holds. */
export function Recipients({ tourId, recipients, maySend, mayWithdraw }: RecipientsProps) {
  return (
    <ul className="grid gap-4">
      {recipients.map((person) => (
        <li key={person.contactId} className="border-t border-line pt-2">
          <p className="flex flex-wrap items-center justify-between gap-x-3">
            <strong>{person.name}</strong>
            <StandingBadge standing={person.standing} />
          </p>
          <p className="text-sm break-words text-soft">
            {person.email}
            {person.duties.length > 0 && `, ${person.duties.join(', ')}`}
          </p>
          <ol className="mt-1 grid gap-1">
            {person.sendings.map((sending) => (
              <Sending key={sending.dispatchId} tourId={tourId} sending={sending} maySend={maySend} mended={sending.toAddress !== person.email} />
            ))}
          </ol>
          {person.links.map((link) => (
            <LinkTools key={link.grantId} link={link} name={person.name} mayPrint={maySend} mayWithdraw={mayWithdraw} />
          ))}
        </li>
      ))}
    </ul>
  )
}

function Sending(props: { tourId: string; sending: AdvanceSending; maySend: boolean; mended: boolean }) {
  const { tourId, sending, maySend, mended } = props
  return (
    <li className="text-sm">
      <Link className="underline underline-offset-4" href={`/tours/${tourId}/revisions/packs/${sending.packId}` as Route}>
        {sending.spec}
      </Link>
      , {fateWords[sending.fate]} <span className="text-soft">
        <LocalTime iso={sending.at} /> by {sending.by}
      </span>
      {sending.failure !== '' && (
        <p className="font-bold text-spike-text">
          {sending.failure}{' '}
          {mended ? 'The address was mended since: send it again.' : `Mend ${sending.toAddress} in the directory, then send it again.`}
        </p>
      )}
      {sending.heldUntil && maySend && <StopIt dispatchId={sending.dispatchId} heldUntil={sending.heldUntil} />}
    </li>
  )
}

/** Counts the seconds that are left to stop a sending that is held back. */
function StopIt({ dispatchId, heldUntil }: { dispatchId: string; heldUntil: string }) {
  const [left, setLeft] = useState<number | null>(null)
  const stop = useAct(stopDispatch)
  useEffect(() => {
    const tick = () => setLeft(Math.max(0, Math.ceil((Date.parse(heldUntil) - Date.now()) / 1000)))
    const timer = setInterval(tick, 500)
    return () => clearInterval(timer)
  }, [heldUntil])
  if (left === 0) return null
  return (
    <div className="flex flex-wrap items-center gap-2 py-1">
      <Button kind="primary" busy={stop.busy && 'Stopping'} onClick={() => stop.run(dispatchId)}>
        Stop it
      </Button>
      <span className="text-brass">
        goes out in <span className="figures">{left ?? '…'}</span> s
      </span>
      {stop.trouble && <Notice kind="error">{stop.trouble}</Notice>}
    </div>
  )
}
