import { emptyDocument, newPiece, PLOT_SCHEMA_VERSION, type Piece, type PlotDocument } from './document'

/**
 * A stored document as this release works with it. Missing fields take their resting value, unknown kinds and unknown
 * properties stay as they are, and a newer schema version is kept so that saving does not pretend to be older.
 * Throws TypeError when the value is not a plot document at all.
 */
export function readDocument(stored: unknown): PlotDocument {
  if (!isObject(stored) || !isObject(stored['pieces'])) throw new TypeError('Not a plot document')
  const stage = isObject(stored['stage']) ? stored['stage'] : {}
  const pieces: Record<string, Piece> = {}
  for (const [id, piece] of Object.entries(stored['pieces'])) {
    if (!isObject(piece) || typeof piece['kind'] !== 'string') throw new TypeError('Not a plot document')
    pieces[id] = newPiece({ ...piece, id, kind: piece['kind'] })
  }
  return {
    ...stored,
    schemaVersion: Math.max(Number(stored['schemaVersion']) || PLOT_SCHEMA_VERSION, PLOT_SCHEMA_VERSION),
    stage: { ...emptyDocument.stage, ...stage },
    pieces,
  }
}

function isObject(value: unknown): value is Record<string, unknown> {
  return typeof value === 'object' && value !== null && !Array.isArray(value)
}
