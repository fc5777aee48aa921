import { readDocument } from '@/plots/model/read-document'
import type { PlotDocument } from '@/plots/model/document'
import type { FrozenGauge } from './frozen-gauge'
import type { FrozenEntry } from './frozen-kit'
import type { Units } from './kit-words'
import type { AskedLine } from './line-content'

/** Version of the document's shape. An older one is upgraded in memory, never on disk. */
export const REVISION_SCHEMA_VERSION = 1

export interface FrozenParty {
  readonly id: string
  readonly name: string
  readonly locale: string
  readonly units: Units
  /** Frequency of A4, Hz. */
  readonly referenceHz: number
  readonly paper: 'A4' | 'Letter'
}

export interface FrozenChannel {
  readonly id: string
  readonly number: number
  readonly name: string
  /** The piece it takes its signal from; null while it waits for one. */
  readonly pieceId: string | null
  readonly output: string
  readonly stand: string
  readonly phantom: boolean
}

/** What a rig is at one moment: all that goes into a revision, before its lines have ids and hashes. */
export interface RigSpec {
  readonly party: FrozenParty
  readonly tour: { readonly id: string; readonly name: string }
  readonly rig: { readonly id: string; readonly name: string }
  readonly kit: readonly FrozenEntry[]
  /** The rig's plot and the last command that is in it. */
  readonly plot: { readonly sequence: number; readonly document: PlotDocument }
  readonly channels: readonly FrozenChannel[]
  /** The tour's gauge; null where none was chosen, and in revisions from before there were gauges. */
  readonly gauge: FrozenGauge | null
}

export interface RevisionLine extends AskedLine {
  readonly lineId: string
  /** SHA-256 of the content as canonical JSON: an answer carries over while it holds. */
  readonly hash: string
}

/** A frozen spec of a rig. */
export interface RevisionDocument extends RigSpec {
  readonly schemaVersion: typeof REVISION_SCHEMA_VERSION
  readonly lines: readonly RevisionLine[]
}

/**
 * A stored revision as this release reads it. Throws TypeError when it is no revision document, or one of a release newer
 * than this.
 */
export function upgradeRevisionDocument(stored: unknown): RevisionDocument {
  if (
    !isObject(stored) ||
    !Array.isArray(stored['kit']) ||
    !Array.isArray(stored['lines']) ||
    !isObject(stored['plot'])
  ) {
    throw new TypeError('Not a revision document')
  }
  const version = stored['schemaVersion']
  if (typeof version !== 'number' || version < 1) throw new TypeError('Not a revision document')
  if (version > REVISION_SCHEMA_VERSION) {
    throw new TypeError(`This revision was issued by a newer release (document version ${version})`)
  }
  // Version 1 is the only one so far; what came to it later is filled in. The plot inside has its own version and upgrade.
  const document = stored as unknown as Omit<RevisionDocument, 'gauge'> & Partial<Pick<RevisionDocument, 'gauge'>>
  return {
    ...document,
    gauge: document.gauge ?? null,
    plot: { ...document.plot, document: readDocument(document.plot.document) },
  }
}

function isObject(value: unknown): value is Record<string, unknown> {
  return typeof value === 'object' && value !== null && !Array.isArray(value)
}
