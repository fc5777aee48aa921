import { eq } from 'drizzle-orm'
import { randomUUID } from 'node:crypto'
import { describe, expect, it } from 'vitest'
import { db } from '@/db/client'
import { insertPerson } from '@/db/queries/person'
import { session, verificationToken } from '@/db/schema/person'
import { hashPassword } from '@/lib/server/auth/password'
import { CookieJar } from '../helpers/cookie-jar'
import { baseUrl } from '../helpers/http-client'
import { countMailTo, latestMailTo } from '../helpers/outbox'

const password = 'a long enough password'

async function somebody(): Promise<{ personId: string; email: string }> {
  const email = `sign-in-${randomUUID()}@test.example`
  const { id } = await insertPerson(db(), { name: 'Ada Test', email, passwordHash: await hashPassword(password), emailVerifiedAt: new Date() })
  return { personId: id, email }
}

const signedIn = async (jar: CookieJar) => (await jar.send('GET', '/api/sessions')).status === 200
const errorOf = (url: URL) => url.searchParams.get('error')

describe('signing in with a password', () => {
  it('opens a session row, and the cookie is out of reach of scripts and of other sites', async () => {
    const { email } = await somebody()
    const jar = new CookieJar()
    const answer = await jar.signIn(email.toUpperCase(), password)
    expect(answer.status).toBe(200)
    expect(answer.url.href).toBe(`${baseUrl()}/tours`)
    const cookie = jar.lastSetCookies.find((line) => line.startsWith('next-auth.session-token='))
    expect(cookie).toMatch(/; HttpOnly/i)
    expect(cookie).toMatch(/; SameSite=Lax/i)
    expect(cookie).toMatch(/; Path=\//i)
    expect(await signedIn(jar)).toBe(true)
  })

  it('refuses a wrong password, an unknown address and an empty form alike', async () => {
    const { email } = await somebody()
    for (const [who, word] of [
      [email, 'not the password'],
      [`nobody-${randomUUID()}@test.example`, password],
      [email, ''],
      ['not an address', password],
    ] as const) {
      const jar = new CookieJar()
      const answer = await jar.signIn(who, word)
      expect(answer.status).toBe(401)
      expect(errorOf(answer.url)).toBe('CredentialsSignin')
      expect(jar.has('next-auth.session-token')).toBe(false)
      expect(await signedIn(jar)).toBe(false)
    }
  })

  it('takes about as long for an unknown address as for a wrong password', async () => {
    const { email } = await somebody()
    const time = async (who: string) => {
      const jar = new CookieJar()
      const begin = performance.now()
      await jar.signIn(who, 'not the password')
      return performance.now() - begin
    }
    await time(email)
    const middle = (times: number[]) => times.toSorted((a, b) => a - b)[2] ?? 0
    const known: number[] = []
    const unknown: number[] = []
    for (let turn = 0; turn < 5; turn += 1) {
      known.push(await time(email))
      unknown.push(await time(`nobody-${randomUUID()}@test.example`))
    }
    // Without the dummy hash the unknown address would answer in a small fraction of the time.
    expect(middle(unknown)).toBeGreaterThan(middle(known) * 0.4)
  })

  it('needs next-auth’s own token, so that another site cannot sign somebody in', async () => {
    const { email } = await somebody()
    const jar = new CookieJar()
    await jar.send('POST', '/api/auth/callback/credentials', { form: { email, password, csrfToken: 'invented', json: 'true' } })
    expect(await signedIn(jar)).toBe(false)
  })

  it('stops after ten tries at one person, from whatever address, and says so', async () => {
    const { email } = await somebody()
    for (let turn = 0; turn < 10; turn += 1) {
      expect(errorOf((await new CookieJar().signIn(email, 'not the password')).url)).toBe('CredentialsSignin')
    }
    const refused = await new CookieJar().signIn(email, password)
    expect(refused.status).toBe(401)
    expect(errorOf(refused.url)).toBe('RateLimited')
  })

  it('never leads to another site afterwards', async () => {
    const { email } = await somebody()
    for (const elsewhere of ['https://elsewhere.example/', '//elsewhere.example/x', '/\\elsewhere.example', 'javascript:alert(1)', `${baseUrl()}.elsewhere.example/`]) {
      const jar = new CookieJar()
      const { url } = await jar.signIn(email, password, elsewhere)
      expect(url.origin).toBe(baseUrl())
      expect(url.pathname).toBe('/tours')
      if (errorOf(url)) throw new Error('the sign-in itself failed')
    }
  })
})

describe('signing in by a mailed link', () => {
  it('mails a page with a button; only the button signs in, once', async () => {
    const { email } = await somebody()
    const jar = new CookieJar()
    expect((await jar.askForLink(email, '/party')).url.pathname).toBe('/api/auth/verify-request')
    const sent = await latestMailTo(email, 'sign-in')
    expect(sent?.link.pathname).toBe('/sign-in/link')
    expect(sent?.link.searchParams.get('next')).toBe('/party')
    const token = sent?.link.searchParams.get('token') ?? ''
    expect(token).toMatch(/^[0-9a-f-]{36}\.[\w-]{43}$/)
    // The outbox itself cannot sign anybody in.
    expect(sent?.stored).not.toContain(token.split('.')[1])

    const page = await jar.send('GET', `${sent?.link.pathname}${sent?.link.search}`)
    expect(page.status).toBe(200)
    const query = new URLSearchParams({ email, token, callbackUrl: '/party' })
    const followed = await new CookieJar().send('GET', `/api/auth/callback/email?${query}`)
    expect(followed.status).toBe(303)
    expect(followed.location).toMatch(/^\/sign-in\/link\?/)

    const pressed = await jar.send('POST', `/api/auth/callback/email?${query}`, { form: {} })
    expect(new URL(pressed.location ?? '', baseUrl()).pathname).toBe('/party')
    expect(await signedIn(jar)).toBe(true)

    const second = new CookieJar()
    const again = await second.send('POST', `/api/auth/callback/email?${query}`, { form: {} })
    expect(again.location).toContain('error=Verification')
    expect(await signedIn(second)).toBe(false)
  })

  it('is refused after its time', async () => {
    const { email } = await somebody()
    const jar = new CookieJar()
    await jar.askForLink(email)
    const sent = await latestMailTo(email, 'sign-in')
    await db().update(verificationToken).set({ expires: new Date(Date.now() - 1000) }).where(eq(verificationToken.identifier, email))
    const query = new URLSearchParams({ email, token: sent?.link.searchParams.get('token') ?? '' })
    const pressed = await jar.send('POST', `/api/auth/callback/email?${query}`, { form: {} })
    expect(pressed.location).toContain('error=Verification')
    expect(await signedIn(jar)).toBe(false)
  })

  it('refuses the press of a button on another site', async () => {
    const { email } = await somebody()
    const jar = new CookieJar()
    await jar.askForLink(email)
    const sent = await latestMailTo(email, 'sign-in')
    const query = new URLSearchParams({ email, token: sent?.link.searchParams.get('token') ?? '' })
    const path = `/api/auth/callback/email?${query}`
    const strange: Record<string, string>[] = [{ origin: 'https://elsewhere.example' }, { 'sec-fetch-site': 'cross-site' }, { origin: 'null' }]
    for (const headers of strange) {
      expect((await jar.send('POST', path, { form: {}, headers })).status).toBe(403)
    }
    expect(await signedIn(jar)).toBe(false)
    await jar.send('POST', path, { form: {}, headers: { origin: 'null', 'sec-fetch-site': 'same-origin' } })
    expect(await signedIn(jar)).toBe(true)
  })

  it('says the same of an unknown address, and mails it nothing', async () => {
    const { email } = await somebody()
    const unknown = `nobody-${randomUUID()}@test.example`
    const known = await new CookieJar().askForLink(email)
    const answer = await new CookieJar().askForLink(unknown)
    expect([answer.status, answer.url.href]).toEqual([known.status, known.url.href])
    expect(await countMailTo(unknown)).toBe(0)
    expect(await db().select().from(verificationToken).where(eq(verificationToken.identifier, unknown))).toHaveLength(0)
  })

  it('stops mailing one address after five links, and says so', async () => {
    const { email } = await somebody()
    for (let turn = 0; turn < 5; turn += 1) expect(errorOf((await new CookieJar().askForLink(email)).url)).toBeNull()
    expect(errorOf((await new CookieJar().askForLink(email)).url)).toBe('RateLimited')
    expect(await countMailTo(email)).toBe(5)
  })
})

describe('signing out', () => {
  it('ends the session row, so that a copy of the cookie opens nothing either', async () => {
    const { personId, email } = await somebody()
    const jar = new CookieJar()
    await jar.signIn(email, password)
    await jar.send('POST', '/api/auth/signout', { form: { csrfToken: await jar.csrfToken(), json: 'true' } })
    expect(await signedIn(jar)).toBe(false)
    const rows = await db().select({ endedAt: session.endedAt }).from(session).where(eq(session.personId, personId))
    expect(rows.map((row) => row.endedAt === null)).toEqual([false])
  })

  it('everywhere takes effect on every device at its next request', async () => {
    const { email } = await somebody()
    const [phone, desk] = [new CookieJar('phone'), new CookieJar('desk')]
    await phone.signIn(email, password)
    await desk.signIn(email, password)
    const list = (await desk.send('GET', '/api/sessions')).body as { devices: { current: boolean }[] }
    expect(list.devices).toHaveLength(2)
    expect(list.devices.filter((device) => device.current)).toHaveLength(1)
    expect((await desk.send('DELETE', '/api/sessions')).status).toBe(200)
    for (const device of [phone, desk]) {
      expect(device.has('next-auth.session-token')).toBe(true)
      expect((await device.send('GET', '/api/sessions')).status).toBe(401)
    }
  })

  it('one device leaves the others signed in; a stranger’s session cannot be ended', async () => {
    const { email } = await somebody()
    const [phone, desk] = [new CookieJar('phone'), new CookieJar('desk')]
    await phone.signIn(email, password)
    await desk.signIn(email, password)
    const { devices } = (await desk.send('GET', '/api/sessions')).body as { devices: { id: string; current: boolean }[] }
    const other = devices.find((device) => !device.current)?.id
    const attacker = new CookieJar()
    await attacker.signIn((await somebody()).email, password)
    expect((await attacker.send('DELETE', `/api/sessions/${other}`)).status).toBe(404)
    expect(await signedIn(phone)).toBe(true)
    expect((await desk.send('DELETE', `/api/sessions/${other}`)).status).toBe(200)
    expect([await signedIn(phone), await signedIn(desk)]).toEqual([false, true])
    expect((await desk.send('DELETE', `/api/sessions/${other}`)).status).toBe(404)
  })
})
