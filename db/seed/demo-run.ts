import type { ContactInput, StageInput } from '@/lib/contracts/directory'

/** The demo's run: sixteen days, nine shows, two hires. Offsets count from its first day; the fourth is "today". */
export const demoDays = 16
export const demoToday = 3
export const demoTravels = [4, 7, 12]

export type DemoShow = {
  offset: number
  venue: string
  town: string
  country: string
  zone: string
  rig: 'full rig' | 'fly rig'
  stage: Pick<StageInput, 'widthM' | 'depthM' | 'heightM' | 'access'>
  /** Local part of the house crew's address; the local mailbox sends back whatever goes to "bounce". */
  mailbox?: string
  festival?: boolean
}

const stage = (widthM: number, depthM: number, heightM: number, access: StageInput['access']) => ({
  widthM,
  depthM,
  heightM,
  access,
})

export const demoShows: readonly DemoShow[] = [
  {
    offset: 0,
    venue: 'Harbour Hall',
    town: 'Lisby',
    country: 'Denmark',
    zone: 'Europe/Copenhagen',
    rig: 'full rig',
    stage: stage(12, 9, 1.2, ['dock']),
  },
  {
    offset: 2,
    venue: 'Kornhaus',
    town: 'Welden',
    country: 'Germany',
    zone: 'Europe/Berlin',
    rig: 'full rig',
    stage: stage(10, 7, 1, ['door', 'stairs']),
  },
  {
    offset: 3,
    venue: 'Salle Nord',
    town: 'Arvic',
    country: 'France',
    zone: 'Europe/Paris',
    rig: 'full rig',
    stage: stage(11, 8, 1.1, ['lift']),
  },
  {
    offset: 5,
    venue: 'The Tannery',
    town: 'Millford',
    country: 'United Kingdom',
    zone: 'Europe/London',
    rig: 'full rig',
    stage: stage(9, 6.5, 0.9, ['push']),
  },
  {
    offset: 6,
    venue: 'Opera Annex',
    town: 'Brennau',
    country: 'Austria',
    zone: 'Europe/Vienna',
    rig: 'full rig',
    stage: stage(14, 10, 1.1, ['dock', 'lift']),
  },
  {
    offset: 8,
    venue: 'Dock 9',
    town: 'Havnes',
    country: 'Norway',
    zone: 'Europe/Oslo',
    rig: 'fly rig',
    stage: stage(8, 6, 0.8, ['door']),
  },
  {
    offset: 9,
    venue: 'Union Rooms',
    town: 'Castleby',
    country: 'Ireland',
    zone: 'Europe/Dublin',
    rig: 'fly rig',
    stage: stage(8, 5.5, 0.8, ['stairs']),
    mailbox: 'bounce',
  },
  {
    offset: 11,
    venue: 'Palais Est',
    town: 'Montrive',
    country: 'France',
    zone: 'Europe/Paris',
    rig: 'full rig',
    stage: stage(13, 9, 1.2, ['dock']),
  },
  {
    offset: 13,
    venue: 'Lakeside',
    town: 'Orrin',
    country: 'Switzerland',
    zone: 'Europe/Zurich',
    rig: 'full rig',
    stage: stage(18, 12, 1.6, ['push']),
    festival: true,
  },
]

export const demoHires = [
  {
    key: 'Northline',
    town: 'Lisby',
    country: 'Denmark',
    zone: 'Europe/Copenhagen',
    currency: 'EUR',
    from: 0,
    to: 6,
    transport: '480.00',
  },
  {
    key: 'Fjord Backline',
    town: 'Havnes',
    country: 'Norway',
    zone: 'Europe/Oslo',
    currency: 'NOK',
    from: 8,
    to: 13,
    transport: '',
  },
] as const

/** "Harbour Hall" → "harbour-hall". */
export function mailDomain(name: string): string {
  return `${name.toLowerCase().replace(/[^a-z0-9]+/g, '-')}.example`
}

export function houseCrew(show: DemoShow): ContactInput {
  return {
    name: `${show.venue} house crew`,
    email: `${show.mailbox ?? 'crew'}@${mailDomain(show.venue)}`,
    phone: '',
    duties: ['backline', 'sound'],
  }
}
