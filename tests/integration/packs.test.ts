import { randomUUID } from 'node:crypto'
import { eq } from 'drizzle-orm'
import { encode } from 'next-auth/jwt'
import { beforeAll, describe, expect, it } from 'vitest'
import { db } from '@/db/client'
import { pack } from '@/db/schema/advance'
import { hire, hireShow } from '@/db/schema/hire'
import { kitEntry } from '@/db/schema/kit'
import { rig, show } from '@/db/schema/tour'
import type { PackDocument } from '@/lib/advance/pack-document'
import { attackRoute, faultyFields } from '../helpers/attack-route'
import type { Answer, HttpClient } from '../helpers/http-client'
import { baseUrl, stranger } from '../helpers/http-client'
import type { PartyFixture } from '../helpers/party-fixture'
import { makeParty } from '../helpers/party-fixture'
import { readPdf } from '../helpers/read-pdf'
import type { TourFixture } from '../helpers/tour-fixture'
import { makeTour } from '../helpers/tour-fixture'

type State = {
  id: string
  pdf: 'making' | 'ready' | 'late'
  pages: number | null
  revisionNumber: number
  showId: string | null
  hireId: string | null
}
const stateOf = (answer: Answer) => answer.body as State
const messageOf = (answer: Answer) => (answer.body as { error: { message: string } }).error.message

