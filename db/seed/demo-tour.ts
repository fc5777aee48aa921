import { createContact } from '@/lib/server/directory/contacts'
import { createStage } from '@/lib/server/directory/stages'
import { createSupplier } from '@/lib/server/directory/suppliers'
import { createVenue } from '@/lib/server/directory/venues'
import { createHire } from '@/lib/server/hires/hires'
import { createPlayer } from '@/lib/server/players/players'
import { changeDay } from '@/lib/server/tours/days'
import { readRun } from '@/lib/server/tours/read-run'
import { createRig } from '@/lib/server/tours/rigs'
import { createShow } from '@/lib/server/tours/shows'
import { createTour } from '@/lib/server/tours/tours'
import { dateAfter } from '@/lib/staging/calendar'
import { demoId } from './demo-id'
import { demoRigId } from './demo-kit'
import { demoDays, demoHires, demoShows, demoToday, demoTravels, houseCrew, mailDomain } from './demo-run'
import type { Team } from './demo-team'

export const demoTourId = demoId('tour')
export const demoShowId = (venue: string) => demoId('show', venue)
export const demoHireId = (key: string) => demoId('hire', key)
export const demoContactId = (house: string) => demoId('contact', house)

/** Days from "today" on which a show's answers are due. */
const dueAfterToday: Record<string, number> = {
  'Harbour Hall': -8,
  Kornhaus: -6,
  'Salle Nord': -2,
  'The Tannery': 1,
  'Opera Annex': 1,
  'Dock 9': -1,
  'Union Rooms': 2,
  'Palais Est': 4,
  Lakeside: 6,
}

/** Tour, rigs, days, player, directory, shows and hires, by the tour manager. `today` is YYYY-MM-DD. */
export async function makeTour(team: Team, today: string): Promise<void> {
  const manager = team['tour-manager']
  const firstDate = dateAfter(today, -demoToday)
  const dateOf = (offset: number) => dateAfter(firstDate, offset)
  const playerId = demoId('player')
  await createPlayer(manager, { id: playerId, player: { name: 'Ilka Marrow', hand: 'right', throneHeightM: 0.52 } })
  await createTour(manager, {
    id: demoTourId,
    rigId: demoRigId('full rig'),
    tour: { name: 'Low Water run', rigName: 'full rig', playerName: null, firstDate, lastDate: dateOf(demoDays - 1) },
  })
  await createRig(manager, { tourId: demoTourId, id: demoRigId('fly rig'), rig: { name: 'fly rig', position: 1 } })
  const { days } = await readRun(manager, demoTourId)
  const dayOf = new Map(days.flatMap(({ date, day }) => (day ? [[date, day] as const] : [])))
  for (const offset of demoTravels) {
    const day = dayOf.get(dateOf(offset))
    if (day?.kind === 'off')
      await changeDay(manager, { dayId: day.id, version: day.version, day: { kind: 'travel', remark: '' } })
  }
  for (const show of demoShows) {
    const dayId = dayOf.get(dateOf(show.offset))?.id
    if (!dayId) throw new Error(`no day for ${show.venue}`)
    const { venue, town, country, zone } = show
    const venueId = demoId('venue', venue)
    const stageId = demoId('stage', venue)
    await createVenue(manager, { id: venueId, venue: { name: venue, town, country, zone, remark: '' } })
    await createStage(manager, {
      venueId,
      id: stageId,
      stage: {
        name: 'Main stage',
        ...show.stage,
        volts: 230,
        mainsHz: 50,
        inlets: 'blue 16 A, upstage left and right',
      },
    })
    await createContact(manager, { of: { venueId }, id: demoContactId(venue), contact: houseCrew(show) })
    await createShow(manager, {
      tourId: demoTourId,
      id: demoShowId(venue),
      show: {
        name: show.festival ? 'Lakeside Days' : '',
        ...{ dayId, rigId: demoRigId(show.rig), stageId, playerId, zone },
        loadInTime: show.festival ? '11:00' : '14:00',
        showTime: show.festival ? '00:30' : '20:30',
        showDayOffset: show.festival ? 1 : 0,
        answersDue: { date: dateAfter(today, dueAfterToday[venue] ?? 0), time: '18:00' },
        slot: show.festival
          ? { changeoverMin: 25, lineCheckMin: 10, riserParking: 'upstage right, behind the black' }
          : null,
        sharedKit: show.festival ? { owner: 'the festival', mayRetune: true, maySwap: 'snare, cymbals, pedal' } : null,
      },
    })
  }
  for (const hire of demoHires) {
    const supplierId = demoId('supplier', hire.key)
    const { town, country, zone, currency } = hire
    await createSupplier(manager, {
      id: supplierId,
      supplier: { name: hire.key, town, country, zone, currency, remark: '' },
    })
    await createContact(manager, {
      of: { supplierId },
      id: demoContactId(hire.key),
      contact: {
        name: `${hire.key} desk`,
        email: `desk@${mailDomain(hire.key)}`,
        phone: '',
        duties: ['backline', 'delivery'],
      },
    })
    await createHire(manager, {
      tourId: demoTourId,
      id: demoHireId(hire.key),
      hire: {
        supplierId,
        name: 'One van',
        showIds: demoShows
          .filter(({ offset }) => offset >= hire.from && offset <= hire.to)
          .map(({ venue }) => demoShowId(venue)),
        zone,
        ...{ deliveryDate: dateOf(hire.from), deliveryFrom: '09:00', deliveryUntil: '11:00' },
        ...{ collectionDate: dateOf(hire.to + 1), collectionFrom: '08:00', collectionUntil: '12:00' },
        receiver: 'Jory Pell, drum tech',
        conditionOnReturn: 'heads stay on, tape off',
        poNumber: '',
        rateBasis: 'show',
        currency,
        transport: hire.transport,
        taxPercent: null,
        validUntil: null,
        answersDue: { date: dateAfter(today, hire.from === 0 ? 1 : 5), time: '17:00' },
        confirmed: false,
      },
    })
  }
}
