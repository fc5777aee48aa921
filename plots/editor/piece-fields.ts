import type { PlotAction } from '../model/command'
import type { Piece } from '../model/document'
import type { LengthUnits } from '../symbols/length-words'
import { parseLengthM } from '../symbols/parse-length'

/** A length as it stands in a box: metres to the centimetre, or feet to two places. */
export function lengthInBox(lengthM: number, units: LengthUnits): string {
  const value = units === 'metric' ? lengthM : lengthM / 0.3048
  return String(Math.round(value * 1000) / 1000 || 0)
}

export function boxUnit(units: LengthUnits): string {
  return units === 'metric' ? 'm' : 'ft'
}

const UNREADABLE = 'Write a length such as 1.2, 35 cm or 4 ft 2 in'

/** What typing a length into a box of a piece does; a string says what is wrong. */
export function lengthAction(
  typed: string,
  units: LengthUnits,
  make: (lengthM: number) => PlotAction,
): PlotAction | string {
  const lengthM = parseLengthM(typed, units)
  return lengthM === null ? UNREADABLE : make(Math.round(lengthM * 1e4) / 1e4)
}

/** The same for a size or height that may be left empty, for the usual one. */
export function optionalLengthAction(
  typed: string,
  units: LengthUnits,
  make: (lengthM: number | null) => PlotAction,
): PlotAction | string {
  return typed === '' ? make(null) : lengthAction(typed, units, make)
}

export function placeAction(piece: Piece, axis: 'xM' | 'yM', typed: string, units: LengthUnits): PlotAction | string {
  return lengthAction(typed, units, (lengthM) => ({
    type: 'move',
    moves: [{ pieceId: piece.id, xM: piece.xM, yM: piece.yM, [axis]: lengthM }],
  }))
}

export function turnAction(piece: Piece, typed: string): PlotAction | string {
  const rotationDeg = Number(typed.replace('°', '').replace(',', '.'))
  if (typed === '' || !Number.isFinite(rotationDeg) || Math.abs(rotationDeg) > 3600)
    return 'Write degrees, such as 45 or -15'
  return { type: 'rotate', turns: [{ pieceId: piece.id, rotationDeg }] }
}
