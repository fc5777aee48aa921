import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { newPiece } from '../model/document'
import { hoop, kick, lugAnglesDeg } from './hoop'
import { areaWords, lengthWords } from './length-words'
import { outputsOf, pieceKinds, pieceName } from './piece-kinds'

describe('lugs', () => {
  it('are evenly spaced, the same seen from either side', () => {
    for (const lugs of [4, 5, 6, 8, 10, 12]) {
      const angles = lugAnglesDeg(lugs)
      expect(angles).toHaveLength(lugs)
      const mirrored = angles.map((angle) => 360 - angle).sort((a, b) => a - b)
      angles.forEach((angle, index) => expect(mirrored[index]).toBeCloseTo(angle, 9))
    }
  })

  it('are as many ticks as the drum has, for any drum', () => {
    fc.assert(
      fc.property(fc.integer({ min: 6, max: 28 }), fc.constantFrom(4, 5, 6, 8, 10, 12), (inches, lugs) => {
        expect(hoop(inches * 0.0254, lugs).filter((shape) => shape.part === 'lug')).toHaveLength(lugs)
      }),
    )
  })

  it('show their upper half, and those at the sides, on both heads of a kick', () => {
    const claws = (lugs: number) => kick(0.56, 0.4, lugs).filter((shape) => shape.part === 'claw').length
    // Half a space from straight down: 8 lugs stand 4 above the middle; 10 stand 4 above and 2 level; 6 stand 2 and 2.
    expect([claws(8), claws(10), claws(6)]).toEqual([2 * 4, 2 * (4 + 2), 2 * (2 + 2)])
  })
})

describe('kinds of pieces', () => {
  it('give the outputs a channel can take', () => {
    const outputs = (kind: string) => outputsOf(newPiece({ id: 'x', kind }))
    expect(outputs('microphone')).toEqual(['mic'])
    expect(outputs('di')).toEqual(['di'])
    expect(outputs('pad')).toEqual(['trigger'])
    expect(outputs('playback')).toEqual(['L', 'R', 'click'])
    expect(outputs('person')).toEqual(['talkback'])
    expect(outputs('drum')).toEqual([])
    expect(outputs('hologram')).toEqual([])
    expect(outputsOf(newPiece({ id: 'x', kind: 'keys', outputs: ['mono'] }))).toEqual(['mono'])
  })

  it('are each named once', () => {
    expect(new Set(pieceKinds.map((kind) => kind.kind)).size).toBe(pieceKinds.length)
    expect(new Set(pieceKinds.map((kind) => kind.word)).size).toBe(pieceKinds.length)
  })

  it('take their name from the label, the kit, or the kind', () => {
    const kit = new Map([
      ['k', { kind: 'hardware', id: 'k', name: 'Boom stand', type: 'boom-stand', count: 4 } as const],
    ])
    expect(pieceName(newPiece({ id: 'x', kind: 'hardware', kitEntryId: 'k' }), kit)).toBe('Boom stand')
    expect(pieceName(newPiece({ id: 'x', kind: 'hardware', kitEntryId: 'k', label: 'Left boom' }), kit)).toBe(
      'Left boom',
    )
    expect(pieceName(newPiece({ id: 'x', kind: 'wedge' }), kit)).toBe('Wedge')
    expect(pieceName(newPiece({ id: 'x', kind: 'hologram' }), kit)).toBe('hologram')
  })
})

describe('lengths in words', () => {
  it('are metres, or feet and inches: 8 ft is 2.4384 m exactly', () => {
    expect(lengthWords(2.4, 'metric')).toBe('2.4 m')
    expect(lengthWords(2.4384, 'imperial')).toBe('8 ft')
    expect(lengthWords(2.4, 'imperial')).toBe('7 ft 10 in')
    expect(lengthWords(0.2, 'imperial')).toBe('8 in')
    expect(areaWords(2.4384, 1.2192, 'imperial')).toBe('8 × 4 ft')
    expect(areaWords(2.4, 1.2, 'metric')).toBe('2.4 × 1.2 m')
  })
})
