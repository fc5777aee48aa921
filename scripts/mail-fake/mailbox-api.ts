import type { IncomingMessage } from 'node:http'
import type { Answer } from './answer'
import { json } from './answer'
import type { MailFilter, MailStore } from './mail-store'
import type { StoredMail } from './stored-mail'
import { lastEventOf } from './stored-mail'

const LONGEST_WAIT_MS = 30_000

export function attachmentPath(mail: StoredMail, index: number): string {
  return `/mail/${mail.id}/attachments/${index}`
}

/** The addresses a mail links to, in order, each once. */
export function linksOf(mail: StoredMail): string[] {
  const inHtml = [...(mail.html ?? '').matchAll(/<a\s[^>]*?href="([^"]+)"/gi)].map((match) => (match[1] ?? '').replaceAll('&amp;', '&'))
  const inText = [...(mail.text ?? '').matchAll(/https?:\/\/[^\s<>")]+/g)].map((match) => match[0])
  return [...new Set([...inHtml, ...inText])]
}

function shown(mail: StoredMail) {
  return {
    id: mail.id,
    createdAt: mail.createdAt,
    from: mail.from,
    to: mail.to,
    cc: mail.cc,
    bcc: mail.bcc,
    replyTo: mail.replyTo,
    subject: mail.subject,
    html: mail.html,
    text: mail.text,
    headers: mail.headers,
    tags: mail.tags,
    links: linksOf(mail),
    attachments: mail.attachments.map((attachment, index) => ({ ...attachment, path: attachmentPath(mail, index) })),
    lastEvent: lastEventOf(mail),
    events: mail.events,
  }
}

function filterOf(query: URLSearchParams): MailFilter {
  const to = query.get('to')
  const subject = query.get('subject')
  return { ...(to !== null && { to }), ...(subject !== null && { subject }) }
}

/**
 * The mailbox as JSON, for tests: `GET /api/mails?to=&subject=&wait=`, newest first; `DELETE /api/mails` empties it.
 * `wait` holds the answer back until a mail fits, so many milliseconds at most. Null for another path.
 */
export async function answerAsMailbox(
  request: IncomingMessage,
  url: URL,
  { store, untilMail }: { store: MailStore; untilMail: (timeoutMs: number) => Promise<void> },
): Promise<Answer | null> {
  if (url.pathname !== '/api/mails') return null
  if (request.method === 'DELETE') {
    store.clear()
    return { status: 204 }
  }
  if (request.method !== 'GET') return json(405, { message: 'GET or DELETE only.' })
  const filter = filterOf(url.searchParams)
  const until = Date.now() + Math.min(Number(url.searchParams.get('wait') ?? 0) || 0, LONGEST_WAIT_MS)
  let found = store.list(filter)
  while (found.length === 0 && Date.now() < until) {
    await untilMail(until - Date.now())
    found = store.list(filter)
  }
  return json(200, { mails: found.map(shown) })
}
