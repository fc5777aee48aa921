import { expect } from 'vitest'
import { stranger } from './http-client'
import type { HttpClient } from './http-client'

/**
 * What no changing route may let through: nobody (401), a reader (403), another party (404), a body too large (413), one that
 * is no JSON (422). `ours` may do it; the caller proves that afterwards, so that a route which refuses everybody is found too.
 */
export async function attackRoute(input: {
  method: string
  path: string
  body: unknown
  reader: HttpClient
  theirs: HttpClient | null
  ours: HttpClient
}): Promise<void> {
  const { method, path, body } = input
  const told = `${method} ${path}`
  expect((await stranger(method, path, body)).status, `${told} by nobody`).toBe(401)
  expect((await input.reader(method, path, body)).status, `${told} by a reader`).toBe(403)
  if (input.theirs) expect((await input.theirs(method, path, body)).status, `${told} by another party`).toBe(404)
  const large = JSON.stringify({ padding: 'x'.repeat(300 * 1024) })
  expect((await input.ours(method, path, large)).status, `${told} too large`).toBe(413)
  expect((await input.ours(method, path, '{"half":')).status, `${told} no JSON`).toBe(422)
  const crossSite = await input.ours(method, path, body, {
    'sec-fetch-site': 'cross-site',
    origin: 'https://other.example',
  })
  expect(crossSite.status, `${told} from another site`).toBe(403)
}

/** The fields that a 422 names. */
export function faultyFields(answer: { status: number; body: unknown }): string[] {
  expect(answer.status).toBe(422)
  const { error } = answer.body as { error: { details: { fields?: Record<string, string> } } }
  return Object.keys(error.details.fields ?? {}).sort()
}
