'use client'

import { Button } from '@/components/ui/button'
import { DrawnImage } from '@/components/ui/drawn-image'
import { Notice } from '@/components/ui/notice'
import { Table, TableCell, TableHead, TableRow } from '@/components/ui/table'
import { instantWords } from '@/lib/advance/when-words'
import { usePrintBenchLink, useWithdrawBenchLink } from '@/lib/client/bench-links'
import type { BenchLink } from '@/lib/contracts/bench'

export interface BenchLinksProps {
  showId: string
  zone: string | null
  links: readonly BenchLink[]
  mayPrint: boolean
  mayWithdraw: boolean
}

/** The bench link of a show: printed as a QR code for whoever stands at the drums, listed, and withdrawn. */
export function BenchLinks({ showId, zone, links, mayPrint, mayWithdraw }: BenchLinksProps) {
  const print = usePrintBenchLink(showId)
  const withdraw = useWithdrawBenchLink(showId)
  const working = links.some(({ state }) => state === 'works')
  return (
    <section aria-labelledby="links" className="mt-10">
      <div className="flex flex-wrap items-end justify-between gap-3">
        <div>
          <h2 id="links" className="text-2xl">
            Bench link
          </h2>
          <p className="max-w-prose text-soft">
            For whoever tunes the drums at this show: no account, this show’s bench only. Hang the QR code by the riser.
          </p>
        </div>
        {mayPrint && (
          <Button
            kind={working ? 'secondary' : 'primary'}
            busy={print.isPending && 'Making the link'}
            onClick={() => print.mutate()}
          >
            {working ? 'Print the bench link again' : 'Print a bench link'}
          </Button>
        )}
      </div>
      {print.error && (
        <Notice kind="error" className="mt-3">
          {print.error.message}
        </Notice>
      )}
      {print.data && (
        <div role="status" className="mt-3 flex flex-wrap gap-5 border-l-4 border-spike bg-sheet p-4">
          <DrawnImage svg={print.data.qrSvg} alt="QR code of the bench link" className="size-48 border border-ink" />
          <div className="min-w-0 grow basis-72 space-y-2">
            <p className="name text-xl">Shown this once</p>
            <p>Print this page or copy the address now; it is not kept. A lost one is printed again.</p>
            <p className="figures break-all">{print.data.href}</p>
            <div className="flex flex-wrap gap-2">
              <Button onClick={() => void navigator.clipboard.writeText(print.data.href)}>Copy the address</Button>
              <Button onClick={() => window.print()}>Print this page</Button>
              <Button kind="quiet" onClick={() => print.reset()}>
                Put it away
              </Button>
            </div>
            <p className="text-soft">Works until {instantWords(print.data.expiresAt, zone)}.</p>
          </div>
        </div>
      )}
      {withdraw.error && (
        <Notice kind="error" className="mt-3">
          {withdraw.error.message}
        </Notice>
      )}
      {links.length > 0 && (
        <Table
          className="mt-3"
          caption="Bench links of this show"
          captionHidden
          head={
            <>
              <TableHead>Link</TableHead>
              <TableHead>State</TableHead>
              <TableHead numeric>Prints</TableHead>
              <TableHead numeric>Times logged through it</TableHead>
              <TableHead>Last used</TableHead>
              <TableHead>
                <span className="sr-only">Withdraw</span>
              </TableHead>
            </>
          }
        >
          {links.map((link) => (
            <TableRow key={link.grantId}>
              <TableCell>{link.name}</TableCell>
              <TableCell>
                {link.state === 'works' ? `works until ${instantWords(link.expiresAt, zone)}` : link.state}
              </TableCell>
              <TableCell numeric>{link.prints}</TableCell>
              <TableCell numeric>{link.uses}</TableCell>
              <TableCell>{link.lastUsedAt ? instantWords(link.lastUsedAt, zone) : 'not yet'}</TableCell>
              <TableCell className="text-right">
                {mayWithdraw && link.state === 'works' && (
                  <Button
                    busy={withdraw.isPending && withdraw.variables === link.grantId && 'Withdrawing'}
                    onClick={() => withdraw.mutate(link.grantId, { onSuccess: () => print.reset() })}
                  >
                    Withdraw this link
                  </Button>
                )}
              </TableCell>
            </TableRow>
          ))}
        </Table>
      )}
    </section>
  )
}
