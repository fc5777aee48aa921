import { describe, expect, it } from 'vitest'
import { newDrum, newPiece } from '@/lib/contracts/kit-defaults'
import { entryDifferences, entryParticulars } from './entry-particulars'

const reader = { locale: 'en', referenceHz: 440, units: 'metric' } as const

describe('two states of one entry', () => {
  it('differ where their words do, and nowhere else', () => {
    const mine = newDrum('tom')
    const theirs = {
      ...mine,
      name: 'Rack tom',
      spec: { ...mine.spec, depthIn: 7, note: { semitone: 50, cents: 0 }, batter: { ...mine.spec.batter, gauge: 75 } },
    }
    expect(entryDifferences(theirs, mine, reader)).toEqual([
      { label: 'Name', theirs: 'Rack tom', mine: 'Tom 12' },
      { label: 'Size', theirs: '12 in across, 7 deep (305 × 178 mm)', mine: '12 in across, 8 deep (305 × 203 mm)' },
      { label: 'Batter gauge', theirs: '75', mine: 'not noted' },
      { label: 'Note', theirs: 'D3', mine: 'no note yet' },
    ])
    expect(entryDifferences(mine, mine, reader)).toEqual([])
  })

  it('have one word for each thing that a form holds', () => {
    const labels = entryParticulars(newPiece('microphone'), reader).map(({ label }) => label)
    expect(labels).toEqual(['Name', 'Brought by', 'Count', 'Microphone', 'Phantom power', 'Stand', 'Remark'])
    expect(new Set(entryParticulars(newDrum('kick'), reader).map(({ label }) => label)).size).toBe(25)
  })
})
