import { encode } from 'next-auth/jwt'

/** Where the running app is. Vitest sets BASE_URL to a value of its own, so the app's address is read from APP_URL. */
export function baseUrl(): string {
  const url = process.env['APP_URL']
  if (!url) throw new Error('APP_URL is not set: these tests talk to a running app (npm test starts one)')
  return url
}

export type Answer = { status: number; body: unknown; headers: Headers }
export type HttpClient = (method: string, path: string, body?: unknown, headers?: Record<string, string>) => Promise<Answer>

/** One connection a call: one kept open may be closed by the server at the moment the next call begins. */
export const ONE_CALL = { connection: 'close' }

async function call(method: string, path: string, body: unknown, headers: Record<string, string>): Promise<Answer> {
  const response = await fetch(new URL(path, baseUrl()), {
    method,
    redirect: 'manual',
    headers: { ...ONE_CALL, ...(body === undefined ? {} : { 'content-type': 'application/json' }), ...headers },
    ...(body === undefined ? {} : { body: typeof body === 'string' ? body : JSON.stringify(body) }),
  })
  const text = await response.text()
  const isJson = response.headers.get('content-type')?.includes('json')
  return { status: response.status, body: isJson ? (JSON.parse(text) as unknown) : text, headers: response.headers }
}

/** Nobody: no cookie. */
export const stranger: HttpClient = (method, path, body, headers = {}) => call(method, path, body, headers)

/** A signed-in device: the cookie next-auth would have set, naming a session row. */
export async function deviceOf(session: { personId: string; sessionId: string }): Promise<HttpClient> {
  const secret = process.env['NEXTAUTH_SECRET']
  if (!secret) throw new Error('NEXTAUTH_SECRET is not set')
  const cookie = await encode({ token: { sub: session.personId, sessionId: session.sessionId }, secret })
  return (method, path, body, headers = {}) => call(method, path, body, { cookie: `next-auth.session-token=${cookie}`, ...headers })
}
