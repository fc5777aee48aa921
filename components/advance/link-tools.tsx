'use client'

import { printLink, withdrawLink } from '@/lib/client/dispatch'
import type { AdvanceLink } from '@/lib/contracts/advance'
import { LocalTime } from '../desk/local-time'
import { Button } from '../ui/button'
import { Dialog } from '../ui/dialog'
import { DrawnImage } from '../ui/drawn-image'
import { Notice } from '../ui/notice'
import { useAct } from './use-act'

/** A recipient's link: when it was last used, another print of it, and its end. */
export function LinkTools({ link, name, mayPrint, mayWithdraw }: { link: AdvanceLink; name: string; mayPrint: boolean; mayWithdraw: boolean }) {
  const print = useAct(printLink)
  const withdraw = useAct(withdrawLink)
  const works = link.state === 'works'
  return (
    <div className="mt-1 text-sm">
      <p className="text-soft">
        {works ? 'Link works until ' : link.state === 'expired' ? 'Link ran out ' : 'Link withdrawn'}
        {link.state !== 'withdrawn' && <LocalTime iso={link.expiresAt} />}
        {link.lastUsedAt ? (
          <>
            , last used <LocalTime iso={link.lastUsedAt} />
          </>
        ) : (
          ', not used yet'
        )}
      </p>
      {works && (
        <div className="-ml-4 flex flex-wrap">
          {mayPrint && (
            <Button kind="quiet" busy={print.busy && 'Making a link'} onClick={() => print.run(link.grantId)}>
              Print a fresh link<span className="sr-only"> for {name}</span>
            </Button>
          )}
          {mayWithdraw && (
            <Button kind="quiet" busy={withdraw.busy && 'Withdrawing'} onClick={() => withdraw.run(link.grantId)}>
              Withdraw the link<span className="sr-only"> of {name}</span>
            </Button>
          )}
        </div>
      )}
      {print.trouble && <Notice kind="error">{print.trouble}</Notice>}
      {withdraw.trouble && <Notice kind="error">{withdraw.trouble}</Notice>}
      <Dialog
        open={print.answer !== null}
        onOpenChange={(open) => {
          if (!open) print.forget()
        }}
        title={`A fresh link for ${name}`}
        description="Shown this once: it is not stored. Whoever holds it can answer in this name."
      >
        {print.answer && (
          <div className="grid justify-items-center gap-3">
            <DrawnImage svg={print.answer.qrSvg} alt="The link as a QR code" className="size-56 bg-sheet" />
            <p className="figures text-sm break-all select-all">{print.answer.href}</p>
          </div>
        )}
      </Dialog>
    </div>
  )
}
