import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { apply } from './apply'
import { actionArbitrary, documentArbitrary } from './arbitrary'
import type { PlotAction } from './command'
import { emptyDocument, newPiece, type PlotDocument } from './document'
import { invert } from './invert'
import { PlotCommandError } from './plot-command-error'
import { readDocument } from './read-document'
import { fit } from './rebase'

const riser = newPiece({ id: 'r', kind: 'riser', xM: 1, yM: 2, widthM: 2.4, depthM: 2.4 })
const tom = newPiece({ id: 't', kind: 'drum', kitEntryId: 'kit-tom' })
const withBoth: PlotDocument = { ...emptyDocument, pieces: { r: riser, t: tom } }

function refusal(document: PlotDocument, action: PlotAction): string {
  try {
    apply(document, action)
  } catch (error) {
    if (error instanceof PlotCommandError) return error.code
    throw error
  }
  return 'applied'
}

describe('applying a command', () => {
  it('taking a command back restores the document exactly', () => {
    fc.assert(
      fc.property(documentArbitrary, actionArbitrary, (document, action) => {
        const fitted = fit(document, action)
        fc.pre(fitted.action !== null)
        const back = apply(apply(document, fitted.action), invert(document, fitted.action))
        expect(back).toEqual(document)
      }),
      { numRuns: 500 },
    )
  })

  it('never changes the document it is given', () => {
    fc.assert(
      fc.property(documentArbitrary, actionArbitrary, (document, action) => {
        const before = structuredClone(document)
        fit(document, action)
        expect(document).toEqual(before)
      }),
    )
  })

  it('a repeated move, turn or edit changes nothing more', () => {
    fc.assert(
      fc.property(documentArbitrary, actionArbitrary, (document, action) => {
        fc.pre(action.type !== 'place' && action.type !== 'remove')
        const fitted = fit(document, action)
        fc.pre(fitted.action !== null)
        const once = apply(document, fitted.action)
        expect(apply(once, fitted.action)).toEqual(once)
      }),
    )
  })

  it('stays JSON: what is stored reads back as the same document', () => {
    fc.assert(
      fc.property(documentArbitrary, (document) => {
        // JSON has no -0; every other number and string survives it.
        expect(JSON.stringify(readDocument(JSON.parse(JSON.stringify(document))))).toBe(JSON.stringify(document))
      }),
    )
  })

  it('refuses what is out of range, and says which rule', () => {
    expect(refusal(withBoth, { type: 'move', moves: [{ pieceId: 'r', xM: 200.01, yM: 0 }] })).toBe('out-of-range')
    expect(refusal(withBoth, { type: 'move', moves: [{ pieceId: 'r', xM: 200, yM: -200 }] })).toBe('applied')
    expect(refusal(withBoth, { type: 'move', moves: [{ pieceId: 'r', xM: Number.NaN, yM: 0 }] })).toBe('out-of-range')
    expect(refusal(withBoth, { type: 'rotate', turns: [{ pieceId: 'r', rotationDeg: Infinity }] })).toBe('out-of-range')
    expect(refusal(withBoth, { type: 'edit', pieceId: 'r', changes: { widthM: 0 } })).toBe('out-of-range')
    expect(refusal(withBoth, { type: 'edit', pieceId: 'r', changes: { zM: -1 } })).toBe('out-of-range')
    expect(refusal(withBoth, { type: 'edit', pieceId: 'r', changes: { label: 'x'.repeat(81) } })).toBe('bad-value')
    expect(refusal(withBoth, { type: 'edit', pieceId: 'r', changes: { outputs: ['L', 'L'] } })).toBe('bad-value')
    expect(refusal(withBoth, { type: 'setStage', stage: { widthM: 0.5, depthM: 4 } })).toBe('out-of-range')
    expect(refusal(withBoth, { type: 'edit', pieceId: 'r', changes: { kind: 'x' } as never })).toBe('bad-value')
    expect(refusal(withBoth, { type: 'explode' } as never)).toBe('unknown-command')
  })

  it('refuses a piece that is not there, is there already, or is named twice, and places a drum once', () => {
    expect(refusal(withBoth, { type: 'remove', pieceIds: ['nobody'] })).toBe('piece-not-there')
    expect(refusal(withBoth, { type: 'remove', pieceIds: ['constructor'] })).toBe('piece-not-there')
    expect(refusal(withBoth, { type: 'remove', pieceIds: ['r', 'r'] })).toBe('piece-named-twice')
    expect(refusal(withBoth, { type: 'place', pieces: [riser] })).toBe('piece-already-there')
    expect(refusal(withBoth, { type: 'place', pieces: [{ ...tom, id: 't2' }] })).toBe('drum-already-placed')
    expect(refusal(withBoth, { type: 'place', pieces: [{ ...tom, id: 't2', kind: 'cymbal' }] })).toBe('applied')
  })

  it('one bad part refuses the whole command', () => {
    const document = withBoth
    expect(() =>
      apply(document, {
        type: 'move',
        moves: [
          { pieceId: 'r', xM: 5, yM: 5 },
          { pieceId: 'nobody', xM: 0, yM: 0 },
        ],
      }),
    ).toThrow(PlotCommandError)
    expect(document.pieces['r']).toEqual(riser)
  })
})

describe('documents from other releases', () => {
  it('an unknown kind and unknown properties survive every change and reading back', () => {
    const stored = {
      schemaVersion: 7,
      fog: true,
      stage: { widthM: 9, depthM: 6, wings: 'both' },
      pieces: { h: { id: 'h', kind: 'hologram', xM: 0, yM: 3, beams: [1, 2, 3] } },
    }
    const read = readDocument(stored)
    const changed = [
      { type: 'move', moves: [{ pieceId: 'h', xM: 1, yM: 1 }] },
      { type: 'rotate', turns: [{ pieceId: 'h', rotationDeg: 45 }] },
      { type: 'edit', pieceId: 'h', changes: { label: 'Ghost singer' } },
      { type: 'setStage', stage: { widthM: 12, depthM: 7 } },
    ].reduce((document, action) => apply(document, action as PlotAction), read)
    const again = JSON.parse(JSON.stringify(changed)) as typeof stored & { pieces: { h: Record<string, unknown> } }
    expect(again).toMatchObject({ schemaVersion: 7, fog: true, stage: { widthM: 12, depthM: 7, wings: 'both' } })
    expect(again.pieces.h).toMatchObject({
      kind: 'hologram',
      beams: [1, 2, 3],
      xM: 1,
      rotationDeg: 45,
      label: 'Ghost singer',
    })
    const undone = apply(
      apply(read, { type: 'remove', pieceIds: ['h'] }),
      invert(read, { type: 'remove', pieceIds: ['h'] }),
    )
    expect(undone).toEqual(read)
  })

  it('fills what an older release did not know, and refuses what is no document', () => {
    const read = readDocument({ schemaVersion: 1, pieces: { a: { kind: 'wedge', xM: 1, yM: 2 } } })
    expect(read.pieces['a']).toEqual(newPiece({ id: 'a', kind: 'wedge', xM: 1, yM: 2 }))
    expect(read.stage).toEqual({ widthM: 10, depthM: 8 })
    expect(() => readDocument(null)).toThrow(TypeError)
    expect(() => readDocument({ pieces: { a: 3 } })).toThrow(TypeError)
  })
})
