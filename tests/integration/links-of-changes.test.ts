import { and, eq, isNull } from 'drizzle-orm'
import { beforeAll, describe, expect, it } from 'vitest'
import { db } from '@/db/client'
import { grant } from '@/db/schema/grant'
import { firstLine, give, issue, readReplyOf, send } from '../helpers/advance-fixture'
import { stranger } from '../helpers/http-client'
import type { PartyFixture } from '../helpers/party-fixture'
import { makeParty } from '../helpers/party-fixture'
import type { TourFixture } from '../helpers/tour-fixture'
import { makeTour } from '../helpers/tour-fixture'

const messageOf = (answer: { body: unknown }) => (answer.body as { error: { message: string } }).error.message

describe('links of a show or hire that changes', () => {
  let party: PartyFixture

  beforeAll(async () => {
    party = await makeParty()
  })

  it('end with the house that they were made for', async () => {
    const elsewhere = await makeTour(party)
    const moving = await makeTour(party)
    const revision = await issue(party, moving)
    const sent = await send(party, moving, revision)
    const showAt = (tourOf: TourFixture, stageId: string) =>
      party.tourManager.call('PATCH', `/api/shows/${tourOf.showId}`, {
        version: 1,
        show: {
          ...{ name: '', dayId: tourOf.dayId, rigId: tourOf.rigId, stageId, playerId: party.playerId, zone: null },
          ...{ loadInTime: null, showTime: null, showDayOffset: 0, answersDue: null, slot: null, sharedKit: null },
        },
      })
    expect((await showAt(moving, elsewhere.stageId)).status).toBe(200)
    expect((await stranger('GET', sent.path)).status).toBe(410)
    expect(await db().select({ id: grant.id }).from(grant).where(and(eq(grant.showId, moving.showId), isNull(grant.withdrawnAt)))).toEqual([])
    // The first house has no show any more, but its mail is on record.
    const venue = await party.tourManager.call('DELETE', `/api/venues/${moving.venueId}`, { version: 1 })
    expect(venue.status).toBe(409)
    expect(messageOf(venue)).toContain('has had mail or a link')

    const answered = await makeTour(party)
    const asked = await send(party, answered, await issue(party, answered))
    expect((await give(asked, firstLine(await readReplyOf(asked)))).status).toBe(200)
    const kept = await showAt(answered, elsewhere.stageId)
    expect(kept.status).toBe(409)
    expect(messageOf(kept)).toContain('has answered for this show')
    expect((await stranger('GET', asked.path)).status).toBe(200)
  })

  it('last until two weeks after the day that they serve, also when that day moves away', async () => {
    const moving = await makeTour(party)
    const revision = await issue(party, moving)
    const ofShow = await send(party, moving, revision)
    const ofHire = await send(party, moving, revision, 'hire')
    const endOf = async (grantId: string) => {
      const [row] = await db().select({ end: grant.expiresAt }).from(grant).where(eq(grant.id, grantId))
      return row?.end.toISOString()
    }
    // Through the fourteenth day after 14 and 15 October, by the clocks of Paris, after summer time.
    expect([await endOf(ofShow.grantId), await endOf(ofHire.grantId)]).toEqual([
      '2031-10-28T23:00:00.000Z',
      '2031-10-29T23:00:00.000Z',
    ])
    const days = await party.tourManager.call('POST', `/api/tours/${moving.tourId}/days`, {
      days: { firstDate: '2031-12-01', lastDate: '2031-12-01', kind: 'off', remark: '' },
    })
    const dayId = (days.body as { days: { id: string }[] }).days[0]?.id
    const shown = await party.tourManager.call('PATCH', `/api/shows/${moving.showId}`, {
      version: 1,
      show: {
        ...{ name: '', dayId, rigId: moving.rigId, stageId: moving.stageId, playerId: party.playerId, zone: null },
        ...{ loadInTime: null, showTime: null, showDayOffset: 0, answersDue: null, slot: null, sharedKit: null },
      },
    })
    expect(shown.status).toBe(200)
    // Through 15 December, in winter time: the hire's last show moved with it.
    expect([await endOf(ofShow.grantId), await endOf(ofHire.grantId)]).toEqual([
      '2031-12-15T23:00:00.000Z',
      '2031-12-15T23:00:00.000Z',
    ])
    const hire = {
      ...{ supplierId: moving.supplierId, name: '', showIds: [moving.showId], zone: null, receiver: '', poNumber: '' },
      ...{ deliveryDate: '2031-11-30', deliveryFrom: null, deliveryUntil: null, conditionOnReturn: '', rateBasis: 'day' },
      ...{ collectionDate: '2031-12-20', collectionFrom: null, collectionUntil: null, currency: null, transport: '' },
      ...{ taxPercent: null, validUntil: null, answersDue: null, confirmed: false },
    }
    const hired = await party.tourManager.call('PATCH', `/api/hires/${moving.hireId}`, { version: 1, hire })
    expect(hired.status).toBe(200)
    const elsewhere = await makeTour(party)
    const taken = await party.tourManager.call('PATCH', `/api/hires/${moving.hireId}`, {
      version: 2,
      hire: { ...hire, supplierId: elsewhere.supplierId },
    })
    expect(taken.status).toBe(409)
    expect(messageOf(taken)).toContain('was asked or has answered')
    // The supplier's zone is not known, so the day is told in UTC.
    expect(await endOf(ofHire.grantId)).toBe('2032-01-04T00:00:00.000Z')
  })
})
