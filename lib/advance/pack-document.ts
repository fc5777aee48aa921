import { WARBLE_LIMIT_HZ } from '@/lib/tuning/warble-limit'
import type { KitPiece } from '@/plots/model/kit-piece'
import type { PlotDocument, StageSize } from '@/plots/model/document'
import { readDocument } from '@/plots/model/read-document'
import type { Caution } from './cautions'
import type { Units } from './kit-words'
import type { SheetHead, TuningSheet } from './tuning-sheet'

/** Version of the document's shape. An older one is upgraded in memory, never on disk. */
export const PACK_SCHEMA_VERSION = 1

export type PackAudience = 'venue' | 'supplier'

export interface Fact {
  readonly label: string
  readonly words: string
}

export interface PackShow {
  readonly showId: string
  readonly title: string
  /** "Tue 14 Oct 2031", then each time of the day with its zone. */
  readonly date: string
  readonly times: readonly Fact[]
}

export interface PackContact {
  readonly name: string
  readonly duty: string
  readonly email: string
  readonly phone: string
}

export interface PackLine {
  readonly number: number
  readonly lineId: string
  readonly hash: string
  readonly count: number
  readonly kind: string
  readonly words: string
  readonly details: readonly string[]
  readonly insteadOf: string | null
  readonly supply: 'rented' | 'venue'
  readonly broughtBy: string
  /** Whether this reader is asked to answer it; the others are there to be known. */
  readonly asked: boolean
}

export interface PackChannel {
  readonly number: number
  readonly name: string
  /** What it takes: the piece, and which of its outputs where it has several. */
  readonly source: string
  readonly stand: string
  readonly phantom: boolean
}

export interface PackPlot {
  readonly document: PlotDocument
  readonly kit: readonly KitPiece[]
  readonly channels: readonly { readonly pieceId: string; readonly output: string; readonly number: number }[]
  /** The stage it is drawn on, and whose that is. */
  readonly stage: StageSize
  readonly stageName: string
}

/** What one recipient gets. It holds words and drawings only, nothing that another recipient said, and no price. */
export interface PackDocument {
  readonly schemaVersion: typeof PACK_SCHEMA_VERSION
  readonly audience: PackAudience
  readonly locale: string
  readonly units: Units
  readonly paper: 'A4' | 'Letter'
  readonly party: string
  readonly tour: string
  readonly rig: string
  readonly revision: { readonly number: number; readonly issued: string; readonly note: string }
  readonly recipient: { readonly name: string; readonly place: string }
  readonly shows: readonly PackShow[]
  /** When answers are wanted; null when no time was set. */
  readonly answersDue: string | null
  /** The stage and its power, the player, the hire's windows: whatever this reader needs on the cover. */
  readonly facts: readonly Fact[]
  readonly contacts: readonly PackContact[]
  /** What changed since the last pack sent to this recipient; null for the first. */
  readonly changed: { readonly sinceRevision: number; readonly sentences: readonly string[] } | null
  readonly plot: PackPlot | null
  readonly channels: readonly PackChannel[]
  readonly lines: readonly PackLine[]
  readonly sheets: readonly TuningSheet[]
  readonly cautions: readonly Caution[]
}

/** A stored pack as this release reads it. Throws TypeError when it is no pack, or one of a release newer than this. */
export function upgradePackDocument(stored: unknown): PackDocument {
  if (
    typeof stored !== 'object' ||
    stored === null ||
    !('schemaVersion' in stored) ||
    !('lines' in stored) ||
    !Array.isArray(stored.lines)
  ) {
    throw new TypeError('Not a pack')
  }
  if (typeof stored.schemaVersion !== 'number' || stored.schemaVersion < 1) throw new TypeError('Not a pack')
  if (stored.schemaVersion > PACK_SCHEMA_VERSION) {
    throw new TypeError(`This pack was made by a newer release (document version ${stored.schemaVersion})`)
  }
  // Version 1 is the only one so far; what came to it later is filled in. The plot inside has its own version and upgrade.
  const document = stored as unknown as PackDocument
  const sheets = document.sheets.map(filledIn)
  return document.plot
    ? { ...document, sheets, plot: { ...document.plot, document: readDocument(document.plot.document) } }
    : { ...document, sheets }
}

type LaterOfSheet = 'note' | 'figures' | 'warbleLimitHz' | 'workedFrom'
type LaterOfHead = 'tensionNPerM' | 'rodPullBoundsN' | 'toleranceHz'
type StoredHead = Omit<SheetHead, LaterOfHead | 'gauge'> &
  Partial<Pick<SheetHead, LaterOfHead>> & { readonly gauge: SheetHead['gauge'] | number }
type StoredSheet = Omit<TuningSheet, LaterOfSheet | 'heads'> &
  Partial<Pick<TuningSheet, LaterOfSheet>> & { readonly heads: readonly StoredHead[] }

/** A sheet from before a drum's figures were worked out of both heads together: its batter's note is the drum's. */
function filledIn(stored: StoredSheet): TuningSheet {
  const heads = stored.heads.map((head) => ({
    ...{ tensionNPerM: null, rodPullBoundsN: null, toleranceHz: null, ...head },
    gauge: typeof head.gauge === 'number' ? ({ kind: 'noted', reading: String(head.gauge) } as const) : head.gauge,
  }))
  const later = { figures: null, workedFrom: null, warbleLimitHz: WARBLE_LIMIT_HZ }
  return { ...later, ...stored, note: stored.note ?? heads[0]?.note ?? null, heads }
}
