import { describe, expect, it } from 'vitest'
import type { DrumEntry } from '@/lib/contracts/kit'
import { newDrum } from '@/lib/contracts/kit-defaults'
import { bentBy, drafted, inNoteOrder, movedBy, notesToSet, withChange } from './note-draft'

const drum = (
  id: string,
  role: Parameters<typeof newDrum>[0],
  diameterIn: number,
  spec: Partial<DrumEntry['spec']> = {},
): DrumEntry => {
  const entry = newDrum(role, { diameterIn })
  return { ...entry, spec: { ...entry.spec, ...spec }, id, rigId: 'rig', position: 0, version: 3, removed: false }
}
const tom12 = drum('tom12', 'tom', 12, { headRelationCents: 0 })
const kit = [
  drum('kick', 'kick', 22),
  drum('snare', 'snare', 14),
  drum('floor16', 'floor-tom', 16),
  drum('tom10', 'tom', 10),
  tom12,
]
const D3 = { semitone: 50, cents: 0 }

describe('the draft of notes', () => {
  it('lists the toms from the smallest down, then kick and snare', () => {
    expect(inNoteOrder(kit).map(({ id }) => id)).toEqual(['tom10', 'tom12', 'floor16', 'kick', 'snare'])
  })

  it('lays a change over the kit’s drum and leaves the rest of it, and of the draft, alone', () => {
    const draft = withChange(withChange({}, tom12, { note: D3 }), tom12, { noteLocked: true })
    expect(draft).toEqual({ tom12: { note: D3, noteLocked: true, headRelationCents: 0 } })
    expect(drafted(tom12, draft).spec).toMatchObject({ note: D3, noteLocked: true, diameterIn: 12 })
    expect(tom12.spec.note).toBeNull()
    expect(withChange(draft, kit[0]!, { note: D3 })['tom12']).toBe(draft['tom12'])
  })

  it('hands out one drum object for one draft note, and another when the kit’s drum changed', () => {
    const draft = withChange({}, tom12, { note: D3 })
    expect(drafted(tom12, draft)).toBe(drafted(tom12, draft))
    const deeper = drum('tom12', 'tom', 12, { depthIn: 9 })
    expect(drafted(deeper, draft).spec.depthIn).toBe(9)
  })

  it('sends only what differs from the kit, each with the version that was seen', () => {
    const wanted = { note: D3, noteLocked: false, headRelationCents: 0 }
    const draft = { tom12: wanted, kick: { note: null, noteLocked: false, headRelationCents: 0 } }
    expect(notesToSet(kit, draft)).toEqual([{ entryId: 'tom12', version: 3, note: D3, noteLocked: false }])
    const set = [drum('tom12', 'tom', 12, { note: { ...D3 }, headRelationCents: 0 })]
    expect(notesToSet(set, draft)).toEqual([])
    expect(notesToSet(set, { tom12: { ...wanted, noteLocked: true } })).toHaveLength(1)
    expect(notesToSet(set, { tom12: { ...wanted, headRelationCents: 300 } })).toEqual([
      { entryId: 'tom12', version: 3, note: D3, noteLocked: false, headRelationCents: 300 },
    ])
  })

  it('keeps a moved note within what a drum may have', () => {
    expect(movedBy({ semitone: 50, cents: -7 }, 1)).toEqual({ semitone: 51, cents: -7 })
    expect(movedBy({ semitone: 96, cents: 0 }, 1).semitone).toBe(96)
    expect(movedBy({ semitone: 12, cents: 0 }, -12).semitone).toBe(12)
  })

  it('bends a note by cents, written from the nearest semitone', () => {
    expect(bentBy({ semitone: 50, cents: 49 }, 2)).toEqual({ semitone: 51, cents: -49 })
    expect(bentBy({ semitone: 51, cents: -49 }, -2)).toEqual({ semitone: 50, cents: 49 })
    const back = bentBy({ semitone: 50, cents: 1 }, -1)
    expect(back.semitone).toBe(50)
    expect(Object.is(back.cents, 0)).toBe(true)
    expect(bentBy({ semitone: 96, cents: 49 }, 5)).toEqual({ semitone: 96, cents: 50 })
    expect(bentBy({ semitone: 12, cents: -50 }, -30)).toEqual({ semitone: 12, cents: -50 })
  })
})
