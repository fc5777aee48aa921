import { randomUUID } from 'node:crypto'
import { readdirSync, readFileSync } from 'node:fs'
import { beforeAll, describe, expect, test } from 'vitest'
import { grant, grantToken } from '@/db/schema/grant'
import { db } from '@/db/client'
import { hashToken, linkToken } from '@/lib/server/auth/link-token'
import { stranger } from '../helpers/http-client'
import type { PartyFixture } from '../helpers/party-fixture'
import { makeParty } from '../helpers/party-fixture'
import type { TourFixture } from '../helpers/tour-fixture'
import { makeTour } from '../helpers/tour-fixture'

/**
 * What every route must refuse whatever it does, read off the route files themselves: a route that is added later is attacked
 * without anybody thinking of it. What a route's own roles and rules refuse is tested beside its resource.
 */

type Guard = 'signed-in' | 'link' | 'open'
type Route = { method: string; path: string; guard: Guard; purpose: 'r' | 'b' | null }

const methods = ['GET', 'POST', 'PUT', 'PATCH', 'DELETE'] as const

/** Guarded by hand or by nothing, each with its reason and its own test. */
const apart = new Set([
  'auth/[...nextauth]', // next-auth's own, tested in auth-sign-in
  'health', // for a balancer
  'webhooks/mail', // guarded by its signature, tested in webhook
])

function guardOf(source: string, path: string): Guard {
  if (/definePublicRoute|linkActor\(/.test(source) || /^(r|b)\//.test(path)) return 'link'
  if (/defineOpenRoute/.test(source)) return 'open'
  return 'signed-in'
}

const routes: Route[] = readdirSync('app/api', { recursive: true, encoding: 'utf8' })
  .filter((file) => file.endsWith('route.ts'))
  .flatMap((file) => {
    const path = file.replaceAll('\\', '/').replace(/\/route\.ts$/, '')
    if (apart.has(path)) return []
    const source = readFileSync(`app/api/${file}`, 'utf8')
    const guard = guardOf(source, path)
    const purpose = guard === 'link' ? (path.startsWith('b/') ? ('b' as const) : ('r' as const)) : null
    return methods
      .filter((method) => new RegExp(`export (const|async function) ${method}\\b`).test(source))
      .map((method) => ({ method, path, guard, purpose }))
  })

const signedIn = routes.filter(({ guard }) => guard === 'signed-in')
const byLink = routes.filter(({ guard }) => guard === 'link')
const changing = (list: Route[]) =>
  list.filter(({ method }) => method === 'POST' || method === 'PUT' || method === 'PATCH')

const address = (path: string, token = 'x'.repeat(43)) =>
  `/api/${path.replace('[token]', token).replace(/\[[^\]]+\]/g, () => randomUUID())}`

let party: PartyFixture
let tour: TourFixture

async function link(row: { purpose: 'reply' | 'bench'; expiresAt: Date; withdrawnAt: Date | null }): Promise<string> {
  const grantId = randomUUID()
  const tokenId = randomUUID()
  await db()
    .insert(grant)
    .values({
      id: grantId,
      partyId: party.partyId,
      showId: tour.showId,
      recipientName: 'Anybody',
      createdBy: party.owner.personId,
      ...row,
    })
  await db()
    .insert(grantToken)
    .values({
      id: tokenId,
      partyId: party.partyId,
      grantId,
      tokenHash: hashToken(linkToken('grant', tokenId)),
      madeFor: 'print',
    })
  return linkToken('grant', tokenId)
}

const soon = () => new Date(Date.now() + 3_600_000)

beforeAll(async () => {
  party = await makeParty()
  tour = await makeTour(party)
})

test('the routes were found', () => {
  expect(signedIn.length).toBeGreaterThan(50)
  expect(byLink.length).toBeGreaterThan(5)
})

describe('a route for signed-in people', () => {
  test.each(signedIn)('$method $path refuses a stranger', async ({ method, path }) => {
    const answer = await stranger(method, address(path), method === 'GET' || method === 'DELETE' ? undefined : {})
    expect(answer.status).toBe(401)
    expect(answer.body).toMatchObject({ error: { code: 'signed-out' } })
  })

  test.each(changing(signedIn))('$method $path refuses another site’s page', async ({ method, path }) => {
    const headers = { origin: 'https://elsewhere.example', 'sec-fetch-site': 'cross-site' }
    expect((await party.owner.call(method, address(path), {}, headers)).status).toBe(403)
  })

  test.each(changing(signedIn))('$method $path refuses what is no JSON', async ({ method, path }) => {
    const answer = await party.owner.call(method, address(path), '{"half":')
    // A route that takes no body never reads it; then its own rules answer.
    expect([422, 403, 404]).toContain(answer.status)
  })

  test.each(changing(signedIn))('$method $path refuses more than it can hold', async ({ method, path }) => {
    const answer = await party.owner.call(method, address(path), { filler: 'x'.repeat(3 * 1024 * 1024) })
    expect([413, 403, 404]).toContain(answer.status)
  })
})

describe('a route behind a link', () => {
  test.each(byLink)('$method $path refuses a token that was never made', async ({ method, path }) => {
    expect((await stranger(method, address(path), method === 'GET' ? undefined : {})).status).toBe(404)
  })

  test.each(byLink)('$method $path refuses a token of another purpose', async ({ method, path, purpose }) => {
    const token = await link({ purpose: purpose === 'b' ? 'reply' : 'bench', expiresAt: soon(), withdrawnAt: null })
    expect((await stranger(method, address(path, token), method === 'GET' ? undefined : {})).status).toBe(404)
  })

  test.each(byLink)('$method $path refuses a withdrawn link', async ({ method, path, purpose }) => {
    const token = await link({
      purpose: purpose === 'b' ? 'bench' : 'reply',
      expiresAt: soon(),
      withdrawnAt: new Date(),
    })
    const answer = await stranger(method, address(path, token), method === 'GET' ? undefined : {})
    expect(answer.status).toBe(410)
    expect(answer.body).toMatchObject({ error: { details: { reason: 'withdrawn' } } })
  })

  test.each(byLink)('$method $path refuses a link that has run out', async ({ method, path, purpose }) => {
    const token = await link({
      purpose: purpose === 'b' ? 'bench' : 'reply',
      expiresAt: new Date(Date.now() - 1000),
      withdrawnAt: null,
    })
    const answer = await stranger(method, address(path, token), method === 'GET' ? undefined : {})
    expect(answer.status).toBe(410)
    expect(answer.body).toMatchObject({ error: { details: { reason: 'expired' } } })
  })

  test.each(changing(byLink))('$method $path refuses another site’s page', async ({ method, path, purpose }) => {
    const token = await link({ purpose: purpose === 'b' ? 'bench' : 'reply', expiresAt: soon(), withdrawnAt: null })
    const headers = { origin: 'https://elsewhere.example', 'sec-fetch-site': 'cross-site' }
    expect((await stranger(method, address(path, token), {}, headers)).status).toBe(403)
  })
})
