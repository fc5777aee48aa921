import { describe, expect, it } from 'vitest'
import { filledEntry } from './filled-entry'
import type { Entry } from './kit'
import { entryInputSchema } from './kit'
import { newDrum, newPiece } from './kit-defaults'

const row = { id: 'e', rigId: 'r', position: 0, version: 1, removed: false }

describe('a kit entry of an older release', () => {
  it('is a whole drum again: range, measured ratio and warble limit as the contract fills them in', () => {
    const drum = newDrum('snare')
    const { measuredTapRatio: _ratio, warbleLimitHz: _limit, batter, resonant, ...older } = drum.spec
    const { range: _batterRange, ...olderBatter } = batter
    const { range: _resonantRange, ...olderResonant } = resonant ?? batter
    const stored = { ...row, ...drum, spec: { ...older, batter: olderBatter, resonant: olderResonant } }
    const filled = filledEntry(stored as unknown as Entry)
    expect(filled).toEqual({ ...row, ...drum })
    expect(filled).toEqual({ ...row, ...entryInputSchema.parse(stored) })
  })

  it('keeps what it has, a drum with one head and whatever is no drum', () => {
    const { spec, ...drum } = newDrum('tom')
    const range = { slackNPerM: 700, chokedNPerM: 4000 }
    const own = { ...spec, resonant: null, measuredTapRatio: 1.8, warbleLimitHz: 2, batter: { ...spec.batter, range } }
    expect(filledEntry({ ...row, ...drum, spec: own } as Entry).spec).toEqual(own)
    const cymbal = { ...row, ...newPiece('cymbal') } as Entry
    expect(filledEntry(cymbal)).toEqual(cymbal)
  })
})
