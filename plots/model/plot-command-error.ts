/** Why a command cannot be applied to a document. */
export type PlotCommandErrorCode =
  | 'unknown-command'
  | 'piece-not-there'
  | 'piece-already-there'
  | 'drum-already-placed'
  | 'piece-named-twice'
  | 'out-of-range'
  | 'bad-value'
  | 'too-many-pieces'

/** A refused command; the document is unchanged. `message` is fit to show. */
export class PlotCommandError extends Error {
  override readonly name = 'PlotCommandError'
  constructor(
    readonly code: PlotCommandErrorCode,
    message: string,
    readonly pieceId: string | null = null,
  ) {
    super(message)
  }
}
