import { randomUUID } from 'node:crypto'
import { db } from '@/db/client'
import { contact, stage, supplier, venue } from '@/db/schema/directory'
import { hire, hireShow } from '@/db/schema/hire'
import { kitEntry } from '@/db/schema/kit'
import { day, rig, show, tour } from '@/db/schema/tour'
import type { DrumSpec } from '@/lib/contracts/kit'
import type { PartyFixture } from './party-fixture'

export const tomSpec: DrumSpec = {
  role: 'tom',
  diameterIn: 12,
  depthIn: 8,
  lugs: 6,
  shell: 'maple',
  ported: false,
  batter: { plyMils: [10], film: 'coated', coatingGPerM2: 0, damping: 'none', gauge: 75, range: null },
  resonant: { plyMils: [10], film: 'clear', coatingGPerM2: 0, damping: 'none', gauge: 75, range: null },
  note: { semitone: 50, cents: 0 },
  noteLocked: false,
  headRelationCents: 0,
  measuredTapRatio: null,
  warbleLimitHz: 1,
  toleranceCents: 10,
  muffling: '',
  insteadOf: { diameterMinIn: 12, diameterMaxIn: 13, depthMinIn: 7, depthMaxIn: 10 },
}

export type TourFixture = {
  tourId: string
  rigId: string
  dayId: string
  showId: string
  venueId: string
  stageId: string
  contactId: string
  supplierId: string
  supplierContactId: string
  hireId: string
  /** A rented 12 in tom, note D3. */
  tomId: string
  /** The venue's ride cymbal. */
  rideId: string
}

/** A tour with one rig, one show at one stage, and one hire covering it, written straight into the tables. */
export async function makeTour(party: PartyFixture): Promise<TourFixture> {
  const { partyId } = party
  const made: TourFixture = {
    tourId: randomUUID(),
    rigId: randomUUID(),
    dayId: randomUUID(),
    showId: randomUUID(),
    venueId: randomUUID(),
    stageId: randomUUID(),
    contactId: randomUUID(),
    supplierId: randomUUID(),
    supplierContactId: randomUUID(),
    hireId: randomUUID(),
    tomId: randomUUID(),
    rideId: randomUUID(),
  }
  await db().transaction(async (tx) => {
    await tx.insert(tour).values({ id: made.tourId, partyId, name: 'Test run' })
    await tx.insert(rig).values({ id: made.rigId, partyId, tourId: made.tourId, name: 'full rig' })
    await tx.insert(day).values({ id: made.dayId, partyId, tourId: made.tourId, date: '2031-10-14', kind: 'show' })
    await tx.insert(venue).values({ id: made.venueId, partyId, name: 'Test Hall', town: 'Arvic', zone: 'Europe/Paris' })
    await tx.insert(stage).values({ id: made.stageId, partyId, venueId: made.venueId, name: 'Main', widthM: 10, depthM: 8 })
    await tx.insert(contact).values({
      id: made.contactId,
      partyId,
      venueId: made.venueId,
      name: 'House crew',
      email: `house-${made.contactId}@venue.example`,
      duties: ['backline'],
    })
    await tx.insert(supplier).values({ id: made.supplierId, partyId, name: 'Test Backline', currency: 'EUR' })
    await tx.insert(contact).values({
      id: made.supplierContactId,
      partyId,
      supplierId: made.supplierId,
      name: 'Hire desk',
      email: `desk-${made.supplierContactId}@supplier.example`,
      duties: ['backline'],
    })
    await tx.insert(show).values({
      id: made.showId,
      partyId,
      tourId: made.tourId,
      dayId: made.dayId,
      rigId: made.rigId,
      stageId: made.stageId,
      playerId: party.playerId,
      zone: 'Europe/Paris',
      showTime: '20:30',
      answersDueAt: new Date('2031-10-02T16:00:00Z'),
    })
    await tx.insert(hire).values({
      id: made.hireId,
      partyId,
      tourId: made.tourId,
      supplierId: made.supplierId,
      currency: 'EUR',
      zone: 'Europe/Paris',
      deliveryDate: '2031-10-14',
      collectionDate: '2031-10-15',
    })
    await tx.insert(hireShow).values({ partyId, hireId: made.hireId, showId: made.showId })
    await tx.insert(kitEntry).values([
      { id: made.tomId, partyId, rigId: made.rigId, kind: 'drum', name: 'Tom 12', supply: 'rented', spec: tomSpec, position: 0 },
      {
        id: made.rideId,
        partyId,
        rigId: made.rigId,
        kind: 'cymbal',
        name: 'Ride 21',
        supply: 'venue',
        spec: { type: 'ride', diameterIn: 21 },
        position: 1,
      },
    ])
  })
  return made
}
