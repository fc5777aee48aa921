import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import type { PackContactInput, PackInput, PackRecipient } from './pack-input'
import { composePack } from './pack'
import { upgradePackDocument } from './pack-document'
import { sampleContacts, sampleHire, sampleKit, sampleRevision, sampleShow, sampleSpec } from './sample-revision'

const revision = {
  number: 7,
  issuedAt: '2031-09-20T10:00:00.000Z',
  note: 'First full spec.',
  document: sampleRevision(),
}
const venue: PackRecipient = { kind: 'venue', locale: 'en', show: sampleShow }
const supplier: PackRecipient = { kind: 'supplier', locale: 'en', hire: sampleHire, shows: [sampleShow] }
const compose = (recipient: PackRecipient, more: Partial<PackInput> = {}) =>
  composePack({ revision, recipient, contacts: sampleContacts, previous: null, ...more })

describe('a venue’s pack', () => {
  const pack = compose(venue)

  it('holds every line, with who brings it, and asks only for what the house brings', () => {
    expect(pack.lines.map(({ number, asked, broughtBy }) => [number, asked, broughtBy])).toEqual([
      [1, false, 'Fenland Backline'],
      [2, false, 'Fenland Backline'],
      [3, false, 'Fenland Backline'],
      [4, false, 'Fenland Backline'],
      [5, true, 'you'],
      [6, true, 'you'],
      [7, true, 'you'],
      [8, true, 'you'],
    ])
  })

  it('asks the house for everything while nobody is hired', () => {
    const { lines } = compose({ ...venue, show: { ...sampleShow, supplierNames: [] } })
    expect(lines.every(({ asked, broughtBy }) => asked && broughtBy === 'you')).toBe(true)
  })

  it('has one sheet for each drum, carried ones too, in the kit’s order', () => {
    expect(pack.sheets.map(({ name }) => name)).toEqual(['Kick 22', 'Snare 14', 'Tom 12', 'Tom 14', 'Floor tom 16'])
  })

  it('draws the plot on the house’s own stage and names what each channel takes', () => {
    expect(pack.plot?.stage).toEqual({ widthM: 10, depthM: 8 })
    expect(pack.plot?.kit.find(({ id }) => id === 'k-tom')).toMatchObject({ noteLabel: 'C♯3', lugs: 6 })
    expect(pack.channels.map(({ number, source }) => [number, source])).toEqual([
      [1, 'Drum microphones on Kick 22'],
      [2, 'Drum microphones on Snare 14'],
      [3, 'Drum microphones on Tom 12'],
      [4, 'Drum microphones on Tom 14'],
      [5, 'Drum microphones on Floor tom 16'],
    ])
  })

  it('has no plot page when nothing is placed', () => {
    const document = sampleRevision({
      ...sampleSpec,
      plot: { sequence: 0, document: { ...sampleSpec.plot.document, pieces: {} } },
    })
    expect(compose(venue, { revision: { ...revision, document } }).plot).toBeNull()
  })

  it('tells times with the venue’s zone and when answers are wanted', () => {
    expect(pack.shows[0]?.times).toEqual([
      { label: 'Load-in', words: 'Tue 14 Oct 2031, 14:00 (Europe/Paris)' },
      { label: 'Show', words: 'Tue 14 Oct 2031, 20:30 (Europe/Paris)' },
    ])
    expect(pack.answersDue).toBe('Thu 2 Oct 2031, 18:00 (Europe/Paris)')
  })

  it('carries every caution', () => {
    expect(pack.cautions.map(({ name }) => name)).toEqual(['Film and rods', 'Hearing', 'Lifting', 'Loads', 'Power'])
  })

  it('comes back whole from JSON', () => {
    expect(upgradePackDocument(JSON.parse(JSON.stringify(pack)))).toEqual(pack)
    expect(() => upgradePackDocument({ ...pack, schemaVersion: 2 })).toThrow('newer release')
    expect(() => upgradePackDocument({ lines: [] })).toThrow('Not a pack')
  })
})

describe('a pack from before both heads were worked out together', () => {
  it('is read with what it has: its batter’s note is the drum’s, figures that it lacks are none', () => {
    const pack = compose(venue)
    const older = pack.sheets.map(
      ({ note: _note, figures: _figures, warbleLimitHz: _limit, workedFrom: _from, heads, ...sheet }) => ({
        ...sheet,
        heads: heads.map(({ tensionNPerM: _tension, rodPullBoundsN: _bounds, toleranceHz: _hz, ...head }) => ({
          ...head,
          gauge: 75,
        })),
      }),
    )
    const read = upgradePackDocument(JSON.parse(JSON.stringify({ ...pack, sheets: older })))
    expect(read.sheets.map(({ note, figures }) => [note?.name, figures])).toEqual(
      pack.sheets.map(({ note }) => [note?.name, null]),
    )
    for (const head of read.sheets.flatMap(({ heads }) => heads)) {
      expect(head).toMatchObject({ tensionNPerM: null, rodPullBoundsN: null, toleranceHz: null })
      expect(head.gauge).toEqual({ kind: 'noted', reading: '75' })
    }
    expect(read.sheets.map(({ workedFrom, warbleLimitHz }) => [workedFrom, warbleLimitHz])).toEqual(
      pack.sheets.map(() => [null, 1]),
    )
    expect(read.sheets[2]?.heads[0]?.tap).toEqual(pack.sheets[2]?.heads[0]?.tap)
  })
})

