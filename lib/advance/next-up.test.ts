import { describe, expect, it } from 'vitest'
import type { NextSubject, NextUpFacts } from './next-up'
import { nextUp } from './next-up'
import type { Standing } from './standing'

const everything = { editRun: true, editKit: true, issue: true, editDirectory: true, send: true, settle: true }
const nothing = { editRun: false, editKit: false, issue: false, editDirectory: false, send: false, settle: false }
const full = { id: 'full', name: 'full rig', entries: 9, revision: 7 }

function subject(id: string, date: string, over: Partial<NextSubject> = {}): NextSubject {
  return {
    id,
    about: id,
    date,
    rigIds: ['full'],
    zoneKnown: true,
    hasContact: true,
    sent: true,
    standing: 'out',
    ...over,
  }
}

function facts(over: Partial<NextUpFacts>): NextUpFacts {
  return { today: '2026-10-01', may: everything, dayCount: 16, rigs: [full], shows: [], hires: [], ...over }
}

const kinds = (over: Partial<NextUpFacts>) => nextUp(facts(over)).map((step) => `${step.kind}: ${step.about}`)

describe('what a run needs next', () => {
  it('begins with days, then a show, then the kit', () => {
    expect(kinds({ dayCount: 0 })).toEqual(['add days: the run'])
    expect(kinds({})).toEqual(['add a show: the run'])
    expect(kinds({ rigs: [{ ...full, entries: 0, revision: null }], shows: [subject('Arvic', '2026-10-15')] })).toEqual(
      ['start the kit: full rig'],
    )
  })

  it('asks to issue before it asks to send, and then to send', () => {
    const show = subject('Arvic', '2026-10-15', { sent: false, standing: 'not sent' })
    expect(kinds({ rigs: [{ ...full, revision: null }], shows: [show] })).toEqual(['issue: full rig'])
    expect(kinds({ shows: [show] })).toEqual(['send: Arvic'])
  })

  it.each<[Standing, string[]]>([
    ['out', []],
    ['part answered', []],
    ['settled', []],
    ['answered', ['settle: Arvic']],
    ['overdue', ['take down: Arvic']],
    ['not delivered', ['send again: Arvic']],
    ['changed since', ['send what changed: Arvic']],
  ])('a show that is %s', (standing, expected) => {
    expect(kinds({ shows: [subject('Arvic', '2026-10-15', { standing })] })).toEqual(expected)
  })

  it('a venue without a contact is a task of its own, and nothing is asked to be sent there', () => {
    const show = subject('Arvic', '2026-10-15', { hasContact: false, sent: false, standing: 'not sent' })
    expect(kinds({ shows: [show] })).toEqual(['add a contact: Arvic'])
    expect(kinds({ shows: [show], may: { ...everything, editDirectory: false } })).toEqual([])
  })

  it('the nearest show comes first, but a mail that came back overtakes one that is still to be sent', () => {
    const unsent = { sent: false, standing: 'not sent' } as const
    expect(
      kinds({
        shows: [
          subject('near', '2026-10-05', unsent),
          subject('middle', '2026-10-20', unsent),
          subject('far', '2026-10-28', { standing: 'not delivered' }),
          subject('no zone', '2026-10-30', { zoneKnown: false }),
        ],
      }),
    ).toEqual(['send again: far', 'send: near', 'send: middle', 'give the zone: no zone'])
  })

  it('hires are asked for like shows, and what was played needs nothing', () => {
    expect(
      kinds({
        shows: [subject('played', '2026-09-30', { standing: 'not delivered' })],
        hires: [
          subject('Northline', '2026-10-12', { standing: 'answered' }),
          subject('old van', '2026-09-12', { standing: 'answered' }),
        ],
      }),
    ).toEqual(['settle: Northline'])
  })

  it('nobody is told what their role cannot do', () => {
    expect(
      kinds({
        may: nothing,
        rigs: [{ ...full, entries: 0 }],
        shows: [subject('Arvic', '2026-10-15', { standing: 'answered', zoneKnown: false, hasContact: false })],
      }),
    ).toEqual([])
    expect(kinds({ may: nothing, dayCount: 0 })).toEqual([])
    const drumTech = { ...nothing, editKit: true, issue: true }
    expect(
      kinds({
        may: drumTech,
        rigs: [{ ...full, revision: null }],
        shows: [subject('Arvic', '2026-10-15', { standing: 'answered' })],
      }),
    ).toEqual(['issue: full rig'])
  })

  it('says which show, hire or rig each step is about', () => {
    const [send] = nextUp(facts({ shows: [subject('Arvic', '2026-10-15', { standing: 'answered' })] }))
    expect(send).toMatchObject({ showId: 'Arvic', hireId: null, rigId: null })
    const [settle] = nextUp(
      facts({ shows: [subject('x', '2026-10-15')], hires: [subject('van', '2026-10-15', { standing: 'answered' })] }),
    )
    expect(settle).toMatchObject({ showId: null, hireId: 'van' })
  })
})
