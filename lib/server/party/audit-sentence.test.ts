import { describe, expect, it } from 'vitest'
import { auditSentence } from './audit-sentence'

describe('the audit trail in sentences', () => {
  it('says both sides of a change of roles', () => {
    expect(
      auditSentence('member.change-roles', {
        name: 'Jo Berg',
        before: ['viewer'],
        after: ['drum-tech', 'tour-manager'],
      }),
    ).toBe('changed the roles of Jo Berg from production viewer to drum tech, tour manager')
  })

  it('says until when a role is lent', () => {
    expect(
      auditSentence('stand-in.lend', { name: 'Jo Berg', role: 'tour-manager', untilAt: '2031-10-14T23:30:00.000Z' }),
    ).toBe('lent Jo Berg the role tour manager until 2031-10-14 23:30 UTC')
  })

  it('tells an action it does not know by its own words and the name kept with it', () => {
    expect(auditSentence('kit-entry.remove', { name: 'Tom 12' })).toBe('kit entry remove: Tom 12')
    expect(auditSentence('plot.save', null)).toBe('plot save')
  })
})

describe('the work in sentences', () => {
  const names = new Map([
    ['s1', 'Salle Nord'],
    ['h1', 'Northline'],
    ['r1', 'full rig'],
    ['d1', 'Tom 12'],
    ['d2', 'Floor 16'],
    ['c1', 'Northline desk'],
  ])
  const told = (action: string, detail: object, subject = '') => auditSentence(action, detail, subject, names)

  it('names things by what they are called now', () => {
    expect(told('answer.accept', { showId: 's1', hireId: null, lineId: 'l1' })).toBe('settled a line of Salle Nord')
    expect(told('answer.close', { showId: null, hireId: 'h1' })).toBe('said that this is all from Northline')
    expect(told('dispatch.send', { hireId: 'h1', contactId: 'c1', number: 2, holdSeconds: 20 })).toBe(
      'sent revision 2 to Northline desk, held back for 20 seconds',
    )
    expect(told('bench.read', { readings: 6, entryIds: ['d1', 'd2'] }, 's1')).toBe(
      'logged 6 readings of Tom 12, Floor 16 at Salle Nord',
    )
    expect(told('bench.sign-off', { entryId: 'd1', name: 'Sanna' }, 's1')).toBe(
      'signed off Tom 12 at Salle Nord as Sanna',
    )
    expect(told('revision.issue', { rigId: 'r1', number: 3, lines: 19 })).toBe(
      'issued revision 3 of full rig, 19 lines',
    )
  })

  it('says what was changed from what', () => {
    expect(told('day.changed', { from: { date: '2031-10-14', kind: 'off' }, to: { kind: 'travel' } })).toBe(
      'changed Tue 14 Oct from day off to travel',
    )
    expect(told('kit.changed', { from: { name: 'Rug, 2 by 1.6 m' }, to: { name: 'Rug, 2.4 by 2 m' } })).toBe(
      'changed Rug, 2 by 1.6 m in the kit, now called Rug, 2.4 by 2 m',
    )
    expect(told('channel.removed', { was: { number: 6, name: 'Bass', rigId: 'r1' } })).toBe(
      'took channel 6, Bass, off the patch of full rig',
    )
  })

  it('stays a sentence when the thing is gone', () => {
    expect(told('bench.take-back', { entryId: 'gone', name: 'Sanna' }, 'gone')).toBe('took back the sign-off of a drum')
    expect(told('answer.give', { showId: 'gone', hireId: null })).toBe('answered a line')
  })
})