describe('a supplier’s pack', () => {
  const pack = compose(supplier)

  it('holds the rented lines only, numbered as everybody’s', () => {
    expect(pack.lines.map(({ number, supply, asked }) => [number, supply, asked])).toEqual(
      [1, 2, 3, 4].map((number) => [number, 'rented', true]),
    )
  })

  it('has no sheet, no plot, no channel list', () => {
    expect(pack).toMatchObject({ sheets: [], plot: null, channels: [] })
  })

  it('tells no note, no gauge and no muffling', () => {
    const text = JSON.stringify(pack)
    for (const secret of ['C♯3', 'pillow', 'gauge', '138.5']) expect(text).not.toContain(secret)
  })

  it('is told of changes to its own lines, never of tuning, plot, patch or others’ lines', () => {
    const before = sampleRevision({
      ...sampleSpec,
      party: { ...sampleSpec.party, referenceHz: 442 },
      kit: sampleKit
        .filter(({ id }) => id !== 'k-throne')
        .map((entry) =>
          entry.id === 'k-tom' && entry.kind === 'drum'
            ? {
                ...entry,
                spec: {
                  ...entry.spec,
                  lugs: 5,
                  note: { semitone: 51, cents: 0 },
                  batter: { ...entry.spec.batter, gauge: 12 },
                },
              }
            : entry,
        ),
      plot: { sequence: 3, document: { ...sampleSpec.plot.document, pieces: {} } },
      channels: [],
    })
    expect(compose(supplier, { previous: { number: 5, document: before } }).changed).toEqual({
      sinceRevision: 5,
      sentences: ['Tom 12: lugs 5 → 6'],
    })
    const told = compose(venue, { previous: { number: 5, document: before } }).changed?.sentences ?? []
    expect(told).toContain('New: Throne')
    expect(told).toContain('Plot: 15 placed')
    expect(told).toContain('Tom 12, tuning: note D♯3 → C♯3; A4 442 Hz → 440 Hz; batter gauge 12 → 75')
  })
})

describe('what a reader must not see', () => {
  const house = fc.constantFrom<PackContactInput['of']>(
    { kind: 'party' },
    { kind: 'venue', id: sampleShow.venue.id },
    { kind: 'venue', id: 'another venue' },
    { kind: 'supplier', id: sampleHire.supplier.id },
    { kind: 'supplier', id: 'another supplier' },
    // The id of one's own house under the other kind is somebody else's.
    { kind: 'supplier', id: sampleShow.venue.id },
    { kind: 'venue', id: sampleHire.supplier.id },
  )
  const contacts = fc.array(
    fc.record({ of: house, name: fc.uuid(), duty: fc.constant('backline'), email: fc.uuid(), phone: fc.uuid() }),
    { maxLength: 12 },
  )
  const both = fc.constantFrom(venue, supplier)

  it('is the contacts of another house', () => {
    fc.assert(
      fc.property(both, contacts, (recipient, all) => {
        const text = JSON.stringify(compose(recipient, { contacts: all }))
        const own = recipient.kind === 'venue' ? sampleShow.venue.id : sampleHire.supplier.id
        for (const contact of all) {
          const mayRead = contact.of.kind === 'party' || (contact.of.kind === recipient.kind && contact.of.id === own)
          for (const secret of [contact.name, contact.email, contact.phone]) expect(text.includes(secret)).toBe(mayRead)
        }
      }),
    )
  })

  it('is anything that a row brings along beside the fields of a pack', () => {
    fc.assert(
      fc.property(
        both,
        fc.uuid(),
        fc.integer({ min: 1_000_000_000, max: 2_000_000_000 }),
        (recipient, words, minor) => {
          const along = { transportMinor: minor, currency: words, answers: [{ remark: words }], taxBasisPoints: minor }
          const rows: PackRecipient =
            recipient.kind === 'venue'
              ? { ...recipient, show: { ...recipient.show, ...along, venue: { ...recipient.show.venue, ...along } } }
              : {
                  ...recipient,
                  hire: { ...recipient.hire, ...along },
                  shows: recipient.shows.map((show) => ({ ...show, ...along })),
                }
          const text = JSON.stringify(
            compose(rows, { contacts: sampleContacts.map((contact) => ({ ...contact, ...along })) }),
          )
          expect(text).not.toContain(words)
          expect(text).not.toContain(String(minor))
        },
      ),
    )
  })

  it('is, for a supplier, the stage, its power and the player of any show', () => {
    const text = JSON.stringify(compose(supplier))
    for (const secret of [sampleShow.stage.inlets, sampleShow.player.name, sampleShow.player.mixes])
      expect(text).not.toContain(secret)
  })
})
