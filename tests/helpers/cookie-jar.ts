import { randomInt } from 'node:crypto'
import type { Answer } from './http-client'
import { baseUrl, ONE_CALL } from './http-client'

/** A browser as far as cookies go: keeps what the app sets, sends it back, follows nothing by itself. */
export class CookieJar {
  readonly #cookies = new Map<string, string>()
  /** The whole Set-Cookie lines of the last answer, for their flags. */
  lastSetCookies: string[] = []
  /** Its own network address, so that the limits of one test never count for another. */
  readonly address = `10.${randomInt(256)}.${randomInt(256)}.${randomInt(1, 255)}`
  readonly userAgent: string

  constructor(userAgent = 'test device') {
    this.userAgent = userAgent
  }

  has(name: string): boolean {
    return this.#cookies.has(name)
  }

  async send(
    method: string,
    path: string,
    sent: { json?: unknown; form?: Record<string, string>; headers?: Record<string, string> } = {},
  ): Promise<Answer & { location: string | null }> {
    const body = sent.form ? new URLSearchParams(sent.form) : sent.json === undefined ? undefined : JSON.stringify(sent.json)
    const response = await fetch(new URL(path, baseUrl()), {
      method,
      redirect: 'manual',
      headers: {
        ...ONE_CALL,
        cookie: [...this.#cookies].map(([name, value]) => `${name}=${value}`).join('; '),
        'x-forwarded-for': this.address,
        'user-agent': this.userAgent,
        ...(sent.json === undefined ? {} : { 'content-type': 'application/json' }),
        ...sent.headers,
      },
      ...(body === undefined ? {} : { body }),
    })
    this.lastSetCookies = response.headers.getSetCookie()
    for (const line of this.lastSetCookies) {
      const [pair = ''] = line.split(';')
      const cut = pair.indexOf('=')
      const value = pair.slice(cut + 1)
      if (value) this.#cookies.set(pair.slice(0, cut), value)
      else this.#cookies.delete(pair.slice(0, cut))
    }
    const text = await response.text()
    const isJson = response.headers.get('content-type')?.includes('json')
    return {
      status: response.status,
      body: isJson && text ? (JSON.parse(text) as unknown) : text,
      headers: response.headers,
      location: response.headers.get('location'),
    }
  }

  /** Next-auth's token against changes sent by other sites; it goes with every one of its forms. */
  async csrfToken(): Promise<string> {
    return ((await this.send('GET', '/api/auth/csrf')).body as { csrfToken: string }).csrfToken
  }

  /** The password form, as the sign-in page sends it. Answers where next-auth leads. */
  async signIn(email: string, password: string, callbackUrl = '/tours') {
    const csrfToken = await this.csrfToken()
    const answer = await this.send('POST', '/api/auth/callback/credentials', {
      form: { email, password, csrfToken, callbackUrl, json: 'true' },
    })
    return { ...answer, url: new URL((answer.body as { url: string }).url) }
  }

  /** The form that asks for a link by mail. */
  async askForLink(email: string, callbackUrl = '/tours') {
    const csrfToken = await this.csrfToken()
    const answer = await this.send('POST', '/api/auth/signin/email', { form: { email, csrfToken, callbackUrl, json: 'true' } })
    return { ...answer, url: new URL((answer.body as { url: string }).url) }
  }
}
