import { randomUUID } from 'node:crypto'
import { once } from 'node:events'
import type { IncomingHttpHeaders, Server, ServerResponse } from 'node:http'
import { createServer } from 'node:http'
import type { AddressInfo } from 'node:net'
import { eq } from 'drizzle-orm'
import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest'
import { db } from '@/db/client'
import { insertMail } from '@/db/queries/mail'
import { mail } from '@/db/schema/mail'
import { linkToken } from '@/lib/server/auth/link-token'
import { sendMail } from '@/lib/server/jobs/send-mail'
import { linkPlace } from '@/lib/server/mail/link-place'

type Received = { headers: IncomingHttpHeaders; body: { to: string; text: string; tags: { name: string; value: string }[] } }

/** A mail service that misbehaves as it is told, and knows keys as the real one does: the same key is the same mail. */
class MisbehavingService {
  readonly received: Received[] = []
  /** What was really mailed, by key. */
  readonly mailed = new Map<string, string>()
  /** How the next tries are answered, one each; then well. */
  plan: ((response: ServerResponse, accept: () => string) => void)[] = []
  private readonly server: Server

  constructor() {
    this.server = createServer((request, response) => {
      const parts: Buffer[] = []
      request.on('data', (part: Buffer) => parts.push(part))
      request.on('end', () => {
        const body = JSON.parse(Buffer.concat(parts).toString('utf8')) as Received['body']
        this.received.push({ headers: request.headers, body })
        const key = String(request.headers['idempotency-key'])
        const accept = () => {
          const id = this.mailed.get(key) ?? randomUUID()
          this.mailed.set(key, id)
          return id
        }
        const behave = this.plan.shift() ?? well
        behave(response, accept)
      })
    })
  }

  async open(): Promise<string> {
    this.server.listen(0, '127.0.0.1')
    await once(this.server, 'listening')
    return `http://127.0.0.1:${(this.server.address() as AddressInfo).port}`
  }

  close(): void {
    this.server.close()
    this.server.closeAllConnections()
  }
}

function say(response: ServerResponse, status: number, value: unknown): void {
  response.writeHead(status, { 'content-type': 'application/json' }).end(JSON.stringify(value))
}
const well = (response: ServerResponse, accept: () => string) => say(response, 200, { id: accept() })
const refuse = (status: number, name: string) => (response: ServerResponse) => say(response, status, { statusCode: status, name, message: `told: ${name}` })
const hangUp = (response: ServerResponse) => void response.socket?.destroy()
const takeAndHangUp = (response: ServerResponse, accept: () => string) => {
  accept()
  response.socket?.destroy()
}
const takeAndStammer = (response: ServerResponse, accept: () => string) => {
  accept()
  response.writeHead(200, { 'content-type': 'application/json' }).end('{"id":')
}
const takeNamelessly = (response: ServerResponse, accept: () => string) => {
  accept()
  say(response, 200, {})
}
const gateway = (response: ServerResponse) => void response.writeHead(502, { 'content-type': 'text/html' }).end('<h1>Bad gateway</h1>')

describe('sending a mail of the outbox', () => {
  const service = new MisbehavingService()
  const before = process.env['RESEND_BASE_URL']

  beforeAll(async () => {
    // Read by the SDK when the first mail goes out, so it is set before any.
    process.env['RESEND_BASE_URL'] = await service.open()
  })
  afterAll(() => {
    service.close()
    if (before === undefined) delete process.env['RESEND_BASE_URL']
    else process.env['RESEND_BASE_URL'] = before
  })
  beforeEach(() => {
    service.received.length = 0
    service.mailed.clear()
    service.plan = []
  })
  const outgoing = (more: object = {}) =>
    insertMail(db(), {
      ...{ partyId: null, kind: 'reset', toAddress: 'somebody@test.example', toName: 'Ib "the Storm"\r\nBcc: all@test.example' },
      ...{ subject: 'A test', textBody: `Open ${linkPlace('reset', '11111111-1111-4111-8111-111111111111')}`, htmlBody: '<p>Open</p>' },
      ...more,
    })
  const rowOf = async (id: string) => {
    const [row] = await db().select().from(mail).where(eq(mail.id, id))
    if (!row) throw new Error('no mail')
    return row
  }

  it('hands over address, filled links, its tag and its key, and notes the provider’s id', async () => {
    const id = await outgoing()
    await sendMail({ mailId: id })
    const [received] = service.received
    const row = await rowOf(id)
    expect(received?.headers['idempotency-key']).toBe(row.idempotencyKey)
    expect(received?.body.to).toBe('"Ib  the Storm   Bcc: all@test.example" <somebody@test.example>')
    expect(received?.body.text).toBe(`Open ${linkToken('reset', '11111111-1111-4111-8111-111111111111')}`)
    expect(received?.body.tags).toEqual([{ name: 'mail_id', value: id }])
    expect(row).toMatchObject({ providerId: service.mailed.get(row.idempotencyKey), attempts: 1, failure: null })
    expect(row.sentAt).not.toBeNull()
    await sendMail({ mailId: id })
    expect(service.received).toHaveLength(1)
  })

  it.each([
    ['hangs up', hangUp],
    ['takes it and hangs up', takeAndHangUp],
    ['takes it and answers half a sentence', takeAndStammer],
    ['takes it and names no mail', takeNamelessly],
    ['is a broken gateway', gateway],
    ['says too many', refuse(429, 'rate_limit_exceeded')],
    ['fails over there', refuse(500, 'internal_server_error')],
    ['still works on the same key', refuse(409, 'concurrent_idempotent_requests')],
  ])('is tried again when the service %s, and never goes out twice', async (_, behave) => {
    const id = await outgoing()
    service.plan = [behave]
    await expect(sendMail({ mailId: id })).rejects.toThrow('trying again later')
    expect(await rowOf(id)).toMatchObject({ sentAt: null, failedAt: null, attempts: 1 })
    await sendMail({ mailId: id })
    const keys = service.received.map((entry) => entry.headers['idempotency-key'])
    expect(new Set(keys).size).toBe(1)
    expect(keys).toHaveLength(2)
    expect(service.mailed.size).toBe(1)
    const row = await rowOf(id)
    expect(row).toMatchObject({ attempts: 2, providerId: service.mailed.get(row.idempotencyKey) })
    expect(row.sentAt).not.toBeNull()
  })

  it('is given up, with the reason, when the service refuses this very mail', async () => {
    const id = await outgoing()
    service.plan = [refuse(422, 'validation_error')]
    await sendMail({ mailId: id })
    const row = await rowOf(id)
    expect(row.failedAt).not.toBeNull()
    expect(row.failure).toContain('told: validation_error')
    await sendMail({ mailId: id })
    expect(service.received).toHaveLength(1)
  })

  it('is not sent again once the service may have forgotten its key', async () => {
    const id = await outgoing({ firstTriedAt: new Date(Date.now() - 24 * 60 * 60 * 1000), attempts: 9 })
    await sendMail({ mailId: id })
    expect(service.received).toEqual([])
    expect((await rowOf(id)).failure).toContain('cannot know')
  })

  it('is not sent when it was stopped', async () => {
    const id = await outgoing({ cancelledAt: new Date() })
    await sendMail({ mailId: id })
    expect(service.received).toEqual([])
    expect((await rowOf(id)).sentAt).toBeNull()
  })

  it('goes out once when two workers take it at once', async () => {
    const id = await outgoing()
    await Promise.all([sendMail({ mailId: id }), sendMail({ mailId: id })])
    expect(service.mailed.size).toBe(1)
    expect((await rowOf(id)).providerId).toBe([...service.mailed.values()][0])
  })
})
