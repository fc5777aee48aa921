import fc from 'fast-check'
import type { PlotAction } from './command'
import { newPiece, pieceSets, type Piece, type PlotDocument } from './document'

/** Random documents and actions for the model's property tests. Few ids, so that actions meet the same pieces. */

const ids = ['a', 'b', 'c', 'd', 'e', 'f']
const pieceId = fc.constantFrom(...ids)
const coordinate = fc.double({ min: -200, max: 200, noNaN: true })
const angle = fc.double({ min: 0, max: 359.9, noNaN: true })
const size = fc.option(fc.double({ min: 0.01, max: 60, noNaN: true }))
const height = fc.option(fc.double({ min: 0, max: 30, noNaN: true }))
const label = fc.string({ maxLength: 20 })
const outputs = fc.option(fc.uniqueArray(fc.constantFrom('L', 'R', 'click', 'mic'), { maxLength: 4 }))

export function pieceArbitrary(id: fc.Arbitrary<string> = pieceId): fc.Arbitrary<Piece> {
  return fc
    .record({
      id,
      kind: fc.constantFrom('drum', 'microphone', 'riser', 'hologram'),
      kitEntryId: fc.option(fc.constantFrom('k1', 'k2', 'k3', 'k4')),
      xM: coordinate,
      yM: coordinate,
      rotationDeg: angle,
      zM: height,
      widthM: size,
      depthM: size,
      heightM: height,
      label,
      aim: fc.option(fc.record({ pieceId })),
      set: fc.constantFrom(...pieceSets),
      locked: fc.boolean(),
      outputs,
      newerField: fc.string(),
    })
    .map((fields) => newPiece(fields))
}

export const documentArbitrary: fc.Arbitrary<PlotDocument> = fc
  .uniqueArray(pieceArbitrary(), { selector: (piece) => piece.id, maxLength: 6 })
  .map((pieces) => {
    const drums = new Set<string>()
    const kept = pieces.filter((piece) => {
      if (piece.kind !== 'drum' || piece.kitEntryId === null) return true
      if (drums.has(piece.kitEntryId)) return false
      drums.add(piece.kitEntryId)
      return true
    })
    return {
      schemaVersion: 1,
      stage: { widthM: 10, depthM: 8 },
      pieces: Object.fromEntries(kept.map((piece) => [piece.id, piece])),
    }
  })

const some = <T>(one: fc.Arbitrary<T>, key: (value: T) => string) =>
  fc.uniqueArray(one, { selector: key, minLength: 1, maxLength: 4 })

export const actionArbitrary: fc.Arbitrary<PlotAction> = fc.oneof(
  some(pieceArbitrary(), (piece) => piece.id).map((pieces): PlotAction => ({ type: 'place', pieces })),
  some(pieceId, (id) => id).map((pieceIds): PlotAction => ({ type: 'remove', pieceIds })),
  some(fc.record({ pieceId, xM: coordinate, yM: coordinate }), (move) => move.pieceId).map((moves): PlotAction => ({
    type: 'move',
    moves,
  })),
  some(
    fc.record({ pieceId, rotationDeg: fc.double({ min: -720, max: 720, noNaN: true }) }),
    (turn) => turn.pieceId,
  ).map((turns): PlotAction => ({ type: 'rotate', turns })),
  fc
    .record({
      pieceId,
      changes: fc.record(
        {
          label,
          zM: height,
          widthM: size,
          depthM: size,
          set: fc.constantFrom(...pieceSets),
          locked: fc.boolean(),
          outputs,
        },
        { requiredKeys: [] },
      ),
    })
    .map((edit): PlotAction => ({ type: 'edit', ...edit })),
  fc.record({ pieceId, at: fc.option(pieceId) }).map((aim): PlotAction => ({ type: 'aim', ...aim })),
  fc
    .record({
      widthM: fc.double({ min: 1, max: 100, noNaN: true }),
      depthM: fc.double({ min: 1, max: 100, noNaN: true }),
    })
    .map((stage): PlotAction => ({ type: 'setStage', stage })),
)
