import { db } from '@/db/client'
import type { Reply } from '@/lib/contracts/answer'
import type { Actor } from '@/lib/server/auth/actor'
import { assertLink } from '@/lib/server/auth/actor'
import { loadReply, replyLines } from './reply-lines'

/** All that a reply link shows. Reading changes nothing: mail scanners open links too. */
export async function readReply(actor: Actor): Promise<Reply> {
  assertLink(actor, 'reply')
  const { packs, asked, states, closed } = await loadReply(db(), actor)
  const newest = packs[0]
  const shows = [...new Map(packs.flatMap((pack) => pack.document.shows).map((show) => [show.showId, show])).values()]
  return {
    party: newest?.document.party ?? '',
    recipient: newest?.document.recipient.name ?? actor.recipientName,
    title: shows.length === 1 ? `${shows[0]?.title ?? ''}, ${shows[0]?.date ?? ''}` : `${shows.length} shows, ${shows[0]?.date ?? ''} to ${shows.at(-1)?.date ?? ''}`,
    spec: packs.map(({ spec }) => spec).join('; '),
    due: newest?.document.answersDue ?? null,
    shows: shows.map(({ title, date }) => ({ title, date })),
    lines: await replyLines(db(), actor, asked, states),
    closed,
    pdfs: packs.filter((pack) => pack.pdfBlobId).map((pack) => ({ packId: pack.packId, spec: pack.spec, pages: pack.pdfPages })),
  }
}
