import { describe, expect, it } from 'vitest'
import { auditSentence } from './audit-sentence'

describe('the audit trail in sentences', () => {
  it('says both sides of a change of roles', () => {
    expect(
      auditSentence('member.change-roles', { name: 'Jo Berg', before: ['viewer'], after: ['drum-tech', 'tour-manager'] }),
    ).toBe('changed the roles of Jo Berg from production viewer to drum tech, tour manager')
  })

  it('says until when a role is lent', () => {
    expect(auditSentence('stand-in.lend', { name: 'Jo Berg', role: 'tour-manager', untilAt: '2031-10-14T23:30:00.000Z' })).toBe(
      'lent Jo Berg the role tour manager until 2031-10-14 23:30 UTC',
    )
  })

  it('tells an action it does not know by its own words and the name kept with it', () => {
    expect(auditSentence('kit-entry.remove', { name: 'Tom 12' })).toBe('kit entry remove: Tom 12')
    expect(auditSentence('plot.save', null)).toBe('plot save')
  })
})
