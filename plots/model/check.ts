import { PLOT_LIMITS, pieceSets, type Piece, type StageSize } from './document'
import { PlotCommandError } from './plot-command-error'

/** Throws unless a coordinate in metres is within ±200 m. */
export function checkCoordinate(valueM: number, pieceId: string): void {
  if (!Number.isFinite(valueM) || Math.abs(valueM) > PLOT_LIMITS.coordinateM)
    throw new PlotCommandError(
      'out-of-range',
      `A piece stands within ${PLOT_LIMITS.coordinateM} m of the centre line and the downstage edge`,
      pieceId,
    )
}

/** Throws unless an angle is a finite number of degrees. */
export function checkAngle(valueDeg: number, pieceId: string): void {
  if (!Number.isFinite(valueDeg)) throw new PlotCommandError('out-of-range', 'An angle is a number of degrees', pieceId)
}

/** Throws unless a stage is between 1 and 100 m each way. */
export function checkStage(stage: StageSize): void {
  for (const size of [stage.widthM, stage.depthM])
    if (!Number.isFinite(size) || size < PLOT_LIMITS.stageMinM || size > PLOT_LIMITS.stageMaxM)
      throw new PlotCommandError(
        'out-of-range',
        `A stage is ${PLOT_LIMITS.stageMinM} to ${PLOT_LIMITS.stageMaxM} m wide and deep`,
      )
}

/** Throws unless every field of a piece holds what this release can draw. Unknown kinds and properties pass. */
export function checkPiece(piece: Piece): void {
  checkCoordinate(piece.xM, piece.id)
  checkCoordinate(piece.yM, piece.id)
  checkAngle(piece.rotationDeg, piece.id)
  for (const size of [piece.widthM, piece.depthM])
    if (size !== null && !(size >= PLOT_LIMITS.sizeMinM && size <= PLOT_LIMITS.sizeMaxM))
      throw new PlotCommandError(
        'out-of-range',
        `A piece is ${PLOT_LIMITS.sizeMinM} to ${PLOT_LIMITS.sizeMaxM} m wide and deep`,
        piece.id,
      )
  for (const height of [piece.zM, piece.heightM])
    if (height !== null && !(height >= 0 && height <= PLOT_LIMITS.heightMaxM))
      throw new PlotCommandError('out-of-range', `A height is 0 to ${PLOT_LIMITS.heightMaxM} m`, piece.id)
  if (typeof piece.label !== 'string' || piece.label.length > PLOT_LIMITS.labelLength)
    throw new PlotCommandError('bad-value', `A label has at most ${PLOT_LIMITS.labelLength} characters`, piece.id)
  if (!pieceSets.includes(piece.set))
    throw new PlotCommandError('bad-value', `A piece belongs to ${pieceSets.join(', ')}`, piece.id)
  if (piece.outputs !== null) checkOutputs(piece.outputs, piece.id)
}

function checkOutputs(outputs: readonly string[], pieceId: string): void {
  const named = outputs.every((output) => output.trim() !== '' && output.length <= PLOT_LIMITS.outputLength)
  if (!named || outputs.length > PLOT_LIMITS.outputs || new Set(outputs).size !== outputs.length)
    throw new PlotCommandError(
      'bad-value',
      `A piece has at most ${PLOT_LIMITS.outputs} outputs, each with its own name of at most ${PLOT_LIMITS.outputLength} characters`,
      pieceId,
    )
}
