import { eq } from 'drizzle-orm'
import { randomUUID } from 'node:crypto'
import { describe, expect, it } from 'vitest'
import { db } from '@/db/client'
import { insertPerson } from '@/db/queries/person'
import { passwordReset, person } from '@/db/schema/person'
import { hashPassword } from '@/lib/server/auth/password'
import { CookieJar } from '../helpers/cookie-jar'
import { countMailTo, latestMailTo } from '../helpers/outbox'

const password = 'a long enough password'
const newAddress = () => `account-${randomUUID()}@test.example`

async function somebody(email = newAddress()) {
  const { id } = await insertPerson(db(), { name: 'Ada Test', email, passwordHash: await hashPassword(password), emailVerifiedAt: new Date() })
  return { personId: id, email }
}

const findByEmail = async (email: string) => (await db().select().from(person).where(eq(person.email, email)))[0]
const fieldsOf = (body: unknown) => (body as { error: { details: { fields: Record<string, string> } } }).error.details.fields
const codeOf = (body: unknown) => (body as { error: { code: string } }).error.code

async function pressSignInLink(jar: CookieJar, email: string) {
  const sent = await latestMailTo(email, 'sign-in')
  const query = new URLSearchParams({ email, token: sent?.link.searchParams.get('token') ?? '' })
  return jar.send('POST', `/api/auth/callback/email?${query}`, { form: {} })
}

describe('signing up', () => {
  it('makes a person whose address is not shown yet; the mailed link shows it and signs in', async () => {
    const email = newAddress()
    const jar = new CookieJar()
    expect((await jar.send('POST', '/api/sign-ups', { json: { name: 'New Hand', email, next: '/party' } })).status).toBe(202)
    expect(await findByEmail(email)).toMatchObject({ name: 'New Hand', emailVerifiedAt: null, passwordHash: null })
    const sent = await latestMailTo(email, 'sign-in')
    expect(sent?.link.searchParams.get('next')).toBe('/party')
    // Anybody can type a name beside anybody's address: it is no way to mail a stranger words of one's own.
    expect(sent?.text).not.toContain('New Hand')
    await pressSignInLink(jar, email)
    expect((await jar.send('GET', '/api/sessions')).status).toBe(200)
    expect((await findByEmail(email))?.emailVerifiedAt).toBeInstanceOf(Date)
  })

  it('answers a known address the same, mails it a plain sign-in link, and changes nothing about it', async () => {
    const known = await somebody()
    const before = await findByEmail(known.email)
    const answers = await Promise.all(
      [known.email, newAddress()].map((email) => new CookieJar().send('POST', '/api/sign-ups', { json: { name: 'Intruder', email } })),
    )
    expect(answers[0]?.status).toBe(answers[1]?.status)
    expect(answers[0]?.body).toEqual(answers[1]?.body)
    expect(await findByEmail(known.email)).toEqual(before)
    expect((await latestMailTo(known.email, 'sign-in'))?.text).toContain('Hello Ada Test')
  })

  it('names the field at fault, makes nobody, and takes no address but of this site to go on to', async () => {
    const email = newAddress()
    for (const [json, field] of [
      [{ name: ' ', email }, 'name'],
      [{ name: 'New Hand', email: 'nowhere' }, 'email'],
      [{ name: 'New Hand', email, next: 'https://elsewhere.example' }, 'next'],
      [{ name: 'x'.repeat(121), email }, 'name'],
    ] as const) {
      const answer = await new CookieJar().send('POST', '/api/sign-ups', { json })
      expect(answer.status).toBe(422)
      expect(Object.keys(fieldsOf(answer.body))).toEqual([field])
    }
    expect(await findByEmail(email)).toBeUndefined()
  })

  it('refuses a body that is too large, not JSON, or from another site', async () => {
    const jar = new CookieJar()
    expect((await jar.send('POST', '/api/sign-ups', { json: { name: 'x'.repeat(300_000), email: newAddress() } })).status).toBe(413)
    expect((await jar.send('POST', '/api/sign-ups', { form: { name: 'a', email: 'b' } })).status).toBe(422)
    const elsewhere = { headers: { origin: 'https://elsewhere.example' }, json: { name: 'New Hand', email: newAddress() } }
    expect((await jar.send('POST', '/api/sign-ups', elsewhere)).status).toBe(403)
  })

  it('cannot set what is not the form’s to set', async () => {
    const email = newAddress()
    await new CookieJar().send('POST', '/api/sign-ups', {
      json: { name: 'New Hand', email, emailVerifiedAt: new Date().toISOString(), passwordHash: 'x', id: randomUUID() },
    })
    expect(await findByEmail(email)).toMatchObject({ emailVerifiedAt: null, passwordHash: null })
  })

  it('stops mailing one address after five, whoever asks', async () => {
    const email = newAddress()
    for (let turn = 0; turn < 5; turn += 1) {
      expect((await new CookieJar().send('POST', '/api/sign-ups', { json: { name: 'New Hand', email } })).status).toBe(202)
    }
    const refused = await new CookieJar().send('POST', '/api/sign-ups', { json: { name: 'New Hand', email } })
    expect(refused.status).toBe(429)
    expect(Number(refused.headers.get('retry-after'))).toBeGreaterThan(0)
    expect(await countMailTo(email)).toBe(5)
  })
})