describe('packs', () => {
  let party: PartyFixture
  let other: PartyFixture
  let tour: TourFixture

  beforeAll(async () => {
    party = await makeParty()
    other = await makeParty()
  })
  const fresh = async () => {
    tour = await makeTour(party)
    const issued = await party.drumTech.call('POST', `/api/rigs/${tour.rigId}/revisions`, { note: 'first' })
    expect(issued.status).toBe(201)
    return (issued.body as { id: string }).id
  }
  const make = (body: object, by: HttpClient = party.tourManager.call) => by('POST', '/api/packs', body)
  const documentOf = async (packId: string) =>
    (await db().select({ document: pack.document }).from(pack).where(eq(pack.id, packId)))[0]?.document as PackDocument
  const countPacks = async () =>
    (await db().select({ id: pack.id }).from(pack).where(eq(pack.showId, tour.showId))).length
  const pdfOf = async (packId: string, by: PartyFixture) => {
    const response = await by.viewer.call('GET', `/api/packs/${packId}/pdf`)
    return response
  }

  it('are previewed for a show: stored, then printed by the worker, without a link', async () => {
    await fresh()
    const answer = await make({ showId: tour.showId })
    expect(answer.status).toBe(201)
    expect(stateOf(answer)).toMatchObject({
      pdf: 'making',
      pages: null,
      revisionNumber: 1,
      showId: tour.showId,
      hireId: null,
    })
    const { id } = stateOf(answer)
    await expect
      .poll(async () => stateOf(await party.viewer.call('GET', `/api/packs/${id}`)).pdf, {
        timeout: 60_000,
        interval: 300,
      })
      .toBe('ready')
    const answered = await pdfOf(id, party)
    expect(answered.status).toBe(200)
    expect(answered.headers.get('content-type')).toBe('application/pdf')
    expect(answered.headers.get('content-disposition')).toMatch(/^inline; .*revision%201%2C%20Test%20Hall\.pdf$/)
    const bytes = await fetchPdf(id)
    const file = await readPdf(bytes)
    expect(file.pages).toHaveLength(stateOf(await party.viewer.call('GET', `/api/packs/${id}`)).pages ?? 0)
    expect(file.links).toEqual([])
    const text = file.pages.map((page) => page.text).join(' ')
    for (const words of ['Test Hall', 'Tom 12', 'Ride 21', 'Tuning sheet, Tom 12']) expect(text).toContain(words)
  }, 90_000)

  const fetchPdf = async (id: string): Promise<Uint8Array> => {
    const cookie = await encode({
      token: { sub: party.viewer.personId, sessionId: party.viewer.sessionId },
      secret: process.env['NEXTAUTH_SECRET'] ?? '',
    })
    const response = await fetch(new URL(`/api/packs/${id}/pdf`, baseUrl()), {
      headers: { cookie: `next-auth.session-token=${cookie}` },
    })
    return new Uint8Array(await response.arrayBuffer())
  }

  it('of a hire hold the supplier’s lines and no price, no stage, no other house’s contact', async () => {
    await fresh()
    await db().update(hire).set({ transportMinor: 98_765_432, currency: 'EUR' }).where(eq(hire.id, tour.hireId))
    const answer = await make({ hireId: tour.hireId }, party.drumTech.call)
    expect(answer.status).toBe(201)
    const document = await documentOf(stateOf(answer).id)
    expect(document.lines.map(({ words }) => words)).toEqual(['Tom 12, 12 in across, 8 deep (305 × 203 mm), 6 lugs'])
    expect(document).toMatchObject({
      audience: 'supplier',
      sheets: [],
      plot: null,
      recipient: { name: 'Test Backline' },
    })
    const text = JSON.stringify(document)
    for (const secret of ['98765432', '987654', tour.contactId, 'venue.example', 'Main'])
      expect(text).not.toContain(secret)
    expect(text).toContain(tour.supplierContactId)
  })

  it('of a venue name the supplier and ask only for what the house brings; without a hire the house is asked for all', async () => {
    await fresh()
    const withHire = await documentOf(stateOf(await make({ showId: tour.showId })).id)
    expect(withHire.lines.map(({ asked, broughtBy }) => [asked, broughtBy])).toEqual([
      [false, 'Test Backline'],
      [true, 'you'],
    ])
    await db().delete(hireShow).where(eq(hireShow.hireId, tour.hireId))
    const without = await documentOf(stateOf(await make({ showId: tour.showId })).id)
    expect(without.lines.every(({ asked }) => asked)).toBe(true)
  })

  it('are the same preview when the same request comes again', async () => {
    await fresh()
    const id = randomUUID()
    const [first, second] = [await make({ id, showId: tour.showId }), await make({ id, showId: tour.showId })]
    expect([first.status, second.status, stateOf(second).id]).toEqual([201, 201, id])
    expect(await countPacks()).toBe(1)
    expect((await make({ id, hireId: tour.hireId })).status).toBe(409)
    const theirs = await makeTour(other)
    await other.drumTech.call('POST', `/api/rigs/${theirs.rigId}/revisions`, { note: 'theirs' })
    expect((await make({ id, showId: theirs.showId }, other.tourManager.call)).status).toBe(409)
  })

  it('need a revision, and one of the right rig', async () => {
    tour = await makeTour(party)
    const none = await make({ showId: tour.showId })
    expect(none.status).toBe(409)
    expect(messageOf(none)).toContain('Issue one first')
    const elsewhere = await fresh()
    const mine = await makeTour(party)
    expect((await make({ showId: mine.showId, revisionId: elsewhere })).status).toBe(404)
    expect((await make({ showId: mine.showId, revisionId: randomUUID() })).status).toBe(404)
  })

  it('of a hire over two rigs ask which, and of a hire over none say so', async () => {
    await fresh()
    const flyRig = randomUUID()
    await db().insert(rig).values({ id: flyRig, partyId: party.partyId, tourId: tour.tourId, name: 'fly rig' })
    const second = randomUUID()
    const [row] = await db().select().from(show).where(eq(show.id, tour.showId))
    if (!row) throw new Error('the show is there')
    await db()
      .insert(show)
      .values({ ...row, id: second, rigId: flyRig })
    await db().insert(hireShow).values({ partyId: party.partyId, hireId: tour.hireId, showId: second })
    const asked = await make({ hireId: tour.hireId })
    expect(asked.status).toBe(409)
    expect(messageOf(asked)).toMatch(/full rig and fly rig|fly rig and full rig/)
    expect((await make({ hireId: tour.hireId, rigId: tour.rigId })).status).toBe(201)
    expect((await make({ hireId: tour.hireId, rigId: randomUUID() })).status).toBe(404)
    await db().delete(hireShow).where(eq(hireShow.hireId, tour.hireId))
    expect(messageOf(await make({ hireId: tour.hireId }))).toContain('covers no show')
  })

  it('of a supplier are refused when nothing is rented', async () => {
    await fresh()
    await db().update(kitEntry).set({ supply: 'venue' }).where(eq(kitEntry.id, tour.tomId))
    await party.drumTech.call('POST', `/api/rigs/${tour.rigId}/revisions`, { note: 'nothing rented' })
    const refused = await make({ hireId: tour.hireId })
    expect(refused.status).toBe(409)
    expect(messageOf(refused)).toContain('no entry of the kit is rented')
  })

  it('name the field at fault and are refused to whoever must not', async () => {
    await fresh()
    expect(faultyFields(await make({}))).toEqual(['showId'])
    expect(faultyFields(await make({ showId: tour.showId, hireId: tour.hireId }))).toEqual(['showId'])
    expect(faultyFields(await make({ hireId: 'seven' }))).toEqual(['hireId'])
    const attack = {
      method: 'POST',
      path: '/api/packs',
      reader: party.viewer.call,
      theirs: other.tourManager.call,
      ours: party.tourManager.call,
    }
    await attackRoute({ ...attack, body: { showId: tour.showId } })
    await attackRoute({ ...attack, body: { hireId: tour.hireId } })
    expect(await countPacks()).toBe(0)
    expect((await make({ showId: tour.showId })).status).toBe(201)
  })

  it('and their bytes are read by members only, the bytes once they are there', async () => {
    await fresh()
    const { id } = stateOf(await make({ showId: tour.showId }))
    for (const path of [`/api/packs/${id}`, `/api/packs/${id}/pdf`]) {
      expect((await stranger('GET', path)).status).toBe(401)
      expect((await other.owner.call('GET', path)).status).toBe(404)
    }
    expect((await party.viewer.call('GET', `/api/packs/${randomUUID()}/pdf`)).status).toBe(404)
    expect((await party.viewer.call('GET', '/api/packs/seven/pdf')).status).toBe(422)
    const unmade = randomUUID()
    const [row] = await db().select().from(pack).where(eq(pack.id, id))
    if (!row) throw new Error('the pack is there')
    await db()
      .insert(pack)
      .values({ ...row, id: unmade, pdfBlobId: null, pdfPages: null })
    expect((await party.viewer.call('GET', `/api/packs/${unmade}/pdf`)).status).toBe(409)
  })
})
