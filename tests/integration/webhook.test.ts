import { createHmac, randomUUID } from 'node:crypto'
import { eq } from 'drizzle-orm'
import { beforeAll, describe, expect, it } from 'vitest'
import { db } from '@/db/client'
import { insertMail } from '@/db/queries/mail'
import { mail, mailEvent } from '@/db/schema/mail'
import { issue, send } from '../helpers/advance-fixture'
import { baseUrl, stranger } from '../helpers/http-client'
import { makeParty } from '../helpers/party-fixture'
import type { PartyFixture } from '../helpers/party-fixture'
import { makeTour } from '../helpers/tour-fixture'

/** Signs as the webhook standard says (standardwebhooks.com, symmetric "v1"): HMAC-SHA256 over id, time and body. */
function signed(body: string, more: { id?: string; at?: Date; secret?: string } = {}) {
  const secret = more.secret ?? process.env['RESEND_WEBHOOK_SECRET'] ?? ''
  const id = more.id ?? `msg_${randomUUID()}`
  const timestamp = String(Math.floor((more.at ?? new Date()).getTime() / 1000))
  const key = Buffer.from(secret.replace('whsec_', ''), 'base64')
  const signature = createHmac('sha256', key).update(`${id}.${timestamp}.${body}`).digest('base64')
  return { 'svix-id': id, 'svix-timestamp': timestamp, 'svix-signature': `v1,${signature}` }
}

const post = (body: string, headers: Record<string, string> = signed(body)) => stranger('POST', '/api/webhooks/mail', body, headers)

describe('the mail webhook', () => {
  let party: PartyFixture
  let mailId: string

  beforeAll(async () => {
    party = await makeParty()
    // A row without a job: nothing but these tests tells anything of it.
    mailId = await insertMail(db(), {
      ...{ partyId: party.partyId, kind: 'pack', toAddress: 'crew@house.example', subject: 'A pack', textBody: 'text', htmlBody: 'html' },
    })
  })
  const eventsOf = () => db().select().from(mailEvent).where(eq(mailEvent.mailId, mailId))
  const fresh = () => db().delete(mailEvent).where(eq(mailEvent.mailId, mailId))
  const body = (type: string, more: { at?: string; data?: object } = {}, of = mailId) =>
    JSON.stringify({
      type,
      created_at: more.at ?? '2031-09-01T10:00:00.000Z',
      data: { email_id: randomUUID(), tags: { mail_id: of }, ...more.data },
    })

  it('keeps a delivery and a bounce, each once, however often they are told', async () => {
    await fresh()
    const delivered = body('email.delivered')
    const headers = signed(delivered)
    for (const answer of await Promise.all([1, 2, 3].map(() => post(delivered, headers)))) expect(answer.status).toBe(200)
    const bounced = body('email.bounced', { data: { bounce: { message: 'no such address', type: 'Permanent' } } })
    expect((await post(bounced)).status).toBe(200)
    const rows = await eventsOf()
    expect(rows.map((row) => row.kind).sort()).toEqual(['bounced', 'delivered'])
    expect(rows.find((row) => row.kind === 'bounced')?.detail).toEqual({ bounce: { message: 'no such address', type: 'Permanent' } })
  })

  it('takes events in any order, with the time at which they happened', async () => {
    await fresh()
    await post(body('email.delivered', { at: '2031-09-01T10:05:00.000Z' }))
    await post(body('email.delivery_delayed', { at: '2031-09-01T10:01:00.000Z' }))
    await post(body('email.complained', { at: '2031-09-01T10:09:00.000Z' }))
    const rows = (await eventsOf()).sort((a, b) => a.at.getTime() - b.at.getTime())
    expect(rows.map((row) => row.kind)).toEqual(['delayed', 'delivered', 'complained'])
  })

  it('finds a mail by the provider’s id too', async () => {
    await fresh()
    const providerId = randomUUID()
    await db().update(mail).set({ providerId }).where(eq(mail.id, mailId))
    expect((await post(body('email.delivered', { data: { email_id: providerId, tags: undefined } }))).status).toBe(200)
    expect(await eventsOf()).toHaveLength(1)
  })

  it('takes what is not about a mail of ours, or of a kind that is not kept, and lets it go', async () => {
    await fresh()
    expect((await post(body('email.delivered', { data: { tags: { mail_id: randomUUID() } } }))).status).toBe(200)
    expect((await post(body('email.delivered', { data: { tags: undefined } }))).status).toBe(200)
    expect((await post(body('email.opened'))).status).toBe(200)
    expect((await post(body('contact.created'))).status).toBe(200)
    expect(await eventsOf()).toEqual([])
  })

  it('refuses forged, altered, unsigned, early and stale messages', async () => {
    await fresh()
    const good = body('email.bounced')
    const headers = signed(good)
    const forged = signed(good, { secret: `whsec_${Buffer.from('another secret of the size').toString('base64')}` })
    expect((await post(good, forged)).status).toBe(401)
    expect((await post(good.replace('bounced', 'complained'), headers)).status).toBe(401)
    expect((await post(good, { ...headers, 'svix-id': 'msg_other' })).status).toBe(401)
    expect((await post(good, { ...headers, 'svix-signature': 'v1,' })).status).toBe(401)
    expect((await post(good, { ...headers, 'svix-signature': 'v0,abc v1a,def' })).status).toBe(401)
    expect((await post(good, { ...headers, 'svix-timestamp': 'soon' })).status).toBe(401)
    for (const name of Object.keys(headers)) {
      const lacking: Record<string, string> = { ...headers }
      delete lacking[name]
      expect((await post(good, lacking)).status, `without ${name}`).toBe(401)
    }
    expect((await post(good, signed(good, { at: new Date(Date.now() - 6 * 60_000) }))).status).toBe(401)
    expect((await post(good, signed(good, { at: new Date(Date.now() + 6 * 60_000) }))).status).toBe(401)
    expect(await eventsOf()).toEqual([])
  })

  it('refuses a signed message that it cannot read, and one too large before it is held', async () => {
    for (const odd of ['{"half":', '[]', '{"type":"email.delivered"}', body('email.delivered', { at: 'yesterday' })]) {
      expect((await post(odd)).status, odd).toBe(422)
    }
    const large = body('email.delivered', { data: { padding: 'x'.repeat(200_000) } })
    expect((await post(large)).status).toBe(413)
  })

  it('is only posted to, and tells a desk that listens', async () => {
    expect((await stranger('GET', '/api/webhooks/mail')).status).toBe(405)
    const tour = await makeTour(party)
    const sent = await send(party, tour, await issue(party, tour))
    const stream = await fetch(`${baseUrl()}${sent.path}/live`)
    const reader = stream.body?.pipeThrough(new TextDecoderStream()).getReader()
    if (!reader) throw new Error('no stream')
    let heard = (await reader.read()).value ?? ''
    await post(body('email.bounced', {}, sent.mailId))
    while (!heard.includes('advance:')) heard += (await reader.read()).value ?? ''
    await reader.cancel()
    expect(heard).toContain(`advance:${tour.showId}`)
  })
})