describe('choosing a new password by mail', () => {
  const ask = (email: string) => new CookieJar().send('POST', '/api/password-resets', { json: { email } })
  const redeem = (token: string, word = 'another long password') =>
    new CookieJar().send('POST', '/api/password-resets/redeem', { json: { token, password: word } })
  const tokenTo = async (email: string) => {
    const sent = await latestMailTo(email, 'reset')
    return { token: sent?.link.pathname.split('/').at(-1) ?? '', stored: sent?.stored ?? '' }
  }

  it('sets it once and signs out every device', async () => {
    const { email, personId } = await somebody()
    const desk = new CookieJar()
    await desk.signIn(email, password)
    expect((await ask(email)).status).toBe(202)
    const { token, stored } = await tokenTo(email)
    expect(stored).not.toContain(token)
    // Neither the token nor anything it could be read from is in the table.
    const rows = await db().select().from(passwordReset).where(eq(passwordReset.personId, personId))
    expect(JSON.stringify(rows)).not.toContain(token)

    expect((await new CookieJar().send('GET', `/reset/${token}`)).status).toBe(200)
    expect((await desk.send('GET', '/api/sessions')).status).toBe(200)

    expect((await redeem(token)).status).toBe(200)
    expect((await desk.send('GET', '/api/sessions')).status).toBe(401)
    expect((await new CookieJar().signIn(email, password)).status).toBe(401)
    expect((await new CookieJar().signIn(email, 'another long password')).status).toBe(200)

    const again = await redeem(token, 'a third long password')
    expect(again.status).toBe(410)
    expect(again.body).toMatchObject({ error: { details: { reason: 'used' } } })
    expect((await new CookieJar().signIn(email, 'another long password')).status).toBe(200)
  })

  it('ends older links when one is used, and one of two presses at once wins', async () => {
    const { email } = await somebody()
    await ask(email)
    const first = await tokenTo(email)
    await ask(email)
    const second = await tokenTo(email)
    expect(first.token).not.toBe(second.token)
    const answers = await Promise.all([redeem(second.token, 'password number one'), redeem(second.token, 'password number two')])
    expect(answers.map((answer) => answer.status).sort()).toEqual([200, 410])
    expect((await redeem(first.token)).status).toBe(410)
  })

  it('says that a link has run out, and leaves the password', async () => {
    const { email, personId } = await somebody()
    await ask(email)
    await db().update(passwordReset).set({ expiresAt: new Date(Date.now() - 1000) }).where(eq(passwordReset.personId, personId))
    const { token } = await tokenTo(email)
    const late = await redeem(token)
    expect(late.status).toBe(410)
    expect(late.body).toMatchObject({ error: { details: { reason: 'expired' } } })
    expect((await new CookieJar().send('GET', `/reset/${token}`)).body).toContain('This link has run out')
    expect((await new CookieJar().signIn(email, password)).status).toBe(200)
  })

  it('knows no invented token, and names a password that is too short', async () => {
    expect((await redeem('A'.repeat(43))).status).toBe(404)
    const malformed = await redeem('short')
    expect([malformed.status, Object.keys(fieldsOf(malformed.body))]).toEqual([422, ['token']])
    const weak = await redeem('A'.repeat(43), 'nine char')
    expect([weak.status, Object.keys(fieldsOf(weak.body))]).toEqual([422, ['password']])
  })

  it('says the same of an unknown address, and mails it nothing', async () => {
    const unknown = newAddress()
    const answers = [await ask((await somebody()).email), await ask(unknown)]
    expect(answers[0]?.status).toBe(answers[1]?.status)
    expect(answers[0]?.body).toEqual(answers[1]?.body)
    expect(await countMailTo(unknown)).toBe(0)
  })
})

describe('changing the password while signed in', () => {
  it('asks for the present one, keeps this device and signs out the others', async () => {
    const { email } = await somebody()
    const [phone, desk] = [new CookieJar(), new CookieJar()]
    await phone.signIn(email, password)
    await desk.signIn(email, password)
    const wrong = await desk.send('PUT', '/api/sessions/password', { json: { current: 'not it at all', password: 'another long password' } })
    expect([wrong.status, Object.keys(fieldsOf(wrong.body))]).toEqual([422, ['current']])
    const none = await desk.send('PUT', '/api/sessions/password', { json: { current: null, password: 'another long password' } })
    expect(none.status).toBe(422)
    expect((await desk.send('PUT', '/api/sessions/password', { json: { current: password, password: 'another long password' } })).status).toBe(200)
    expect((await desk.send('GET', '/api/sessions')).status).toBe(200)
    expect((await phone.send('GET', '/api/sessions')).status).toBe(401)
    expect((await new CookieJar().signIn(email, 'another long password')).status).toBe(200)
  })

  it('lets somebody who came by a link choose a first one', async () => {
    const email = newAddress()
    const jar = new CookieJar()
    await jar.send('POST', '/api/sign-ups', { json: { name: 'New Hand', email } })
    await pressSignInLink(jar, email)
    expect((await jar.send('PUT', '/api/sessions/password', { json: { current: null, password } })).status).toBe(200)
    expect((await new CookieJar().signIn(email, password)).status).toBe(200)
  })

  it('is for the signed-in only, and stops guessing of the present one', async () => {
    const nobody = await new CookieJar().send('PUT', '/api/sessions/password', { json: { current: 'x', password } })
    expect(nobody.status).toBe(401)
    const { email } = await somebody()
    const jar = new CookieJar()
    await jar.signIn(email, password)
    for (let turn = 0; turn < 10; turn += 1) {
      await jar.send('PUT', '/api/sessions/password', { json: { current: `guess ${turn}`, password: 'another long password' } })
    }
    const refused = await jar.send('PUT', '/api/sessions/password', { json: { current: password, password: 'another long password' } })
    expect([refused.status, codeOf(refused.body)]).toEqual([429, 'rate-limited'])
  })
})
