import { describe, expect, it } from 'vitest'
import type { DrumEntry } from '@/lib/contracts/kit'
import { newDrum } from '@/lib/contracts/kit-defaults'
import { NOTE_TEMPLATES } from '@/lib/tuning/note-template'
import { drafted, inNoteOrder, judged, movedBy, notesToSet, planned } from './note-draft'

const drum = (
  id: string,
  role: Parameters<typeof newDrum>[0],
  diameterIn: number,
  spec: Partial<DrumEntry['spec']> = {},
): DrumEntry => {
  const entry = newDrum(role, { diameterIn })
  return { ...entry, spec: { ...entry.spec, ...spec }, id, rigId: 'rig', position: 0, version: 3, removed: false }
}
const kit = [
  drum('kick', 'kick', 22),
  drum('snare', 'snare', 14),
  drum('floor16', 'floor-tom', 16),
  drum('tom10', 'tom', 10),
  drum('tom12', 'tom', 12),
]
const [fourths] = NOTE_TEMPLATES
if (!fourths) throw new Error('no templates')
const D3 = { semitone: 50, cents: 0 }

describe('the plan of notes', () => {
  it('lists the toms from the smallest down, then kick and snare', () => {
    expect(inNoteOrder(kit).map(({ id }) => id)).toEqual(['tom10', 'tom12', 'floor16', 'kick', 'snare'])
  })

  it('steps the toms in fourths from the anchor and goes round a lock', () => {
    // Common practice: a fourth for 2 in, so G3 over D3, and E2 at 16 in.
    expect(planned(kit, fourths, { drumId: 'tom12', note: D3 }, {})).toMatchObject({
      tom10: { note: { semitone: 55, cents: 0 }, noteLocked: false },
      floor16: { note: { semitone: 40, cents: 0 } },
    })
    const locked = kit.map((each) =>
      each.id === 'floor16' ? drafted(each, { floor16: { note: { semitone: 43, cents: 0 }, noteLocked: true } }) : each,
    )
    expect(planned(locked, fourths, { drumId: 'tom12', note: D3 }, {})['floor16']).toEqual({
      note: { semitone: 43, cents: 0 },
      noteLocked: true,
    })
  })

  it('sends only what differs from the kit, each with the version that was seen', () => {
    const draft = { tom12: { note: D3, noteLocked: false }, kick: { note: null, noteLocked: false } }
    expect(notesToSet(kit, draft)).toEqual([{ entryId: 'tom12', version: 3, note: D3, noteLocked: false }])
    const set = [drum('tom12', 'tom', 12, { note: { ...D3 } })]
    expect(notesToSet(set, draft)).toEqual([])
    expect(notesToSet(set, { tom12: { note: D3, noteLocked: true } })).toHaveLength(1)
  })

  it('judges the notes as they stand and moves none', () => {
    const same = [drum('a', 'tom', 12, { note: D3 }), drum('b', 'tom', 13, { note: D3 }), drum('c', 'tom', 10)]
    const found = judged(same, {})
    expect([...found.keys()]).toEqual(['a', 'b'])
    expect(found.get('a')?.note).toEqual(D3)
    expect(found.get('a')?.warnings).toContainEqual({ kind: 'shared-note', withDrumIds: ['b'] })
    expect(judged([drum('a', 'tom', 12, { note: { semitone: 30, cents: 0 } })], {}).get('a')?.warnings).toEqual([
      { kind: 'below-range' },
    ])
    expect(judged([drum('c', 'tom', 10)], {}).size).toBe(0)
  })

  it('keeps a moved note within what a drum may have', () => {
    expect(movedBy({ semitone: 50, cents: -7 }, 1)).toEqual({ semitone: 51, cents: -7 })
    expect(movedBy({ semitone: 96, cents: 0 }, 1).semitone).toBe(96)
    expect(movedBy({ semitone: 12, cents: 0 }, -12).semitone).toBe(12)
  })
})
