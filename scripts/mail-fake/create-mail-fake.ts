import { EventEmitter, once } from 'node:events'
import type { IncomingMessage, Server, ServerResponse } from 'node:http'
import { createServer } from 'node:http'
import type { Answer } from './answer'
import { give, html, json, seeOther } from './answer'
import type { WebhookTarget } from './fate-teller'
import { FateTeller } from './fate-teller'
import { MailStore } from './mail-store'
import { answerAsMailbox } from './mailbox-api'
import { framedHtml, listPage, listScript, mailPage, missingPage } from './mailbox-page'
import { answerAsProvider } from './provider-api'
import { readBody } from './read-body'
import type { Fate, StoredMail } from './stored-mail'
import { FATES } from './stored-mail'

const MOST_FORM_BYTES = 1000
const PAGE_POLICY = "default-src 'none'; style-src 'unsafe-inline'; script-src 'self'; connect-src 'self'; frame-src 'self'; form-action 'self'; base-uri 'none'; frame-ancestors 'none'"
/** Scripts are allowed by the sandbox for browser tests, which reach into a frame by them, and forbidden to the mail itself by default-src. */
const MAIL_POLICY = "sandbox allow-scripts allow-popups allow-popups-to-escape-sandbox; default-src 'none'; style-src 'unsafe-inline'; img-src data: http: https:; font-src data: http: https:"
/** Shown in the browser; anything else a mail brings is only to be saved. */
const OPENED_TYPES = /^(application\/pdf|image\/(png|jpeg|gif|webp)|text\/plain)$/

export interface MailFakeOptions {
  folder: string
  apiKey: string
  webhook: WebhookTarget
}

export interface MailFake {
  server: Server
  close: () => Promise<void>
}

function attachmentAnswer(store: MailStore, mail: StoredMail, index: number, download: boolean): Answer | null {
  const about = mail.attachments[index]
  const bytes = store.attachment(mail, index)
  if (!about || !bytes) return null
  const opened = OPENED_TYPES.test(about.contentType) && !download
  const name = `filename="attachment"; filename*=UTF-8''${encodeURIComponent(about.filename)}`
  return {
    status: 200,
    headers: { 'content-type': opened ? about.contentType : 'application/octet-stream', 'content-disposition': `${opened ? 'inline' : 'attachment'}; ${name}` },
    body: bytes,
  }
}

/** A stand-in for the mail provider on this machine: its HTTP API, its webhooks, and a mailbox page to read what was sent. */
export function createMailFake({ folder, apiKey, webhook }: MailFakeOptions): MailFake {
  const store = new MailStore(folder)
  const teller = new FateTeller(store, webhook)
  const news = new EventEmitter().setMaxListeners(0)
  const untilMail = async (timeoutMs: number): Promise<void> => {
    await once(news, 'mail', { signal: AbortSignal.timeout(Math.max(timeoutMs, 1)) }).catch(() => undefined)
  }

  function followNews(response: ServerResponse): void {
    response.writeHead(200, { 'content-type': 'text/event-stream', 'cache-control': 'no-store' })
    response.write(': open\n\n')
    const tell = (mail: StoredMail) => response.write(`event: mail\ndata: ${mail.id}\n\n`)
    news.on('mail', tell)
    response.on('close', () => news.off('mail', tell))
  }

  async function mailAnswer(request: IncomingMessage, url: URL, mail: StoredMail, rest: string): Promise<Answer | null> {
    if (request.method === 'POST' && rest === '/events') {
      if (request.headers['sec-fetch-site'] === 'cross-site') return json(403, { message: 'Not from another site.' })
      const form = new URLSearchParams((await readBody(request, MOST_FORM_BYTES))?.toString('utf8'))
      const type = FATES.find((fate: Fate) => fate === form.get('type'))
      if (!type) return json(422, { message: `type has to be one of ${FATES.join(', ')}` })
      await teller.happen(mail, type)
      return seeOther(`/mail/${mail.id}`)
    }
    if (request.method !== 'GET') return null
    if (rest === '') return html(200, mailPage(mail), { 'content-security-policy': PAGE_POLICY })
    if (rest === '/html') return html(200, framedHtml(mail), { 'content-security-policy': MAIL_POLICY })
    const index = /^\/attachments\/(\d{1,3})$/.exec(rest)?.[1]
    return index === undefined ? null : attachmentAnswer(store, mail, Number(index), url.searchParams.has('download'))
  }

  async function answer(request: IncomingMessage, url: URL): Promise<Answer> {
    const onMail = (mail: StoredMail) => news.emit('mail', mail)
    const given =
      (await answerAsProvider(request, url.pathname, { store, teller, apiKey, onMail })) ?? (await answerAsMailbox(request, url, { store, untilMail }))
    if (given) return given
    if (url.pathname === '/health') return json(200, { ok: true })
    if (url.pathname === '/') {
      return html(200, listPage(store.list(Object.fromEntries(url.searchParams))), { 'content-security-policy': PAGE_POLICY })
    }
    if (url.pathname === '/mailbox.js') return { status: 200, headers: { 'content-type': 'text/javascript' }, body: listScript }
    const [, id = '', rest = ''] = /^\/mail\/([0-9a-f-]{36})(\/.*)?$/.exec(url.pathname) ?? []
    const mail = store.get(id)
    return (mail && (await mailAnswer(request, url, mail, rest))) ?? html(404, missingPage())
  }

  const server = createServer((request, response) => {
    const url = new URL(request.url ?? '/', 'http://mailbox.invalid')
    // A page from elsewhere must not read the mailbox through a name that it points at this machine.
    if (!/^(127\.0\.0\.1|localhost|\[::1\])(:\d+)?$/.test(request.headers.host ?? '')) {
      return give(response, json(421, { message: 'Call the mailbox by 127.0.0.1 or localhost.' }))
    }
    if (request.method === 'GET' && url.pathname === '/api/live') return followNews(response)
    answer(request, url).then(
      (given) => give(response, given),
      (error: unknown) => {
        process.stderr.write(`${error instanceof Error ? error.stack : String(error)}\n`)
        give(response, json(500, { statusCode: 500, name: 'internal_server_error', message: 'The local mailbox failed; its log says how.' }))
      },
    )
  })
  teller.resume()

  return {
    server,
    close: async () => {
      await teller.close()
      const closed = once(server, 'close')
      server.close()
      server.closeAllConnections()
      await closed
    },
  }
}
