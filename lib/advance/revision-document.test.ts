import { describe, expect, it } from 'vitest'
import { REVISION_SCHEMA_VERSION, upgradeRevisionDocument } from './revision-document'
import { sampleRevision } from './sample-revision'

describe('a stored revision', () => {
  it('comes back whole from JSON', () => {
    const document = sampleRevision()
    expect(upgradeRevisionDocument(JSON.parse(JSON.stringify(document)))).toEqual(document)
  })

  it('keeps pieces of a newer plot and fills in what an older one lacks', () => {
    const document = sampleRevision()
    const stored = {
      ...document,
      plot: { sequence: 1, document: { schemaVersion: 1, pieces: { x: { kind: 'fog machine', xM: 1, glow: true } } } },
    }
    const piece = upgradeRevisionDocument(stored).plot.document.pieces['x']
    expect(piece).toMatchObject({ kind: 'fog machine', xM: 1, yM: 0, glow: true, locked: false })
  })

  it.each([
    [null],
    ['text'],
    [{}],
    [{ kit: [], lines: [], plot: {} }],
    [{ kit: [], lines: [], plot: {}, schemaVersion: 0 }],
    [{ schemaVersion: 1, kit: 'no', lines: [], plot: {} }],
  ])('is refused when it is none: %j', (stored) => {
    expect(() => upgradeRevisionDocument(stored)).toThrow('Not a revision document')
  })

  it('is refused when a newer release issued it', () => {
    expect(() => upgradeRevisionDocument({ ...sampleRevision(), schemaVersion: REVISION_SCHEMA_VERSION + 1 })).toThrow(
      'newer release',
    )
  })
})
