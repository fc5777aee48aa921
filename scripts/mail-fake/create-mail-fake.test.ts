import { once } from 'node:events'
import { mkdtempSync, rmSync } from 'node:fs'
import type { IncomingHttpHeaders, Server } from 'node:http'
import { createServer } from 'node:http'
import type { AddressInfo } from 'node:net'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { Resend } from 'resend'
import { afterEach, beforeEach, describe, expect, it } from 'vitest'
import type { MailFake } from './create-mail-fake'
import { createMailFake } from './create-mail-fake'

const API_KEY = 're_test_key'
const SECRET = `whsec_${Buffer.from('a key of twenty-four byte').toString('base64')}`
const PDF = Buffer.from('%PDF-1.4 a pack')

interface Told {
  headers: IncomingHttpHeaders
  body: string
}

/** An app that takes webhooks: hands them out one by one and answers with the statuses it is given, then 200. */
class Receiver {
  readonly #server: Server
  readonly #told: Told[] = []
  readonly #waiting: ((told: Told) => void)[] = []
  statuses: number[] = []

  constructor() {
    this.#server = createServer((request, response) => {
      const parts: Buffer[] = []
      request.on('data', (part: Buffer) => parts.push(part))
      request.on('end', () => {
        response.writeHead(this.statuses.shift() ?? 200).end()
        const told = { headers: request.headers, body: Buffer.concat(parts).toString('utf8') }
        const next = this.#waiting.shift()
        if (next) next(told)
        else this.#told.push(told)
      })
    })
  }

  async open(): Promise<string> {
    this.#server.listen(0, '127.0.0.1')
    await once(this.#server, 'listening')
    return `http://127.0.0.1:${(this.#server.address() as AddressInfo).port}/hook`
  }

  next(): Promise<Told> {
    const told = this.#told.shift()
    return told ? Promise.resolve(told) : new Promise((resolve) => this.#waiting.push(resolve))
  }

  close(): void {
    this.#server.close()
    this.#server.closeAllConnections()
  }
}

let folder: string
let receiver: Receiver
let hookUrl: string
let fake: MailFake
let baseUrl: string
let resend: Resend

async function openFake(): Promise<void> {
  fake = createMailFake({ folder, apiKey: API_KEY, webhook: { url: hookUrl, secret: SECRET, delayMs: 0, retryDelaysMs: [0, 0] } })
  fake.server.listen(0, '127.0.0.1')
  await once(fake.server, 'listening')
  baseUrl = `http://127.0.0.1:${(fake.server.address() as AddressInfo).port}`
  resend = new Resend(API_KEY, { baseUrl })
}

beforeEach(async () => {
  folder = mkdtempSync(join(tmpdir(), 'mail-fake-'))
  receiver = new Receiver()
  hookUrl = await receiver.open()
  await openFake()
})

afterEach(async () => {
  await fake.close()
  receiver.close()
  rmSync(folder, { recursive: true, force: true })
})

const pack = {
  from: 'Saltmarsh Radio <packs@saltmarsh.example>',
  to: ['stage@harbour-hall.example'],
  subject: 'Kit for 3 December',
  html: '<p>Please answer <a href="https://hoopwright.example/r/abc?x=1&amp;y=2">line by line</a>.</p>',
  text: 'Please answer line by line: https://hoopwright.example/r/abc?x=1&y=2',
  attachments: [{ filename: 'Pack – 3 December.pdf', content: PDF }],
  tags: [{ name: 'kind', value: 'dispatch' }],
}

async function sent(options?: { idempotencyKey?: string }, mail = pack): Promise<string> {
  const { data, error } = await resend.emails.send(mail, options)
  expect(error).toBeNull()
  return data?.id ?? ''
}

describe('sending through the provider’s SDK', () => {
  it('accepts a mail, keeps all of it and shows it again', async () => {
    const id = await sent()
    const { data } = await resend.emails.get(id)
    expect(data).toMatchObject({ id, subject: pack.subject, to: pack.to, html: pack.html, text: pack.text, tags: pack.tags })
  })

  it('answers the same request under the same idempotency key with the same mail, and keeps one', async () => {
    const first = await sent({ idempotencyKey: 'dispatch/1' })
    const again = await sent({ idempotencyKey: 'dispatch/1' })
    expect(again).toBe(first)
    const { mails } = (await (await fetch(`${baseUrl}/api/mails`)).json()) as { mails: unknown[] }
    expect(mails).toHaveLength(1)
  })

  it('refuses another request under a used idempotency key with 409', async () => {
    await sent({ idempotencyKey: 'dispatch/1' })
    const { data, error } = await resend.emails.send({ ...pack, subject: 'Another' }, { idempotencyKey: 'dispatch/1' })
    expect(data).toBeNull()
    expect(error).toMatchObject({ statusCode: 409, name: 'invalid_idempotent_request' })
  })

  it('refuses an idempotency key of more than 256 characters', async () => {
    const { error } = await resend.emails.send(pack, { idempotencyKey: 'k'.repeat(257) })
    expect(error).toMatchObject({ statusCode: 400, name: 'invalid_idempotency_key' })
  })

  it.each([
    ['an address that is none', { to: ['nobody'] }, 'validation_error', '`to.0`'],
    ['a sender that is none', { from: 'Saltmarsh Radio' }, 'validation_error', '`from`'],
    ['an empty subject', { subject: '' }, 'missing_required_field', '`subject`'],
    ['51 recipients', { to: Array.from({ length: 51 }, (_, n) => `a${n}@b.example`) }, 'validation_error', '`to`'],
    ['a tag with a space', { tags: [{ name: 'a kind', value: 'x' }] }, 'validation_error', '`tags.0.name`'],
    ['an attachment that is not base64', { attachments: [{ filename: 'a.pdf', content: '&&&' }] }, 'invalid_attachment', '`attachments.0.content`'],
    ['neither HTML nor text', { html: '', text: '' }, 'validation_error', '`html`'],
    ['a feature that is not offered here', { scheduledAt: 'in 1 min' }, 'validation_error', '`scheduled_at`'],
  ])('refuses %s and names the field', async (_what, change, name, field) => {
    const { error } = await resend.emails.send({ ...pack, ...change })
    expect(error).toMatchObject({ statusCode: 422, name })
    expect(error?.message).toContain(field)
  })

  it('refuses a wrong key with 403 and an unknown mail with 404', async () => {
    const { error: wrong } = await new Resend('re_other', { baseUrl }).emails.send(pack)
    expect(wrong).toMatchObject({ statusCode: 403, name: 'invalid_api_key' })
    const { error: unknown } = await resend.emails.get('6b2f0c1e-0000-4000-8000-000000000000')
    expect(unknown).toMatchObject({ statusCode: 404, name: 'not_found' })
  })

  it('keeps mails and idempotency keys over a restart', async () => {
    const id = await sent({ idempotencyKey: 'dispatch/1' })
    await fake.close()
    await openFake()
    expect(await sent({ idempotencyKey: 'dispatch/1' })).toBe(id)
    expect((await resend.emails.get(id)).data?.subject).toBe(pack.subject)
  })
})

describe('webhooks', () => {
  function verified({ headers, body }: Told) {
    return resend.webhooks.verify({
      payload: body,
      headers: {
        id: String(headers['svix-id']),
        timestamp: String(headers['svix-timestamp']),
        signature: String(headers['svix-signature']),
      },
      webhookSecret: SECRET,
    })
  }

  it('says delivered by itself, signed so that the SDK accepts it', async () => {
    const id = await sent()
    const event = verified(await receiver.next())
    expect(event).toMatchObject({ type: 'email.delivered', data: { email_id: id, to: pack.to, tags: { kind: 'dispatch' } } })
  })

  it('says bounced for an address with "bounce" before the @', async () => {
    await sent({}, { ...pack, to: ['bounce.desk@harbour-hall.example'] })
    expect(verified(await receiver.next())).toMatchObject({ type: 'email.bounced', data: { bounce: { type: 'Permanent' } } })
  })

  it('signs the very bytes: a changed body is refused by the SDK', async () => {
    await sent()
    const told = await receiver.next()
    expect(() => verified({ ...told, body: told.body.replace('delivered', 'bounced') })).toThrow('No matching signature')
  })

  it('tries again with the same id until the app takes it', async () => {
    receiver.statuses = [503, 500]
    await sent()
    const told = [await receiver.next(), await receiver.next(), await receiver.next()]
    expect(new Set(told.map(({ headers }) => headers['svix-id'])).size).toBe(1)
  })

  it('sends what the reader of the mailbox page says became of a mail', async () => {
    const id = await sent()
    await receiver.next()
    const response = await fetch(`${baseUrl}/mail/${id}/events`, { method: 'POST', body: new URLSearchParams({ type: 'email.complained' }), redirect: 'manual' })
    expect(response.status).toBe(303)
    expect(verified(await receiver.next())).toMatchObject({ type: 'email.complained', data: { email_id: id } })
  })

  it('takes up after a restart what it could not tell before', async () => {
    receiver.statuses = [503, 503, 503]
    await sent()
    const first = await receiver.next()
    await fake.close()
    receiver.statuses = []
    await openFake()
    // What was still under way when the fake closed may come first.
    let again = await receiver.next()
    while (again.headers['svix-id'] !== first.headers['svix-id']) again = await receiver.next()
    expect(verified(again)).toMatchObject({ type: 'email.delivered' })
  })
})

describe('the mailbox', () => {
  interface Listed {
    mails: { id: string; to: string[]; links: string[]; attachments: { path: string; filename: string }[] }[]
  }
  const list = async (query: string) => (await (await fetch(`${baseUrl}/api/mails?${query}`)).json()) as Listed

  it('lists the mails of one address, newest first, with their links', async () => {
    await sent()
    await sent({}, { ...pack, to: ['Desk <DESK@other.example>'] })
    const { mails } = await list('to=desk@other.example')
    expect(mails.map(({ to }) => to)).toEqual([['Desk <DESK@other.example>']])
    expect(mails[0]?.links).toEqual(['https://hoopwright.example/r/abc?x=1&y=2'])
  })

  it('holds the answer back until a mail comes that fits', async () => {
    const waiting = list('to=stage@harbour-hall.example&wait=20000')
    await sent({}, { ...pack, to: ['other@other.example'] })
    const id = await sent()
    expect((await waiting).mails.map((mail) => mail.id)).toEqual([id])
  })

  it('hands an attachment back byte by byte', async () => {
    await sent()
    const attachment = (await list('')).mails[0]?.attachments[0]
    const response = await fetch(`${baseUrl}${attachment?.path}`)
    expect(response.headers.get('content-type')).toBe('application/pdf')
    expect(response.headers.get('content-disposition')).toContain("inline; filename=\"attachment\"; filename*=UTF-8''Pack%20%E2%80%93%203%20December.pdf")
    expect(Buffer.from(await response.arrayBuffer())).toEqual(PDF)
  })

  it('shows the mail in a frame of its own origin whose policy lets no script of the mail run, and opens links in a new tab', async () => {
    const id = await sent({}, { ...pack, html: '<html><head><title>x</title></head><body>Hello</body></html>' })
    const page = await (await fetch(`${baseUrl}/mail/${id}`)).text()
    expect(page).toContain(`sandbox="allow-scripts allow-popups allow-popups-to-escape-sandbox" src="/mail/${id}/html"`)
    const framed = await fetch(`${baseUrl}/mail/${id}/html`)
    expect(framed.headers.get('content-security-policy')).toMatch(/^sandbox [a-z -]+; default-src 'none'; style-src 'unsafe-inline'; img-src data: http: https:; font-src data: http: https:$/)
    expect(await framed.text()).toContain('<head><base target="_blank"><title>')
  })

  it('writes what a mail says as text, never as markup of its own page', async () => {
    const id = await sent({}, { ...pack, subject: '<img src=x onerror=alert(1)>' })
    for (const path of ['/', `/mail/${id}`]) {
      const page = await (await fetch(`${baseUrl}${path}`)).text()
      expect(page).not.toContain('<img')
      expect(page).toContain('&lt;img src=x onerror=alert(1)&gt;')
    }
  })

  it('is emptied on demand', async () => {
    const id = await sent()
    expect((await fetch(`${baseUrl}/api/mails`, { method: 'DELETE' })).status).toBe(204)
    expect((await list('')).mails).toEqual([])
    expect((await fetch(`${baseUrl}/mail/${id}`)).status).toBe(404)
  })
})
